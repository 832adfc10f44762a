/** Formulas in rows, words in lines, slabs on pages. */
import fc from 'fast-check'
import PDFDocument from 'pdfkit'
import { describe, expect, test } from 'vitest'
import { facesOf, faceFile } from '../../app/print/faces.ts'
import { flow, type Slab } from '../../app/print/flow.ts'
import { formulaRows } from '../../app/print/formula-rows.ts'
import { typeset } from '../../app/print/formula.ts'
import { frameOf, STYLE } from '../../app/print/hand.ts'
import { mathOf, partsOf, type Element } from '../../app/print/mathml.ts'
import { widthOf, type Pen } from '../../app/print/pen.ts'
import { wrap, wrapAtMost } from '../../app/print/text.ts'
import { lines } from './sample.ts'

const doc = new PDFDocument({ font: faceFile('regular') })
const pen: Pen = { doc, faces: facesOf(doc), frame: frameOf('a4'), root: doc.struct('Document'), glyph: () => '' }

const leaves = (parts: readonly Element[]): readonly string[] =>
  parts.flatMap(({ text, children }) => (children.length === 0 ? [text] : leaves(children)))

describe('formulas', () => {
  test('know where each part of a row begins', () => {
    for (const { symbols, values } of lines('us'))
      for (const mathml of [symbols, values].filter((text) => text !== '')) {
        const parts = partsOf(mathml)
        const { starts, width } = typeset(mathml)
        expect(starts.length).toBe(parts.length)
        expect(starts.every((start, index) => start >= (starts[index - 1] ?? 0) && start <= width)).toBe(true)
        expect(typeset(mathOf(parts))).toEqual(typeset(mathml))
      }
  })

  test('fit their column, hardly scaled, at any width that holds their widest figure', () => {
    const formulas = lines('us')
      .flatMap(({ symbols, values }) => [partsOf(symbols), partsOf(values)])
      .filter((parts) => parts.length > 0)
    fc.assert(
      fc.property(fc.constantFrom(...formulas), fc.integer({ min: 12000, max: 40000 }), (parts, width) => {
        const rows = formulaRows(parts, () => width)
        for (const { drawing } of rows) expect(drawing.width * 0.86).toBeLessThanOrEqual(width)
        // No figure is lost, none stands twice, and brackets close as often as they open.
        const [before, after] = [leaves(parts), rows.flatMap((row) => leaves(row.parts))]
        const figures = (texts: readonly string[]): string =>
          texts.filter((text) => /^[\d.,]{3,}$/.test(text)).join(' ')
        expect(figures(after)).toBe(figures(before))
        const count = (sign: RegExp): number => after.filter((text) => sign.test(text)).length
        expect(count(/^[([{]$/)).toBe(count(/^[)\]}]$/))
      }),
      { numRuns: 40 },
    )
  })

  test('break before a relation rather than inside of a sum', () => {
    const parts = partsOf(
      '<math><mrow><mi>a</mi><mo>=</mo><mi>b</mi><mo>+</mo><mi>c</mi><mo>=</mo><mi>d</mi><mo>+</mo><mi>e</mi></mrow></math>',
    )
    const rows = formulaRows(parts, () => 6000)
    expect(rows.map(({ related }) => related)).toEqual([false, true])
    expect(rows.map(({ drawing }) => drawing.starts.length)).toEqual([5, 4])
  })

  test('draw the stretched brackets of a tall fraction from their parts', () => {
    const tall = (depth: number): string => (depth === 0 ? '<mn>1</mn>' : `<mfrac>${tall(depth - 1)}<mn>2</mn></mfrac>`)
    const deep = `<math><mrow><mrow><mo>(</mo><mtable>${'<mtr><mtd><mn>1</mn></mtd></mtr>'.repeat(9)}</mtable><mo>)</mo></mrow></mrow></math>`
    const { marks, ascent, depth } = typeset(deep)
    expect(marks.some(({ clip }) => clip !== undefined)).toBe(true)
    for (const { clip } of marks)
      if (clip) {
        expect(clip[1]).toBeGreaterThanOrEqual(-depth - 1)
        expect(clip[1] + clip[3]).toBeLessThanOrEqual(ascent + 1)
      }
    expect(typeset(`<math><mrow>${tall(3)}</mrow></math>`).marks.length).toBeGreaterThan(6)
  })

  test('are refused where they are not well formed', () => {
    expect(() => partsOf('<math><mrow><mi>a</mrow></math>')).toThrow('not well formed')
    expect(() => partsOf('<math><mrow>')).toThrow('left open')
    expect(partsOf('')).toEqual([])
  })
})

describe('words', () => {
  test('keep all their letters, in lines that fit', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.string({
            unit: fc.constantFrom('a', 'b', 'W', '/', '-', '.', 'Ω', 'ж', '\u0301'),
            minLength: 1,
            maxLength: 60,
          }),
          {
            maxLength: 30,
          },
        ),
        fc.integer({ min: 20, max: 400 }),
        (words, width) => {
          const text = words.join(' ').normalize('NFC')
          const wrapped = wrap(pen, text, STYLE.plain, width)
          expect(wrapped.join('').replaceAll(' ', '')).toBe(text.replaceAll(' ', ''))
          for (const line of wrapped) expect(widthOf(pen, line, STYLE.plain)).toBeLessThanOrEqual(width + 0.01)
        },
      ),
      { numRuns: 60 },
    )
  })

  test('keep a figure and its unit on one line', () => {
    for (let width = 60; width < 200; width += 7)
      for (const line of wrap(
        pen,
        'spans of 30 ft, 28 ft and 12 kip-ft at 25 %, to 26\' 7 13/16" and on',
        STYLE.plain,
        width,
      ))
        expect(line).not.toMatch(/^(ft|kip-ft|%|7|13)/)
  })

  test('end with an ellipsis where there are more lines than may be', () => {
    const most = wrapAtMost(pen, 'one two three four five six seven', STYLE.plain, 40, 2)
    expect(most.length).toBe(2)
    expect(most[1]).toMatch(/…$/)
  })
})

describe('flow', () => {
  const slab = (height: number, keep = false, head?: number): Slab => ({
    ...{ height, gap: 10, keep, draw: () => undefined },
    ...(head === undefined ? {} : { head: { height: head, draw: () => undefined } }),
  })
  const indices = (slabs: readonly Slab[]): number[][] => flow(slabs, 100).map((page) => page.map(({ index }) => index))

  test('drops the space at the head of a page', () => {
    expect(flow([slab(40), slab(40), slab(40)], 100).map((page) => page.map(({ top }) => top))).toEqual([[0, 50], [0]])
  })

  test('takes what must keep together to the next page, and parts what no page holds', () => {
    expect(indices([slab(40), slab(10, true), slab(40)])).toEqual([[0], [1, 2]])
    expect(indices([slab(40, true), slab(40, true), slab(40)])).toEqual([[0, 1], [2]])
  })

  test('makes room for the head that stands again', () => {
    const pages = flow([slab(90), slab(30, false, 20), slab(30, false, 20), slab(30, false, 20)], 100)
    expect(pages[1]!.map(({ top, head }) => [top, head])).toEqual([
      [20, true],
      [60, false],
    ])
    expect(pages[2]!.map(({ top, head }) => [top, head])).toEqual([[20, true]])
  })

  test('throws at a piece that no page holds', () => {
    expect(() => flow([slab(101)], 100)).toThrow('does not fit')
  })
})
