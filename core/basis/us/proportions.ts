/** Proportioning limits of AISC 360-22 F13.2 for unstiffened I shapes. */
import { chapter } from '../../formula/chapter.ts'
import { working } from '../../formula/working.ts'
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
  const lambda_w = WEB.value({ h: section.h, t_w: section.tw })
  const limits: Judgement[] = [limit('lambda_w', 'lambda_max', lambda_w, 260, 'h/t_w of an unstiffened girder')]
  if (section.aw > 0) limits.push(limit('a_w', 'a_max', section.aw, 10, 'twice the web in compression over the flange'))
  if (!section.doublySymmetric) {
    const i = SHARE.value({ I_yc: section.Iyc, I_y: section.Iy })
    limits.push(
      limit('i', 'i_max', i, 0.9, 'I_yc/I_y, not above 0.9'),
      limit('1/i', '1/i_min', 1 / i, 10, 'I_y/I_yc, not above 10'),
    )
  }
  if (lambda_w > WEB_NONCOMPACT.value(steel)) {
    limits.push(limit('lambda_w', 'lambda_max', lambda_w, SLENDER_WEB.value(steel), 'h/t_w of a slender web'))
  }
  const judgement = limits.reduce((a, b) => (b.utilisation > a.utilisation ? b : a))
  return {
    id: 'us.proportions',
    title: 'Proportions',
    clause: F13.clause('F13.2'),
    status: judgement.utilisation <= 1 ? 'holds' : 'fails',
    why: '',
    judgement,
  }
}

function limit(left: string, right: string, value: number, most: number, note: string): Judgement {
  const on = working()
  on.note(note, F13.clause('F13.2'))
  return judge(on, 'ratio', [left, value], [right, most])
}
