/** The program as a page: one desk, one server, and the browser if there is one. Ends soon after its last page. */
import { fileURLToPath } from 'node:url'
import { startDesk } from '../desk/desk.ts'
import { dataFolder } from '../folders.ts'
import { lastingDesk } from '../shell/lasting-desk.ts'
import { openInBrowser, openerFor } from './open.ts'
import { startPage } from './page.ts'

/** The bundle stands in out/main, the built window beside it. */
const WINDOW = fileURLToPath(new URL('../renderer', import.meta.url))

const run = async (): Promise<void> => {
  // Heard to the end: a second signal, as from a terminal and from the starter, must not cut the closing short.
  const stopped = new Promise<void>((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => resolve())
  })
  const data = dataFolder(process.env, process.platform)
  if (!('folder' in data)) {
    process.stderr.write(`longtravel: ${data.message}\n`)
    process.exitCode = 2
    return
  }
  const desk = lastingDesk(() => startDesk({ home: data.folder }))
  const page = await startPage(desk, WINDOW)
  const opener = process.argv.includes('--no-open') ? undefined : openerFor(process.platform, process.env)
  const tidy = opener === undefined ? undefined : openInBrowser(page.newAddress(), opener)
  process.stdout.write(`${page.newAddress()}\n`)
  if (opener !== undefined)
    process.stdout.write('If no window appears, open this address in a browser. It is good once.\n')
  await Promise.race([page.gone, stopped])
  tidy?.()
  await page.close()
  const closed = await desk.close()
  if (!closed.ok) process.stderr.write(`longtravel: the record was not closed: ${closed.error.message}\n`)
  // The waits that are left are for pages that will not come.
  process.exit(closed.ok ? 0 : 3)
}

void run()
