/** Where texts go so that none covers another: the same input gives the same places. */
import { CLEAR, boxOf, overlap, type Box, type Text } from './text.ts'

/**
 * Centres for things of the given sizes along one line, in the wanted order, as near to the wanted centres as they go (least sum of
 * squares) with nothing overlapping and all between `from` and `to`. Undefined where they do not all fit.
 */
export const spread = (
  wanted: readonly number[],
  sizes: readonly number[],
  from: number,
  to: number,
): readonly number[] | undefined => {
  const total = sizes.reduce((sum, size) => sum + size, 0)
  if (total > to - from) return undefined
  // Take away what lies before each thing: what is left must only not fall, and blocks that would fall share their mean.
  let used = 0
  const before = sizes.map((size) => (used += size) - size / 2)
  const blocks: { mean: number; count: number }[] = []
  for (const [i, centre] of wanted.entries()) {
    let block = { mean: centre - before[i]!, count: 1 }
    for (let last = blocks.at(-1); last !== undefined && last.mean > block.mean; last = blocks.at(-1)) {
      blocks.pop()
      const count = last.count + block.count
      block = { mean: (last.mean * last.count + block.mean * block.count) / count, count }
    }
    blocks.push(block)
  }
  const shifts = blocks.flatMap(({ mean, count }) =>
    new Array<number>(count).fill(Math.min(Math.max(mean, from), to - total)),
  )
  return shifts.map((shift, i) => shift + before[i]!)
}

/** The first of the places that is free and inside the frame's width. */
export const firstFree = (places: readonly Text[], taken: readonly Box[], width: number): Text | undefined =>
  places.find((place) => {
    const box = boxOf(place)
    const wide = { ...box, left: box.left - CLEAR, right: box.right + CLEAR }
    return box.left >= 0 && box.right <= width && !taken.some((other) => overlap(wide, other))
  })

/** A text moved sideways as little as needed to lie within the frame's width. */
export const within = (text: Text, width: number): Text => {
  const { left, right } = boxOf(text)
  const shift = left < EDGE ? EDGE - left : right > width - EDGE ? width - EDGE - right : 0
  return { ...text, at: [text.at[0] + shift, text.at[1]] }
}

/** What is kept free along the frame, mm. */
export const EDGE = 0.8
