/** The program as built, for tests that need it: built once, by the first that asks, when it is stale. */
import { execFile } from 'node:child_process'
import { mkdirSync, rmdirSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { promisify } from 'node:util'
import { isStale } from '../../app/start/stale.ts'

const PROJECT = join(import.meta.dirname, '../..')
const LOCK = join(PROJECT, '.reports/building')

/** A build takes some seconds; a lock that is older was left by a run that was stopped. */
const LONGEST_BUILD = 60_000

/** Builds into out/ unless it is up to date. Test files run side by side: one builds and the others wait for it. */
export const built = async (): Promise<void> => {
  mkdirSync(join(PROJECT, '.reports'), { recursive: true })
  while (!locked()) await pause(100)
  try {
    if (isStale()) await promisify(execFile)(process.execPath, ['app/build.ts'], { cwd: PROJECT })
  } finally {
    rmdirSync(LOCK)
  }
}

const locked = (): boolean => {
  try {
    mkdirSync(LOCK)
    return true
  } catch {
    const age = Date.now() - (statSync(LOCK, { throwIfNoEntry: false })?.mtimeMs ?? Date.now())
    if (age > LONGEST_BUILD) rmdirSync(LOCK)
    return false
  }
}
