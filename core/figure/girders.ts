/** The runway itself in an elevation: girders, rail, bearings and supports, to scale. */
import type { DrawnReview } from '../review/values.ts'
import { SIDE, type Scale } from './standing.ts'
import type { Item, Point } from './types.ts'

/** Between the frame and the stub of a neighbouring girder, mm. */
const STUB = 3
/** How far a girder reaches over its support at an end of the runway, mm, at least: not to scale. */
const OVER = 2.6
/** Half the gap between two girders, mm: not to scale. */
const GAP = 0.3
const BEARING = 1
const COLUMN = 5.5

/** What the drawn depth of a girder keeps to, mm; outside of it the depth is not to scale. */
const SHALLOWEST = 2
const DEEPEST = 26

/** Paper heights, mm: y runs downward. */
export interface Girders {
  readonly items: readonly Item[]
  readonly depth: number
  readonly depthToScale: boolean
  readonly underside: number
  /** Foot of what is drawn of the columns. */
  readonly foot: number
  /** Supports in the view, by index. */
  readonly supports: readonly { readonly support: number; readonly x: number }[]
}

/** Heights of rail and girder on paper; what would be a hairline or fill the page is drawn thicker or shallower. */
export const heightsOf = (review: DrawnReview, { perMetre }: Scale) => {
  const { section, job } = review
  const scaled = section.depth * perMetre
  const depth = Math.min(Math.max(scaled, SHALLOWEST), DEEPEST)
  const rail = (job.runway.rail.height - job.runway.rail.wear) * perMetre
  return { depth, rail: Math.min(Math.max(rail, 0.7), 5), toScale: depth === scaled }
}

/** The runway with the top of its girders at height `top` on paper. */
export const girders = (review: DrawnReview, scale: Scale, top: number, width: number): Girders => {
  const { section, job } = review
  const { across, view } = scale
  const { depth, rail, toScale } = heightsOf(review, scale)
  const underside = top + depth
  const foot = underside + BEARING + COLUMN
  const stations = job.runway.spans.reduce<readonly number[]>((all, span) => [...all, all.at(-1)! + span], [0])
  const [least, most] = [STUB, width - STUB]
  const ends = { first: 0, last: stations.length - 1 }
  const bearing = Math.min(Math.max((job.runway.bearingLength ?? 0) * scale.perMetre, 2.4), SIDE - STUB)
  const over = Math.max(OVER, bearing / 2)
  const edge = (support: number, side: 'left' | 'right'): number => {
    const x = across(stations[support]!)
    if (side === 'left') return support === ends.first ? x - over : x + GAP
    return support === ends.last ? x + over : x - GAP
  }

  const drawn = job.runway.spans.flatMap((_, span): readonly Item[] => {
    const [left, right] = [edge(span, 'left'), edge(span + 1, 'right')]
    if (right <= least || left >= most) return []
    return girder(Math.max(left, least), Math.min(right, most), top, depth, {
      leftBroken: left < least,
      rightBroken: right > most,
      flanges: [section.topFlange.thickness + section.cap.thickness, section.bottomFlange.thickness].map(
        (thickness) => (thickness / section.depth) * depth,
      ),
    })
  })
  const railFrom = Math.max(edge(ends.first, 'left'), least)
  const railTo = Math.min(edge(ends.last, 'right'), most)
  const supports = stations.flatMap((station, support) => {
    const near = 1e-9 * (view.to - view.from)
    return station < view.from - near || station > view.to + near ? [] : [{ support, x: across(station) }]
  })
  return {
    items: [
      ...drawn,
      ...(railTo > railFrom ? [rectangle(railFrom, railTo, top - rail, top, 'solid')] : []),
      ...supports.flatMap(({ x }): readonly Item[] => [
        rectangle(x - bearing / 2, x + bearing / 2, underside, underside + BEARING, 'solid'),
        ...[-1.6, 1.6].map((side): Item => ({
          item: 'line',
          points: [
            [x + side, underside + BEARING],
            [x + side, foot],
          ],
          role: 'thin',
        })),
      ]),
    ],
    depth,
    depthToScale: toScale,
    underside,
    foot,
    supports,
  }
}

/** A girder's side view; a broken end shows that it goes on. */
const girder = (
  left: number,
  right: number,
  top: number,
  depth: number,
  of: { readonly leftBroken: boolean; readonly rightBroken: boolean; readonly flanges: readonly number[] },
): readonly Item[] => {
  const bottom = top + depth
  const [upper = 0, lower = 0] = of.flanges.map((thickness) => Math.max(thickness, 0.55))
  const end = (x: number, broken: boolean): Item => ({
    item: 'line',
    points: broken
      ? breakLine(x, top, bottom)
      : [
          [x, top],
          [x, bottom],
        ],
    role: broken ? 'thin' : 'ink',
  })
  const along = (y: number, role: 'ink' | 'thin'): Item => ({
    item: 'line',
    points: [
      [left, y],
      [right, y],
    ],
    role,
  })
  const inner = upper + lower < 0.7 * depth ? [along(top + upper, 'thin'), along(bottom - lower, 'thin')] : []
  return [along(top, 'ink'), along(bottom, 'ink'), ...inner, end(left, of.leftBroken), end(right, of.rightBroken)]
}

/** A break line, as where a drawing goes on beyond what is shown. */
const breakLine = (x: number, top: number, bottom: number): readonly Point[] => {
  const middle = (top + bottom) / 2
  const size = Math.min(1, (bottom - top) / 4)
  return [
    [x, top - 1],
    [x, middle - size],
    [x - size, middle - size / 2],
    [x + size, middle + size / 2],
    [x, middle + size],
    [x, bottom + 1],
  ]
}

const rectangle = (left: number, right: number, top: number, bottom: number, fill: 'solid' | 'paper'): Item => ({
  item: 'area',
  points: [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ],
  fill,
})
