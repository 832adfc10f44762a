/** `npm start`: builds what is stale, then opens the window in Electron, or as a page where Electron cannot run. */
import { join } from 'node:path'
import { hasDisplay } from './page/open.ts'
import { electronIn, fetchElectron } from './start/electron.ts'
import { FAULT, failedAtOnce, run } from './start/run.ts'
import { isStale } from './start/stale.ts'

const PROJECT = join(import.meta.dirname, '..')
const ELECTRON = join(PROJECT, 'node_modules/electron')
const FETCH_LIMIT = 5 * 60_000

const say = (line: string) => process.stdout.write(`${line}\n`)

const start = async (given: readonly string[]): Promise<void> => {
  if (isStale()) {
    say('Building the window.')
    // In a process of its own: the builder is large, and this one stays while the window is open.
    const { code } = await run(process.execPath, ['app/build.ts'], PROJECT)
    if (code !== 0) {
      process.exitCode = FAULT
      return
    }
  }
  const electron = await wantedElectron(given)
  if (electron !== undefined) {
    const end = await run(electron, [PROJECT, ...given], PROJECT)
    if (!failedAtOnce(end)) {
      process.exitCode = end.code ?? FAULT
      return
    }
    // Electron is never run without its sandbox.
    say('Electron ended at once, as it does where its sandbox may not run: the window opens in the browser instead.')
  }
  process.exitCode = (await run(process.execPath, ['out/main/page.js', ...given], PROJECT)).code ?? FAULT
}

/** Electron's program where it is to be used, fetched if need be; undefined where the page is to be served, with the reason said. */
const wantedElectron = async (given: readonly string[]): Promise<string | undefined> => {
  if (process.env['LONGTRAVEL_PAGE'] === '1' || given.includes('--no-open')) return undefined
  if (!hasDisplay(process.platform, process.env)) {
    say('There is no display here: the window is served as a page.')
    return undefined
  }
  const there = electronIn(ELECTRON)
  if (there !== undefined) return there
  say(`Fetching Electron, once and for at most ${FETCH_LIMIT / 60_000} minutes ...`)
  const fetched = await fetchElectron(ELECTRON, FETCH_LIMIT)
  if (fetched === undefined) say('Electron could not be fetched: the window opens in the browser instead.')
  return fetched
}

await start(process.argv.slice(2))
