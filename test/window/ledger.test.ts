/** The ledger in its order, and the working of the check that is chosen in it. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { writeWorking } from '../../core/formula/write.ts'
import { citation } from '../../core/sources/clause.ts'
import { changed, reviewOf, sampleText } from './expected.ts'
import { expectComputed, openFile, windowTests } from './window.ts'

const { inWindow } = windowTests()

const working = (page: Page) => page.locator('section.working')
const chosen = (page: Page) => page.locator('[data-check][aria-current=true]')

/** Fails, holds and not covered. */
const light = changed(sampleText(), 'girder', {
  section: { kind: 'rolled', shape: 'W36X135', cap: { shape: 'C15X33.9' } },
})

inWindow(
  'what fails stands first, then what holds, the worst of each first, then what is not covered',
  async ({ page }) => {
    await openFile(page, 'light.json', light)
    await expectComputed(page)
    const ids = await page.evaluate<string[]>(
      `[...document.querySelectorAll('[data-check]')].map(row => row.dataset.check)`,
    )
    const checks = reviewOf(light).checks.filter(({ status }) => status !== 'not-applicable')
    const rank = { fails: 0, holds: 1, 'not-covered': 2, 'not-applicable': 3 }
    const found = ids.map((id) => checks.find((check) => check.id === id)!)
    expect(found.length).toBe(checks.length)
    expect(found.map(({ status }) => rank[status])).toEqual(checks.map(({ status }) => rank[status]).sort())
    expect(new Set(found.map(({ status }) => status)).size).toBe(3)
    for (const status of ['fails', 'holds'] as const) {
      const shares = found.filter((check) => check.status === status).map(({ utilisation }) => utilisation!)
      expect(shares).toEqual([...shares].sort((a, b) => b - a))
    }
    // The governing check is chosen from the start.
    expect(await chosen(page).getAttribute('data-check')).toBe(reviewOf(light).governing)
  },
)

inWindow('a check is chosen by keys, and its working is shown', async ({ page }) => {
  const rows = page.locator('[data-check]')
  const last = (await rows.count()) - 1
  await chosen(page).focus()
  for (const [key, at] of [
    ['Home', 0],
    ['ArrowDown', 1],
    ['ArrowDown', 2],
    ['ArrowUp', 1],
    ['End', last],
    ['ArrowDown', last],
  ] as const) {
    await page.keyboard.press(key)
    expect(await chosen(page).innerText(), key).toBe(await rows.nth(at).innerText())
    expect(await page.locator(':focus').innerText(), key).toBe(await rows.nth(at).innerText())
    expect(await working(page).locator('h2').innerText()).toBe(await rows.nth(at).locator('.title').innerText())
  }
})

inWindow('the working is the derivation of that check, in MathML, each line with its clause', async ({ page }) => {
  const check = reviewOf(sampleText()).checks.find(({ title }) => title === 'Strong-axis bending')!
  await page.locator(`[data-check="${check.id}"]`).click()
  await working(page).locator('math').first().waitFor()
  expect(await working(page).locator('header .clause').innerText()).toBe(citation(check.clause))
  const lines = writeWorking(check.working!(), 'us')
  const formulas = await page.evaluate<string[]>(
    `[...document.querySelectorAll('section.working li')].map(row => [...row.querySelectorAll('math')].map(math => math.textContent).join(''))`,
  )
  expect(formulas.map(squeezed)).toEqual(lines.map(({ symbols, values }) => squeezed(textOf(symbols + values))))
  const clauses = lines.map(({ clause }) => clause).filter((clause) => clause !== '')
  expect(clauses.length).toBeGreaterThan(20)
  expect(await working(page).locator('li > .clause').allInnerTexts()).toEqual(clauses)
  const spaces = await page.evaluate<string[]>(
    `[...new Set([...document.querySelectorAll('section.working math')].map(math => math.namespaceURI))]`,
  )
  expect(spaces).toEqual(['http://www.w3.org/1998/Math/MathML'])
})

const squeezed = (text: string): string => text.replace(/\s+/g, '')
const textOf = (mathml: string): string =>
  mathml
    .replace(/<[^>]*>/g, '')
    .replaceAll('&lt;', '<')
    .replaceAll('&gt;', '>')
    .replaceAll('&amp;', '&')

inWindow('what is not covered says so with its reason', async ({ page }) => {
  const open = reviewOf(sampleText()).checks.filter(({ status }) => status === 'not-covered')
  expect(open.length).toBeGreaterThan(3)
  for (const { id, why, title } of open) {
    await page.locator(`[data-check="${id}"]`).click()
    expect(await working(page).innerText(), title).toContain('not covered')
    expect(squeezed(await working(page).innerText()), title).toContain(squeezed(why!))
  }
})
