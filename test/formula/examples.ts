/** Formulas of AISC 360-22 chapter F as the tests of this room use them, with the values of one girder. */
import { chapter } from '../../core/formula/chapter.ts'
import { as, type Kind, type KindValue } from '../../core/quantity/kinds.ts'
import { UNIT, type Unit } from '../../core/quantity/units.ts'

export const of = <K extends Kind>(kind: K, value: number, unit: Unit): KindValue[K] => as(kind, value * UNIT[unit])

export const F2 = chapter('AISC 360-22', 'F2')

export const F2_1 = F2.formula('F2-1', {
  gives: ['M_p', 'moment'],
  where: { F_y: 'stress', Z_x: 'modulus' },
  text: 'F_y*Z_x',
})
export const F2_2 = F2.formula('F2-2', {
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
export const F2_3 = F2.formula('F2-3', {
  gives: ['M_n', 'moment'],
  where: { F_cr: 'stress', S_x: 'modulus', M_p: 'moment' },
  text: 'F_cr*S_x',
  atMost: 'M_p',
})
export const F2_4 = F2.formula('F2-4', {
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
  text: 'C_b*pi^2*E/(L_b/r_ts)^2*sqrt(1 + 0.078*(J*c/(S_x*h_o))*(L_b/r_ts)^2)',
})
export const F2_6 = F2.formula('F2-6', {
  gives: ['L_r', 'distance'],
  where: { r_ts: 'length', E: 'stress', F_y: 'stress', J: 'inertia', c: 'ratio', S_x: 'modulus', h_o: 'length' },
  text: '1.95*r_ts*(E/(0.7*F_y))*sqrt(J*c/(S_x*h_o) + sqrt((J*c/(S_x*h_o))^2 + 6.76*(0.7*F_y/E)^2))',
})
export const F2_LTB = F2.cases('F2.2', [
  { clause: '(a)', when: 'L_b <= L_p', use: F2_1 },
  { clause: '(b)', when: 'L_b <= L_r', use: F2_2 },
  { clause: '(c)', otherwise: F2_3 },
])

/** W27X84 of ASTM A992: properties of AISC Shapes Database v16.0; L_p, L_r of AISC Manual Table 3-2. */
export const girder = {
  F_y: of('stress', 50, 'ksi'),
  E: of('stress', 29000, 'ksi'),
  Z_x: of('modulus', 244, 'in3'),
  S_x: of('modulus', 213, 'in3'),
  J: of('inertia', 2.81, 'in4'),
  h_o: of('length', 26.1, 'in'),
  r_ts: of('length', 2.54, 'in'),
  c: 1,
  C_b: 1,
  M_p: of('moment', 12200, 'kip in'),
  L_b: of('distance', 20, 'ft'),
  L_p: of('distance', 7.31, 'ft'),
  L_r: of('distance', 20.8, 'ft'),
  F_cr: of('stress', 20, 'ksi'),
}
