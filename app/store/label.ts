/** What a revision is called. */
import type { Numbering } from '../../core/contract/record.ts'

/** The label of the revision with this sequence, from 0: 0, 1, 2 ... or A to Z, then AA, AB ... */
export const labelOf = (sequence: number, numbering: Numbering): string => {
  if (numbering === 'numbers') return String(sequence)
  const last = String.fromCharCode('A'.charCodeAt(0) + (sequence % 26))
  return sequence < 26 ? last : labelOf(Math.floor(sequence / 26) - 1, numbering) + last
}
