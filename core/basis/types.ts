/** What a set of rules hands to the drive, and what comes back as a check. */
import type { WorkingRecorder } from '../formula/working.ts'
import type { Clause } from '../sources/clause.ts'
import type { Quantity } from '../quantity/kinds.ts'
import type { Effect, Extreme } from '../travel/types.ts'

export type Status = 'holds' | 'fails' | 'not-applicable' | 'not-covered'

/** What is asked, whatever the answer. */
export interface Subject {
  readonly id: string
  readonly title: string
  readonly clause: Clause
}

/** Demand against resistance at one place, in one combination of one set of cranes. */
export interface Judgement {
  readonly demand: Quantity
  readonly resistance: Quantity
  readonly utilisation: number
}

/** An effect to be made worst, and the judge who decides at that place. */
export interface Ask extends Subject {
  readonly span: number
  /** Index of the train; undefined where no crane stands on the span. */
  readonly train: number | undefined
  readonly combination: string
  readonly set: string
  readonly effect: Effect
  /** Writes its derivation to `on` as it goes. */
  readonly judge: (worst: Extreme, on: WorkingRecorder) => Judgement
}

/** An answer that needs no wheels: a proportion, or a subject that does not apply or is not covered, with the reason. */
export interface Verdict extends Subject {
  readonly status: Status
  readonly why: string
  readonly judge?: (on: WorkingRecorder) => Judgement
}

export interface Plan {
  readonly asks: readonly Ask[]
  readonly verdicts: readonly Verdict[]
  readonly cautions: readonly string[]
}
