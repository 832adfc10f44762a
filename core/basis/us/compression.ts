/** Axial compression by the longitudinal force: AISC 360-22 E3, E4 (one axis of symmetry) and E7 (slender elements). */
import { chapter } from '../../formula/chapter.ts'
import { working, type Working, type WorkingRecorder } from '../../formula/working.ts'
import { as, type Metre, type Newton, type Pascal, type SquareMetre } from '../../quantity/kinds.ts'
import type { Section } from '../../section/types.ts'
import { available } from './available.ts'
import type { Steel } from './flexure.ts'
import { BUILT_UP_FLANGE_SLENDER, COVER_SLENDER, K_C, ROLLED_FLANGE_SLENDER, WEB_SLENDER } from './slenderness.ts'

const E1 = chapter('AISC 360-22', 'E1')
const E3 = chapter('AISC 360-22', 'E3')
const E4 = chapter('AISC 360-22', 'E4')
const E7 = chapter('AISC 360-22', 'E7')

/** phi_c P_n or P_n / Omega_c. */
export const availableCompression = available(E1, 'E1', {
  kind: 'force',
  strength: 'P',
  subscript: 'c',
  phi: 0.9,
  Omega: 1.67,
})

const E3_4X = E3.formula('E3-4', {
  gives: ['F_ex', 'stress'],
  where: { E: 'stress', L_cx: 'distance', r_x: 'length' },
  text: 'pi^2*E/(L_cx/r_x)^2',
})
const E3_4Y = E3.formula('E3-4', {
  gives: ['F_ey', 'stress'],
  where: { E: 'stress', L_cy: 'distance', r_y: 'length' },
  text: 'pi^2*E/(L_cy/r_y)^2',
})
const LOWER = E3.formula('E3', {
  gives: ['F_e', 'stress'],
  where: { F_ex: 'stress', F_ey: 'stress' },
  text: 'min(F_ex, F_ey)',
  note: 'F_ey sideways, with twist where the girder has one axis of symmetry',
})
const FEY = E4.formula('E4-6', {
  gives: ['F_ey', 'stress'],
  where: { E: 'stress', L_cy: 'distance', r_y: 'length' },
  text: 'pi^2*E/(L_cy/r_y)^2',
})
const R_O2 = E4.formula('E4-9', {
  gives: ['r_o', 'length'],
  where: { y_o: 'length', I_x: 'inertia', I_y: 'inertia', A_g: 'area' },
  text: 'sqrt(y_o^2 + (I_x + I_y)/A_g)',
})
const FLEXURAL_CONSTANT = E4.formula('E4-8', {
  gives: ['H', 'ratio'],
  where: { y_o: 'length', r_o: 'length' },
  text: '1 - y_o^2/r_o^2',
})
const FEZ = E4.formula('E4-7', {
  gives: ['F_ez', 'stress'],
  where: { E: 'stress', C_w: 'warping', L_cz: 'distance', G: 'stress', J: 'inertia', A_g: 'area', r_o: 'length' },
  text: '(pi^2*E*C_w/L_cz^2 + G*J)/(A_g*r_o^2)',
})
const E4_3 = E4.formula('E4-3', {
  gives: ['F_e', 'stress'],
  where: { F_ey: 'stress', F_ez: 'stress', H: 'ratio' },
  text: '(F_ey + F_ez)/(2*H)*(1 - sqrt(1 - 4*F_ey*F_ez*H/(F_ey + F_ez)^2))',
})
const E3_2 = E3.formula('E3-2', {
  gives: ['F_n', 'stress'],
  where: { F_y: 'stress', F_e: 'stress' },
  text: '0.658^(F_y/F_e)*F_y',
})
const E3_3 = E3.formula('E3-3', { gives: ['F_n', 'stress'], where: { F_e: 'stress' }, text: '0.877*F_e' })
/** Nominal stress of flexural buckling. */
export const E3_FN = E3.cases('E3', [
  { clause: '(a)', when: 'F_y/F_e <= 2.25', use: E3_2 },
  { clause: '(b)', otherwise: E3_3 },
])
const E7_1 = E7.formula('E7-1', {
  gives: ['P_n', 'force'],
  where: { F_n: 'stress', A_e: 'area' },
  text: 'F_n*A_e',
})
const E7_5 = E7.formula('E7-5', {
  gives: ['F_el', 'stress'],
  where: { c_2: 'ratio', lambda_r: 'ratio', lambda: 'ratio', F_y: 'stress' },
  text: '(c_2*lambda_r/lambda)^2*F_y',
})
const E7_3 = E7.formula('E7-3', {
  gives: ['b_e', 'length'],
  where: { b: 'length', c_1: 'ratio', F_el: 'stress', F_n: 'stress' },
  text: 'b*(1 - c_1*sqrt(F_el/F_n))*sqrt(F_el/F_n)',
})

/** Shear modulus of steel, 11,200 ksi: AISC 360-22 E4, symbol G (77 200 MPa). */
const G = as('stress', 11_200 * 6.894757293168361e6)

export interface CompressiveStrength {
  readonly P_n: Newton
  /** Elastic buckling load about the x- and y-axis over the lengths given, for the amplifier of appendix 8. */
  readonly elastic: { readonly x: Newton; readonly y: Newton }
  readonly working: Working
}

/**
 * Nominal axial strength of the whole girder.
 * @param L_x length between the brackets; L_y and L_z between points braced sideways and against twist, m
 */
export function compressiveStrength(section: Section, steel: Steel, L_x: Metre, L_y: Metre): CompressiveStrength {
  const on = working()
  const { E, F_y } = steel
  on.given('L_cx', 'distance', L_x, 'between the brackets')
  on.given('L_cy', 'distance', L_y, 'between points braced sideways, and against twist')
  const F_ex = on.take(E3_4X, { E, L_cx: L_x, r_x: section.rx })
  const F_ey = section.doublySymmetric
    ? on.take(E3_4Y, { E, L_cy: L_y, r_y: section.ry })
    : flexuralTorsional(section, steel, L_y, on)
  const F_e = on.take(LOWER, { F_ex, F_ey })
  const F_n = on.take(E3_FN, { F_y, F_e })
  const A_e = effectiveArea(section, steel, F_n, on)
  const P_n = on.take(E7_1, { F_n, A_e })
  const elastic = {
    x: as('force', F_ex * section.A),
    y: as('force', E3_4Y.value({ E, L_cy: L_y, r_y: section.ry }) * section.A),
  }
  return { P_n, elastic, working: on }
}

function flexuralTorsional(section: Section, { E }: Steel, L: Metre, on: WorkingRecorder): Pascal {
  const y_o = as('length', section.yShear - section.yBar)
  const A_g = section.A
  const r_o = on.take(R_O2, { y_o, I_x: section.Ix, I_y: section.Iy, A_g })
  const H = on.take(FLEXURAL_CONSTANT, { y_o, r_o })
  const F_ey = on.take(FEY, { E, L_cy: L, r_y: section.ry })
  const F_ez = on.take(FEZ, { E, C_w: section.Cw, L_cz: L, G, J: section.J, A_g, r_o })
  return on.take(E4_3, { F_ey, F_ez, H })
}

interface Element {
  readonly name: string
  readonly b: Metre
  readonly t: Metre
  readonly count: number
  readonly lambda_r: number
  /** Factors of Table E7.1: (a) for elements held along both edges, (c) for the others. */
  readonly c_1: number
  readonly c_2: number
}

const HELD_BOTH = { c_1: 0.18, c_2: 1.31 }
const HELD_ONCE = { c_1: 0.22, c_2: 1.49 }

/** Gross area less what slender elements lose (E7-2 to E7-5). */
function effectiveArea(section: Section, steel: Steel, F_n: Pascal, on: WorkingRecorder): SquareMetre {
  let lost = 0
  for (const { name, b, t, count, lambda_r, c_1, c_2 } of elementsOf(section, steel)) {
    const lambda = b / t
    if (lambda <= lambda_r * Math.sqrt(steel.F_y / F_n)) continue
    on.note(`Slender in compression: ${name}, width over thickness ${lambda.toFixed(1)}.`, {
      document: 'AISC 360-22',
      clause: 'E7.1',
    })
    const F_el = on.take(E7_5, { c_2, lambda_r, lambda, F_y: steel.F_y })
    const b_e = on.take(E7_3, { b, c_1, F_el, F_n })
    lost += count * (b - b_e) * t
  }
  return on.given(
    'A_e',
    'area',
    as('area', section.A - lost),
    lost > 0 ? 'gross area less the widths lost' : 'gross area: no slender element',
  )
}

function elementsOf(section: Section, steel: Steel): readonly Element[] {
  const k_c = K_C.value({ h: section.h, t_w: section.tw })
  const outstand =
    section.makeUp === 'plated' ? BUILT_UP_FLANGE_SLENDER.value({ k_c, ...steel }) : ROLLED_FLANGE_SLENDER.value(steel)
  const half = (flange: Section['topFlange']) => ({
    b: as('length', flange.width / 2),
    t: flange.thickness,
    count: 2,
    lambda_r: outstand,
    ...HELD_ONCE,
  })
  const elements: Element[] = [
    { name: 'web', b: section.h, t: section.tw, count: 1, lambda_r: WEB_SLENDER.value(steel), ...HELD_BOTH },
    { name: 'top flange', ...half(section.topFlange) },
    { name: 'bottom flange', ...half(section.bottomFlange) },
  ]
  if (section.cap.thickness > 0) {
    elements.push({
      name: 'cap between its welds',
      b: as('length', section.cap.slenderness * section.cap.thickness),
      t: section.cap.thickness,
      count: 1,
      lambda_r: COVER_SLENDER.value(steel),
      ...HELD_BOTH,
    })
  }
  return elements
}
