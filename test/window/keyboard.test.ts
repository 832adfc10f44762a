/** From a new job to a printed sheet with the keyboard alone. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { bytesOf, expectComputed, notice, windowTests } from './window.ts'

const { inWindow } = windowTests()

/** More stops than the window has. */
const MOST_STOPS = 150

/** Goes on by the Tab key until the focus stands where it is wanted. */
const tabTo = async (page: Page, selector: string, key = 'Tab'): Promise<void> => {
  for (let stop = 0; stop < MOST_STOPS; stop++) {
    if ((await page.locator(`:focus`).and(page.locator(selector)).count()) === 1) return
    await page.keyboard.press(key)
  }
  throw new Error(`The Tab key does not come to ${selector}`)
}

const ENTRIES: readonly (readonly [path: string, text: string])[] = [
  ['cranes-0-ratedCapacity', '20 ton'],
  ['cranes-0-bridgeWeight', '40'],
  ['cranes-0-trolleyWeight', '12 kip'],
  ['cranes-0-bridgeSpan', "60'"],
  ['cranes-0-operation', 'pend'],
  ['cranes-0-serviceClass', 'C'],
  ['cranes-0-wheelSpacings', "10' 6"],
  ['runway-spans', '3 x 25 ft'],
  ['runway-rail-name', '85 lb'],
  ['girder-section-shape', 'W24X131'],
  ['girder-steel-name', 'A992'],
  ['project-title', 'By hand'],
]

inWindow('from a new job to a printed sheet by the keyboard alone', async ({ page }) => {
  await tabTo(page, 'button:text-is("New")')
  await page.keyboard.press('Enter')
  await page.locator('[data-check]').first().waitFor({ state: 'detached' })
  for (const [path, text] of ENTRIES) {
    await tabTo(page, `#entry-${path}`)
    await page.keyboard.type(text)
  }
  await expectComputed(page)

  // The crane by keys, then a check and its working.
  await tabTo(page, '[role=slider][aria-label="Crane on the girder"]')
  const crane = page.locator(':focus')
  const lead = await crane.getAttribute('aria-valuenow')
  await page.keyboard.press('Shift+ArrowRight')
  expect(await crane.getAttribute('aria-valuenow')).not.toBe(lead)
  await tabTo(page, '[data-check]')
  await page.keyboard.press('End')
  await page.locator('section.working h2').waitFor()

  await tabTo(page, 'header button:text-is("Issue calc sheet")', 'Shift+Tab')
  await page.keyboard.press('Enter')
  await page.getByRole('dialog').waitFor()
  await tabTo(page, 'dialog button:text-is("Issue")')
  const [download] = await Promise.all([
    page.waitForEvent('download', { timeout: 60_000 }),
    page.keyboard.press('Enter'),
  ])
  expect((await bytesOf(download)).subarray(0, 5).toString('latin1')).toBe('%PDF-')
  await notice(page).getByText('handed over').waitFor()
  // The focus is back where the dialog was opened from.
  expect(await page.locator(':focus').innerText()).toBe('Issue calc sheet')
})
