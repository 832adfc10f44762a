/** What would be wrong on a page: something outside of the margins, words that stand on words or on formulas. */
import { frameOf, type Paper } from '../../app/print/hand.ts'
import type { Box, Mark, Page } from './reader.ts'

/** Half the weight of the heaviest rule, and a little for rounding. */
const EDGE = 1.2

export function outside({ marks }: Page, paper: Paper): readonly string[] {
  const { left, right, top, bottom } = frameOf(paper)
  return marks
    .filter(
      (mark) =>
        mark.left < left - EDGE || mark.right > right + EDGE || mark.top < top - EDGE || mark.bottom > bottom + EDGE,
    )
    .map(described)
}

/** Words by themselves and formulas row by row, each pair that shares more than a hair. */
export function overlapping({ marks }: Page): readonly string[] {
  const words = marks.filter(({ what, text }) => what === 'words' && text !== '')
  const rows = new Map<number, Mark[]>()
  for (const mark of marks.filter(({ what }) => what === 'glyph'))
    rows.set(mark.group, [...(rows.get(mark.group) ?? []), mark])
  const boxes: Mark[] = [...words, ...[...rows.values()].map(joined)]
  const found: string[] = []
  boxes.forEach((a, index) => {
    for (const b of boxes.slice(index + 1)) if (share(a, b)) found.push(`${described(a)} and ${described(b)}`)
  })
  return found
}

const share = (a: Box, b: Box): boolean =>
  Math.min(a.right, b.right) - Math.max(a.left, b.left) > 0.3 &&
  Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top) > 0.3

const joined = (marks: readonly Mark[]): Mark => ({
  ...marks[0]!,
  text: `a formula of ${marks.length} glyphs`,
  left: Math.min(...marks.map(({ left }) => left)),
  right: Math.max(...marks.map(({ right }) => right)),
  top: Math.min(...marks.map(({ top }) => top)),
  bottom: Math.max(...marks.map(({ bottom }) => bottom)),
})

const described = ({ what, text, left, top }: Mark): string =>
  `${what} "${text}" at ${left.toFixed(1)}, ${top.toFixed(1)}`

/** All of a file's faults, each with its page. */
export const faultsOf = (pages: readonly Page[], paper: Paper): readonly string[] =>
  pages.flatMap((page, index) =>
    [...outside(page, paper), ...overlapping(page)].map((fault) => `page ${index + 1}: ${fault}`),
  )
