import { describe, expect, it } from 'vitest'
import { chapter } from '../../core/formula/chapter.ts'
import { FormulaError } from '../../core/formula/types.ts'
import { as } from '../../core/quantity/kinds.ts'
import { F2, F2_1, F2_2, F2_3, F2_LTB, girder } from './examples.ts'

const ratio = (name: string, text: string, where: Record<string, 'ratio'>) =>
  F2.formula(name, { gives: ['x', 'ratio'], where, text })
const one = ratio('one', '1', {})
const two = ratio('two', '2', {})
const three = ratio('three', '3', {})

describe('cases', () => {
  const at = (L_b: number): number => F2_LTB.choose({ ...girder, L_b: as('distance', L_b) })

  it('take the branch whose border is reached, on the border the one that includes it', () => {
    const above = (x: number): number => x * (1 + Number.EPSILON)
    expect([at(0), at(girder.L_p), at(above(girder.L_p))]).toEqual([0, 0, 1])
    expect([at(girder.L_r), at(above(girder.L_r)), at(1000)]).toEqual([1, 2, 2])
    expect(F2_LTB.value({ ...girder, L_b: girder.L_p })).toBe(F2_1.value(girder))
    expect(F2_LTB.value(girder)).toBe(F2_2.value(girder))
    expect(F2_LTB.value({ ...girder, L_b: as('distance', 20) })).toBe(F2_3.value(girder))
  })

  it('know < from <= and join comparisons by and, or and chains', () => {
    const joined = F2.cases(
      'F2.9',
      [
        { clause: '(a)', when: 'a < 1 and b >= 2', use: one },
        { clause: '(b)', when: '1 <= a < 2 or (b > 5 and a > 0)', use: two },
        { clause: '(c)', otherwise: three },
      ],
      { a: 'ratio', b: 'ratio' },
    )
    const value = (a: number, b: number): number => joined.value({ a, b })
    expect([value(0.9, 2), value(0.9, 1.9), value(1, 2), value(2, 5), value(2, 5.1), value(-1, 1)]).toEqual([
      1, 3, 2, 3, 2, 3,
    ])
  })

  it('may stand in cases', () => {
    const inner = F2.cases(
      'F2.8',
      [
        { clause: '(i)', when: 'a < 0', use: one },
        { clause: '(ii)', otherwise: two },
      ],
      {
        a: 'ratio',
      },
    )
    const outer = F2.cases(
      'F2.9',
      [
        { clause: '(a)', when: 'b <= 0', use: inner },
        { clause: '(b)', otherwise: three },
      ],
      {
        b: 'ratio',
      },
    )
    expect([outer.value({ a: -1, b: 0 }), outer.value({ a: 1, b: 0 }), outer.value({ a: 1, b: 1 })]).toEqual([1, 2, 3])
    // @ts-expect-error a, which only the inner cases want, is missing
    expect(() => outer.value({ b: 0 })).toThrow(FormulaError)
  })

  it('never choose by a number that is not finite', () => {
    expect(() => at(NaN)).toThrow('AISC 360-22 F2.2: a side of a condition is not a finite number (in SI: L_b = NaN')
    expect(() => at(Infinity)).toThrow(FormulaError)
  })

  it('tell where no branch holds', () => {
    const open = F2.cases('F2.9', [{ clause: '(a)', when: 'a > 0', use: one }], { a: 'ratio' })
    expect(() => open.value({ a: 0 })).toThrow('AISC 360-22 F2.9: no branch holds (in SI: a = 0)')
  })

  it.each<[string, string]>([
    ['L_b <= F_y', 'compares "L_b" (m) and "F_y" (kg m-1 s-2)'],
    ['L_b <= 3', 'compares "L_b" (m) and "3" (a ratio)'],
    ['L_b <= X', 'AISC 360-22 F2.9: symbol X of a condition is not declared'],
    ['L_b', 'AISC 360-22 F2.9(a): "L_b" is no condition'],
    ['L_b == L_p', '"L_b == L_p" is no comparison by <=, <, >= or >'],
    ['not (L_b < L_p)', 'is no comparison'],
    ['L_b < L_p <', 'cannot be read'],
    ['L_b*L_p*L_r*S_x*S_x < L_b*L_p*L_r*S_x*S_x', 'compares quantities of m9, which is no kind'],
  ])('are refused for the condition %s', (when, message) => {
    expect(() => F2.cases('F2.9', [{ clause: '(a)', when, use: F2_2 }])).toThrow(message)
  })

  it('accept a zero beside any quantity', () => {
    expect(() => F2.cases('F2.9', [{ clause: '(a)', when: 'L_b >= 0', use: F2_2 }])).not.toThrow()
  })

  it('are refused for branches that do not fit together', () => {
    expect(() =>
      F2.cases('F2.9', [
        { clause: '(a)', when: 'F_y > 0', use: F2_1 },
        { clause: '(b)', otherwise: one },
      ]),
    ).toThrow('AISC 360-22 F2.9: gives moment (AISC 360-22 F2-1) or ratio (AISC 360-22 one)')
    expect(() => F2.cases('F2.9', [])).toThrow('has no branch')
    expect(() =>
      F2.cases('F2.9', [
        { clause: '(a)', otherwise: one },
        { clause: '(b)', when: '1 < 2', use: two },
      ]),
    ).toThrow('has a branch after the one that takes whatever is left')
    expect(() => F2.cases('F2.9', [{ clause: '(a)', otherwise: one }], { a: 'ratio' })).toThrow(
      'symbol a is declared but no condition has it',
    )
    const span = F2.formula('span', { gives: ['x', 'ratio'], where: { L_b: 'length', d: 'length' }, text: 'L_b/d' })
    const bay = F2.formula('bay', { gives: ['x', 'ratio'], where: { L_b: 'distance', d: 'length' }, text: 'L_b/d' })
    const mixed = () =>
      F2.cases('F2.9', [
        { clause: '(a)', when: 'd > 0', use: span },
        { clause: '(b)', otherwise: bay },
      ])
    expect(mixed).toThrow('AISC 360-22 F2.9: symbol L_b is length in one place and distance in another')
  })

  it('cite documents without chapters by name', () => {
    const beam = chapter('statics').formula('simple beam', {
      gives: ['M', 'moment'],
      where: { P: 'force', L: 'distance' },
      text: 'P*L/4',
    })
    expect(beam.clause).toEqual({ document: 'statics', clause: '', equation: 'simple beam' })
  })
})
