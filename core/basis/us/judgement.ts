/** How a check is put: demand, resistance, their ratio, and the line that compares them. */
import type { WorkingRecorder } from '../../formula/working.ts'
import { as, type Kind, type KindValue, type Quantity } from '../../quantity/kinds.ts'
import type { Effect } from '../../travel/types.ts'
import type { Ask, Judgement, Subject } from '../types.ts'
import type { Loading } from './design.ts'

/** Demand against resistance of one kind; their symbols stand in the closing line. */
export function judge<K extends Kind>(
  on: WorkingRecorder,
  kind: K,
  [left, demand]: readonly [symbol: string, value: KindValue[K]],
  [right, resistance]: readonly [symbol: string, value: KindValue[K]],
): Judgement {
  const [d, r] = [demand, resistance].map((value): Quantity => ({ kind, value })) as [Quantity, Quantity]
  on.compare(left, d, '<=', right, r)
  return { demand: d, resistance: r, utilisation: demand / resistance }
}

/** An interaction that must not pass 1. */
export const judgeSum = (on: WorkingRecorder, U: number): Judgement => judge(on, 'ratio', ['U', U], ['U_max', 1])

/** A derivation begins with the combination and the forces of the heaviest wheel. */
export function demandOf(loading: Loading, on: WorkingRecorder): void {
  on.note(`${loading.combination.name}, ${loading.set}`, loading.combination.clause)
  if (loading.train !== undefined) {
    on.include(
      loading.working,
      ['P', 'force', as('force', Math.max(...loading.vertical))],
      'forces of the heaviest wheel',
    )
  }
}

/** An ask of one loading. */
export const ask = (subject: Subject, span: number, loading: Loading, effect: Effect, judge: Ask['judge']): Ask => ({
  ...subject,
  span,
  train: loading.train,
  combination: loading.combination.name,
  set: loading.set,
  effect,
  judge,
})
