/** Chapters of a document, from which formulas and cases are made. Everything is checked here, when a rule file is loaded. */
import { DIMENSIONS, as, type Kind, type KindValue } from '../quantity/kinds.ts'
import type { ChapterOf, DocumentKey } from '../sources/bibliography.ts'
import { citation, type Clause } from '../sources/clause.ts'
import { useClause } from '../sources/coverage.ts'
import { compile } from './compile.ts'
import { makeCases, type BranchText, type MergedWhere, type ResultKind } from './cases.ts'
import { dimensionOf, dimensionText, sameDimension } from './dimensions.ts'
import { readExpression, symbolsOf, type Expression } from './expression.ts'
import {
  FormulaError,
  type Cases,
  type Constants,
  type Formula,
  type Numbers,
  type Values,
  type Where,
} from './types.ts'
import { formulaLine } from './write.ts'

/** What a formula is: its result, the kinds of its symbols, and its right-hand side as text. */
interface FormulaText<W extends Where, K extends Kind> {
  readonly gives: readonly [symbol: string, kind: K]
  readonly where: W
  readonly text: string
  /** The result is not taken greater, or not smaller, than this. */
  readonly atMost?: string
  readonly atLeast?: string
  /** Figures with a unit that the source prints in the formula. */
  readonly constants?: Constants
  /** Plain words printed beside the line. */
  readonly note?: string
}

export interface Chapter<C extends string = string> {
  /**
   * An equation by the number the source prints beside it, or by a name where it has none. Operations + - * / ^ with
   * number exponents, sqrt, cbrt, abs, min, max, and pi; every other symbol is declared in `where`. Throws at once for an
   * undeclared or unused symbol, a function off that list, and quantities that do not fit together.
   */
  formula<const W extends Where, const K extends Kind>(equation: string, spec: FormulaText<W, K>): Formula<W, K>
  /**
   * Equations of which the first one whose condition holds is used. Symbols that only conditions have are declared in
   * `where`. Throws at once for what `formula` throws for, for results of unlike kinds, and for a symbol of two kinds.
   */
  cases<const B extends readonly BranchText[], const X extends Where = never>(
    clause: `${C}${string}`,
    branches: B,
    where?: X,
  ): Cases<MergedWhere<B, X>, ResultKind<B>>
  /** A clause of this chapter or the commentary to it, for a check, a note or a table row. */
  clause(clause: `${'' | 'Commentary '}${C}${string}`): Clause
}

/** A chapter of a document in the bibliography; one that is not there does not compile. */
export function chapter<D extends DocumentKey, const C extends ChapterOf<D> = ChapterOf<D>>(
  document: D,
  ...key: string extends ChapterOf<D> ? [key?: C] : [key: C]
): Chapter<C> {
  const name = key[0] ?? ''
  // The types above have held the text to the document's chapters; the compiler cannot follow that into a union.
  const place = (clause: string, equation?: string): Clause =>
    ({ document, clause, ...(equation === undefined ? {} : { equation }) }) as unknown as Clause
  return {
    formula: (equation, spec) => makeFormula(place(name, equation), spec),
    cases: (clause, branches, where) => {
      const at = (part: string): Clause => place(`${clause}${part}`)
      return makeCases(place(clause), at, branches, where ?? {})
    },
    clause: (clause) => place(clause),
  }
}

function makeFormula<W extends Where, K extends Kind>(clause: Clause, spec: FormulaText<W, K>): Formula<W, K> {
  const named = citation(clause)
  const [symbol, kind] = spec.gives
  const constants = spec.constants ?? {}
  const expression = refusing(named, () => readExpression(spec.text))
  const atMost = spec.atMost === undefined ? undefined : refusing(named, () => readExpression(spec.atMost!))
  const atLeast = spec.atLeast === undefined ? undefined : refusing(named, () => readExpression(spec.atLeast!))
  const parts = [expression, atMost, atLeast].filter((part) => part !== undefined)
  refusing(named, () => {
    checkSymbols(parts, spec.where, constants)
    for (const part of parts) checkResult(part, symbol, kind, (name) => spec.where[name] ?? constants[name]![0])
  })

  const numbers = Object.fromEntries(Object.entries(constants).map(([name, [, si]]) => [name, si]))
  const compute = {
    expression: compile(expression, numbers),
    atMost: atMost && compile(atMost, numbers),
    atLeast: atLeast && compile(atLeast, numbers),
  }
  const plain = compute.expression
  const held = compute.atMost ?? (() => Infinity)
  const raised = compute.atLeast ?? (() => -Infinity)
  const bounded = atMost || atLeast ? (v: Numbers) => Math.max(Math.min(plain(v), held(v)), raised(v)) : plain

  useClause(clause)
  const formula: Formula<W, K> = {
    rule: 'formula',
    clause,
    symbol,
    kind,
    where: spec.where,
    note: spec.note ?? '',
    constants,
    expression,
    atMost,
    atLeast,
    value: (values: Values<W>): KindValue[K] => {
      const result = bounded(values)
      if (!Number.isFinite(result)) throw notFinite(formula, values)
      return as(kind, result)
    },
    part: (part, values) => compute[part]?.(values) ?? NaN,
    working: (values, system) => formulaLine(formula, values, formula.value(values), system),
  }
  return formula
}

/** Only the formula's own symbols are listed, not all that a wider object carries. */
function notFinite(formula: { clause: Clause; symbol: string; where: Where }, values: Numbers): FormulaError {
  const own = Object.fromEntries(Object.keys(formula.where).map((name) => [name, values[name] ?? NaN]))
  return new FormulaError(`${formula.symbol} is not a finite number`, citation(formula.clause), own)
}

/** Puts the citation before whatever an equation is refused for. */
function refusing<T>(named: string, make: () => T): T {
  try {
    return make()
  } catch (error) {
    throw new Error(`${named}: ${error instanceof Error ? error.message : String(error)}`, { cause: error })
  }
}

function checkSymbols(parts: readonly Expression[], where: Where, constants: Constants): void {
  const declared = [...Object.keys(where), ...Object.keys(constants)]
  const used = new Set(parts.flatMap(symbolsOf))
  const twice = declared.find((name, index) => declared.indexOf(name) !== index)
  if (twice !== undefined) throw new Error(`symbol ${twice} is declared as a value and as a constant`)
  if (declared.includes('pi')) throw new Error('pi is a number and cannot be declared')
  const unknown = [...used].find((name) => !declared.includes(name))
  if (unknown !== undefined) throw new Error(`symbol ${unknown} is not declared`)
  const idle = declared.find((name) => !used.has(name))
  if (idle !== undefined) throw new Error(`symbol ${idle} is declared but not used`)
}

function checkResult(tree: Expression, symbol: string, kind: Kind, kindOf: (name: string) => Kind): void {
  const dimension = dimensionOf(tree, kindOf)
  if (!sameDimension(dimension, DIMENSIONS[kind]))
    throw new Error(
      `${symbol} is declared as ${kind} (${dimensionText(DIMENSIONS[kind])}) but its text gives ${dimensionText(dimension)}`,
    )
}
