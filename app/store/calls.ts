/** Argument and result of every call to the store. Refusals are values; a handle that reads has no call that writes. */
import type { Outcome } from '../../core/contract/errors.ts'
import type {
  JobEntry,
  Numbering,
  Project,
  Revision,
  RevisionStatement,
  RevisionSummary,
} from '../../core/contract/record.ts'
import type { Json } from '../../core/job/json.ts'
import type { Result } from '../../core/review/result.ts'

export interface ReadCalls {
  /** In the order they were made. */
  readonly projects: () => Outcome<readonly Project[]>
  readonly jobs: (project: number) => Outcome<readonly JobEntry[]>
  /** In the order they were kept. */
  readonly revisions: (job: number) => Outcome<readonly RevisionSummary[]>
  /** Whole or refused as damaged: its hash is computed again. */
  readonly revision: (id: number) => Outcome<Revision>
  /** `null` for what was never set. */
  readonly setting: (name: string) => Outcome<Json>
  /** The whole record: integrity, foreign keys, the hash of every revision. Reads all of it. */
  readonly verify: () => Outcome<{ readonly revisions: number }>
}

export interface WriteCalls extends ReadCalls {
  readonly createProject: (name: string, numbering: Numbering) => Outcome<Project>
  readonly createJob: (project: number, name: string) => Outcome<JobEntry>
  readonly renameJob: (job: number, name: string) => Outcome<JobEntry>
  /** On the disk before this returns. */
  readonly keepRevision: (job: number, kept: NewRevision) => Outcome<RevisionSummary>
  readonly set: (name: string, value: Json) => Outcome<null>
}

/** The result brings the program's version and the job's fingerprint. */
export interface NewRevision extends RevisionStatement {
  readonly text: string
  readonly result: Result
}
