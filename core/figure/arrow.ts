/** The head of an arrow, the same in every renderer. */
import type { Item, Point } from './types.ts'

const LENGTH = 1.9
const HALF = 0.75

/** Shaft and head: the shaft ends at the foot of the head, the head's tip is where the arrow points to. */
export const arrowParts = ({ from, to }: Extract<Item, { item: 'arrow' }>) => {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  const length = Math.hypot(dx, dy)
  if (!(length > 0)) throw new RangeError('an arrow of no length')
  const [ux, uy] = [dx / length, dy / length]
  const head = Math.min(LENGTH, length)
  const foot: Point = [to[0] - ux * head, to[1] - uy * head]
  const corner = (side: 1 | -1): Point => [foot[0] - side * uy * HALF, foot[1] + side * ux * HALF]
  return { shaft: [from, foot] as const, head: [to, corner(1), corner(-1)] as const }
}
