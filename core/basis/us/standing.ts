/** The wheels as they stand at a worst place, and the moment there by plain statics, so that a reader can follow it by hand. */
import { chapter } from '../../formula/chapter.ts'
import type { WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type Newton, type NewtonMetre } from '../../quantity/kinds.ts'
import { spanOf } from '../../travel/influence.ts'
import type { Extreme, MomentTerm } from '../../travel/types.ts'
import type { Design } from './design.ts'

const statics = chapter('statics')

const REACTION = statics.formula('moments about the right bearing', {
  gives: ['R_A', 'force'],
  where: { M_PB: 'moment', w: 'lineLoad', L: 'distance', M_A: 'moment', M_B: 'moment' },
  text: '(M_PB + w*L^2/2 + M_B - M_A)/L',
  note: 'M_PB moment of the wheels about the right bearing; M_A, M_B moments entering at the ends',
})
const END_REACTION = statics.formula('moments about the other bearing', {
  gives: ['R', 'force'],
  where: { M_P: 'moment', w: 'lineLoad', L: 'distance' },
  text: '(M_P + w*L^2/2)/L',
  note: 'M_P moment of the wheels about the other bearing',
})
const MOMENT = statics.formula('moments left of the section', {
  gives: ['M', 'moment'],
  where: { M_A: 'moment', R_A: 'force', x: 'distance', M_Px: 'moment', w: 'lineLoad' },
  text: 'M_A + R_A*x - M_Px - w*x^2/2',
  note: 'M_Px moment of the wheels left of the section about it',
})

/**
 * The moment of one term at its station, from the wheels on the span.
 * @param term the same wheel forces, uniform load and end moments as were asked, at what station they were found
 */
export function momentByStatics(
  design: Design,
  place: Extreme,
  term: Pick<MomentTerm, 'wheels' | 'uniform' | 'ends'>,
  station: Metre,
  on: WorkingRecorder,
): NewtonMetre {
  const { start, length } = spanOf(design.job.runway, place.span)
  const L = as('distance', length)
  const x = as('distance', station - start)
  let [aboutRight, aboutSection] = [0, 0]
  for (const { wheel, at, name } of standingOn(design, place)) {
    const force = term.wheels[wheel]!
    aboutRight += force * (L - (at - start))
    aboutSection += force * Math.max(x - (at - start), 0)
    on.row('Wheel on the span', name, [
      ['x', 'distance', at - start],
      ['P', 'force', force],
    ])
  }
  const [M_A, M_B] = term.ends
  const M_PB = as('moment', aboutRight)
  const R_A = on.take(REACTION, { M_PB, w: term.uniform, L, M_A, M_B })
  on.given('x', 'distance', x, 'the section, from the left bearing')
  return on.take(MOMENT, { M_A, R_A, x, M_Px: as('moment', aboutSection), w: term.uniform })
}

/** The reaction of one bearing from the wheels on the span; the ends carry no moment. */
export function reactionByStatics(
  design: Design,
  place: Extreme,
  { wheels, uniform: w }: Pick<MomentTerm, 'wheels' | 'uniform'>,
  end: 'left' | 'right',
  on: WorkingRecorder,
): Newton {
  const { start, length } = spanOf(design.job.runway, place.span)
  const L = as('distance', length)
  let aboutOther = 0
  for (const { wheel, at, name } of standingOn(design, place)) {
    const x = at - start
    aboutOther += wheels[wheel]! * (end === 'left' ? L - x : x)
    on.row('Wheel on the span', name, [
      ['x', 'distance', x],
      ['P', 'force', wheels[wheel]!],
    ])
  }
  return on.take(END_REACTION, { M_P: as('moment', aboutOther), w, L })
}

/** The wheels on the span: index in the train, station along the runway, and how the drawing calls them. */
function standingOn(design: Design, place: Extreme): readonly { wheel: number; at: number; name: string }[] {
  if (place.train === undefined) return []
  const { wheels } = design.trains[place.train]!
  return place.on.map((wheel) => {
    const { crane, wheel: own } = wheels[wheel]!
    const { lead, mirrored } = place.positions.find((position) => position.crane === crane)!
    const offset = design.job.cranes[crane]!.wheelSpacings.slice(0, own).reduce((sum, spacing) => sum + spacing, 0)
    return {
      wheel,
      at: mirrored ? lead - offset : lead + offset,
      name: `${design.job.cranes[crane]!.name}, wheel ${own + 1}`,
    }
  })
}
