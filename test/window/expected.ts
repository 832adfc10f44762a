/** What the window ought to show, computed here from the same job text. */
import { readFileSync } from 'node:fs'
import { catalogue } from '../../core/catalogue/load.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'

/** A sample job as it stands in resources/jobs. */
export const sampleText = (name = 'fifty-ton-cab'): string =>
  readFileSync(new URL(`../../resources/jobs/${name}.json`, import.meta.url), 'utf8')

export const reviewOf = (text: string): Review => {
  const read = reviewText(text, catalogue)
  if (!read.ok) throw new Error(read.findings.map(({ path, message }) => `${path}: ${message}`).join('\n'))
  return read.review
}

/** A job text with other entries, by name within the part: `changed(text, 'girder', { steel: ... })`. */
export const changed = (text: string, part: string, entries: object): string => {
  const job = JSON.parse(text) as Record<string, object>
  return JSON.stringify({ ...job, [part]: { ...job[part], ...entries } })
}
