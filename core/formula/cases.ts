/** Cases: several equations of a clause, of which conditions choose one. */
import type { Kind, KindValue } from '../quantity/kinds.ts'
import { citation, type Clause } from '../sources/clause.ts'
import { useClause } from '../sources/coverage.ts'
import { compileCondition } from './compile.ts'
import { checkCondition } from './dimensions.ts'
import { readCondition, symbolsOf } from './expression.ts'
import { FormulaError, type Branch, type Cases, type Numbers, type Rule, type Values, type Where } from './types.ts'
import { casesLines } from './write.ts'

/** A branch as it is written in a rule file; its clause goes on from the clause of the cases: "(a)", ".2". */
export type BranchText =
  | { readonly clause: string; readonly when: string; readonly use: Rule }
  | { readonly clause: string; readonly otherwise: Rule }

type RuleOf<B> = B extends { readonly use: infer R } ? R : B extends { readonly otherwise: infer R } ? R : never
type WhereOf<R> = R extends { readonly where: infer W } ? W : never
type Intersection<U> = (U extends unknown ? (part: U) => void : never) extends (whole: infer I) => void ? I : never
type Flat<T> = { readonly [S in keyof T]: T[S] }

/** All symbols of the equations used and of the conditions; one of two kinds becomes `never`, which no value has. */
export type MergedWhere<B extends readonly BranchText[], X extends Where> =
  Flat<Intersection<WhereOf<RuleOf<B[number]>> | X>> extends infer W extends Where ? W : never
export type ResultKind<B extends readonly BranchText[]> =
  RuleOf<B[number]> extends { readonly kind: infer K extends Kind } ? K : never

/** Makes cases of a clause. `at` gives the clause of a branch. Called by chapter().cases, which says what is refused. */
export function makeCases<W extends Where, K extends Kind>(
  clause: Clause,
  at: (part: string) => Clause,
  branchTexts: readonly BranchText[],
  extra: Where,
): Cases<W, K> {
  const named = citation(clause)
  const refuse = (why: string): never => {
    throw new Error(`${named}: ${why}`)
  }
  const rules = branchTexts.map((text) => ('use' in text ? text.use : text.otherwise))
  const last = rules.at(-1) ?? refuse('has no branch')
  if (branchTexts.findIndex((text) => 'otherwise' in text) < branchTexts.length - 1 && branchTexts.some(isOtherwise))
    refuse('has a branch after the one that takes whatever is left')
  const odd = rules.find((rule) => rule.kind !== last.kind)
  if (odd) refuse(`gives ${odd.kind} (${citation(odd.clause)}) or ${last.kind} (${citation(last.clause)})`)

  const where: Record<string, Kind> = {}
  for (const [name, kind] of [...rules.map((rule) => rule.where), extra].flatMap((map) => Object.entries(map))) {
    const known = where[name] ?? kind
    if (known !== kind) refuse(`symbol ${name} is ${known} in one place and ${kind} in another`)
    where[name] = kind
  }
  const kindOf = (name: string): Kind => where[name] ?? refuse(`symbol ${name} of a condition is not declared`)

  const branches = branchTexts.map((text): Branch => {
    const place = at(text.clause)
    if (!('use' in text)) return { clause: place, when: undefined, use: text.otherwise }
    try {
      const when = readCondition(text.when)
      checkCondition(when, kindOf)
      return { clause: place, when, use: text.use }
    } catch (error) {
      throw new Error(`${citation(place)}: ${error instanceof Error ? error.message : String(error)}`, { cause: error })
    }
  })
  const conditioned = new Set(branches.flatMap((branch) => (branch.when ? symbolsOf(branch.when) : [])))
  const idle = Object.keys(extra).find((name) => !conditioned.has(name))
  if (idle !== undefined) refuse(`symbol ${idle} is declared but no condition has it`)

  const fault = (values: Numbers): never => {
    const own = Object.fromEntries([...conditioned].map((name) => [name, values[name] ?? NaN]))
    throw new FormulaError('a side of a condition is not a finite number', named, own)
  }
  const tests = branches.map((branch) => branch.when && compileCondition(branch.when, fault))
  const choose = (values: Numbers): number => {
    const index = tests.findIndex((test) => test === undefined || test(values))
    if (index >= 0) return index
    throw new FormulaError('no branch holds', named, Object.fromEntries(Object.entries(values)))
  }

  for (const branch of branches) useClause(branch.clause)
  const cases: Cases<W, K> = {
    rule: 'cases',
    clause,
    symbol: last.symbol,
    kind: last.kind as K,
    where: where as W,
    branches,
    choose: (values) => choose(values),
    value: (values: Values<W>): KindValue[K] => {
      const { use } = branches[choose(values)]!
      return use.value(values) as KindValue[K]
    },
    working: (values, system) => casesLines(cases, values, cases.value(values), system),
  }
  return cases
}

const isOtherwise = (text: BranchText): boolean => 'otherwise' in text
