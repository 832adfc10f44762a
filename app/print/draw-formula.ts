/** Drawings of formulas put on the page: each glyph's outline stands once in the file and is called where it is wanted. */
import type { Drawing } from './formula.ts'
import { COLOUR } from './hand.ts'
import type { Pen } from './pen.ts'

/** Draws a formula from x on, standing on the baseline, its letters of `size` points. */
export function drawFormula(pen: Pen, drawing: Drawing, x: number, baseline: number, size: number): void {
  const { doc } = pen
  const scale = size / 1000
  doc.save().fillColor(COLOUR.ink).transform(scale, 0, 0, -scale, x, baseline)
  for (const mark of drawing.marks) {
    const { outline, clip } = mark
    if (typeof outline !== 'string') {
      const [left, low, width, height] = outline
      doc
        .rect(mark.x + mark.scaleX * left, mark.y + mark.scaleY * low, mark.scaleX * width, mark.scaleY * height)
        .fill()
      continue
    }
    doc.save()
    if (clip) doc.rect(...clip).clip()
    doc.transform(mark.scaleX, 0, 0, mark.scaleY, mark.x, mark.y)
    doc.addContent(`/${pen.glyph(outline)} Do`).restore()
  }
  doc.restore()
}

/** The glyphs of one document as forms, by outline. */
export function glyphForms(doc: PDFKit.PDFDocument): (outline: string) => string {
  const forms = new Map<string, { name: string; form: PDFKit.PDFKitReference }>()
  return (outline) => {
    let known = forms.get(outline)
    if (known === undefined) {
      const { content, box } = operators(outline)
      const form = doc.ref({ Type: 'XObject', Subtype: 'Form', BBox: box, Resources: {} })
      form.end(content)
      known = { name: `G${forms.size}`, form }
      forms.set(outline, known)
    }
    const objects = doc.page.xobjects as Record<string, PDFKit.PDFKitReference>
    objects[known.name] ??= known.form
    return known.name
  }
}

/** The typeface's outlines are moves, lines and third-degree curves with absolute coordinates. */
function operators(outline: string): { readonly content: string; readonly box: readonly number[] } {
  const content: string[] = []
  const [xs, ys]: [number[], number[]] = [[], []]
  for (const [, command = '', inner = ''] of outline.matchAll(/([A-Z])([^A-Z]*)/g)) {
    const values = (inner.match(/-?\d*\.?\d+/g) ?? []).map(Number)
    values.forEach((value, index) => (index % 2 === 0 ? xs : ys).push(value))
    const step = { M: 2, L: 2, C: 6, Z: 0 }[command]
    if (step === undefined) throw new Error(`unknown step ${command} in a glyph's outline`)
    if (step === 0) content.push('h')
    // A further subpath is closed by filling; what follows a move without a letter are lines.
    for (let index = 0; step > 0 && index < values.length; index += step) {
      const operator = command === 'M' && index > 0 ? 'L' : command
      content.push(`${values.slice(index, index + step).join(' ')} ${operator.toLowerCase()}`)
    }
  }
  return {
    content: `${content.join('\n')}\nf`,
    box: [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)],
  }
}
