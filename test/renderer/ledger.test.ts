import { describe, expect, test } from 'vitest'
import { writeWorking } from '../../core/formula/write.ts'
import { math } from '../../core/formula/script.ts'
import type { CheckValues } from '../../core/review/values.ts'
import {
  comparison,
  ledgerOf,
  LIMIT,
  neighbour,
  placeSentence,
  placeWords,
  ruleOf,
  summary,
  utilisationText,
} from '../../renderer/ledger/order.ts'
import { sidesOf } from '../../renderer/ledger/pieces.ts'
import { reviewOf, sample } from './plant.ts'

const two = sample('two-crane-plate-girder')
const bare = two.checks.find(({ status }) => status === 'not-applicable')!
const check = (status: CheckValues['status'], utilisation?: number): CheckValues => ({
  ...bare,
  id: `${status} ${utilisation ?? ''}`,
  status,
  ...(utilisation === undefined ? {} : { utilisation }),
})

describe('the ledger', () => {
  test('has what fails first, then what holds, worst first, then what is not covered; the rest apart', () => {
    const checks = [
      check('holds', 0.2),
      check('not-applicable'),
      check('fails', 1.01),
      check('holds', 0.99),
      check('not-covered'),
      check('fails', 1.4),
    ]
    const { open, notApplicable } = ledgerOf(checks)
    expect(open.map(({ id }) => id)).toEqual(['fails 1.4', 'fails 1.01', 'holds 0.99', 'holds 0.2', 'not-covered '])
    expect(notApplicable).toHaveLength(1)
    expect(summary(checks)).toBe('2 checks fail, 1 not covered, 2 hold')
  })

  test('of a review loses no check', () => {
    const { open, notApplicable } = ledgerOf(two.checks)
    expect(new Set([...open, ...notApplicable])).toEqual(new Set(two.checks))
    expect(open[0]!.id).toBe(two.governing)
  })

  test('compares demand and resistance in the units shown, the unit once', () => {
    const crippling = two.checks.find(({ id }) => id === 'us.web.crippling.end')!
    expect(comparison(crippling, 'us')).toBe('313.9 of 263.7 kip')
    expect(comparison(crippling, 'si')).toMatch(/^1,396 of 1,173 kN$/)
    expect(
      comparison(
        two.checks.find(({ status }) => status === 'not-covered')!,
        'us',
      ),
    ).toBe('')
    const proportions = two.checks.find(({ id }) => id === 'us.proportions')!
    expect(comparison(proportions, 'us')).toBe('0.7477 of 0.9')
  })

  test('never writes a failure as 1.00, nor what holds as more', () => {
    const text = (status: CheckValues['status'], utilisation: number): string =>
      utilisationText(check(status, utilisation))
    expect(text('fails', 1.0001)).toBe('1.01')
    expect(text('fails', 1.2)).toBe('1.20')
    expect(text('holds', 0.999)).toBe('1.00')
    expect(text('holds', 0.587)).toBe('0.59')
    expect(text('fails', 1234)).toBe('1,234')
    expect(utilisationText(check('not-covered'))).toBe('')
  })

  test('measures on a rule whose limit mark stands within it', () => {
    expect(ruleOf(1)).toBe(LIMIT)
    expect(ruleOf(0.5)).toBe(LIMIT / 2)
    expect(ruleOf(50)).toBe(1)
    expect(ruleOf(-1)).toBe(0)
  })

  test('is walked by keys and ends at its ends', () => {
    const ids = ['a', 'b', 'c']
    const walk = (from: string | undefined, key: string) => neighbour(ids, from, key)
    expect(walk('a', 'ArrowDown')).toBe('b')
    expect(walk('c', 'ArrowDown')).toBe('c')
    expect(walk('a', 'ArrowUp')).toBe('a')
    expect([walk('b', 'Home'), walk('b', 'End')]).toEqual(['a', 'c'])
    expect(walk(undefined, 'ArrowDown')).toBe('a')
    expect(walk('a', 'Enter')).toBeUndefined()
  })

  test('tells where a check was judged', () => {
    const crippling = two.checks.find(({ id }) => id === 'us.web.crippling.end')!
    expect(placeSentence(two, crippling, 'us')).toBe(
      '1.2D + 1.6L, Crane 1, 40 ton in full, Crane 2, 25 ton vertical. At station 0\' 0" in span 1: ' +
        'wheel 1 of Crane 1, 40 ton at 0\' 0"; wheel 1 of Crane 2, 25 ton at 16\' 11".',
    )
    expect(
      placeSentence(
        two,
        two.checks.find(({ id }) => id === 'us.proportions')!,
        'us',
      ),
    ).toBe('Wherever the cranes stand.')
    expect(placeWords(crippling, true)).toBe(
      'span 1 · 1.2D + 1.6L · Crane 1, 40 ton in full, Crane 2, 25 ton vertical · fails, 1.19',
    )
  })
})

describe('a typeset line', () => {
  const relation = (sign: string): string => `<mo>${sign}</mo>`

  test('is parted at its relations, each side whole, and inside a side before its signs', () => {
    const sides = sidesOf(
      math(
        `<mi>a</mi>${relation('=')}<mi>b</mi>${relation('+')}<mrow><mi>c</mi><mo>+</mo><mi>d</mi></mrow>${relation('≤')}<mn>3</mn>`,
      ),
    )
    expect(sides.map((side) => side.length)).toEqual([1, 2, 1])
    expect(sides[1]![0]).toContain('<mrow><mo form="infix">=</mo><mi>b</mi></mrow>')
    expect(sides[1]![1]).toContain('<mrow><mo form="infix">+</mo><mrow><mi>c</mi><mo>+</mo><mi>d</mi></mrow></mrow>')
  })

  test('keeps a sign with the number it belongs to, and leaves alone what it does not know', () => {
    const [first] = sidesOf(math(`${relation('=')}${relation('\u2212')}<mn>3</mn>`))
    expect(first).toHaveLength(1)
    expect(sidesOf('')).toEqual([])
    for (const other of ['<b>not ours</b>', math('<mi>a</mrow><mrow>'), math('words <mi>a</mi>')])
      expect(sidesOf(other)).toEqual([[other]])
  })

  test('of every working of the samples is whole MathML in every piece and loses nothing', () => {
    const bare = (text: string): string =>
      text.replaceAll(' form="infix"', '').replace(/<math [^>]*><mrow>|<\/mrow><\/math>/g, '')
    let parted = 0
    for (const name of ['fifty-ton-cab', 'ten-ton-pendant', 'two-crane-plate-girder'])
      for (const { working } of reviewOf(name).checks)
        for (const line of working === undefined ? [] : writeWorking(working(), 'us'))
          for (const whole of [line.symbols, line.values]) {
            const pieces = sidesOf(whole).flat()
            if (pieces.length > 1) parted += 1
            expect(pieces.map(bare).join('')).toBe(bare(whole))
            for (const piece of pieces) expect(piece).toMatch(/^<math [^>]*><mrow>.*<\/mrow><\/math>$/)
          }
    expect(parted).toBeGreaterThan(500)
  })
})
