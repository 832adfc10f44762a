/** A review as the result file holds it: SI throughout, cranes by their names, `null` where there is no value. */
import type { Check, HandedOn, Place, Review } from './types.ts'
import type { Status } from '../basis/types.ts'
import type { Quantity } from '../quantity/kinds.ts'
import { SI_UNIT } from '../quantity/unit-names.ts'
import { citation } from '../sources/clause.ts'
import type { Extreme } from '../travel/types.ts'

interface ResultQuantity {
  readonly value: number
  readonly unit: string
}

interface ResultExtreme {
  readonly value: number
  readonly span: number
  readonly station: number
  readonly side: string
  readonly lead: number
  readonly mirrored: boolean
  /** Index in `trains`; null where no crane stands on the span. */
  readonly train: number | null
  readonly positions: readonly { readonly crane: string; readonly lead: number; readonly mirrored: boolean }[]
  readonly with: { readonly moment: number; readonly shear: number }
}

interface ResultPlace {
  readonly status: Status
  readonly why: string | null
  readonly ok: boolean | null
  readonly demand: ResultQuantity | null
  readonly resistance: ResultQuantity | null
  readonly utilisation: number | null
  readonly at: ResultExtreme | null
  readonly combination: string | null
  readonly set: string | null
}

interface ResultCheck extends ResultPlace {
  readonly id: string
  readonly title: string
  readonly clause: string
  readonly places: readonly ResultPlace[]
}

/**
 * The result file of a review, version 1. Lengths in m, forces in N, moments in N m, stresses in Pa; signs as in
 * travel/types.ts. Throws where a figure is NaN or infinite: that is a fault of the program, never of a job.
 */
export const resultOf = (review: Review): Result => {
  const result = assemble(review)
  requireFinite(result, 'result')
  return result
}

export type Result = ReturnType<typeof assemble>

const assemble = (review: Review) => {
  const name = craneName(review)
  const place = placeOf(name)
  const extreme = extremeOf(name)
  const { envelope, section } = review
  const range = (of: { readonly max: Extreme; readonly min: Extreme }) => ({
    max: extreme(of.max),
    min: extreme(of.min),
  })
  return {
    format: 'longtravel-result',
    version: 1,
    program: review.program,
    fingerprint: review.job.fingerprint,
    trains: review.trains.map(({ cranes, wheels }) => ({
      cranes: cranes.map(name),
      wheels: wheels.map(({ crane, offset, load }) => ({ crane: name(crane), offset, load })),
    })),
    envelope: {
      moment: range(envelope.moment),
      shear: range(envelope.shear),
      reaction: envelope.reaction.map((of) => ({ support: of.support, ...range(of) })),
      endReaction: envelope.endReaction.map((of) => ({ span: of.span, end: of.end, ...range(of) })),
      deflection: { max: extreme(envelope.deflection.max) },
    },
    section: {
      A: section.A,
      depth: section.depth,
      yBar: section.yBar,
      Ix: section.Ix,
      Iy: section.Iy,
      SxTop: section.SxTop,
      SxBottom: section.SxBottom,
      Zx: section.Zx,
      Zy: section.Zy,
      J: section.J,
      Cw: section.Cw,
      massPerLength: section.massPerLength,
    },
    topFlangeSystem: {
      A: section.top.A,
      I: section.top.I,
      S: section.top.S,
      Z: section.top.Z,
      rt: section.rt,
    },
    actions: {
      cranes: review.actions.map(({ crane, impact, sideThrustPerWheel, longitudinal }) => ({
        crane: name(crane),
        impact,
        sideThrustPerWheel: sideThrustPerWheel.map(({ value }) => value),
        longitudinal: longitudinal.value,
      })),
      deadLoad: review.deadLoad.value.value,
      combinations: review.combinations.map(({ name: combination, clause, text }) => ({
        name: combination,
        clause,
        text,
      })),
    },
    checks: review.checks.map((check) => checkOf(check, place)),
    governing: review.governing ?? null,
    ok: review.ok,
    complete: review.complete,
    handedOn: handedOnOf(review.handedOn),
    cautions: [...review.cautions],
    editions: [...review.editions],
  }
}

const craneName =
  (review: Review) =>
  (crane: number): string => {
    const found = review.job.cranes[crane]
    if (found === undefined) throw new Error(`crane ${crane} is not one of the job's`)
    return found.name
  }

const extremeOf =
  (name: (crane: number) => string) =>
  (extreme: Extreme): ResultExtreme => ({
    value: extreme.value,
    span: extreme.span,
    station: extreme.station,
    side: extreme.side,
    lead: extreme.lead,
    mirrored: extreme.mirrored,
    train: extreme.train ?? null,
    positions: extreme.positions.map(({ crane, lead, mirrored }) => ({ crane: name(crane), lead, mirrored })),
    with: { moment: extreme.with.moment, shear: extreme.with.shear },
  })

const placeOf =
  (name: (crane: number) => string) =>
  (place: Place): ResultPlace => ({
    status: place.status,
    why: place.why ?? null,
    ok: OK[place.status],
    demand: quantityOf(place.demand),
    resistance: quantityOf(place.resistance),
    utilisation: place.utilisation ?? null,
    at: place.at === undefined ? null : extremeOf(name)(place.at),
    combination: place.combination ?? null,
    set: place.set ?? null,
  })

const OK: Record<Status, boolean | null> = { holds: true, fails: false, 'not-applicable': null, 'not-covered': null }

const checkOf = (check: Check, place: (of: Place) => ResultPlace): ResultCheck => ({
  id: check.id,
  title: check.title,
  clause: citation(check.clause),
  ...place(check),
  places: check.places.map(place),
})

const handedOnOf = ({ brackets, longitudinal }: HandedOn) => ({
  brackets: brackets.map(({ support, dead, wheels, wheelsWithImpact, sideThrust, moment }) => ({
    support,
    dead: dead.value,
    wheels: wheels.value,
    wheelsWithImpact: wheelsWithImpact.value,
    sideThrust: sideThrust.value,
    moment: moment?.value ?? null,
  })),
  longitudinal: longitudinal.value,
})

const quantityOf = (quantity: Quantity | undefined): ResultQuantity | null =>
  quantity === undefined ? null : { value: quantity.value, unit: SI_UNIT[quantity.kind] || '1' }

/** JSON would write NaN and infinity as null and so hide them. */
const requireFinite = (value: unknown, path: string): void => {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new Error(`${path} is ${value}`)
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, inner] of Object.entries(value)) requireFinite(inner, `${path}.${key}`)
  }
}
