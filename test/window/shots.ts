/** Pictures of the window to look at, in .reports/window/; run only where LONGTRAVEL_SHOTS=1, and nothing is asserted of them. */
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import type { Page } from 'playwright-core'
import { describe } from 'vitest'
import { sampleText } from './expected.ts'
import { button, enter, expectComputed, openFile, windowTests } from './window.ts'

const FOLDER = join(import.meta.dirname, '../../.reports/window')

const SIZES = [
  { width: 1100, height: 700, scale: 1 },
  { width: 1440, height: 900, scale: 1 },
  { width: 2560, height: 1440, scale: 2 },
]

describe('pictures', () => {
  const { inWindow } = windowTests()
  for (const size of SIZES)
    for (const dark of [false, true]) {
      const name = `${size.width}x${size.height}-${dark ? 'dark' : 'light'}`
      inWindow(name, ({ page }) => takeAll(page, name), { ...size, dark })
    }
})

const takeAll = async (page: Page, name: string): Promise<void> => {
  mkdirSync(FOLDER, { recursive: true })
  const take = async (what: string): Promise<void> => {
    await page.waitForTimeout(300)
    await page.screenshot({ path: join(FOLDER, `${name}-${what}.png`) })
  }
  await take('us')
  await button(page, 'SI').click()
  await expectComputed(page)
  await take('si')
  await button(page, 'US').click()

  await enter(page, 'girder.section.shape', 'W36X1820')
  await take('wrong-shape')
  await enter(page, 'cranes[0].ratedCapacity', 'fifty tons')
  await enter(page, 'cranes[0].bridgeSpan', '')
  await take('wrong')

  await openFile(page, 'two.json', sampleText('two-crane-plate-girder'))
  await expectComputed(page)
  await take('two')

  for (const [word, what] of [
    ['Cautions', 'cautions'],
    ['Issue calc sheet', 'issue'],
    ['Keep revision', 'keep'],
  ] as const) {
    await button(page, word).click()
    await page.getByRole('dialog').waitFor()
    await take(what)
    if (what !== 'keep') await page.keyboard.press('Escape')
  }
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Purpose').fill('For approval')
  await dialog.getByLabel('Author').fill('R. Ortega')
  await button(dialog, 'Keep').click()
  await dialog.waitFor({ state: 'detached' })
  await button(page, 'Revisions').click()
  await page.getByRole('table').waitFor()
  await take('revisions')

  await button(page, 'Girder').click()
  await button(page, 'New').click()
  await take('new')
}
