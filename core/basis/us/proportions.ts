/** Proportioning limits of AISC 360-22 F13.2 for unstiffened I shapes. */
import { chapter } from '../../formula/chapter.ts'
import { unrecorded, type WorkingRecorder } from '../../formula/working.ts'
import type { Section } from '../../section/types.ts'
import type { Judgement, Verdict } from '../types.ts'
import type { Steel } from './flexure.ts'
import { judge } from './judgement.ts'
import { WEB_NONCOMPACT } from './slenderness.ts'

const F13 = chapter('AISC 360-22', 'F13')

const SHARE = F13.formula('F13-2', {
  gives: ['i', 'ratio'],
  where: { I_yc: 'inertia', I_y: 'inertia' },
  text: 'I_yc/I_y',
})
const WEB = F13.formula('F13.2', { gives: ['lambda_w', 'ratio'], where: { h: 'length', t_w: 'length' }, text: 'h/t_w' })
const SLENDER_WEB = F13.formula('F13-4', {
  gives: ['lambda_max', 'ratio'],
  where: { E: 'stress', F_y: 'stress' },
  text: '0.40*E/F_y',
})

/** The limit of F13.2 that is used most. Those of slender webs hold where h/t_w passes 5.70 sqrt(E/F_y). */
export function proportions(section: Section, steel: Steel): Verdict {
  const web = { h: section.h, t_w: section.tw }
  const limits: ((on: WorkingRecorder) => Judgement)[] = [
    (on) => limit(on, ['lambda_w', on.take(WEB, web)], ['lambda_max', 260], 'web of an unstiffened girder'),
    (on) => limit(on, ['a_w', section.aw], ['a_max', 10], 'twice the web in compression over the compression flange'),
  ]
  if (WEB.value(web) > WEB_NONCOMPACT.value(steel)) {
    limits.push((on) =>
      limit(on, ['lambda_w', on.take(WEB, web)], ['lambda_max', on.take(SLENDER_WEB, steel)], 'slender web'),
    )
  }
  if (!section.doublySymmetric) {
    const share = (on: WorkingRecorder): number => on.take(SHARE, { I_yc: section.Iyc, I_y: section.Iy })
    limits.push(
      (on) => limit(on, ['i', share(on)], ['i_max', 0.9], 'compression flange not above nine tenths'),
      (on) => limit(on, ['i_min', 0.1], ['i', share(on)], 'compression flange not below a tenth'),
    )
  }
  const decided = limits.map((decide) => ({ decide, utilisation: decide(unrecorded).utilisation }))
  const { decide, utilisation } = decided.reduce((a, b) => (b.utilisation > a.utilisation ? b : a))
  return {
    id: 'us.proportions',
    title: 'Proportions',
    clause: F13.clause('F13.2'),
    status: utilisation <= 1 ? 'holds' : 'fails',
    why: '',
    judge: decide,
  }
}

type Named = readonly [symbol: string, value: number]

function limit(on: WorkingRecorder, value: Named, most: Named, note: string): Judgement {
  on.note(note, F13.clause('F13.2'))
  return judge(on, 'ratio', value, most)
}
