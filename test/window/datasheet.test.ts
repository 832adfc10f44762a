/** The data sheet: what is typed is kept, read in the units shown, judged at its line, and the ledger follows. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { button, enter, entryAt, expectComputed, ledgerOf, savedJob, windowTests } from './window.ts'

const { inWindow } = windowTests()

const CAPACITY = 'cranes[0].ratedCapacity'
const SPAN = 'cranes[0].bridgeSpan'

const valueAt = (page: Page, path: string): Promise<string> => entryAt(page, path).inputValue()
const messageAt = (page: Page, path: string) =>
  entryAt(page, path).locator('xpath=ancestor::div[contains(@class,"line")][1]').locator('.message')

inWindow('a bare number takes the unit shown', async ({ page }) => {
  const before = await ledgerOf(page)
  await enter(page, CAPACITY, '120')
  expect(await valueAt(page, CAPACITY)).toBe('120 kip')
  expect(await ledgerOf(page)).not.toEqual(before)
  // 50 short tons of 2000 lbf.
  await enter(page, CAPACITY, '100')
  expect(await ledgerOf(page)).toEqual(before)
  await button(page, 'SI').click()
  await enter(page, SPAN, '24')
  expect(await valueAt(page, SPAN)).toBe('24 m')
})

inWindow('arithmetic and feet with inches are read, and kept as they were typed', async ({ page }) => {
  const before = await ledgerOf(page)
  await enter(page, CAPACITY, '2 * 25 ton')
  expect(await valueAt(page, CAPACITY)).toBe('2 * 25 ton')
  expect(await ledgerOf(page)).toEqual(before)
  await enter(page, SPAN, `77' 12"`)
  expect(await ledgerOf(page)).toEqual(before)
  await enter(page, SPAN, `90'-6 1/2"`)
  expect(await ledgerOf(page)).not.toEqual(before)
  const job = JSON.parse(await savedJob(page)) as { cranes: readonly Record<string, string>[] }
  expect(job.cranes[0]).toMatchObject({ ratedCapacity: '2 * 25 ton', bridgeSpan: `90'-6 1/2"` })
})

inWindow('a wrong entry is kept with its message, and the last figures stand until it is mended', async ({ page }) => {
  const before = await ledgerOf(page)
  await enter(page, CAPACITY, 'fifty tons')
  await messageAt(page, CAPACITY).waitFor()
  expect(await messageAt(page, CAPACITY).innerText()).toContain('fifty tons')
  expect(await valueAt(page, CAPACITY)).toBe('fifty tons')
  expect(await entryAt(page, CAPACITY).getAttribute('aria-invalid')).toBe('true')
  const described = (await entryAt(page, CAPACITY).getAttribute('aria-describedby')) ?? ''
  expect(described.split(' ')).toContain(await messageAt(page, CAPACITY).getAttribute('id'))
  await page.locator('section.ledger').getByText('of the entries before').waitFor()
  expect(await page.locator('[data-check]').count()).toBe(before.size)
  await enter(page, CAPACITY, '50 ton')
  await messageAt(page, CAPACITY).waitFor({ state: 'detached' })
  expect(await ledgerOf(page)).toEqual(before)
})

inWindow('an entry that is emptied gives its default back, and Escape what stood there before', async ({ page }) => {
  const gear = entryAt(page, 'cranes[0].belowHook')
  expect(await gear.inputValue()).toBe('2.2 kip')
  await enter(page, 'cranes[0].belowHook', '')
  expect(await gear.getAttribute('placeholder')).toBe('0 kip')
  expect(JSON.parse(await savedJob(page))).not.toHaveProperty('cranes.0.belowHook')
  await gear.fill('9 kip')
  await gear.press('Escape')
  expect(await gear.inputValue()).toBe('')
  await enter(page, CAPACITY, '')
  await expect.poll(() => entryAt(page, CAPACITY).getAttribute('placeholder')).toBe('required')
})

inWindow('a crane is added and removed', async ({ page }) => {
  const before = await ledgerOf(page)
  await button(page, '+ crane').click()
  await page.getByRole('heading', { name: 'Crane 2' }).waitFor()
  expect(await valueAt(page, 'cranes[1].ratedCapacity')).toBe('50 ton')
  await enter(page, 'cranes[1].ratedCapacity', '70 ton')
  expect(await ledgerOf(page)).not.toEqual(before)
  await button(page, 'remove Crane 2').click()
  await page.getByRole('heading', { name: 'Crane 2' }).waitFor({ state: 'detached' })
  expect(await ledgerOf(page)).toEqual(before)
})

inWindow('another shape and another make-up of the girder', async ({ page }) => {
  const before = await ledgerOf(page)
  await enter(page, 'girder.section.shape', 'W36X135')
  const weaker = await ledgerOf(page)
  expect(Number(weaker.get('Strong-axis bending'))).toBeGreaterThan(Number(before.get('Strong-axis bending')))
  await entryAt(page, 'girder.section').selectOption({ label: 'welded plates' })
  const depth = entryAt(page, 'girder.section.web.depth')
  await expect.poll(() => depth.getAttribute('placeholder')).toBe('required')
  await entryAt(page, 'girder.section').selectOption({ label: 'rolled' })
  expect(await valueAt(page, 'girder.section.shape')).toBe('W36X135')
  expect(await ledgerOf(page)).toEqual(weaker)
})

inWindow('US or SI changes what is shown and nothing that is computed', async ({ page }) => {
  const before = await ledgerOf(page)
  const compared = page
    .locator('.holds .beside')
    .filter({ hasText: /\d (kip|kN)/ })
    .first()
  const shown = await compared.innerText()
  const working = await page.locator('ol .formula').allInnerTexts()
  await button(page, 'SI').click()
  await expectComputed(page)
  expect(await button(page, 'SI').getAttribute('aria-pressed')).toBe('true')
  expect(await ledgerOf(page)).toEqual(before)
  expect(await compared.innerText()).not.toBe(shown)
  expect(await valueAt(page, CAPACITY)).toBe('50 ton')
  await page.locator('ol .formula').first().waitFor()
  expect(await page.locator('ol .formula').allInnerTexts()).not.toEqual(working)
  await button(page, 'US').click()
  expect(await compared.innerText()).toBe(shown)
})
