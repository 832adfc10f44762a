/** Versions of what the record rests on. */
import Database from 'better-sqlite3'
import { newest } from './migrate.ts'
import { MIGRATIONS } from './migrations/chain.ts'

/** Of the record's tables; a newer record is refused. */
export const RECORD_VERSION = newest(MIGRATIONS)

/** Of the SQLite library inside. */
export const sqliteVersion = (): string => {
  const empty = new Database(':memory:')
  try {
    return String(empty.prepare('SELECT sqlite_version()').pluck().get())
  } finally {
    empty.close()
  }
}
