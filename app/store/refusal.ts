/** What SQLite and the system refuse, as errors of the contract that name the file and what to do. */
import Database from 'better-sqlite3'
import { refuse, type CallError, type ErrorKind, type Outcome } from '../../core/contract/errors.ts'
import { reasonOf } from '../command/reason.ts'

/** Runs what may meet a damaged, locked or full disk; what only a programmer can cause is thrown on. */
export const guarded = <T>(file: string, work: () => Outcome<T>): Outcome<T> => {
  try {
    return work()
  } catch (error) {
    return { ok: false, error: refusalOf(error, file) }
  }
}

/** The refusal that an exception stands for. Throws on what is no refusal of SQLite or of the system. */
export const refusalOf = (error: unknown, file: string): CallError => {
  if (error instanceof Database.SqliteError) {
    const found = SQLITE.find(([code]) => error.code === code || error.code.startsWith(`${code}_`))
    if (found === undefined) throw error
    const [, kind, what] = found
    return refuse(kind, `${file}: ${what} (${error.message})`).error
  }
  const code = error instanceof Error && 'code' in error ? error.code : undefined
  const kind = SYSTEM[String(code)] ?? 'disk'
  return refuse(kind, `${file}: ${reasonOf(error)}; ${ADVICE[kind]}`).error
}

/** What to do about a damaged record. */
export const DAMAGED = 'nothing was changed: keep this file and what stands beside it, and put a back-up in its place'

export const ADVICE = {
  place: 'name a folder of this machine by LONGTRAVEL_HOME',
  'no-right': 'give yourself the right to read and write it, or name another folder by LONGTRAVEL_HOME',
  'no-room': 'make room on the disk and try again; what was kept before is safe',
  disk: 'see whether the disk or the network is in order and try again',
} as const

const SQLITE: readonly (readonly [code: string, kind: ErrorKind, what: string])[] = [
  ['SQLITE_NOTADB', 'damaged', `is no database, or its beginning is overwritten; ${DAMAGED}`],
  ['SQLITE_CORRUPT', 'damaged', `is damaged; ${DAMAGED}`],
  ['SQLITE_BUSY', 'locked', 'is locked by another program; close that program and try again'],
  ['SQLITE_LOCKED', 'locked', 'is locked by another program; close that program and try again'],
  ['SQLITE_READONLY', 'no-right', `cannot be written; ${ADVICE['no-right']}`],
  ['SQLITE_PERM', 'no-right', `cannot be used; ${ADVICE['no-right']}`],
  ['SQLITE_CANTOPEN', 'no-right', `cannot be opened; ${ADVICE['no-right']}`],
  ['SQLITE_FULL', 'no-room', `the disk is full; ${ADVICE['no-room']}`],
  ['SQLITE_IOERR', 'disk', `cannot be read or written; ${ADVICE.disk}`],
]

const SYSTEM: Readonly<Record<string, 'no-right' | 'no-room' | 'place'>> = {
  EACCES: 'no-right',
  EPERM: 'no-right',
  EROFS: 'no-right',
  ENOSPC: 'no-room',
  EDQUOT: 'no-room',
  ENOTDIR: 'place',
  EEXIST: 'place',
  ENAMETOOLONG: 'place',
  ELOOP: 'place',
}
