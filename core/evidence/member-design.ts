/** A rolled W shape of Fy 50 ksi taken through the rules, in the units of the Manual's tables. */
import { availableFlexure, flexuralStrength, type Steel } from '../basis/us/flexure.ts'
import { topFlangeStrength } from '../basis/us/flange.ts'
import { shearStrength } from '../basis/us/shear.ts'
import {
  availableCrippling,
  availableYielding,
  CRIPPLING_INTERIOR,
  YIELDING_END,
  YIELDING_INTERIOR,
} from '../basis/us/web.ts'
import { catalogue } from '../catalogue/load.ts'
import { working } from '../formula/working.ts'
import { as } from '../quantity/kinds.ts'
import { inUnit, UNIT } from '../quantity/units.ts'
import { sectionOf } from '../section/properties.ts'
import type { Section } from '../section/types.ts'

export interface Design {
  readonly shape: string
  readonly method: 'LRFD' | 'ASD'
}

const STEEL: Steel = { F_y: as('stress', 50 * UNIT.ksi), E: as('stress', 29_000 * UNIT.ksi) }

const shapeOf = (name: string): Section => sectionOf({ kind: 'rolled', shape: catalogue.iShape(name)! })

/** Available strength about both axes, kip ft, and the limiting lengths, ft. */
export function flexureOf({ shape, method }: Design, L_b: number, C_b = 1) {
  const section = shapeOf(shape)
  const strength = flexuralStrength(section, STEEL, as('distance', L_b * UNIT.ft), 'shear-centre')
  if ('notCovered' in strength) throw new Error(strength.notCovered)
  const { cap, buckling, L_p, L_r } = strength
  const M_n = buckling === undefined ? cap : as('moment', Math.min(cap, C_b * buckling))
  // The whole shape about its weak axis is judged by the same clause as the top flange alone, with its own moduli.
  const whole = topFlangeStrength({ ...section, top: { ...section.top, S: section.Sy, Z: section.Zy } }, STEEL)
  const kipFeet = (nominal: typeof M_n): number => inUnit(availableFlexure(working(), method, nominal), 'kip ft')
  return { strong: kipFeet(M_n), weak: kipFeet(whole.M_n), L_p: inUnit(L_p, 'ft'), L_r: inUnit(L_r, 'ft') }
}

/** Available strength in shear or of the web under a force with the given bearing length in inches, kip. */
export function availableForceOf(
  { shape, method }: Design,
  state: 'shear' | 'yielding' | 'yielding at the end' | 'crippling',
  bearing = 0,
): number {
  const section = shapeOf(shape)
  const { F_y, E } = STEEL
  const on = working()
  const l_b = as('length', bearing * UNIT.in)
  const yielding = { F_yw: F_y, t_w: section.tw, k: section.topFlange.k, l_b }
  switch (state) {
    case 'shear':
      return inUnit(shearStrength(section, STEEL, method).available, 'kip')
    case 'yielding':
      return inUnit(availableYielding(on, method, YIELDING_INTERIOR.value(yielding)), 'kip')
    case 'yielding at the end':
      return inUnit(availableYielding(on, method, YIELDING_END.value(yielding)), 'kip')
    case 'crippling': {
      const t_f = section.topFlange.thickness
      const R_n = CRIPPLING_INTERIOR.value({ t_w: section.tw, l_b, d: section.d, t_f, E, F_yw: F_y, Q_f: 1 })
      return inUnit(availableCrippling(on, method, R_n), 'kip')
    }
  }
}
