/** A browser for the window: the one that CHROME names, else on Linux the one inside a package, unpacked once. */
import { chmodSync, mkdirSync, readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import chromiumPackage from '@sparticuz/chromium'
import { chromium, type BrowserServer } from 'playwright-core'

/** Nothing that loosens what a page may do. */
const ARGS = [
  '--headless=shell',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-background-networking',
  '--font-render-hinting=none',
]

/** Starts it, to be connected to by its address; else why it cannot be started here. */
export const startBrowser = async (): Promise<BrowserServer | { readonly why: string }> => {
  const named = process.env['CHROME']
  if (named === undefined && (process.platform !== 'linux' || process.arch !== 'x64'))
    return { why: `no browser is at hand on ${process.platform} ${process.arch}; CHROME may name one` }
  try {
    return await chromium.launchServer({ executablePath: named ?? (await unpacked()), args: ARGS, host: '127.0.0.1' })
  } catch (error) {
    const [line] = String(error).split('\n', 1)
    return {
      why: `the browser${named === undefined ? ' of the package' : ` ${named}`} does not start: ${line!.replace(/\.+$/, '')}`,
    }
  }
}

/** The package unpacks into TMPDIR and takes any older file that lies there: a folder of its own keeps versions apart. */
const unpacked = async (): Promise<string> => {
  const within = createRequire(import.meta.url).resolve('@sparticuz/chromium')
  const { version } = JSON.parse(readFileSync(join(within, '../../package.json'), 'utf8')) as { version: string }
  const before = process.env['TMPDIR']
  const folder = join(tmpdir(), `longtravel-chromium-${version}-${process.getuid?.() ?? 0}`)
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  // Refused where the folder is somebody else's.
  chmodSync(folder, 0o700)
  process.env['TMPDIR'] = folder
  try {
    return await chromiumPackage.executablePath()
  } finally {
    if (before === undefined) delete process.env['TMPDIR']
    else process.env['TMPDIR'] = before
  }
}
