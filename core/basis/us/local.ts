/** Shear of the span and the web under wheels and over bearings. */
import { unrecorded, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type Newton } from '../../quantity/kinds.ts'
import { spanOf } from '../../travel/influence.ts'
import type { Ask, Subject, Verdict } from '../types.ts'
import type { Design, Loading } from './design.ts'
import { ask, demandOf, judge } from './judgement.ts'
import { shearStrength } from './shear.ts'
import { reactionByStatics } from './standing.ts'
import {
  availableCrippling,
  availableYielding,
  CRIPPLING_END,
  CRIPPLING_INTERIOR,
  DISPERSAL,
  YIELDING_END,
  YIELDING_INTERIOR,
} from './web.ts'

const SHEAR: Subject = { id: 'us.shear', title: 'Shear', clause: { document: 'AISC 360-22', clause: 'G2.1' } }

/** Greatest shear at the supports of one span. */
export function shearAsks(design: Design, span: number): readonly Ask[] {
  const strength = shearStrength(design.section, design.steel, design.job.basis.method)
  return design.loadings.map((loading) =>
    ask(SHEAR, span, loading, { kind: 'shear', wheels: loading.vertical, uniform: loading.uniform }, (place, on) => {
      demandOf(loading, on)
      const end = place.value > 0 ? 'left' : 'right'
      const V_u = on.given('V_u', 'force', as('force', Math.abs(place.value)), `greatest shear, at the ${end} bearing`)
      reactionByStatics(design, place, { wheels: loading.vertical, uniform: loading.uniform }, end, on)
      on.include(strength.working, ['V_n', 'force', strength.V_n], 'shear strength')
      return judge(on, 'force', ['V_u', V_u], ['V_c', strength.available])
    }),
  )
}

/** One of the two limit states of the web under a force, in its interior and its end form. */
interface LimitState {
  readonly name: 'yielding' | 'crippling'
  readonly clause: 'J10.2' | 'J10.3'
  /** The end form holds within this part of the depth from the girder's end. */
  readonly endZone: number
  readonly available: (
    design: Design,
    l_b: Metre,
    where: 'interior' | 'end',
    flange: 'top' | 'bottom',
    on: WorkingRecorder,
  ) => Newton
  /** Wheels nearer than this share one length. */
  readonly reach: (design: Design, l_b: Metre, where: 'interior' | 'end') => number
}

const YIELDING: LimitState = {
  name: 'yielding',
  clause: 'J10.2',
  endZone: 1,
  available: (design, l_b, where, flange, on) => {
    const { section, steel, job } = design
    const k = (flange === 'top' ? section.topFlange : section.bottomFlange).k
    const rule = where === 'interior' ? YIELDING_INTERIOR : YIELDING_END
    return availableYielding(on, job.basis.method, on.take(rule, { F_yw: steel.F_y, t_w: section.tw, k, l_b }))
  },
  reach: ({ section }, l_b, where) => l_b + (where === 'interior' ? 5 : 2.5) * section.topFlange.k,
}

const CRIPPLING: LimitState = {
  name: 'crippling',
  clause: 'J10.3',
  endZone: 1 / 2,
  available: (design, l_b, where, flange, on) => {
    const { section, steel, job } = design
    const t_f = (flange === 'top' ? section.topFlange : section.bottomFlange).thickness
    const values = { t_w: section.tw, l_b, d: section.d, t_f, E: steel.E, F_yw: steel.F_y, Q_f: 1 }
    const R_n = where === 'interior' ? on.take(CRIPPLING_INTERIOR, values) : on.take(CRIPPLING_END, values)
    return availableCrippling(on, job.basis.method, R_n)
  },
  reach: (_design, l_b) => l_b,
}

const subject = (state: LimitState, where: 'wheel' | 'end'): Subject => ({
  id: `us.web.${state.name}.${where}`,
  title: where === 'wheel' ? `Web ${state.name} under a wheel` : `Web ${state.name} at the girder’s end`,
  clause: { document: 'AISC 360-22', clause: state.clause },
})

/**
 * The web of one span: under a wheel inside the span; and at the girder's end, under a wheel that stands there and over
 * the bearing. No bearing stiffener takes part.
 */
export function webPlan(design: Design, span: number): { asks: readonly Ask[]; verdicts: readonly Verdict[] } {
  const asks: Ask[] = []
  const verdicts: Verdict[] = []
  for (const state of [YIELDING, CRIPPLING]) {
    for (const loading of design.loadings) {
      if (loading.train === undefined) continue
      asks.push(...wheelAsks(design, span, loading, state), ...bearingAsks(design, span, loading, state))
    }
    if (design.job.runway.bearingLength === undefined) {
      verdicts.push({
        ...subject(state, 'end'),
        status: 'not-covered',
        why: 'Over the bearing: the bearing length is not entered (runway.bearingLength).',
      })
    }
  }
  return { asks, verdicts }
}

function wheelAsks(design: Design, span: number, loading: Loading, state: LimitState): readonly Ask[] {
  const { section, job } = design
  const { start, length } = spanOf(job.runway, span)
  const zone = state.endZone * section.d
  const { rail } = job.runway
  const dispersal = { h_r: as('length', rail.height - rail.wear), t_cap: section.cap.thickness }
  const places = [{ where: 'end', at: as('distance', start) } as const]
  const interior = { where: 'interior', at: as('distance', start + length / 2) } as const
  return [...places, ...(length > 2 * zone ? [interior] : [])].map(({ where, at }) => {
    const l_b = DISPERSAL.value(dispersal)
    const together = worstTogether(design, loading, state, l_b, where)
    const effect = { kind: 'stand', wheel: together.wheel, at, value: together.force } as const
    return ask(subject(state, where === 'end' ? 'end' : 'wheel'), span, loading, effect, (_place, on) => {
      demandOf(loading, on)
      on.note(
        where === 'end'
          ? `A wheel within ${state.endZone === 1 ? 'd' : 'd/2'} of the girder’s end.`
          : 'A wheel inside the span.',
      )
      const R_u = on.given(
        'R_u',
        'force',
        together.force,
        together.count > 1
          ? `${together.count} wheels that share one length of web`
          : 'one wheel with impact and load factor',
      )
      let bearing = on.take(DISPERSAL, dispersal)
      if (together.count > 1) {
        bearing = on.given(
          'l_b',
          'length',
          as('length', l_b + together.spread),
          'lengthened by the distance between these wheels',
        )
      }
      return judge(on, 'force', ['R_u', R_u], ['R_c', state.available(design, bearing, where, 'top', on)])
    })
  })
}

/** Neighbouring wheels whose lengths of web overlap act as one force over the joined length; the worst such group. */
function worstTogether(design: Design, loading: Loading, state: LimitState, l_b: Metre, where: 'interior' | 'end') {
  const { wheels } = design.trains[loading.train!]!
  const reach = state.reach(design, l_b, where)
  let worst = { wheel: 0, count: 1, spread: 0, force: as('force', 0), utilisation: -1 }
  for (let first = 0; first < wheels.length; first++) {
    let force = 0
    for (let last = first; last < wheels.length; last++) {
      if (last > first && wheels[last]!.offset - wheels[last - 1]!.offset >= reach) break
      force += loading.vertical[last]!
      const spread = wheels[last]!.offset - wheels[first]!.offset
      const available = state.available(design, as('length', l_b + spread), where, 'top', unrecorded)
      const utilisation = force / available
      if (utilisation > worst.utilisation) {
        worst = { wheel: first, count: last - first + 1, spread, force: as('force', force), utilisation }
      }
    }
  }
  return worst
}

function bearingAsks(design: Design, span: number, loading: Loading, state: LimitState): readonly Ask[] {
  const { bearingLength, endDistance } = design.job.runway
  if (bearingLength === undefined) return []
  const far = endDistance !== undefined && endDistance > state.endZone * design.section.d
  return (['left', 'right'] as const).map((end) =>
    ask(
      subject(state, 'end'),
      span,
      loading,
      { kind: 'endReaction', end, wheels: loading.vertical, uniform: loading.uniform },
      (place, on) => {
        demandOf(loading, on)
        const R_u = on.given(
          'R_u',
          'force',
          as('force', place.value),
          `reaction at the ${end} bearing, dead load included`,
        )
        const l_b = on.given('l_b', 'length', bearingLength, 'length of the bearing')
        return judge(
          on,
          'force',
          ['R_u', R_u],
          ['R_c', state.available(design, l_b, far ? 'interior' : 'end', 'bottom', on)],
        )
      },
    ),
  )
}
