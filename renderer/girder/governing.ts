/** The positions worth standing at: where an effect is greatest, and where a check that matters was judged. */
import type { CheckValues, PlaceValues, ReviewValues } from '../../core/review/values.ts'
import { as } from '../../core/quantity/kinds.ts'
import { beamOf } from '../../core/figure/standing.ts'
import { spanOf } from '../../core/travel/influence.ts'
import { stationsOf } from '../../core/travel/place.ts'
import type { Extreme } from '../../core/travel/types.ts'
import { SAME } from './moving.ts'

export interface Governing {
  readonly id: string
  /** On the button. */
  readonly words: string
  /** What is greatest there, in full. */
  readonly effect: string
  readonly extreme: Extreme
  readonly fails: boolean
}

/** Up to this many brackets each has its button; of more, those of the span shown. */
const BRACKETS = 4

/**
 * Of the span shown: greatest moment, shear at either end, reaction of the brackets, deflection; then checks that fail, the
 * governing one and the chosen one. An effect that is greatest in another span of the same length is shown in this one.
 */
export const governingPlaces = (
  review: ReviewValues,
  span: number,
  chosen: { readonly id: string | undefined; readonly place: number },
): readonly Governing[] => {
  const { moment, deflection, endReaction, reaction } = review.envelope
  const effect = (id: string, words: string, name: string, extreme: Extreme): Governing => ({
    id,
    words,
    effect: name,
    extreme,
    fails: false,
  })
  const end = (side: 'left' | 'right'): readonly Governing[] =>
    endReaction.flatMap((of) =>
      of.span === span && of.end === side
        ? [effect(`shear-${side}`, `shear ${side}`, `shear at the ${side} end`, of.max)]
        : [],
    )
  const brackets = reaction
    .filter(({ support }) => reaction.length <= BRACKETS || support === span || support === span + 1)
    .map(({ support, max }) =>
      effect(`reaction-${support}`, `reaction ${support + 1}`, `reaction of support ${support + 1}`, max),
    )
  return [
    effect('moment', 'moment', 'moment', inSpan(review, moment.max, span)),
    ...end('left'),
    ...end('right'),
    ...brackets,
    effect('deflection', 'deflection', 'deflection', inSpan(review, deflection.max, span)),
    ...checkPlaces(review, chosen),
  ].filter(({ extreme }) => extreme.train !== undefined)
}

/** The place of a check that a view has chosen: 0 is the worst, the others follow. */
const placeOfCheck = (check: CheckValues, place: number): PlaceValues =>
  place === 0 ? check : (check.places[place - 1] ?? check)

const checkPlaces = (
  review: ReviewValues,
  chosen: { readonly id: string | undefined; readonly place: number },
): readonly Governing[] =>
  review.checks.flatMap((check): readonly Governing[] => {
    const isChosen = check.id === chosen.id
    if (check.status !== 'fails' && check.id !== review.governing && !isChosen) return []
    const { at, status } = placeOfCheck(check, isChosen ? chosen.place : 0)
    if (at === undefined) return []
    const name = lower(check.title)
    return [{ id: check.id, words: name, effect: name, extreme: at, fails: status === 'fails' }]
  })

const lower = (title: string): string => title.charAt(0).toLowerCase() + title.slice(1)

/** Where an extreme stands, in another span of the same length. */
const inSpan = (review: ReviewValues, extreme: Extreme, span: number): Extreme => {
  const beam = beamOf(review)
  const [own, shown] = [spanOf(beam, extreme.span), spanOf(beam, span)]
  if (extreme.span === span || Math.abs(own.length - shown.length) > SAME) return extreme
  const by = shown.start - own.start
  const moved = (station: number) => as('distance', station + by)
  return {
    ...extreme,
    span,
    station: moved(extreme.station),
    lead: moved(extreme.lead),
    positions: extreme.positions.map((position) => ({ ...position, lead: moved(position.lead) })),
    terms: extreme.terms.map((term) => ({ ...term, station: moved(term.station) })),
  }
}

export interface Stood {
  readonly span: number
  readonly train: number
  readonly lead: number
  readonly mirrored: boolean
}

export const standsAt = (stood: Stood, { span, train, lead, mirrored }: Extreme): boolean =>
  span === stood.span && train === stood.train && mirrored === stood.mirrored && Math.abs(lead - stood.lead) <= SAME

/** Whether the extreme's cranes stand apart, not bumper to bumper: then its lead alone does not tell where they are. */
export const cranesApart = (review: ReviewValues, { train, lead, mirrored, positions }: Extreme): boolean => {
  const of = train === undefined ? undefined : review.trains[train]
  if (of === undefined) return false
  const stations = stationsOf(of, mirrored, lead)
  return positions.some(({ crane, lead: own }) => {
    const first = of.wheels.findIndex((wheel) => wheel.crane === crane && wheel.wheel === 0)
    return Math.abs(stations[first]! - own) > SAME
  })
}

/** "stands where moment governs", naming all that is greatest at this position as its buttons do; empty where nothing is. */
export const whatGoverns = (places: readonly Governing[], stood: Stood): string => {
  const names = places.filter(({ extreme }) => standsAt(stood, extreme)).map(({ words }) => words)
  if (names.length === 0) return ''
  const list = names.length === 1 ? names[0]! : `${names.slice(0, -1).join(', ')} and ${names.at(-1)!}`
  return `stands where ${list} ${names.length === 1 ? 'governs' : 'govern'}`
}
