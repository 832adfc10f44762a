/** A job file's text to its review: the door that the command, the window and the desk share. */
import type { Catalogue } from '../catalogue/types.ts'
import { readJob, type Finding } from '../job/read.ts'
import { sectionFindings } from '../section/findings.ts'
import { review } from './review.ts'
import type { Review } from './types.ts'

export type Reviewed =
  { readonly ok: true; readonly review: Review } | { readonly ok: false; readonly findings: readonly Finding[] }

/** Reviews a job file, or says everything that is wrong with it. What it throws is a fault of the program. */
export function reviewText(text: string, catalogue: Catalogue): Reviewed {
  const read = readJob(text, catalogue)
  if (!read.ok) return read
  const { job } = read
  const found = sectionFindings(job.girder.section, job.units)
  const findings = found.filter((finding) => finding.level === 'refused')
  if (findings.length > 0) return { ok: false, findings }
  const cautions = found.map(({ path, read: value, message }) => `${path}: ${value}: ${message}`)
  const reviewed = review(job)
  return { ok: true, review: { ...reviewed, cautions: [...read.cautions, ...cautions, ...reviewed.cautions] } }
}
