/** Bending about the strong axis: what is asked of the wheels, and the strength at the place found, F1 to F4. */
import { chapter } from '../../formula/chapter.ts'
import { unrecorded, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type NewtonMetre } from '../../quantity/kinds.ts'
import { writeQuantity } from '../../quantity/write.ts'
import { spanOf } from '../../travel/influence.ts'
import type { Extreme, MomentTerm } from '../../travel/types.ts'
import type { Ask, Subject } from '../types.ts'
import type { Design, Loading } from './design.ts'
import { availableFlexure, flexuralStrength, type FlexuralStrength } from './flexure.ts'
import { ask, demandOf, judge } from './judgement.ts'
import { momentByStatics } from './standing.ts'

const F1 = chapter('AISC 360-22', 'F1')

const F1_1 = F1.formula('F1-1', {
  gives: ['C_b', 'ratio'],
  where: { M_max: 'moment', M_A: 'moment', M_B: 'moment', M_C: 'moment' },
  text: '12.5*M_max/(2.5*M_max + 3*M_A + 4*M_B + 3*M_C)',
})
const LOAD_ON_TOP = F1.formula('Commentary F1', {
  gives: ['C_b', 'ratio'],
  where: { C_b0: 'ratio' },
  text: 'C_b0/1.4',
  note: 'load on the unbraced top flange: custom reduction, no clause',
})
const WITH_CB = F1.formula('F1', {
  gives: ['M_n', 'moment'],
  where: { C_b: 'ratio', M_LTB: 'moment', M_cap: 'moment' },
  text: 'C_b*M_LTB',
  atMost: 'M_cap',
  note: 'M_LTB at C_b = 1, M_cap least of the limit states that no moment diagram changes',
})

export const MAJOR: Subject = { id: 'us.flexure.major', title: 'Strong-axis bending', clause: F1.clause('F1') }

/** One span as it bends about its strong axis. */
export interface StrongAxis {
  readonly design: Design
  readonly span: number
  readonly length: Metre
  readonly L_b: Metre
  readonly strength: FlexuralStrength
}

export const NO_ENDS = [as('moment', 0), as('moment', 0)] as const

/** Greatest strong-axis moment anywhere in the span, in parts of `over`. */
const greatest = (loading: Loading, over: NewtonMetre, factor: number, ends: MomentTerm['ends']): MomentTerm => ({
  factor: factor / over,
  at: 'worst',
  wheels: loading.vertical,
  uniform: loading.uniform,
  ends,
})

/**
 * The ways in which strong-axis bending uses its strength, each a sum of moments over an available strength: at C_b = 1 one
 * way; with the diagram two, the greater of which is the utilisation: against the limit states that no diagram changes, and
 * C_b put into M_max/(C_b M_LTB), which is (2.5 M_max + 3 M_A + 4 M_B + 3 M_C)/(12.5 M_LTB).
 */
export function strongTerms(
  axis: StrongAxis,
  loading: Loading,
  ends: MomentTerm['ends'] = NO_ENDS,
): readonly (readonly MomentTerm[])[] {
  const { design, span, length, strength } = axis
  const available = (M_n: NewtonMetre): NewtonMetre => availableFlexure(unrecorded, design.job.basis.method, M_n)
  if (!usesDiagram(axis)) return [[greatest(loading, available(strength.M_n), 1, ends)]]
  const { start } = spanOf(design.job.runway, span)
  const buckling = available(strength.buckling!)
  const weighed = (weight: number): MomentTerm => greatest(loading, buckling, (weight / 12.5) * reduction(axis), ends)
  const quarter = (part: number, weight: number): MomentTerm => ({
    ...weighed(weight),
    at: as('distance', start + part * length),
  })
  return [
    [greatest(loading, available(strength.cap), 1, ends)],
    [weighed(2.5), quarter(1 / 4, 3), quarter(1 / 2, 4), quarter(3 / 4, 3)],
  ]
}

/** The braces' places are not entered, so that the diagram of a segment is known only where the segment is the span. */
const usesDiagram = ({ design, L_b, length, strength }: StrongAxis): boolean =>
  design.job.basis.cb === 'diagram' && L_b >= length && strength.buckling !== undefined

const reduction = ({ design }: StrongAxis): number => (design.job.basis.loadHeight === 'rail' ? 1.4 : 1)

/** Nominal strength at a place found with `terms`: with C_b of the diagram where they hold its quarter points. */
export function strengthAt(
  axis: StrongAxis,
  place: Extreme,
  terms: readonly MomentTerm[],
  M_max: NewtonMetre,
  on: WorkingRecorder,
): NewtonMetre {
  const { strength } = axis
  on.include(strength.working, ['M_n', 'moment', strength.M_n], 'strong-axis strength at C_b = 1')
  if (!usesDiagram(axis)) return strength.M_n
  if (terms.length === 1) {
    on.note(
      'Here against the limit states that no moment diagram changes; lateral-torsional buckling with C_b of the diagram is judged at its own worst position.',
    )
    return strength.cap
  }
  const [M_A, M_B, M_C] = place.terms.slice(1, 4).map((term) => term.value) as [NewtonMetre, NewtonMetre, NewtonMetre]
  let C_b = on.take(F1_1, { M_max, M_A, M_B, M_C })
  if (reduction(axis) !== 1) C_b = on.take(LOAD_ON_TOP, { C_b0: C_b })
  return on.take(WITH_CB, { C_b, M_LTB: strength.buckling!, M_cap: strength.cap })
}

/** Strong-axis bending by vertical loads alone. */
export const majorAsks = (axis: StrongAxis, loading: Loading): readonly Ask[] =>
  strongTerms(axis, loading).map((terms) =>
    ask(MAJOR, axis.span, loading, { kind: 'moments', terms }, (place, on) => {
      demandOf(loading, on)
      const M_u = on.given('M_u', 'moment', place.terms[0]!.value, 'greatest moment, dead load included')
      momentByStatics(axis.design, place, terms[0]!, place.terms[0]!.station, on)
      const M_n = strengthAt(axis, place, terms, M_u, on)
      return judge(on, 'moment', ['M_u', M_u], ['M_c', availableFlexure(on, axis.design.job.basis.method, M_n)])
    }),
  )

/** What the choices of C_b and of the load's height leave to be judged; the other value beside the one used. */
export function strongAxisCautions({ design, L_b, length, strength }: StrongAxis): readonly string[] {
  const { job, section, steel } = design
  if (L_b < length) {
    if (job.basis.cb === 'one') return []
    return [
      'C_b is taken as 1: the moment diagram of an unbraced segment shorter than the span is not known, since the braces’ places are not entered.',
    ]
  }
  const rail = job.basis.loadHeight === 'rail'
  const other = flexuralStrength(section, steel, L_b, rail ? 'shear-centre' : 'rail')
  if ('notCovered' in other || other.M_n === strength.M_n) return []
  const [used, instead] = [strength, other].map(({ M_n }) =>
    writeQuantity({ kind: 'moment', value: availableFlexure(unrecorded, job.basis.method, M_n) }, job.units),
  ) as [string, string]
  return [
    rail
      ? `The J term is dropped for wheels on the unbraced top flange (AISC 360-22 commentary F1): at C_b = 1 the available strong-axis strength is ${used}; with load at the shear centre it would be ${instead}.`
      : `Chapter F takes loads at the centroid, while wheels load the unbraced top flange: at C_b = 1 the available strong-axis strength is ${used}; with the J term dropped (AISC 360-22 commentary F1; load height at the rail) it would be ${instead}.`,
  ]
}
