/** A folder that goes with its test, and a record in it. */
import { mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'
import type { WriteCalls } from '../../app/store/calls.ts'
import { openForWriting, RECORD_FILE, type Opened } from '../../app/store/open.ts'
import type { Migration } from '../../app/store/migrations/chain.ts'
import type { Outcome } from '../../core/contract/errors.ts'

export const newFolder = (): string => {
  const folder = mkdtempSync(join(tmpdir(), 'longtravel-record-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }))
  return folder
}

export const newFile = (): string => join(newFolder(), RECORD_FILE)

/** What an outcome brings; the test fails where it is an error. */
export const valueOf = <T>(outcome: Outcome<T>): T => {
  if (!outcome.ok) throw new Error(`${outcome.error.kind}: ${outcome.error.message}`)
  return outcome.value
}

/** The kind of an error and its message; the test fails where there is none. */
export const errorOf = (outcome: Outcome<unknown>) => {
  if (outcome.ok) throw new Error(`no error, but ${JSON.stringify(outcome.value)}`)
  return outcome.error
}

/** Opens to write and closes when the test is over. */
export const opened = async (file: string, chain?: readonly Migration[]): Promise<Opened<WriteCalls>> => {
  const store = valueOf(await openForWriting(file, chain))
  onTestFinished(() => void store.close())
  return store
}

/** Every file of a folder with its bytes, but the writer's lock, which holds none, and the memory that readers share. */
export const bytesIn = (folder: string): ReadonlyMap<string, string> =>
  new Map(
    readdirSync(folder)
      .filter((name) => !/-(?:writer|shm)$/.test(name))
      .map((name) => [name, readFileSync(join(folder, name)).toString('base64')]),
  )
