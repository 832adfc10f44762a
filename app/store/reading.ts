/** The calls of a store that only read. */
import { done, refuse, type Outcome } from '../../core/contract/errors.ts'
import type { JobEntry, Project, Revision, RevisionSummary } from '../../core/contract/record.ts'
import type { Json } from '../../core/job/json.ts'
import type { Result } from '../../core/review/result.ts'
import type { ReadCalls } from './calls.ts'
import type { ReadableDatabase } from './handle.ts'
import { faultOf } from './integrity.ts'
import { DAMAGED, guarded } from './refusal.ts'
import { COLUMNS, hashOf, summaryOf, type RevisionRow } from './revision.ts'

export const readCalls = (database: ReadableDatabase): ReadCalls => {
  const file = database.name
  const all = {
    projects: database.prepare<[], Project>('SELECT id, name, numbering FROM projects ORDER BY id'),
    jobs: database.prepare<[number], JobEntry>('SELECT id, project, name FROM jobs WHERE project = ? ORDER BY id'),
    revisions: database.prepare<[number], RevisionSummary>(
      `SELECT ${SUMMARY} FROM revisions WHERE job = ? ORDER BY sequence`,
    ),
  }
  const one = {
    project: database.prepare<[number]>('SELECT 1 FROM projects WHERE id = ?'),
    job: database.prepare<[number]>('SELECT 1 FROM jobs WHERE id = ?'),
    revision: database.prepare<[number], Kept>(`SELECT id, hash, ${COLUMNS.join(', ')} FROM revisions WHERE id = ?`),
    setting: database.prepare<[string], { value: string }>('SELECT value FROM settings WHERE name = ?'),
  }
  const every = database.prepare<[], Kept>(`SELECT id, hash, ${COLUMNS.join(', ')} FROM revisions ORDER BY id`)
  const broken = ({ id, label }: Kept) =>
    refuse('damaged', `${file}: revision ${label} (${id}) is not as it was kept; ${DAMAGED}`)

  return {
    projects: () => guarded(file, () => done(all.projects.all())),
    jobs: (project) =>
      guarded(file, () => (one.project.get(project) ? done(all.jobs.all(project)) : noSuch('project', project))),
    revisions: (job) => guarded(file, () => (one.job.get(job) ? done(all.revisions.all(job)) : noSuch('job', job))),
    revision: (id) =>
      guarded(file, (): Outcome<Revision> => {
        const found = one.revision.get(id)
        if (found === undefined) return noSuch('revision', id)
        if (!isWhole(found)) return broken(found)
        const { note, text, result } = found
        return done({ ...summaryOf(id, found), note, text, result: JSON.parse(result) as Result })
      }),
    setting: (name) =>
      guarded(file, () => {
        const found = one.setting.get(name)
        return done(found === undefined ? null : (JSON.parse(found.value) as Json))
      }),
    verify: () =>
      guarded(file, () => {
        const fault = faultOf(database)
        if (fault !== undefined) return refuse('damaged', `${file}: ${fault}; ${DAMAGED}`)
        let revisions = 0
        for (const kept of every.iterate()) {
          if (!isWhole(kept)) return broken(kept)
          revisions++
        }
        return done({ revisions })
      }),
  }
}

/** The refusal of an id that names nothing. */
export const noSuch = (what: 'project' | 'job' | 'revision', id: number) =>
  refuse('not-found', `there is no ${what} ${id} in the record`)

type Kept = RevisionRow & { readonly id: number; readonly hash: string }

const SUMMARY = 'id, job, sequence, label, purpose, author, checker, date, program, fingerprint'

const isWhole = (kept: Kept): boolean => hashOf(kept) === kept.hash
