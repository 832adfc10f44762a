/** All that bends the girder of one span. */
import { chapter } from '../../formula/chapter.ts'
import { as, type Metre } from '../../quantity/kinds.ts'
import type { MomentTerm } from '../../travel/types.ts'
import type { Ask, Plan, Subject, Verdict } from '../types.ts'
import { BIAXIAL, biaxialAsks, BOTTOM, bottomAsks, compressionVerdict } from './both-axes.ts'
import { compressiveStrength } from './compression.ts'
import type { Design } from './design.ts'
import { availableFlexure, flexuralStrength } from './flexure.ts'
import { ask, demandOf, judge } from './judgement.ts'
import { momentByStatics } from './standing.ts'
import { MAJOR, majorAsks, NO_ENDS, strongAxisCautions } from './strong-axis.ts'

const LATERAL: Subject = {
  id: 'us.flexure.lateral',
  title: 'Side thrust on the top flange',
  clause: chapter('AISC 360-22', 'F6').clause('F6'),
}

/** Asks, verdicts and cautions of bending; what rests on strong-axis strength is not covered where that is not. */
export function bendingOf(design: Design, span: number): Plan {
  const { job, section, steel } = design
  const length = job.runway.spans[span]!
  const L_b = job.runway.unbracedLength ?? length
  const strength = flexuralStrength(section, steel, L_b, job.basis.loadHeight)
  const axial = compressiveStrength(section, steel, length, longest(L_b, job.runway.unbracedLengthBottom ?? length))
  const lateral = lateralAsks(design, span)
  const compression = compressionVerdict(design, axial)
  if ('notCovered' in strength) {
    const open = [MAJOR, BIAXIAL, BOTTOM].map((subject): Verdict => ({
      ...subject,
      status: 'not-covered',
      why: strength.notCovered,
    }))
    return { asks: lateral, verdicts: [...open, compression], cautions: [] }
  }
  const axis = { design, span, length, L_b, strength }
  const asks: Ask[] = []
  const verdicts: Verdict[] = [compression]
  for (const loading of design.loadings) {
    asks.push(...majorAsks(axis, loading), ...bottomAsks(axis, loading))
    if (loading.train === undefined) continue
    const both = biaxialAsks(axis, axial, loading)
    if ('status' in both) verdicts.push(both)
    else asks.push(...both)
  }
  return { asks: [...asks, ...lateral], verdicts, cautions: strongAxisCautions(axis) }
}

const longest = (a: Metre, b: Metre): Metre => (a >= b ? a : b)

function lateralAsks(design: Design, span: number): readonly Ask[] {
  const top = design.topFlange
  return design.loadings.flatMap((loading) => {
    if (loading.train === undefined) return []
    const term: MomentTerm = { factor: 1, at: 'worst', wheels: loading.top, uniform: as('lineLoad', 0), ends: NO_ENDS }
    return ask(LATERAL, span, loading, { kind: 'moments', terms: [term] }, (place, on) => {
      demandOf(loading, on)
      const found = place.terms[0]!
      const M_ry = on.given('M_ry', 'moment', found.value, 'greatest moment of the top flange sideways')
      momentByStatics(design, place, term, found.station, on)
      on.include(top.working, ['M_n', 'moment', top.M_n], 'strength of the top flange sideways')
      return judge(on, 'moment', ['M_ry', M_ry], ['M_cy', availableFlexure(on, design.job.basis.method, top.M_n)])
    })
  })
}
