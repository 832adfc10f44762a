/** A train stood anywhere by hand, for the eye: the effects at one position, not the worst one. */
import { as, type Metre, type NewtonSquareMetre } from '../quantity/kinds.ts'
import { deflectionLine, ordinateAt, spanOf } from './influence.ts'
import { onSpan, positionsOf, stationsOf } from './place.ts'
import { momentAt, shearAt, type Standing } from './statics.ts'
import type { Drive, Extreme } from './types.ts'

/**
 * The train of a drive with its first wheel at `lead`, read at a station of the span: an Extreme whose value is the moment
 * there, with the shear beside it. Static wheel loads. Throws RangeError where the drive has no such train.
 */
export function standAt({ beam, span, trains, train }: Drive, lead: Metre, mirrored: boolean, station: Metre): Extreme {
  const standing = train === undefined ? undefined : trains[train]
  if (standing === undefined) throw new RangeError(`train ${String(train)} of ${trains.length} does not exist`)
  const { start, length } = spanOf(beam, span)
  const stations = stationsOf(standing, mirrored, lead)
  const on = onSpan(beam, span, stations)
  const girder = girderOf(
    length,
    on.map(({ wheel, x }) => ({ x, force: standing.wheels[wheel]!.load })),
  )
  const x = Math.min(Math.max(station - start, 0), length)
  const moment = as('moment', momentAt(girder, x))
  return {
    value: moment,
    span,
    station: as('distance', start + x),
    side: 'at',
    lead,
    mirrored,
    train,
    positions: positionsOf(standing, mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: [],
    with: { moment, shear: as('force', shearAt(girder, x)) },
    method: 'exact',
  }
}

/** Downward deflection (m) at evenly spaced stations of the span, both ends included, under the train as it stands. */
export function deflectionsAt(
  drive: Drive,
  lead: Metre,
  mirrored: boolean,
  stiffness: NewtonSquareMetre,
  parts: number,
): readonly { readonly station: Metre; readonly value: Metre }[] {
  const { beam, span, trains, train } = drive
  const standing = train === undefined ? undefined : trains[train]
  const { start, length } = spanOf(beam, span)
  const on = standing === undefined ? [] : onSpan(beam, span, stationsOf(standing, mirrored, lead))
  return Array.from({ length: parts + 1 }, (_, part) => {
    const station = as('distance', start + (length * part) / parts)
    const line = deflectionLine(beam, span, station, stiffness)
    const value = on.reduce((sum, { wheel, x }) => sum + standing!.wheels[wheel]!.load * ordinateAt(line, start + x), 0)
    return { station, value: as('length', value) }
  })
}

const girderOf = (length: number, loads: Standing['loads']): Standing => ({
  length,
  loads,
  uniform: 0,
  left: 0,
  right: 0,
})
