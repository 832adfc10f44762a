/** Printed problems. Tolerances are half of the last printed digit. */
import { describe, expect, it } from 'vitest'
import { drive } from '../../core/travel/drive.ts'
import type { Effect, Extreme } from '../../core/travel/types.ts'
import { lineLoad, on, term, train } from './trains.ts'

interface Problem {
  readonly span: number
  readonly loads: readonly number[]
  readonly spacings: readonly number[]
}

const ask = ({ span, loads, spacings }: Problem, effect: (wheels: readonly number[]) => Effect): Extreme =>
  drive(on([span], train(loads, spacings)), effect(loads))

const moment = (problem: Problem): Extreme => ask(problem, (wheels) => ({ kind: 'moments', terms: [term(wheels)] }))
const shear = (problem: Problem): Extreme => ask(problem, (wheels) => ({ kind: 'shear', wheels, uniform: lineLoad(0) }))
const reaction = (problem: Problem, end: 'left' | 'right', uniform = 0): Extreme =>
  ask(problem, (wheels) => ({ kind: 'endReaction', end, wheels, uniform: lineLoad(uniform) }))

describe('printed moving-load problems', () => {
  // Kassimali, Structural Analysis, 6th ed., Problem 9.22, Fig. P9.13. Printed: loads, and the resultant 1.64 m from the first
  // load; the rest is arithmetic from these inputs.
  it('Kassimali 9.22: three loads on 15 m', () => {
    const problem = { span: 15, loads: [125, 100, 50], spacings: [2, 3] }
    const worst = moment(problem)
    expect(Math.abs(worst.value - 831.86)).toBeLessThan(0.005)
    expect(Math.abs(worst.station - 7.682)).toBeLessThan(0.0005)
    expect(worst.on).toEqual([0, 1, 2])
    expect(Math.abs(Math.abs(shear(problem).value) - 245)).toBeLessThan(0.05)
  })

  // Gere, Mechanics of Materials, Problem 4.5-30: V_max = P (3 - d/L) printed; 78.4 kN m in the answer key, from memory.
  it('Gere 4.5-30: P and 2P on 12 m', () => {
    const problem = { span: 12, loads: [10, 20], spacings: [2.4] }
    expect(Math.abs(shear(problem).value)).toBeCloseTo(10 * (3 - 2.4 / 12), 12)
    expect(Math.abs(moment(problem).value - 78.4)).toBeLessThan(0.05)
    expect(moment(problem)).toMatchObject({ lead: 4, mirrored: false })
  })

  // arizval.com, Theory of Structures, module 4: inputs printed, results by arithmetic.
  it('40 and 80 kN, 3 m apart, on 10 m', () => {
    const problem = { span: 10, loads: [40, 80], spacings: [3] }
    const worst = drive(on([10], train([40, 80], [3], false)), { kind: 'moments', terms: [term([40, 80])] })
    expect(worst.value).toBeCloseTo(243, 9)
    expect(worst.station).toBeCloseTo(5.5, 9)
    expect(Math.abs(shear(problem).value)).toBeCloseTo(108, 9)
  })

  // F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025, part 8.
  it('two wheels of 161.239 kN, 3.4 m apart, on 7.5 m', () => {
    const problem = { span: 7.5, loads: [161.239, 161.239], spacings: [3.4] }
    const worst = moment(problem)
    expect(Math.abs(worst.value - 361.6)).toBeLessThan(0.05)
    expect(Math.abs(worst.value / 161.239 - 2.24266)).toBeLessThan(0.01 / 161.239)
    expect(worst.lead).toBeCloseTo(2.9, 9)
    expect(Math.abs(reaction(problem, 'left').value / 161.239 - 1.54667)).toBeLessThan(0.000005)
    expect(Math.abs(Math.abs(shear(problem).value) - 249.38)).toBeLessThan(0.005)
  })

  // AISC Manual Table 3-23, two equal moving loads (form from memory); 38.1 kip at 12 ft on 30 ft as in AISC Design Guide 7
  // (from memory): M = P (L - a/2)^2 / (2 L), V = P (2 - a/L). Feet and kips throughout.
  it('two wheels of 38.1 kip, 12 ft apart, on 30 ft', () => {
    const problem = { span: 30, loads: [38.1, 38.1], spacings: [12] }
    const worst = moment(problem)
    expect(Math.abs(worst.value - 365.76)).toBeLessThan(0.005)
    expect(worst.lead).toBeCloseTo(12, 9)
    expect(worst.station).toBeCloseTo(12, 9)
    expect(Math.abs(Math.abs(shear(problem).value) - 60.96)).toBeLessThan(0.005)
  })

  // Design of gantry girder, published calculation sheet: 125 + 125 x 6.4/10 + 0.3 x 5 = 206.5 kN.
  it('two wheels of 125 kN, 3.6 m apart, on 10 m with 0.3 kN/m of rail', () => {
    const problem = { span: 10, loads: [125, 125], spacings: [3.6] }
    expect(Math.abs(reaction(problem, 'left', 0.3).value - 206.5)).toBeLessThan(0.05)
    expect(Math.abs(reaction(problem, 'right', 0.3).value - 206.5)).toBeLessThan(0.05)
    expect(Math.abs(moment(problem).value - 420.25)).toBeLessThan(0.005)
  })

  // F. Carrasco, the same notes: the pair astride a support between two such simple spans, 1.54667 of a wheel.
  it('the bracket between two girders carries the sum of both', () => {
    const loads = [1, 1]
    const worst = drive(on([7.5, 7.5], train(loads, [3.4])), {
      kind: 'bracketReaction',
      support: 1,
      wheels: loads,
      uniform: lineLoad(0),
    })
    expect(Math.abs(worst.value - 1.54667)).toBeLessThan(0.000005)
    expect(worst.station).toBe(7.5)
  })
})
