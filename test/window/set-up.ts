/** Before the tests of the window: builds it if what stands in out/ is stale, and starts one browser for all of them. */
import { spawnSync } from 'node:child_process'
import { cpSync } from 'node:fs'
import { join } from 'node:path'
import type { TestProject } from 'vitest/node'
import { isStale } from '../../app/start/stale.ts'
import { startBrowser } from './browser.ts'
import { BUILT, newFolder } from './serve.ts'

declare module 'vitest' {
  interface ProvidedContext {
    /** Where the browser is connected to; empty where there is none. */
    readonly browser: string
    /** The built window, in a copy that no later build disturbs. */
    readonly built: string
  }
}

export default async function setUp(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const browser = await startBrowser()
  if ('why' in browser) {
    console.warn(`The tests of the window are skipped: ${browser.why}.`)
    project.provide('browser', '')
    project.provide('built', '')
    return undefined
  }
  buildIfStale()
  const built = newFolder()
  cpSync(BUILT, built.folder, { recursive: true })
  project.provide('built', built.folder)
  project.provide('browser', browser.wsEndpoint())
  return async () => {
    await browser.close()
    built.remove()
  }
}

const buildIfStale = (): void => {
  if (!isStale()) return
  const built = spawnSync(process.execPath, [join(import.meta.dirname, '../../app/build.ts')], { encoding: 'utf8' })
  if (built.status !== 0) throw new Error(`The window cannot be built:\n${built.stdout}${built.stderr}`)
}
