/** A formula that is too wide for its column, set in several rows. */
import { typeset, type Drawing } from './formula.ts'
import { leaf, mathOf, row, type Element } from './mathml.ts'

/** One row of a formula as it is drawn. */
export interface FormulaRow {
  readonly parts: readonly Element[]
  readonly drawing: Drawing
  /** Where its first relation stands, so that the rows below can stand under it; undefined where it has none. */
  readonly relation: number | undefined
  /** Whether it begins with a relation. */
  readonly related: boolean
}

/** Width of the column for a row, in thousandths of an em: by whether it begins with a relation, and by its index. */
export type RowWidth = (related: boolean, index: number) => number

/**
 * Sets parts in rows no wider than they may be, or a little wider where that saves a fraction, broken before relations first, then before plus and minus, then at products;
 * a fraction, root or bracket that is wider than a row, or that would leave it mostly empty, is opened and broken inside.
 */
export function formulaRows(parts: readonly Element[], widthOf: RowWidth): readonly FormulaRow[] {
  const rows: FormulaRow[] = []
  let rest = parts
  while (rest.length > 0) {
    const width = widthOf(rankOf(rest[0]!) === 0, rows.length)
    const drawing = set(rest)
    if (drawing.width <= width) return [...rows, rowOf(rest, drawing)]
    const cut = cutOf(rest, drawing, width)
    const far = nextCut(rest, drawing, width)
    let end = cut ?? far
    if (cut === undefined || drawing.starts[cut]! < width * EMPTY) {
      if ((drawing.starts[far] ?? drawing.width) * SMALLEST <= width) end = far
      else {
        const opened = open(rest, drawing, width)
        if (opened) {
          rest = opened
          continue
        }
      }
    }
    const head = rest.slice(0, end)
    rows.push(rowOf(head, set(head)))
    rest = continued(rest.slice(end))
  }
  return rows
}

/** A row filled less than this is mostly empty. */
const EMPTY = 0.3
/** What would fit at this share of its size is scaled by the page rather than opened. */
const SMALLEST = 0.86

const set = (parts: readonly Element[]): Drawing => {
  const text = mathOf(parts)
  const known = memory.get(text)
  if (known) return known
  const drawing = typeset(text)
  if (memory.size >= REMEMBERED) memory.clear()
  memory.set(text, drawing)
  return drawing
}

/** Formulas set before; a sheet sets the same symbols for every place of a check. */
const memory = new Map<string, Drawing>()
const REMEMBERED = 600

const rowOf = (parts: readonly Element[], drawing: Drawing): FormulaRow => {
  const index = parts.findIndex((part) => rankOf(part) === 0)
  return { parts, drawing, relation: index < 0 ? undefined : drawing.starts[index], related: index === 0 }
}

/** Before which part to break: the last place that leaves the row within the width, the strongest kind of place first. */
function cutOf(parts: readonly Element[], drawing: Drawing, width: number): number | undefined {
  let best: number | undefined
  let bestRank = Number.POSITIVE_INFINITY
  for (let index = 1; index < parts.length; index += 1) {
    const end = drawing.starts[index]
    if (end === undefined || end > width) break
    const rank = rankOf(parts[index]!)
    // A weaker place is taken only where the stronger one would leave the row mostly empty.
    const start = best === undefined ? 0 : drawing.starts[best]!
    if (rank <= bestRank || (Number.isFinite(rank) && start < width * 0.4)) {
      if (!Number.isFinite(rank)) continue
      best = index
      bestRank = rank
    }
  }
  return best
}

/** The first place beyond the width; the end where there is none. */
function nextCut(parts: readonly Element[], drawing: Drawing, width: number): number {
  const next = parts.findIndex(
    (part, index) => index > 0 && drawing.starts[index]! > width && Number.isFinite(rankOf(part)),
  )
  return next < 0 ? parts.length : next
}

/** How good a place before this part is: relations, then sums, then products; infinite where none is. */
function rankOf(part: Element): number {
  if (part.name !== 'mo') return Number.POSITIVE_INFINITY
  if (/^(=|≤|≥|&lt;|&gt;)$/.test(part.text)) return 0
  if (/^[+\u2212]$/.test(part.text)) return 1
  return /^[×\u2062/]$/.test(part.text) ? 2 : Number.POSITIVE_INFINITY
}

/**
 * What goes on in the next row: its first sign still stands between two parts, and a product that shows no sign gets one, so
 * that it is read as one.
 */
function continued(parts: readonly Element[]): readonly Element[] {
  const [first, ...others] = parts
  if (first === undefined) return parts
  const sign = first.text === '\u2062' ? '×' : first.text
  return [{ ...leaf('mo', sign), attributes: ' form="infix"' }, ...others]
}

/** The first part that can be opened at or before the column's edge, opened: its contents written in the row. */
function open(parts: readonly Element[], drawing: Drawing, width: number): readonly Element[] | undefined {
  const crossing = parts.findIndex((_, index) => (drawing.starts[index + 1] ?? drawing.width) > width)
  for (let index = crossing; index >= 0; index -= 1) {
    const opened = contents(parts[index]!)
    if (opened === undefined) continue
    // A fraction that is multiplied further is bracketed, so that the factor is not read as part of what is below.
    const factor = parts[index]!.name === 'mfrac' && /^[×\u2062]$/.test(parts[index + 1]?.text ?? '')
    const inner = factor ? [leaf('mo', '('), ...opened, leaf('mo', ')')] : opened
    return [...parts.slice(0, index), ...inner, ...parts.slice(index + 1)]
  }
  return undefined
}

/** A part written along the line instead: a fraction with a slash, a root as a power. */
function contents({ name, children }: Element): readonly Element[] | undefined {
  const [first, second] = children
  switch (name) {
    case 'mrow':
      // A figure and its unit stay together.
      return children.some((child) => child.name === 'mspace') ? undefined : children
    case 'mfrac':
      return [...grouped([first!]), leaf('mo', '/'), ...grouped([second!])]
    case 'msqrt':
      return raised(children, row([leaf('mn', '1'), leaf('mo', '/'), leaf('mn', '2')]))
    case 'mroot':
      return raised([first!], row([leaf('mn', '1'), leaf('mo', '/'), second!]))
    case 'msup':
      return isLeaf(first!) ? undefined : raised([first!], second!)
    default:
      return undefined
  }
}

/** In brackets of the row itself, which may be broken between them; a single sign or figure needs none. */
function grouped(parts: readonly Element[]): readonly Element[] {
  const inner = parts.length === 1 && parts[0]!.name === 'mrow' ? parts[0]!.children : parts
  if (inner.length === 1 && isLeaf(inner[0]!)) return inner
  return inBrackets(inner) ? inner : [leaf('mo', '('), ...inner, leaf('mo', ')')]
}

function raised(parts: readonly Element[], exponent: Element): readonly Element[] {
  const inner = grouped(parts)
  return [...inner.slice(0, -1), { name: 'msup', attributes: '', children: [inner.at(-1)!, exponent], text: '' }]
}

const inBrackets = (parts: readonly Element[]): boolean => /^[([{]$/.test(parts[0]?.text ?? '') && closes(parts)

/** Whether the last sign closes the first one. */
function closes(parts: readonly Element[]): boolean {
  let depth = 0
  return parts.every((part, index) => {
    if (part.name === 'mo' && /^[([{]$/.test(part.text)) depth += 1
    if (part.name === 'mo' && /^[)\]}]$/.test(part.text)) depth -= 1
    return index === parts.length - 1 ? depth === 0 : depth > 0
  })
}

const isLeaf = (part: Element): boolean => /^(mi|mn|mo|mtext|msub)$/.test(part.name)
