/** Available strength from nominal strength: phi R_n (LRFD) or R_n / Omega (ASD). */
import type { Chapter } from '../../formula/chapter.ts'
import type { WorkingRecorder } from '../../formula/working.ts'
import type { Basis } from '../../job/types.ts'
import type { Newton, NewtonMetre } from '../../quantity/kinds.ts'

type Method = Basis['method']

/** The two factors of one limit state, as the clause gives them. */
export interface Factors {
  readonly phi: number
  readonly Omega: number
}

/** Recorder of phi_b M_n or M_n / Omega_b, factors from the clause given. */
export function availableMoment(chapter: Chapter<string>, id: string, { phi, Omega }: Factors) {
  const lrfd = chapter.formula(id, {
    gives: ['M_c', 'moment'],
    where: { phi_b: 'ratio', M_n: 'moment' },
    text: 'phi_b*M_n',
  })
  const asd = chapter.formula(id, {
    gives: ['M_c', 'moment'],
    where: { M_n: 'moment', Omega_b: 'ratio' },
    text: 'M_n/Omega_b',
  })
  return (on: WorkingRecorder, method: Method, M_n: NewtonMetre): NewtonMetre =>
    method === 'LRFD' ? on.take(lrfd, { phi_b: phi, M_n }) : on.take(asd, { M_n, Omega_b: Omega })
}

/** Recorder of phi R_n or R_n / Omega, factors from the clause given. */
export function availableForce(chapter: Chapter<string>, id: string, { phi, Omega }: Factors) {
  const lrfd = chapter.formula(id, { gives: ['R_c', 'force'], where: { phi: 'ratio', R_n: 'force' }, text: 'phi*R_n' })
  const asd = chapter.formula(id, {
    gives: ['R_c', 'force'],
    where: { R_n: 'force', Omega: 'ratio' },
    text: 'R_n/Omega',
  })
  return (on: WorkingRecorder, method: Method, R_n: Newton): Newton =>
    method === 'LRFD' ? on.take(lrfd, { phi, R_n }) : on.take(asd, { R_n, Omega })
}
