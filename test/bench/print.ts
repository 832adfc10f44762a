/** Speed of the printed sheet: a line with its formula, and pages against the same count of plain ones. */
import { once } from 'node:events'
import PDFDocument from 'pdfkit'
import { faceFile } from '../../app/print/faces.ts'
import { formulaRows } from '../../app/print/formula-rows.ts'
import { leaf, partsOf, type Element } from '../../app/print/mathml.ts'
import { printSheet } from '../../app/print/print.ts'
import type { Sheet } from '../../core/sheet/types.ts'
import { lines, manyWords, sampleSheet } from '../print/sample.ts'

export interface Measured {
  readonly name: string
  readonly value: number
  readonly unit: string
}

/** Prints a sheet of 30 pages and more, first as a fresh program does, then again, and times its parts. */
export async function printSpeed(): Promise<readonly Measured[]> {
  const sheet = longSheet()
  const before = process.memoryUsage().rss
  const first = await milliseconds(() => printSheet(sheet, 'letter'))
  const memory = (process.memoryUsage().rss - before) / 2 ** 20
  const again = await milliseconds(() => printSheet(sheet, 'letter'))
  const file = Buffer.from(await printSheet(sheet, 'letter')).toString('latin1')
  const pages = Number(/\/Type \/Pages\n\/Count (\d+)/.exec(file)?.[1])
  const plain = await milliseconds(() => plainPages(pages))
  return [
    { name: `a sheet of ${pages} pages, libraries and typefaces loaded on the way`, value: first, unit: 'ms' },
    { name: 'the same again, its formulas known', value: again, unit: 'ms' },
    { name: 'pages of a sheet', value: (pages * 1000) / again, unit: 'pages/s' },
    { name: 'as many plain pages of words, by the same library', value: (pages * 1000) / plain, unit: 'pages/s' },
    { name: 'memory taken while the sheet was printed', value: memory, unit: 'MiB' },
    { name: 'a line of a working set for the first time', value: lineTime(), unit: 'ms' },
  ]
}

function longSheet(): Sheet {
  const sheet = sampleSheet('us')
  return { ...sheet, blocks: Array.from({ length: 9 }, () => sheet.blocks).flat() }
}

/** Every line with figures that were not set before. */
function lineTime(): number {
  const formulas = lines('us').filter(({ symbols }) => symbols !== '')
  const parts = Array.from({ length: 8 }, (_, round) =>
    formulas.map(({ symbols, values }) =>
      [...partsOf(symbols), ...partsOf(values)].map((part) => changed(part, round)),
    ),
  ).flat()
  const start = performance.now()
  for (const each of parts) formulaRows(each, () => Number.POSITIVE_INFINITY)
  return (performance.now() - start) / parts.length
}

const changed = (part: Element, round: number): Element =>
  part.name === 'mn'
    ? leaf('mn', part.text.replace(/\d$/, `${round}1`))
    : { ...part, children: part.children.map((child) => changed(child, round)) }

async function plainPages(count: number): Promise<void> {
  const doc = new PDFDocument({ size: 'letter', font: faceFile('regular'), autoFirstPage: false })
  const words = manyWords(420)
  for (let page = 0; page < count; page += 1) doc.addPage().fontSize(9.2).text(words)
  doc.end()
  await once(doc.resume(), 'end')
}

async function milliseconds(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now()
  await work()
  return performance.now() - start
}
