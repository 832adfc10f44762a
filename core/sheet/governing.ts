/** Where the cranes stand worst: the absolute maximum moment with its proof, and the envelopes. */
import { momentFigure, shearFigure } from '../figure/diagram.ts'
import { elevationFigure } from '../figure/elevation.ts'
import { writeFeetInches, writeQuantity } from '../quantity/write.ts'
import { as, type Metre, type UnitSystem } from '../quantity/kinds.ts'
import type { Review } from '../review/types.ts'
import { momentProof } from '../travel/proof.ts'
import type { Extreme } from '../travel/types.ts'
import { heading, left, plain, right } from './block.ts'
import type { Block } from './types.ts'

/** Width of drawings on the page, beside the clause column, mm. */
export const FIGURE_WIDTH = 132

export function governingPart(review: Review, units: UnitSystem, number: string): readonly Block[] {
  const { envelope } = review
  const moment = envelope.moment.max
  const show = { units, width: FIGURE_WIDTH }
  return [
    heading(1, number, 'Governing positions'),
    plain('Static wheel loads: no impact, no load factor, no dead load. The search is exact: no position is worse.'),
    heading(2, `${number}.1`, 'Absolute maximum moment'),
    plain(placeOf(review, moment, units)),
    { block: 'figure', figure: elevationFigure(review, moment, show), caption: 'Cranes at the greatest moment' },
    ...proofOf(review, moment, units),
    { block: 'figure', figure: momentFigure(review, moment, show), caption: 'Moment here, over the envelope' },
    { block: 'figure', figure: shearFigure(review, moment, show), caption: 'Shear here, over the envelope' },
    heading(2, `${number}.2`, 'Greatest effects'),
    {
      block: 'table',
      columns: [left('Effect', 34), right('Value', 22), left('Place', 44)],
      rows: effects(review, units),
    },
  ]
}

/** Words for a place: station, span, and where each crane's first wheel stands. */
export function placeOf(review: Review, at: Extreme, units: UnitSystem): string {
  const station = (metres: Metre): string =>
    units === 'us' ? writeFeetInches(metres) : writeQuantity({ kind: 'distance', value: metres }, units)
  const cranes = at.positions.map(({ crane, lead, mirrored }) => {
    const { name } = review.job.cranes[crane]!
    return `wheel 1 of ${name} at ${station(lead)}${mirrored ? ', the crane turned about' : ''}`
  })
  const spans = review.job.runway.spans.length
  const span = spans > 1 ? ` in span ${at.span + 1}` : ''
  return `At station ${station(at.station)}${span}${cranes.length === 0 ? '' : `: ${cranes.join('; ')}`}.`
}

function proofOf(review: Review, at: Extreme, units: UnitSystem): readonly Block[] {
  if (at.train === undefined) return []
  const { wheels } = review.trains[at.train]!
  const { runway } = review.job
  const drive = {
    beam: { continuity: runway.continuity, spans: runway.spans },
    span: at.span,
    trains: review.trains,
    train: at.train,
    eitherWay: runway.eitherWay,
  } as const
  const term = {
    factor: 1,
    at: 'worst',
    wheels: wheels.map(({ load }) => load),
    uniform: as('lineLoad', 0),
    ends: [as('moment', 0), as('moment', 0)],
  } as const
  const proof = momentProof(drive, at, term)
  if (proof === undefined) return []
  const distance = (metres: number): string =>
    writeQuantity({ kind: 'distance', value: as('distance', Math.abs(metres)) }, units)
  const resultant = writeQuantity({ kind: 'force', value: proof.resultant }, units)
  return [
    plain(
      `Proof: the wheels on the span have a resultant of ${resultant}, ${distance(proof.distance)} from the governing wheel. ` +
        `The wheel stands ${distance(proof.wheelFromMidspan)} and the resultant ${distance(proof.resultantFromMidspan)} from midspan, ` +
        'on opposite sides: equal distances, as the greatest moment under a wheel asks.',
      'statics',
    ),
  ]
}

function effects(review: Review, units: UnitSystem): readonly (readonly string[])[] {
  const { moment, shear, reaction, deflection } = review.envelope
  const value = (kind: 'moment' | 'force' | 'length', { value: si }: Extreme): string =>
    writeQuantity({ kind, value: as(kind, si) }, units)
  const greatest = reaction.reduce((a, b) => (b.max.value > a.max.value ? b : a))
  return [
    ['Moment', value('moment', moment.max), placeOf(review, moment.max, units)],
    ['Shear', value('force', shear.max), placeOf(review, shear.max, units)],
    [`Reaction of support ${greatest.support + 1}`, value('force', greatest.max), placeOf(review, greatest.max, units)],
    ['Deflection', value('length', deflection.max), placeOf(review, deflection.max, units)],
  ]
}
