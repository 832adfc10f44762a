/** Texts and revisions for the record's tests. */
import { catalogue } from '../../core/catalogue/load.ts'
import { resultOf, type Result } from '../../core/review/result.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { NewRevision } from '../../app/store/calls.ts'
import { smallJob } from '../app/doors.ts'

export const jobText = JSON.stringify(smallJob)

/** The result of the small job, computed once. */
export const result: Result = (() => {
  const reviewed = reviewText(jobText, catalogue)
  if (!reviewed.ok) throw new Error(JSON.stringify(reviewed.findings))
  return resultOf(reviewed.review)
})()

export const newRevision = (changes: Partial<NewRevision> = {}): NewRevision => ({
  purpose: 'For approval',
  author: 'A. Author',
  checker: 'C. Checker',
  date: '2026-03-31',
  note: '',
  text: jobText,
  result,
  ...changes,
})

/** Greek, Cyrillic, slashes, quotation marks, signs beyond the basic plane, and SQL that must stay text. */
export const ODD_NAMES = [
  'Bay 3/4 \\ north',
  'Γραμμή κύλισης Ω',
  'Подкрановая балка № 7',
  'crane 🏗️ 👷‍♀️ line',
  `O'Neill "B" -- '); DROP TABLE revisions; --`,
  '../../etc',
  'a'.repeat(200),
]

/** A note of three thousand words on many lines. */
export const LONG_NOTE = Array.from({ length: 3000 }, (_, word) => `wort${word}${word % 12 === 11 ? '\n' : ''}`).join(
  ' ',
)
