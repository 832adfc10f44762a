/** Entries as lines of a form: a word, a value on its rule; a default dotted and grey, with where it comes from. */
import type { Block } from '../../core/sheet/types.ts'
import type { Slab } from './flow.ts'
import { COLOUR, STYLE } from './hand.ts'
import { artifact, openTag, rise, rule, widthOf, write, writeLines, type Pen, type Tag } from './pen.ts'
import { wrap } from './text.ts'

type Entry = Extract<Block, { block: 'entries' }>['rows'][number]

const LABEL_SHARE = 0.36
const VALUE_SHARE = 0.28
const GAP = 12
const PAD = 2.2

/** One slab an entry; an entry of very many lines is parted between them. */
export function entriesSlabs(pen: Pen, rows: readonly Entry[]): readonly Slab[] {
  const { left, right, height } = pen.frame
  const whole = right - left
  const [labelWidth, valueWidth] = [whole * LABEL_SHARE - GAP, whole * VALUE_SHARE]
  const valueX = left + whole * LABEL_SHARE
  const sourceX = valueX + valueWidth + GAP
  const most = Math.max(1, Math.floor(height / 3 / STYLE.cell.leading))
  let table: Tag | undefined
  return rows.flatMap((entry, index): Slab[] => {
    const style = entry.isDefault ? { ...STYLE.cell, colour: COLOUR.grey } : STYLE.cell
    const values = wrap(pen, entry.value, STYLE.cell, valueWidth)
    const columns = [
      { lines: wrap(pen, entry.label, STYLE.cell, labelWidth), style: STYLE.cell, x: left, type: 'TH', end: 0 },
      { lines: values, style, x: valueX, type: 'TD', end: valueX + valueWidth },
      {
        lines: wrap(pen, sourceOf(entry), STYLE.clause, right - sourceX),
        style: STYLE.clause,
        x: sourceX,
        type: 'TD',
        end: 0,
      },
    ]
    const count = Math.max(...columns.map(({ lines }) => lines.length))
    const starts = Array.from({ length: Math.ceil(count / most) }, (_, part) => part * most)
    let row: Tag | undefined
    let cells: Tag[] = []
    return starts.map((from, part): Slab => {
      const to = Math.min(count, from + most)
      const last = index === rows.length - 1 && to === count
      const tall = (to - from) * STYLE.cell.leading + 2 * PAD
      return {
        height: tall,
        gap: index === 0 && part === 0 ? 4 : 0,
        keep: !last && (index === 0 || index === rows.length - 2),
        draw: (_, top) => {
          const ends = values.length > from && values.length <= to
          const foot = top + PAD + (values.length - from) * STYLE.cell.leading + PAD - 1
          const dash = entry.isDefault ? [0.8, 1.8] : undefined
          if (ends)
            artifact(pen, 'Layout', () => {
              rule(pen, [valueX, foot], [valueX + valueWidth, foot], COLOUR.grey, 0.5, dash)
            })
          table ??= openTag(pen, 'Table')
          row ??= table.child('TR')
          const line = row
          cells = columns.map(({ lines, style: own, x, type, end }, column) => {
            const cell = cells[column] ?? line.child(type, type === 'TH' ? { scope: 'Row' } : {})
            const shown = lines.slice(from, to)
            cell.draw(() => {
              // A short value stands at the right of its rule like a figure; words of several lines from the left.
              if (end === 0 || lines.length > 1) writeLines(pen, shown, own, x, top + PAD)
              else if (shown[0] !== undefined)
                write(pen, shown[0], own, end - widthOf(pen, shown[0], own), top + PAD + rise(own))
            })
            if (to === count) cell.end()
            return cell
          })
          if (to === count) row.end()
          if (last) table.end()
        },
      }
    })
  })
}

const sourceOf = ({ isDefault, source = '' }: Entry): string =>
  isDefault ? ['default', source].filter((word) => word !== '').join(', ') : source
