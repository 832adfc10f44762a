/** Comma-separated values as RFC 4180 writes them: CRLF, quotes doubled. Figures are SI, as in the result file. */
import { as } from '../../core/quantity/kinds.ts'
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

/** Points per span at which the envelope is tabulated: both ends and 39 between. */
const PARTS = 40

/** Greatest and least moment (N m) and shear (N) of the static wheel loads along every span; stations in m along the runway. */
export const envelopeCsv = ({ job, trains }: Review): string => {
  const { spans, continuity } = job.runway
  const starts = spans.map((_, span) => spans.slice(0, span).reduce((sum, length) => sum + length, 0))
  const rows = spans.flatMap((length, span) => {
    const stations = Array.from({ length: PARTS + 1 }, (_, i) => as('distance', starts[span]! + (length * i) / PARTS))
    return envelopeCurve({ continuity, spans }, span, trains, stations).map(({ station, moment, shear }) => [
      span,
      station,
      ...[moment.max, moment.min, shear.max, shear.min].map(withoutNoise),
    ])
  })
  return csv([['span', 'station', 'momentMax', 'momentMin', 'shearMax', 'shearMin'], ...rows])
}

/** To a millionth of a newton or newton metre: what lies below is the rounding of the arithmetic, and 0 should read 0. */
const withoutNoise = (value: number): number => Math.round(value * 1e6) / 1e6 + 0

const cell = (value: Cell): string => {
  if (value === null) return ''
  if (typeof value === 'number') return String(value)
  const safe = /^(\s*[=+\-@]|[\t\r\n])/.test(value) ? `'${value}` : value
  return /[",\r\n]|^\s|\s$/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
