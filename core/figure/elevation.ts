/** The elevation: a span to scale with the train at an extreme, its loads, their resultant and the proof distances. */
import { spanOf } from '../travel/influence.ts'
import type { MomentProof } from '../travel/proof.ts'
import type { Extreme } from '../travel/types.ts'
import type { DrawnReview } from '../review/values.ts'
import { sectionName } from '../section/name.ts'
import { BLOCK, blockAbove, bridges, inView, wheelRadius } from './bridge.ts'
import { ABOVE, chain, distanceText, over, tick, type Mark } from './dimension.ts'
import { girders, heightsOf } from './girders.ts'
import { EDGE, firstFree, within } from './layout.ts'
import {
  beamOf,
  proofAt,
  scaleOf,
  wheelName,
  wheelsAt,
  type Scale,
  type Shown,
  type StandingWheel,
} from './standing.ts'
import { CLEAR, LINE, RISE, boxOf, textWidth, type Box, type Text } from './text.ts'
import type { Figure, Item } from './types.ts'
import { forceText, loadLabels } from './wheel-loads.ts'

/** Length of the arrows, mm. */
const ARROW = 9

/**
 * The extreme's span from the side, horizontal distances to scale from `view.from` to `view.to`; neighbouring girders, and wheels
 * that stand on them, as far as the view shows them. Depths are to scale with the distances where they are between 2 and 26 mm on
 * paper, and said not to be elsewhere; wheels and end trucks are signs. Where a wheel stands at the extreme's station, the
 * distances of this wheel and of the resultant from midspan are drawn: equal where wheels act alone (core/travel/proof.ts).
 * The height follows from the contents. Throws RangeError for less than 120 mm or loads that do not fit the train.
 */
export const elevationFigure = (review: DrawnReview, extreme: Extreme, shown: Shown): Figure => {
  const { units, width } = shown
  const wheels = wheelsAt(review, extreme, shown.loads)
  const scale = scaleOf(review, extreme, shown)
  const { start, length } = spanOf(beamOf(review), extreme.span)
  const midspan = scale.across(start + length / 2)
  const seen = wheels.filter((wheel) => inView(wheel, scale))
  const loaded = seen.filter(({ force }) => force !== 0)
  const resultant = resultantOf(wheels)
  const proof = proofAt(review, extreme, wheels, shown)

  const labels = loadLabels(
    loaded.map((wheel) => ({ x: scale.across(wheel.station), wheel })),
    units,
    width,
  )
  const tails = EDGE + labels.height
  const block = tails + ARROW
  const head = wheels.length === 0 ? EDGE : block + BLOCK + blockAbove(wheelRadius(wheels, scale))
  const top = head + heightsOf(review, scale).rail
  const runway = girders(review, scale, top, width)

  const arrows = loaded.map(({ station, on }): Item => ({
    item: 'arrow',
    from: [scale.across(station), tails],
    to: [scale.across(station), block],
    role: on ? 'ink' : 'thin',
  }))
  const taken: Box[] = arrows.flatMap((arrow) =>
    arrow.item === 'arrow'
      ? [{ left: arrow.from[0] - 0.9, right: arrow.from[0] + 0.9, top: tails, bottom: block }]
      : [],
  )
  const texts: Text[] = []
  const put = (places: readonly Text[]): boolean => {
    const free = firstFree(places, taken, width)
    if (free === undefined) return false
    texts.push(free)
    taken.push(boxOf(free))
    return true
  }
  beyond(wheels, scale, block - 1, width).forEach((text) => put([text]))

  const distances =
    proof === undefined
      ? { items: [], texts: [], bottom: runway.foot }
      : proofLines(proof, scale, midspan, runway.underside, shown)
  const lower = Math.max(distances.bottom, runway.foot)
  for (const text of distances.texts) put([text])

  const lines: Item[] = [centreLine(midspan, head - 1, lower + 0.5)]
  const names = lower + 0.5 + 0.6 + RISE
  const row = (text: string, x: number, role: Text['role'], line = 0): Text =>
    within({ item: 'text', at: [x, names + line * (LINE + CLEAR)], text, role, anchor: 'middle' }, width)
  const rows = [0, 1, 2, 3, 4, 5]
  for (const { support, x } of runway.supports) {
    const words = [`support ${support + 1}`, String(support + 1)]
    put([...words, ...words].map((text, i) => row(text, x, 'dimension', i < 2 ? 0 : 1)))
  }
  put(rows.map((line) => row('midspan', midspan, 'dimension', line)))
  if (resultant !== undefined && wheels.filter(({ on, force }) => on && force !== 0).length > 1) {
    const x = scale.across(resultant.station)
    const text = `resultant ${forceText(resultant.force, units)}`
    const beside = (anchor: 'start' | 'end', y: number): Text => {
      return { item: 'text', at: [x + (anchor === 'start' ? 1 : -1), y], text, role: 'accent', anchor }
    }
    const heights = [tails + RISE + 0.8, tails + RISE + 3.4]
    const high = heights.flatMap((y) => [beside('start', y), beside('end', y)])
    const low = rows.flatMap((line) => {
      const middle = row(text, x, 'accent', line)
      const from = (anchor: 'start' | 'end'): Text => ({ ...middle, at: [x, middle.at[1]], anchor })
      return [middle, from('start'), from('end')]
    })
    put([...high, ...low])
    lines.push({
      item: 'line',
      points: [
        [x, tails + 0.8],
        [x, lower + 0.5],
      ],
      role: 'accent',
    })
  }

  const foot = Math.max(names, ...texts.map((text) => boxOf(text).bottom))
  const dimensions = chain(marksOf(review, extreme, seen, scale), foot + 1.2 + ABOVE, units, width)
  const note = runway.depthToScale ? [] : [depthNote(dimensions.bottom + 0.8 + RISE)]
  return {
    width,
    height: dimensions.bottom + EDGE + (note.length > 0 ? LINE + 0.8 : 0),
    items: [
      ...bridges(review, wheels, scale, head, width),
      ...runway.items,
      ...lines,
      ...arrows,
      ...distances.items,
      ...dimensions.items,
      ...labels.draw(tails),
      ...texts,
      ...note,
    ],
    alt: altText(review, extreme, wheels, resultant, proof, shown),
  }
}

interface Resultant {
  readonly force: number
  readonly station: number
}

/** Of the wheels on the span; undefined where they carry nothing downward. */
const resultantOf = (wheels: readonly StandingWheel[]): Resultant | undefined => {
  const on = wheels.filter((wheel) => wheel.on)
  const force = on.reduce((sum, wheel) => sum + wheel.force, 0)
  if (!(force > 0)) return undefined
  return { force, station: on.reduce((sum, wheel) => sum + wheel.force * wheel.station, 0) / force }
}

/** Wheels that the view leaves out, counted at its ends. */
const beyond = (wheels: readonly StandingWheel[], scale: Scale, y: number, width: number): readonly Text[] => {
  const out = wheels.filter((wheel) => !inView(wheel, scale))
  const left = out.filter(({ station }) => station < scale.view.from).length
  const text = (count: number, x: number, anchor: 'start' | 'end'): readonly Text[] =>
    count === 0 ? [] : [{ item: 'text', at: [x, y], text: `+ ${count}`, role: 'dimension', anchor }]
  return [...text(left, EDGE, 'start'), ...text(out.length - left, width - EDGE, 'end')]
}

const centreLine = (x: number, top: number, bottom: number): Item => ({
  item: 'line',
  points: [
    [x, top],
    [x, bottom],
  ],
  role: 'centre',
})

/** Distances from midspan to the wheel and to the resultant; on one line where they lie on either side of it. */
const proofLines = (proof: MomentProof, scale: Scale, midspan: number, underside: number, { units, width }: Shown) => {
  const items: Item[] = []
  const texts: Text[] = []
  let y = underside + 1 + ABOVE
  const drawn = [proof.wheelFromMidspan, proof.resultantFromMidspan].filter(
    (metres) => Math.abs(metres) * scale.perMetre > 1e-6,
  )
  const measured = drawn.map((metres) => {
    const text = distanceText(Math.abs(metres), units)
    const x = midspan + metres * scale.perMetre
    const needed = textWidth(text) + 2 * CLEAR
    const side = metres < 0 ? -1 : 1
    const inside = needed <= Math.abs(x - midspan)
    // Too short for its text: the line goes on under it, outward, or the other way where the frame is near.
    const outward = x + side * needed
    const fits = outward >= EDGE && outward <= width - EDGE
    const [from, to] = inside ? [midspan, x] : fits ? [x, outward] : [midspan, midspan - side * needed]
    return { text, x, from, to, oneSided: inside || fits }
  })
  const [first, second] = measured
  const oneLine = drawn[0]! * drawn[1]! < 0 && measured.every(({ oneSided }) => oneSided)
  for (const dimension of measured) {
    const { text, x, from, to } = dimension
    if (dimension === second && !oneLine) y += ABOVE + 1
    items.push({
      item: 'line',
      points: [
        [Math.min(midspan, x, to), y],
        [Math.max(midspan, x, to), y],
      ],
      role: 'dimension',
    })
    items.push(tick([x, y]), tick([midspan, y]))
    if (dimension === first)
      items.push({
        item: 'line',
        points: [
          [x, underside + 0.5],
          [x, y + 1],
        ],
        role: 'hair',
      })
    texts.push({ item: 'text', at: [(from + to) / 2, over(y)], text, role: 'dimension', anchor: 'middle' })
  }
  return { items, texts, bottom: drawn.length === 0 ? underside : y + 1 }
}

/** Ends of the span and every wheel in the view, each station once. */
const marksOf = (
  review: DrawnReview,
  { span }: Extreme,
  seen: readonly StandingWheel[],
  scale: Scale,
): readonly Mark[] => {
  const { start, length } = spanOf(beamOf(review), span)
  const stations = [start, start + length, ...seen.map(({ station }) => station)].sort((a, b) => a - b)
  const near = 1e-9 * (start + length)
  return stations
    .filter((station, i) => i === 0 || station - stations[i - 1]! > near)
    .map((station) => ({ station, x: scale.across(station) }))
}

const depthNote = (y: number): Text => ({
  item: 'text',
  at: [EDGE, y],
  text: 'girder depth not to scale',
  role: 'dimension',
  anchor: 'start',
})

const altText = (
  review: DrawnReview,
  extreme: Extreme,
  wheels: readonly StandingWheel[],
  resultant: Resultant | undefined,
  proof: MomentProof | undefined,
  { units }: Shown,
): string => {
  const { length } = spanOf(beamOf(review), extreme.span)
  const distance = (metres: number): string => distanceText(metres, units)
  const sentences = [
    `Elevation of span ${extreme.span + 1}, ${distance(length)} between supports, ${sectionName(review.job.girder.section, units)}.`,
  ]
  for (const wheel of wheels)
    sentences.push(
      `${capital(wheelName(review, wheel))}: ${forceText(wheel.force, units)} at station ${distance(wheel.station)}${wheel.on ? '' : ', off the span'}.`,
    )
  if (resultant !== undefined)
    sentences.push(
      `Resultant on the span ${forceText(resultant.force, units)} at station ${distance(resultant.station)}.`,
    )
  if (proof !== undefined) {
    const wheel = wheels.find(({ index }) => index === proof.wheel)!
    sentences.push(
      `From midspan ${distance(Math.abs(proof.wheelFromMidspan))} to ${wheelName(review, wheel)} and ${distance(Math.abs(proof.resultantFromMidspan))} to the resultant.`,
    )
  }
  return sentences.join(' ')
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
