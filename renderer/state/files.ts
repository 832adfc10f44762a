/** Names of the files that leave the window. */
import type { JobState } from './types.ts'

/** From the job's number and subject: only letters, digits, points and hyphens, which every system takes. */
export const fileName = (job: Pick<JobState, 'entry'>, ending: string): string => {
  const parts = [job.entry('project.number'), job.entry('project.subject') ?? job.entry('project.title')]
  const stem = parts
    .filter((part) => part !== undefined)
    .join(' ')
    .replace(/[^\p{L}\p{N}.]+/gu, '-')
    .replace(/^[-.]+|[-.]+$/g, '')
    .slice(0, 80)
  return `${stem === '' ? 'girder' : stem}${ending}`
}
