/** Short makers of blocks, so that a chapter reads as its contents. */
import { writeQuantity } from '../quantity/write.ts'
import type { Quantity, UnitSystem } from '../quantity/kinds.ts'
import type { Block, Column } from './types.ts'

export const heading = (level: 1 | 2 | 3, number: string, text: string): Block => ({
  block: 'heading',
  level,
  number,
  text,
})

export const plain = (text: string, clause?: string): Block => ({
  block: 'paragraph',
  text,
  tone: 'plain',
  ...(clause === undefined ? {} : { clause }),
})

export const caution = (text: string): Block => ({ block: 'paragraph', text, tone: 'caution' })

export const left = (head: string, width: number): Column => ({ head, align: 'left', width })
export const right = (head: string, width: number): Column => ({ head, align: 'right', width })

/** A value in the sheet's units, or a dash where there is none. */
export const shown = (quantity: Quantity | undefined, units: UnitSystem): string =>
  quantity === undefined ? '–' : writeQuantity(quantity, units)
