/** Tables: rows on hairlines, the head again on every page, utilisations as rules against their limit. */
import { writeUtilisation } from '../../core/quantity/write.ts'
import type { Block, Cell, Column } from '../../core/sheet/types.ts'
import type { Slab } from './flow.ts'
import { COLOUR, STYLE, type Style } from './hand.ts'
import {
  artifact,
  hatch,
  openTag,
  rise,
  rule,
  spaced,
  widthOf,
  write,
  writeEnd,
  writeLines,
  type Pen,
  type Tag,
} from './pen.ts'
import { wrap } from './text.ts'

const GUTTER = 10
const PAD = 2.6
/** A table lower than this share of a page is not parted. */
const SHORT = 0.22

/** A table over the whole width of the page. A row higher than a third of a page is parted between its lines. */
export function tableSlabs(pen: Pen, { columns, rows, caption }: Extract<Block, { block: 'table' }>): readonly Slab[] {
  const { left, right, height } = pen.frame
  const places = placesOf(
    columns.map((column, index) => measured(column, rows, index)),
    left,
    right,
  )
  const most = Math.max(1, Math.floor(height / 3 / STYLE.cell.leading))
  const head = headOf(pen, places)
  const parts = rows.flatMap((row) => partsOfRow(pen, row, places, most))
  const short = parts.reduce((sum, part) => sum + part.height, 0) < height * SHORT
  let opened: Tag | undefined
  const table = (): Tag => (opened ??= openTag(pen, 'Table'))
  let row: Tag | undefined

  const captions = caption === undefined || caption === '' ? [] : [captionSlab(pen, caption, table)]
  const heading: Slab = {
    height: head.height,
    gap: captions.length > 0 ? 2 : 8,
    keep: parts.length > 0,
    draw: (_, top) => {
      artifact(pen, 'Layout', () => head.rule(top))
      const line = table().child('TR')
      places.forEach((place, index) => {
        const cell = line.child('TH', { scope: 'Column' })
        cell.draw(() => head.cell(place, index, top))
        cell.end()
      })
      line.end()
      if (parts.length === 0) table().end()
    },
  }
  const again = (_: Pen, top: number): void =>
    artifact(pen, 'Pagination', () => {
      head.rule(top)
      places.forEach((place, index) => head.cell(place, index, top))
    })
  const body = parts.map((part, index): Slab => {
    const last = index === parts.length - 1
    return {
      height: part.height,
      gap: 0,
      // A short table stays whole; of a longer one no row stands alone at the foot or the head of a page.
      keep: !last && (short || index === 0 || index === parts.length - 2),
      head: { height: head.height, draw: again },
      draw: (_, top) => {
        const foot = top + part.height
        const [colour, weight] = last ? [COLOUR.ink, 0.7] : [COLOUR.hair, 0.5]
        if (part.ends) artifact(pen, 'Layout', () => rule(pen, [left, foot], [right, foot], colour, weight))
        row ??= table().child('TR')
        part.draw(top, row)
        if (part.ends) {
          row.end()
          row = undefined
        }
        if (last) table().end()
      },
    }
  })
  return [...captions, heading, ...body]
}

/** A column of utilisations begins with its rules, so its head stands at the left whatever its figures do. */
const measured = (column: Column, rows: readonly (readonly Cell[])[], index: number): Column =>
  rows.some((row) => typeof row[index] === 'object') ? { ...column, align: 'left' } : column

interface Place {
  readonly column: Column
  readonly x: number
  readonly width: number
}

function placesOf(columns: readonly Column[], left: number, right: number): readonly Place[] {
  const whole = columns.reduce((sum, { width }) => sum + width, 0)
  const free = right - left - GUTTER * (columns.length - 1)
  let x = left
  return columns.map((column) => {
    const place = { column, x, width: (free * column.width) / whole }
    x += place.width + GUTTER
    return place
  })
}

function headOf(pen: Pen, places: readonly Place[]) {
  const { left, right } = pen.frame
  const lines = places.map(({ column, width }) => wrap(pen, column.head.toUpperCase(), STYLE.label, width))
  const tall = Math.max(...lines.map((each) => each.length), 1) * STYLE.label.leading
  return {
    height: tall + 4,
    rule: (top: number) => rule(pen, [left, top + tall + 4], [right, top + tall + 4], COLOUR.ink, 0.7),
    cell: (place: Place, index: number, top: number) => {
      const own = lines[index]!
      writeAligned(pen, own, STYLE.label, place, top + tall - own.length * STYLE.label.leading)
    },
  }
}

function captionSlab(pen: Pen, caption: string, table: () => Tag): Slab {
  const { left, body } = pen.frame
  const lines = wrap(pen, caption, STYLE.h3, body - left)
  return {
    height: lines.length * STYLE.h3.leading + 3,
    gap: 10,
    keep: true,
    draw: (_, top) => {
      const tag = table().child('Caption')
      tag.draw(() => writeLines(pen, lines, STYLE.h3, left, top))
      tag.end()
    },
  }
}

function writeAligned(
  pen: Pen,
  lines: readonly string[],
  style: Style,
  { column, x, width }: Place,
  top: number,
): void {
  spaced(lines).forEach((line, index) => {
    const baseline = top + index * style.leading + rise(style)
    if (column.align === 'left') write(pen, line, style, x, baseline)
    else writeEnd(pen, line, style, x + width, baseline)
  })
}

interface RowPart {
  readonly height: number
  /** Whether the row ends with it. */
  readonly ends: boolean
  readonly draw: (top: number, row: Tag) => void
}

interface Content {
  readonly height: number
  readonly lines: number
  /** Draws lines from one on up to another. */
  readonly draw: (top: number, from: number, to: number) => void
}

function partsOfRow(pen: Pen, row: readonly Cell[], places: readonly Place[], most: number): readonly RowPart[] {
  const { leading } = STYLE.cell
  const contents = places.map((place, index) => contentOf(pen, row[index] ?? '', place))
  const count = Math.max(1, ...contents.map(({ lines }) => lines))
  const tags: Tag[] = []
  const parts: RowPart[] = []
  for (let from = 0; from < count; from += most) {
    const to = Math.min(count, from + most)
    const [above, below] = [from === 0 ? PAD : 0, to === count ? PAD : 0]
    parts.push({
      height: (to - from) * leading + above + below,
      ends: to === count,
      draw: (top, line) => {
        contents.forEach((content, index) => {
          const tag = (tags[index] ??= line.child('TD'))
          tag.draw(() => content.draw(top + above, from, Math.min(to, content.lines)))
          if (to === count) tag.end()
        })
      },
    })
  }
  return parts
}

function contentOf(pen: Pen, cell: Cell, place: Place): Content {
  if (typeof cell !== 'string') return utilisationContent(pen, cell, place)
  const style = STYLE.cell
  const lines = wrap(pen, cell, style, place.width)
  return {
    height: lines.length * style.leading,
    lines: lines.length,
    draw: (top, from, to) => writeAligned(pen, lines.slice(from, to), style, place, top),
  }
}

const FIGURE_WIDTH = 28
/** The limit stands at this share of the rule's length: what goes beyond is seen to. */
const LIMIT_AT = 0.8

/** The rule measured against its limit, the figure, and the word behind them or below. */
function utilisationContent(pen: Pen, { utilisation, word }: Exclude<Cell, string>, place: Place): Content {
  const over = utilisation !== null && utilisation > 1
  const colour = over ? COLOUR.accent : COLOUR.ink
  const style = { ...(over ? STYLE.cellStrong : STYLE.cell), colour }
  const wide = widthOf(pen, word, style)
  // Alike in every row, so that they can be compared; a short word has room behind them.
  const bar = Math.min(70, Math.max(40, place.width - FIGURE_WIDTH - 36))
  const beside = utilisation !== null && word !== '' && place.width >= bar + FIGURE_WIDTH + 6 + wide
  const words = word === '' || beside ? [] : wrap(pen, word, style, place.width)
  const first = utilisation === null ? 0 : 1
  return {
    height: (words.length + first) * style.leading,
    lines: words.length + first,
    draw: (top, from, to) => {
      const lines = [...(utilisation === null ? [] : ['']), ...words].slice(from, to)
      writeLines(pen, lines, style, place.x, top)
      if (utilisation === null || from > 0) return
      drawBar(pen, utilisation, place.x, top + style.leading / 2, bar)
      const baseline = top + rise(style)
      writeEnd(pen, writeUtilisation(utilisation), style, place.x + bar + FIGURE_WIDTH, baseline)
      if (beside) write(pen, ` ${word}`, style, place.x + bar + FIGURE_WIDTH + 6 - widthOf(pen, ' ', style), baseline)
    },
  }
}

function drawBar(pen: Pen, utilisation: number, x: number, middle: number, width: number): void {
  const limit = x + width * LIMIT_AT
  const end = Math.min(x + width * LIMIT_AT * Math.max(utilisation, 0), x + width)
  const [top, thick] = [middle - 1.7, 3.4]
  rule(pen, [limit, middle - 3.6], [limit, middle + 3.6], COLOUR.grey, 0.5)
  if (end <= x) return
  const outline = (): void => {
    pen.doc.rect(x, top, end - x, thick)
  }
  if (utilisation <= 1) {
    pen.doc.save().fillColor(COLOUR.ink)
    outline()
    pen.doc.fill().restore()
    return
  }
  hatch(pen, [x, top, end, top + thick], outline, COLOUR.accent, 1, 2.4)
  pen.doc.save().lineWidth(0.5).strokeColor(COLOUR.accent)
  outline()
  pen.doc.stroke().restore()
}
