/** The sample jobs as they are printed: on both papers and in both unit systems. */
import { readFileSync, readdirSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { printSheet } from '../../app/print/print.ts'
import { checkText } from '../../app/command/check.ts'
import { sheetOf } from '../../core/sheet/sheet.ts'
import type { Sheet } from '../../core/sheet/types.ts'
import { faultsOf } from './faults.ts'
import { has, told } from './other-readers.ts'
import { pagesOf, type Page } from './reader.ts'

const folder = new URL('../../resources/jobs/', import.meta.url)

describe.each(readdirSync(folder))('%s', (file) => {
  const outcome = checkText(readFileSync(new URL(file, folder), 'utf8'))
  if (outcome.exit === 2) throw new Error(outcome.messages.join('\n'))

  test.each([
    ['a4', 'us'],
    ['a4', 'si'],
    ['letter', 'us'],
    ['letter', 'si'],
  ] as const)('on %s in %s units: nothing outside, nothing on another, every word there', async (paper, units) => {
    const sheet = sheetOf(outcome.review, units)
    const pages = pagesOf(await printSheet(sheet, paper))
    expect(faultsOf(pages, paper)).toEqual([])
    const shown = squeezed(contentOf(pages))
    expect(textsOf(sheet).filter((text) => !shown.includes(squeezed(text)))).toEqual([])
  })

  test.skipIf(!has('pdftotext'))('another reader finds every value of its workings', async () => {
    const sheet = sheetOf(outcome.review, 'us')
    const text = squeezed(told('pdftotext', await printSheet(sheet, 'a4')))
    const lines = sheet.blocks.flatMap((block) => (block.block === 'working' ? block.lines : []))
    const formulas = lines.filter(({ symbols, values }) => symbols + values !== '').map(formulaText)
    expect(formulas.length).toBeGreaterThan(50)
    expect(formulas.filter((formula) => !text.includes(squeezed(formula)))).toEqual([])
  })
})

/** Words in the order in which they were drawn, what is read instead of outlines among them; furniture left out. */
const contentOf = (pages: readonly Page[]): string =>
  pages
    .flatMap(({ marks }) => marks)
    .filter(({ what, tagged }) => what === 'words' && tagged)
    .map(({ text, actual }) => actual ?? text)
    .join(' ')

const squeezed = (text: string): string => text.normalize('NFC').replace(/\s+/g, '')

const formulaText = ({ text, note }: { readonly text: string; readonly note: string }): string =>
  note !== '' && text.endsWith(note) ? text.slice(0, -note.length).trim() : text

/** Every text that a sheet asks to be printed. */
const textsOf = (sheet: Sheet): readonly string[] =>
  sheet.blocks.flatMap((block) => {
    switch (block.block) {
      case 'heading':
        return [`${block.number} ${block.text}`]
      case 'paragraph':
        return [block.text, block.clause ?? '']
      case 'table':
        return [...block.rows.flat().map((cell) => (typeof cell === 'string' ? cell : cell.word)), block.caption ?? '']
      case 'entries':
        return block.rows.flatMap(({ label, value, source = '' }) => [label, value, source])
      case 'working':
        return block.lines.flatMap((line) => [formulaText(line), line.note, line.clause])
      case 'figure':
        return [block.caption, ...block.figure.items.map((item) => (item.item === 'text' ? item.text : ''))]
      case 'verdict':
      case 'seal':
        return [block.text]
    }
  })
