/** A copy of the record as it stands, proven before it counts. */
import type Database from 'better-sqlite3'
import { open, rename, rm } from 'node:fs/promises'
import { dirname } from 'node:path'
import { refuse, done, type Outcome } from '../../core/contract/errors.ts'
import { connectToRead } from './handle.ts'
import { faultOf } from './integrity.ts'
import { refusalOf } from './refusal.ts'

/**
 * Copies the open record to `target` by the online back-up of SQLite: to a temporary name first, then both checks on the copy, then
 * to the disk, then the rename. A copy that fails a check is removed, and a former `target` stands.
 */
export const backUp = async (database: Database.Database, target: string): Promise<Outcome<null>> => {
  const temporary = `${target}.new`
  try {
    await rm(temporary, { force: true })
    await database.backup(temporary)
    const fault = faultOfFile(temporary)
    if (fault !== undefined) return refuse('damaged', `${database.name}: its back-up does not hold: ${fault}`)
    await toDisk(temporary)
    await rename(temporary, target)
    await folderToDisk(dirname(target))
    return done(null)
  } catch (error) {
    return { ok: false, error: refusalOf(error, target) }
  } finally {
    await Promise.all(['', '-wal', '-shm', '-journal'].map((end) => rm(`${temporary}${end}`, { force: true })))
  }
}

/** What the checks say against a file that nobody has open; undefined where it is whole. */
const faultOfFile = (file: string): string | undefined => {
  const copy = connectToRead(file)
  try {
    return faultOf(copy)
  } finally {
    copy.close()
  }
}

/** Everything of a file on the disk before this returns. */
export const toDisk = async (file: string): Promise<void> => {
  const handle = await open(file, 'r+')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

/** A rename is on the disk once its folder is. Windows has no such call and needs none. */
export const folderToDisk = async (folder: string): Promise<void> => {
  if (process.platform === 'win32') return
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}
