/** A train standing on the runway: which way about, where each wheel and each crane is. Stations in m along the runway. */
import { as } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'
import { STATION_TOLERANCE, spanOf } from './influence.ts'
import { EQUAL } from './passage.ts'
import type { Beam, Extreme } from './types.ts'

/** The wheels of a train in order of station, as distances from its first wheel (negative on its left). */
export interface Way {
  readonly mirrored: boolean
  /** Index in the train of each wheel of the row. */
  readonly order: readonly number[]
  readonly offsets: Float64Array
}

/** The ways a train may stand: as listed, and mirrored where that is another load and may be. No train: one empty way. */
export const waysOf = (train: WheelTrain | undefined, eitherWay: boolean): readonly Way[] => {
  const order = train === undefined ? [] : train.wheels.map((_, i) => i)
  const offset = (i: number): number => train!.wheels[i]!.offset
  const listed: Way = { mirrored: false, order, offsets: Float64Array.from(order, offset) }
  if (train === undefined || !train.mayMirror || !eitherWay) return [listed]
  const reversed = [...order].reverse()
  return [listed, { mirrored: true, order: reversed, offsets: Float64Array.from(reversed, (i) => -offset(i)) }]
}

/** Forces in the order of a way. */
export const inOrder = (way: Way, forces: readonly number[]): Float64Array =>
  Float64Array.from(way.order, (i) => forces[i]!)

/** Station of every wheel, in the train's order, with its first wheel at `lead`. */
export const stationsOf = (train: WheelTrain | undefined, mirrored: boolean, lead: number): readonly number[] =>
  train === undefined ? [] : train.wheels.map(({ offset }) => (mirrored ? lead - offset : lead + offset))

/** Lead and direction of every crane, told by the stations of the train's wheels. */
export const positionsOf = (
  train: WheelTrain | undefined,
  mirrored: boolean,
  stations: readonly number[],
): Extreme['positions'] => {
  if (train === undefined) return []
  return train.cranes.map((crane, c) => {
    const first = train.wheels.findIndex((wheel) => wheel.crane === crane && wheel.wheel === 0)
    return { crane, lead: as('distance', stations[first]!), mirrored: train.turned[c] !== mirrored }
  })
}

/** Wheels at or between the ends of the span, by index in the train, and their distances from its left support. */
export const onSpan = (
  beam: Beam,
  span: number,
  stations: readonly number[],
): readonly { readonly wheel: number; readonly x: number }[] => {
  const { start, length } = spanOf(beam, span)
  const near = STATION_TOLERANCE * (start + length)
  return stations.flatMap((station, wheel) => {
    const x = station - start
    return x < -near || x > length + near ? [] : [{ wheel, x: Math.min(Math.max(x, 0), length) }]
  })
}

/** The entries of an extreme that tell where the train stands. */
export const placed = (
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

/** The greater one; of equal ones the first. */
export const worse = <T extends { readonly value: number }>(a: T, b: T): T =>
  b.value > a.value + EQUAL * Math.abs(a.value) ? b : a
