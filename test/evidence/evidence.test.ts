import { describe, expect, it } from 'vitest'
import { evidence } from '../../core/evidence/evidence.ts'

const results = evidence()

describe('outside checks', () => {
  it.each(results.map((each) => [each.id, each] as const))('%s', (_id, each) => {
    expect(
      Math.abs(each.difference),
      `${each.source}: printed ${each.printed} ${each.unit}, computed ${each.computed}`,
    ).toBeLessThanOrEqual(each.tolerance)
  })

  it('has every id once', () => {
    expect(new Set(results.map(({ id }) => id)).size).toBe(results.length)
  })

  it('explains every tolerance wider than half of the last printed digit', () => {
    const wide = results.filter(
      ({ printed, tolerance, why }) => why === undefined && tolerance > 0.51 * lastDigit(printed),
    )
    expect(wide.map(({ id }) => id)).toEqual([])
  })
})

/** Value of the last digit printed; a whole number is taken as printed to the unit. */
function lastDigit(printed: number): number {
  const decimals = /\.(\d+)$/.exec(String(printed))?.[1]?.length ?? 0
  return 10 ** -decimals
}
