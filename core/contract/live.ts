/** What the page asks of its own worker, which reviews the job while it is edited. Plain values only: they are posted. */
import type { Line } from '../formula/types.ts'
import type { Finding } from '../job/read.ts'
import type { UnitSystem } from '../quantity/kinds.ts'
import type { ReviewValues } from '../review/values.ts'

export type ToLive =
  /** The job's text as it stands now; a later one makes an earlier one stale. */
  | { readonly ask: 'review'; readonly turn: number; readonly text: string }
  /** The derivation of one check of the last review; `place` 0 is the worst, then the others in their order. */
  | {
      readonly ask: 'working'
      readonly turn: number
      readonly id: string
      readonly place: number
      readonly units: UnitSystem
    }

export type FromLive =
  | { readonly answer: 'review'; readonly turn: number; readonly review: ReviewValues; readonly milliseconds: number }
  | { readonly answer: 'findings'; readonly turn: number; readonly findings: readonly Finding[] }
  | {
      readonly answer: 'working'
      readonly turn: number
      readonly id: string
      readonly place: number
      readonly lines: readonly Line[]
    }
  /** A fault of the program while it reviewed: told, never hidden. */
  | { readonly answer: 'fault'; readonly turn: number; readonly message: string }
