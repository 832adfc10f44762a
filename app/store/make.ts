/** A new, empty record: made under another name and then renamed, so that a record is whole or is not there. */
import { rename, rm } from 'node:fs/promises'
import { dirname } from 'node:path'
import { folderToDisk, toDisk } from './backup.ts'
import { APPLICATION_ID, connectToMake, setToWrite } from './handle.ts'
import { migrate } from './migrate.ts'
import type { Migration } from './migrations/chain.ts'

/** Only for the holder of the writer lock, where no record stands. Throws what the library and the system throw. */
export const makeRecord = async (file: string, chain: readonly Migration[]): Promise<void> => {
  const temporary = `${file}.new`
  // What a process left that was killed here.
  await Promise.all(['', '-wal', '-shm', '-journal'].map((end) => rm(`${temporary}${end}`, { force: true })))
  const database = connectToMake(temporary)
  try {
    database.pragma(`application_id = ${APPLICATION_ID}`)
    setToWrite(database)
    migrate(database, chain)
    database.pragma('wal_checkpoint(TRUNCATE)')
  } finally {
    database.close()
  }
  await toDisk(temporary)
  await rename(temporary, file)
  await folderToDisk(dirname(file))
}
