/** `longtravel evidence`: every outside check with its printed and its computed value, and the clauses covered on demand. */
import { evidence as outsideChecks } from '../../core/evidence/evidence.ts'
import type { EvidenceResult } from '../../core/evidence/types.ts'
import { writeNumber } from '../../core/quantity/write.ts'
// Clauses enter the coverage list when the rules that use them are loaded.
import '../../core/review/review.ts'
import { coverage, type Coverage } from '../../core/sources/coverage.ts'
import { EXIT, type Io } from './exit.ts'
import { columns, printable, wrap } from './text.ts'

/** Runs the command and gives the exit code: 0 where every check is within its tolerance. */
export const evidence = (withCoverage: boolean, io: Io): number => {
  const results = outsideChecks()
  io.stdout(printable(evidenceTable(results)))
  if (withCoverage) io.stdout(printable(coverageTable(coverage())))
  return results.every(({ within }) => within) ? EXIT.holds : EXIT.fails
}

/** The checks, each with its source below it, and how many are within their tolerance. */
export const evidenceTable = (results: readonly EvidenceResult[]): string => {
  const heading = ['', 'Printed', 'Computed', 'Difference', 'Tolerance', 'Unit', 'Outside check']
  const rows = results.map(({ within, what, printed, computed, difference, tolerance, unit }) => [
    within ? 'within' : 'OUTSIDE',
    writeNumber(printed, 12),
    writeNumber(computed, 7),
    differenceText(difference, printed),
    writeNumber(tolerance, 3),
    unit,
    what,
  ])
  const [first = '', ...lines] = columns([heading, ...rows], [1, 2, 3, 4])
  const outside = results.filter(({ within }) => !within).length
  const verdict = outside === 0 ? 'all within tolerance' : `${outside} OUTSIDE tolerance`
  return `${[
    first,
    ...lines.flatMap((line, index) => [line, ...sourceOf(results[index]!)]),
    '',
    `Outside checks: ${results.length}, ${verdict}`,
  ].join('\n')}\n`
}

/** What the arithmetic rounds off is no difference. */
const differenceText = (difference: number, printed: number): string =>
  Math.abs(difference) <= 1e-12 * Math.abs(printed) ? '0' : writeNumber(difference, 2)

const sourceOf = ({ id, source, known, why }: EvidenceResult): readonly string[] =>
  wrap(`${id}: ${source} (${known})${why === undefined ? '' : `; ${why}`}`, 4)

/** The clauses by document: used, or left out with the reason. */
const coverageTable = (clauses: readonly Coverage[]): string => {
  const lines = clauses.flatMap((entry, index) => [
    ...(entry.document === clauses[index - 1]?.document ? [] : ['', entry.document]),
    ...wrap(
      entry.status === 'used'
        ? `${entry.clause}: used`
        : `${entry.clause}: ${entry.status === 'not-covered' ? 'not covered' : 'not applicable'}, ${entry.reason}`,
      2,
    ),
  ])
  return `${['', 'Clauses', ...lines].join('\n')}\n`
}
