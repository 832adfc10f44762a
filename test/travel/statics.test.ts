import { describe, expect, it } from 'vitest'
import { momentAt, proveEquilibrium, proveValue, reactions, shearAt, type Standing } from '../../core/travel/statics.ts'

describe('plain statics of a simple girder', () => {
  const standing: Standing = { length: 10, loads: [{ x: 4, force: 50 }], uniform: 2, left: 10, right: 30 }

  it('reactions, moment and both sides of the shear', () => {
    expect(reactions(standing)).toEqual({ left: 42, right: 28 })
    expect(momentAt(standing, 4)).toBeCloseTo(10 + 168 - 16, 12)
    expect([0, 3, 4, 10].map((x) => shearAt(standing, x))).toEqual([42, 36, 34, -28])
  })

  it('an extreme that does not close is a named error', () => {
    const named = (run: () => void): string => {
      try {
        run()
      } catch (error) {
        return (error as Error).name
      }
      return 'none'
    }
    expect(named(() => proveEquilibrium(standing, 4))).toBe('none')
    expect(named(() => proveEquilibrium({ ...standing, left: NaN }, 4))).toBe('EquilibriumError')
    expect(named(() => proveValue(100, 100 + 1e-8, 100))).toBe('none')
    expect(named(() => proveValue(100, 100 + 1e-6, 100))).toBe('EquilibriumError')
    expect(named(() => proveValue(NaN, 1, 1))).toBe('EquilibriumError')
  })
})
