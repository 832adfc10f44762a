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
import { F2_1, F2_4, F2_5, F2_6, F2_LTB, F3_FLB } from './equations-f2-f3.ts'
import {
  F4_MP,
  F4_4,
  F4_MYT,
  MY,
  FLANGE_SHARE,
  F4_RPC,
  F4_RPT,
  F4_1,
  F4_5,
  F4_FL,
  F4_7,
  F4_8,
  F4_LTB,
  F4_FLB,
  F4_15,
} from './equations-f4.ts'
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
const F4 = chapter('AISC 360-22', 'F4')

/** phi_b M_n or M_n / Omega_b of chapter F. */
export const availableFlexure = available(F1, 'F1(a)', {
  kind: 'moment',
  strength: 'M',
  subscript: 'b',
  phi: 0.9,
  Omega: 1.67,
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
