/** Equations of AISC 360-22 F2 (compact) and F3 (noncompact or slender flanges), doubly symmetric I shapes. */
import { chapter } from '../../formula/chapter.ts'

const F2 = chapter('AISC 360-22', 'F2')
const F3 = chapter('AISC 360-22', 'F3')

export const F2_1 = F2.formula('F2-1', {
  gives: ['M_p', 'moment'],
  where: { F_y: 'stress', Z_x: 'modulus' },
  text: 'F_y*Z_x',
})
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
  text: 'C_b*pi^2*E/(L_b/r_ts)^2*sqrt(1 + 0.078*J*c/(S_x*h_o)*(L_b/r_ts)^2)',
})
export const F2_5 = F2.formula('F2-5', {
  gives: ['L_p', 'distance'],
  where: { r_y: 'length', E: 'stress', F_y: 'stress' },
  text: '1.76*r_y*sqrt(E/F_y)',
})
export const F2_6 = F2.formula('F2-6', {
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
export const F2_LTB = F2.cases('F2.2', [
  { clause: '(a)', when: 'L_b <= L_p', use: NO_BUCKLING_F2 },
  { clause: '(b)', when: 'L_b <= L_r', use: F2_2 },
  { clause: '(c)', otherwise: F2_3 },
])

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
export const F3_FLB = F3.cases('F3.2', [
  { clause: '(a)', when: 'lambda <= lambda_rf', use: F3_1 },
  { clause: '(b)', otherwise: F3_2 },
])
