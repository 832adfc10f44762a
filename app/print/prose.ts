/** Headings, paragraphs and the clause column beside them. */
import type { Slab } from './flow.ts'
import { COLOUR, STYLE, type Style } from './hand.ts'
import { artifact, openTag, rule, spaced, widthOf, write, writeLines, rise, type Pen, type Tag } from './pen.ts'
import { wrap } from './text.ts'

/** A heading, with its number and its entry in the outline. */
export function headingSlab(
  pen: Pen,
  { level, number, text }: { readonly level: 1 | 2 | 3; readonly number: string; readonly text: string },
  outline: (level: 1 | 2 | 3, title: string, top: number) => void,
  afterHeading: boolean,
): Slab {
  const style = STYLE[`h${level}`]
  const indent = number === '' ? 0 : widthOf(pen, `${number}  `, style)
  const { left, body } = pen.frame
  const lines = wrap(pen, text, style, body - left - indent)
  const below = [5, 3, 2][level - 1]!
  return {
    height: lines.length * style.leading + below,
    gap: afterHeading ? 7 : [26, 20, 13][level - 1]!,
    keep: true,
    draw: (_, top) => {
      outline(level, `${number} ${text}`.trim(), top)
      const tag = openTag(pen, `H${level}`)
      tag.draw(() => {
        if (number !== '') write(pen, `${number} `, style, left, top + rise(style))
        writeLines(pen, lines, style, left + indent, top)
      })
      tag.end()
    },
  }
}

/** A paragraph; a long one may go on over pages, never with one line alone at the foot or the head of one. */
export function paragraphSlabs(
  pen: Pen,
  {
    text,
    clause,
    tone,
  }: { readonly text: string; readonly clause?: string; readonly tone: 'plain' | 'note' | 'caution' },
): readonly Slab[] {
  const style: Style = tone === 'note' ? STYLE.note : STYLE.plain
  const indent = tone === 'caution' ? 11 : 0
  const { left, body } = pen.frame
  const lines = wrap(pen, text, style, body - left - indent)
  const beside = clause === undefined || clause === '' ? undefined : clauseBeside(pen, clause)
  let tag: Tag | undefined
  return parted(lines.length, beside ? Math.ceil(beside.height / style.leading) : 0).map(([from, to]): Slab => {
    const tall = (to - from) * style.leading
    const height = from === 0 ? Math.max(tall, beside?.height ?? 0) : tall
    return {
      height,
      gap: from === 0 ? 5 : 0,
      keep: false,
      draw: (_, top) => {
        if (tone === 'caution')
          artifact(pen, 'Layout', () => {
            rule(pen, [left + 1.5, top], [left + 1.5, top + tall], COLOUR.accent, 2)
          })
        tag ??= openTag(pen, 'P')
        tag.draw(() => writeLines(pen, spaced(lines).slice(from, to), style, left + indent, top))
        if (from === 0) beside?.draw(top, beside.height)
        if (to === lines.length) tag.end()
      },
    }
  })
}

const WHOLE = 6

/** Lines into runs that stay together: a short paragraph whole; of a longer one those beside its clause and the last two. */
function parted(count: number, beside: number): readonly (readonly [from: number, to: number])[] {
  const first = Math.max(2, beside)
  if (count <= Math.max(WHOLE, first + 2)) return [[0, count]]
  const single = Array.from({ length: count - first - 2 }, (_, index) => [first + index, first + index + 1] as const)
  return [[0, first], ...single, [count - 2, count]]
}

export interface Beside {
  readonly height: number
  /** Draws it from `top` on; its rule is `span` long. */
  draw(top: number, span: number): void
}

/** A citation in the clause column. */
export function clauseBeside(pen: Pen, clause: string): Beside {
  const style = STYLE.clause
  const { clauseRule, clause: x, right } = pen.frame
  const lines = wrap(pen, clause, style, right - x)
  const height = lines.length * style.leading + 2
  return {
    height,
    draw: (top, span) => {
      artifact(pen, 'Layout', () => rule(pen, [clauseRule, top], [clauseRule, top + span], COLOUR.hair, 0.6))
      const tag = openTag(pen, 'P')
      tag.draw(() => writeLines(pen, lines, style, x, top + (span - lines.length * style.leading) / 2))
      tag.end()
    },
  }
}
