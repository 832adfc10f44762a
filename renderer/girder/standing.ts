/** What stands on the span now: the position shown, the loads on it, and what they cause. SI throughout. */
import type { ReviewValues } from '../../core/review/values.ts'
import { as, type Metre, type NewtonSquareMetre, type UnitSystem } from '../../core/quantity/kinds.ts'
import { writeFeetInches, writeQuantity } from '../../core/quantity/write.ts'
import { beamOf, wheelName, wheelsAt, type StandingWheel, type View } from '../../core/figure/standing.ts'
import { spanOf } from '../../core/travel/influence.ts'
import { onSpan, stationsOf } from '../../core/travel/place.ts'
import { standAt } from '../../core/travel/stand-at.ts'
import { momentAt, shearAt, type Standing } from '../../core/travel/statics.ts'
import type { Drive, Extreme } from '../../core/travel/types.ts'
import { held, limitsOf } from './moving.ts'
import type { Stood } from './governing.ts'

/** E I of the girder about its strong axis, of which the review's deflections are. */
export const stiffnessOf = ({ job, section }: ReviewValues): NewtonSquareMetre =>
  as('flexuralStiffness', job.girder.steel.E * section.Ix)

/** A position that this review can show: what was stood before the job changed may lie outside of it by now. */
export const shownStand = (review: ReviewValues, stood: Stood): Stood => {
  const { max } = review.envelope.moment
  const train = review.trains[stood.train]
  const known = train !== undefined && review.job.runway.spans[stood.span] !== undefined
  if (!known) return { span: max.span, train: max.train ?? 0, lead: max.lead, mirrored: max.mirrored }
  const { span, mirrored, lead } = stood
  return { span, train: stood.train, mirrored, lead: held(lead, limitsOf(beamOf(review), span, train, mirrored)) }
}

export const driveOf = (review: ReviewValues, { span, train }: Stood): Drive => ({
  beam: beamOf(review),
  span,
  trains: review.trains,
  train,
  eitherWay: review.job.runway.eitherWay,
})

export interface Present {
  readonly span: number
  readonly start: number
  readonly length: number
  /** Left to right, those off the span included. */
  readonly wheels: readonly StandingWheel[]
  /** The girder with the wheels on it, distances from its left support. */
  readonly girder: Standing
}

/** The static wheel loads of an extreme's train on its span. */
export const presentOf = (review: ReviewValues, extreme: Extreme): Present => {
  const { start, length } = spanOf(beamOf(review), extreme.span)
  const wheels = wheelsAt(review, extreme)
  const loads = wheels
    .filter(({ on }) => on)
    .map(({ station, force }) => ({ x: Math.min(Math.max(station - start, 0), length), force }))
  return { span: extreme.span, start, length, wheels, girder: { length, loads, uniform: 0, left: 0, right: 0 } }
}

/**
 * The train as it stands, read where its moment is greatest, so that the drawing sets the distances of that wheel and of the
 * resultant from midspan against each other.
 */
export const extremeAt = (review: ReviewValues, stood: Stood): Extreme => {
  if (review.trains[stood.train] === undefined) return review.envelope.moment.max
  const drive = driveOf(review, stood)
  const { start, length } = spanOf(drive.beam, stood.span)
  const middle = as('distance', start + length / 2)
  return readAtPeak(review, standAt(drive, as('distance', stood.lead), stood.mirrored, middle))
}

/** The same of an extreme whose cranes stand apart, where they were found. */
export const extremeApart = (review: ReviewValues, extreme: Extreme): Extreme => {
  const beam = beamOf(review)
  const stations: number[] = []
  for (const { index, station } of wheelsAt(review, extreme)) stations[index] = station
  return readAtPeak(review, { ...extreme, on: onSpan(beam, extreme.span, stations).map(({ wheel }) => wheel) })
}

const readAtPeak = (review: ReviewValues, extreme: Extreme): Extreme => {
  const { start, girder } = presentOf(review, extreme)
  const peak = girder.loads.reduce((best, { x }) => {
    const moment = momentAt(girder, x)
    return moment > best.moment * (1 + 1e-9) ? { x, moment } : best
  }, NONE)
  if (peak === NONE) return extreme
  const [station, moment] = [as('distance', start + peak.x), as('moment', peak.moment)]
  return {
    ...extreme,
    value: moment,
    station,
    side: 'at',
    terms: [],
    with: { moment, shear: as('force', shearAt(girder, peak.x)) },
  }
}

const NONE = { x: 0, moment: 0 }

/** The span, or with it as much of its neighbours as the train reaches over: fixed, however the train moves. */
export const viewOf = (review: ReviewValues, stood: Omit<Stood, 'lead'>, wide: boolean): View => {
  const { spans } = review.job.runway
  const { start, length } = spanOf(beamOf(review), stood.span)
  const train = review.trains[stood.train]
  const offsets = train === undefined ? [0] : stationsOf(train, stood.mirrored, 0)
  const reach = Math.min(Math.max(...offsets) - Math.min(...offsets), length)
  const over = (neighbour: number | undefined): number => (wide ? Math.min(neighbour ?? 0, reach) : 0)
  return {
    from: as('distance', start - over(spans[stood.span - 1])),
    to: as('distance', start + length + over(spans[stood.span + 1])),
  }
}

/** A station as it is read: feet and inches, or metres. */
export const stationText = (station: number, units: UnitSystem): string =>
  units === 'us'
    ? writeFeetInches(station)
    : writeQuantity({ kind: 'distance', value: as('distance', Math.abs(station) < 1e-9 ? 0 : station) }, units)

/** Where the train stands, in words: "wheel 1 at 12' 1"". */
export const leadText = (review: ReviewValues, extreme: Extreme, units: UnitSystem): string => {
  const first = wheelsAt(review, extreme).find(({ index }) => index === 0)
  return first === undefined ? 'no wheel' : `${wheelName(review, first)} at ${stationText(first.station, units)}`
}

/** How a train is called in words: "Crane 1 with Crane 2, turned". */
export const trainName = (review: ReviewValues, train: number): string =>
  review.trains[train]!.cranes.map((crane, place) => {
    const { name } = review.job.cranes[crane]!
    return review.trains[train]!.turned[place] === true ? `${name}, turned` : name
  }).join(' with ')

/** The same place in another span: as far from its left support. */
export const leadInSpan = (review: ReviewValues, { span, lead }: Stood, other: number): Metre => {
  const beam = beamOf(review)
  return as('distance', lead - spanOf(beam, span).start + spanOf(beam, other).start)
}
