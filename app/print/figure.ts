/** Drawings on paper: lines, areas and words by their roles, one millimetre to a millimetre unless they are too wide. */
import { arrowParts } from '../../core/figure/arrow.ts'
import { TEXT_SIZE } from '../../core/figure/text.ts'
import type { Fill, Item, Point, Role } from '../../core/figure/types.ts'
import type { Block } from '../../core/sheet/types.ts'
import type { Slab } from './flow.ts'
import { COLOUR, POINTS_PER_MM, STYLE } from './hand.ts'
import { artifact, hatch, openTag, widthOf, write, writeLines, type Pen } from './pen.ts'
import { tidy, wrap } from './text.ts'

interface Stroke {
  readonly weight: number
  readonly colour: string
  readonly dash?: readonly number[]
}

const STROKE: Readonly<Record<Role, Stroke>> = {
  ink: { weight: 1, colour: COLOUR.ink },
  thin: { weight: 0.6, colour: COLOUR.ink },
  hair: { weight: 0.4, colour: COLOUR.hair },
  dimension: { weight: 0.45, colour: COLOUR.grey },
  centre: { weight: 0.5, colour: COLOUR.grey, dash: [7, 2, 1.5, 2] },
  accent: { weight: 0.9, colour: COLOUR.accent, dash: [4, 2.5] },
  envelope: { weight: 0.6, colour: COLOUR.grey },
}

/** Words of these roles stand in the colour of the role; all others in ink. */
const WORD_COLOUR: Partial<Record<Role, string>> = { accent: COLOUR.accent, hair: COLOUR.grey, envelope: COLOUR.grey }

/** The tallest drawing that still leaves room for its heading and caption, as a share of the page. */
const TALLEST = 0.62

/** A figure with its caption below, on one page. */
export function figureSlab(pen: Pen, { figure, caption }: Extract<Block, { block: 'figure' }>): Slab {
  const { left, right, height } = pen.frame
  const scale = Math.min(POINTS_PER_MM, (right - left) / figure.width, (height * TALLEST) / figure.height)
  const tall = figure.height * scale
  const wide = figure.width * scale
  const lines = caption === '' ? [] : wrap(pen, caption, STYLE.caption, right - left)
  return {
    height: tall + (lines.length > 0 ? 5 + lines.length * STYLE.caption.leading : 0) + 4,
    gap: 10,
    keep: false,
    draw: (_, top) => {
      const tag = openTag(pen, 'Figure', { alt: figure.alt, bbox: [left, top, left + wide, top + tall] })
      tag.draw(() => {
        for (const item of figure.items) drawItem(pen, item, left, top, scale)
      })
      tag.end()
      if (lines.length === 0) return
      const words = openTag(pen, 'Caption')
      words.draw(() => writeLines(pen, lines, STYLE.caption, left, top + tall + 5))
      words.end()
    },
  }
}

/** Place for a seal and signature. */
export function sealSlab(pen: Pen, text: string): Slab {
  const { left, body } = pen.frame
  const [width, height] = [Math.min(240, body - left), 104]
  const pad = 8
  const lines = wrap(pen, text, STYLE.note, width - 2 * pad)
  const tall = Math.max(height, lines.length * STYLE.note.leading + 2 * pad + 60)
  return {
    height: tall,
    gap: 16,
    keep: false,
    draw: (_, top) => {
      artifact(pen, 'Layout', () => {
        pen.doc.save().lineWidth(0.7).strokeColor(COLOUR.ink).rect(left, top, width, tall).stroke()
        pen.doc.moveTo(left + pad, top + tall - 14).lineTo(left + width - pad, top + tall - 14)
        pen.doc.lineWidth(0.5).strokeColor(COLOUR.grey).stroke().restore()
      })
      const tag = openTag(pen, 'P')
      tag.draw(() => writeLines(pen, lines, STYLE.note, left + pad, top + pad))
      tag.end()
    },
  }
}

function drawItem(pen: Pen, item: Item, left: number, top: number, scale: number): void {
  const { doc } = pen
  const at = ([x, y]: Point): [number, number] => [left + x * scale, top + y * scale]
  switch (item.item) {
    case 'line':
      strokeBy(pen, item.role, () => trace(doc, item.points.map(at)))
      return
    case 'area': {
      const points = item.points.map(at)
      const outline = (): void => {
        trace(doc, points)
        doc.closePath()
      }
      fillBy(pen, item.fill, extentOf(points), outline)
      if (item.role) strokeBy(pen, item.role, outline)
      return
    }
    case 'circle': {
      const [x, y] = at(item.centre)
      const radius = item.radius * scale
      const outline = (): void => {
        doc.circle(x, y, radius)
      }
      if (item.fill) fillBy(pen, item.fill, [x - radius, y - radius, x + radius, y + radius], outline)
      strokeBy(pen, item.role, outline)
      return
    }
    case 'arrow': {
      const { shaft, head } = arrowParts(item)
      strokeBy(pen, item.role, () => trace(doc, shaft.map(at)))
      doc.save().fillColor(STROKE[item.role].colour)
      trace(doc, head.map(at))
      doc.closePath().fill().restore()
      return
    }
    case 'text':
      drawWords(pen, item, at(item.at), scale)
  }
}

function trace(doc: PDFKit.PDFDocument, points: readonly (readonly [number, number])[]): void {
  points.forEach(([x, y], index) => (index === 0 ? doc.moveTo(x, y) : doc.lineTo(x, y)))
}

function strokeBy(pen: Pen, role: Role, outline: () => void): void {
  const { weight, colour, dash } = STROKE[role]
  const { doc } = pen
  doc.save().lineWidth(weight).strokeColor(colour).lineJoin('round')
  // The types know one length only, the library a list.
  if (dash) doc.dash(dash as unknown as number, {})
  outline()
  doc.stroke().restore()
}

function fillBy(pen: Pen, fill: Fill, extent: readonly [number, number, number, number], outline: () => void): void {
  if (fill === 'hatch') hatch(pen, extent, outline, COLOUR.ink, 0.4, 3.4)
  else if (fill === 'accentHatch') hatch(pen, extent, outline, COLOUR.accent, 0.6, 3)
  else {
    pen.doc.save().fillColor({ shade: COLOUR.shade, solid: COLOUR.ink, paper: COLOUR.paper }[fill])
    outline()
    pen.doc.fill().restore()
  }
}

function extentOf(points: readonly (readonly [number, number])[]): readonly [number, number, number, number] {
  const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)]
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)]
}

/** Words stand on their point with their baseline; a turned text turns round it. */
function drawWords(pen: Pen, item: Extract<Item, { item: 'text' }>, [x, y]: [number, number], scale: number): void {
  const style = { ...STYLE.plain, size: TEXT_SIZE * scale, colour: WORD_COLOUR[item.role] ?? COLOUR.ink }
  const text = tidy(item.text).replaceAll('\n', ' ')
  const shift = { start: 0, middle: 0.5, end: 1 }[item.anchor] * widthOf(pen, text, style)
  if (item.turn === undefined || item.turn === 0) {
    write(pen, text, style, x - shift, y)
    return
  }
  pen.doc.save().rotate(item.turn, { origin: [x, y] })
  write(pen, text, style, x - shift, y)
  pen.doc.restore()
}
