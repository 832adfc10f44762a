/** A train as it stands on the runway at an extreme, and the runway's stations on paper. */
import { as, type Metre, type NewtonMetre, type NewtonPerMetre, type UnitSystem } from '../quantity/kinds.ts'
import type { DrawnReview } from '../review/values.ts'
import { spanOf } from '../travel/influence.ts'
import { stationsOf } from '../travel/place.ts'
import { momentProof, type MomentProof } from '../travel/proof.ts'
import type { Beam, Extreme } from '../travel/types.ts'

/** Part of the runway that is drawn. */
export interface View {
  readonly from: Metre
  readonly to: Metre
}

/** What elevation and diagrams of one position have in common. */
export interface Shown {
  readonly units: UnitSystem
  /** Of the figure, mm; 120 or more. */
  readonly width: number
  /** Vertical force of each wheel of the extreme's train, in the train's order, N: with or without factors. Default: static. */
  readonly loads?: readonly number[]
  /** Load per length of the whole span, and moments at its ends, sagging positive. Default: none. */
  readonly uniform?: NewtonPerMetre
  readonly ends?: readonly [left: NewtonMetre, right: NewtonMetre]
  /** Holds the extreme's whole span; default: `viewOf`. Figures of the same view and width have the same horizontal scale. */
  readonly view?: View
}

/** Least width of elevation and diagrams, mm: what the words along the span need. */
const LEAST_WIDTH = 120

/** Between the frame and the view's ends, mm: room for bearings, stubs of the neighbours and values. */
export const SIDE = 12

export interface StandingWheel {
  /** In the train. */
  readonly index: number
  readonly crane: number
  /** In the crane's own list, from 0. */
  readonly wheel: number
  readonly station: number
  readonly force: number
  /** Whether it stands on the extreme's span. */
  readonly on: boolean
}

/** The wheels of an extreme's train from left to right. Throws RangeError where the loads do not fit the train. */
export const wheelsAt = (
  review: DrawnReview,
  extreme: Extreme,
  loads?: readonly number[],
): readonly StandingWheel[] => {
  if (extreme.train === undefined) return []
  const train = review.trains[extreme.train]
  if (train === undefined) throw new RangeError(`train ${extreme.train} of ${review.trains.length} does not exist`)
  if (loads !== undefined && loads.length !== train.wheels.length)
    throw new RangeError(`${loads.length} loads for ${train.wheels.length} wheels`)
  const wheels = train.wheels.map(({ crane, wheel, offset, load }, index): StandingWheel => {
    const position = extreme.positions.find((of) => of.crane === crane)
    const first = train.wheels.find((of) => of.crane === crane && of.wheel === 0)
    if (position === undefined || first === undefined) throw new RangeError(`crane ${crane} has no position`)
    const along = Math.abs(offset - first.offset)
    return {
      index,
      crane,
      wheel,
      station: position.mirrored ? position.lead - along : position.lead + along,
      force: loads?.[index] ?? load,
      on: extreme.on.includes(index),
    }
  })
  return wheels.sort((a, b) => a.station - b.station || a.index - b.index)
}

export const beamOf = ({ job }: DrawnReview): Beam => ({ continuity: job.runway.continuity, spans: job.runway.spans })

/** The extreme's span with as much of its neighbours, a span's length at most, as the train's wheels reach over. */
export const viewOf = (review: DrawnReview, extreme: Extreme): View => {
  const { start, length } = spanOf(beamOf(review), extreme.span)
  const stations = wheelsAt(review, extreme).map(({ station }) => station)
  return {
    from: as('distance', Math.max(Math.min(start, ...stations), start - length)),
    to: as('distance', Math.min(Math.max(start + length, ...stations), start + 2 * length)),
  }
}

export interface Scale {
  readonly view: View
  /** Millimetres on paper for a metre. */
  readonly perMetre: number
  /** Where a station lies on paper, mm. */
  readonly across: (station: number) => number
}

/** Throws RangeError for a figure too narrow or a view that does not hold the extreme's whole span. */
export const scaleOf = (
  review: DrawnReview,
  extreme: Extreme,
  { view = viewOf(review, extreme), width }: Shown,
): Scale => {
  if (!(width >= LEAST_WIDTH && width < Infinity)) throw new RangeError(`a figure of ${width} mm`)
  const { start, length } = spanOf(beamOf(review), extreme.span)
  const near = 1e-9 * (start + length)
  if (!(view.from <= start + near && view.to >= start + length - near && view.to - view.from < Infinity))
    throw new RangeError(`a view from ${view.from} to ${view.to} m of a span from ${start} to ${start + length} m`)
  const perMetre = (width - 2 * SIDE) / (view.to - view.from)
  return { view, perMetre, across: (station) => SIDE + (station - view.from) * perMetre }
}

/**
 * Proof of the greatest moment under a wheel, of the loads shown; undefined where the extreme is not under a wheel within its span, or
 * where cranes stand apart: then one moment alone was not what was made worst.
 */
export const proofAt = (
  review: DrawnReview,
  extreme: Extreme,
  wheels: readonly StandingWheel[],
  { uniform = as('lineLoad', 0), ends = [as('moment', 0), as('moment', 0)] }: Shown,
): MomentProof | undefined => {
  if (extreme.train === undefined || extreme.side !== 'at') return undefined
  const train = review.trains[extreme.train]
  const inContact = stationsOf(train, extreme.mirrored, extreme.lead)
  const near = 1e-9 * (extreme.station + spanOf(beamOf(review), extreme.span).length)
  if (wheels.some(({ index, station }) => Math.abs(station - inContact[index]!) > near)) return undefined
  const forces = [...wheels].sort((a, b) => a.index - b.index).map(({ force }) => force)
  const drive = {
    beam: beamOf(review),
    span: extreme.span,
    trains: review.trains,
    train: extreme.train,
    eitherWay: review.job.runway.eitherWay,
  }
  return momentProof(drive, extreme, { factor: 1, at: 'worst', wheels: forces, uniform, ends })
}

/** "wheel 2", or "wheel 2 of crane 1" where there are several. */
export const wheelName = (review: DrawnReview, { crane, wheel }: StandingWheel): string =>
  `wheel ${wheel + 1}${review.job.cranes.length > 1 ? ` of crane ${crane + 1}` : ''}`
