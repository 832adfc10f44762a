/** Drives a train over a span and finds the worst place of an effect. */
import { as } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'
import { greatestDeflection } from './deflection.ts'
import { deflectionLine, ordinateAt, spanOf, withinSpan } from './influence.ts'
import { driveMoments } from './moments.ts'
import { inOrder, onSpan, placed, stationsOf, waysOf, worse, type Way } from './place.ts'
import { driveBracket, driveEnd, driveShear } from './reactions.ts'
import { momentAt, proveEquilibrium, proveValue, shearAt, standingOf } from './statics.ts'
import type { Drive, Effect, EffectOf, Extreme } from './types.ts'

/**
 * The worst value of an effect over every position of the train on its span, with its place. Exact for what is linear in
 * the wheels; `method` says 'refined' where the place was closed in on to 1e-9 of the span.
 *
 * Wheels at a support count as on the span. Of equally bad places one is given: the train as listed before mirrored, then
 * the greatest lead (of a train that is the same either way: the section left of midspan).
 * Cranes of a train stand bumper to bumper; where that is not certain to be the worst (apart.ts) they are also driven with
 * free gaps. Some of its cranes alone are another train, to be asked for itself.
 *
 * Throws RangeError where the effect does not fit the train or the span (number of wheels, negative factor of a 'worst'
 * moment, any factor of a 'same' one, a wheel force that is negative where the effect is no moment, a station outside), and
 * EquilibriumError where plain statics at the place found does not give the value found. Both are faults of the program.
 */
export const drive = (drive: Drive, effect: Effect): Extreme => {
  const train = drive.train === undefined ? undefined : drive.trains[drive.train]
  if (drive.train !== undefined && train === undefined)
    throw new RangeError(`train ${drive.train} of ${drive.trains.length} does not exist`)
  checkEffect(effect, train)
  const ways = waysOf(train, drive.eitherWay)
  switch (effect.kind) {
    case 'moments':
      return driveMoments(drive, train, ways, effect)
    case 'shear':
      return driveShear(drive, train, ways, effect)
    case 'endReaction':
      return driveEnd(drive, train, ways, effect)
    case 'bracketReaction':
      return driveBracket(drive, train, ways, effect)
    case 'deflection':
      return driveDeflection(drive, train, ways, effect)
    case 'stand':
      return stand(drive, train, effect)
  }
}

const driveDeflection = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { wheels, stiffness }: EffectOf<'deflection'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const found = ways
    .map((way) => ({ way, ...greatestDeflection(length, way.offsets, inOrder(way, wheels), stiffness) }))
    .reduce(worse)
  const stations = stationsOf(train, found.way.mirrored, start + found.lead)
  const on = onSpan(beam, span, stations)
  const standing = standingOf(length, on, wheels, 0)
  const line = deflectionLine(beam, span, start + found.at, stiffness)
  const again = on.reduce((sum, { wheel, x }) => sum + wheels[wheel]! * ordinateAt(line, start + x), 0)
  proveEquilibrium(standing, found.at)
  proveValue(found.value, again, Math.abs(again))
  return {
    value: found.value,
    span,
    station: as('distance', start + found.at),
    side: 'at',
    ...placed(index, train, found.way.mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: [],
    with: {
      moment: as('moment', momentAt(standing, found.at)),
      shear: as('force', shearAt(standing, found.at)),
    },
    method: 'refined',
  }
}

/** One wheel at the station asked for; beside it stand the train's static loads. */
const stand = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  { wheel, at, value }: EffectOf<'stand'>,
): Extreme => {
  const x = withinSpan(beam, span, at)
  const { length } = spanOf(beam, span)
  const stations = stationsOf(train, false, at - train!.wheels[wheel]!.offset)
  const on = onSpan(beam, span, stations)
  const loads = train!.wheels.map(({ load }) => load)
  const standing = standingOf(length, on, loads, 0)
  const moment = momentAt(standing, x)
  proveEquilibrium(standing, x)
  return {
    value,
    span,
    station: at,
    side: 'at',
    ...placed(index, train, false, stations),
    on: on.map((load) => load.wheel),
    terms: [],
    with: { moment: as('moment', moment), shear: as('force', shearAt(standing, x)) },
    method: 'exact',
  }
}

const checkEffect = (effect: Effect, train: WheelTrain | undefined): void => {
  const wheels = train?.wheels.length ?? 0
  const fits = (forces: readonly number[], name: string, negative: boolean): void => {
    if (forces.length !== wheels) throw new RangeError(`${name}: ${forces.length} forces for ${wheels} wheels`)
    if (!forces.every((force) => Number.isFinite(force) && (negative || force >= 0)))
      throw new RangeError(`${name}: wheel forces ${forces.join(', ')}`)
  }
  switch (effect.kind) {
    case 'moments':
      if (effect.terms[0] === undefined || effect.terms[0].at === 'same')
        throw new RangeError('moments: the first term must name its own station')
      for (const { factor, at, wheels: forces, uniform, ends } of effect.terms) {
        fits(forces, 'moments', true)
        if (!Number.isFinite(factor) || (at === 'worst' && factor < 0) || (at === 'same' && factor !== 0))
          throw new RangeError(`moments: factor ${factor} at ${at}`)
        if (![uniform, ...ends].every(Number.isFinite))
          throw new RangeError(`moments: uniform ${uniform}, ends ${ends.join(', ')}`)
      }
      return
    case 'stand':
      if (train?.wheels[effect.wheel] === undefined)
        throw new RangeError(`stand: wheel ${effect.wheel} of ${wheels} does not exist`)
      return
    case 'deflection':
      fits(effect.wheels, effect.kind, false)
      if (!(effect.stiffness > 0 && effect.stiffness < Infinity))
        throw new RangeError(`deflection: stiffness ${effect.stiffness} N m2`)
      return
    default:
      fits(effect.wheels, effect.kind, false)
      if (!Number.isFinite(effect.uniform)) throw new RangeError(`${effect.kind}: uniform ${effect.uniform} N/m`)
  }
}
