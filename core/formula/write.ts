/** Workings as printed lines: symbols, then values with their units, then the result. */
import { type Kind, type UnitSystem } from '../quantity/kinds.ts'
import { SHOWN, inUnit, type Unit } from '../quantity/units.ts'
import { writeNumber } from '../quantity/write.ts'
import { citation, clausePlace, type Clause } from '../sources/clause.ts'
import { compile } from './compile.ts'
import { OPPOSITE, reasonsFor, type Chain } from './conditions.ts'
import { dimensionOf, kindWith } from './dimensions.ts'
import { symbolsOf, type Expression } from './expression.ts'
import { lineNumber, math, mathml, plain, type Script } from './script.ts'
import { setExpression, setLabel, setSymbols, type Leaf } from './typeset.ts'
import type { Cases, Constants, Figure, Formula, Line, Numbers, Step, Where } from './types.ts'
import type { Working } from './working.ts'

/** Every step of a working as printed lines, in order. */
export const writeWorking = (working: Working, system: UnitSystem): Line[] =>
  working.steps.flatMap((step) => linesOf(step, system))

/**
 * The line of a formula. Values stand in it in units that multiply out; the result comes in that unit first and then, where
 * another is usual, in that one. `before` are further symbols of the same result: "M_n = M_p = F_y Z_x".
 */
export function formulaLine(
  formula: Formula,
  values: Numbers,
  result: number,
  system: UnitSystem,
  before: readonly string[] = [],
): Line {
  const written = (script: Script): readonly [symbols: string, values: string] => {
    const names = [...before, formula.symbol].filter((name, index, all) => name !== all[index - 1])
    const equals = script.sign('=')
    const symbols =
      [...names.map((name) => script.symbol(name)), setSymbols(formula.expression, script)].join(equals) +
      bounds(formula, script)
    return [symbols, results(formula, values, result, system, script)]
  }
  return line('formula', formula.clause, written, formula.note)
}

/** The condition that chose the branch, with its values, and the line of the equation used; cases inside cases likewise. */
export function casesLines(
  cases: Cases,
  values: Numbers,
  result: number,
  system: UnitSystem,
  before: readonly string[] = [],
): Line[] {
  const index = cases.choose(values)
  const { clause, use } = cases.branches[index]!
  const reasons = reasonsFor(cases.branches, index, values)
  const names = [...before, cases.symbol]
  return [
    ...(reasons.length === 0 ? [] : [conditionLine(clause, reasons, cases.where, values, system)]),
    ...(use.rule === 'formula'
      ? [formulaLine(use, values, result, system, names)]
      : casesLines(use, values, result, system, names)),
  ]
}

function linesOf(step: Step, system: UnitSystem): Line[] {
  switch (step.step) {
    case 'rule':
      return step.rule.rule === 'formula'
        ? [formulaLine(step.rule, step.values, step.result, system)]
        : casesLines(step.rule, step.values, step.result, system)
    case 'part':
      return writeWorking(step.working, system)
    case 'given':
      return [line('given', step.clause, (script) => figureParts(step.figure, script, system), step.note)]
    case 'note':
      return [{ kind: 'note', clause: cited(step.clause), symbols: '', values: '', text: step.text, note: step.text }]
    case 'compare':
      return [compareLine(step, system)]
    case 'row': {
      const figures = (script: Script): string =>
        step.figures.map((figure) => figureParts(figure, script, system).join('')).join(script.sign(','))
      return [line('row', step.clause, (script) => ['', figures(script)], `${step.table}, ${step.key}`)]
    }
    case 'iteration': {
      const found = `by iteration, residual ${writeNumber(step.residual, 2)} after ${step.evaluations} evaluations`
      const note = step.note === '' ? found : `${step.note}, ${found}`
      return [line('iteration', undefined, (script) => figureParts(step.figure, script, system), note)]
    }
  }
}

const cited = (clause: Clause | undefined): string => (clause ? citation(clause) : '')

/** A line whose plain text is its symbols, its values and its note. */
function line(
  kind: Line['kind'],
  clause: Clause | undefined,
  written: (script: Script) => readonly [symbols: string, values: string],
  note: string,
): Line {
  const [symbols, values] = written(mathml)
  const text = written(plain).join('')
  return { kind, clause: cited(clause), symbols: math(symbols), values: math(values), text: withNote(text, note), note }
}

const withNote = (text: string, note: string): string => (note === '' ? text : `${text}   ${note}`)

/** A figure in the unit its kind is shown in. */
function shown(kind: Kind, value: number, script: Script, system: UnitSystem): string {
  const unit = SHOWN[kind][system]
  return script.quantity(lineNumber(inUnit(value, unit)), unit)
}

const figureParts = ([symbol, kind, value]: Figure, script: Script, system: UnitSystem): readonly [string, string] => [
  setLabel(symbol, script),
  `${script.sign('=')}${shown(kind, value, script, system)}`,
]

function compareLine(step: Extract<Step, { step: 'compare' }>, system: UnitSystem): Line {
  const op = step.holds ? step.op : OPPOSITE[step.op]
  const sides = [step.left, step.right]
  const symbols = sides.map(([name]) => setLabel(name, mathml)).join(mathml.sign(step.op))
  const values = sides.map(([, kind, value]) => shown(kind, value, mathml, system)).join(mathml.sign(op))
  const text = sides.map((side) => figureParts(side, plain, system).join('')).join(plain.sign(op))
  const note = step.holds ? '' : 'not satisfied'
  return { kind: 'compare', clause: '', symbols: math(symbols), values: math(values), text: withNote(text, note), note }
}

/** The least and greatest value a formula may give. */
function bounds({ symbol, atLeast, atMost }: Formula, script: Script): string {
  const most = atMost && setSymbols(atMost, script)
  const least = atLeast && setSymbols(atLeast, script)
  const [to, from] = [script.sign('<='), script.sign('>=')]
  if (most === undefined) return least === undefined ? '' : script.bound(`${from}${least}`, false)
  if (least === undefined) return script.bound(`${to}${most}`, false)
  return script.bound(`${least}${to}${script.symbol(symbol)}${to}${most}`, true)
}

/** "= 1.1 (50 ksi) ... = 610 kip-in = 50.8 kip-ft"; where a bound governs it says so and goes on from the bound. */
function results(formula: Formula, values: Numbers, result: number, system: UnitSystem, script: Script): string {
  const { kind, symbol } = formula
  const equals = script.sign('=')
  const leaf = valueLeaf(formula.where, formula.constants, values, system)
  const coherent = (value: number): string => inUnitOf(kind, value, script, system)
  const ends = [coherent(result), shown(kind, result, script, system)]

  // What a formula of numbers alone says is said by its symbols already.
  const substituted = (tree: Expression): string[] =>
    symbolsOf(tree).length === 0 ? [] : [setExpression(tree, script, leaf)]
  const chain = (parts: readonly string[]): string =>
    parts
      .filter((part, index) => part !== parts[index - 1])
      .map((part) => `${equals}${part}`)
      .join('')

  const own = formula.part('expression', values)
  const bound = own > result ? formula.atMost : own < result ? formula.atLeast : undefined
  if (bound === undefined) {
    const parts = [...substituted(formula.expression), ...ends]
    return formula.expression.node === 'number' ? chain(ends.slice(1).filter(() => kind !== 'ratio')) : chain(parts)
  }
  const governing = [...(bound.node === 'number' ? [] : [setSymbols(bound, script)])]
  const composite = bound.node === 'symbol' || bound.node === 'number' ? [] : substituted(bound)
  const limit = [...governing, ...composite, bound.node === 'number' ? setSymbols(bound, script) : coherent(result)]
  return [
    chain([...substituted(formula.expression), coherent(own)]),
    script.sign(own > result ? '>' : '<'),
    limit.join(equals),
    script.words(', so '),
    script.symbol(symbol),
    chain(ends),
  ].join('')
}

function inUnitOf(kind: Kind, value: number, script: Script, system: UnitSystem): string {
  const unit: Unit = SHOWN[kind].coherent[system]
  return script.quantity(lineNumber(inUnit(value, unit)), unit)
}

/** Values in units that multiply out; a constant as its source prints it where that is such a unit. */
function valueLeaf(where: Where, constants: Constants, values: Numbers, system: UnitSystem): Leaf {
  return (name) => {
    const [kind, value, printed] = constants[name] ?? [where[name]!, values[name]!, '']
    const unit: Unit = SHOWN[kind].coherent[system]
    const number = printed.endsWith(` ${unit}`) ? printed.slice(0, -unit.length - 1) : undefined
    return { number: number ?? lineNumber(inUnit(value, unit)), unit }
  }
}

function conditionLine(
  clause: Clause,
  reasons: readonly Chain[],
  where: Where,
  values: Numbers,
  system: UnitSystem,
): Line {
  const chains = (script: Script, term: (tree: Expression, kind: Kind) => string): string =>
    reasons
      .map(({ terms, ops }) => {
        const kind = chainKind(terms, where)
        return terms.map((tree, index) => term(tree, kind) + (ops[index] ? script.sign(ops[index]) : '')).join('')
      })
      .join(script.words(' and '))
  const value = (tree: Expression, kind: Kind, script: Script): string =>
    tree.node === 'number' ? setSymbols(tree, script) : shown(kind, compile(tree, {})(values), script, system)
  const full = (tree: Expression, kind: Kind): string =>
    tree.node === 'number'
      ? setSymbols(tree, plain)
      : `${setSymbols(tree, plain)}${plain.sign('=')}${value(tree, kind, plain)}`
  return {
    kind: 'condition',
    clause: citation(clause),
    symbols: math(chains(mathml, (tree) => setSymbols(tree, mathml))),
    values: math(chains(mathml, (tree, kind) => value(tree, kind, mathml))),
    text: `${chains(plain, full)}, ${clausePlace(clause)}`,
    note: '',
  }
}

/** The kind a chain is written in: a distance if any of its terms is one, else the kind of its first symbol or dimension. */
function chainKind(terms: readonly Expression[], where: Where): Kind {
  const named = terms.flatMap((tree) => (tree.node === 'symbol' ? [where[tree.name]!] : []))
  if (named.includes('distance')) return 'distance'
  const measured = terms.find((tree) => tree.node !== 'number') ?? terms[0]!
  return named[0] ?? kindWith(dimensionOf(measured, (name) => where[name]!)) ?? 'ratio'
}
