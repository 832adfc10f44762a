/** The record's schema, step by step. A step that was once released is never edited: a change is a new step. */
import type Database from 'better-sqlite3'
import { recordTables } from './0001-record.ts'

/** Takes a record from the version before to its own; runs inside a transaction. */
export interface Migration {
  readonly version: number
  readonly run: (database: Database.Database) => void
}

export const MIGRATIONS: readonly Migration[] = [{ version: 1, run: recordTables }]
