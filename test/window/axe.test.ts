/** No barrier that axe knows of levels A and AA, in light and dark. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { barriers, button, enter, expectComputed, windowTests } from './window.ts'

const { inWindow } = windowTests()

for (const dark of [false, true])
  inWindow(
    `no barrier ${dark ? 'in the dark' : 'in the light'}`,
    async ({ page }) => {
      expect(await page.locator('html').getAttribute('data-theme')).toBe(dark ? 'dark' : 'light')
      expect(await barriers(page), 'girder').toEqual([])
      await enter(page, 'cranes[0].ratedCapacity', 'fifty')
      await enter(page, 'cranes[0].bridgeSpan', '')
      await page.locator('ul.stale').waitFor()
      expect(await barriers(page), 'girder with wrong entries').toEqual([])
      await enter(page, 'cranes[0].ratedCapacity', '50 ton')
      await enter(page, 'cranes[0].bridgeSpan', '78 ft')
      await expectComputed(page)
      for (const name of ['Cautions', 'Keep revision', 'Issue calc sheet']) {
        await button(page, name).first().click()
        await page.getByRole('dialog').waitFor()
        expect(await barriers(page, 'dialog'), name).toEqual([])
        await page.keyboard.press('Escape')
        await page.getByRole('dialog').waitFor({ state: 'detached' })
      }
      await keepOne(page)
      await button(page, 'Revisions').click()
      await page.getByRole('table').waitFor()
      expect(await barriers(page), 'revisions').toEqual([])
    },
    { dark },
  )

const keepOne = async (page: Page): Promise<void> => {
  await button(page, 'Keep revision').click()
  await button(page.getByRole('dialog'), 'Keep').click()
  await page.getByRole('dialog').waitFor({ state: 'detached' })
}
