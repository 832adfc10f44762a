/** What should not be entered: it is said plainly at its place, and the work is kept. */
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { enter, entryAt, ledgerOf, notice, openFile, savedJob, windowTests } from './window.ts'

const { inWindow } = windowTests()

const CAPACITY = 'cranes[0].ratedCapacity'
const PAGE = 'The crane runway girder carries wheels that move. '.repeat(60)

const message = (page: Page) => page.locator('#entry-cranes-0-ratedCapacity-message')

inWindow('a page of text, emoji and right-to-left text in a number', async ({ page }) => {
  const before = await ledgerOf(page)
  for (const text of [
    PAGE,
    '🏗️💥 50',
    'خمسون طن',
    '\u202e05 not',
    '50 ton; DROP',
    '<img src=x onerror=alert(1)>',
    '1e999',
    '0/0',
  ]) {
    const entry = entryAt(page, CAPACITY)
    await entry.focus()
    await entry.press('ControlOrMeta+a')
    // As a paste does: all at once.
    await page.keyboard.insertText(text)
    await message(page).waitFor()
    expect(await entry.getAttribute('aria-invalid'), text).toBe('true')
    expect(await entry.inputValue(), text).toBe(text)
    const said = await message(page).innerText()
    expect(said.length, said).toBeGreaterThan(20)
    expect(said.length, said).toBeLessThan(400)
    expect(await page.locator('body').innerText(), text).not.toMatch(/NaN|undefined|\[object|Infinity/)
    // The window stays within its frame.
    expect(await page.evaluate<number>('document.documentElement.scrollWidth - innerWidth'), text).toBeLessThanOrEqual(
      0,
    )
    expect(JSON.parse(await savedJob(page)), text).toMatchObject({ cranes: [{ ratedCapacity: text.trim() }] })
  }
  await enter(page, CAPACITY, '50 ton')
  expect(await ledgerOf(page)).toEqual(before)
})

inWindow('emoji and right-to-left text where words are asked for', async ({ page }) => {
  const before = await ledgerOf(page)
  await enter(page, 'project.title', '🏗️ מסלול מנוף')
  await enter(page, 'project.notes', `${PAGE}\n${PAGE}`)
  await enter(page, 'cranes[0].name', 'رافعة ١')
  expect(await ledgerOf(page)).toEqual(before)
  expect(JSON.parse(await savedJob(page))).toMatchObject({
    project: { title: '🏗️ מסלול מנוף' },
    cranes: [{ name: 'رافعة ١' }],
  })
  expect(await page.evaluate<number>('document.documentElement.scrollWidth - innerWidth')).toBeLessThanOrEqual(0)
})

const DROP = `(() => {
  const picture = new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0xff, 0xd8])
  const carried = new DataTransfer()
  carried.items.add(new File([picture], 'crane.png', { type: 'image/png' }))
  const drop = new DragEvent('drop', { dataTransfer: carried, bubbles: true, cancelable: true })
  document.querySelector('main').dispatchEvent(drop)
  return drop.defaultPrevented
})()`

inWindow('a picture that is dropped, or opened', async ({ page }) => {
  const [address, text] = [page.url(), await savedJob(page)]
  // Else the browser would show the picture instead of the window.
  expect(await page.evaluate<boolean>(DROP)).toBe(true)
  await notice(page).getByText('crane.png is no text; right would be a job file').waitFor()
  await openFile(page, 'photo.jpg', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16]))
  await notice(page).getByText('photo.jpg is no text').waitFor()
  expect(page.url()).toBe(address)
  expect(await savedJob(page)).toBe(text)
})
