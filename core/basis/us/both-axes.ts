/** Bending about both axes with the longitudinal force: H1.1 for the girder, H1.2 for its bottom flange, chapter E alone. */
import { chapter } from '../../formula/chapter.ts'
import { unrecorded, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Newton } from '../../quantity/kinds.ts'
import type { MomentTerm } from '../../travel/types.ts'
import type { Ask, Judgement, Subject, Verdict } from '../types.ts'
import { availableCompression, type CompressiveStrength } from './compression.ts'
import type { Design, Loading } from './design.ts'
import { availableFlexure } from './flexure.ts'
import { ask, demandOf, judge, judgeSum } from './judgement.ts'
import { momentByStatics } from './standing.ts'
import { NO_ENDS, strengthAt, strongTerms, type StrongAxis } from './strong-axis.ts'

const D2 = chapter('AISC 360-22', 'D2')
const H1 = chapter('AISC 360-22', 'H1')
const APPENDIX_8 = chapter('AISC 360-22', 'App. 8')

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
/** H1-1a or H1-1b by the part of the axial strength that is used. */
export const H1_1 = H1.cases('H1.1', [
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
const amplified = (gives: 'M_rx' | 'M_ry') =>
  APPENDIX_8.formula('A-8-1', { gives: [gives, 'moment'], where: { B_1: 'ratio', M_nt: 'moment' }, text: 'B_1*M_nt' })
const M_RX = amplified('M_rx')
const M_RY = amplified('M_ry')

export const BIAXIAL: Subject = {
  id: 'us.flexure.biaxial',
  title: 'Both axes with side thrust',
  clause: H1.clause('H1.1'),
}
export const BOTTOM: Subject = {
  id: 'us.flexure.bottom-flange',
  title: 'Bottom flange with its part of the couple',
  clause: H1.clause('H1.2'),
}
const COMPRESSION: Subject = {
  id: 'us.compression',
  title: 'Longitudinal force',
  clause: { document: 'AISC 360-22', clause: 'E3' },
}

const noLoad = as('lineLoad', 0)

/** Factor on the moments in H1-1a and H1-1b; the axial force does not change with the train's position. */
const momentFactor = (P_r: Newton, P_c: Newton): number => (P_r / P_c >= 0.2 ? 8 / 9 : 1)

/** The longitudinal force at the rail head, carried to the centroid: a moment at either end of the span, whichever is worse. */
function endMoments(design: Design, P_r: Newton): readonly MomentTerm['ends'][] {
  if (P_r === 0) return [NO_ENDS]
  const M = as('moment', P_r * design.headAboveCentroid)
  return [
    [M, as('moment', 0)],
    [as('moment', 0), M],
  ]
}

/**
 * Both moments, each the greatest in the unbraced segment at one and the same position of the train, with the axial force
 * (H1.1: singly symmetric members held to a geometric axis included). M_cy of the top flange alone is custom.
 */
export function biaxialAsks(axis: StrongAxis, axial: CompressiveStrength, loading: Loading): readonly Ask[] | Verdict {
  const { design, span } = axis
  const { method } = design.job.basis
  const P_r = loading.longitudinal
  const P_c = availableCompression(unrecorded, method, axial.P_n)
  const alpha = method === 'LRFD' ? 1 : 1.6
  const [x, y] = [axial.elastic.x, axial.elastic.y].map((P_e1) => ({ C_m: 1, alpha, P_r, P_e1 })) as [Axial, Axial]
  if (alpha * P_r >= Math.min(x.P_e1, y.P_e1)) {
    return {
      ...BIAXIAL,
      status: 'fails',
      why: `${loading.set}: the longitudinal force reaches the elastic buckling load of the girder.`,
    }
  }
  const inBending = momentFactor(P_r, P_c)
  const top = design.topFlange
  const M_cy = availableFlexure(unrecorded, method, top.M_n)
  const sideways: MomentTerm = {
    factor: (inBending * A_8_3.value(y)) / M_cy,
    at: 'worst',
    wheels: loading.top,
    uniform: noLoad,
    ends: NO_ENDS,
  }

  return endMoments(design, P_r).flatMap((ends) =>
    strongTerms(axis, loading, ends).map((strong) => {
      const terms = [...strong.map((term) => ({ ...term, factor: term.factor * inBending * A_8_3.value(x) })), sideways]
      return ask(BIAXIAL, span, loading, { kind: 'moments', terms }, (place, on) => {
        demandOf(loading, on)
        on.note(
          'The position is the worst for the sum of both moments, each the greatest in the unbraced segment. M_cy of the top flange alone is custom, no clause.',
        )
        const [first, last] = [place.terms[0]!, place.terms.at(-1)!]
        if (P_r > 0) {
          on.given('P_r', 'force', P_r, 'longitudinal force with its load factor')
          on.given('e', 'length', design.headAboveCentroid, 'rail head above the centroid: P_r e enters at one end')
        }
        const M_x = on.given('M_x', 'moment', first.value, 'greatest strong-axis moment at this position')
        momentByStatics(design, place, terms[0]!, first.station, on)
        const M_y = on.given('M_y', 'moment', last.value, 'greatest moment of the top flange sideways')
        momentByStatics(design, place, sideways, last.station, on)
        const M_cx = availableFlexure(on, method, strengthAt(axis, place, strong, M_x, on))
        on.include(top.working, ['M_n', 'moment', top.M_n], 'strength of the top flange sideways')
        availableFlexure(on, method, top.M_n)
        on.include(axial.working, ['P_n', 'force', axial.P_n], 'axial strength')
        availableCompression(on, method, axial.P_n)
        const M_rx = P_r === 0 ? M_x : on.take(M_RX, { B_1: on.take(A_8_3, x), M_nt: M_x })
        const M_ry = P_r === 0 ? M_y : on.take(M_RY, { B_1: on.take(A_8_3, y), M_nt: M_y })
        return judgeSum(on, on.take(H1_1, { P_r, P_c, M_rx, M_cx, M_ry, M_cy }))
      })
    }),
  )
}

interface Axial {
  readonly C_m: number
  readonly alpha: number
  readonly P_r: Newton
  readonly P_e1: Newton
}

/** Yielding at the bottom flange: the strong-axis moment and the couple's moment at one and the same section. */
export function bottomAsks(axis: StrongAxis, loading: Loading): readonly Ask[] {
  const { design, span, strength } = axis
  if (loading.train === undefined) return []
  const { method } = design.job.basis
  const flange = design.bottomFlange
  const M_cx = availableFlexure(unrecorded, method, strength.bottomYield)
  const M_cy = availableFlexure(unrecorded, method, flange.M_n)
  const yields = { F_y: design.steel.F_y, A_g: design.section.A }
  const P_r = loading.longitudinal
  const P_c = availableCompression(unrecorded, method, D2_1.value(yields))
  return endMoments(design, P_r).map((ends) => {
    // The utilisation itself is the moment that is driven: wheel forces in parts of the strength they use.
    const use: MomentTerm = {
      factor: momentFactor(P_r, P_c),
      at: 'worst',
      wheels: loading.vertical.map((P, index) => P / M_cx + loading.bottom[index]! / M_cy),
      uniform: as('lineLoad', loading.uniform / M_cx),
      ends: [as('moment', ends[0] / M_cx), as('moment', ends[1] / M_cx)],
    }
    const upright: MomentTerm = { factor: 0, at: 'same', wheels: loading.vertical, uniform: loading.uniform, ends }
    const sideways: MomentTerm = { factor: 0, at: 'same', wheels: loading.bottom, uniform: noLoad, ends: NO_ENDS }
    return ask(BOTTOM, span, loading, { kind: 'moments', terms: [use, upright, sideways] }, (place, on) => {
      demandOf(loading, on)
      on.note('Both moments at one section: yielding, no buckling of a flange in tension.')
      const [, strong, couple] = place.terms
      const M_rx = on.given('M_rx', 'moment', strong!.value, 'strong-axis moment there')
      momentByStatics(design, place, upright, strong!.station, on)
      const M_ry = on.given('M_ry', 'moment', couple!.value, 'moment of the bottom flange sideways there')
      momentByStatics(design, place, sideways, couple!.station, on)
      on.given('M_n', 'moment', strength.bottomYield, `yielding at the bottom flange, ${strength.section}`)
      availableFlexure(on, method, strength.bottomYield)
      on.include(flange.working, ['M_n', 'moment', flange.M_n], 'strength of the bottom flange sideways')
      availableFlexure(on, method, flange.M_n)
      availableCompression(on, method, on.take(D2_1, yields))
      return judgeSum(on, on.take(H1_1, { P_r, P_c, M_rx, M_cx, M_ry, M_cy }))
    })
  })
}

/** The greatest longitudinal force alone against chapter E. */
export function compressionVerdict(design: Design, axial: CompressiveStrength): Verdict {
  const { method } = design.job.basis
  const loaded = design.loadings.filter((loading) => loading.longitudinal > 0)
  if (loaded.length === 0) {
    return { ...COMPRESSION, status: 'not-applicable', why: 'No longitudinal force acts on the girder.' }
  }
  const { longitudinal, set } = loaded.reduce((a, b) => (b.longitudinal > a.longitudinal ? b : a))
  const decide = (on: WorkingRecorder): Judgement => {
    const P_r = on.given('P_r', 'force', longitudinal, `longitudinal force with its load factor, ${set}`)
    on.include(axial.working, ['P_n', 'force', axial.P_n], 'axial strength')
    return judge(on, 'force', ['P_r', P_r], ['P_c', availableCompression(on, method, axial.P_n)])
  }
  return { ...COMPRESSION, ...statusOf(decide), why: '', judge: decide }
}

const statusOf = (decide: (on: WorkingRecorder) => Judgement) =>
  ({ status: decide(unrecorded).utilisation <= 1 ? 'holds' : 'fails' }) as const
