import cab from '../../resources/jobs/fifty-ton-cab.json' with { type: 'json' }
import pendant from '../../resources/jobs/ten-ton-pendant.json' with { type: 'json' }
import plateGirder from '../../resources/jobs/two-crane-plate-girder.json' with { type: 'json' }
import { catalogue } from '../../core/catalogue/load.ts'
import { reviewText, type Reviewed } from '../../core/review/review-text.ts'
import { Job } from '../../renderer/state/job.svelte.ts'

const SAMPLES = { cab, pendant, plateGirder }

export type Sample = keyof typeof SAMPLES

export const sampleText = (name: Sample): string => JSON.stringify(SAMPLES[name])

export const jobOf = (name: Sample = 'cab'): Job => new Job(sampleText(name))

/** What the file holds at the top of a path of two or three plain steps. */
export const stored = (job: Job): Stored => JSON.parse(job.text) as Stored

export interface Stored {
  readonly units: string
  readonly basis: Readonly<Record<string, unknown>>
  readonly cranes: readonly Readonly<Record<string, unknown>>[]
  readonly runway: Readonly<Record<string, unknown>>
  readonly girder: Readonly<Record<string, unknown>>
}

/** Reviews the job as it stands and gives it what was found, as the window does with the worker's answer. */
export const review = (job: Job): Reviewed => {
  const reviewed = reviewText(job.text, catalogue)
  job.take(reviewed.ok ? [] : reviewed.findings)
  return reviewed
}

/** Paths of what is wrong with the job as it stands. */
export const wrongPaths = (job: Job): readonly string[] => {
  const reviewed = review(job)
  return reviewed.ok ? [] : reviewed.findings.map(({ path }) => path)
}
