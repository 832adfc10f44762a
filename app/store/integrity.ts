/** What SQLite's own checks, and a comparison with the schema that the migrations make, say of a database. */
import Database from 'better-sqlite3'
import { migrate } from './migrate.ts'
import type { Migration } from './migrations/chain.ts'

/** What the two whole checks say against it; undefined where it is whole. Reads every page. */
export const faultOf = (database: Database.Database): string | undefined => {
  const said = database.pragma('integrity_check', { simple: true })
  if (said !== 'ok') return String(said)
  const strays = database.pragma('foreign_key_check') as readonly unknown[]
  return strays.length > 0 ? `${strays.length} entries belong to nothing` : undefined
}

/** Every table, index and trigger as it stands in the file, by name. */
export const schemaOf = (database: Database.Database): readonly string[] =>
  database
    .prepare<[], string>(
      "SELECT sql FROM sqlite_schema WHERE sql IS NOT NULL AND name NOT LIKE 'sqlite\\_%' ESCAPE '\\' ORDER BY name",
    )
    .pluck()
    .all()

/** The schema that a chain of migrations makes from nothing. */
export const schemaOfChain = (chain: readonly Migration[]): readonly string[] => {
  const empty = new Database(':memory:')
  try {
    migrate(empty, chain)
    return schemaOf(empty)
  } finally {
    empty.close()
  }
}
