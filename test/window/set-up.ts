/** Before the tests of the window: builds it if what stands in out/ is stale, and starts one browser for all of them. */
import { cpSync } from 'node:fs'
import type { TestProject } from 'vitest/node'
import { startBrowser } from './browser.ts'
import { BUILT, buildIfStale, newFolder } from './serve.ts'

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
