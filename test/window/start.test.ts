/** The program from its first start to its sudden end. */
import type { Request } from 'playwright-core'
import { expect } from 'vitest'
import { STANDING_CAUTIONS } from '../../core/review/cautions.ts'
import { reviewOf, sampleText } from './expected.ts'
import { startProgram } from './program.ts'
import { button, enter, entryAt, expectComputed, ledgerOf, notice, savedJob, windowTests } from './window.ts'

const { withBrowser } = windowTests()

withBrowser('it starts with a sample computed, and first its cautions', async (open) => {
  const program = await startProgram('app/start.ts')
  await open({ address: program.address }, async ({ page }) => {
    const { checks } = reviewOf(sampleText())
    const shown = await ledgerOf(page)
    expect([...shown.keys()].sort()).toEqual(
      checks
        .filter(({ status }) => status !== 'not-applicable')
        .map(({ title }) => title)
        .sort(),
    )
    // The key is good once, and does not stay where it could be copied from.
    expect(new URL(page.url()).hash).toBe('')

    const dialog = page.getByRole('dialog')
    await dialog.waitFor()
    expect(await dialog.locator('ol li').allInnerTexts()).toEqual(STANDING_CAUTIONS)
    await page.keyboard.press('Escape')
    await page.keyboard.press('Escape')
    expect(await dialog.isVisible()).toBe(true)
    const set = page.waitForResponse((response) => isAbout(response.request(), 'settings.set'))
    await button(dialog, 'I have read these cautions').click()
    await dialog.waitFor({ state: 'detached' })
    await set

    // The shade of the window is remembered with it.
    const darkened = page.waitForResponse((response) => response.url().endsWith('settings.set'))
    await button(page, 'Dark').click()
    await darkened
    const answered = page.waitForResponse((response) => isAbout(response.request(), 'settings.get'))
    await page.reload()
    await answered
    // Answered, it would be there within a frame or two.
    await page.waitForTimeout(250)
    await expectComputed(page)
    expect(await dialog.count()).toBe(0)
    expect(await page.locator('html').getAttribute('data-theme')).toBe('dark')
    await button(page, 'Cautions').click()
    expect(await dialog.locator('ol li').allInnerTexts()).toEqual(STANDING_CAUTIONS)
    await page.keyboard.press('Escape')
    await dialog.waitFor({ state: 'detached' })
  })
  expect(await program.end()).toBe(0)
})

/** Whether it asks or sets that the cautions were read. */
const isAbout = (request: Request, call: string): boolean =>
  request.url().endsWith(call) && (request.postData() ?? '').includes('window.cautions')

withBrowser('when its program is gone the page says so, and the work goes on', async (open) => {
  const program = await startProgram('out/main/page.js')
  await open({ address: program.address }, async ({ page, expectLoss }) => {
    await button(page, 'I have read these cautions').click()
    await enter(page, 'project.title', 'Entered before')
    expectLoss()
    await program.kill()
    await notice(page).getByText('The program behind this page was closed or has stopped').waitFor()

    const before = await ledgerOf(page)
    await enter(page, 'girder.section.shape', 'W36X135')
    expect(await ledgerOf(page)).not.toEqual(before)
    expect(await entryAt(page, 'project.title').inputValue()).toBe('Entered before')
    expect(JSON.parse(await savedJob(page))).toMatchObject({
      project: { title: 'Entered before' },
      girder: { section: { shape: 'W36X135' } },
    })

    await button(page, 'Keep revision').click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText('The program behind this page was closed or has stopped').first().waitFor()
    await button(dialog, 'Leave it').click()
    await button(page, 'Issue calc sheet').click()
    await button(dialog, 'Issue').click()
    await dialog.getByText('The program behind this page was closed or has stopped').waitFor()
  })
})
