/** A review on a screen of plain text: the checks, worst first, what is not covered, the cautions. */
import { writeFeetInches, writeQuantity, writeUtilisation } from '../../core/quantity/write.ts'
import { as, type Quantity, type UnitSystem } from '../../core/quantity/kinds.ts'
import { STANDING_CAUTIONS } from '../../core/review/cautions.ts'
import type { Check, Place, Review } from '../../core/review/types.ts'
import { sectionName } from '../../core/section/name.ts'
import { citation } from '../../core/sources/clause.ts'
import type { Extreme } from '../../core/travel/types.ts'
import { columns, printable, wrap } from './text.ts'

/** The screen's text, in the job's own unit system, ending with a line break. */
export const reviewTable = (review: Review): string => {
  const judged = review.checks.filter(({ utilisation }) => utilisation !== undefined)
  const open = review.checks.filter(({ utilisation }) => utilisation === undefined)
  return printable(
    [
      ...heading(review),
      '',
      ...checkLines(judged, review),
      ...reasons('Not covered: check these by other means', open, 'not-covered'),
      ...reasons('Not applicable', open, 'not-applicable'),
      ...reasons('Further', open, 'holds', 'fails'),
      '',
      ...list('Cautions', review.cautions),
      '',
      ...list('Always', STANDING_CAUTIONS),
      '',
      ...list('Editions', review.editions),
      '',
      ...wrap(verdict(review), 0),
    ].join('\n') + '\n',
  )
}

const heading = ({ program, job }: Review): readonly string[] => [
  ...wrap([job.project.title, job.project.subject ?? ''].filter((text) => text !== '').join(': '), 0),
  ...wrap(`${sectionName(job.girder.section, job.units)}, ${spansText(job.runway.spans, job.units)}`, 0),
  `${job.basis.standard.toUpperCase()} rules, ${job.basis.method}; fingerprint ${job.fingerprint.slice(0, 12)}; longtravel ${program}`,
]

const spansText = (spans: readonly number[], units: UnitSystem): string =>
  `${spans.length === 1 ? 'span' : 'spans'} ${spans.map((span) => station(span, units)).join(', ')}`

const checkLines = (checks: readonly Check[], { job }: Review): readonly string[] => {
  const sorted = [...checks].sort((a, b) => (b.utilisation ?? 0) - (a.utilisation ?? 0))
  const rows = sorted.map((check) => [
    check.title,
    citation(check.clause),
    comparison(check, job.units),
    writeUtilisation(check.utilisation ?? 0),
    WORD[check.status],
  ])
  const lines = columns([['Check', 'Clause', 'Demand of resistance', 'Utilisation', ''], ...rows], [3])
  return lines.flatMap((line, index) => {
    const check = sorted[index - 1]
    const place = check === undefined ? '' : placeText(check, job.runway.spans.length, job.units)
    return place === '' ? [line] : [line, ...wrap(place, 4)]
  })
}

const WORD = {
  holds: 'holds',
  fails: 'FAILS',
  'not-applicable': 'not applicable',
  'not-covered': 'not covered',
} as const

const comparison = ({ demand, resistance }: Check, units: UnitSystem): string => {
  if (demand === undefined || resistance === undefined) return ''
  const [left, right] = [writeQuantity(demand, units), writeQuantity(resistance, units)]
  const unit = /[^\d.,]*$/.exec(right)?.[0] ?? ''
  return unit !== '' && left.endsWith(unit) ? `${left.slice(0, -unit.length)} of ${right}` : `${left} of ${right}`
}

/** Rounded up where the check fails, so that a failure never reads as 1.000. */

const placeText = ({ at, combination, set }: Place, spans: number, units: UnitSystem): string =>
  [at === undefined ? '' : stand(at, spans, units), combination ?? '', set ?? '']
    .filter((part) => part !== '')
    .join('; ')

const SIDE = { left: 'just left of ', right: 'just right of ', at: '' } as const

const stand = ({ span, station: at, side }: Extreme, spans: number, units: UnitSystem): string =>
  `at ${SIDE[side]}${station(at, units)}${spans === 1 ? '' : ` in span ${span + 1} of ${spans}`}`

const station = (metres: number, units: UnitSystem): string =>
  units === 'us' ? writeFeetInches(metres) : writeQuantity(distance(metres), units)

const distance = (metres: number): Quantity => ({ kind: 'distance', value: as('distance', metres) })

const reasons = (title: string, checks: readonly Check[], ...of: readonly Check['status'][]): readonly string[] => {
  const found = checks.filter(({ status }) => of.includes(status))
  if (found.length === 0) return []
  return [
    '',
    title,
    ...found.flatMap((check) => wrap(`${check.title} (${citation(check.clause)}): ${check.why ?? ''}`, 2)),
  ]
}

const list = (title: string, texts: readonly string[]): readonly string[] =>
  texts.length === 0 ? [] : [title, ...texts.flatMap((text) => wrap(text, 2))]

const verdict = ({ ok, checks, governing }: Review): string => {
  const failing = checks.filter(({ status }) => status === 'fails')
  const open = checks.filter(({ status }) => status === 'not-covered')
  const worst = checks.find(({ id }) => id === governing)
  const governs =
    worst === undefined ? '' : ` Governing: ${worst.title}, utilisation ${writeUtilisation(worst.utilisation ?? 0)}.`
  if (ok === false) return `${count(failing.length, 'check fails', 'checks fail')}.${governs}`
  if (ok === null)
    return `Nothing fails, but ${count(open.length, 'subject is', 'subjects are')} not covered.${governs}`
  return `All checks hold.${governs}`
}

const count = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`
