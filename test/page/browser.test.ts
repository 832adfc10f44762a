/** The loopback page in a real browser: the built window as it is, its key, its token and its files. */
import { readdirSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { chromium, type Browser, type BrowserContext, type Page as Tab } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, onTestFinished, test } from 'vitest'
import { openInBrowser } from '../../app/page/open.ts'
import { LIMITS, startPage } from '../../app/page/page.ts'
import { startBrowser } from '../window/browser.ts'
import { built } from '../tools/built.ts'
import { realDesk } from './doors.ts'

const WINDOW = join(import.meta.dirname, '../../out/renderer')

const server = await startBrowser()
if ('why' in server) console.warn(`The tests of the page in a browser are skipped: ${server.why}.`)
let browser: Browser | undefined

beforeAll(async () => {
  await built()
  if (!('why' in server)) browser = await chromium.connect(server.wsEndpoint())
})

afterAll(async () => {
  await browser?.close()
  if (!('why' in server)) await server.close()
})

/** A tab, all that it asked for, and all that it complained of. */
interface Watched {
  readonly tab: Tab
  readonly context: BrowserContext
  readonly asked: string[]
  readonly complaints: string[]
}

const watched = async (context?: BrowserContext): Promise<Watched> => {
  const own = context ?? (await browser!.newContext())
  if (context === undefined) onTestFinished(() => own.close())
  const tab = await own.newPage()
  const asked: string[] = []
  const complaints: string[] = []
  own.on('request', (request) => asked.push(request.url()))
  tab.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text())
  })
  tab.on('pageerror', (error) => complaints.push(String(error)))
  return { tab, context: own, asked, complaints }
}

const served = async (last = LIMITS.last) => {
  const page = await startPage(realDesk(), WINDOW, { ...LIMITS, last })
  onTestFinished(() => page.close())
  return page
}

/** Settles when the window holds its token and its watch. */
const ready = (tab: Tab) => tab.waitForFunction('sessionStorage.getItem("longtravel.token") !== null')

/** What the page itself may do with its token, by the browser's own fetch. */
const call = (tab: Tab, name: string): Promise<{ status: number; text: string }> =>
  tab.evaluate(
    `fetch('/call/${name}', { method: 'POST', body: '{}', headers: {
      'content-type': 'application/json', 'x-longtravel-token': sessionStorage.getItem('longtravel.token') } })
      .then(async (response) => ({ status: response.status, text: await response.text() }))`,
  )

describe.skipIf('why' in server)('in the browser', () => {
  test('the window opens, asks nobody else and breaks no rule of its policy', async () => {
    const page = await served()
    const { tab, asked, complaints } = await watched()
    const address = page.newAddress()
    await tab.goto(address)
    await ready(tab)
    await tab.waitForLoadState('networkidle', { timeout: 3_000 }).catch(() => undefined)
    const { origin } = new URL(address)
    expect(asked.filter((url) => !url.startsWith(`${origin}/`) && !/^(?:data|blob):/.test(url))).toEqual([])
    expect(complaints).toEqual([])
  })

  test('the key goes out of the address, is sent in no address, and the page may be loaded anew', async () => {
    const page = await served(1_500)
    const { tab, asked } = await watched()
    const address = page.newAddress()
    await tab.goto(address)
    await ready(tab)
    expect(tab.url()).toBe(`${new URL(address).origin}/`)
    await tab.reload()
    expect(JSON.parse((await call(tab, 'projects.list')).text)).toEqual({ kind: 'answer', ok: true, value: [] })
    const key = address.split('#key=')[1]!
    expect(asked.filter((url) => url.replace(/#.*$/, '').includes(key))).toEqual([])
  })

  test('another tab has no token, and a used key gives it none', async () => {
    const page = await served()
    const { tab, context } = await watched()
    const address = page.newAddress()
    await tab.goto(address)
    await ready(tab)
    const { tab: other } = await watched(context)
    await other.goto(address)
    await other.waitForLoadState()
    expect((await call(other, 'projects.list')).status).toBe(401)
    expect(await other.evaluate('sessionStorage.getItem("longtravel.token")')).toBeNull()
  })

  test('a foreign page can neither frame the window, nor read it, nor call it', async () => {
    const page = await served()
    const { tab } = await watched()
    const { origin } = new URL(page.newAddress())
    const statuses: number[] = []
    tab.on('response', (response) => {
      if (response.url().startsWith(origin)) statuses.push(response.status())
    })
    // Another port is another origin; this one has no policy that would stop the attempt on its own side.
    const foreign = createServer((_request, response) => {
      response.setHeader('content-type', 'text/html')
      response.end(`<iframe src="${origin}/"></iframe><script src="${origin}/"></script><img src="${origin}/">`)
    })
    await new Promise<void>((resolve) => foreign.listen(0, '127.0.0.1', resolve))
    onTestFinished(() => void foreign.close())
    await tab.goto(`http://127.0.0.1:${(foreign.address() as AddressInfo).port}/`)
    const reading = `fetch('${origin}/', { mode: 'cors' }).then(() => 'read', () => 'refused')`
    expect(await tab.evaluate(reading)).toBe('refused')
    const calling = `fetch('${origin}/call/projects.list', { method: 'POST', body: '{}', headers: { 'content-type': 'application/json' } })
      .then(() => 'called', () => 'refused')`
    expect(await tab.evaluate(calling)).toBe('refused')
    const blind = `fetch('${origin}/token', { method: 'POST', mode: 'no-cors', body: '{}' }).then((response) => response.type, () => 'refused')`
    expect(['opaque', 'refused']).toContain(await tab.evaluate(blind))
    expect(statuses).toContain(403)
    expect(statuses.every((status) => status >= 400)).toBe(true)
  })

  test('the file that opens the browser leads to the window with its key', async () => {
    const page = await served()
    const before = new Set(readdirSync(tmpdir()))
    const tidy = openInBrowser(page.newAddress(), { file: 'true', before: [] })
    onTestFinished(tidy)
    const folder = readdirSync(tmpdir()).find((name) => name.startsWith('longtravel-') && !before.has(name))!
    const { tab } = await watched()
    await tab.goto(`file://${join(tmpdir(), folder, 'open.html')}`)
    await tab.waitForURL(/^http:\/\/127\.0\.0\.1:/)
    await ready(tab)
  })

  test('the program ends soon after the last tab is closed', async () => {
    const page = await served(500)
    const { tab } = await watched()
    await tab.goto(page.newAddress())
    await ready(tab)
    await new Promise((resolve) => setTimeout(resolve, 1_000))
    const gone = page.gone.then(() => 'gone')
    expect(await Promise.race([gone, Promise.resolve('open')])).toBe('open')
    await tab.close()
    expect(await gone).toBe('gone')
  })
})
