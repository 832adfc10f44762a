/** A review as PDF: the document made, then laid on pages. */
import { done, refuse } from '../../core/contract/errors.ts'
import type { Revision } from '../../core/contract/record.ts'
import { sheetOf, type RevisionMarks } from '../../core/sheet/sheet.ts'
import type { MakeSheet } from './handlers.ts'

/** The printer is loaded with the first sheet, so that the desk answers at once. */
export const makeSheet: MakeSheet = async (review, { paper, units, revision, signal, onProgress }) => {
  const [{ printSheet }, { UnprintableText }] = await Promise.all([
    import('../print/print.ts'),
    import('../print/unprintable.ts'),
  ])
  try {
    const sheet = sheetOf(review, units, revision === undefined ? undefined : marksOf(revision))
    return done(await printSheet(sheet, paper, { signal, onProgress }))
  } catch (error) {
    if (error instanceof UnprintableText) return refuse('not-covered', error.message)
    throw error
  }
}

const marksOf = ({ label, date, author, checker }: Revision): RevisionMarks => ({
  label,
  date,
  preparedBy: author,
  checkedBy: checker,
})
