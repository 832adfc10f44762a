/** Every call the interface may ask of the Node side, with the schema of its argument and of its result. No call knows a path. */
import * as v from 'valibot'
import { CallError, Fault } from './errors.ts'
import { Id, JobEntry, NUMBERINGS, Project, Revision, RevisionStatement, RevisionSummary } from './record.ts'
import { JobText, Name, SettingName } from './texts.ts'
import { JsonValue, ResultFile } from './values.ts'

const call = <A extends v.GenericSchema, R extends v.GenericSchema>(argument: A, result: R) => ({ argument, result })

const nothing = v.strictObject({})
const UNITS = ['us', 'si'] as const
const PAPERS = ['a4', 'letter'] as const

/** A calc sheet is some megabytes at the most. */
const MOST_PDF_BYTES = 200_000_000

const Pdf = v.custom<Uint8Array>(
  (value) => value instanceof Uint8Array && value.length <= MOST_PDF_BYTES,
  `right would be at most ${MOST_PDF_BYTES} bytes`,
)

const list = <T extends v.GenericSchema>(item: T) => v.pipe(v.array(item), v.readonly())

export const CALLS = {
  'projects.list': call(nothing, list(Project)),
  'projects.create': call(v.strictObject({ name: Name, numbering: v.picklist(NUMBERINGS) }), Project),
  'jobs.list': call(v.strictObject({ project: Id }), list(JobEntry)),
  'jobs.create': call(v.strictObject({ project: Id, name: Name }), JobEntry),
  'jobs.rename': call(v.strictObject({ job: Id, name: Name }), JobEntry),
  /** The desk computes what it keeps from the text; findings in the text are an error of kind `job`, and nothing is kept. */
  'revisions.keep': call(v.strictObject({ job: Id, text: JobText, ...RevisionStatement.entries }), RevisionSummary),
  /** In the order they were kept. */
  'revisions.list': call(v.strictObject({ job: Id }), list(RevisionSummary)),
  'revisions.open': call(v.strictObject({ revision: Id }), Revision),
  /** A text with findings is no error of the call: they are its answer. */
  review: call(
    v.strictObject({ text: JobText }),
    v.variant('ok', [
      v.strictObject({ ok: v.literal(true), result: ResultFile }),
      v.strictObject({ ok: v.literal(false), findings: list(Fault) }),
    ]),
  ),
  /**
   * The calc sheet as PDF, computed anew from the text or from the revision's text; progress counts pages. `kept` is false for
   * a text, and for a revision that this program computes otherwise than it was kept: `caution` says so, else it is ''.
   */
  'sheet.print': call(
    v.strictObject({
      of: v.variant('from', [
        v.strictObject({ from: v.literal('text'), text: JobText }),
        v.strictObject({ from: v.literal('revision'), revision: Id }),
      ]),
      paper: v.picklist(PAPERS),
      units: v.picklist(UNITS),
    }),
    v.strictObject({ pdf: Pdf, kept: v.boolean(), caution: v.string() }),
  ),
  /** `null` for what was never set. */
  'settings.get': call(v.strictObject({ name: SettingName }), v.strictObject({ value: JsonValue })),
  'settings.set': call(v.strictObject({ name: SettingName, value: JsonValue }), nothing),
  /** Versions, and how the record stands: written to, only read (why), or not to be used (why). */
  about: call(
    nothing,
    v.strictObject({
      program: Name,
      node: Name,
      sqlite: Name,
      /** Of the record; a record of a newer program is refused. */
      schema: v.number(),
      record: v.variant('access', [
        v.strictObject({ access: v.literal('write'), cautions: list(v.string()) }),
        v.strictObject({ access: v.literal('read'), cautions: list(v.string()), because: CallError }),
        v.strictObject({ access: v.literal('none'), because: CallError }),
      ]),
    }),
  ),
}

export type CallName = keyof typeof CALLS
export type Argument<N extends CallName> = v.InferOutput<(typeof CALLS)[N]['argument']>
export type Answer<N extends CallName> = v.InferOutput<(typeof CALLS)[N]['result']>

export const isCall = (name: string): name is CallName => Object.hasOwn(CALLS, name)
