import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { iterate } from '../../core/formula/iterate.ts'
import { FormulaError } from '../../core/formula/types.ts'

describe('iterate', () => {
  it('finds roots known in closed form to the last digits, with few evaluations', () => {
    const cases = [
      [(x: number) => x * x - 2, 0, 2, Math.SQRT2],
      [(x: number) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
      [(x: number) => x ** 9, -1, 1.5, 0],
      [(x: number) => Math.exp(x) - 1e6, -50, 50, Math.log(1e6)],
      [(x: number) => Math.atan(x - 0.001), -1000, 1, 0.001],
    ] as const
    for (const [f, a, b, exact] of cases) {
      const { root, residual, evaluations } = iterate('test', f, a, b, 1e-14)
      // The tolerance is on x, so even the root of ninth order, where f is flat, is found as closely as the others.
      expect(Math.abs(root - exact)).toBeLessThanOrEqual(2e-14 * Math.max(1, exact))
      expect(residual).toBe(f(root))
      expect(evaluations).toBeLessThan(150)
    }
    expect(iterate('test', (x) => x * x - 2, 0, 2).evaluations).toBeLessThan(15)
  })

  it('takes a root at either end, and ends in either order', () => {
    expect(iterate('test', (x) => x, 0, 1)).toEqual({ root: 0, residual: 0, evaluations: 2 })
    expect(iterate('test', (x) => x - 1, 0, 1)).toEqual({ root: 1, residual: 0, evaluations: 2 })
    expect(iterate('test', (x) => x - 0.25, 1, 0).root).toBeCloseTo(0.25, 15)
  })

  it('finds the root of every cubic that has one in the bracket', () => {
    const place = fc.double({ min: -10, max: 10, noNaN: true })
    fc.assert(
      fc.property(place, fc.double({ min: 0.01, max: 5, noNaN: true }), (exact, stiff) => {
        const f = (x: number): number => stiff * (x - exact) + (x - exact) ** 3
        const { root } = iterate('test', f, -11, 12)
        expect(Math.abs(root - exact)).toBeLessThan(3e-13)
      }),
    )
  })

  it('never leaves the bracket, and stops at a jump', () => {
    const visited: number[] = []
    const jump = (x: number): number => {
      visited.push(x)
      return x < 1 / 3 ? -1 : 1
    }
    expect(iterate('test', jump, 0, 1).root).toBeCloseTo(1 / 3, 14)
    expect(Math.min(...visited)).toBeGreaterThanOrEqual(0)
    expect(Math.max(...visited)).toBeLessThanOrEqual(1)
  })

  it('names what cannot be solved', () => {
    expect(() => iterate('neutral axis', (x) => x * x + 1, -1, 1)).toThrow(
      'neutral axis: no change of sign between the ends (in SI: a = -1, b = 1, fa = 2, fb = 2)',
    )
    expect(() => iterate('neutral axis', (x) => 1 / x, -1, 1)).toThrow('in SI: x = 0, y = Infinity')
    expect(() => iterate('neutral axis', (x) => Math.sqrt(x), -1, 1)).toThrow('the function is not finite')
    expect(() => iterate('neutral axis', () => NaN, 0, 1)).toThrow(FormulaError)
  })
})
