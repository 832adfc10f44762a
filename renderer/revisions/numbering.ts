/** How a project counts its revisions, in words. */
import type { Numbering as Kept } from '../../core/contract/record.ts'

export type Numbering = Kept

export const NUMBERINGS: readonly (readonly [Numbering, string])[] = [
  ['letters', 'A, B, C'],
  ['numbers', '0, 1, 2'],
]
