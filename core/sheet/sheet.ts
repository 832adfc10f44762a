/** A review as a calc sheet: what another engineer reads, follows by hand and stamps. */
import type { Review } from '../review/types.ts'
import type { UnitSystem } from '../quantity/kinds.ts'
import { entriesPart } from './entries.ts'
import { governingPart } from './governing.ts'
import { loadsPart } from './loads.ts'
import { closingPart, handedOnPart } from './closing.ts'
import { sectionPart } from './section.ts'
import { summaryPart } from './summary.ts'
import { workingsPart } from './workings.ts'
import type { Block, Sheet } from './types.ts'

/** A kept revision's marks, printed in the title block. */
export interface RevisionMarks {
  readonly label: string
  readonly date: string
  readonly preparedBy: string
  readonly checkedBy: string
}

/** Chapters in their order; each is given its number. */
const PARTS = [summaryPart, entriesPart, loadsPart, governingPart, sectionPart, workingsPart, handedOnPart, closingPart]

/**
 * The sheet of a review in one unit system. Dates come from the revision or the job, never from a clock. Without a revision
 * the sheet says on each page that it was not kept.
 */
export function sheetOf(review: Review, units: UnitSystem, revision?: RevisionMarks): Sheet {
  const { project, basis, fingerprint } = review.job
  return {
    title: {
      project: project.title,
      subject: project.subject ?? '',
      number: project.number ?? '',
      revision: revision?.label ?? '',
      preparedBy: revision?.preparedBy ?? project.preparedBy ?? '',
      checkedBy: revision?.checkedBy ?? project.checkedBy ?? '',
      date: revision?.date ?? project.date ?? '',
    },
    units,
    program: `Longtravel ${review.program}`,
    fingerprint,
    basis: `${basis.method}, ${units === 'us' ? 'US' : 'SI'} units`,
    kept: revision !== undefined,
    date: revision?.date ?? project.date ?? '',
    caution: 'For review and seal by a licensed engineer; local codes govern',
    blocks: PARTS.flatMap((part, index): readonly Block[] => part(review, units, String(index + 1))),
  }
}
