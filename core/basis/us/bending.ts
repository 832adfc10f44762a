/** Bending of the girder: strong axis, side thrust, both together with the longitudinal force, and the bottom flange. */
import { chapter } from '../../formula/chapter.ts'
import { working, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type Newton, type NewtonMetre } from '../../quantity/kinds.ts'
import type { Extreme, MomentTerm } from '../../travel/types.ts'
import type { Ask, Subject, Verdict } from '../types.ts'
import { availableCompression, compressiveStrength, type CompressiveStrength } from './compression.ts'
import type { Design, Loading } from './design.ts'
import { bottomFlangeStrength, topFlangeStrength } from './flange.ts'
import { availableFlexure, flexuralStrength, type FlexuralStrength } from './flexure.ts'
import { ask, judge, judgeSum } from './judgement.ts'

const D2 = chapter('AISC 360-22', 'D2')
const F1 = chapter('AISC 360-22', 'F1')
const H1 = chapter('AISC 360-22', 'H1')
const APPENDIX_8 = chapter('AISC 360-22', 'App. 8')

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
const WITH_CB = F1.formula('F1(b)', {
  gives: ['M_n', 'moment'],
  where: { C_b: 'ratio', M_LTB: 'moment', M_cap: 'moment' },
  text: 'C_b*M_LTB',
  atMost: 'M_cap',
  note: 'M_LTB at C_b = 1, M_cap least of the limit states that no moment diagram changes',
})
const INTERACTION = {
  P_r: 'force',
  P_c: 'force',
  M_rx: 'moment',
  M_cx: 'moment',
  M_ry: 'moment',
  M_cy: 'moment',
} as const
const H1_1A = H1.formula('H1-1a', {
  gives: ['U', 'ratio'],
  where: INTERACTION,
  text: 'P_r/P_c + 8/9*(M_rx/M_cx + M_ry/M_cy)',
})
const H1_1B = H1.formula('H1-1b', {
  gives: ['U', 'ratio'],
  where: INTERACTION,
  text: 'P_r/(2*P_c) + (M_rx/M_cx + M_ry/M_cy)',
})
const H1_1 = H1.cases('H1.1', [
  { clause: '(a)', when: 'P_r/P_c >= 0.2', use: H1_1A },
  { clause: '(b)', otherwise: H1_1B },
])
const D2_1 = D2.formula('D2-1', {
  gives: ['P_n', 'force'],
  where: { F_y: 'stress', A_g: 'area' },
  text: 'F_y*A_g',
})
const A_8_3 = APPENDIX_8.formula('A-8-3', {
  gives: ['B_1', 'ratio'],
  where: { C_m: 'ratio', alpha: 'ratio', P_r: 'force', P_e1: 'force' },
  text: 'C_m/(1 - alpha*P_r/P_e1)',
  atLeast: '1',
})

const MAJOR: Subject = { id: 'us.flexure.major', title: 'Strong-axis bending', clause: F1.clause('F1') }
const LATERAL: Subject = {
  id: 'us.flexure.lateral',
  title: 'Side thrust on the top flange',
  clause: { document: 'AISC 360-22', clause: 'F6' },
}
const BIAXIAL: Subject = { id: 'us.flexure.biaxial', title: 'Both axes with side thrust', clause: H1.clause('H1.1') }
const BOTTOM: Subject = {
  id: 'us.flexure.bottom-flange',
  title: 'Bottom flange with its part of the couple',
  clause: H1.clause('H1.2'),
}
const COMPRESSION: Subject = {
  id: 'us.compression',
  title: 'Longitudinal force',
  clause: { document: 'AISC 360-22', clause: 'E3' },
}

export interface BendingPlan {
  readonly asks: readonly Ask[]
  readonly verdicts: readonly Verdict[]
  readonly cautions: readonly string[]
}

/** All that bends the girder of one span. */
export function bendingOf(design: Design, span: number): BendingPlan {
  const { job, section, steel } = design
  const length = job.runway.spans[span]!
  const L_b = job.runway.unbracedLength ?? length
  const strong = flexuralStrength(section, steel, L_b, job.basis.loadHeight)
  const axial = compressiveStrength(section, steel, length, longest(L_b, job.runway.unbracedLengthBottom ?? length))
  const lateral = lateralAsks(design, span)
  const compression = compressionVerdicts(design, axial)
  if ('notCovered' in strong) {
    const verdicts = [MAJOR, BIAXIAL, BOTTOM].map((subject): Verdict => ({
      ...subject,
      status: 'not-covered',
      why: strong.notCovered,
    }))
    return { asks: lateral, verdicts: [...verdicts, ...compression], cautions: [] }
  }
  const girder = { design, span, length, L_b, strong, axial }
  const asks: Ask[] = [...lateral]
  const verdicts: Verdict[] = [...compression]
  for (const loading of design.loadings) {
    asks.push(...majorAsks(girder, loading), ...bottomAsks(girder, loading))
    if (loading.train !== undefined) {
      const both = biaxialAsks(girder, loading)
      if ('status' in both) verdicts.push(both)
      else asks.push(...both)
    }
  }
  return { asks, verdicts, cautions: loadHeightCautions(girder) }
}

interface Girder {
  readonly design: Design
  readonly span: number
  readonly length: Metre
  readonly L_b: Metre
  readonly strong: FlexuralStrength
  readonly axial: CompressiveStrength
}

const longest = (a: Metre, b: Metre): Metre => (a >= b ? a : b)

const NO_ENDS = [as('moment', 0), as('moment', 0)] as const

/** Greatest sagging moment anywhere in the span, in parts of `over`. */
const worst = (loading: Loading, over: NewtonMetre, factor = 1, ends: MomentTerm['ends'] = NO_ENDS): MomentTerm => ({
  factor: factor / over,
  at: 'worst',
  wheels: loading.vertical,
  uniform: loading.uniform,
  ends,
})

/** The two ways in which strong-axis bending can use its strength: without the moment diagram, and with it. */
function strongTerms(
  girder: Girder,
  loading: Loading,
  ends: MomentTerm['ends'] = NO_ENDS,
): readonly (readonly MomentTerm[])[] {
  const { strong, design } = girder
  const available = (M_n: NewtonMetre): NewtonMetre => availableFlexure(working(), design.job.basis.method, M_n)
  if (!usesDiagram(girder) || strong.buckling === undefined) return [[worst(loading, available(strong.M_n), 1, ends)]]
  const start = startOf(girder)
  const buckling = available(strong.buckling)
  const quarter = (part: number, weight: number): MomentTerm => ({
    ...worst(loading, buckling, (weight / 12.5) * reduction(girder), ends),
    at: as('distance', start + part * girder.length),
  })
  return [
    [worst(loading, available(strong.cap), 1, ends)],
    [
      worst(loading, buckling, (2.5 / 12.5) * reduction(girder), ends),
      quarter(1 / 4, 3),
      quarter(1 / 2, 4),
      quarter(3 / 4, 3),
    ],
  ]
}

/** The braces' places are not entered, so that the diagram of a segment is known only where the segment is the span. */
const usesDiagram = ({ design, L_b, length }: Girder): boolean => design.job.basis.cb === 'diagram' && L_b >= length

const reduction = ({ design }: Girder): number => (design.job.basis.loadHeight === 'rail' ? 1.4 : 1)

const startOf = ({ design, span }: Girder): number =>
  design.job.runway.spans.slice(0, span).reduce((sum, length) => sum + length, 0)

/** Nominal strength at this place and how it came about: with C_b of the diagram where the terms hold its quarter points. */
function strengthAt(
  girder: Girder,
  place: Extreme,
  M_max: NewtonMetre,
  on: WorkingRecorder,
  quarters: number,
): NewtonMetre {
  const { strong } = girder
  on.include(strong.working)
  if (!usesDiagram(girder) || strong.buckling === undefined) return strong.M_n
  if (quarters === 0) {
    on.note('At this position C_b from the diagram lifts lateral-torsional buckling above the other limit states.')
    return strong.cap
  }
  const [M_A, M_B, M_C] = place.terms.slice(1, 4).map((term) => term.value) as [NewtonMetre, NewtonMetre, NewtonMetre]
  let C_b = on.take(F1_1, { M_max, M_A, M_B, M_C })
  if (reduction(girder) !== 1) C_b = on.take(LOAD_ON_TOP, { C_b0: C_b })
  return on.take(WITH_CB, { C_b, M_LTB: strong.buckling, M_cap: strong.cap })
}

function majorAsks(girder: Girder, loading: Loading): readonly Ask[] {
  return strongTerms(girder, loading).map((terms) =>
    ask(MAJOR, girder.span, loading, { kind: 'moments', terms }, (place) => {
      const on = demandOf(loading)
      const M_u = on.given('M_u', 'moment', place.terms[0]!.value, 'greatest moment, dead load included')
      const M_n = strengthAt(girder, place, M_u, on, terms.length - 1)
      return judge(on, 'moment', ['M_u', M_u], ['M_c', availableFlexure(on, girder.design.job.basis.method, M_n)])
    }),
  )
}

function lateralAsks(design: Design, span: number): readonly Ask[] {
  const top = topFlangeStrength(design.section, design.steel)
  return design.loadings.flatMap((loading) => {
    if (loading.train === undefined) return []
    const terms = [{ factor: 1, at: 'worst', wheels: loading.top, uniform: as('lineLoad', 0), ends: NO_ENDS }] as const
    return ask(LATERAL, span, loading, { kind: 'moments', terms }, (place) => {
      const on = demandOf(loading)
      const M_ry = on.given(
        'M_ry',
        'moment',
        place.terms[0]!.value,
        'greatest moment of the top flange about the vertical axis',
      )
      on.include(top.working)
      return judge(on, 'moment', ['M_ry', M_ry], ['M_cy', availableFlexure(on, design.job.basis.method, top.M_n)])
    })
  })
}

function biaxialAsks(girder: Girder, loading: Loading): readonly Ask[] | Verdict {
  const { design, span, axial } = girder
  const { method } = design.job.basis
  const P_r = loading.longitudinal
  const P_c = availableCompression(working(), method, axial.P_n)
  const alpha = method === 'LRFD' ? 1 : 1.6
  if (alpha * P_r >= Math.min(axial.elastic.x, axial.elastic.y)) {
    return {
      ...BIAXIAL,
      status: 'fails',
      why: `${loading.set}: the longitudinal force reaches the elastic buckling load of the girder.`,
    }
  }
  const B_x = A_8_3.value({ C_m: 1, alpha, P_r, P_e1: axial.elastic.x })
  const B_y = A_8_3.value({ C_m: 1, alpha, P_r, P_e1: axial.elastic.y })
  const inBending = P_r / P_c >= 0.2 ? 8 / 9 : 1
  const top = topFlangeStrength(design.section, design.steel)
  const M_cy = availableFlexure(working(), method, top.M_n)

  return endMoments(design, P_r).flatMap((ends) =>
    strongTerms(girder, loading, ends).map((strong) => {
      const lateral: MomentTerm = {
        factor: (inBending * B_y) / M_cy,
        at: 'worst',
        wheels: loading.top,
        uniform: as('lineLoad', 0),
        ends: NO_ENDS,
      }
      const terms = [...strong.map((term) => ({ ...term, factor: term.factor * inBending * B_x })), lateral]
      return ask(BIAXIAL, span, loading, { kind: 'moments', terms }, (place) => {
        const on = demandOf(loading)
        on.note(
          'The position is the worst for the sum of both moments, each the greatest in the unbraced segment; M_cy of the top flange alone is custom, no clause.',
        )
        const M_x = on.given(
          'M_x',
          'moment',
          place.terms[0]!.value,
          'greatest moment about the strong axis at this position',
        )
        const M_y = on.given(
          'M_y',
          'moment',
          place.terms.at(-1)!.value,
          'greatest moment of the top flange about the vertical axis',
        )
        const M_n = strengthAt(girder, place, M_x, on, strong.length - 1)
        const M_cx = availableFlexure(on, method, M_n)
        on.include(top.working)
        availableFlexure(on, method, top.M_n)
        on.include(axial.working)
        availableCompression(on, method, axial.P_n)
        const M_rx = amplified('M_rx', M_x, { alpha, P_r, P_e1: axial.elastic.x }, on)
        const M_ry = amplified('M_ry', M_y, { alpha, P_r, P_e1: axial.elastic.y }, on)
        const U = on.take(H1_1, { P_r, P_c, M_rx, M_cx, M_ry, M_cy })
        return judgeSum(on, U)
      })
    }),
  )
}

/** P-delta within the span, appendix 8 with C_m = 1 for loads between the supports. */
function amplified(
  symbol: string,
  M_nt: NewtonMetre,
  axial: { alpha: number; P_r: Newton; P_e1: Newton },
  on: WorkingRecorder,
): NewtonMetre {
  if (axial.P_r === 0) return M_nt
  const B_1 = on.take(A_8_3, { C_m: 1, ...axial })
  return on.given(
    symbol,
    'moment',
    as('moment', B_1 * M_nt),
    'B_1 times the first-order moment',
    APPENDIX_8.clause('App. 8.2.1'),
  )
}

/** The longitudinal force at the rail head, carried to the centroid: a moment at either end of the span, whichever is worse. */
function endMoments(design: Design, P_r: Newton): readonly MomentTerm['ends'][] {
  if (P_r === 0) return [NO_ENDS]
  const M = as('moment', P_r * design.headAboveCentroid)
  return [
    [M, as('moment', 0)],
    [as('moment', 0), M],
  ]
}

/** Yielding at the bottom flange: the strong-axis moment and the couple's moment at one and the same section (H1.2). */
function bottomAsks(girder: Girder, loading: Loading): readonly Ask[] {
  const { design, span, strong } = girder
  if (loading.train === undefined) return []
  const { method } = design.job.basis
  const flange = bottomFlangeStrength(design.section, design.steel)
  const M_cx = availableFlexure(working(), method, strong.bottomYield)
  const M_cy = availableFlexure(working(), method, flange.M_n)
  const { F_y } = design.steel
  const A_g = design.section.A
  const P_r = loading.longitudinal
  const P_c = availableCompression(working(), method, D2_1.value({ F_y, A_g }))
  const inBending = P_r / P_c >= 0.2 ? 8 / 9 : 1
  return endMoments(design, P_r).map((ends) => {
    const both: MomentTerm = {
      factor: inBending,
      at: 'worst',
      wheels: loading.vertical.map((P, index) => P / M_cx + loading.bottom[index]! / M_cy),
      uniform: as('lineLoad', loading.uniform / M_cx),
      ends: [as('moment', ends[0] / M_cx), as('moment', ends[1] / M_cx)],
    }
    const couple: MomentTerm = {
      factor: 0,
      at: 'same',
      wheels: loading.bottom,
      uniform: as('lineLoad', 0),
      ends: NO_ENDS,
    }
    return ask(BOTTOM, span, loading, { kind: 'moments', terms: [both, couple] }, (place) => {
      const on = demandOf(loading)
      on.note('Both moments at one section: yielding, no buckling of a flange in tension.')
      const M_ry = on.given(
        'M_ry',
        'moment',
        place.terms[1]!.value,
        'moment of the bottom flange about the vertical axis there',
      )
      const M_rx = on.given(
        'M_rx',
        'moment',
        as('moment', (place.terms[0]!.value - M_ry / M_cy) * M_cx),
        'moment about the strong axis there',
      )
      on.given('M_n', 'moment', strong.bottomYield, `yielding at the bottom flange, ${strong.section}`)
      availableFlexure(on, method, strong.bottomYield)
      on.include(flange.working)
      availableFlexure(on, method, flange.M_n)
      availableCompression(on, method, on.take(D2_1, { F_y, A_g }))
      return judgeSum(on, on.take(H1_1, { P_r, P_c, M_rx, M_cx, M_ry, M_cy }))
    })
  })
}

function compressionVerdicts(design: Design, axial: CompressiveStrength): readonly Verdict[] {
  const { method } = design.job.basis
  const loaded = design.loadings.filter((loading) => loading.longitudinal > 0)
  if (loaded.length === 0)
    return [{ ...COMPRESSION, status: 'not-applicable', why: 'No longitudinal force acts on the girder.' }]
  const greatest = loaded.reduce((a, b) => (b.longitudinal > a.longitudinal ? b : a))
  const on = working()
  const P_r = on.given(
    'P_r',
    'force',
    greatest.longitudinal,
    `longitudinal force with its load factor, ${greatest.set}`,
  )
  on.include(axial.working)
  const judgement = judge(on, 'force', ['P_r', P_r], ['P_c', availableCompression(on, method, axial.P_n)])
  return [{ ...COMPRESSION, status: judgement.utilisation <= 1 ? 'holds' : 'fails', why: '', judgement }]
}

function loadHeightCautions({ design, L_b, length, strong }: Girder): readonly string[] {
  const { job, section, steel } = design
  const cautions: string[] = []
  if (job.basis.cb === 'diagram' && L_b < length) {
    cautions.push(
      'C_b is taken as 1: the moment diagram of an unbraced segment shorter than the span is not known, since the braces’ places are not entered.',
    )
  }
  if (L_b < length) return cautions
  const other = job.basis.loadHeight === 'rail' ? 'shear-centre' : 'rail'
  const alternative = flexuralStrength(section, steel, L_b, other)
  if ('notCovered' in alternative) return cautions
  const available = (M_n: NewtonMetre): string => `${Math.round((M_n / strong.M_n) * 100)} %`
  cautions.push(
    other === 'rail'
      ? `Wheels load the unbraced top flange, while chapter F takes loads at the centroid: with the J term dropped (AISC 360-22 commentary F1) the strong-axis strength at C_b = 1 is ${available(alternative.M_n)} of the one used.`
      : `The J term is dropped for load on the unbraced top flange (AISC 360-22 commentary F1); with load at the shear centre the strong-axis strength at C_b = 1 is ${available(alternative.M_n)} of the one used.`,
  )
  return cautions
}

/** A working that begins with the forces of the heaviest wheel. */
function demandOf(loading: Loading): WorkingRecorder {
  const on = working()
  on.note(`${loading.combination.name}, ${loading.set}`, loading.combination.clause)
  on.include(loading.working)
  return on
}
