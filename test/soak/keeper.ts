/** Keeps revisions at full speed until it is killed; says each one that it was told is kept. */
import { writeSync } from 'node:fs'
import { openForWriting } from '../../app/store/open.ts'
import { newRevision } from '../store/texts.ts'
import { contentOf } from './content.ts'

const [file] = process.argv.slice(2)
const outcome = await openForWriting(file!)
if (!outcome.ok) throw new Error(outcome.error.message)
const { calls } = outcome.value

const value = <T>(of: { ok: true; value: T } | { ok: false; error: { message: string } }): T => {
  if (!of.ok) throw new Error(of.error.message)
  return of.value
}
const project = value(calls.projects())[0] ?? value(calls.createProject('P', 'numbers'))
const job = value(calls.jobs(project.id))[0] ?? value(calls.createJob(project.id, 'J'))
for (let next = value(calls.revisions(job.id)).length; ; next++) {
  const kept = value(calls.keepRevision(job.id, newRevision(contentOf(next))))
  writeSync(1, `${kept.id} ${kept.sequence}\n`)
}
