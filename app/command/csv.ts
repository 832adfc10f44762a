/** Comma-separated values as RFC 4180 writes them: CRLF, quotes doubled. Figures are SI, as in the result file. */
import type { Result } from '../../core/review/result.ts'
import type { Review } from '../../core/review/types.ts'
import { envelopeCurve } from '../../core/travel/envelope.ts'

/** A cell: text, a number in SI, or nothing. */
export type Cell = string | number | null

/**
 * Rows as one text, the first row being the heading. Text that a spreadsheet would run as a formula is written with an
 * apostrophe before it; numbers are never touched.
 */
export const csv = (rows: readonly (readonly Cell[])[]): string =>
  rows.map((row) => `${row.map(cell).join(',')}\r\n`).join('')

const CHECKS = ['id', 'title', 'clause', 'status', 'demand', 'unit', 'resistance', 'utilisation', 'combination', 'set']

/** The checks of a result, one a row. */
export const checksCsv = (result: Result): string =>
  csv([
    CHECKS,
    ...result.checks.map(({ id, title, clause, status, demand, resistance, utilisation, combination, set }) => [
      id,
      title,
      clause,
      status,
      demand?.value ?? null,
      demand?.unit ?? null,
      resistance?.value ?? null,
      utilisation,
      combination,
      set,
    ]),
  ])

const cell = (value: Cell): string => {
  if (value === null) return ''
  if (typeof value === 'number') return String(value)
  const safe = /^(\s*[=+\-@]|[\t\r\n])/.test(value) ? `'${value}` : value
  return /[",\r\n]|^\s|\s$/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
