/** Workings as printed lines. */
import type { UnitSystem } from '../quantity/kinds.ts'
import { citation } from '../sources/clause.ts'
import type { Cases, Formula, Line, Numbers } from './types.ts'
import type { Working } from './working.ts'

/** Every step of a working as lines, in order. */
export function writeWorking(working: Working, system: UnitSystem): Line[] {
  return working.steps.flatMap((step) =>
    step.step !== 'rule'
      ? []
      : step.rule.rule === 'formula'
        ? [formulaLine(step.rule, step.values, step.result, system)]
        : casesLines(step.rule, step.values, step.result, system),
  )
}

export function formulaLine(formula: Formula, _values: Numbers, _result: number, _system: UnitSystem): Line {
  return { kind: 'formula', clause: citation(formula.clause), symbols: '', values: '', text: '', note: formula.note }
}

export function casesLines(_cases: Cases, _values: Numbers, _result: number, _system: UnitSystem): Line[] {
  return []
}
