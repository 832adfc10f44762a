/** Closures and typesetting against the parser's own evaluation, on random formulas of every shape. */
import fc from 'fast-check'
import { OperatorNode, isOperatorNode, parse, type MathNode } from 'mathjs/number'
import { describe, expect, it } from 'vitest'
import { FormulaError } from '../../core/formula/types.ts'
import { readExpression, symbolsOf } from '../../core/formula/expression.ts'
import { mathml, math, plain } from '../../core/formula/script.ts'
import { setSymbols } from '../../core/formula/typeset.ts'
import { F2 } from './examples.ts'
import { faultsOf } from './xml.ts'

const SYMBOLS = ['E', 'e', 'phi', 'i', 'M_p', 'lambda_pf', 'C_b'] as const

const { text } = fc.letrec<{ text: string; leaf: string; number: string }>((tie) => ({
  number: fc.oneof(
    fc.integer({ min: 0, max: 20000 }).map(String),
    fc.tuple(fc.integer({ min: 0, max: 99 }), fc.integer({ min: 0, max: 999 })).map(([a, b]) => `${a}.${b}`),
  ),
  leaf: fc.oneof(
    { weight: 4, arbitrary: fc.constantFrom(...SYMBOLS) },
    { weight: 2, arbitrary: tie('number') },
    fc.constant('pi'),
  ),
  text: fc.oneof(
    { depthSize: 'small', withCrossShrink: true },
    tie('leaf'),
    fc
      .tuple(tie('text'), fc.constantFrom('+', '-', '*', '/', ' - ', ' * '), tie('text'))
      .map((parts) => parts.join('')),
    tie('text').map((inner) => `(${inner})`),
    fc
      .tuple(tie('text'), fc.constantFrom('2', '3', '0.5', '(1/3)', '-1', '(-2)', '1.5', '0'))
      .map(([base, n]) => `(${base})^${n}`),
    tie('leaf').map((inner) => `${inner}^2`),
    fc.tuple(tie('leaf'), tie('text')).map(([base, n]) => `${base}^(${n})`),
    tie('text').map((inner) => `-(${inner})`),
    tie('leaf').map((inner) => `-${inner}`),
    fc.tuple(fc.constantFrom('sqrt', 'abs', 'cbrt'), tie('text')).map(([name, inner]) => `${name}(${inner})`),
    fc
      .tuple(fc.constantFrom('min', 'max'), fc.array(tie('text'), { minLength: 2, maxLength: 4 }))
      .map(([name, inner]) => `${name}(${inner.join(', ')})`),
  ),
}))
const value = fc.double({ min: 0.01, max: 100, noNaN: true })
const scope = fc.record(Object.fromEntries(SYMBOLS.map((name) => [name, value]))) as fc.Arbitrary<
  Record<string, number>
>

const formulaOf = (text: string) =>
  F2.formula('random', {
    gives: ['x', 'ratio'],
    where: Object.fromEntries(symbolsOf(readExpression(text)).map((name) => [name, 'ratio' as const])),
    text,
  })

/** What the parser evaluates; undefined where that is not a finite number. */
function evaluated(text: string, values: Record<string, number>): number | undefined {
  // The parser's own min and max take numbers for equal that differ in the last digits.
  const result: unknown = multiplied(parse(text)).evaluate({ ...values, min: Math.min, max: Math.max })
  return typeof result === 'number' && Number.isFinite(result) ? result : undefined
}

/** Squares and cubes as products, as the closures compute them: powers differ from those in the last digit. */
function multiplied(node: MathNode): MathNode {
  const tree = node.map(multiplied)
  if (!isOperatorNode(tree) || (tree.fn as string) !== 'pow') return tree
  const [base, exponent] = tree.args as [MathNode, MathNode]
  const times = (a: MathNode, b: MathNode): MathNode => new OperatorNode('*', 'multiply', [a, b])
  if (exponent.toString() === '2') return times(base, base)
  return exponent.toString() === '3' ? times(times(base, base), base) : tree
}

describe('on random formulas', () => {
  it('closures give what the parser evaluates, to the last digit', () => {
    let compared = 0
    fc.assert(
      fc.property(text, scope, (text, values) => {
        const expected = evaluated(text, values)
        const formula = formulaOf(text)
        if (expected === undefined) {
          expect(() => formula.value(values)).toThrow(FormulaError)
          return
        }
        let result: number
        try {
          result = formula.value(values)
        } catch (error) {
          // Refused although finite: only where a zero divisor was hidden by what stands round it.
          expect(error).toBeInstanceOf(FormulaError)
          expect(text).toMatch(/\/|\^/)
          return
        }
        compared += 1
        expect(result === expected, `${text}: ${result}, ${expected}`).toBe(true)
      }),
      { numRuns: 3000 },
    )
    expect(compared).toBeGreaterThan(1500)
  })

  it('the plain text of a formula means what the formula means', () => {
    const near = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(1, Math.abs(b))
    fc.assert(
      fc.property(text, fc.array(scope, { minLength: 5, maxLength: 5 }), (text, scopes) => {
        const printed = setSymbols(readExpression(text), plain)
        const pairs = scopes.flatMap((values) => {
          const expected = evaluated(text, values)
          return expected === undefined ? [] : [[evaluated(typedOut(printed), values), expected] as const]
        })
        fc.pre(pairs.length > 0)
        // Brackets that change nothing are not printed, so sums may be taken in another order: where large numbers cancel,
        // digits are lost. A lost bracket would show at all five places.
        const agree = pairs.some(([again, expected]) => again !== undefined && near(again, expected))
        expect(agree, `${text} printed as ${printed}`).toBe(true)
      }),
      { numRuns: 3000 },
    )
  })

  it('the MathML of a formula is well formed', () => {
    fc.assert(
      fc.property(text, (text) => {
        expect(faultsOf(math(setSymbols(readExpression(text), mathml)))).toEqual([])
      }),
      { numRuns: 1000 },
    )
  })
})

/** Printed text with its brackets round, its products starred and its thousands joined, as the parser wants them. */
const typedOut = (printed: string): string =>
  printed
    .replace(/(\d),(?=\d{3}(\D|$))/g, '$1')
    .replace(/[[{]/g, '(')
    .replace(/[\]}]/g, ')')
    .replace(/(?<=[\w)]) (?=[\w(])/g, '*')
