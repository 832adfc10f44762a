/** Nothing stands outside the margins, and no words stand on other words or formulas, found in the file itself. */
import { describe, expect, test } from 'vitest'
import type { Paper } from '../../app/print/hand.ts'
import { printSheet } from '../../app/print/print.ts'
import type { Sheet } from '../../core/sheet/types.ts'
import { faultsOf, outside, overlapping } from './faults.ts'
import { pagesOf, type Mark, type Page } from './reader.ts'
import { lines, manyWords, sampleSheet } from './sample.ts'

const long = 'Drahtseilbahnoberbauinstandsetzungsgesellschaft/Nordwestdeutsche-Kranbahn '.repeat(6).trim()

async function expectClean(sheet: Sheet, paper: Paper): Promise<readonly Page[]> {
  const pages = pagesOf(await printSheet(sheet, paper))
  expect(faultsOf(pages, paper)).toEqual([])
  return pages
}

describe.each(['a4', 'letter'] as const)('on %s', (paper) => {
  test.each(['us', 'si'] as const)('the sample sheet in %s units', async (system) => {
    await expectClean(sampleSheet(system), paper)
  })

  test('very long names, a long note, many checks, a row higher than a page', async () => {
    const sheet = sampleSheet('us')
    const table = sheet.blocks.find((block) => block.block === 'table')!
    const odd: Sheet = {
      ...sheet,
      title: {
        ...sheet.title,
        project: long,
        subject: 'W'.repeat(300),
        preparedBy: long,
        checkedBy: long,
        number: 'N'.repeat(60),
      },
      caution: `${sheet.caution}. `.repeat(6),
      basis: long,
      blocks: [
        { block: 'heading', level: 1, number: '12.11.10', text: long },
        {
          ...table,
          rows: [
            ...Array.from({ length: 3 }, () => table.rows).flat(),
            [long, manyWords(900), '1', '2', { utilisation: 3.2, word: long }],
          ],
        },
        { block: 'entries', rows: [{ label: long, value: manyWords(700), isDefault: true, source: long }] },
        { block: 'paragraph', text: manyWords(3000), clause: long, tone: 'plain' },
        { block: 'paragraph', text: 'short', clause: long, tone: 'caution' },
        { block: 'working', lines: lines('us').map((line) => ({ ...line, clause: long, note: long })) },
        { block: 'verdict', text: long, holds: false },
        { block: 'seal', text: long },
      ],
    }
    await expectClean(odd, paper)
  })

  test('a figure larger than the page, and one that is narrow', async () => {
    const sheet = sampleSheet('us')
    const figure = sheet.blocks.find((block) => block.block === 'figure')!
    const tall = { ...figure, figure: { ...figure.figure, width: 170, height: 600 } }
    const narrow = { ...figure, figure: { ...figure.figure, width: 20, height: 60, items: [] } }
    await expectClean({ ...sheet, blocks: [sheet.blocks[0]!, tall, narrow] }, paper)
  })
})

test('a sheet without blocks is one page', async () => {
  expect((await expectClean({ ...sampleSheet('us'), blocks: [] }, 'a4')).length).toBe(1)
})

describe('the finder', () => {
  test('finds words that stand on others and words outside', () => {
    const mark = {
      what: 'words',
      text: 'a',
      artifact: false,
      tagged: true,
      actual: undefined,
      group: 0,
      size: 9,
    } as const
    const at = (left: number, top: number): Mark => ({ ...mark, left, top, right: left + 20, bottom: top + 9 })
    expect(overlapping({ width: 612, height: 792, marks: [at(100, 100), at(110, 104)] }).length).toBe(1)
    expect(overlapping({ width: 612, height: 792, marks: [at(100, 100), at(100, 110)] })).toEqual([])
    expect(outside({ width: 612, height: 792, marks: [at(570, 100)] }, 'letter').length).toBe(1)
  })
})
