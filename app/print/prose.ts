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

/** A paragraph, which may go on over pages; never one line of it alone at the foot or the head of one. */
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
  const short = lines.length * style.leading
  let tag: Tag | undefined
  return lines.map((line, index) => {
    const last = index === lines.length - 1
    // The clause stands beside the first lines; a shorter paragraph makes room for all of it.
    const height = last && beside ? Math.max(style.leading, beside.height - short + style.leading) : style.leading
    return {
      height,
      gap: index === 0 ? 5 : 0,
      // What stands beside the clause stays on its page.
      keep: !last && (index === 0 || index === lines.length - 2 || (index + 1) * style.leading < (beside?.height ?? 0)),
      draw: (_, top) => {
        if (tone === 'caution')
          artifact(pen, 'Layout', () =>
            rule(pen, [left + 1.5, top], [left + 1.5, top + style.leading], COLOUR.accent, 2),
          )
        tag ??= openTag(pen, 'P')
        const words = spaced(lines)[index]!
        if (line !== '') tag.draw(() => write(pen, words, style, left + indent, top + rise(style)))
        if (index === 0) beside?.draw(top, Math.max(beside.height, style.leading))
        if (last) tag.end()
      },
    }
  })
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
