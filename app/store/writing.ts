/** The calls of a store that write, each in one transaction that is on the disk before the call returns. */
import { done, type Outcome } from '../../core/contract/errors.ts'
import type { Numbering } from '../../core/contract/record.ts'
import type { NewRevision, WriteCalls } from './calls.ts'
import type { WritableDatabase } from './handle.ts'
import { labelOf } from './label.ts'
import { noSuch, readCalls } from './reading.ts'
import { guarded } from './refusal.ts'
import { COLUMNS, hashOf, summaryOf, type RevisionRow } from './revision.ts'

export const writeCalls = (database: WritableDatabase): WriteCalls => {
  const file = database.name
  const find = {
    project: database.prepare<[number]>('SELECT 1 FROM projects WHERE id = ?'),
    job: database.prepare<[number], { project: number }>('SELECT project FROM jobs WHERE id = ?'),
    next: database.prepare<[number], { sequence: number; numbering: Numbering }>(
      `SELECT projects.numbering, (SELECT count(*) FROM revisions WHERE job = jobs.id) AS sequence
       FROM jobs JOIN projects ON projects.id = jobs.project WHERE jobs.id = ?`,
    ),
  }
  const add = {
    project: database.prepare<[string, Numbering]>('INSERT INTO projects (name, numbering) VALUES (?, ?)'),
    job: database.prepare<[number, string]>('INSERT INTO jobs (project, name) VALUES (?, ?)'),
    revision: database.prepare<[RevisionRow & { readonly hash: string }]>(
      `INSERT INTO revisions (hash, ${COLUMNS.join(', ')}) VALUES (@hash, ${COLUMNS.map((name) => `@${name}`).join(', ')})`,
    ),
  }
  const rename = database.prepare<[string, number]>('UPDATE jobs SET name = ? WHERE id = ?')
  const set = database.prepare<[string, string]>(
    'INSERT INTO settings (name, value) VALUES (?, ?) ON CONFLICT (name) DO UPDATE SET value = excluded.value',
  )
  /** Takes the right to write before it reads, so that what was read still holds when it writes. */
  const written = <T>(work: () => Outcome<T>): Outcome<T> => guarded(file, () => database.transaction(work).immediate())

  return {
    ...readCalls(database),
    createProject: (name, numbering) =>
      written(() => done({ id: Number(add.project.run(name, numbering).lastInsertRowid), name, numbering })),
    createJob: (project, name) =>
      written(() => {
        if (find.project.get(project) === undefined) return noSuch('project', project)
        return done({ id: Number(add.job.run(project, name).lastInsertRowid), project, name })
      }),
    renameJob: (job, name) =>
      written(() => {
        const found = find.job.get(job)
        if (found === undefined) return noSuch('job', job)
        rename.run(name, job)
        return done({ id: job, project: found.project, name })
      }),
    keepRevision: (job, kept) =>
      written(() => {
        const next = find.next.get(job)
        if (next === undefined) return noSuch('job', job)
        const row = rowOf(job, next.sequence, labelOf(next.sequence, next.numbering), kept)
        const id = Number(add.revision.run({ ...row, hash: hashOf(row) }).lastInsertRowid)
        return done(summaryOf(id, row))
      }),
    set: (name, value) =>
      written(() => {
        set.run(name, JSON.stringify(value))
        return done(null)
      }),
  }
}

const rowOf = (job: number, sequence: number, label: string, kept: NewRevision): RevisionRow => ({
  job,
  sequence,
  label,
  purpose: kept.purpose,
  author: kept.author,
  checker: kept.checker,
  date: kept.date,
  note: kept.note,
  text: kept.text,
  result: JSON.stringify(kept.result),
  program: kept.result.program,
  fingerprint: kept.result.fingerprint,
})
