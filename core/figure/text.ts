/** How much room a text takes, without a font at hand: core draws nothing, but must know what would overlap. */
import type { Item } from './types.ts'

export type Text = Extract<Item, { item: 'text' }>

/** Size of every text of a figure, mm (8 pt). `at` is on its baseline. */
export const TEXT_SIZE = 2.8

/** Least distance between two texts that stand side by side or one above the other, mm. */
export const CLEAR = 0.6

/** An upright rectangle on paper, mm. */
export interface Box {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
}

/**
 * Width of a text on paper, mm, never less than in IBM Plex Sans with tabular figures: each sign counts as the widest of its
 * group, by the advance widths of that face.
 */
export const textWidth = (text: string): number => {
  let ems = 0
  for (const sign of text) ems += GROUPS.find(([signs]) => signs.includes(sign))?.[1] ?? OTHER
  return ems * TEXT_SIZE
}

const GROUPS: readonly (readonly [signs: string, ems: number])[] = [
  ["ijl.,' ", 0.28],
  ['ftrI()/-·²³⁴"', 0.42],
  ['abcdeghknopqsuvxyz0123456789−×+=', 0.6],
  ['ABCDEFGHJKLNOPQRSTUVXYZ', 0.71],
]
const OTHER = 1

/** From the baseline up to capitals and down to descenders, as parts of the size. */
const ASCENT = 0.78
const DESCENT = 0.22

/** How high a line of text stands, mm, and how much of it lies above the baseline. */
export const LINE = (ASCENT + DESCENT) * TEXT_SIZE
export const RISE = ASCENT * TEXT_SIZE

/** The rectangle about a text. Turned texts stand upright or level: other angles throw a RangeError. */
export const boxOf = ({ at: [x, y], text, anchor, turn = 0 }: Text): Box => {
  const width = textWidth(text)
  const before = anchor === 'start' ? 0 : anchor === 'end' ? width : width / 2
  const [up, down] = [ASCENT * TEXT_SIZE, DESCENT * TEXT_SIZE]
  switch (turn) {
    case 0:
      return { left: x - before, right: x - before + width, top: y - up, bottom: y + down }
    case -90:
      return { left: x - up, right: x + down, top: y + before - width, bottom: y + before }
    default:
      throw new RangeError(`a text turned by ${turn} degrees`)
  }
}

export const overlap = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom
