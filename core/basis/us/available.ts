/** Available strength from nominal strength: phi R_n (LRFD) or R_n / Omega (ASD). */
import type { Chapter } from '../../formula/chapter.ts'
import type { WorkingRecorder } from '../../formula/working.ts'
import type { Basis } from '../../job/types.ts'
import type { KindValue } from '../../quantity/kinds.ts'

type Method = Basis['method']

/** The two factors of one limit state, as the clause gives them, and the letters the clause writes. */
interface LimitState<K extends 'moment' | 'force'> {
  readonly kind: K
  /** "M" and "b" for M_n, M_c, phi_b, Omega_b; no letter: phi, Omega. */
  readonly strength: string
  readonly subscript?: string
  readonly phi: number
  readonly Omega: number
}

/** Recorder of phi M_n or M_n / Omega, the nominal strength being given. */
export function available<K extends 'moment' | 'force'>(
  chapter: Chapter,
  equation: string,
  { kind, strength, subscript, ...factors }: LimitState<K>,
) {
  const [nominal, gives] = [`${strength}_n`, `${strength}_c`]
  const [phi, Omega] = ['phi', 'Omega'].map((name) => (subscript === undefined ? name : `${name}_${subscript}`)) as [
    string,
    string,
  ]
  const lrfd = chapter.formula(equation, {
    gives: [gives, kind],
    where: { [phi]: 'ratio', [nominal]: kind },
    text: `${phi}*${nominal}`,
  })
  const asd = chapter.formula(equation, {
    gives: [gives, kind],
    where: { [nominal]: kind, [Omega]: 'ratio' },
    text: `${nominal}/${Omega}`,
  })
  return (on: WorkingRecorder, method: Method, value: KindValue[K]): KindValue[K] =>
    method === 'LRFD'
      ? on.take(lrfd, { [phi]: factors.phi, [nominal]: value } as never)
      : on.take(asd, { [nominal]: value, [Omega]: factors.Omega } as never)
}
