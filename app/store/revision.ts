/** A revision's row and the hash that proves it whole. */
import type { RevisionSummary } from '../../core/contract/record.ts'
import { digest } from '../../core/job/fingerprint.ts'

/** As the table has it, without id and hash. */
export interface RevisionRow {
  readonly job: number
  readonly sequence: number
  readonly label: string
  readonly purpose: string
  readonly author: string
  readonly checker: string
  readonly date: string
  readonly note: string
  readonly text: string
  readonly result: string
  readonly program: string
  readonly fingerprint: string
}

/** SHA-256 over every column but id and hash: JSON keeps the columns apart. */
export const hashOf = (row: RevisionRow): string => digest(JSON.stringify(COLUMNS.map((column) => row[column])))

/** What a list shows of it. */
export const summaryOf = (id: number, row: RevisionRow): RevisionSummary => ({
  id,
  job: row.job,
  sequence: row.sequence,
  label: row.label,
  purpose: row.purpose,
  author: row.author,
  checker: row.checker,
  date: row.date,
  program: row.program,
  fingerprint: row.fingerprint,
})

/** In the order in which they are hashed, which never changes. */
export const COLUMNS = [
  'job',
  'sequence',
  'label',
  'purpose',
  'author',
  'checker',
  'date',
  'note',
  'text',
  'result',
  'program',
  'fingerprint',
] as const satisfies readonly (keyof RevisionRow)[]
