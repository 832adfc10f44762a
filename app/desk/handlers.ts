/** What the desk does for each call. What it keeps or prints it computes from the job text; no result is taken from outside. */
import { catalogue } from '../../core/catalogue/load.ts'
import type { Answer, Argument, CallName } from '../../core/contract/calls.ts'
import { done, refuse, type CallError, type Outcome } from '../../core/contract/errors.ts'
import type { Revision } from '../../core/contract/record.ts'
import { resultOf } from '../../core/review/result.ts'
import { reviewText, type Reviewed } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'
import { VERSION } from '../../core/review/version.ts'
import { RECORD_VERSION, sqliteVersion } from '../store/version.ts'
import { reading, writing, type DeskRecord } from './record.ts'

export interface Context {
  readonly signal: AbortSignal
  /** `done` of `of` parts are finished. */
  readonly onProgress: (done: number, of: number) => void
}

export interface SheetOptions extends Context {
  readonly paper: 'a4' | 'letter'
  readonly units: 'us' | 'si'
  /** The revision that the sheet prints; undefined where it prints none, and says so. */
  readonly revision: Revision | undefined
}

/** A review as PDF. Lets the thread's other work have its turn between its steps, so that a cancel can arrive. */
export type MakeSheet = (review: Review, options: SheetOptions) => Promise<Outcome<Uint8Array>>

export type Handlers = {
  readonly [N in CallName]: (
    argument: Argument<N>,
    context: Context,
  ) => Outcome<Answer<N>> | Promise<Outcome<Answer<N>>>
}

export const handlersOf = (record: DeskRecord, makeSheet: MakeSheet): Handlers => ({
  'projects.list': () => reading(record, ({ projects }) => projects()),
  'projects.create': ({ name, numbering }) => writing(record, ({ createProject }) => createProject(name, numbering)),
  'jobs.list': ({ project }) => reading(record, ({ jobs }) => jobs(project)),
  'jobs.create': ({ project, name }) => writing(record, ({ createJob }) => createJob(project, name)),
  'jobs.rename': ({ job, name }) => writing(record, ({ renameJob }) => renameJob(job, name)),
  'revisions.keep': ({ job, ...kept }) =>
    writing(record, ({ keepRevision }) => {
      const reviewed = reviewText(kept.text, catalogue)
      if (!reviewed.ok) return { ok: false, error: wrongJob(reviewed, 'it was not kept') }
      return keepRevision(job, { ...kept, result: resultOf(reviewed.review) })
    }),
  'revisions.list': ({ job }) => reading(record, ({ revisions }) => revisions(job)),
  'revisions.open': ({ revision }) => reading(record, (calls) => calls.revision(revision)),
  review: ({ text }) => {
    const reviewed = reviewText(text, catalogue)
    return done(
      reviewed.ok ? { ok: true, result: resultOf(reviewed.review) } : { ok: false, findings: faultsOf(reviewed) },
    )
  },
  'sheet.print': ({ of, paper, units }, context) =>
    of.from === 'text'
      ? printText(of.text, makeSheet, { ...context, paper, units })
      : printRevision(record, of.revision, makeSheet, { ...context, paper, units }),
  'settings.get': ({ name }) =>
    reading(record, ({ setting }) => {
      const found = setting(name)
      return found.ok ? done({ value: found.value }) : found
    }),
  'settings.set': ({ name, value }) =>
    writing(record, ({ set }) => {
      const kept = set(name, value)
      return kept.ok ? done({}) : kept
    }),
  about: () =>
    done({
      program: VERSION,
      node: process.version,
      sqlite: sqliteVersion(),
      schema: RECORD_VERSION,
      record: standing(record),
    }),
})

type Printed = Promise<Outcome<Answer<'sheet.print'>>>
type PrintOptions = Omit<SheetOptions, 'revision'>

const printText = async (text: string, makeSheet: MakeSheet, options: PrintOptions): Printed => {
  const reviewed = reviewText(text, catalogue)
  if (!reviewed.ok) return { ok: false, error: wrongJob(reviewed, 'it was not printed') }
  const made = await makeSheet(reviewed.review, { ...options, revision: undefined })
  return made.ok ? done({ pdf: made.value, kept: false, caution: '' }) : made
}

/** A sheet bears a revision's name only where it says what was kept, figure by figure. */
const printRevision = async (record: DeskRecord, id: number, makeSheet: MakeSheet, options: PrintOptions): Printed => {
  const opened = reading(record, ({ revision }) => revision(id))
  if (!opened.ok) return opened
  const { text, result } = opened.value
  const reviewed = reviewText(text, catalogue)
  if (!reviewed.ok)
    return { ok: false, error: wrongJob(reviewed, `program ${VERSION} refuses what ${result.program} had kept`) }
  const kept = JSON.stringify(resultOf(reviewed.review)) === JSON.stringify(result)
  const made = await makeSheet(reviewed.review, { ...options, revision: kept ? opened.value : undefined })
  if (!made.ok) return made
  const caution = kept
    ? ''
    : `Revision ${opened.value.label} was kept by program ${result.program}; program ${VERSION} does not give the same result. The sheet shows what is computed now and says that it is not the revision.`
  return done({ pdf: made.value, kept, caution })
}

type Refused = Extract<Reviewed, { readonly ok: false }>

const faultsOf = ({ findings }: Refused): NonNullable<CallError['at']> =>
  findings.map(({ path, read, message }) => ({ path, read, message }))

const wrongJob = (refused: Refused, consequence: string): CallError => {
  const count = refused.findings.length
  const faults = `the job has ${count} ${count === 1 ? 'entry that is' : 'entries that are'} refused`
  return refuse('job', `${faults}: ${consequence}`, faultsOf(refused)).error
}

const standing = (record: DeskRecord): Answer<'about'>['record'] => {
  if (record.access === 'none') return { access: 'none', because: record.because }
  const cautions = record.opened.cautions.map(({ message }) => message)
  return record.access === 'write'
    ? { access: 'write', cautions }
    : { access: 'read', cautions, because: record.because }
}
