/** How outside checks are shown: what the source prints, what the program has, and by how much they differ. */
import { describe, expect, it } from 'vitest'
import { evidenceTable } from '../../app/command/evidence.ts'
import type { EvidenceResult } from '../../core/evidence/types.ts'

const result = (computed: number): EvidenceResult => ({
  id: 'made-up',
  what: 'greatest moment',
  source: 'No book, 1st ed., Example 1',
  known: 'read',
  printed: 12.5,
  unit: 'kip ft',
  tolerance: 0.05,
  compute: () => computed,
  computed,
  difference: computed - 12.5,
  within: Math.abs(computed - 12.5) <= 0.05,
})

describe('the table of outside checks', () => {
  it('shows printed and computed value, difference, tolerance and source', () => {
    expect(evidenceTable([result(12.53)]).split('\n')).toEqual([
      '        Printed  Computed  Difference  Tolerance  Unit    Outside check',
      'within     12.5     12.53        0.03       0.05  kip ft  greatest moment',
      '    made-up: No book, 1st ed., Example 1 (read)',
      '',
      'Outside checks: 1, all within tolerance',
      '',
    ])
  })

  it('tells what is outside, and why a tolerance is what it is', () => {
    const table = evidenceTable([result(12.53), { ...result(12.6), why: 'rounded twice' }])
    expect(table).toContain('\nOUTSIDE ')
    expect(table).toContain('(read); rounded twice\n')
    expect(table).toContain('Outside checks: 2, 1 OUTSIDE tolerance\n')
  })
})
