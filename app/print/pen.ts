/** What blocks are measured and drawn with: words, rules, boxes, hatches, tags. Lengths in points, y downward. */
import { faceFile, type Faces } from './faces.ts'
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
    width += pen.doc.font(faceFile(run.file)).fontSize(style.size).widthOfString(run.text)
  return width
}

/** Words on one line, from x on, standing on the baseline. */
export function write(pen: Pen, text: string, style: Style, x: number, baseline: number): void {
  const { doc } = pen
  doc.fillColor(style.colour)
  let at = x
  for (const run of pen.faces.runs(text, style.face)) {
    doc.font(faceFile(run.file)).fontSize(style.size)
    const spacing = style.spacing ?? 0
    doc.text(run.text, at, baseline, {
      lineBreak: false,
      baseline: 'alphabetic',
      ...(spacing === 0 ? {} : { characterSpacing: spacing }),
    })
    at += doc.widthOfString(run.text) + spacing * Array.from(run.text).length
  }
}

/** Lines of one text, each but the last with the space that was broken at, so that their words do not run together. */
export const spaced = (lines: readonly string[]): readonly string[] =>
  lines.map((line, index) => (index < lines.length - 1 ? `${line} ` : line))

/** Words that end at x; a space behind them does not count. */
export const writeEnd = (pen: Pen, text: string, style: Style, x: number, baseline: number): void =>
  write(pen, text, style, x - widthOf(pen, text.trimEnd(), style), baseline)

/** Where the first baseline stands below the upper edge of a line, so that the letters stand in its middle. */
export const rise = (style: Style): number => style.leading / 2 + style.size * 0.35

/** Lines, one below another, from the upper edge `top` on. */
export function writeLines(pen: Pen, lines: readonly string[], style: Style, x: number, top: number): void {
  spaced(lines).forEach((line, index) => write(pen, line, style, x, top + index * style.leading + rise(style)))
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

/** A stretch of the page that is read, searched and copied as a text, whatever is drawn there. */
export interface ReadAs {
  readonly text: string
  readonly x: number
  readonly baseline: number
  readonly width: number
  readonly size: number
}

/**
 * Lays a glyph that leaves no ink over a place, as wide as the place, and says what it is read as. Readers take place and
 * direction of the words from the text's own state, so the mark begins and ends inside of the text.
 */
export function readAs(pen: Pen, { text, x, baseline, width, size }: ReadAs): void {
  const { doc } = pen
  doc.font(faceFile('regular')).fontSize(size)
  const { _font: font } = doc as unknown as { _font: EmbeddedFont }
  const fonts = doc.page.fonts as Record<string, PDFKit.PDFKitReference>
  fonts[font.id] ??= font.ref()
  const number = (value: number): string => `${Math.round(value * 1000) / 1000}`
  doc.save().transform(1, 0, 0, -1, 0, doc.page.height).addContent('BT')
  doc.addContent(`1 0 0 1 ${number(x)} ${number(doc.page.height - baseline)} Tm`)
  doc.addContent(`/${font.id} ${number(size)} Tf ${number((100 * width) / doc.widthOfString(' '))} Tz`)
  doc.markContent('Span', { actual: text })
  doc.addContent(`<${font.encode(' ')[0].join('')}> Tj`)
  doc.endMarkedContent().addContent('ET').restore()
}

/** What the library keeps to itself of a font. */
interface EmbeddedFont {
  readonly id: string
  ref(): PDFKit.PDFKitReference
  encode(text: string): readonly [codes: readonly string[], positions: unknown]
}
