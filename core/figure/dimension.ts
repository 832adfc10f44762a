/** Dimension lines as a draughtsman sets them: ticks, texts over the line, and what is too short for its text led out below. */
import { as, type UnitSystem } from '../quantity/kinds.ts'
import { writeQuantity } from '../quantity/write.ts'
import { EDGE, spread } from './layout.ts'
import { CLEAR, LINE, RISE, textWidth } from './text.ts'
import type { Item, Point } from './types.ts'

export interface Mark {
  /** On paper, mm. */
  readonly x: number
  /** On the runway, m. */
  readonly station: number
}

/** A distance or station in the unit shown; what is less than a nanometre is the rounding of a station, not a distance. */
export const distanceText = (metres: number, units: UnitSystem): string =>
  writeQuantity({ kind: 'distance', value: as('distance', Math.abs(metres) < 1e-9 ? 0 : metres) }, units)

/** A slash across a dimension line. */
export const tick = ([x, y]: Point): Item => ({
  item: 'line',
  points: [
    [x - TICK, y + TICK],
    [x + TICK, y - TICK],
  ],
  role: 'dimension',
})
const TICK = 0.8

/** Baseline of a text that stands on a line at height y. */
export const over = (y: number): number => y - 0.5 - (LINE - RISE)

/** Room that a level text needs above its dimension line. */
export const ABOVE = LINE + 0.5

export interface Chain {
  readonly items: readonly Item[]
  /** Lowest point that was used. */
  readonly bottom: number
}

/**
 * A chain of dimensions between neighbouring marks, listed from left to right, on a line at height y. Where texts do not fit
 * over their parts, equal neighbours are written together ("3 × 1.5 m"), else upright below the line with a line that leads there,
 * else as runs ("31 parts, 24.8 m").
 */
export const chain = (marks: readonly Mark[], y: number, units: UnitSystem, width: number): Chain => {
  const [first, last] = [marks[0], marks.at(-1)]
  if (first === undefined || last === undefined || marks.length < 2) return { items: [], bottom: y }
  const line: Item[] = [
    {
      item: 'line',
      points: [
        [first.x, y],
        [last.x, y],
      ],
      role: 'dimension',
    },
  ]
  const ticks = marks.map(({ x }) => tick([x, y]))
  const parts = together(
    marks.slice(1).map((to, i): Part => ({
      from: marks[i]!.x,
      to: to.x,
      metres: to.station - marks[i]!.station,
      text: distanceText(to.station - marks[i]!.station, units),
      parts: 1,
    })),
  )
  const fitting = parts.filter(fits)
  const texts = fitting.map((part): Item => levelText(part, y))
  const led =
    ledOut(
      parts.filter((part) => !fits(part)),
      y,
      width,
    ) ?? ledOut(runs(parts, units), y, width)
  if (led === undefined) throw new RangeError(`no room for the dimensions in ${width} mm`)
  return { items: [...line, ...ticks, ...texts, ...led.items], bottom: Math.max(y + TICK, led.bottom) }
}

interface Part {
  readonly from: number
  readonly to: number
  readonly metres: number
  readonly text: string
  readonly parts: number
}

const fits = ({ from, to, text }: Part): boolean => textWidth(text) + 2 * CLEAR <= to - from

const levelText = ({ from, to, text }: Part, y: number): Item => ({
  item: 'text',
  at: [(from + to) / 2, over(y)],
  text,
  role: 'dimension',
  anchor: 'middle',
})

/** Equal neighbours as one part, where they do not fit one by one but do together. */
const together = (parts: readonly Part[]): readonly Part[] => {
  const result: Part[] = []
  for (let i = 0; i < parts.length;) {
    const first = parts[i]!
    let end = i + 1
    while (end < parts.length && parts[end]!.text === first.text) end++
    const joined = { ...first, to: parts[end - 1]!.to, text: `${end - i} × ${first.text}`, parts: end - i }
    if (end - i > 1 && !fits(first) && fits(joined)) result.push(joined)
    else result.push(...parts.slice(i, end))
    i = end
  }
  return result
}

/** Neighbours that do not fit, each run of them as one part. */
const runs = (parts: readonly Part[], units: UnitSystem): readonly Part[] => {
  const result: Part[][] = []
  for (const [i, part] of parts.entries()) {
    if (fits(part)) continue
    if (i > 0 && !fits(parts[i - 1]!)) result.at(-1)!.push(part)
    else result.push([part])
  }
  return result.map((run) => {
    const metres = run.reduce((sum, part) => sum + part.metres, 0)
    const count = run.reduce((sum, part) => sum + part.parts, 0)
    const text = count === 1 ? run[0]!.text : `${count} parts, ${distanceText(metres, units)}`
    return { from: run[0]!.from, to: run.at(-1)!.to, metres, text, parts: count }
  })
}

/** From the line to upright texts below it, mm. */
const LEAD = 2.6

const ledOut = (parts: readonly Part[], y: number, width: number): Chain | undefined => {
  const wanted = parts.map(({ from, to }) => (from + to) / 2)
  const centres = spread(
    wanted,
    parts.map(() => LINE + 2 * CLEAR),
    EDGE,
    width - EDGE,
  )
  if (centres === undefined) return undefined
  const longest = Math.max(0, ...parts.map(({ text }) => textWidth(text)))
  return {
    bottom: parts.length === 0 ? y : y + LEAD + 0.4 + longest,
    items: parts.flatMap(({ text }, i): readonly Item[] => [
      {
        item: 'line',
        points: [
          [wanted[i]!, y],
          [centres[i]!, y + LEAD],
        ],
        role: 'hair',
      },
      {
        item: 'text',
        at: [centres[i]! + RISE - LINE / 2, y + LEAD + 0.4],
        text,
        role: 'dimension',
        anchor: 'end',
        turn: -90,
      },
    ]),
  }
}
