/** The ledger: which check stands where, and what is said of each. */
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import { writeFeetInches, writeQuantity, writeUtilisation } from '../../core/quantity/write.ts'
import type { CheckValues, PlaceValues, ReviewValues } from '../../core/review/values.ts'
import type { Extreme } from '../../core/travel/types.ts'
import { as, type Quantity } from '../../core/quantity/kinds.ts'

export interface LedgerParts {
  /** What fails and what holds, worst first; then what is owed and not covered. */
  readonly open: readonly CheckValues[]
  readonly notApplicable: readonly CheckValues[]
}

const RANK: Readonly<Record<CheckValues['status'], number>> = {
  fails: 0,
  holds: 1,
  'not-covered': 2,
  'not-applicable': 3,
}

export const ledgerOf = (checks: readonly CheckValues[]): LedgerParts => {
  const worse = (a: CheckValues, b: CheckValues): number =>
    RANK[a.status] - RANK[b.status] || (b.utilisation ?? 0) - (a.utilisation ?? 0)
  return {
    open: checks.filter(({ status }) => status !== 'not-applicable').sort(worse),
    notApplicable: checks.filter(({ status }) => status === 'not-applicable'),
  }
}

export const WORDS: Readonly<Record<CheckValues['status'], string>> = {
  fails: 'fails',
  'not-covered': 'not covered',
  holds: 'holds',
  'not-applicable': 'not applicable',
}

/** "101 of 395 kip": the unit once where both have it; empty where nothing was judged. */
export const comparison = ({ demand, resistance }: PlaceValues, units: UnitSystem): string => {
  if (demand === undefined || resistance === undefined) return ''
  const [left, right] = [writeQuantity(demand, units), writeQuantity(resistance, units)]
  const unit = / [^\d\s]\S*$/.exec(right)?.[0]
  return unit !== undefined && left.endsWith(unit)
    ? `${left.slice(0, -unit.length)} of ${right}`
    : `${left} of ${right}`
}

/** To hundredths; what fails never reads as 1.00. Empty where nothing was judged. */
export const utilisationText = ({ utilisation }: PlaceValues): string =>
  utilisation === undefined ? '' : writeUtilisation(utilisation, 2)

/** Where the limit stands on a rule of length 1, and how far a utilisation reaches: more than the rule holds ends at its edge. */
export const LIMIT = 0.78
export const ruleOf = (utilisation: number): number => Math.min(Math.max(utilisation * LIMIT, 0), 1)

/** The one above or below; at either end it stays. */
export const neighbour = (ids: readonly string[], from: string | undefined, key: string): string | undefined => {
  const at = from === undefined ? -1 : ids.indexOf(from)
  switch (key) {
    case 'ArrowDown':
      return ids[Math.min(at + 1, ids.length - 1)]
    case 'ArrowUp':
      return ids[Math.max(at - 1, 0)]
    case 'Home':
      return ids[0]
    case 'End':
      return ids.at(-1)
    default:
      return undefined
  }
}

/** "1 check fails, 5 not covered, 12 hold". */
export const summary = (checks: readonly CheckValues[]): string => {
  const count = (status: CheckValues['status']): number => checks.filter((check) => check.status === status).length
  const [fails, open, holds] = [count('fails'), count('not-covered'), count('holds')]
  return [
    ...(fails === 0 ? [] : [fails === 1 ? '1 check fails' : `${fails} checks fail`]),
    ...(open === 0 ? [] : [`${open} not covered`]),
    ...(holds === 0 ? [] : [`${holds} ${holds === 1 ? 'holds' : 'hold'}`]),
  ].join(', ')
}

const SIDE = { left: 'just left of ', right: 'just right of ', at: '' } as const

const stationText = (metres: number, units: UnitSystem): string => {
  const quantity: Quantity = { kind: 'distance', value: as('distance', metres) }
  return units === 'us' ? writeFeetInches(metres) : writeQuantity(quantity, units)
}

/** Where a check was judged: "1.2D + 1.6L, Crane 1 alone. At station 12' 1": wheel 1 of Crane 1 at 8' 6"." */
export const placeSentence = (review: ReviewValues, place: PlaceValues, units: UnitSystem): string => {
  const { at, combination, set } = place
  const loads = [combination, set].filter((part) => part !== undefined && part !== '').join(', ')
  const where = at === undefined ? 'Wherever the cranes stand.' : stationSentence(review, at, units)
  return loads === '' ? where : `${loads}. ${where}`
}

const stationSentence = (review: ReviewValues, at: Extreme, units: UnitSystem): string => {
  const cranes = at.positions.map(({ crane, lead, mirrored }) => {
    const name = review.job.cranes[crane]?.name ?? `crane ${crane + 1}`
    return `wheel 1 of ${name} at ${stationText(lead, units)}${mirrored ? ', the crane turned about' : ''}`
  })
  const span = review.job.runway.spans.length > 1 ? ` in span ${at.span + 1}` : ''
  return `At ${SIDE[at.side]}station ${stationText(at.station, units)}${span}${cranes.length === 0 ? '' : `: ${cranes.join('; ')}`}.`
}

/** One of several places, short: "span 2, Crane 1 alone, 0.87". */
export const placeWords = (place: PlaceValues, several: boolean): string =>
  [
    ...(several && place.at !== undefined ? [`span ${place.at.span + 1}`] : []),
    ...(place.combination === undefined ? [] : [place.combination]),
    ...(place.set === undefined ? [] : [place.set]),
    place.status === 'fails' ? `fails, ${utilisationText(place)}` : utilisationText(place) || WORDS[place.status],
  ].join(' · ')
