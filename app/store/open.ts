/** Opening the record: proven to be one, whole and of this version, or left as it is and refused by name. */
import type Database from 'better-sqlite3'
import { access, constants, mkdir, realpath, stat } from 'node:fs/promises'
import { existsSync } from 'node:fs'
import { dirname, join, basename, resolve } from 'node:path'
import { done, refuse, type CallError, type Outcome } from '../../core/contract/errors.ts'
import { backUp } from './backup.ts'
import type { ReadCalls, WriteCalls } from './calls.ts'
import {
  APPLICATION_ID,
  connectToRead,
  connectToWrite,
  expectedSettings,
  pragma,
  setToRead,
  setToWrite,
  settingsOf,
  type ReadableDatabase,
  type Settings,
} from './handle.ts'
import { schemaOf, schemaOfChain } from './integrity.ts'
import { makeRecord } from './make.ts'
import { migrate, newest } from './migrate.ts'
import { MIGRATIONS, type Migration } from './migrations/chain.ts'
import { placeCautions, type PlaceCaution } from './place.ts'
import { readCalls } from './reading.ts'
import { ADVICE, DAMAGED, guarded, refusalOf } from './refusal.ts'
import { takeWriterLock } from './writer-lock.ts'
import { writeCalls } from './writing.ts'

/** The record's file in the data folder. */
export const RECORD_FILE = 'record.sqlite'

export interface Opened<Calls> {
  readonly calls: Calls
  /** As they were read back from this connection. */
  readonly settings: Settings
  readonly cautions: readonly PlaceCaution[]
  /** A writer brings the write-ahead log into the file first. No call may follow. */
  readonly close: () => Outcome<null>
}

/** Milliseconds that opening waits for a file that another program has locked. */
const OPEN_TIMEOUT = 1000

/**
 * Opens the record to read and write, as the only one of all processes that writes; makes it where it is missing, and brings an
 * older one up after a back-up beside it. `in-use` where another writes: it can still be opened for reading.
 */
export const openForWriting = async (
  given: string,
  chain: readonly Migration[] = MIGRATIONS,
): Promise<Outcome<Opened<WriteCalls>>> => {
  let file = resolve(given)
  const held: { release: () => void }[] = []
  const release = () =>
    held
      .splice(0)
      .reverse()
      .forEach((each) => each.release())
  const failed = (error: CallError): { ok: false; error: CallError } => {
    release()
    return { ok: false, error }
  }
  try {
    await mkdir(dirname(file), { recursive: true, mode: 0o700 })
    file = await trueOf(file)
    const unfit = await unfitToOpen(file, constants.R_OK | constants.W_OK)
    if (unfit !== undefined && unfit.kind !== 'not-found') return failed(unfit)
    const lock = takeWriterLock(file)
    if (lock === undefined) return failed(inUse(file))
    held.push(lock)

    // Asked again under the lock: another process may have made it meanwhile.
    if (!existsSync(file)) await makeRecord(file, chain)
    const version = versionOf(file, chain)
    if (!version.ok) return failed(version.error)
    const database = connectToWrite(file)
    held.push({ release: () => database.close() })
    const writable = setToWrite(database)
    if (version.value < newest(chain)) {
      const raised = await raise(database, version.value, chain)
      if (!raised.ok) return failed(raised.error)
    }
    const settings = settingsOf(writable, expectedSettings(newest(chain), 'write'))
    if (!settings.ok) return failed(unset(file, settings.message))
    const schema = schemaFault(writable, chain)
    if (schema !== undefined) return failed(schema)
    const close = () =>
      guarded(file, () => {
        try {
          if (database.open) database.pragma('wal_checkpoint(TRUNCATE)')
          return done(null)
        } finally {
          release()
        }
      })
    return done({
      calls: writeCalls(writable),
      settings: settings.settings,
      cautions: placeCautions(dirname(file)),
      close,
    })
  } catch (error) {
    release()
    return { ok: false, error: refusalOf(error, file) }
  }
}

/** Opens a record that is there to read it, also while another process writes. An older one is refused: only a writer brings it up. */
export const openForReading = async (
  given: string,
  chain: readonly Migration[] = MIGRATIONS,
): Promise<Outcome<Opened<ReadCalls>>> => {
  let file = resolve(given)
  let database: Database.Database | undefined
  const failed = (error: CallError): { ok: false; error: CallError } => {
    database?.close()
    return { ok: false, error }
  }
  try {
    file = await trueOf(file)
    const unfit = await unfitToOpen(file, constants.R_OK)
    if (unfit !== undefined) return failed(unfit)
    database = connectToRead(file, OPEN_TIMEOUT)
    const opened = database
    const version = proven(opened, chain)
    if (!version.ok) return failed(version.error)
    if (version.value < newest(chain)) return failed(older(file, version.value, newest(chain)))
    const readable = setToRead(opened)
    const settings = settingsOf(readable, expectedSettings(newest(chain), 'read'))
    if (!settings.ok) return failed(unset(file, settings.message))
    const schema = schemaFault(readable, chain)
    if (schema !== undefined) return failed(schema)
    const close = () =>
      guarded(file, () => {
        opened.close()
        return done(null)
      })
    return done({
      calls: readCalls(readable),
      settings: settings.settings,
      cautions: placeCautions(dirname(file)),
      close,
    })
  } catch (error) {
    return failed(refusalOf(error, file))
  }
}

/** Where a path leads: links followed, the file itself allowed to be missing. */
const trueOf = async (file: string): Promise<string> => {
  const parent = async () => join(await realpath(dirname(file)).catch(() => dirname(file)), basename(file))
  return realpath(file).catch(parent)
}

/** What can be said against a file without opening it; `not-found` where there is none and one could be made. */
const unfitToOpen = async (file: string, rights: number): Promise<CallError | undefined> => {
  const found = await stat(file).catch((error: unknown) => {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return undefined
    throw error
  })
  if (found === undefined) {
    const left = ['-wal', '-journal'].map((end) => `${file}${end}`).filter((path) => existsSync(path))
    // SQLite would take the log of the lost file for that of the new one.
    if (left.length > 0)
      return refuse('damaged', `${file}: is missing, while ${left.join(', ')} still stands; ${DAMAGED}`).error
    return refuse('not-found', `${file}: there is no record yet`).error
  }
  if (found.isDirectory()) return refuse('place', `${file}: is a folder; the record is a file. ${MOVE}`).error
  if (!found.isFile()) return refuse('place', `${file}: is not a plain file. ${MOVE}`).error
  // A record is made whole and then renamed, so that none is ever empty by itself; SQLite would make an empty one anew.
  if (found.size === 0) return refuse('damaged', `${file}: is empty; ${DAMAGED}`).error
  await access(file, rights)
  return undefined
}

/** The version of the record in a file, or why it is not used. The file is opened for reading only and closed again. */
const versionOf = (file: string, chain: readonly Migration[]): Outcome<number> => {
  const database = connectToRead(file, OPEN_TIMEOUT)
  try {
    return proven(database, chain)
  } finally {
    database.close()
  }
}

/** Ours, not newer, and whole as far as the quick check reads. */
const proven = (database: Database.Database, chain: readonly Migration[]): Outcome<number> => {
  const file = database.name
  const owner = pragma(database, 'application_id')
  if (owner !== APPLICATION_ID)
    return refuse('foreign', `${file}: belongs to another program; it was left as it is. ${MOVE}`)
  const version = Number(pragma(database, 'user_version'))
  if (version > newest(chain))
    return refuse(
      'newer',
      `${file}: was written by a newer program: version ${version}, this one keeps ${newest(chain)}; it was left as it is. Open it with the newer program`,
    )
  const said = pragma(database, 'quick_check(1)')
  if (said !== 'ok' || version < 1) return refuse('damaged', `${file}: is damaged (${String(said)}); ${DAMAGED}`)
  return done(version)
}

/** Brings an older record up, after a back-up beside it. Where a step fails the record stays at the step before. */
const raise = async (
  database: Database.Database,
  version: number,
  chain: readonly Migration[],
): Promise<Outcome<null>> => {
  const copy = `${database.name}.before-version-${version + 1}`
  const backedUp = await backUp(database, copy)
  if (!backedUp.ok) return backedUp
  migrate(database, chain)
  return done(null)
}

const schemaFault = (database: ReadableDatabase, chain: readonly Migration[]): CallError | undefined => {
  const expected = schemaOfChain(chain)
  const found = schemaOf(database)
  if (found.length === expected.length && found.every((sql, index) => sql === expected[index])) return undefined
  return refuse(
    'damaged',
    `${database.name}: its tables are not those of a record of version ${newest(chain)}; ${DAMAGED}`,
  ).error
}

const MOVE = `To keep the record elsewhere, ${ADVICE.place}`

const inUse = (file: string): CallError =>
  refuse(
    'in-use',
    `${file}: another Longtravel has it open and writes to it; it can be read here. Close the other to write`,
  ).error

const older = (file: string, version: number, wanted: number): CallError =>
  refuse(
    'in-use',
    `${file}: is of the older version ${version}, this program keeps ${wanted}; it is brought up when it is opened for writing and no other has it open`,
  ).error

const unset = (file: string, message: string): CallError =>
  refuse('place', `${file}: the database cannot be set as it must be where it lies: ${message}. ${MOVE}`).error
