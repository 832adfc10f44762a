/** The built window on a loopback page, with a desk on a data folder of its own. */
import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { startDesk } from '../../app/desk/desk.ts'
import { startPage } from '../../app/page/page.ts'
import { isStale } from '../../app/start/stale.ts'
import { lastingDesk } from '../../app/shell/lasting-desk.ts'
import { STANDING_CAUTIONS } from '../../core/review/cautions.ts'

export interface Served {
  /** Good for one page. */
  readonly newAddress: () => string
  readonly close: () => Promise<void>
}

/** Where a build leaves the window. */
export const BUILT = join(import.meta.dirname, '../../out/renderer')

/** Serves it to users who have read the cautions. */
export const serveWindow = async (built: string): Promise<Served> => {
  const home = newFolder()
  const desk = lastingDesk(() => startDesk({ home: home.folder }))
  const read = await desk.ask('settings.set', { name: 'window.cautions', value: STANDING_CAUTIONS })
  if (!read.ok) throw new Error(read.error.message)
  const page = await startPage(desk, built)
  return {
    newAddress: page.newAddress,
    close: async () => {
      await page.close()
      await desk.close()
      home.remove()
    },
  }
}

export const newFolder = () => {
  const folder = mkdtempSync(join(tmpdir(), 'longtravel-window-'))
  return { folder, remove: () => rmSync(folder, { recursive: true, force: true }) }
}

/** Builds the window if what stands in out/ is not what would be built now. */
export const buildIfStale = (): void => {
  if (!isStale()) return
  const built = spawnSync(process.execPath, [join(import.meta.dirname, '../../app/build.ts')], { encoding: 'utf8' })
  if (built.status !== 0) throw new Error(`The window cannot be built:\n${built.stdout}${built.stderr}`)
}
