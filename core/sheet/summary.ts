/** First on the sheet: every check with its utilisation, what fails, what is not covered. */
import type { UnitSystem } from '../quantity/kinds.ts'
import { writeUtilisation } from '../quantity/write.ts'
import { sectionName } from '../section/name.ts'
import { citation } from '../sources/clause.ts'
import type { Check, Review } from '../review/types.ts'
import { heading, left, plain, right, shown } from './block.ts'
import type { Block, Cell } from './types.ts'

const WORD: Readonly<Record<Check['status'], string>> = {
  holds: 'holds',
  fails: 'fails',
  'not-covered': 'not covered',
  'not-applicable': 'not applicable',
}

export function summaryPart(review: Review, units: UnitSystem, number: string): readonly Block[] {
  const { checks, job } = review
  const judged = checks
    .filter((check) => check.status === 'holds' || check.status === 'fails')
    .sort((a, b) => (b.utilisation ?? Infinity) - (a.utilisation ?? Infinity))
  const open = checks.filter((check) => check.status === 'not-covered')
  const idle = checks.filter((check) => check.status === 'not-applicable')
  const row = (check: Check): readonly Cell[] => [
    check.title,
    citation(check.clause),
    check.demand === undefined
      ? (check.why ?? '')
      : `${shown(check.demand, units)} of ${shown(check.resistance, units)}`,
    { utilisation: check.utilisation ?? null, word: WORD[check.status] },
  ]
  const blocks: Block[] = [
    heading(1, number, 'Summary of checks'),
    plain(`${sectionName(job.girder.section, units)}, ${job.girder.steel.name}. ${verdict(review)}`),
    {
      block: 'table',
      columns: [left('Check', 30), left('Clause', 21), right('Demand of resistance', 28), right('Utilisation', 21)],
      rows: judged.map(row),
    },
  ]
  if (open.length > 0) {
    blocks.push(heading(2, `${number}.1`, 'Owed and not covered'), reasons(open))
  }
  if (idle.length > 0) {
    blocks.push(heading(2, `${number}.${open.length > 0 ? 2 : 1}`, 'Not applicable'), reasons(idle))
  }
  return blocks
}

const reasons = (checks: readonly Check[]): Block => ({
  block: 'table',
  columns: [left('Check', 30), left('Clause', 21), left('Reason', 49)],
  rows: checks.map((check) => [check.title, citation(check.clause), check.why ?? '']),
})

function verdict({ checks, governing, complete }: Review): string {
  const failing = checks.filter((check) => check.status === 'fails')
  const open = checks.filter((check) => check.status === 'not-covered').length
  const worst = checks.find((check) => check.id === governing)
  const governs = worst === undefined ? '' : ` ${worst.title} governs with ${writeUtilisation(worst.utilisation!)}.`
  const rest = complete
    ? ''
    : ` ${open} that ${open === 1 ? 'is' : 'are'} owed ${open === 1 ? 'is' : 'are'} not covered.`
  if (failing.length === 0) return `No check made fails.${governs}${rest}`
  return `${failing.length} ${failing.length === 1 ? 'check fails' : 'checks fail'}.${governs}${rest}`
}
