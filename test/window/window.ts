/** A window in the browser, watched: whatever goes wrong in it unseen fails the test that opened it. */
import AxeBuilder from '@axe-core/playwright'
import { chromium, type Browser, type BrowserContext, type Locator, type Page } from 'playwright-core'
import { afterAll, beforeAll, expect, inject, test } from 'vitest'
import { serveWindow, type Served } from './serve.ts'

export interface Opened {
  readonly page: Page
  /** The page's program goes away: what the page then cannot reach is no fault of it. */
  readonly expectLoss: () => void
}

interface Shown {
  readonly width?: number
  readonly height?: number
  readonly scale?: number
  readonly dark?: boolean
  /** Another program than the one of this file. */
  readonly address?: string
}

type Work = (opened: Opened) => Promise<void>

/** To be called once in a file: a test that opens a window, and one file's own program with its own record behind it. */
export const windowTests = () => {
  const endpoint = inject('browser')
  let browser: Browser
  let served: Served
  beforeAll(async () => {
    if (endpoint === '') return
    browser = await chromium.connect(endpoint)
    served = await serveWindow(inject('built'))
  })
  afterAll(async () => {
    if (endpoint === '') return
    await served.close()
    await browser.close()
  })
  const work = async (shown: Shown, deed: Work): Promise<void> => {
    const opened = await openWatched(browser, shown, shown.address ?? served.newAddress())
    try {
      await deed(opened)
    } finally {
      await opened.close()
      expect.soft(opened.strays, 'errors, violations of the policy and requests to elsewhere').toEqual([])
    }
  }
  return {
    /** A test of one window, of the size in most use where none is said. */
    inWindow: (name: string, deed: Work, shown: Shown = {}) => {
      test.skipIf(endpoint === '')(name, () => work(shown, deed))
    },
    /** The same with a program that the test starts itself. */
    withBrowser: (name: string, deed: (open: (shown: Shown, deed: Work) => Promise<void>) => Promise<void>) => {
      test.skipIf(endpoint === '')(name, () => deed(work))
    },
  }
}

/** Said by Chromium when a connection is refused or lost. */
const LOST = /net::ERR_(?:CONNECTION|INCOMPLETE|EMPTY)/

const openWatched = async (browser: Browser, shown: Shown, address: string) => {
  const context = await browser.newContext({
    viewport: { width: shown.width ?? 1440, height: shown.height ?? 900 },
    deviceScaleFactor: shown.scale ?? 1,
    colorScheme: shown.dark === true ? 'dark' : 'light',
    acceptDownloads: true,
  })
  const strays: string[] = []
  let lossExpected = false
  watch(context, new URL(address).origin, (stray) => {
    if (!(lossExpected && LOST.test(stray))) strays.push(stray)
  })
  await context.addInitScript(
    `addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI }) => console.error('policy violated: ' + violatedDirective + ' ' + blockedURI))`,
  )
  const page = await context.newPage()
  page.setDefaultTimeout(10_000)
  await page.goto(address)
  await expectComputed(page)
  return { page, strays, expectLoss: () => void (lossExpected = true), close: () => context.close() }
}

const watch = (context: BrowserContext, origin: string, tell: (stray: string) => void): void => {
  context.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') tell(`${message.type()}: ${message.text()}`)
  })
  context.on('weberror', (error) => tell(`thrown: ${String(error.error())}`))
  context.on('request', (request) => {
    const url = request.url().replace(/^blob:/, '')
    if (!url.startsWith('data:') && new URL(url).origin !== origin) tell(`request to ${url}`)
  })
}

/** Waits for a ledger that belongs to what is entered. */
export const expectComputed = async (page: Page): Promise<void> => {
  await page.locator('[data-check]').first().waitFor()
  await page.locator('ul.stale').waitFor({ state: 'detached' })
}

/** A line of the data sheet, by its path in the job file. */
export const entryAt = (page: Page, path: string): Locator => page.locator(`#entry-${path.replace(/[^\w]+/g, '-')}`)

/** Types into a line and leaves it, as a hand does. */
export const enter = async (page: Page, path: string, text: string): Promise<void> => {
  const entry = entryAt(page, path)
  await entry.fill(text)
  await entry.blur()
}

/** A line of the ledger: "0.87" or a word, by the check's title. */
export const ledgerOf = async (page: Page): Promise<ReadonlyMap<string, string>> => {
  await expectComputed(page)
  const titles = await page.locator('[data-check] .title').allInnerTexts()
  const values = await page.locator('[data-check]').locator('.value, .word').allInnerTexts()
  return new Map(titles.map((title, row) => [title, values[row] ?? '']))
}

/** The text of the job as the window would save it. */
export const savedJob = async (page: Page): Promise<string> => {
  const [download] = await Promise.all([page.waitForEvent('download'), button(page, 'Save').click()])
  return (await bytesOf(download)).toString('utf8')
}

export const bytesOf = async (download: {
  createReadStream: () => Promise<AsyncIterable<unknown>>
}): Promise<Buffer> => {
  const chunks: Buffer[] = []
  for await (const chunk of await download.createReadStream()) chunks.push(chunk as Buffer)
  return Buffer.concat(chunks)
}

export const button = (page: Page | Locator, name: string | RegExp): Locator =>
  page.getByRole('button', { name, exact: true })

/** What the window says in its line. */
export const notice = (page: Page): Locator => page.locator('.sheet > [role=status]')

/** Takes a file in by way of the button. */
export const openFile = async (page: Page, name: string, content: string | Buffer): Promise<void> => {
  const [chooser] = await Promise.all([page.waitForEvent('filechooser'), button(page, 'Open').click()])
  await chooser.setFiles({ name, mimeType: 'application/json', buffer: Buffer.from(content) })
}

/** What axe finds against the levels A and AA, each as one line, in a part of the window: what lies behind a dialog is inert. */
export const barriers = async (page: Page, part = 'body'): Promise<readonly string[]> => {
  const { violations } = await new AxeBuilder({ page })
    .include(part)
    .options({ resultTypes: ['violations'] })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze()
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(({ target, failureSummary }) => `${id} ${String(target)}: ${failureSummary ?? ''}`),
  )
}
