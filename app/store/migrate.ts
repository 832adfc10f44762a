/** Bringing a record from its version to the newest one, step by step. */
import type Database from 'better-sqlite3'
import type { Migration } from './migrations/chain.ts'
import { pragma } from './handle.ts'

/** The version that a chain leads to. Throws where its steps do not count 1, 2, 3 ... */
export const newest = (chain: readonly Migration[]): number => {
  if (chain.some(({ version }, index) => version !== index + 1)) throw new Error('migrations do not count 1, 2, 3')
  return chain.length
}

/** Runs the steps that a record still needs, each in a transaction with its number. Throws what a step throws, then nothing of it stays. */
export const migrate = (database: Database.Database, chain: readonly Migration[]): void => {
  const from = Number(pragma(database, 'user_version'))
  for (const { version, run } of chain.slice(from)) {
    database
      .transaction(() => {
        run(database)
        database.pragma(`user_version = ${version}`)
      })
      .immediate()
  }
}
