/** A connection to the record with its settings, set and read back. A handle that may write is another type than one that reads. */
import Database from 'better-sqlite3'

declare const reads: unique symbol
declare const writes: unique symbol

export type ReadableDatabase = Database.Database & { readonly [reads]: true }
export type WritableDatabase = ReadableDatabase & { readonly [writes]: true }

/** "Ltvg" in ASCII, in the header of every record: it tells a record from another program's database. */
export const APPLICATION_ID = 0x4c747667

/** Milliseconds that a statement waits for another process. */
const BUSY_TIMEOUT = 5000

export type Settings = Readonly<Record<string, string | number>>

/**
 * On every connection. `synchronous` 2 is FULL: what was acknowledged is on the disk. `recursive_triggers` lets the triggers that
 * protect revisions see a REPLACE as well; `fullfsync` is macOS's way to reach the disk itself.
 */
const ON_EVERY_OPEN: Settings = {
  synchronous: 2,
  foreign_keys: 1,
  trusted_schema: 0,
  cell_size_check: 1,
  recursive_triggers: 1,
  fullfsync: 1,
  checkpoint_fullfsync: 1,
  busy_timeout: BUSY_TIMEOUT,
}

/** What an open handle's settings must read back as; `query_only` on handles that only read. */
export const expectedSettings = (version: number, access: 'read' | 'write'): Settings => ({
  journal_mode: 'wal',
  ...ON_EVERY_OPEN,
  query_only: access === 'read' ? 1 : 0,
  application_id: APPLICATION_ID,
  user_version: version,
})

/** Connects without a right to write; nothing is set yet. Throws what the library throws. */
export const connectToRead = (file: string, timeout = BUSY_TIMEOUT): Database.Database =>
  new Database(file, { readonly: true, fileMustExist: true, timeout })

/** Connects with the right to write; `make` a new file or take one that is there. Throws what the library throws. */
export const connectToWrite = (file: string): Database.Database =>
  new Database(file, { fileMustExist: true, timeout: BUSY_TIMEOUT })

export const connectToMake = (file: string): Database.Database => new Database(file, { timeout: BUSY_TIMEOUT })

/** Sets what is set on a handle that writes. The journal comes first: a change of it may set `synchronous` anew. */
export const setToWrite = (database: Database.Database): WritableDatabase => {
  database.pragma('journal_mode = WAL')
  set(database, { ...ON_EVERY_OPEN, query_only: 0 })
  return database as WritableDatabase
}

export const setToRead = (database: Database.Database): ReadableDatabase => {
  set(database, { ...ON_EVERY_OPEN, query_only: 1 })
  return database as ReadableDatabase
}

/** The settings read back, or the first that is not what it must be: a build may know another default or none at all. */
export const settingsOf = (
  database: ReadableDatabase,
  expected: Settings,
): { readonly ok: true; readonly settings: Settings } | { readonly ok: false; readonly message: string } => {
  const settings: Record<string, string | number> = {}
  for (const [name, wanted] of Object.entries(expected)) {
    const found = pragma(database, name)
    if (found !== wanted) return { ok: false, message: `${name} is ${String(found)} and must be ${wanted}` }
    settings[name] = wanted
  }
  return { ok: true, settings }
}

/** One value of a PRAGMA. */
export const pragma = (database: Database.Database, source: string): unknown =>
  database.pragma(source, { simple: true })

const set = (database: Database.Database, settings: Settings): void => {
  for (const [name, value] of Object.entries(settings)) database.pragma(`${name} = ${value}`)
}
