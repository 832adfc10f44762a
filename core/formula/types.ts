/** What the formula room hands out: formulas and cases as plain values, the steps of a working, and its printed lines. */
import type { Kind, KindValue, UnitSystem } from '../quantity/kinds.ts'
import type { Clause } from '../sources/clause.ts'
import type { Condition, Expression } from './expression.ts'

/** Symbol -> kind of the quantity it stands for. */
export type Where = Readonly<Record<string, Kind>>

/** The values a formula wants, in SI, each branded by its kind. */
export type Values<W extends Where> = { readonly [S in keyof W]: KindValue[W[S]] }

/** Symbol -> kind, SI value, and the figure with its unit as the source prints it. */
export type Constants = Readonly<Record<string, readonly [kind: Kind, si: number, printed: string]>>

interface Common<W extends Where, K extends Kind> {
  readonly clause: Clause
  readonly symbol: string
  readonly kind: K
  readonly where: W
  /** The result in SI. Throws FormulaError where it is not a finite number. */
  value(values: Values<W>): KindValue[K]
}

/** One equation of a source. */
export interface Formula<W extends Where = Where, K extends Kind = Kind> extends Common<W, K> {
  readonly rule: 'formula'
  readonly note: string
  readonly constants: Constants
  readonly expression: Expression
  readonly atMost: Expression | undefined
  readonly atLeast: Expression | undefined
  /** The value of one of its parts in SI, for what is printed between. */
  part(part: 'expression' | 'atMost' | 'atLeast', values: Values<W>): number
  /** The typeset line with these values. */
  working(values: Values<W>, system: UnitSystem): Line
}

/** One branch of cases. */
export interface Branch {
  readonly clause: Clause
  /** Undefined: what is left when no other branch holds. */
  readonly when: Condition | undefined
  readonly use: Rule
}

/** Equations of which the first one whose condition holds is used. */
export interface Cases<W extends Where = Where, K extends Kind = Kind> extends Common<W, K> {
  readonly rule: 'cases'
  readonly branches: readonly Branch[]
  /** Index of the branch that these values take. */
  choose(values: Values<W>): number
  /** The conditions with their values, then the line of the equation used. */
  working(values: Values<W>, system: UnitSystem): Line[]
}

export type Rule<W extends Where = Where, K extends Kind = Kind> = Formula<W, K> | Cases<W, K>

/** Values by symbol, their kinds told elsewhere. */
export type Numbers = Readonly<Record<string, number>>

export type Comparison = '<=' | '<' | '>=' | '>'

/** A figure with its symbol, kind and SI value. */
export type Figure = readonly [symbol: string, kind: Kind, value: number]

/** A derivation, step by step. Written out by writeWorking (write.ts). */
export interface Working {
  readonly steps: readonly Step[]
}

/** One step of a working: references only, written out when it is to be shown. */
export type Step =
  | { readonly step: 'rule'; readonly rule: Rule; readonly values: Numbers; readonly result: number }
  | { readonly step: 'given'; readonly figure: Figure; readonly note: string; readonly clause: Clause | undefined }
  | { readonly step: 'note'; readonly text: string; readonly clause: Clause | undefined }
  | {
      readonly step: 'compare'
      readonly left: Figure
      readonly op: Comparison
      readonly right: Figure
      readonly holds: boolean
    }
  | {
      readonly step: 'row'
      readonly table: string
      readonly key: string
      readonly figures: readonly Figure[]
      readonly clause: Clause | undefined
    }
  /** Another derivation used here, with what it came to: written in full, or told by its result where it stands already. */
  | { readonly step: 'part'; readonly working: Working; readonly figure: Figure; readonly name: string }
  | {
      readonly step: 'iteration'
      readonly figure: Figure
      readonly residual: number
      readonly evaluations: number
      readonly note: string
    }

/**
 * One printed line. `symbols` and `values` are MathML; where `symbols` is an equation `values` goes on from its end and
 * begins with an equals sign. `text` is the whole line, note included, for plain text. Empty where there is nothing to say.
 */
export interface Line {
  readonly kind: 'given' | 'formula' | 'condition' | 'note' | 'compare' | 'row' | 'iteration'
  readonly clause: string
  readonly symbols: string
  readonly values: string
  readonly text: string
  readonly note: string
}

/** A result that is not a finite number: where, and from which values. */
export class FormulaError extends Error {
  readonly clause: string
  readonly values: Numbers

  constructor(message: string, clause: string, values: Numbers) {
    const listed = Object.entries(values).map(([symbol, value]) => `${symbol} = ${value}`)
    super(`${clause}: ${message}${listed.length > 0 ? ` (in SI: ${listed.join(', ')})` : ''}`)
    this.name = 'FormulaError'
    this.clause = clause
    this.values = values
  }
}
