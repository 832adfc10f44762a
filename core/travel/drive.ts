/** Drives a train over a span and finds the worst place of an effect. */
import { as } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'
import { apart, contactGoverns } from './apart.ts'
import { greatestDeflection } from './deflection.ts'
import {
  deflectionLine,
  endReactionLine,
  spanOf,
  supportReactionLine,
  withinSpan,
  type Influence,
} from './influence.ts'
import { EQUAL, passLine } from './passage.ts'
import { inOrder, onSpan, positionsOf, stationsOf, waysOf, type Way } from './place.ts'
import { momentAt, proveEquilibrium, proveValue, reactions, shearAt, type Standing } from './statics.ts'
import { stationAt, sweep, type SweepTerm } from './sweep.ts'
import type { Drive, Effect, Extreme, MomentTerm } from './types.ts'

type Of<Kind extends Effect['kind']> = Extract<Effect, { kind: Kind }>

/**
 * The worst value of an effect over every position of the train on its span, with its place. Exact for what is linear in
 * the wheels; `method` says 'refined' where the place was closed in on to 1e-9 of the span.
 *
 * Wheels at a support count as on the span. Of equally bad places one is given: the train as listed before mirrored, then
 * the greatest lead (of a train that is the same either way: the section left of midspan). Cranes of a train stand bumper to bumper; where that is not certain to be the worst
 * (apart.ts) they are also driven with free gaps. Other cranes being away is another train, to be asked for itself.
 *
 * Throws RangeError where the effect does not fit the train (number of wheels, negative factor of a 'worst' moment, a factor of a 'same' one, negative
 * wheel forces where an effect is not a moment, a station outside the span), and EquilibriumError where plain statics at
 * the place found does not give the value found; either is a fault of the program.
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

const driveMoments = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { terms }: Of<'moments'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const searched = terms.filter(({ at }) => at !== 'same')
  const termsOf = (way: Way): SweepTerm[] =>
    searched.map(({ factor, at, wheels, uniform, ends: [left, right] }) => ({
      factor,
      at: typeof at === 'number' ? withinSpan(beam, span, at) : undefined,
      weights: inOrder(way, wheels),
      uniform,
      left,
      right,
    }))
  const rowOf = (offsets: Float64Array) => ({ length, offsets, moves: new Uint8Array(offsets.length).fill(1) })
  const found = ways.map((way) => ({ way, ...sweep(rowOf(way.offsets), termsOf(way)) })).reduce(worse)
  const { way } = found
  const row = rowOf(way.offsets)
  let stations = stationsOf(train, way.mirrored, start + found.lead)
  let value = found.value
  let method: Extreme['method'] = 'exact'
  let standing = row
  let lead = found.lead
  if (train !== undefined && train.cranes.length > 1) {
    const cranes = way.order.map((i) => train.wheels[i]!.crane)
    if (!contactGoverns(row, cranes, termsOf(way))) {
      const free = apart(row, cranes, termsOf(way), found)
      method = 'refined'
      if (free.value > value + EQUAL * Math.abs(value)) {
        value = free.value
        standing = { ...row, offsets: free.stations }
        lead = 0
        stations = stations.map((_, i) => start + free.stations[way.order.indexOf(i)]!)
      }
    }
  }

  const sections = termsOf(way).map((term) => stationAt(standing, term, lead))
  const places = terms.map((term) => (term.at === 'same' ? sections[0]! : sections[searched.indexOf(term)]!))
  const on = onSpan(beam, span, stations)
  const loaded = (term: MomentTerm): Standing => ({
    length,
    loads: on.map(({ wheel, x }) => ({ x, force: term.wheels[wheel]! })),
    uniform: term.uniform,
    left: term.ends[0],
    right: term.ends[1],
  })
  const read = terms.map((term, t) => {
    const moment = momentAt(loaded(term), places[t]!)
    proveEquilibrium(loaded(term), places[t]!)
    return { station: as('distance', start + places[t]!), value: as('moment', moment) }
  })
  const first = loaded(terms[0]!)
  const total = terms.reduce((sum, { factor }, t) => sum + factor * read[t]!.value, 0)
  const size = terms.reduce((sum, { factor }, t) => sum + Math.abs(factor) * sizeOf(loaded(terms[t]!)), 0)
  proveValue(value, total, size)
  return {
    value,
    span,
    station: read[0]!.station,
    side: 'at',
    ...placed(index, train, way.mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: read,
    with: { moment: read[0]!.value, shear: as('force', shearAt(first, places[0]!)) },
    method,
  }
}

/** The reaction of one end is the shear beside it; the greater of the two ends governs. */
const driveShear = (
  drive: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { wheels, uniform }: Of<'shear'>,
): Extreme => {
  const at = (end: 'left' | 'right'): Extreme =>
    driveEnd(drive, train, ways, { kind: 'endReaction', end, wheels, uniform })
  const [left, right] = [at('left'), at('right')]
  return right.value > left.value + EQUAL * left.value
    ? { ...right, value: -right.value, side: 'left' }
    : { ...left, side: 'right' }
}

const driveEnd = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { end, wheels, uniform }: Of<'endReaction'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const found = passWorst(endReactionLine(beam, span, end), ways, wheels)
  const stations = stationsOf(train, found.way.mirrored, found.lead)
  const on = onSpan(beam, span, stations)
  const standing = standingOf(length, on, wheels, uniform)
  const value = found.value + (uniform * length) / 2
  const x = end === 'left' ? 0 : length
  const reaction = reactions(standing)[end]
  proveEquilibrium(standing, x)
  proveValue(value, reaction, sizeOf(standing) / length)
  return {
    value,
    span,
    station: as('distance', start + x),
    side: 'at',
    ...placed(index, train, found.way.mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: [],
    with: { moment: as('moment', 0), shear: as('force', end === 'left' ? reaction : -reaction) },
    method: 'exact',
  }
}

const driveBracket = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { support, wheels, uniform }: Of<'bracketReaction'>,
): Extreme => {
  const found = passWorst(supportReactionLine(beam, support), ways, wheels)
  const stations = stationsOf(train, found.way.mirrored, found.lead)
  const neighbours = [support - 1, support].filter((s) => s >= 0 && s < beam.spans.length)
  const on = new Set<number>()
  let shear = 0
  let sum = 0
  let dead = 0
  for (const girder of neighbours) {
    const { length } = spanOf(beam, girder)
    // A wheel at the support itself is carried once, by the first girder that holds it.
    const here = onSpan(beam, girder, stations).filter(({ wheel }) => !on.has(wheel))
    for (const { wheel } of here) on.add(wheel)
    const standing = standingOf(length, here, wheels, uniform)
    const end = girder === support ? 'left' : 'right'
    const reaction = reactions(standing)[end]
    proveEquilibrium(standing, end === 'left' ? 0 : length)
    if (reaction > Math.abs(shear)) shear = end === 'left' ? reaction : -reaction
    sum += reaction
    dead += (uniform * length) / 2
  }
  const value = found.value + dead
  const { start, length } = spanOf(beam, neighbours.at(-1)!)
  proveValue(value, sum, Math.abs(sum))
  return {
    value,
    span,
    station: as('distance', neighbours.at(-1) === support ? start : start + length),
    side: 'at',
    ...placed(index, train, found.way.mirrored, stations),
    on: [...on].sort((a, b) => a - b),
    terms: [],
    with: { moment: as('moment', 0), shear: as('force', shear) },
    method: 'exact',
  }
}

const driveDeflection = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { wheels, stiffness }: Of<'deflection'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const found = ways
    .map((way) => ({ way, ...greatestDeflection(length, way.offsets, inOrder(way, wheels), stiffness) }))
    .reduce(worse)
  const stations = stationsOf(train, found.way.mirrored, start + found.lead)
  const on = onSpan(beam, span, stations)
  const standing = standingOf(length, on, wheels, 0)
  const line = deflectionLine(beam, span, start + found.at, stiffness)
  const again = on.reduce((sum, { wheel, x }) => sum + wheels[wheel]! * ordinate(line, start + x), 0)
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
  { wheel, at, value }: Of<'stand'>,
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

/** The way and lead (runway station) with the greatest sum over an influence line. */
const passWorst = (line: Influence, ways: readonly Way[], wheels: readonly number[]) =>
  ways.map((way) => ({ way, ...passLine(line, way.offsets, inOrder(way, wheels)).max })).reduce(worse)

const worse = <T extends { readonly value: number }>(a: T, b: T): T =>
  b.value > a.value + EQUAL * Math.abs(a.value) ? b : a

const placed = (
  index: number | undefined,
  train: WheelTrain | undefined,
  mirrored: boolean,
  stations: readonly number[],
): Pick<Extreme, 'lead' | 'mirrored' | 'train' | 'positions'> => ({
  lead: as('distance', stations[0] ?? 0),
  mirrored,
  train: index,
  positions: positionsOf(train, mirrored, stations),
})

const standingOf = (
  length: number,
  on: readonly { readonly wheel: number; readonly x: number }[],
  wheels: readonly number[],
  uniform: number,
): Standing => ({
  length,
  loads: on.map(({ wheel, x }) => ({ x, force: wheels[wheel]! })),
  uniform,
  left: 0,
  right: 0,
})

const sizeOf = ({ length, loads, uniform, left, right }: Standing): number =>
  loads.reduce((sum, { force }) => sum + Math.abs(force), Math.abs(uniform) * length) * length +
  Math.abs(left) +
  Math.abs(right)

const ordinate = ({ breaks, polynomials }: Influence, station: number): number => {
  const piece = Math.max(
    0,
    Math.min(
      breaks.findLastIndex((at) => at <= station),
      polynomials.length - 1,
    ),
  )
  const t = station - breaks[piece]!
  const [a, b, c, d] = polynomials[piece]!
  return a + t * (b + t * (c + t * d))
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
