/** The sample jobs, reviewed, as the window has them. */
import { readFileSync } from 'node:fs'
import { catalogue } from '../../core/catalogue/load.ts'
import { reviewText } from '../../core/review/review-text.ts'
import { valuesOf, type ReviewValues } from '../../core/review/values.ts'
import type { Review } from '../../core/review/types.ts'

export const reviewOf = (name: string, change: (job: Job) => void = () => undefined): Review => {
  const text = readFileSync(new URL(`../../resources/jobs/${name}.json`, import.meta.url), 'utf8')
  const job = JSON.parse(text) as Job
  change(job)
  const reviewed = reviewText(JSON.stringify(job), catalogue)
  if (!reviewed.ok) throw new Error(JSON.stringify(reviewed.findings))
  return reviewed.review
}

export const sample = (name: string, change?: (job: Job) => void): ReviewValues => valuesOf(reviewOf(name, change))

interface Job {
  cranes: Record<string, unknown>[]
  runway: Record<string, unknown>
}
