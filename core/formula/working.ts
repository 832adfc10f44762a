/** The recorder a judge writes its derivation with. It keeps references; nothing is typeset until it is asked for. */
import type { Kind, KindValue, Quantity } from '../quantity/kinds.ts'
import { citation, type Clause } from '../sources/clause.ts'
import { TESTS } from './compile.ts'
import {
  FormulaError,
  type Comparison,
  type Figure,
  type Rule,
  type Step,
  type Values,
  type Where,
  type Working,
} from './types.ts'

export type { Working } from './types.ts'

export interface WorkingRecorder extends Working {
  /** Computes a formula or cases and keeps both. The values must not be changed afterwards. Throws FormulaError. */
  take<W extends Where, K extends Kind>(rule: Rule<W, K>, values: NoInfer<Values<W>>): KindValue[K]
  /** A value the derivation starts from: "L_b = 30 ft, the span, no bracing in it". Returns it. */
  given<K extends Kind>(symbol: string, kind: K, value: KindValue[K], note?: string, clause?: Clause): KindValue[K]
  /** Plain words. */
  note(text: string, clause?: Clause): void
  /** Demand against resistance: "M_u = 620 kip ft <= phi M_n = 838 kip ft". Tells whether it holds. */
  compare(left: string, leftQuantity: Quantity, op: Comparison, right: string, rightQuantity: Quantity): boolean
  /** A row looked up in a table. */
  row(table: string, key: string, figures: readonly Figure[], clause?: Clause): void
  /** A root found by iteration, with the residual left and the number of evaluations. Returns the root. */
  iterate<K extends Kind>(
    symbol: string,
    kind: K,
    root: KindValue[K],
    residual: number,
    evaluations: number,
    note: string,
  ): KindValue[K]
  /** Another derivation, with what it came to and its name: "strong-axis strength". */
  include(other: Working, figure: Figure, name: string): void
}

/** An empty derivation. Every figure entered must be finite; FormulaError names the one that is not. */
export function working(): WorkingRecorder {
  const steps: Step[] = []
  return {
    steps,
    take: (rule, values) => {
      const result = rule.value(values)
      steps.push({ step: 'rule', rule: rule as unknown as Rule, values: values, result })
      return result
    },
    given: (symbol, kind, value, note = '', clause) => {
      steps.push({ step: 'given', figure: finite([symbol, kind, value], clause), note, clause })
      return value
    },
    note: (text, clause) => {
      steps.push({ step: 'note', text, clause })
    },
    compare: (left, leftQuantity, op, right, rightQuantity) => {
      const leftFigure = finite([left, leftQuantity.kind, leftQuantity.value])
      const rightFigure = finite([right, rightQuantity.kind, rightQuantity.value])
      const holds = TESTS[op](leftFigure[2], rightFigure[2])
      steps.push({ step: 'compare', left: leftFigure, op, right: rightFigure, holds })
      return holds
    },
    row: (table, key, figures, clause) => {
      for (const figure of figures) finite(figure, clause)
      steps.push({ step: 'row', table, key, figures, clause })
    },
    iterate: (symbol, kind, root, residual, evaluations, note) => {
      steps.push({ step: 'iteration', figure: finite([symbol, kind, root]), residual, evaluations, note })
      return root
    },
    include: (other, figure, name) => {
      steps.push({ step: 'part', working: other, figure: finite(figure), name })
    },
  }
}

/** Computes as a derivation does and keeps nothing: for the many places of which only the worst will be shown. */
export const unrecorded: WorkingRecorder = {
  steps: [],
  take: (rule, values) => rule.value(values),
  given: (_symbol, _kind, value) => value,
  note: () => undefined,
  compare: (_left, left, op, _right, right) => TESTS[op](left.value, right.value),
  row: () => undefined,
  iterate: (_symbol, _kind, root) => root,
  include: () => undefined,
}

function finite(figure: Figure, clause?: Clause): Figure {
  const [symbol, , value] = figure
  if (Number.isFinite(value)) return figure
  throw new FormulaError(`${symbol} is not a finite number`, clause ? citation(clause) : 'working', { [symbol]: value })
}
