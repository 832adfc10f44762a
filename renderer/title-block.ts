/** The words of the title block. */
import type { Held } from './state/keeping.svelte.ts'
import type { ReviewState } from './state/types.ts'

export const rulesText = (method: string | undefined): string => `ASCE 7-22 · AISC 360-22 ${method ?? 'LRFD'}`

/** The revision the data sheet holds, and whether it has been changed since. */
export const revisionText = (held: Held | undefined, text: string): string => {
  if (held === undefined) return 'draft, not kept'
  return held.text === text ? held.label : `${held.label}, changed since`
}

/** How the job stands: what is wrong with its entries, else what its checks say. */
export const stateText = (
  findings: number,
  { fault, review }: Pick<ReviewState, 'fault' | 'review'>,
): { readonly text: string; readonly grave: boolean } => {
  if (fault !== undefined) return { text: `A fault of the program: ${fault}`, grave: true }
  if (findings > 0)
    return {
      text: `${findings} ${findings === 1 ? 'entry' : 'entries'} to mend${review ? '; figures are of the entries before' : ''}`,
      grave: true,
    }
  if (review === undefined) return { text: 'being computed', grave: false }
  const count = (status: string) => review.checks.filter((check) => check.status === status).length
  const fails = count('fails')
  const open = count('not-covered')
  const parts = [
    fails === 0 ? 'nothing fails' : `${fails} ${fails === 1 ? 'check fails' : 'checks fail'}`,
    ...(open === 0 ? [] : [`${open} not covered`]),
    'for a licensed engineer',
  ]
  return { text: parts.join(' · '), grave: fails > 0 }
}
