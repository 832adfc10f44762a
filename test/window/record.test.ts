/** Revisions kept and reopened, calc sheets handed over, job files in and out. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { pagesOf } from '../print/reader.ts'
import { changed, sampleText } from './expected.ts'
import {
  button,
  bytesOf,
  enter,
  entryAt,
  expectComputed,
  ledgerOf,
  notice,
  openFile,
  savedJob,
  windowTests,
} from './window.ts'

const { inWindow } = windowTests()

const dialog = (page: Page) => page.getByRole('dialog')

/** The words on the pages of the sheet that is handed over, and its name. */
const issued = async (page: Page): Promise<{ readonly name: string; readonly words: readonly string[] }> => {
  await button(page, 'Issue calc sheet').click()
  const [download] = await Promise.all([
    page.waitForEvent('download', { timeout: 60_000 }),
    button(dialog(page), 'Issue').click(),
  ])
  const bytes = await bytesOf(download)
  expect(bytes.subarray(0, 5).toString('latin1')).toBe('%PDF-')
  await dialog(page).waitFor({ state: 'detached' })
  const words = pagesOf(bytes).map(({ marks }) => marks.map(({ text }) => text).join(' '))
  expect(words.length).toBeGreaterThan(5)
  return { name: download.suggestedFilename(), words }
}

inWindow('a revision is kept, issued with its mark, listed, and reopened after a change', async ({ page }) => {
  const [before, text] = [await ledgerOf(page), await savedJob(page)]

  await button(page, 'Keep revision').click()
  await dialog(page).getByLabel('Purpose').fill('For approval')
  await dialog(page).getByLabel('Author').fill('R. Ortega')
  await dialog(page).getByLabel('Checker').fill('M. Lindqvist')
  await dialog(page).getByLabel('Date').fill('2026-03-31')
  await button(dialog(page), 'Keep').click()
  await notice(page).getByText('Kept as revision A.').waitFor()

  const kept = await issued(page)
  expect(kept.name).toMatch(/-A\.pdf$/)
  for (const words of kept.words) {
    expect(words).toContain('BKW-204\u00a0/\u00a0A')
    expect(words).not.toContain('not kept as a revision')
  }
  expect(kept.words[0]).toContain('R. Ortega')

  await enter(page, 'girder.section.shape', 'W36X135')
  const lighter = await ledgerOf(page)
  expect(lighter).not.toEqual(before)
  const draft = await issued(page)
  expect(draft.name).toMatch(/[^A]\.pdf$/)
  for (const words of draft.words) expect(words).toContain('not kept as a revision')

  await button(page, 'Revisions').click()
  const row = page.getByRole('row', { name: /For approval/ })
  expect(await row.getByRole('cell').allInnerTexts()).toEqual(
    expect.arrayContaining(['2026-03-31', 'For approval', 'R. Ortega', 'M. Lindqvist']),
  )
  await button(page, 'reopen revision A').click()
  expect(await ledgerOf(page)).toEqual(before)
  expect(await savedJob(page)).toBe(text)

  // What was replaced comes back.
  await notice(page).getByText('handed over').waitFor()
})

const STOP_AT_ONCE = `new Promise((done) => {
  const look = new MutationObserver(() => {
    const shown = document.querySelector('dialog progress, dialog [role=progressbar]')
    const stop = [...document.querySelectorAll('dialog button')].find(({ textContent }) => textContent.trim() === 'Stop')
    if (shown === null || stop === undefined) return
    look.disconnect()
    stop.click()
    done(true)
  })
  look.observe(document.body, { subtree: true, childList: true })
})`

inWindow('the making of a sheet shows how far it is, and can be stopped', async ({ page }) => {
  await button(page, 'Issue calc sheet').click()
  let downloads = 0
  page.on('download', () => downloads++)
  // A sheet is made within a second: the page itself stops it, the moment its progress is there to be seen.
  const stopped = page.evaluate<boolean>(STOP_AT_ONCE)
  await button(dialog(page), 'Issue').click()
  expect(await stopped).toBe(true)
  await dialog(page).getByText('Stopped. No sheet was made.').waitFor()
  expect(downloads).toBe(0)
  await button(dialog(page), 'Leave it').click()
  await dialog(page).waitFor({ state: 'detached' })
})

inWindow('a job file is saved and opened, and what was replaced can be taken back', async ({ page }) => {
  const text = await savedJob(page)
  expect(JSON.parse(text)).toEqual(JSON.parse(sampleText()))
  const before = await ledgerOf(page)
  const other = changed(text, 'girder', { addedDeadLoad: '400 lb/ft' })
  await openFile(page, 'heavier.json', other)
  await notice(page).getByText('heavier.json is in the data sheet.').waitFor()
  expect(await entryAt(page, 'girder.addedDeadLoad').inputValue()).toBe('400 lb/ft')
  expect(await ledgerOf(page)).not.toEqual(before)
  await button(notice(page), 'take it back').click()
  expect(await ledgerOf(page)).toEqual(before)
  expect(await savedJob(page)).toBe(text)
})

inWindow('a bad job file says why, and the work is kept', async ({ page }) => {
  await enter(page, 'project.title', 'Kept while bad files come')
  const text = await savedJob(page)
  const deep = `${'{"a":'.repeat(200)}1${'}'.repeat(200)}`
  for (const [content, why] of [
    ['not JSON at all', 'This is no job file'],
    ['[1, 2]', 'holds no object'],
    ['{"format":"something else","version":1}', 'its format is not'],
    ['{"format":"longtravel-job","version":99}', 'written by a newer program'],
    [text.replace('"units"', '"units": "si", "units"'), 'given twice'],
    [deep, 'This is no job file'],
    ['', 'This is no job file'],
    [Buffer.from([0xff, 0xfe, 0x00, 0xd8]), 'is no text'],
    [Buffer.alloc(4_000_001, ' '), 'right would be a job file of at most'],
  ] as const) {
    await openFile(page, 'bad.json', content)
    await notice(page).getByText(why).waitFor()
    await button(notice(page), /^close/).click()
  }
  await expectComputed(page)
  expect(await savedJob(page)).toBe(text)
})
