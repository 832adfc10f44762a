/** A working on paper: formula, values and result on one line where they fit, its clause in the column at the right. */
import type { Line } from '../../core/formula/types.ts'
import { drawFormula } from './draw-formula.ts'
import { keptOn, type Slab } from './flow.ts'
import { formulaRows, type FormulaRow } from './formula-rows.ts'
import { COLOUR, FORMULA_SIZE, STYLE, type Style } from './hand.ts'
import { leaf, partsOf, type Element } from './mathml.ts'
import { box, openTag, readAs, rise, widthOf, writeLines, type Pen, type Tag } from './pen.ts'
import { clauseBeside } from './prose.ts'
import { wrap } from './text.ts'

/** What a check comes to, in its box. */
export interface Verdict {
  readonly text: string
  readonly holds: boolean
}

/** The lines of a working; a verdict that follows stands behind the last one where there is room, else below. `gap` is the space above the first. */
export const workingSlabs = (pen: Pen, lines: readonly Line[], gap: number, verdict?: Verdict): readonly Slab[] =>
  lines.flatMap((line, index) => {
    const slabs = lineSlabs(pen, line, index === 0 ? gap : LINE_GAP, index === lines.length - 1 ? verdict : undefined)
    // Neither its first line nor the one that it comes to stands alone on a page.
    return index === 0 || index === lines.length - 2 ? keptOn(slabs, index < lines.length - 1) : slabs
  })

/** A verdict by itself. */
export function verdictSlab(pen: Pen, verdict: Verdict, indent = 0): Slab {
  const x = pen.frame.left + indent
  const { height, draw } = verdictBox(pen, verdict, pen.frame.body - x)
  return {
    height,
    gap: 7,
    keep: false,
    draw: (_, top) => {
      const tag = openTag(pen, 'P')
      tag.draw(() => draw(x, top))
      tag.end()
    },
  }
}

const INDENT = 10
/** Rows that go on stand under the first relation, unless it is as far out as this share of the column. */
const FAR_OUT = 0.35
const ROW_GAP = 7
const LINE_GAP = 8

function lineSlabs(pen: Pen, line: Line, gap: number, verdict: Verdict | undefined): readonly Slab[] {
  const room = pen.frame.body - pen.frame.left - INDENT
  const rows = rowsOf(line, room)
  const note = noteStyle(line)
  const beside = line.clause === '' ? undefined : clauseBeside(pen, line.clause)
  const pieces: Piece[] = rows.map((row) => formulaPiece(pen, row))
  const end = pieces.at(-1)
  let free = end ? room - end.right : room
  const words = line.note === '' ? undefined : notePiece(pen, line.note, note, end ? free - 14 : room, room)
  if (words) {
    if (end && words.beside) {
      pieces[pieces.length - 1] = sideBySide(end, words.piece, 14)
      free -= words.piece.right + 14
    } else {
      pieces.push(words.piece)
      free = room - words.piece.right
    }
  }
  let below: Slab | undefined
  if (verdict) {
    const boxed = verdictBox(pen, verdict, room)
    const last = pieces.at(-1)
    if (last && boxed.width + 16 <= free) pieces[pieces.length - 1] = sideBySide(last, verdictPiece(boxed), 16)
    else below = verdictSlab(pen, verdict, INDENT)
  }
  return [...stacked(pen, line, pieces, gap, beside, below !== undefined), ...(below ? [below] : [])]
}

/** A part of a line in its column: extent round a baseline, and how it is drawn from x on. */
interface Piece {
  readonly ascent: number
  readonly depth: number
  /** Its right edge, measured from the line's left. */
  readonly right: number
  /** The right edge of its formula. */
  readonly inked: number
  readonly draw: (x: number, baseline: number) => void
  readonly kind: 'formula' | 'words'
}

/**
 * A line as one slab, so that it is never parted; only one that fills most of a page is a slab a row. `more` says that what
 * follows must stay with it.
 */
function stacked(
  pen: Pen,
  line: Line,
  pieces: readonly Piece[],
  gap: number,
  beside: ReturnType<typeof clauseBeside> | undefined,
  more: boolean,
): readonly Slab[] {
  const x = pen.frame.left + INDENT
  const isFormula = pieces.some(({ kind }) => kind === 'formula')
  let tag: Tag | undefined
  const slab = (from: number, to: number): Slab => {
    const own = pieces.slice(from, to)
    const tall = own.reduce((sum, { ascent, depth }) => sum + ascent + depth, 0) + ROW_GAP * (own.length - 1)
    const height = from === 0 ? Math.max(tall, beside?.height ?? 0) : tall
    const last = to === pieces.length
    return {
      height,
      gap: from === 0 ? gap : ROW_GAP,
      keep: !last || more,
      draw: (_, top) => {
        tag ??= openTag(pen, isFormula ? 'Formula' : 'P', isFormula ? { alt: line.text } : {})
        tag.draw(() => {
          let at = top + (own.length === 1 ? (height - tall) / 2 : 0)
          own.forEach((piece, index) => {
            const baseline = at + piece.ascent
            // All of the line is read where its first row stands.
            if (from + index === 0 && isFormula)
              readAs(pen, { text: formulaText(line), x, baseline, width: piece.inked, size: FORMULA_SIZE })
            piece.draw(x, baseline)
            at += piece.ascent + piece.depth + ROW_GAP
          })
        })
        // The clause stands beside the first row, or beside all of them where it is taller.
        const first = own[0]!.ascent + own[0]!.depth
        if (from === 0) beside?.draw(top, Math.max(own.length === 1 ? height : first, beside.height))
        if (last) tag.end()
      },
    }
  }
  const whole = slab(0, pieces.length)
  if (pieces.length === 1 || whole.height < pen.frame.height / 2) return [whole]
  return pieces.map((_, index) => slab(index, index + 1))
}

/** The line's plain text without the note, which is drawn as words. */
const formulaText = ({ text, note }: Line): string =>
  note !== '' && text.endsWith(note) ? text.slice(0, -note.length).trim() : text

const noteStyle = (line: Line): Style => {
  if (line.kind === 'note') return STYLE.plain
  return line.kind === 'compare' && line.note !== '' ? { ...STYLE.cellStrong, colour: COLOUR.accent } : STYLE.note
}

/** Whether the values go on from the symbols' end. */
const goesOn = (values: readonly Element[]): boolean => values[0]?.name === 'mo' && values[0].text === '='

interface Row extends FormulaRow {
  /** Where it begins, in points from the line's left. */
  readonly x: number
}

/** A formula in as few rows as its column allows: symbols and values on one, or the values below the symbols. */
function rowsOf(line: Line, room: number): readonly Row[] {
  const [symbols, values] = [partsOf(line.symbols), partsOf(line.values)]
  if (symbols.length + values.length === 0) return []
  const width = (room * 1000) / FORMULA_SIZE
  const between = symbols.length > 0 && values.length > 0 && !goesOn(values) ? [COLON, GAP] : []
  const [whole] = formulaRows([...symbols, ...between, ...values], () => Number.POSITIVE_INFINITY)
  if (whole!.drawing.width <= width) return [{ ...whole!, x: 0 }]
  const relation = whole!.relation ?? 0
  const indent = symbols.length > 0 && relation < width * FAR_OUT ? relation : 1500
  const later = (related: boolean): number => width - indent - (related ? 0 : BEHIND)
  const rows = [
    ...formulaRows(symbols, (related, index) => (index === 0 ? width : later(related))),
    ...formulaRows(values, (related, index) => (symbols.length === 0 && index === 0 ? width : later(related))),
  ]
  return rows.map((row, index) => {
    const [begins = 0] = row.drawing.starts
    const x = index === 0 ? 0 : indent + (row.related ? 0 : BEHIND) - begins
    return { ...row, x: (x * FORMULA_SIZE) / 1000 }
  })
}

const COLON = leaf('mo', ':')
const GAP: Element = { ...leaf('mspace', ''), attributes: ' width="0.5em"' }
/** What goes on without a relation stands this far behind the relation above it. */
const BEHIND = 1100

function formulaPiece(pen: Pen, { drawing, x }: Row): Piece {
  // What has no place to break is scaled down rather than drawn beyond the column: a single sign wider than a page.
  const room = pen.frame.body - pen.frame.left - INDENT - x
  const size = Math.min(FORMULA_SIZE, (room * 1000) / drawing.width)
  const scale = size / 1000
  return {
    ascent: Math.max(drawing.ascent * scale, FORMULA_SIZE * 0.75),
    depth: Math.max(drawing.depth * scale, FORMULA_SIZE * 0.25),
    right: x + drawing.width * scale,
    inked: x + drawing.width * scale,
    draw: (left, baseline) => drawFormula(pen, drawing, left + x, baseline, size),
    kind: 'formula',
  }
}

/** A note behind a formula where it fits in `free`, else below it in `room`. */
function notePiece(
  pen: Pen,
  note: string,
  style: Style,
  free: number,
  room: number,
): { readonly beside: boolean; readonly piece: Piece } {
  const beside = widthOf(pen, note, style) <= free
  const lines = beside ? [note] : wrap(pen, note, style, room)
  const first = rise(style)
  return {
    beside,
    piece: {
      ascent: first,
      depth: lines.length * style.leading - first,
      right: Math.max(...lines.map((line) => widthOf(pen, line, style))),
      inked: 0,
      draw: (x, baseline) => writeLines(pen, lines, style, x, baseline - first),
      kind: 'words',
    },
  }
}

const sideBySide = (left: Piece, right: Piece, between: number): Piece => ({
  ascent: Math.max(left.ascent, right.ascent),
  depth: Math.max(left.depth, right.depth),
  right: left.right + between + right.right,
  inked: left.inked,
  draw: (x, baseline) => {
    left.draw(x, baseline)
    right.draw(x + left.right + between, baseline)
  },
  kind: left.kind,
})

interface Boxed {
  readonly width: number
  readonly height: number
  readonly draw: (x: number, top: number) => void
}

const PAD_X = 6
const PAD_Y = 2.5

/** The verdict's box; where the check fails it is heavy and in the accent. */
function verdictBox(pen: Pen, { text, holds }: Verdict, room: number): Boxed {
  const style = { ...STYLE.strong, colour: holds ? COLOUR.ink : COLOUR.accent }
  const lines = wrap(pen, text, style, room - 2 * PAD_X)
  const width = Math.max(...lines.map((line) => widthOf(pen, line, style))) + 2 * PAD_X
  const height = lines.length * style.leading + 2 * PAD_Y
  return {
    width,
    height,
    draw: (x, top) => {
      box(pen, x, top, width, height, style.colour, holds ? 0.8 : 1.6)
      writeLines(pen, lines, style, x + PAD_X, top + PAD_Y)
    },
  }
}

/** A verdict of one line, on the baseline of the formula before it. */
function verdictPiece({ width, height, draw }: Boxed): Piece {
  const ascent = PAD_Y + rise(STYLE.strong)
  return {
    ascent,
    depth: height - ascent,
    right: width,
    inked: 0,
    draw: (x, baseline) => draw(x, baseline - ascent),
    kind: 'words',
  }
}
