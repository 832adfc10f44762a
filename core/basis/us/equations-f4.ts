/** Equations of AISC 360-22 F4: other I shapes with compact or noncompact webs. */
import { chapter } from '../../formula/chapter.ts'

const F4 = chapter('AISC 360-22', 'F4')

export const F4_MP = F4.formula('F4.2(c)(6)', {
  gives: ['M_p', 'moment'],
  where: { F_y: 'stress', Z_x: 'modulus', S_xc: 'modulus' },
  text: 'F_y*Z_x',
  atMost: '1.6*F_y*S_xc',
})
export const F4_4 = F4.formula('F4-4', {
  gives: ['M_yc', 'moment'],
  where: { F_y: 'stress', S_xc: 'modulus' },
  text: 'F_y*S_xc',
})
export const F4_MYT = F4.formula('F4.4(b)', {
  gives: ['M_yt', 'moment'],
  where: { F_y: 'stress', S_xt: 'modulus' },
  text: 'F_y*S_xt',
})
export const MY = F4.formula('Table B4.1b note c', {
  gives: ['M_y', 'moment'],
  where: { F_y: 'stress', S_xc: 'modulus', S_xt: 'modulus' },
  text: 'F_y*min(S_xc, S_xt)',
})
export const FLANGE_SHARE = F4.formula('F4.2(c)', {
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
export const F4_RPC = F4.cases(
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
export const F4_RPT = F4.cases(
  'F4.4(b)',
  [
    { clause: '(2)', when: 'i <= 0.23', use: ONE_PT },
    { clause: '(1)(i)', when: 'lambda_w <= lambda_pw', use: F4_16A },
    { clause: '(1)(ii)', otherwise: F4_16B },
  ],
  { i: 'ratio' },
)
export const F4_1 = F4.formula('F4-1', {
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
export const F4_5 = F4.formula('F4-5', {
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
export const F4_FL = F4.cases('F4.2(c)(3)', [
  { clause: '(i)', when: 'S_xt/S_xc >= 0.7', use: F4_6A },
  { clause: '(ii)', otherwise: F4_6B },
])
export const F4_7 = F4.formula('F4-7', {
  gives: ['L_p', 'distance'],
  where: { r_t: 'length', E: 'stress', F_y: 'stress' },
  text: '1.1*r_t*sqrt(E/F_y)',
})
export const F4_8 = F4.formula('F4-8', {
  gives: ['L_r', 'distance'],
  where: { r_t: 'length', E: 'stress', F_L: 'stress', J: 'inertia', S_xc: 'modulus', h_o: 'length' },
  text: '1.95*r_t*E/F_L*sqrt(J/(S_xc*h_o) + sqrt((J/(S_xc*h_o))^2 + 6.76*(F_L/E)^2))',
})
const NO_BUCKLING_F4 = F4.formula('F4.2(a)', {
  gives: ['M_n', 'moment'],
  where: { R_pc: 'ratio', M_yc: 'moment' },
  text: 'R_pc*M_yc',
})
export const F4_LTB = F4.cases('F4.2', [
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
export const F4_FLB = F4.cases('F4.3', [
  { clause: '(b)', when: 'lambda <= lambda_rf', use: F4_13 },
  { clause: '(c)', otherwise: F4_14 },
])
export const F4_15 = F4.formula('F4-15', {
  gives: ['M_n', 'moment'],
  where: { R_pt: 'ratio', M_yt: 'moment' },
  text: 'R_pt*M_yt',
})
