/** The last line of .ci/run: what vitest's report counted, or one failure where no test could be counted. */
import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, expect, it } from 'vitest'

const folder = mkdtempSync(join(tmpdir(), 'longtravel-count-'))
afterAll(() => {
  rmSync(folder, { recursive: true })
})

it.each([
  ['all well', { numPassedTests: 7, numFailedTests: 0 }, 0, '7 passed, 0 failed', 0],
  ['tests failed', { numPassedTests: 5, numFailedTests: 2 }, 1, '5 passed, 2 failed', 1],
  ['a test file did not load', { numPassedTests: 7, numFailedTests: 0 }, 1, '7 passed, 1 failed', 1],
  ['an earlier step failed', undefined, 1, '0 passed, 1 failed', 1],
  ['nothing ran', undefined, 0, '0 passed, 1 failed', 1],
])('%s', (name, report, status, line, exit) => {
  const path = join(folder, `${name}.json`)
  if (report !== undefined) writeFileSync(path, JSON.stringify(report))
  const script = fileURLToPath(new URL('count.mjs', import.meta.url))
  const ended = spawnSync(process.execPath, [script, path, String(status)], { encoding: 'utf8' })
  expect([ended.stdout, ended.status]).toEqual([`${line}\n`, exit])
})
