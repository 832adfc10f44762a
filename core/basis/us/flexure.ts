/**
 * Strong-axis flexural strength, AISC 360-22 chapter F: F2, F3 or F4, chosen by the section itself.
 * A slender web belongs to F5, which this version does not cover and says so.
 */
import { chapter } from '../../formula/chapter.ts'
import { working, type Working, type WorkingRecorder } from '../../formula/working.ts'
import type { Basis } from '../../job/types.ts'
import { as, type Metre, type Metre4, type NewtonMetre, type Pascal } from '../../quantity/kinds.ts'
import type { Section } from '../../section/types.ts'
import { available } from './available.ts'
import {
  BUILT_UP_FLANGE_NONCOMPACT,
  FLANGE_COMPACT,
  FLANGE_SLENDERNESS,
  K_C,
  ROLLED_FLANGE_NONCOMPACT,
  UNEQUAL_WEB_COMPACT,
  UNEQUAL_WEB_SLENDERNESS,
  WEB_COMPACT,
  WEB_NONCOMPACT,
  WEB_SLENDERNESS,
} from './slenderness.ts'

const F1 = chapter('AISC 360-22', 'F1')
const F2 = chapter('AISC 360-22', 'F2')
const F3 = chapter('AISC 360-22', 'F3')
const F4 = chapter('AISC 360-22', 'F4')

/** phi_b M_n or M_n / Omega_b of chapter F. */
export const availableFlexure = available(F1, 'F1(a)', {
  kind: 'moment',
  strength: 'M',
  subscript: 'b',
  phi: 0.9,
  Omega: 1.67,
})

// ---- F2, doubly symmetric, compact
const F2_1 = F2.formula('F2-1', { gives: ['M_p', 'moment'], where: { F_y: 'stress', Z_x: 'modulus' }, text: 'F_y*Z_x' })
const F2_2 = F2.formula('F2-2', {
  gives: ['M_n', 'moment'],
  where: {
    C_b: 'ratio',
    M_p: 'moment',
    F_y: 'stress',
    S_x: 'modulus',
    L_b: 'distance',
    L_p: 'distance',
    L_r: 'distance',
  },
  text: 'C_b*(M_p - (M_p - 0.7*F_y*S_x)*((L_b - L_p)/(L_r - L_p)))',
  atMost: 'M_p',
})
const F2_3 = F2.formula('F2-3', {
  gives: ['M_n', 'moment'],
  where: { F_cr: 'stress', S_x: 'modulus', M_p: 'moment' },
  text: 'F_cr*S_x',
  atMost: 'M_p',
})
const F2_4 = F2.formula('F2-4', {
  gives: ['F_cr', 'stress'],
  where: {
    C_b: 'ratio',
    E: 'stress',
    L_b: 'distance',
    r_ts: 'length',
    J: 'inertia',
    c: 'ratio',
    S_x: 'modulus',
    h_o: 'length',
  },
  text: 'C_b*pi^2*E/(L_b/r_ts)^2*sqrt(1 + 0.078*J*c/(S_x*h_o)*(L_b/r_ts)^2)',
})
const F2_5 = F2.formula('F2-5', {
  gives: ['L_p', 'distance'],
  where: { r_y: 'length', E: 'stress', F_y: 'stress' },
  text: '1.76*r_y*sqrt(E/F_y)',
})
const F2_6 = F2.formula('F2-6', {
  gives: ['L_r', 'distance'],
  where: {
    r_ts: 'length',
    E: 'stress',
    F_y: 'stress',
    J: 'inertia',
    c: 'ratio',
    S_x: 'modulus',
    h_o: 'length',
  },
  text: '1.95*r_ts*E/(0.7*F_y)*sqrt(J*c/(S_x*h_o) + sqrt((J*c/(S_x*h_o))^2 + 6.76*(0.7*F_y/E)^2))',
})
const NO_BUCKLING_F2 = F2.formula('F2.2(a)', { gives: ['M_n', 'moment'], where: { M_p: 'moment' }, text: 'M_p' })
const F2_LTB = F2.cases('F2.2', [
  { clause: '(a)', when: 'L_b <= L_p', use: NO_BUCKLING_F2 },
  { clause: '(b)', when: 'L_b <= L_r', use: F2_2 },
  { clause: '(c)', otherwise: F2_3 },
])

// ---- F3, noncompact or slender flanges
const F3_1 = F3.formula('F3-1', {
  gives: ['M_n', 'moment'],
  where: {
    M_p: 'moment',
    F_y: 'stress',
    S_x: 'modulus',
    lambda: 'ratio',
    lambda_pf: 'ratio',
    lambda_rf: 'ratio',
  },
  text: 'M_p - (M_p - 0.7*F_y*S_x)*((lambda - lambda_pf)/(lambda_rf - lambda_pf))',
})
const F3_2 = F3.formula('F3-2', {
  gives: ['M_n', 'moment'],
  where: { E: 'stress', k_c: 'ratio', S_x: 'modulus', lambda: 'ratio' },
  text: '0.9*E*k_c*S_x/lambda^2',
})
const F3_FLB = F3.cases('F3.2', [
  { clause: '(a)', when: 'lambda <= lambda_rf', use: F3_1 },
  { clause: '(b)', otherwise: F3_2 },
])

// ---- F4, other I shapes with compact or noncompact webs
const F4_MP = F4.formula('F4.2(c)(6)', {
  gives: ['M_p', 'moment'],
  where: { F_y: 'stress', Z_x: 'modulus', S_xc: 'modulus' },
  text: 'F_y*Z_x',
  atMost: '1.6*F_y*S_xc',
})
const F4_4 = F4.formula('F4-4', {
  gives: ['M_yc', 'moment'],
  where: { F_y: 'stress', S_xc: 'modulus' },
  text: 'F_y*S_xc',
})
const F4_MYT = F4.formula('F4.4(b)', {
  gives: ['M_yt', 'moment'],
  where: { F_y: 'stress', S_xt: 'modulus' },
  text: 'F_y*S_xt',
})
const MY = F4.formula('Table B4.1b note c', {
  gives: ['M_y', 'moment'],
  where: { F_y: 'stress', S_xc: 'modulus', S_xt: 'modulus' },
  text: 'F_y*min(S_xc, S_xt)',
})
const FLANGE_SHARE = F4.formula('F4.2(c)', {
  gives: ['i', 'ratio'],
  where: { I_yc: 'inertia', I_y: 'inertia' },
  text: 'I_yc/I_y',
})
const F4_9A = F4.formula('F4-9a', {
  gives: ['R_pc', 'ratio'],
  where: { M_p: 'moment', M_yc: 'moment' },
  text: 'M_p/M_yc',
})
const F4_9B = F4.formula('F4-9b', {
  gives: ['R_pc', 'ratio'],
  where: {
    M_p: 'moment',
    M_yc: 'moment',
    lambda_w: 'ratio',
    lambda_pw: 'ratio',
    lambda_rw: 'ratio',
  },
  text: 'M_p/M_yc - (M_p/M_yc - 1)*((lambda_w - lambda_pw)/(lambda_rw - lambda_pw))',
  atMost: 'M_p/M_yc',
})
const ONE_PC = F4.formula('F4-10', { gives: ['R_pc', 'ratio'], where: {}, text: '1.0' })
const F4_RPC = F4.cases(
  'F4.2(c)(6)',
  [
    { clause: '(ii)', when: 'i <= 0.23', use: ONE_PC },
    { clause: '(i)(a)', when: 'lambda_w <= lambda_pw', use: F4_9A },
    { clause: '(i)(b)', otherwise: F4_9B },
  ],
  { i: 'ratio' },
)
const F4_16A = F4.formula('F4-16a', {
  gives: ['R_pt', 'ratio'],
  where: { M_p: 'moment', M_yt: 'moment' },
  text: 'M_p/M_yt',
})
// lambda_w is h_c/t_w here as in F4-9b, so that R_pt is continuous at lambda_pw.
const F4_16B = F4.formula('F4-16b', {
  gives: ['R_pt', 'ratio'],
  where: {
    M_p: 'moment',
    M_yt: 'moment',
    lambda_w: 'ratio',
    lambda_pw: 'ratio',
    lambda_rw: 'ratio',
  },
  text: 'M_p/M_yt - (M_p/M_yt - 1)*((lambda_w - lambda_pw)/(lambda_rw - lambda_pw))',
  atMost: 'M_p/M_yt',
})
const ONE_PT = F4.formula('F4-17', { gives: ['R_pt', 'ratio'], where: {}, text: '1.0' })
const F4_RPT = F4.cases(
  'F4.4(b)',
  [
    { clause: '(2)', when: 'i <= 0.23', use: ONE_PT },
    { clause: '(1)(i)', when: 'lambda_w <= lambda_pw', use: F4_16A },
    { clause: '(1)(ii)', otherwise: F4_16B },
  ],
  { i: 'ratio' },
)
const F4_1 = F4.formula('F4-1', {
  gives: ['M_n', 'moment'],
  where: { R_pc: 'ratio', M_yc: 'moment' },
  text: 'R_pc*M_yc',
})
const F4_2 = F4.formula('F4-2', {
  gives: ['M_n', 'moment'],
  where: {
    C_b: 'ratio',
    R_pc: 'ratio',
    M_yc: 'moment',
    F_L: 'stress',
    S_xc: 'modulus',
    L_b: 'distance',
    L_p: 'distance',
    L_r: 'distance',
  },
  text: 'C_b*(R_pc*M_yc - (R_pc*M_yc - F_L*S_xc)*((L_b - L_p)/(L_r - L_p)))',
  atMost: 'R_pc*M_yc',
})
const F4_3 = F4.formula('F4-3', {
  gives: ['M_n', 'moment'],
  where: { F_cr: 'stress', S_xc: 'modulus', R_pc: 'ratio', M_yc: 'moment' },
  text: 'F_cr*S_xc',
  atMost: 'R_pc*M_yc',
})
const F4_5 = F4.formula('F4-5', {
  gives: ['F_cr', 'stress'],
  where: {
    C_b: 'ratio',
    E: 'stress',
    L_b: 'distance',
    r_t: 'length',
    J: 'inertia',
    S_xc: 'modulus',
    h_o: 'length',
  },
  text: 'C_b*pi^2*E/(L_b/r_t)^2*sqrt(1 + 0.078*J/(S_xc*h_o)*(L_b/r_t)^2)',
})
const F4_6A = F4.formula('F4-6a', { gives: ['F_L', 'stress'], where: { F_y: 'stress' }, text: '0.7*F_y' })
const F4_6B = F4.formula('F4-6b', {
  gives: ['F_L', 'stress'],
  where: { F_y: 'stress', S_xt: 'modulus', S_xc: 'modulus' },
  text: 'F_y*S_xt/S_xc',
  atLeast: '0.5*F_y',
})
const F4_FL = F4.cases('F4.2(c)(3)', [
  { clause: '(i)', when: 'S_xt/S_xc >= 0.7', use: F4_6A },
  { clause: '(ii)', otherwise: F4_6B },
])
const F4_7 = F4.formula('F4-7', {
  gives: ['L_p', 'distance'],
  where: { r_t: 'length', E: 'stress', F_y: 'stress' },
  text: '1.1*r_t*sqrt(E/F_y)',
})
const F4_8 = F4.formula('F4-8', {
  gives: ['L_r', 'distance'],
  where: { r_t: 'length', E: 'stress', F_L: 'stress', J: 'inertia', S_xc: 'modulus', h_o: 'length' },
  text: '1.95*r_t*E/F_L*sqrt(J/(S_xc*h_o) + sqrt((J/(S_xc*h_o))^2 + 6.76*(F_L/E)^2))',
})
const NO_BUCKLING_F4 = F4.formula('F4.2(a)', {
  gives: ['M_n', 'moment'],
  where: { R_pc: 'ratio', M_yc: 'moment' },
  text: 'R_pc*M_yc',
})
const F4_LTB = F4.cases('F4.2', [
  { clause: '(a)', when: 'L_b <= L_p', use: NO_BUCKLING_F4 },
  { clause: '(b)', when: 'L_b <= L_r', use: F4_2 },
  { clause: '(c)', otherwise: F4_3 },
])
const F4_13 = F4.formula('F4-13', {
  gives: ['M_n', 'moment'],
  where: {
    R_pc: 'ratio',
    M_yc: 'moment',
    F_L: 'stress',
    S_xc: 'modulus',
    lambda: 'ratio',
    lambda_pf: 'ratio',
    lambda_rf: 'ratio',
  },
  text: 'R_pc*M_yc - (R_pc*M_yc - F_L*S_xc)*((lambda - lambda_pf)/(lambda_rf - lambda_pf))',
})
const F4_14 = F4.formula('F4-14', {
  gives: ['M_n', 'moment'],
  where: { E: 'stress', k_c: 'ratio', S_xc: 'modulus', lambda: 'ratio' },
  text: '0.9*E*k_c*S_xc/lambda^2',
})
const F4_FLB = F4.cases('F4.3', [
  { clause: '(b)', when: 'lambda <= lambda_rf', use: F4_13 },
  { clause: '(c)', otherwise: F4_14 },
])
const F4_15 = F4.formula('F4-15', {
  gives: ['M_n', 'moment'],
  where: { R_pt: 'ratio', M_yt: 'moment' },
  text: 'R_pt*M_yt',
})
/** M_n as the least over its limit states, given buckling at C_b = 1 and everything else in M_cap. */
const LEAST = F1.formula('F1(b)', {
  gives: ['M_n', 'moment'],
  where: { M_cap: 'moment', M_LTB: 'moment' },
  text: 'min(M_cap, M_LTB)',
  note: 'M_cap least of the limit states that no moment diagram changes, M_LTB lateral-torsional buckling',
})

export interface FlexuralStrength {
  /** Nominal strength at C_b = 1. */
  readonly M_n: NewtonMetre
  /** Nominal strength of the limit states that the moment diagram does not change. */
  readonly cap: NewtonMetre
  /** Nominal strength in lateral-torsional buckling at C_b = 1, proportional to C_b below the cap; undefined where L_b <= L_p. */
  readonly buckling: NewtonMetre | undefined
  /** Nominal strength in yielding at the bottom flange, for the sum of stresses there. */
  readonly bottomYield: NewtonMetre
  readonly section: 'F2' | 'F3' | 'F4'
  readonly L_p: Metre
  readonly L_r: Metre
  readonly working: Working
}

export interface Steel {
  readonly F_y: Pascal
  readonly E: Pascal
}

/**
 * Nominal strength of the girder bent about its strong axis with the top flange in compression.
 * @param L_b unbraced length of the top flange, m
 * @param loadHeight 'rail' drops the J term (AISC 360-22 commentary F1: load on an unbraced top flange)
 * @returns the strength, or why the standard's covered sections do not reach this girder
 */
export function flexuralStrength(
  section: Section,
  steel: Steel,
  L_b: Metre,
  loadHeight: Basis['loadHeight'],
): FlexuralStrength | { readonly notCovered: string } {
  const on = working()
  const { F_y, E } = steel
  const web = webOf(section, steel, on)
  if (web === 'slender') {
    return {
      notCovered:
        'The web is slender (h/tw above 5.70 sqrt(E/Fy)): AISC 360-22 F5 applies, which this version does not cover.',
    }
  }
  on.given('L_b', 'distance', L_b, 'unbraced length of the top flange')
  let J = section.J
  if (loadHeight === 'rail') {
    J = as('inertia', 0)
    on.note('Load on the unbraced top flange: the J term is dropped (commentary F1).', {
      document: 'AISC 360-22',
      clause: 'Commentary F1',
    })
  }
  if (section.doublySymmetric && web === 'compact') {
    const S_x = section.SxTop
    const M_p = on.take(F2_1, { F_y, Z_x: section.Zx })
    const flange = flangeOf(section, steel, as('stress', 0.7 * F_y), on)
    const cap = flange.class === 'compact' ? M_p : on.take(F3_FLB, { ...flange, M_p, F_y, E, S_x })
    const { L_p, L_r, M_LTB } = bucklingF2(section, steel, L_b, J, M_p, on)
    const buckling = L_b <= L_p ? undefined : M_LTB
    const M_n = buckling === undefined ? cap : on.take(LEAST, { M_cap: cap, M_LTB })
    return {
      M_n,
      cap,
      buckling,
      L_p,
      L_r,
      bottomYield: M_p,
      section: flange.class === 'compact' ? 'F2' : 'F3',
      working: on,
    }
  }
  return strengthF4(section, steel, L_b, J, on)
}

function bucklingF2(section: Section, { F_y, E }: Steel, L_b: Metre, J: Metre4, M_p: NewtonMetre, on: WorkingRecorder) {
  const S_x = section.SxTop
  const shared = { E, F_y, J, c: 1, S_x, h_o: section.ho, r_ts: section.rts }
  const L_p = on.take(F2_5, { r_y: section.ry, E, F_y })
  const L_r = on.take(F2_6, shared)
  const F_cr = L_b > L_r ? on.take(F2_4, { ...shared, C_b: 1, L_b }) : as('stress', 0)
  return { L_p, L_r, M_LTB: on.take(F2_LTB, { C_b: 1, M_p, F_y, S_x, L_b, L_p, L_r, F_cr }) }
}

function strengthF4(section: Section, steel: Steel, L_b: Metre, J: Metre4, on: WorkingRecorder): FlexuralStrength {
  const { F_y, E } = steel
  const S_xc = section.SxTop
  const S_xt = section.SxBottom
  const i = on.take(FLANGE_SHARE, { I_yc: section.Iyc, I_y: section.Iy })
  const M_p = on.take(F4_MP, { F_y, Z_x: section.Zx, S_xc })
  const M_yc = on.take(F4_4, { F_y, S_xc })
  const web = webLimits(section, steel, on)
  const R_pc = on.take(F4_RPC, { i, M_p, M_yc, ...web })
  const yielding = on.take(F4_1, { R_pc, M_yc })
  const F_L = on.take(F4_FL, { F_y, S_xt, S_xc })

  let cap = yielding
  const flange = flangeOf(section, steel, F_L, on)
  if (flange.class !== 'compact') cap = least(cap, on.take(F4_FLB, { ...flange, R_pc, M_yc, F_L, S_xc, E }))
  let bottomYield = M_p
  if (S_xt < S_xc) {
    const M_yt = on.take(F4_MYT, { F_y, S_xt })
    const R_pt = on.take(F4_RPT, { i, M_p, M_yt, ...web })
    bottomYield = on.take(F4_15, { R_pt, M_yt })
    cap = least(cap, bottomYield)
  } else {
    on.note('Tension flange yielding does not apply: S_xt >= S_xc.', F4.clause('F4.4(a)'))
  }

  const r_t = section.rt
  const J_used = i <= 0.23 ? as('inertia', 0) : J
  if (i <= 0.23) on.note('I_yc/I_y <= 0.23: J is taken as zero.', F4.clause('F4.2(c)(2)'))
  on.given('r_t', 'length', r_t, 'effective radius of gyration', F4.clause('F4.2(c)(7)'))
  const L_p = on.take(F4_7, { r_t, E, F_y })
  const L_r = on.take(F4_8, { r_t, E, F_L, J: J_used, S_xc, h_o: section.ho })
  const F_cr = L_b > L_r ? on.take(F4_5, { C_b: 1, E, L_b, r_t, J: J_used, S_xc, h_o: section.ho }) : as('stress', 0)
  const ltb = on.take(F4_LTB, { C_b: 1, R_pc, M_yc, F_L, S_xc, L_b, L_p, L_r, F_cr })
  const buckling = L_b <= L_p ? undefined : ltb
  const M_n = buckling === undefined ? cap : on.take(LEAST, { M_cap: cap, M_LTB: buckling })
  return { M_n, cap, buckling, L_p, L_r, bottomYield, section: 'F4', working: on }
}

type Slenderness = 'compact' | 'noncompact' | 'slender'

/** Class of the web: h/t_w of equal flanges, h_c/t_w of unequal ones. */
function webOf(section: Section, steel: Steel, on: WorkingRecorder): Slenderness {
  if (!section.doublySymmetric) {
    const { lambda_w, lambda_pw, lambda_rw } = webLimits(section, steel, working())
    return classOf(lambda_w, lambda_pw, lambda_rw)
  }
  const lambda_w = on.take(WEB_SLENDERNESS, { h: section.h, t_w: section.tw })
  return classOf(lambda_w, on.take(WEB_COMPACT, steel), on.take(WEB_NONCOMPACT, steel))
}

/** Slenderness and limits of the web in the terms of F4; with the plastic axis at or above the web's toe the web is compact. */
function webLimits(section: Section, steel: Steel, on: WorkingRecorder) {
  const { F_y, E } = steel
  const lambda_rw = on.take(WEB_NONCOMPACT, steel)
  if (section.doublySymmetric) {
    const lambda_w = on.take(WEB_SLENDERNESS, { h: section.h, t_w: section.tw })
    return { lambda_w, lambda_pw: on.take(WEB_COMPACT, steel), lambda_rw }
  }
  const lambda_w = on.take(UNEQUAL_WEB_SLENDERNESS, { h_c: section.hc, t_w: section.tw })
  if (section.hp <= 0) {
    on.note('The plastic neutral axis lies at or above the web’s toe: h_p = 0 and the web is compact (commentary F4).')
    return { lambda_w, lambda_pw: lambda_rw, lambda_rw }
  }
  const S_xc = section.SxTop
  const S_xt = section.SxBottom
  const lambda_pw = on.take(UNEQUAL_WEB_COMPACT, {
    h_c: section.hc,
    h_p: section.hp,
    E,
    F_y,
    M_p: on.take(F4_MP, { F_y, Z_x: section.Zx, S_xc }),
    M_y: on.take(MY, { F_y, S_xc, S_xt }),
    lambda_rw,
  })
  return { lambda_w, lambda_pw, lambda_rw }
}

/** Slenderness, limits and class of the top flange; of a capped shape the rolled flange itself. */
function flangeOf(section: Section, steel: Steel, F_L: Pascal, on: WorkingRecorder) {
  const lambda = on.take(FLANGE_SLENDERNESS, { b_f: section.topFlange.width, t_f: section.topFlange.thickness })
  const lambda_pf = on.take(FLANGE_COMPACT, steel)
  const k_c = K_C.value({ h: section.h, t_w: section.tw })
  if (lambda <= lambda_pf) return { lambda, lambda_pf, lambda_rf: lambda_pf, k_c, class: 'compact' as const }
  on.take(K_C, { h: section.h, t_w: section.tw })
  const lambda_rf =
    section.makeUp === 'plated'
      ? on.take(BUILT_UP_FLANGE_NONCOMPACT, { k_c, E: steel.E, F_L })
      : on.take(ROLLED_FLANGE_NONCOMPACT, steel)
  return { lambda, lambda_pf, lambda_rf, k_c, class: classOf(lambda, lambda_pf, lambda_rf) }
}

const classOf = (lambda: number, lambda_p: number, lambda_r: number): Slenderness =>
  lambda <= lambda_p ? 'compact' : lambda <= lambda_r ? 'noncompact' : 'slender'

const least = (a: NewtonMetre, b: NewtonMetre): NewtonMetre => (a <= b ? a : b)
