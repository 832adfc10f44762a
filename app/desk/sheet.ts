/** A review as PDF. */
import { refuse } from '../../core/contract/errors.ts'
import type { MakeSheet } from './handlers.ts'

export const makeSheet: MakeSheet = () =>
  Promise.resolve(refuse('not-covered', 'the calc sheet is not covered by this version'))
