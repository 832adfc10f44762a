/** The wheels of neighbouring cranes on one rail, as trains that travel as one. */
import type { Job } from '../job/types.ts'
import { as } from '../quantity/kinds.ts'
import type { Wheel, WheelTrain } from './types.ts'
import type { CraneWheels } from './wheels.ts'

/**
 * The trains of each group of crane indices, neighbours in the order they stand, left to right.
 *
 * One crane: one train, which may be driven mirrored where the job allows it and its wheels are not the same either way.
 * Several: bumper to bumper (the last overhang of one plus the first of the next between their outer wheels), one train for
 * every way the cranes can stand, each turned or not; a crane that is the same either way stands once. Such trains are not
 * mirrored: the cranes keep their order, and every turn is listed.
 *
 * Wheels are listed from left to right, offsets in m from the leftmost, ascending; loads are the greatest static ones, in N. A
 * turned crane's wheels therefore stand in the reverse of its own order (`wheel` tells its own).
 * Cautions name trains that are longer than a span. Throws RangeError for a crane that is not one of the job's.
 */
export const wheelTrains = (
  job: Job,
  loads: readonly CraneWheels[],
  groups: readonly (readonly number[])[],
): { readonly trains: readonly WheelTrain[]; readonly cautions: readonly string[] } => {
  const stands = job.cranes.map((_, crane) => standing(job, loads, crane))
  const trains = groups.flatMap((group) => {
    const cranes = group.map((crane) => {
      const found = stands[crane]
      if (found === undefined) throw new RangeError(`crane ${crane} of ${job.cranes.length} does not exist`)
      return found
    })
    const mayTurn = (stand: Stand): boolean => job.runway.eitherWay && cranes.length > 1 && !stand.same
    const ways = cranes.reduce<readonly (readonly boolean[])[]>(
      (list, stand) =>
        list.flatMap((way) => (mayTurn(stand) ? [false, true] : [false]).map((turned) => [...way, turned])),
      [[]],
    )
    return ways.map((turned): WheelTrain => ({
      cranes: group,
      turned,
      wheels: coupled(cranes, turned),
      mayMirror: job.runway.eitherWay && cranes.length === 1 && !cranes[0]!.symmetric,
    }))
  })
  return { trains, cautions: cautionsOf(job, trains) }
}

/** A crane as it stands on this rail, unturned. */
interface Stand {
  readonly wheels: readonly Wheel[]
  readonly overhang: readonly [first: number, last: number]
  /** Wheels the same either way about. */
  readonly symmetric: boolean
  /** Wheels and bumpers the same either way about. */
  readonly same: boolean
}

const standing = (job: Job, loads: readonly CraneWheels[], crane: number): Stand => {
  const { wheelSpacings, bumperOverhang: overhang } = job.cranes[crane]!
  const { greatest } = loads[crane]!
  const wheels = greatest.map((load, wheel) => ({
    crane,
    wheel,
    offset: as(
      'distance',
      wheelSpacings.slice(0, wheel).reduce((sum, spacing) => sum + spacing, 0),
    ),
    load,
  }))
  const length = wheels.at(-1)!.offset
  const symmetric = wheels.every(({ offset, load }, i) => {
    const other = wheels[wheels.length - 1 - i]!
    return Math.abs(offset - (length - other.offset)) <= SAME * length && Math.abs(load - other.load) <= SAME * load
  })
  const same = symmetric && Math.abs(overhang[0] - overhang[1]) <= SAME * (overhang[0] + overhang[1])
  return { wheels, overhang, symmetric, same }
}

/** Rounding of an entry that was converted from other units. */
const SAME = 1e-9

const coupled = (cranes: readonly Stand[], turned: readonly boolean[]): readonly Wheel[] => {
  const wheels: Wheel[] = []
  let bumper = 0
  for (const [c, { wheels: own, overhang }] of cranes.entries()) {
    const [before, after] = turned[c] === true ? [overhang[1], overhang[0]] : overhang
    const start = c === 0 ? 0 : bumper + before
    const length = own.at(-1)!.offset
    const row = turned[c] === true ? own.map((w) => ({ ...w, offset: length - w.offset })).reverse() : own
    for (const wheel of row) wheels.push({ ...wheel, offset: as('distance', start + wheel.offset) })
    bumper = start + length + after
  }
  return wheels
}

/** By the first train of each group: the others differ by turned cranes only. */
const cautionsOf = (job: Job, trains: readonly WheelTrain[]): readonly string[] => {
  const shortest = Math.min(...job.runway.spans)
  const cautions = trains.flatMap(({ cranes, wheels }) => {
    const length = wheels.at(-1)!.offset
    if (length <= shortest) return []
    const names = cranes.map((crane) => job.cranes[crane]!.name).join(' and ')
    return [
      `The wheels of ${names} reach farther than the shortest span: some are always off it. Positions with every part of the wheels on the span have been tried.`,
    ]
  })
  return [...new Set(cautions)]
}
