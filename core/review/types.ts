/** One complete computation of a job: what screens, sheets, searches and the result file all read. */
import type { Status, Subject } from '../basis/types.ts'
import type { CraneWheels } from '../crane/wheels.ts'
import type { WheelTrain } from '../crane/types.ts'
import type { Working } from '../formula/working.ts'
import type { Job } from '../job/types.ts'
import type { Quantity } from '../quantity/kinds.ts'
import type { Section } from '../section/types.ts'
import type { StaticEnvelope } from '../travel/envelope.ts'
import type { Extreme } from '../travel/types.ts'

/** A check where it was judged; `at` is undefined where no position of a crane is involved. */
export interface Place {
  readonly status: Status
  readonly why?: string
  readonly demand?: Quantity
  readonly resistance?: Quantity
  readonly utilisation?: number
  readonly at?: Extreme
  readonly combination?: string
  readonly set?: string
  /** The derivation, made when it is to be shown. */
  readonly working?: () => Working
}

/** The worst place of one subject; the others, worst first, stand under `places`. */
export interface Check extends Subject, Place {
  readonly places: readonly Place[]
}

/** Forces that one crane brings, before any load factor. */
export interface CraneActions {
  readonly crane: number
  /** Fraction of the wheel load. */
  readonly impact: number
  /** On each wheel of this rail, horizontal, either way. */
  readonly sideThrustPerWheel: readonly Quantity<'force'>[]
  /** Along this rail, either way, of the whole crane. */
  readonly longitudinal: Quantity<'force'>
  readonly working: Working
}

export interface HandedOn {
  /** By support: what one bracket takes, unfactored: dead load and static wheels, the same with impact, side thrust. */
  readonly brackets: readonly {
    readonly support: number
    readonly dead: Quantity<'force'>
    readonly wheels: Quantity<'force'>
    readonly wheelsWithImpact: Quantity<'force'>
    readonly sideThrust: Quantity<'force'>
    /** Of dead load and wheels with impact about the column's face; undefined where no eccentricity is entered. */
    readonly moment?: Quantity<'moment'>
  }[]
  /** To the braced bay: greatest longitudinal force of this rail in any set of cranes, unfactored. */
  readonly longitudinal: Quantity<'force'>
}

export interface Review {
  readonly program: string
  readonly job: Job
  readonly section: Section
  readonly wheels: readonly CraneWheels[]
  readonly trains: readonly WheelTrain[]
  readonly envelope: StaticEnvelope
  readonly actions: readonly CraneActions[]
  /** Girder, rail and what was added, over the whole length. */
  readonly deadLoad: { readonly value: Quantity<'lineLoad'>; readonly working: Working }
  readonly combinations: readonly { readonly name: string; readonly clause: string; readonly text: string }[]
  readonly checks: readonly Check[]
  /** Id of the check with the greatest utilisation. */
  readonly governing: string | undefined
  /** False if any check fails, null if none fails but one that is owed is not covered, else true. */
  readonly ok: boolean | null
  /** True where nothing owed is missing. */
  readonly complete: boolean
  readonly handedOn: HandedOn
  readonly cautions: readonly string[]
  /** Documents and editions the checks rest on. */
  readonly editions: readonly string[]
}
