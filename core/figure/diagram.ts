/** Moment and shear at one position of a train, over the envelope of every position. */
import { as } from '../quantity/kinds.ts'
import { shownUnit } from '../quantity/units.ts'
import { writeQuantity, writeUnit } from '../quantity/write.ts'
import type { DrawnReview } from '../review/values.ts'
import { envelopeCurve } from '../travel/envelope.ts'
import { spanOf } from '../travel/influence.ts'
import type { Extreme } from '../travel/types.ts'
import { distanceText } from './dimension.ts'
import { EDGE, firstFree, within } from './layout.ts'
import { beamOf, scaleOf, wheelName, wheelsAt, type Shown } from './standing.ts'
import { CLEAR, LINE, RISE, boxOf, overlap, type Text } from './text.ts'
import type { Figure, Item, Point } from './types.ts'

/** Height of the greatest ordinate above and below the base line taken together, mm. */
const ORDINATES = 24
/** Equal parts of the span at which envelope and parabolas are read, beside the wheels. */
const PARTS = 96

/**
 * Moments of the extreme's span at its position, in ink, over the envelope of the same loads in every position of the train: sagging
 * is drawn downward, on the side in tension. Loads as shown: static ones have the envelope of all trains, others that of their own
 * train; uniform load and end moments count in both. The greatest moment at this position is marked. Stations as in the elevation.
 */
export const momentFigure = (review: DrawnReview, extreme: Extreme, shown: Shown): Figure => {
  const state = stateOf(review, extreme, shown)
  const present = state.stations.map((x): Ordinate => ({ x, value: state.moment(x) }))
  const envelope = state.curve.map(({ x, moment }) => ({ x, ...moment }))
  const peak = present.reduce((a, b) => (Math.abs(b.value) > Math.abs(a.value) * (1 + 1e-9) ? b : a))
  const under = state.standing.find(({ x }) => x === peak.x)
  const where = under === undefined ? '' : `, under ${wheelName(review, under.of)}`
  return draw(review, extreme, shown, {
    kind: 'moment',
    title: 'moment',
    down: 1,
    present,
    envelope,
    mark: { ...peak, where },
  })
}

/** The same for shear, positive upward; at a wheel both sides are drawn. The extreme's own shear, or else the greatest, is marked. */
export const shearFigure = (review: DrawnReview, extreme: Extreme, shown: Shown): Figure => {
  const state = stateOf(review, extreme, shown)
  // A wheel at a support stands just within the span, as travel reads it: the base line's end has the whole reaction.
  const present = state.stations.flatMap((x) => {
    const wheel = state.standing.find((of) => of.x === x)
    const sides = (['left', 'right'] as const).map((side) => ({ x, value: state.shear(x, side) }))
    if (wheel === undefined) return sides.slice(0, 1).map((side) => ({ ...side, where: '' }))
    const name = wheelName(review, wheel.of)
    const support = x === 0 ? 0 : x === state.length ? 1 : undefined
    return sides.map((side, i) => ({ ...side, where: i === support ? '' : `, ${SIDES[i]!} of ${name}` }))
  })
  const envelope = state.curve.map(({ x, shear }) => ({ x, ...shear }))
  const mark = present.reduce((a, b) => (Math.abs(b.value) > Math.abs(a.value) * (1 + 1e-9) ? b : a))
  return draw(review, extreme, shown, { kind: 'force', title: 'shear', down: -1, present, envelope, mark })
}

const SIDES = ['left', 'right'] as const

interface Ordinate {
  /** From the left support, m. */
  readonly x: number
  readonly value: number
}

interface Diagram {
  readonly kind: 'moment' | 'force'
  readonly title: string
  /** Which way positive values are drawn on paper. */
  readonly down: 1 | -1
  readonly present: readonly Ordinate[]
  readonly envelope: readonly { readonly x: number; readonly max: number; readonly min: number }[]
  readonly mark: Ordinate & { readonly where: string }
}

/** Statics of the span at the extreme's position, distances from its left support in m. */
const stateOf = (review: DrawnReview, extreme: Extreme, shown: Shown) => {
  const beam = beamOf(review)
  const { start, length } = spanOf(beam, extreme.span)
  const { uniform = 0, ends: [endLeft, endRight] = [0, 0], loads } = shown
  const wheels = wheelsAt(review, extreme, loads)
  const near = 1e-9 * length
  const standing = wheels
    .filter(({ on }) => on)
    .map((of) => {
      const x = of.station - start
      return { x: x < near ? 0 : x > length - near ? length : x, force: of.force, of }
    })
  const reaction =
    (standing.reduce((sum, { x, force }) => sum + force * (length - x), 0) + endRight - endLeft) / length +
    (uniform * length) / 2
  const shear = (x: number, side: 'left' | 'right'): number =>
    reaction -
    uniform * x -
    standing.reduce((sum, load) => sum + (load.x < x || (side === 'right' && load.x === x) ? load.force : 0), 0)
  const moment = (x: number): number =>
    endLeft +
    reaction * x -
    (uniform * x * x) / 2 -
    standing.reduce((sum, load) => sum + load.force * Math.max(x - load.x, 0), 0)

  const breaks = [0, ...standing.map(({ x }) => x), length]
  const even = Array.from({ length: PARTS - 1 }, (_, i) => ((i + 1) * length) / PARTS)
  const stations = uniform === 0 ? breaks : [...breaks, ...even, ...level(breaks, shear, uniform)]
  const trains = trainsOf(review, extreme, loads)
  const dead = (x: number) => ({
    moment: endLeft + ((endRight - endLeft) * x) / length + (uniform * x * (length - x)) / 2,
    shear: (endRight - endLeft) / length + uniform * (length / 2 - x),
  })
  const read = ascending([...breaks, ...even])
  const curve = envelopeCurve(
    beam,
    extreme.span,
    trains,
    read.map((x) => as('distance', start + x)),
  ).map((point, i) => {
    const x = read[i]!
    const own = dead(x)
    return {
      x,
      moment: { max: point.moment.max + own.moment, min: point.moment.min + own.moment },
      shear: { max: point.shear.max + own.shear, min: point.shear.min + own.shear },
    }
  })
  return { length, standing, shear, moment, stations: ascending(stations), curve }
}

/** Where the shear passes zero between two breaks under uniform load: there the moment may be greatest. */
const level = (
  breaks: readonly number[],
  shear: (x: number, side: 'right') => number,
  uniform: number,
): readonly number[] => {
  const sorted = ascending(breaks)
  return sorted.slice(1).flatMap((to, i) => {
    const from = sorted[i]!
    const x = from + shear(from, 'right') / uniform
    return x > from && x < to ? [x] : []
  })
}

const ascending = (list: readonly number[]): readonly number[] => [...new Set(list)].sort((a, b) => a - b)

/** Static loads are those of every train; other loads are known of the extreme's own train only. */
const trainsOf = (
  review: DrawnReview,
  extreme: Extreme,
  loads: readonly number[] | undefined,
): DrawnReview['trains'] => {
  if (loads === undefined) return review.trains
  const own = extreme.train === undefined ? undefined : review.trains[extreme.train]
  if (own === undefined) return []
  return [{ ...own, wheels: own.wheels.map((wheel, i) => ({ ...wheel, load: as('force', loads[i]!) })) }]
}

const draw = (review: DrawnReview, extreme: Extreme, shown: Shown, diagram: Diagram): Figure => {
  const { units, width } = shown
  const { kind, down, present, envelope, mark } = diagram
  const scale = scaleOf(review, extreme, shown)
  const { start, length } = spanOf(beamOf(review), extreme.span)
  const across = (x: number): number => scale.across(start + x)
  const write = (value: number): string => writeQuantity({ kind, value: as(kind, value) }, units)

  const values = [0, ...present.map(({ value }) => value), ...envelope.flatMap(({ max, min }) => [max, min])]
  const [greatest, least] = [Math.max(...values), Math.min(...values)]
  const perUnit = greatest > least ? ORDINATES / (greatest - least) : 0
  const heading = EDGE + RISE
  const top = EDGE + LINE + 0.8 + (down === -1 || least < 0 ? LINE + 0.8 : 1)
  const base = top + (down === 1 ? -least : greatest) * perUnit
  const bottom = top + ORDINATES
  const at = ({ x, value }: Ordinate): Point => [across(x), base + down * value * perUnit]

  const texts: Text[] = []
  const put = (places: readonly Text[]): void => {
    const free = firstFree(places, texts.map(boxOf), width)
    if (free !== undefined) texts.push(free)
  }
  const title = `${diagram.title.toUpperCase()}, ${writeUnit(shownUnit(kind, units))}`
  put([{ item: 'text', at: [EDGE, heading], text: title, role: 'dimension', anchor: 'start' }])

  const rowOf = (above: boolean): number => (above ? top - 0.8 - (LINE - RISE) : bottom + 1 + RISE)
  const [markX, markY] = at(mark)
  const below = mark.value * down > 0 || (mark.value === 0 && down === 1)
  for (const end of kind === 'force' ? ends(envelope) : []) {
    const same = end.x === mark.x && Math.abs(end.value - mark.value) <= 1e-9 * Math.abs(mark.value)
    if (same || end.value === 0) continue
    const anchor = end.x > 0 ? 'end' : 'start'
    put([
      { item: 'text', at: [across(end.x), rowOf(end.value > 0)], text: write(end.value), role: 'dimension', anchor },
    ])
  }
  const station = distanceText(start + mark.x, units)
  const label =
    mark.value === 0 ? `${write(0)} at this position` : `${write(mark.value)} at station ${station}${mark.where}`
  const near = within({ item: 'text', at: [markX, rowOf(!below)], text: label, role: 'ink', anchor: 'middle' }, width)
  // The value of an end gives way where there is no room for both.
  const beside = firstFree([near, ...clearOf(near, texts)], texts.map(boxOf), width)
  const kept = beside === undefined ? texts.filter((other) => !overlap(boxOf(near), boxOf(other))) : texts
  const written = [...kept, beside ?? near]
  const edge = envelope.map(({ x, max, min }) => at({ x, value: below === (down === 1) ? max : min })[1])
  const hidden = mark.value !== 0 && Math.abs((below ? Math.max(...edge) : Math.min(...edge)) - markY) > 1.5
  const leader: Item = {
    item: 'line',
    points: [
      [markX, markY],
      [markX, below ? bottom + 0.6 : top - 0.4],
    ],
    role: 'hair',
  }

  const maxima = envelope.map(({ x, max }) => at({ x, value: max }))
  const minima = envelope.map(({ x, min }) => at({ x, value: min }))
  const line = present.map(at)
  const closed: Point[] = [[across(0), base], ...line, [across(length), base]]
  return {
    width,
    height: bottom + 1 + LINE + EDGE,
    items: [
      { item: 'area', points: [...maxima, ...[...minima].reverse()], fill: 'shade' },
      { item: 'line', points: maxima, role: 'envelope' },
      { item: 'line', points: minima, role: 'envelope' },
      {
        item: 'line',
        points: [
          [across(0), base],
          [across(length), base],
        ],
        role: 'thin',
      },
      ...(hidden ? [leader] : []),
      { item: 'line', points: closed, role: 'ink' },
      ...(mark.value === 0
        ? []
        : [{ item: 'circle', centre: [markX, markY], radius: 0.8, fill: 'solid', role: 'accent' } as const]),
      ...written,
    ],
    alt: `${diagram.title === 'moment' ? 'Moment' : 'Shear'} in span ${extreme.span + 1}: ${label}. Envelope from ${write(Math.min(...envelope.map(({ min }) => min)))} to ${write(Math.max(...envelope.map(({ max }) => max)))}.`,
  }
}

/** A text moved along its line to just left or right of others on it, the least move first. */
const clearOf = (text: Text, others: readonly Text[]): readonly Text[] => {
  const own = boxOf(text)
  const shifts = others
    .filter(({ at }) => at[1] === text.at[1])
    .map(boxOf)
    .flatMap((other) => [other.left - own.right - 2 * CLEAR, other.right - own.left + 2 * CLEAR])
    .sort((a, b) => Math.abs(a) - Math.abs(b))
  return shifts.map((shift): Text => ({ ...text, at: [text.at[0] + shift, text.at[1]] }))
}

/** The envelope's shear at either support, on the side where it is greatest. */
const ends = (envelope: Diagram['envelope']): readonly Ordinate[] => {
  const [left, right] = [envelope[0]!, envelope.at(-1)!]
  return [
    { x: left.x, value: left.max },
    { x: right.x, value: right.min },
  ]
}
