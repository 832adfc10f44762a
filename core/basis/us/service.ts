/** Deflection under one crane, static: vertical with the wheels as they stand, lateral of the top flange alone. */
import { chapter } from '../../formula/chapter.ts'
import type { Crane } from '../../job/types.ts'
import { as } from '../../quantity/kinds.ts'
import type { Ask, Subject } from '../types.ts'
import type { Design } from './design.ts'
import { judge } from './judgement.ts'

const practice = chapter('practice')
const STIFFNESS = practice.formula('bending stiffness', {
  gives: ['B', 'flexuralStiffness'],
  where: { E: 'stress', I: 'inertia' },
  text: 'E*I',
})
const ALLOWED = practice.formula('span over n', {
  gives: ['delta_max', 'length'],
  where: { L: 'distance', n: 'ratio' },
  text: 'L/n',
})

const VERTICAL: Subject = {
  id: 'us.deflection.vertical',
  title: 'Deflection, vertical',
  clause: { document: 'CMAA 70', clause: '1.4.6' },
}
const LATERAL: Subject = {
  id: 'us.deflection.lateral',
  title: 'Deflection, lateral',
  clause: { document: 'CMAA 70', clause: '1.4.6' },
}

/** n of span/n for one crane, with where it comes from (AISC Design Guide 7, from memory: by CMAA service class). */
function verticalLimit(design: Design, { serviceClass }: Crane): { n: number; from: string } {
  const entered = design.job.basis.deflection.vertical
  if (entered !== undefined) return { n: entered, from: 'limit as entered' }
  const n = serviceClass === 'D' ? 800 : serviceClass === 'E' || serviceClass === 'F' ? 1000 : 600
  return { n, from: `service class ${serviceClass}` }
}

/** Vertical and lateral deflection of one span, each crane alone. */
export function deflectionAsks(design: Design, span: number): readonly Ask[] {
  const { job, section, steel, trains, forces } = design
  const lateral = job.basis.deflection.lateral
  const lateralLimit = { n: lateral ?? 400, from: lateral === undefined ? 'common practice' : 'limit as entered' }
  const vertical = { E: steel.E, I: section.Ix }
  const sideways = { E: steel.E, I: section.top.I }
  return trains.flatMap((train, index) => {
    if (train.cranes.length > 1) return []
    const number = train.cranes[0]!
    const crane = job.cranes[number]!
    const loads = train.wheels.map((wheel) => wheel.load)
    const thrust = train.wheels.map((wheel) => forces[number]!.sideThrust[wheel.wheel]!)
    const cases = [
      {
        subject: VERTICAL,
        set: `${crane.name}, static`,
        wheels: loads,
        beam: vertical,
        limit: verticalLimit(design, crane),
      },
      { subject: LATERAL, set: `side thrust of ${crane.name}`, wheels: thrust, beam: sideways, limit: lateralLimit },
      {
        subject: LATERAL,
        set: `10 % of the wheel loads of ${crane.name}`,
        wheels: loads.map((load) => 0.1 * load),
        beam: sideways,
        limit: lateralLimit,
      },
    ]
    return cases.map(({ subject, set, wheels, beam, limit }): Ask => ({
      ...subject,
      span,
      train: index,
      combination: 'service',
      set,
      effect: { kind: 'deflection', wheels, stiffness: STIFFNESS.value(beam) },
      judge: (place, on) => {
        on.note(`${set}: no impact, no load factor, no dead load`)
        on.take(STIFFNESS, beam)
        const delta = on.given(
          'delta',
          'length',
          as('length', place.value),
          'greatest deflection, section and position both sought',
        )
        const delta_max = on.take(ALLOWED, {
          L: job.runway.spans[span]!,
          n: on.given('n', 'ratio', limit.n, limit.from),
        })
        return judge(on, 'length', ['delta', delta], ['delta_max', delta_max])
      },
    }))
  })
}
