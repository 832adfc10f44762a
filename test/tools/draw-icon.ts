/** Draws resources/icons/longtravel.png, which packages carry, from the SVG beside it: `node test/tools/draw-icon.ts`. */
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { chromium } from 'playwright-core'
import { startBrowser } from '../window/browser.ts'

const ICONS = join(import.meta.dirname, '../../resources/icons')

/** Of this side each system's package makes its own sizes. */
const SIDE = 1024

const server = await startBrowser()
if ('why' in server) throw new Error(server.why)
const browser = await chromium.connect(server.wsEndpoint())
const page = await browser.newPage({ viewport: { width: SIDE, height: SIDE } })
const svg = readFileSync(join(ICONS, 'longtravel.svg'), 'utf8')
await page.setContent(`<style>body{margin:0}svg{display:block}</style>${svg}`)
await page.screenshot({ path: join(ICONS, 'longtravel.png'), omitBackground: true })
await browser.close()
await server.close()
