/** The web under a concentrated force: local yielding (J10.2) and local crippling (J10.3), AISC 360-22. */
import { chapter } from '../../formula/chapter.ts'
import { available } from './available.ts'

const J10 = chapter('AISC 360-22', 'J10')

export const availableYielding = available(J10, 'J10.2', { kind: 'force', strength: 'R', phi: 1, Omega: 1.5 })
export const availableCrippling = available(J10, 'J10.3', { kind: 'force', strength: 'R', phi: 0.75, Omega: 2 })

const YIELDING = { F_yw: 'stress', t_w: 'length', k: 'length', l_b: 'length' } as const

/** A force farther than d from the girder's end. */
export const YIELDING_INTERIOR = J10.formula('J10-2', {
  gives: ['R_n', 'force'],
  where: YIELDING,
  text: 'F_yw*t_w*(5*k + l_b)',
})
/** A force within d of the girder's end. */
export const YIELDING_END = J10.formula('J10-3', {
  gives: ['R_n', 'force'],
  where: YIELDING,
  text: 'F_yw*t_w*(2.5*k + l_b)',
})

const CRIPPLING = {
  t_w: 'length',
  l_b: 'length',
  d: 'length',
  t_f: 'length',
  E: 'stress',
  F_yw: 'stress',
  Q_f: 'ratio',
} as const
const SHORT = '(1 + 3*(l_b/d)*(t_w/t_f)^1.5)*sqrt(E*F_yw*t_f/t_w)*Q_f'

/** A force at d/2 or farther from the girder's end. */
export const CRIPPLING_INTERIOR = J10.formula('J10-4', {
  gives: ['R_n', 'force'],
  where: CRIPPLING,
  text: `0.80*t_w^2*${SHORT}`,
})
const J10_5A = J10.formula('J10-5a', { gives: ['R_n', 'force'], where: CRIPPLING, text: `0.40*t_w^2*${SHORT}` })
const J10_5B = J10.formula('J10-5b', {
  gives: ['R_n', 'force'],
  where: CRIPPLING,
  text: '0.40*t_w^2*(1 + (4*l_b/d - 0.2)*(t_w/t_f)^1.5)*sqrt(E*F_yw*t_f/t_w)*Q_f',
})
/** A force within d/2 of the girder's end. */
export const CRIPPLING_END = J10.cases('J10.3(b)', [
  { clause: '(1)', when: 'l_b/d <= 0.2', use: J10_5A },
  { clause: '(2)', otherwise: J10_5B },
])

const practice = chapter('practice')

/** Length over which the rail spreads a wheel's force to the top of the flange: 45 degrees through rail and cap. */
export const DISPERSAL = practice.formula('dispersal', {
  gives: ['l_b', 'length'],
  where: { h_r: 'length', t_cap: 'length' },
  text: '2*(h_r + t_cap)',
  note: 'h_r height of the worn rail, t_cap thickness of the cap; the flange itself stands in k',
})
