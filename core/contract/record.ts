/** What the record holds, as the interface sees it: projects, their jobs, the jobs' revisions. */
import * as v from 'valibot'
import { Day, JobText, Line, Name, Note } from './texts.ts'
import { ResultFile } from './values.ts'

/** Given by the record, from 1; never used again for another thing. */
export const Id = v.pipe(v.number(), v.safeInteger('right would be a whole number'), v.minValue(1, 'is at least 1'))

/** How a project numbers its revisions: A, B, C ... or 0, 1, 2 ... */
export const NUMBERINGS = ['letters', 'numbers'] as const

export const Project = v.strictObject({ id: Id, name: Name, numbering: v.picklist(NUMBERINGS) })

/** A job is one girder line of a project. */
export const JobEntry = v.strictObject({ id: Id, project: Id, name: Name })

/** What its author says of a revision. The date is the author's own. */
const statement = { purpose: Line, author: Line, checker: Line, date: Day }

export const RevisionStatement = v.strictObject({ ...statement, note: Note })

const summary = {
  id: Id,
  job: Id,
  /** From 0, without gaps, within the job. */
  sequence: v.pipe(v.number(), v.safeInteger(), v.minValue(0)),
  label: Name,
  ...statement,
  /** The version of the program that computed it. */
  program: Name,
  /** SHA-256 of the job as entered, 64 hexadecimal digits. */
  fingerprint: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
}

/** A revision in a list. */
export const RevisionSummary = v.strictObject(summary)

/** A revision as it was kept: the job text letter by letter as it was entered, and the result of that day's program. */
export const Revision = v.strictObject({ ...summary, note: Note, text: JobText, result: ResultFile })

export type Numbering = (typeof NUMBERINGS)[number]
export type Project = Readonly<v.InferOutput<typeof Project>>
export type JobEntry = Readonly<v.InferOutput<typeof JobEntry>>
export type RevisionStatement = Readonly<v.InferOutput<typeof RevisionStatement>>
export type RevisionSummary = Readonly<v.InferOutput<typeof RevisionSummary>>
export type Revision = Readonly<v.InferOutput<typeof Revision>>
