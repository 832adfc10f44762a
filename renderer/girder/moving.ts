/** How a train is moved by hand: how far it may go, the steps of the keys, and where it comes to rest by itself. */
import { as, type Metre, type UnitSystem } from '../../core/quantity/kinds.ts'
import { fromUnit } from '../../core/quantity/units.ts'
import type { WheelTrain } from '../../core/crane/types.ts'
import { spanOf } from '../../core/travel/influence.ts'
import { stationsOf } from '../../core/travel/place.ts'
import type { Beam } from '../../core/travel/types.ts'

/** Stations of the train's first wheel, m. */
export interface Limits {
  /** Last wheel over the left support, and first wheel over the right one: beyond, nothing stands on the span. */
  readonly from: Metre
  readonly to: Metre
  /** The wheel at the left end over the left support, the one at the right end over the right support. */
  readonly home: Metre
  readonly end: Metre
}

export const limitsOf = (beam: Beam, span: number, train: WheelTrain, mirrored: boolean): Limits => {
  const { start, length } = spanOf(beam, span)
  const offsets = stationsOf(train, mirrored, 0)
  const [least, greatest] = [Math.min(...offsets), Math.max(...offsets)]
  return {
    from: as('distance', start - greatest),
    to: as('distance', start + length - least),
    home: as('distance', start - least),
    end: as('distance', start + length - greatest),
  }
}

export const held = (lead: number, { from, to }: Pick<Limits, 'from' | 'to'>): Metre =>
  as('distance', Math.min(Math.max(lead, from), to))

/** Two leads nearer than this are one, m. */
export const SAME = 1e-6

/** One step of an arrow key, m: a tenth of a foot or 25 mm, ten times that with Shift. */
export const stepOf = (units: UnitSystem, large: boolean): number =>
  units === 'us' ? fromUnit(large ? 1 : 0.1, 'ft') : fromUnit(large ? 250 : 25, 'mm')

/** The lead after a step; a stop that lies on the way is not passed. */
export const stepped = (lead: number, by: number, limits: Limits, stops: readonly number[]): Metre => {
  const target = lead + by
  const between = stops.filter((stop) =>
    by > 0 ? stop > lead + SAME && stop < target : stop < lead - SAME && stop > target,
  )
  const first = by > 0 ? Math.min(...between, target) : Math.max(...between, target)
  return held(first, limits)
}

/** The nearest stop within `reach`, m, else the lead as it is. */
export const snapped = (lead: number, stops: readonly number[], reach: number): number => {
  const near = stops.filter((stop) => Math.abs(stop - lead) <= reach)
  return near.length === 0 ? lead : near.reduce((a, b) => (Math.abs(b - lead) < Math.abs(a - lead) ? b : a))
}

/** Seconds that the drive takes from one limit to the other. */
const DRIVE_SECONDS = 24

/** The lead after some milliseconds of driving to the right, and whether the drive is over there. */
export const driven = (
  lead: number,
  milliseconds: number,
  { from, to }: Limits,
): { readonly lead: Metre; readonly over: boolean } => {
  const next = held(lead + ((to - from) * milliseconds) / (1000 * DRIVE_SECONDS), { from, to })
  return { lead: next, over: next >= to }
}
