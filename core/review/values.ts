/** A review without its derivations: plain values that a worker can post and a page can draw. */
import type { CraneWheels } from '../crane/wheels.ts'
import type { Check, CraneActions, Place, Review } from './types.ts'

export type PlaceValues = Omit<Place, 'working'>
export interface CheckValues extends Omit<Check, 'working' | 'places'> {
  readonly places: readonly PlaceValues[]
  /** Whether a derivation can be asked for. */
  readonly derived: boolean
}

export interface ReviewValues extends Omit<Review, 'wheels' | 'actions' | 'deadLoad' | 'checks'> {
  readonly wheels: readonly Omit<CraneWheels, 'working'>[]
  readonly actions: readonly Omit<CraneActions, 'working'>[]
  readonly deadLoad: Omit<Review['deadLoad'], 'working'>
  readonly checks: readonly CheckValues[]
}

/** What drawings read: of a whole review or of its values. */
export type DrawnReview = Pick<Review, 'job' | 'trains' | 'section'>

/** What of a review screens and drawings read. A derivation is asked for by the check's id. */
export function valuesOf(review: Review): ReviewValues {
  return {
    ...review,
    wheels: review.wheels.map(({ working: _working, ...rest }) => rest),
    actions: review.actions.map(({ working: _working, ...rest }) => rest),
    deadLoad: { value: review.deadLoad.value },
    checks: review.checks.map(({ working, places, ...rest }) => ({
      ...rest,
      derived: working !== undefined,
      places: places.map(({ working: _working, ...place }) => place),
    })),
  }
}
