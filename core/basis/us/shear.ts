/** Shear of the web, AISC 360-22 G2.1: no tension field, no transverse stiffeners. */
import { chapter } from '../../formula/chapter.ts'
import { working, type Working } from '../../formula/working.ts'
import type { Basis } from '../../job/types.ts'
import { as, type Newton } from '../../quantity/kinds.ts'
import type { Section } from '../../section/types.ts'
import { available } from './available.ts'
import type { Steel } from './flexure.ts'

const G1 = chapter('AISC 360-22', 'G1')
const G2 = chapter('AISC 360-22', 'G2')

const STRENGTH = { kind: 'force', strength: 'V', subscript: 'v' } as const
const availableRolled = available(G2, 'G2.1(a)', { ...STRENGTH, phi: 1, Omega: 1.5 })
const availableOther = available(G1, 'G1(a)', { ...STRENGTH, phi: 0.9, Omega: 1.67 })

const WEB = { h: 'length', t_w: 'length', E: 'stress', F_y: 'stress' } as const
const G2_2 = G2.formula('G2-2', { gives: ['C_v1', 'ratio'], where: {}, text: '1.0' })
const G2_3 = G2.formula('G2-3', { gives: ['C_v1', 'ratio'], where: {}, text: '1.0' })
const G2_4 = G2.formula('G2-4', {
  gives: ['C_v1', 'ratio'],
  where: { ...WEB, k_v: 'ratio' },
  text: '1.10*sqrt(k_v*E/F_y)/(h/t_w)',
})
const CV1 = G2.cases('G2.1(b)', [
  { clause: '(i)', when: 'h/t_w <= 1.10*sqrt(k_v*E/F_y)', use: G2_3 },
  { clause: '(ii)', otherwise: G2_4 },
])
const STOCKY = G2.formula('G2.1(a)', {
  gives: ['lambda_v', 'ratio'],
  where: { E: 'stress', F_y: 'stress' },
  text: '2.24*sqrt(E/F_y)',
})
const G2_1 = G2.formula('G2-1', {
  gives: ['V_n', 'force'],
  where: { F_y: 'stress', d: 'length', t_w: 'length', C_v1: 'ratio' },
  text: '0.6*F_y*(d*t_w)*C_v1',
})

export interface ShearStrength {
  /** phi_v V_n or V_n / Omega_v. */
  readonly available: Newton
  readonly V_n: Newton
  readonly working: Working
}

/** Available shear strength of the unstiffened web; the depth is that of the I without its cap. */
export function shearStrength(section: Section, steel: Steel, method: Basis['method']): ShearStrength {
  const on = working()
  const { E, F_y } = steel
  const web = { h: section.h, t_w: section.tw }
  const stocky = section.h / section.tw <= on.take(STOCKY, { E, F_y })
  const rolled = section.makeUp !== 'plated' && stocky
  const C_v1 = rolled
    ? on.take(G2_2, {})
    : on.take(CV1, { ...web, E, F_y, k_v: on.given('k_v', 'ratio', 5.34, 'no transverse stiffeners', G2_1.clause) })
  const V_n = on.take(G2_1, { F_y, d: as('length', section.d), t_w: section.tw, C_v1 })
  return { available: (rolled ? availableRolled : availableOther)(on, method, V_n), V_n, working: on }
}
