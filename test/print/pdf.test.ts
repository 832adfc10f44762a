/** The printed file: its structure, its text, that the same sheet gives the same bytes. */
import { describe, expect, test } from 'vitest'
import { NOT_KEPT } from '../../app/print/furniture.ts'
import { printSheet } from '../../app/print/print.ts'
import type { Sheet } from '../../core/sheet/types.ts'
import { entry, listOf, nameOf, readPdf, stringOf, type Pdf, type Value } from './objects.ts'
import { has, told } from './other-readers.ts'
import { pagesOf } from './reader.ts'
import { lines, manyWords, sampleSheet } from './sample.ts'

const sheet = sampleSheet('us')
const bytes = await printSheet(sheet, 'letter')
const pdf = readPdf(bytes)
const root = pdf.get(entry(pdf.trailer, 'Root'))
const pages = pagesOf(bytes)

describe('file', () => {
  test('has the paper asked for', async () => {
    expect(pages.length).toBeGreaterThan(2)
    expect(pages.every(({ width, height }) => width === 612 && height === 792)).toBe(true)
    const a4 = pagesOf(await printSheet(sheet, 'a4'))
    expect(a4.every(({ width, height }) => width === 595.28 && height === 841.89)).toBe(true)
  })

  test('says what it is', () => {
    const info = pdf.get(entry(pdf.trailer, 'Info'))
    const of = (key: string): string | undefined => stringOf(pdf.get(entry(info, key)))
    expect(of('Title')).toBe('1187-S-04, Tarn Hollow Foundry (invented), North bay, line B, girder B4–B5')
    expect(of('Author')).toBe('Α. Παπαδόπουλος')
    expect(of('Subject')).toContain('revision C')
    expect(of('CreationDate')).toBe('D:20250314000000Z')
    expect(of('Creator')).toBe('Longtravel 0.1.0')
    expect(stringOf(entry(root, 'Lang'))).toBe('en')
    expect(entry(entry(root, 'MarkInfo') && pdf.get(entry(root, 'MarkInfo')), 'Marked')).toBe(true)
    expect(entry(pdf.get(entry(root, 'ViewerPreferences')), 'DisplayDocTitle')).toBe(true)
  })

  test('keeps the signs of XML in its properties', async () => {
    const odd = { ...sheet, title: { ...sheet.title, project: 'Hook & Eye <Works>' } }
    const printed = readPdf(await printSheet(odd, 'a4'))
    expect(stringOf(printed.get(entry(printed.get(entry(printed.trailer, 'Info')), 'Title')))).toContain(
      'Hook & Eye <Works>',
    )
    const xml = Buffer.from(
      printed.stream(entry(printed.get(entry(printed.trailer, 'Root')), 'Metadata')),
      'latin1',
    ).toString()
    expect(xml).toContain('Hook &amp; Eye &lt;Works&gt;')
  })

  test('embeds all of its typefaces, as parts', () => {
    const fonts = objects(pdf).filter((object) => nameOf(entry(object, 'Type')) === 'FontDescriptor')
    expect(fonts.length).toBeGreaterThanOrEqual(2)
    for (const font of fonts) {
      expect(nameOf(entry(font, 'FontName'))).toMatch(/^[A-Z]{6}\+(IBMPlexSans|DejaVuSans)/)
      expect(entry(font, 'FontFile2')).toBeDefined()
    }
    const standard = objects(pdf).filter((object) => nameOf(entry(object, 'Subtype')) === 'Type1')
    expect(standard).toEqual([])
  })

  test('has an outline of the headings', () => {
    const titles = (item: Value | undefined): unknown[] => {
      const found: unknown[] = []
      for (let next = pdf.get(entry(item, 'First')); next !== undefined; next = pdf.get(entry(next, 'Next')))
        found.push([stringOf(entry(next, 'Title')), ...titles(next)])
      return found
    }
    expect(titles(pdf.get(entry(root, 'Outlines')))).toEqual([
      ['1 Summary of checks'],
      ['2 Entries'],
      ['6 Checks', ['6.3 Biaxial bending with side thrust', ['Strong axis'], ['Short unbraced length']]],
      ['8 What is not covered'],
    ])
  })

  test('is the same twice, without a date too', async () => {
    expect(Buffer.from(await printSheet(sheet, 'letter')).equals(Buffer.from(bytes))).toBe(true)
    const undated = { ...sheet, date: '', title: { ...sheet.title, date: '' } }
    const [one, two] = [await printSheet(undated, 'a4'), await printSheet(undated, 'a4')]
    expect(Buffer.from(one).equals(Buffer.from(two))).toBe(true)
  })
})

describe('tags', () => {
  const [document] = listOf(entry(pdf.get(entry(root, 'StructTreeRoot')), 'K')).map((kid) => pdf.get(kid))
  const kids = listOf(entry(document, 'K')).map((kid) => pdf.get(kid))
  const types = kids.map((kid) => nameOf(entry(kid, 'S')))

  test('name every block in reading order', () => {
    expect(nameOf(entry(document, 'S'))).toBe('Document')
    const named = types.filter((type) => type !== 'P' && type !== 'Formula')
    expect(named).toEqual(['H1', 'Table', 'H1', 'Table', 'H1', 'H2', 'Figure', 'Caption', 'H3', 'H3', 'H1'])
  })

  test('give figures and formulas their words', () => {
    const figure = kids[types.indexOf('Figure')]
    expect(stringOf(entry(figure, 'Alt'))).toContain('two wheels of 88.2 kip')
    const formulas = kids
      .filter((kid) => nameOf(entry(kid, 'S')) === 'Formula')
      .map((kid) => stringOf(entry(kid, 'Alt')))
    const typeset = lines('us').filter((line) => line.symbols + line.values !== '')
    expect(formulas).toEqual(expect.arrayContaining(typeset.map((line) => line.text)))
  })

  test('keep all rows of a formula on one page', () => {
    const contents = kids.filter((kid) => nameOf(entry(kid, 'S')) === 'Formula').map((kid) => listOf(entry(kid, 'K')))
    // A number is content of the element's own page; of another page it would be a reference.
    for (const content of contents)
      expect(content.length > 0 && content.every((kid) => typeof kid === 'number')).toBe(true)
  })

  test('give a table one head and a row each', () => {
    const rows = listOf(entry(kids[types.indexOf('Table')], 'K')).map((kid) => pdf.get(kid))
    expect(rows.map((row) => nameOf(entry(row, 'S')))).toEqual(['Caption', ...Array.from({ length: 15 }, () => 'TR')])
    const cells = rows.slice(1).map((row) => listOf(entry(row, 'K')).map((cell) => nameOf(entry(pdf.get(cell), 'S'))))
    expect(
      cells.every((row, index) => row.length === 5 && row.every((type) => type === (index === 0 ? 'TH' : 'TD'))),
    ).toBe(true)
  })

  test('hold everything that is not furniture', () => {
    for (const page of pages) for (const mark of page.marks) expect(mark.tagged !== mark.artifact).toBe(true)
  })
})

describe('pages', () => {
  const words = (page: (typeof pages)[number]): string => page.marks.map(({ text }) => text).join(' ')

  test('each have title block, number, fingerprint, caution and the word that it is not kept', () => {
    pages.forEach((page, index) => {
      const text = words(page)
      expect(text).toContain(`${index + 1} of ${pages.length}`)
      for (const part of [
        'Tarn Hollow Foundry',
        '1187-S-04',
        '9f3c 71a0 5be2 d418',
        'LRFD, US units',
        'local codes govern',
        NOT_KEPT,
      ])
        expect(text).toContain(part)
    })
  })

  test('of a kept sheet do not say so', async () => {
    for (const page of pagesOf(await printSheet({ ...sheet, kept: true }, 'a4')))
      expect(words(page)).not.toContain(NOT_KEPT)
  })

  test('carry the head of a table again, as furniture', async () => {
    const table = sheet.blocks.find((block) => block.block === 'table')!
    const rows = Array.from({ length: 90 }, (_, index) => [`check ${index}`, '', '', '', ''])
    const printed = pagesOf(await printSheet({ ...sheet, blocks: [{ ...table, rows }] }, 'a4'))
    expect(printed.length).toBeGreaterThan(1)
    printed.forEach((page, index) => {
      const heads = page.marks.filter(({ text }) => text === 'RESISTANCE')
      expect(heads.map(({ artifact }) => artifact)).toEqual([index > 0])
    })
    const shown = printed.flatMap(({ marks }) => marks).filter(({ text }) => /^check \d+$/.test(text))
    expect(shown.length).toBe(90)
  })

  test('take a note of 3,000 words over several of them, every word once and in order', async () => {
    const text = manyWords(3000)
    const note: Sheet = { ...sheet, blocks: [{ block: 'paragraph', text, tone: 'note' }] }
    const printed = pagesOf(await printSheet(note, 'letter'))
    expect(printed.length).toBeGreaterThan(2)
    const shown = printed.flatMap(({ marks }) => marks).filter(({ tagged, text: own }) => tagged && own !== '')
    expect(shown.map((mark) => mark.text).join(' ')).toBe(text)
  })

  test('keep a heading with what follows it', async () => {
    for (let count = 30; count < 52; count += 1) {
      const filler = { block: 'paragraph' as const, text: manyWords(12 * count), tone: 'plain' as const }
      const blocks: Sheet['blocks'] = [
        filler,
        { block: 'heading', level: 2, number: '9', text: 'Last' },
        { block: 'working', lines: lines('us').slice(0, 1) },
      ]
      const printed = pagesOf(await printSheet({ ...sheet, blocks }, 'letter'))
      const page = printed.find(({ marks }) => marks.some(({ text }) => text === 'Last'))!
      expect(page.marks.some(({ actual }) => actual === 'L_b = 20 ft')).toBe(true)
    }
  })
})

describe('other readers', () => {
  test.skipIf(!has('qpdf'))('qpdf finds nothing wrong', () => {
    expect(told('qpdf', bytes)).toContain('No syntax or stream encoding errors')
  })

  test.skipIf(!has('pdftotext'))('pdftotext finds every line of a working and every cell', () => {
    const text = told('pdftotext', bytes).replace(/\s+/g, ' ')
    for (const line of lines('us')) {
      const own = line.kind === 'note' || line.note === '' ? line.text : line.text.slice(0, -line.note.length).trim()
      expect(text).toContain(own.replace(/\s+/g, ' '))
    }
    for (const part of [
      '620 kip-ft',
      '62.4 kip',
      'default, common practice',
      'fails, 1.237',
      'holds, 0.98',
      'тормозной путь',
      '1.070',
      'resultant 176.4 kip',
    ])
      expect(text).toContain(part)
  })
})

/** Every object of the file that is not a stream's content. */
const objects = (file: Pdf): readonly (Value | undefined)[] =>
  Array.from({ length: file.count - 1 }, (_, index) => file.get({ ref: index + 1 }))
