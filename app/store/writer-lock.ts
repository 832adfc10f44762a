/** One writer at a time, among all processes: a lock that the system itself takes back when its holder dies. */
import Database from 'better-sqlite3'

/** A connection that nothing refers to is closed by the garbage collector, and its lock would go with it. */
const held = new Set<Database.Database>()

export interface WriterLock {
  readonly release: () => void
}

/**
 * Takes the right to write to a record, or gives undefined where another holds it. It is SQLite's own lock on an empty file beside
 * the record, held as long as the connection lives, so that it works wherever SQLite does and dies with its process. The
 * file stays: to remove it while another process is about to lock it would let two of them in. Throws what the library throws.
 */
export const takeWriterLock = (record: string): WriterLock | undefined => {
  const lock = new Database(`${record}-writer`, { timeout: 0 })
  try {
    // Nothing is ever written, so nothing needs a journal beside it.
    lock.pragma('journal_mode = MEMORY')
    lock.exec('BEGIN EXCLUSIVE')
    held.add(lock)
    const release = () => {
      held.delete(lock)
      lock.close()
    }
    return { release }
  } catch (error) {
    lock.close()
    if (error instanceof Database.SqliteError && error.code.startsWith('SQLITE_BUSY')) return undefined
    throw error
  }
}
