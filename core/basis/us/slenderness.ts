/** Width-to-thickness limits of AISC 360-22 Table B4.1 for the elements of a runway girder. */
import { chapter } from '../../formula/chapter.ts'

const B4 = chapter('AISC 360-22', 'B4')

const limit = (equation: string, symbol: string, text: string) =>
  B4.formula(equation, { gives: [symbol, 'ratio'], where: { E: 'stress', F_y: 'stress' }, text })

/** Flexure about the major axis. */
export const FLANGE_COMPACT = limit('Table B4.1b 10, 11', 'lambda_pf', '0.38*sqrt(E/F_y)')
export const ROLLED_FLANGE_NONCOMPACT = limit('Table B4.1b 10', 'lambda_rf', '1.0*sqrt(E/F_y)')
export const BUILT_UP_FLANGE_NONCOMPACT = B4.formula('Table B4.1b 11', {
  gives: ['lambda_rf', 'ratio'],
  where: { k_c: 'ratio', E: 'stress', F_L: 'stress' },
  text: '0.95*sqrt(k_c*E/F_L)',
})
export const WEB_COMPACT = limit('Table B4.1b 15', 'lambda_pw', '3.76*sqrt(E/F_y)')
export const WEB_NONCOMPACT = limit('Table B4.1b 15, 16', 'lambda_rw', '5.70*sqrt(E/F_y)')
/** M_y is the moment at first yield of the extreme fibre (footnote c). Not defined where h_p = 0: such a web is compact. */
export const UNEQUAL_WEB_COMPACT = B4.formula('Table B4.1b 16', {
  gives: ['lambda_pw', 'ratio'],
  where: { h_c: 'length', h_p: 'length', E: 'stress', F_y: 'stress', M_p: 'moment', M_y: 'moment', lambda_rw: 'ratio' },
  text: '(h_c/h_p)*sqrt(E/F_y)/(0.54*M_p/M_y - 0.09)^2',
  atMost: 'lambda_rw',
})
export const COVER_COMPACT = limit('Table B4.1b 18', 'lambda_p', '1.12*sqrt(E/F_y)')
/** Flexure about the minor axis. */
export const MINOR_FLANGE_NONCOMPACT = limit('Table B4.1b 13', 'lambda_rf', '1.0*sqrt(E/F_y)')
/** Axial compression. */
export const ROLLED_FLANGE_SLENDER = limit('Table B4.1a 1', 'lambda_r', '0.56*sqrt(E/F_y)')
export const BUILT_UP_FLANGE_SLENDER = B4.formula('Table B4.1a 2', {
  gives: ['lambda_r', 'ratio'],
  where: { k_c: 'ratio', E: 'stress', F_y: 'stress' },
  text: '0.64*sqrt(k_c*E/F_y)',
})
export const WEB_SLENDER = limit('Table B4.1a 5', 'lambda_r', '1.49*sqrt(E/F_y)')
export const COVER_SLENDER = limit('Table B4.1a 7', 'lambda_r', '1.40*sqrt(E/F_y)')

/** k_c of Table B4.1 note a: between 0.35 and 0.76. */
export const K_C = B4.formula('Table B4.1 note a', {
  gives: ['k_c', 'ratio'],
  where: { h: 'length', t_w: 'length' },
  text: '4/sqrt(h/t_w)',
  atLeast: '0.35',
  atMost: '0.76',
})
export const FLANGE_SLENDERNESS = B4.formula('B4.1b', {
  gives: ['lambda', 'ratio'],
  where: { b_f: 'length', t_f: 'length' },
  text: 'b_f/(2*t_f)',
})
export const WEB_SLENDERNESS = B4.formula('B4.1b', {
  gives: ['lambda_w', 'ratio'],
  where: { h: 'length', t_w: 'length' },
  text: 'h/t_w',
})
export const UNEQUAL_WEB_SLENDERNESS = B4.formula('B4.1b', {
  gives: ['lambda_w', 'ratio'],
  where: { h_c: 'length', t_w: 'length' },
  text: 'h_c/t_w',
})
