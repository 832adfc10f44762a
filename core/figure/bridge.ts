/** The cranes in an elevation: wheels on the rail and over them the end trucks, from bumper to bumper. */
import type { DrawnReview } from '../review/values.ts'
import { EDGE } from './layout.ts'
import type { Scale, StandingWheel } from './standing.ts'
import type { Item } from './types.ts'

/** Height of the block that stands for the end trucks, mm: not to scale. */
export const BLOCK = 3.2

/** Of the wheels, mm: as large as their spacing lets them, not to scale. */
export const wheelRadius = (wheels: readonly StandingWheel[], { perMetre }: Scale): number => {
  const gaps = wheels.slice(1).map(({ station }, i) => (station - wheels[i]!.station) * perMetre)
  return Math.min(2.5, Math.max(0.6, 0.45 * Math.min(Infinity, ...gaps)))
}

/** Distance from the rail's head to the foot of the blocks, mm. */
export const blockAbove = (radius: number): number => radius * 1.7

/** Blocks and wheels over a rail whose head is at height `head`; wheels outside the view are not drawn. */
export const bridges = (
  review: DrawnReview,
  wheels: readonly StandingWheel[],
  scale: Scale,
  head: number,
  width: number,
): readonly Item[] => {
  const radius = wheelRadius(wheels, scale)
  const foot = head - blockAbove(radius)
  const cranes = [...new Set(wheels.map(({ crane }) => crane))]
  const blocks = cranes.flatMap((crane): readonly Item[] => {
    const own = wheels.filter((of) => of.crane === crane)
    const [first, last] = [own[0]!, own.at(-1)!]
    const [before, after] = review.job.cranes[crane]!.bumperOverhang
    // Listed from its own last wheel to its first where it stands turned.
    const turned = first.wheel > last.wheel
    const left = scale.across(first.station) - (turned ? after : before) * scale.perMetre
    const right = scale.across(last.station) + (turned ? before : after) * scale.perMetre
    const slope = Math.min(1.2, (right - left) / 8)
    const clip = (x: number): number => Math.min(Math.max(x, EDGE), width - EDGE)
    if (clip(right) - clip(left) < 1e-6) return []
    return [
      {
        item: 'area',
        points: [
          [clip(left), foot],
          [clip(left + slope), foot - BLOCK],
          [clip(right - slope), foot - BLOCK],
          [clip(right), foot],
        ],
        fill: 'shade',
        role: 'ink',
      },
    ]
  })
  const circles = wheels.flatMap((wheel): readonly Item[] => {
    const x = scale.across(wheel.station)
    if (!inView(wheel, scale)) return []
    return [
      { item: 'circle', centre: [x, head - radius], radius, fill: 'paper', role: wheel.on ? 'ink' : 'thin' },
      {
        item: 'circle',
        centre: [x, head - radius],
        radius: radius / 5,
        fill: 'solid',
        role: wheel.on ? 'ink' : 'thin',
      },
    ]
  })
  return [...blocks, ...circles]
}

export const inView = ({ station }: StandingWheel, { view: { from, to } }: Scale): boolean => {
  const near = 1e-9 * (to - from)
  return station >= from - near && station <= to + near
}
