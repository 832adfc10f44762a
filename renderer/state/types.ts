/** What the views of the window share. State lives in .svelte.ts classes beside this file, apart from markup. */
import type { FromLive, ToLive } from '../../core/contract/live.ts'
import type { Line } from '../../core/formula/types.ts'
import type { Finding } from '../../core/job/read.ts'
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import type { Metre } from '../../core/quantity/kinds.ts'

/** The job as it is being written: the JSON tree of the job file, every entry as it was typed. */
export interface JobState {
  /** Reactive. The whole file as text, what the worker reviews and the desk keeps. */
  readonly text: string
  readonly units: UnitSystem
  /** Value typed at a path ("cranes[0].ratedCapacity"), or undefined where it was left out. */
  entry(path: string): string | undefined
  /** Whether anything is entered at a path, be it a value, a list or a part. */
  has(path: string): boolean
  /** Sets what was typed; '' takes it out again, so that the default holds. */
  enter(path: string, typed: string): void
  readonly cranes: number
  addCrane(): void
  removeCrane(index: number): void
  setUnits(units: UnitSystem): void
  /** Which of several forms a part of the job has: a name or dimensions, a rolled or a welded section (ways.ts). */
  way(path: string): string
  /** Changes the form; what stood in the other one is kept aside and comes back with it. */
  turn(path: string, word: string): void
  /** Takes a whole job file in; says why not where it is none, and leaves the job as it was. */
  open(text: string): string | undefined
  /** By path, of the last review's answer; those of an older text stand until the newer one is answered. */
  readonly findings: ReadonlyMap<string, Finding>
}

/** The last review that held, and whether a newer text is waiting or refused. */
export interface ReviewState {
  /** Reactive: undefined until the first job was reviewed. Stays the last good one while an entry is wrong. */
  readonly review: ReviewValues | undefined
  /** Time the last review took in the worker. */
  readonly milliseconds: number | undefined
  readonly stale: boolean
  readonly fault: string | undefined
  /** Lines of the chosen check's derivation, those of the review before until the new ones are made; undefined while there are none. */
  readonly working: readonly Line[] | undefined
  /** Id of the check chosen in the ledger. */
  readonly chosen: string | undefined
  /** Which of the chosen check's places `working` derives: 0 the worst, then the check's other places in their order. */
  readonly place: number
  /** Chooses a check, at its worst place unless another is named. */
  choose(id: string, place?: number): void
}

/** Where the crane stands in the elevation. */
export interface StandState {
  readonly span: number
  readonly train: number
  readonly lead: Metre
  readonly mirrored: boolean
  /** Station at which the diagrams are read. */
  readonly station: Metre
  /** Stands the train where an effect governs. */
  at(extreme: { span: number; train: number | undefined; lead: Metre; mirrored: boolean; station: Metre }): void
  moveTo(lead: Metre): void
  readAt(station: Metre): void
  chooseTrain(train: number): void
}

/** The way to the worker that reviews: posts asks, hands on answers. Tests stand another in its place. */
export interface LivePort {
  post(ask: ToLive): void
  listen(answered: (answer: FromLive) => void): void
}
