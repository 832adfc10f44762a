/** Forces that the girder passes on to its brackets and to the braced bay, without load factors. */
import { serviceLoadings, type Design } from '../basis/us/design.ts'
import { as, type Quantity } from '../quantity/kinds.ts'
import { drive } from '../travel/drive.ts'
import type { Beam, Effect } from '../travel/types.ts'
import type { HandedOn } from './types.ts'

/** By support the greatest vertical reaction and side thrust over all sets of cranes; the longitudinal force of the rail. */
export function handedOn(design: Design, beam: Beam): HandedOn {
  const loadings = serviceLoadings(design).filter((loading) => loading.train !== undefined)
  const none = as('lineLoad', 0)
  const { spans } = beam
  const force = (value: number): Quantity<'force'> => ({ kind: 'force', value: as('force', value) })
  const turned = (value: number): Quantity<'moment'> => ({ kind: 'moment', value: as('moment', value) })
  // Supports between equal spans are loaded alike: each kind is driven once.
  const known = new Map<string, { wheels: number; wheelsWithImpact: number; sideThrust: number }>()

  const greatest = (support: number) => {
    const span = Math.min(support, spans.length - 1)
    const worst = (train: number | undefined, wheels: readonly number[]): number => {
      const effect: Effect = { kind: 'bracketReaction', support, wheels, uniform: none }
      return drive({ beam, span, trains: design.trains, train, eitherWay: design.job.runway.eitherWay }, effect).value
    }
    const most = (forces: (loading: (typeof loadings)[number]) => readonly number[]): number =>
      Math.max(0, ...loadings.map((loading) => worst(loading.train, forces(loading))))
    return {
      wheels: most(({ train }) => design.trains[train!]!.wheels.map((wheel) => wheel.load)),
      wheelsWithImpact: most((loading) => loading.vertical),
      sideThrust: most((loading) => loading.thrust),
    }
  }

  const brackets = Array.from({ length: spans.length + 1 }, (_, support) => {
    const [left, right] = [spans[support - 1] ?? 0, spans[support] ?? 0]
    const key = `${left} ${right}`
    const wheels = known.get(key) ?? greatest(support)
    known.set(key, wheels)
    const dead = (design.dead * (left + right)) / 2
    const arm = design.job.runway.bracketEccentricity
    return {
      support,
      dead: force(dead),
      wheels: force(wheels.wheels),
      wheelsWithImpact: force(wheels.wheelsWithImpact),
      sideThrust: force(wheels.sideThrust),
      ...(arm === undefined ? {} : { moment: turned((dead + wheels.wheelsWithImpact) * arm) }),
    }
  })
  return { brackets, longitudinal: force(Math.max(0, ...loadings.map((loading) => loading.longitudinal))) }
}
