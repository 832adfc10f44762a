import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { chapter } from '../../core/formula/chapter.ts'
import { FormulaError } from '../../core/formula/types.ts'
import { DIMENSIONS, as, type Kind } from '../../core/quantity/kinds.ts'
import { inUnit } from '../../core/quantity/units.ts'
import { coverage } from '../../core/sources/coverage.ts'
import { F2, F2_1, F2_2, F2_3, F2_4, F2_6, F2_LTB, girder, of } from './examples.ts'

describe('a formula', () => {
  it('gives what hand arithmetic gives', () => {
    const M_p = F2_1.value(girder)
    expect(inUnit(M_p, 'kip in')).toBeCloseTo(50 * 244, 8)
    // AISC Manual Table 3-2, W27X84: phi_b M_px = 915 kip-ft
    expect(Math.round(0.9 * inUnit(M_p, 'kip ft'))).toBe(915)
    // AISC Manual Table 3-2, W27X84: L_r = 20.8 ft
    expect(inUnit(F2_6.value(girder), 'ft')).toBeCloseTo(20.8, 1)
  })

  it('agrees with the same arithmetic typed out in inches and kips', () => {
    const slenderness = 240 / 2.54
    const byHand =
      ((Math.PI ** 2 * 29000) / slenderness ** 2) * Math.sqrt(1 + 0.078 * (2.81 / (213 * 26.1)) * slenderness ** 2)
    expect(inUnit(F2_4.value(girder), 'ksi') / byHand).toBeCloseTo(1, 12)
  })

  it('knows its clause, and the coverage list knows the formula', () => {
    expect(F2_1.clause).toEqual({ document: 'AISC 360-22', clause: 'F2', equation: 'F2-1' })
    expect(coverage()).toContainEqual({ document: 'AISC 360-22', clause: 'F2-1', status: 'used' })
    expect(coverage()).toContainEqual({ document: 'AISC 360-22', clause: 'F2.2(b)', status: 'used' })
  })

  it('is held by its bounds', () => {
    const raised = { ...girder, C_b: 1.9 }
    expect(F2_2.value(raised)).toBe(girder.M_p)
    expect(F2_2.value(girder)).toBeLessThan(girder.M_p)
    const k_c = chapter('AISC 360-22', 'Table B4.1a').formula('note a', {
      gives: ['k_c', 'ratio'],
      where: { h: 'length', t_w: 'length' },
      text: '4/sqrt(h/t_w)',
      atLeast: '0.35',
      atMost: '0.76',
    })
    const at = (slenderness: number): number => k_c.value({ h: as('length', slenderness), t_w: as('length', 1) })
    expect([at(16), at(64), at(400)]).toEqual([0.76, 0.5, 0.35])
  })

  it('raises a ratio to a ratio', () => {
    const E3_2 = chapter('AISC 360-22', 'E3').formula('E3-2', {
      gives: ['F_n', 'stress'],
      where: { F_y: 'stress', F_e: 'stress' },
      text: '0.658^(F_y/F_e)*F_y',
    })
    const values = { F_y: girder.F_y, F_e: of('stress', 40, 'ksi') }
    expect(inUnit(E3_2.value(values), 'ksi')).toBeCloseTo(0.658 ** (50 / 40) * 50, 10)
    expect(E3_2.working(values, 'us').text).toBe(
      'F_n = 0.658^(F_y/F_e) F_y = 0.658^[(50 ksi)/(40 ksi)] (50 ksi) = 29.63 ksi',
    )
    expect(() => E3_2.value({ ...values, F_e: of('stress', 0, 'ksi') })).toThrow(FormulaError)
  })

  it('takes constants with a unit of their own', () => {
    const J10_6 = chapter('AISC 360-22', 'J10').formula('J10-6', {
      gives: ['R_n', 'force'],
      where: { t_w: 'length', t_f: 'length', h: 'length' },
      constants: { C_r: ['stress', of('stress', 960_000, 'ksi'), '960,000 ksi'] },
      text: 'C_r*t_w^3*t_f/h^2',
    })
    const R_n = J10_6.value({ t_w: of('length', 0.46, 'in'), t_f: of('length', 0.64, 'in'), h: of('length', 24, 'in') })
    expect(inUnit(R_n, 'kip')).toBeCloseTo((960_000 * 0.46 ** 3 * 0.64) / 24 ** 2, 6)
  })

  it('never gives a number that is not finite', () => {
    const root = F2.formula('root', { gives: ['x', 'ratio'], where: { a: 'ratio' }, text: 'sqrt(a)' })
    const hidden = F2.formula('hidden', {
      gives: ['x', 'ratio'],
      where: { a: 'ratio', b: 'ratio' },
      text: 'min(a, 1/b)',
    })
    const unused = { a: -1, b: 0, other: 3 }
    expect(() => root.value(unused)).toThrow(FormulaError)
    expect(() => root.value(unused)).toThrow('AISC 360-22 root: x is not a finite number (in SI: a = -1)')
    // A division by zero is not smoothed over by the least of two.
    expect(() => hidden.value(unused)).toThrow('AISC 360-22 hidden: x is not a finite number (in SI: a = -1, b = 0)')
    expect(() => F2_1.value({ ...girder, F_y: as('stress', Infinity) })).toThrow('F_y = Infinity')
    try {
      root.value(unused)
      expect.unreachable()
    } catch (error) {
      expect(error).toMatchObject({ name: 'FormulaError', clause: 'AISC 360-22 root', values: { a: -1 } })
    }
  })

  it('does not compile with a missing value or one of another kind', () => {
    const refused = [
      // @ts-expect-error Z_x is missing
      () => F2_1.value({ F_y: girder.F_y }),
      // @ts-expect-error a length is no stress
      () => F2_1.value({ F_y: girder.L_b, Z_x: girder.Z_x }),
      // @ts-expect-error a bare number is no stress
      () => F2_1.value({ F_y: 345e6, Z_x: girder.Z_x }),
      // @ts-expect-error no such document
      () => chapter('AISC 360-99', 'F2'),
      // @ts-expect-error no such chapter
      () => chapter('AISC 360-22', 'Q2'),
      // @ts-expect-error a document with chapters wants one
      () => chapter('AISC 360-22'),
      // @ts-expect-error a clause of another chapter
      () => F2.clause('G2.1'),
      // @ts-expect-error no such kind
      () => F2.formula('x', { gives: ['x', 'ratio'], where: { a: 'temperature' }, text: 'a' }),
      // @ts-expect-error F_cr, which only one branch has, is missing
      () => F2_LTB.value({ ...girder, F_cr: undefined }),
    ]
    expect(() => refused[0]!()).toThrow(FormulaError)
  })
})

describe('what a formula is refused for when it is loaded', () => {
  const where = { a: 'ratio', L: 'length', d: 'distance', F: 'force', M: 'moment', A: 'area', m: 'mass' } as const
  type Name = keyof typeof where
  const load = (text: string, gives: Kind = 'ratio', ...names: Name[]): unknown =>
    F2.formula('F2-9', {
      gives: ['R', gives],
      where: Object.fromEntries(names.map((name) => [name, where[name]])),
      text,
    })

  it.each<[string, Kind, Name[], string]>([
    ['M + F', 'moment', ['M', 'F'], 'AISC 360-22 F2-9: adds "M" (kg m2 s-2) and "F" (kg m s-2)'],
    ['M - F*L*L', 'moment', ['M', 'F', 'L'], 'subtracts "M" (kg m2 s-2) and "F L L" (kg m3 s-2)'],
    ['min(F, a)', 'force', ['F', 'a'], 'takes the min of "F" (kg m s-2) and "a" (a ratio)'],
    ['max(F, 2*F, A)', 'force', ['F', 'A'], 'takes the max of "F" (kg m s-2) and "A" (m2)'],
    ['F/L', 'moment', ['F', 'L'], 'R is declared as moment (kg m2 s-2) but its text gives kg s-2'],
    ['sqrt(L)', 'length', ['L'], 'R is declared as length (m) but its text gives m0.5'],
    ['cbrt(A)', 'length', ['A'], 'but its text gives m0.667'],
    ['L^2', 'length', ['L'], 'but its text gives m2'],
    ['1 + L', 'length', ['L'], 'adds "1" (a ratio) and "L" (m)'],
    ['m*L', 'force', ['m', 'L'], 'but its text gives kg m'],
    ['-L', 'ratio', ['L'], 'R is declared as ratio (a ratio) but its text gives m'],
    ['a', 'ratio', ['a', 'L'], 'symbol L is declared but not used'],
    ['a*b', 'ratio', ['a'], 'symbol b is not declared'],
    ['e*a', 'ratio', ['a'], 'symbol e is not declared'],
    ['sin(a)', 'ratio', ['a'], 'function sin is not one of sqrt, cbrt, abs, min, max'],
    ['L.x(a)', 'ratio', ['a'], 'is not one of sqrt'],
    ['constructor(a)', 'ratio', ['a'], 'function constructor is not one of'],
    ['sqrt(a, 2)', 'ratio', ['a'], 'has 2 arguments'],
    ['min(a)', 'ratio', ['a'], 'has 1 arguments'],
    ['2 a', 'ratio', ['a'], 'leaves out a multiplication sign'],
    ['L^a', 'ratio', ['L', 'a'], '"L^a" has an exponent that is no number, and is not a ratio to a ratio'],
    ['2^L', 'ratio', ['L'], '"2^L" has an exponent that is no number'],
    ['L^(1/0)', 'ratio', ['L'], 'has an exponent that is no number'],
    ['a!', 'ratio', ['a'], 'is no operation here'],
    ['+a', 'ratio', ['a'], 'is no operation here'],
    ['a mod 2', 'ratio', ['a'], 'is no operation of a formula'],
    ['a == 1', 'ratio', ['a'], 'is no operation of a formula'],
    ['a = 1', 'ratio', ['a'], 'has no place in a formula'],
    ['a; a', 'ratio', ['a'], 'has no place in a formula'],
    ['[a, a]', 'ratio', ['a'], 'has no place in a formula'],
    ['a ? 1 : 2', 'ratio', ['a'], 'has no place in a formula'],
    ['"a"', 'ratio', ['a'], 'is no number'],
    ['true', 'ratio', ['a'], 'is no number'],
    ['0x1f*a', 'ratio', ['a'], 'is no plain decimal number'],
    ['a*', 'ratio', ['a'], 'cannot be read'],
    ['', 'ratio', ['a'], 'is no number'],
  ])('%s', (text, gives, names, message) => {
    expect(() => load(text, gives, ...names)).toThrow(message)
  })

  it('bounds are checked like the formula', () => {
    const bounded = (atMost: string): unknown =>
      F2.formula('F2-9', { gives: ['R', 'length'], where: { L: 'length', F: 'force' }, text: 'L', atMost })
    expect(() => bounded('F')).toThrow('R is declared as length (m) but its text gives kg m s-2')
    expect(() => bounded('2*X')).toThrow('symbol X is not declared')
  })

  it('pi and constants cannot be declared twice', () => {
    const twice = (constants: Record<string, readonly ['ratio', number, string]>): unknown =>
      F2.formula('F2-9', { gives: ['R', 'ratio'], where: { a: 'ratio' }, constants, text: 'a' })
    expect(() => twice({ a: ['ratio', 1, '1'] })).toThrow('symbol a is declared as a value and as a constant')
    expect(() => twice({ pi: ['ratio', 3, '3'] })).toThrow('pi is a number and cannot be declared')
  })

  it('lengths and distances go together, a zero goes with everything', () => {
    expect(() => load('L + d', 'distance', 'L', 'd')).not.toThrow()
    expect(() => load('max(0, F)', 'force', 'F')).not.toThrow()
    expect(() => load('sqrt(F*M)/sqrt(F*M*L^2) * L', 'ratio', 'F', 'M', 'L')).not.toThrow()
  })
})

describe('dimensions', () => {
  it('an accepted formula scales with the units of mass, length and time as its kind does', () => {
    const unit = fc.double({ min: 0.5, max: 2, noNaN: true })
    const value = fc.double({ min: 1, max: 3, noNaN: true })
    for (const formula of [F2_1, F2_3, F2_4, F2_6])
      fc.assert(
        fc.property(fc.tuple(unit, unit, unit), fc.array(value, { minLength: 9, maxLength: 9 }), (units, values) => {
          const factor = (kind: Kind): number =>
            DIMENSIONS[kind].reduce<number>((product, exponent, index) => product * units[index]! ** exponent, 1)
          const plain = Object.fromEntries(Object.keys(formula.where).map((name, index) => [name, values[index]!]))
          const kinds: Readonly<Record<string, Kind>> = formula.where
          const scaled = Object.fromEntries(Object.entries(plain).map(([name, x]) => [name, x * factor(kinds[name]!)]))
          const ratio = formula.value(scaled as never) / formula.value(plain as never)
          expect(ratio / factor(formula.kind)).toBeCloseTo(1, 10)
        }),
        { numRuns: 100 },
      )
  })
})
