/** Speed of the window in a browser: the frames of a drag, and the time from the start of the program to the first ledger. */
import { chromium, type Browser, type Page } from 'playwright-core'
import { startBrowser } from '../window/browser.ts'
import { buildIfStale } from '../window/serve.ts'
import { startProgram } from '../window/program.ts'
import type { Measured } from './print.ts'

/** Of the built window; nothing, with the reason said, where no browser starts. */
export async function windowSpeed(): Promise<readonly Measured[]> {
  const server = await startBrowser()
  if ('why' in server) {
    console.log(`The window was not measured: ${server.why}.`)
    return []
  }
  buildIfStale()
  const browser = await chromium.connect(server.wsEndpoint())
  try {
    const starts: number[] = []
    for (let round = 0; round < 3; round++) starts.push((await opened(browser)).milliseconds)
    const { page, close } = await opened(browser, true)
    const frames = (await dragged(page)).toSorted((a, b) => a - b)
    await close()
    const at = (share: number): number => frames[Math.floor(share * (frames.length - 1))]!
    return [
      {
        name: 'start of the built program to its first ledger, least of three',
        value: Math.min(...starts),
        unit: 'ms',
      },
      { name: `frame of a drag that moves at each, median of ${frames.length}`, value: at(0.5), unit: 'ms' },
      { name: 'the same, 95th percentile', value: at(0.95), unit: 'ms' },
    ]
  } finally {
    await browser.close()
    await server.close()
  }
}

/** Starts program and window; ends both again at once, unless they are to be worked in. */
async function opened(browser: Browser, stay = false) {
  const start = performance.now()
  const program = await startProgram('out/main/page.js')
  const page = await browser.newPage({ viewport: { width: 1440, height: 900 } })
  await page.goto(program.address)
  await page.locator('[data-check]').first().waitFor()
  const milliseconds = performance.now() - start
  const close = async (): Promise<void> => {
    await page.close()
    await program.end()
  }
  if (!stay) await close()
  return { page, close, milliseconds }
}

/** Milliseconds from frame to frame while the held crane is moved at each of them, to and fro over the span. */
async function dragged(page: Page): Promise<readonly number[]> {
  await page.getByRole('button', { name: 'I have read these cautions' }).click()
  const crane = page.getByRole('slider', { name: 'Crane on the girder' })
  const before = await crane.getAttribute('aria-valuenow')
  const box = (await crane.boundingBox())!
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  const frames = await page.evaluate<number[]>(`new Promise((resolve) => {
    const crane = document.querySelector('[role=slider][aria-label="Crane on the girder"]')
    const stamps = []
    const step = (now) => {
      stamps.push(now)
      if (stamps.length > 300) return resolve(stamps.slice(1).map((stamp, i) => stamp - stamps[i]))
      const clientX = ${x} + 200 * Math.sin(stamps.length / 20)
      crane.dispatchEvent(new PointerEvent('pointermove', { pointerId: 1, clientX, clientY: ${y}, bubbles: true }))
      requestAnimationFrame(step)
    }
    requestAnimationFrame(step)
  })`)
  await page.mouse.up()
  if ((await crane.getAttribute('aria-valuenow')) === before) throw new Error('the crane was not moved')
  return frames
}
