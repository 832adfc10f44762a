/** The elevation: the crane is dragged and moved by keys, stands where an effect governs, and the diagrams follow. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { inUnit, shownUnit } from '../../core/quantity/units.ts'
import { writeNumber } from '../../core/quantity/write.ts'
import { reviewOf, sampleText } from './expected.ts'
import { button, openFile, expectComputed, windowTests } from './window.ts'

const { inWindow } = windowTests()

const FOOT = 0.3048

const crane = (page: Page) => page.getByRole('slider', { name: 'Crane on the girder' })
const leadOf = async (page: Page): Promise<number> => Number(await crane(page).getAttribute('aria-valuenow'))
const diagram = (page: Page, effect: string) =>
  page.locator('.diagram').filter({ has: page.getByRole('heading', { name: new RegExp(`^${effect}`) }) })
/** Greatest values of moment, shear and deflection as the crane stands. */
const peaks = (page: Page): Promise<string[]> => page.locator('.diagram .label.ink').allInnerTexts()
const readings = (page: Page): Promise<string[]> => page.locator('.diagram .read strong').allInnerTexts()

inWindow('a drag moves the crane by what the hand moves, and the diagrams with it', async ({ page }) => {
  await crane(page).press('Home')
  const [from, shown, read] = [await leadOf(page), await peaks(page), await readings(page)]
  const box = (await crane(page).boundingBox())!
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x + 40, y, { steps: 4 })
  const first = await leadOf(page)
  await page.mouse.move(x + 83, y, { steps: 4 })
  await page.mouse.up()
  const second = await leadOf(page)
  expect(first).toBeGreaterThan(from)
  expect(second).toBeGreaterThan(first)
  expect(await peaks(page)).not.toEqual(shown)
  expect(await readings(page)).not.toEqual(read)
  // Let go, it stays where it is.
  await page.mouse.move(x + 200, y)
  expect(await leadOf(page)).toBe(second)
})

inWindow('keys move it by a tenth of a foot or 25 mm, ten times that with Shift, and to the ends', async ({ page }) => {
  const moved = async (key: string): Promise<number> => {
    const before = await leadOf(page)
    await crane(page).press(key)
    return (await leadOf(page)) - before
  }
  // Wheel 1 over the left support, then on open span.
  await crane(page).press('Home')
  expect(await leadOf(page)).toBeCloseTo(0, 9)
  await moved('Shift+ArrowRight')
  expect(await moved('ArrowRight')).toBeCloseTo(0.1 * FOOT, 9)
  expect(await moved('ArrowLeft')).toBeCloseTo(-0.1 * FOOT, 9)
  expect(await moved('Shift+ArrowLeft')).toBeCloseTo(-FOOT, 9)
  await button(page, 'SI').click()
  expect(await moved('ArrowRight')).toBeCloseTo(0.025, 9)
  expect(await moved('Shift+ArrowRight')).toBeCloseTo(0.25, 9)
  await crane(page).press('End')
  // The last of four wheels at 4'-2", 9'-4", 4'-2" over the right support of 30'.
  expect(await leadOf(page)).toBeCloseTo((30 - (4 + 2 / 12 + 9 + 4 / 12 + 4 + 2 / 12)) * FOOT, 9)
})

inWindow('it stops where something governs instead of passing', async ({ page }) => {
  const { lead } = reviewOf(sampleText()).envelope.moment.max
  await crane(page).press('Home')
  const leads: number[] = []
  for (let step = 0; step < 16; step++) {
    await crane(page).press('Shift+ArrowRight')
    leads.push(await leadOf(page))
  }
  // 8'-6" from the support: no whole number of steps.
  expect(leads.map((each) => each.toFixed(9))).toContain(lead.toFixed(9))
})

inWindow(
  'it stands where moment, shear and deflection govern, and shows what the review found there',
  async ({ page }) => {
    const { moment, deflection, endReaction } = reviewOf(sampleText()).envelope
    const left = endReaction.find(({ span, end }) => span === 0 && end === 'left')!.max
    const places = [
      ['moment', 'moment', moment.max, 'moment'],
      ['shear left', 'shear', left, 'force'],
      ['deflection', 'deflection', deflection.max, 'length'],
    ] as const
    for (const system of ['US', 'SI'] as const) {
      await button(page, system).click()
      for (const [word, effect, extreme, kind] of places) {
        await button(page, word).click()
        expect(await button(page, word).getAttribute('aria-pressed'), word).toBe('true')
        expect(await leadOf(page), word).toBeCloseTo(extreme.lead, 6)
        const unit = shownUnit(kind, system === 'US' ? 'us' : 'si')
        const value = writeNumber(inUnit(extreme.value, unit))
        expect(await diagram(page, effect).locator('.label.ink').innerText(), word).toMatch(startOf(value))
      }
    }
    await page.getByText('stands where').first().waitFor()
  },
)

const startOf = (value: string): RegExp => new RegExp(`^\\u2212?${value.replaceAll('.', '\\.')} at `)

inWindow('of two cranes the train that stands on the rail is chosen', async ({ page }) => {
  await openFile(page, 'two.json', sampleText('two-crane-plate-girder'))
  await expectComputed(page)
  const review = reviewOf(sampleText('two-crane-plate-girder'))
  const trains = page.getByLabel('on the rail')
  expect(await trains.locator('option').count()).toBe(review.trains.length)
  await button(page, 'moment').click()
  expect(await leadOf(page)).toBeCloseTo(review.envelope.moment.max.lead, 6)
  expect(await trains.inputValue()).toBe(String(review.envelope.moment.max.train))
  const shown = await peaks(page)
  await trains.selectOption('0')
  expect(await peaks(page)).not.toEqual(shown)
})
