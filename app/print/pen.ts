/** What blocks are measured and drawn with: words, rules, boxes, hatches, tags. Lengths in points, y downward. */
import type { Faces } from './faces.ts'
import type { Frame, Style } from './hand.ts'

export interface Pen {
  readonly doc: PDFKit.PDFDocument
  readonly faces: Faces
  readonly frame: Frame
  /** The document's element in the tree of tags. */
  readonly root: PDFKit.PDFStructureElement
  /** Name of the glyph with this outline, drawn once a document. Coordinates in thousandths of an em. */
  glyph(outline: string): string
}

/** Width of words on one line. */
export function widthOf(pen: Pen, text: string, style: Style): number {
  let width = (style.spacing ?? 0) * Array.from(text).length
  for (const run of pen.faces.runs(text, style.face))
    width += pen.doc.font(run.file).fontSize(style.size).widthOfString(run.text)
  return width
}

/** Words on one line, from x on, standing on the baseline. */
export function write(pen: Pen, text: string, style: Style, x: number, baseline: number): void {
  const { doc } = pen
  doc.fillColor(style.colour)
  let at = x
  for (const run of pen.faces.runs(text, style.face)) {
    doc.font(run.file).fontSize(style.size)
    const spacing = style.spacing ?? 0
    doc.text(run.text, at, baseline, {
      lineBreak: false,
      baseline: 'alphabetic',
      ...(spacing === 0 ? {} : { characterSpacing: spacing }),
    })
    at += doc.widthOfString(run.text) + spacing * Array.from(run.text).length
  }
}

/** Words that end at x. */
export const writeEnd = (pen: Pen, text: string, style: Style, x: number, baseline: number): void =>
  write(pen, text, style, x - widthOf(pen, text, style), baseline)

/** Where the first baseline stands below the upper edge of a line, so that the letters stand in its middle. */
export const rise = (style: Style): number => style.leading / 2 + style.size * 0.35

/** Lines, one below another, from the upper edge `top` on. */
export function writeLines(pen: Pen, lines: readonly string[], style: Style, x: number, top: number): void {
  lines.forEach((line, index) => write(pen, line, style, x, top + index * style.leading + rise(style)))
}

/** A straight rule. */
export function rule(
  pen: Pen,
  from: readonly [number, number],
  to: readonly [number, number],
  colour: string,
  weight: number,
  dash?: readonly number[],
): void {
  const { doc } = pen
  doc.save().lineWidth(weight).strokeColor(colour)
  if (dash) doc.dash(dash as unknown as number, {})
  doc
    .moveTo(...from)
    .lineTo(...to)
    .stroke()
    .restore()
}

/** A box: its outline. */
export function box(
  pen: Pen,
  x: number,
  y: number,
  width: number,
  height: number,
  colour: string,
  weight: number,
): void {
  pen.doc.save().lineWidth(weight).strokeColor(colour).rect(x, y, width, height).stroke().restore()
}

/** Lines at 45 degrees inside the outline that `outline` traces, from corner to corner of the box round it. */
export function hatch(
  pen: Pen,
  [left, top, right, bottom]: readonly [number, number, number, number],
  outline: () => void,
  colour: string,
  weight: number,
  step: number,
): void {
  const { doc } = pen
  doc.save()
  outline()
  doc.clip().lineWidth(weight).strokeColor(colour)
  const height = bottom - top
  for (let x = left; x < right + height; x += step) {
    // Cut at the box, so that nothing is traced outside of it.
    const [from, to] = [Math.min(x, right), Math.max(x - height, left)]
    doc.moveTo(from, top + (x - from)).lineTo(to, top + (x - to))
  }
  doc.stroke().restore()
}

/** A tag in the tree; what is drawn in `draw` belongs to it. It may be drawn in on several pages, until it is ended. */
export interface Tag {
  draw(draw: () => void): void
  child(type: string, options?: TagOptions): Tag
  end(): void
}

export interface TagOptions {
  readonly alt?: string
  readonly scope?: 'Row' | 'Column'
  readonly bbox?: readonly [number, number, number, number]
  readonly title?: string
}

/** Opens a tag below the document. */
export const openTag = (pen: Pen, type: string, options: TagOptions = {}): Tag => tagUnder(pen, pen.root, type, options)

function tagUnder(pen: Pen, parent: PDFKit.PDFStructureElement, type: string, options: TagOptions): Tag {
  // The types know neither bounding box nor scope, which the library does.
  const element = pen.doc.struct(type, options)
  parent.add(element)
  return {
    draw: (draw) => {
      element.add(draw)
    },
    child: (childType, childOptions = {}) => tagUnder(pen, element, childType, childOptions),
    end: () => element.end(),
  }
}

/** Draws what belongs to no tag: furniture of the page. */
export function artifact(pen: Pen, type: 'Pagination' | 'Layout', draw: () => void): void {
  pen.doc.markContent('Artifact', { type })
  draw()
  pen.doc.endMarkedContent()
}

/** Draws what stands for `text` where it is read, searched or copied. */
export function standingFor(pen: Pen, text: string, draw: () => void): void {
  pen.doc.markContent('Span', { actual: text })
  draw()
  pen.doc.endMarkedContent()
}
