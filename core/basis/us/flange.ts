/**
 * Top and bottom flange bent about the vertical axis by side thrust and by the couple that replaces torsion.
 * The web is left out (common practice): the flange, with its cap, spans on its own between the brackets.
 */
import { chapter } from '../../formula/chapter.ts'
import { working, type Working, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type Newton, type NewtonMetre } from '../../quantity/kinds.ts'
import type { FlangeSystem, Section } from '../../section/types.ts'
import type { Steel } from './flexure.ts'
import { FLANGE_COMPACT, FLANGE_SLENDERNESS, MINOR_FLANGE_NONCOMPACT } from './slenderness.ts'

const F6 = chapter('AISC 360-22', 'F6')
const practice = chapter('practice')

const F6_1 = F6.formula('F6-1', {
  gives: ['M_p', 'moment'],
  where: { F_y: 'stress', Z_y: 'modulus', S_y: 'modulus' },
  text: 'F_y*Z_y',
  atMost: '1.6*F_y*S_y',
})
const COMPACT = F6.formula('F6.2(a)', { gives: ['M_n', 'moment'], where: { M_p: 'moment' }, text: 'M_p' })
const F6_2 = F6.formula('F6-2', {
  gives: ['M_n', 'moment'],
  where: {
    M_p: 'moment',
    F_y: 'stress',
    S_y: 'modulus',
    lambda: 'ratio',
    lambda_pf: 'ratio',
    lambda_rf: 'ratio',
  },
  text: 'M_p - (M_p - 0.70*F_y*S_y)*((lambda - lambda_pf)/(lambda_rf - lambda_pf))',
})
const F6_3 = F6.formula('F6-3', {
  gives: ['M_n', 'moment'],
  where: { E: 'stress', S_y: 'modulus', lambda: 'ratio' },
  text: '0.70*E/lambda^2*S_y',
  note: 'F_cr of F6-4 put in',
})
const F6_FLB = F6.cases('F6.2', [
  { clause: '(a)', when: 'lambda <= lambda_pf', use: COMPACT },
  { clause: '(b)', when: 'lambda <= lambda_rf', use: F6_2 },
  { clause: '(c)', otherwise: F6_3 },
])

export interface FlangeStrength {
  readonly M_n: NewtonMetre
  readonly working: Working
}

/** Nominal strength of the top flange (with its cap) about the vertical axis: F6 with the system's own moduli. */
export function topFlangeStrength(section: Section, steel: Steel): FlangeStrength {
  const on = working()
  const M_p = yielding(section.top, steel, on)
  const M_n = on.take(F6_FLB, {
    M_p,
    F_y: steel.F_y,
    E: steel.E,
    S_y: section.top.S,
    lambda: on.take(FLANGE_SLENDERNESS, { b_f: section.topFlange.width, t_f: section.topFlange.thickness }),
    lambda_pf: on.take(FLANGE_COMPACT, steel),
    lambda_rf: on.take(MINOR_FLANGE_NONCOMPACT, steel),
  })
  return { M_n, working: on }
}

/** Nominal strength of the bottom flange about the vertical axis; it is in tension, so that yielding alone limits it. */
export function bottomFlangeStrength(section: Section, steel: Steel): FlangeStrength {
  const on = working()
  return { M_n: yielding(section.bottom, steel, on), working: on }
}

const yielding = (flange: FlangeSystem, { F_y }: Steel, on: WorkingRecorder): NewtonMetre =>
  on.take(F6_1, { F_y, Z_y: flange.Z, S_y: flange.S })

const TORQUE = practice.formula('torque', {
  gives: ['T', 'moment'],
  where: { H: 'force', a: 'length', P: 'force', e: 'length' },
  text: 'H*a + P*e',
  note: 'side thrust H at the rail head, a above the centroid of the top flange; wheel load P, e beside the web, in the same sense',
})
const COUPLE = practice.formula('couple', {
  gives: ['H_T', 'force'],
  where: { T: 'moment', h_o: 'length' },
  text: 'T/h_o',
  note: 'one force on each flange, opposite',
})
const TOP_FORCE = practice.formula('top flange', {
  gives: ['H_top', 'force'],
  where: { H: 'force', H_T: 'force' },
  text: 'H + H_T',
})

/** Horizontal forces of one wheel on the two flanges, magnitudes, N. */
export interface FlangeForces {
  readonly top: Newton
  readonly bottom: Newton
}

/**
 * Side thrust and torque of one wheel turned into a force on each flange.
 * @param H side thrust of the wheel, P its vertical force with impact, both with their load factors
 * @param a rail head above the centroid of the top flange with its cap; e rail eccentricity
 */
export function flangeForces(
  section: Section,
  { H, P, a, e }: { H: Newton; P: Newton; a: Metre; e: Metre },
  on: WorkingRecorder,
): FlangeForces {
  const T = on.take(TORQUE, { H, a, P, e })
  const H_T = on.take(COUPLE, { T, h_o: section.ho })
  return { top: on.take(TOP_FORCE, { H, H_T }), bottom: H_T }
}

/** Height of the rail's head, as rolled, above the centroid of the top flange with its cap. */
export const leverArm = (section: Section, railHeight: Metre): Metre =>
  as('length', railHeight + section.depth - section.top.height)
