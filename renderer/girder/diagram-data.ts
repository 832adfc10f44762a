/** The lines of the diagrams: envelopes of every position, the present position, and what is read at a station. SI. */
import { as, type Kind, type Metre } from '../../core/quantity/kinds.ts'
import { beamOf, wheelName } from '../../core/figure/standing.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import { envelopeCurve } from '../../core/travel/envelope.ts'
import { deflectionLine, ordinateAt, spanOf } from '../../core/travel/influence.ts'
import { passLine } from '../../core/travel/passage.ts'
import { inOrder, waysOf } from '../../core/travel/place.ts'
import { momentAt, reactions, shearAt } from '../../core/travel/statics.ts'
import { stiffnessOf, type Present } from './standing.ts'

export type Effect = 'moment' | 'shear' | 'deflection'
export const EFFECTS: readonly Effect[] = ['moment', 'shear', 'deflection']

export const KIND_OF = { moment: 'moment', shear: 'force', deflection: 'length' } as const satisfies Record<
  Effect,
  Kind
>

/** Which way positive values are drawn: sagging moments and deflections hang, as the girder does. */
export const HANGS: Readonly<Record<Effect, boolean>> = { moment: true, shear: false, deflection: true }

export interface Bounds {
  readonly max: number
  readonly min: number
}

export interface Point {
  /** Station along the runway, m. */
  readonly x: number
  readonly y: number
}

/** Equal parts of a span at which envelopes are read. */
const PARTS = 96

/** Envelope of a span by station: over all trains, ways about and positions, static wheel loads. */
export const envelopeOf = (review: ReviewValues, span: number): readonly (Record<Effect, Bounds> & { x: number })[] => {
  const { start, length } = spanOf(beamOf(review), span)
  const stations = Array.from({ length: PARTS + 1 }, (_, part) => as('distance', start + (length * part) / PARTS))
  return boundsAt(review, span, stations)
}

/** The same at stations of one's own, within the span. */
export const boundsAt = (
  review: ReviewValues,
  span: number,
  stations: readonly Metre[],
): readonly (Record<Effect, Bounds> & { x: number })[] => {
  const beam = beamOf(review)
  const stiffness = stiffnessOf(review)
  const rows = review.trains.flatMap((train) =>
    waysOf(train, true).map((way) => ({
      offsets: way.offsets,
      loads: inOrder(
        way,
        train.wheels.map(({ load }) => load),
      ),
    })),
  )
  return envelopeCurve(beam, span, review.trains, stations).map(({ station, moment, shear }) => {
    const line = deflectionLine(beam, span, station, stiffness)
    const deflection = Math.max(0, ...rows.map(({ offsets, loads }) => passLine(line, offsets, loads).max.value))
    return { x: station, moment, shear, deflection: { max: deflection, min: 0 } }
  })
}

/** The value at a station of the span under the loads as they stand; shear at a wheel on the side where it is greater. */
export const valueAt = (review: ReviewValues, present: Present, effect: Effect, station: number): number => {
  const { start, length, span, girder } = present
  const x = Math.min(Math.max(station - start, 0), length)
  switch (effect) {
    case 'moment':
      return momentAt(girder, x)
    case 'shear':
      return shearAt(girder, x)
    case 'deflection': {
      const line = deflectionLine(beamOf(review), span, start + x, stiffnessOf(review))
      return girder.loads.reduce((sum, load) => sum + load.force * ordinateAt(line, start + load.x), 0)
    }
  }
}

/** Equal parts in which the bent line is drawn. */
const BENT = 48

/** The present line from support to support: moment straight between wheels, shear with both sides of each, deflection bent. */
export const presentLine = (review: ReviewValues, present: Present, effect: Effect): readonly Point[] => {
  const { start, length, girder } = present
  const { loads } = girder
  switch (effect) {
    case 'moment':
      return ascending([0, ...loads.map(({ x }) => x), length]).map((x) => ({ x: start + x, y: momentAt(girder, x) }))
    case 'shear': {
      let level = reactions(girder).left
      const points: Point[] = [
        { x: start, y: 0 },
        { x: start, y: level },
      ]
      for (const { x, force } of [...loads].sort((a, b) => a.x - b.x)) {
        points.push({ x: start + x, y: level })
        level -= force
        points.push({ x: start + x, y: level })
      }
      const last = { x: start + length, y: level }
      return [...points, last, { x: start + length, y: 0 }]
    }
    case 'deflection':
      return Array.from({ length: BENT + 1 }, (_, part) => {
        const x = start + (length * part) / BENT
        return { x, y: valueAt(review, present, effect, x) }
      })
  }
}

const ascending = (list: readonly number[]): readonly number[] => [...new Set(list)].sort((a, b) => a - b)

export interface Peak extends Point {
  /** ", under wheel 1"; empty where it is not at a wheel. */
  readonly where: string
}

/** The greatest ordinate of a present line; undefined where all are nothing. */
export const peakOf = (
  review: ReviewValues,
  present: Present,
  effect: Effect,
  line: readonly Point[],
): Peak | undefined => {
  const peak = line.reduce((a, b) => (Math.abs(b.y) > Math.abs(a.y) * (1 + 1e-9) ? b : a))
  if (Math.abs(peak.y) < 1e-9) return undefined
  const wheel = present.wheels.find(({ on, station }) => on && Math.abs(station - peak.x) < 1e-9)
  const atEnd = peak.x === present.start || peak.x === present.start + present.length
  if (wheel === undefined || effect === 'deflection' || (effect === 'shear' && atEnd)) return { ...peak, where: '' }
  return { ...peak, where: `, ${effect === 'moment' ? 'under' : 'beside'} ${wheelName(review, wheel)}` }
}

export interface Row extends Bounds {
  readonly station: number
  readonly here: number
  /** "support 1", "wheel 2"; empty at a tenth of the span. */
  readonly name: string
}

/** Tenths of the span and the wheels on it, for the table beside a diagram. */
export const tableRows = (review: ReviewValues, present: Present, effect: Effect): readonly Row[] => {
  const { start, length, span, wheels } = present
  const near = 1e-9 * length
  const standing = wheels.filter(({ on }) => on)
  const tenths = Array.from({ length: 11 }, (_, part) => start + (length * part) / 10)
  const inside = standing.map(({ station }) => Math.min(Math.max(station, start), start + length))
  const stations = ascending([
    ...tenths.filter((station) => !inside.some((other) => Math.abs(other - station) < near)),
    ...inside,
  ])
  const bounds = boundsAt(
    review,
    span,
    stations.map((station) => as('distance', station)),
  )
  return stations.map((station, i) => {
    const wheel = standing.find((of) => Math.abs(of.station - station) < near)
    const support = i === 0 ? span + 1 : i === stations.length - 1 ? span + 2 : undefined
    const names = [
      ...(support === undefined ? [] : [`support ${support}`]),
      ...(wheel === undefined ? [] : [wheelName(review, wheel)]),
    ]
    return {
      station,
      ...bounds[i]![effect],
      here: valueAt(review, present, effect, station),
      name: names.join(', '),
    }
  })
}
