import { describe, expect, test } from 'vitest'
import type { Section } from '../../core/section/types.ts'
import { sectionOf } from '../../core/section/properties.ts'
import { UNIT, type Unit } from '../../core/quantity/units.ts'
import { apart, capped, channel, iShape, ownShape, plate, plated } from './make-up.ts'

const near = (value: number, unit: Unit, printed: number, half: number): void => {
  const read = value / UNIT[unit]
  expect(Math.abs(read - printed), `${read} against ${printed}`).toBeLessThanOrEqual(half)
}

describe('welded girder with unequal flanges', () => {
  // F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025: 350x20 / 650x8 / 250x14 mm. Arithmetic check.
  const section = sectionOf(plated(plate(0.35, 0.02), 0.65, 0.008, plate(0.25, 0.014)))

  test('is built of plates', () => {
    expect(section.makeUp).toBe('plated')
    expect(section.doublySymmetric).toBe(false)
  })

  test('has the printed area, centroid and inertia', () => {
    near(section.depth, 'mm', 684, 1e-9)
    near(section.A, 'mm2', 15_700, 1e-6)
    near(section.depth - section.yBar, 'mm', 269.64968, 5e-6)
    near(section.Ix, 'mm4', 1_265_593_407, 0.5)
    near(section.SxTop, 'mm3', 4_693_473, 0.5)
    near(section.SxBottom, 'mm3', 3_054_404, 0.5)
    near(section.Iy, 'mm4', 89_715_233, 0.5)
    near(section.ry, 'mm', 75.593, 5e-4)
  })

  test('has the printed plastic axis, torsion constant and lengths of the web', () => {
    near(section.depth - section.yPlastic, 'mm', 126.25, 1e-6)
    near(section.Zx, 'mm3', 3_969_188, 0.51)
    near(section.J, 'mm4', 1_272_933, 0.5)
    near(section.ho, 'mm', 667, 1e-6)
    near(section.hc, 'mm', 499.299, 5e-4)
    near(section.hp, 'mm', 212.5, 1e-6)
    expect(section.aw).toBeCloseTo(0.57063, 5)
  })

  test('has the printed flange about the vertical axis and self weight', () => {
    near(section.top.Z, 'mm3', 612_500, 1e-3)
    near(section.top.I, 'mm4', 71_458_333, 0.5)
    // Printed as 1.20903 kN/m with g = 9.81 m/s2.
    expect((section.massPerLength * 9.81) / 1000).toBeCloseTo(1.20903, 5)
  })

  test('takes r_t from the short form of F4-11, not from the long form that the notes print', () => {
    near(section.rt, 'mm', 96.549, 5e-4)
    const { ho, d, h, aw } = section
    const longForm = section.topFlange.width / Math.sqrt(12 * (ho / d + (aw * h * h) / (6 * ho * d)))
    near(longForm, 'mm', 97.986, 5e-4)
  })

  test('has the shear centre and warping constant in closed form', () => {
    const { Iyc, Iyt, ho } = section
    expect(apart(section.Cw, (ho ** 2 * Iyc * Iyt) / (Iyc + Iyt))).toBeLessThan(1e-12)
    expect(apart(section.yShear, section.bottom.height + (ho * Iyc) / (Iyc + Iyt))).toBeLessThan(1e-12)
  })
})

type Printed = [number, number, number, number, number, number, number, number, number]

describe('W shape with a channel cap', () => {
  /*
   * Sums by hand over the printed figures of the two components (AISC shapes data, v16), inches; an arithmetic check of the
   * composition, to the printed digits: A, centroid from the bottom, Ix, S bottom, S top, Iy, I and Z of flange with channel, r_t.
   */
  const rows: [w: string, c: string, ...printed: Printed][] = [
    ['W18X50', 'C12X20.7', 20.78, 11.512, 1120.8, 97.4, 165.5, 169, 149.0, 33.6, 3.672],
    ['W21X62', 'C12X20.7', 24.38, 13.015, 1797.9, 138.1, 217.5, 186.5, 157.7, 36.0, 3.605],
    ['W24X76', 'C12X20.7', 28.48, 14.412, 2740.0, 190.1, 280.5, 212, 170.2, 39.3, 3.552],
    ['W24X84', 'C15X33.9', 34.7, 15.411, 3346.2, 217.1, 368.1, 409, 362.1, 66.5, 4.462],
    ['W27X84', 'C15X33.9', 34.7, 17.085, 4054.0, 237.3, 404.8, 421, 368.3, 66.8, 4.552],
    ['W30X116', 'C15X33.9', 44.2, 18.306, 6590.1, 360.0, 544.9, 479, 397.0, 74.2, 4.351],
    ['W36X150', 'C15X33.9', 54.3, 21.184, 11564.3, 545.9, 765.1, 585, 450.4, 84.6, 4.318],
  ]

  test.each(rows)('%s + %s adds up', (w, c, A, yBar, Ix, bottom, top, Iy, It, Zt, rt) => {
    const section = sectionOf(capped(iShape(w), channel(c)))
    near(section.A, 'in2', A, 0.0051)
    near(section.yBar, 'in', yBar, 0.00051)
    near(section.Ix, 'in4', Ix, 0.051)
    near(section.SxBottom, 'in3', bottom, 0.051)
    near(section.SxTop, 'in3', top, 0.051)
    near(section.Iy, 'in4', Iy, 0.51)
    near(section.top.I, 'in4', It, 0.051)
    near(section.top.Z, 'in3', Zt, 0.051)
    near(section.rt, 'in', rt, 0.00051)
  })

  test('W27X84 + C15X33.9 as in the AISC Manual, table 1-19 (from memory; older components, hence 0.5 %)', () => {
    const section = sectionOf(capped(iShape('W27X84'), channel('C15X33.9')))
    const printed = [
      [section.Ix, 'in4', 4050],
      [section.SxBottom, 'in3', 237],
      [section.SxTop, 'in3', 403],
      [section.Iy, 'in4', 420],
    ] as const
    for (const [value, unit, figure] of printed) expect(apart(value / UNIT[unit], figure)).toBeLessThan(0.005)
  })

  test('r_t of W30X116 + C15X33.9 as in the AISC Manual of 1989 (4.34 in; older components, hence 0.5 %)', () => {
    const section = sectionOf(capped(iShape('W30X116'), channel('C15X33.9')))
    expect(apart(section.rt / UNIT.in, 4.34)).toBeLessThan(0.005)
  })

  test('measures the web of the W alone and from the W’s own toe', () => {
    const w = iShape('W27X84')
    const c = channel('C15X33.9')
    const section = sectionOf(capped(w, c))
    expect(section.h).toBeCloseTo(w.d - 2 * w.k, 12)
    expect(section.d).toBe(w.d)
    expect(section.depth).toBeCloseTo(w.d + c.tw, 12)
    expect(section.hc).toBeCloseTo(2 * (w.d - w.k - section.yBar), 12)
    expect(section.hp).toBeCloseTo(2 * (w.d - w.k - section.yPlastic), 12)
    expect(section.cap).toEqual({ thickness: c.tw, slenderness: w.bf / c.tw })
    expect(section.massPerLength).toBeCloseTo(117.9 * UNIT['lb/ft'], 9)
    near(section.J, 'in4', 2.81 + 1.01, 0.0051)
    // Flange and channel together: (6.4 x 26.38 + 10.0 x 26.313)/16.4 less half the bottom flange, by hand.
    near(section.ho, 'in', 26.02, 0.01)
  })

  test('a heavy channel on a light W breaks 0.9 of F13.2: Iyc/Iy 0.944 and 0.923 by hand', () => {
    const ratio = (w: string): number => {
      const section = sectionOf(capped(iShape(w), channel('C15X33.9')))
      return section.Iyc / section.Iy
    }
    expect(ratio('W18X50')).toBeCloseTo(0.944, 3)
    expect(ratio('W21X62')).toBeCloseTo(0.923, 3)
  })
})

describe('rolled shape alone', () => {
  test('keeps every handbook figure', () => {
    const shape = iShape('W24X76')
    const section = sectionOf({ kind: 'rolled', shape })
    const { A, Ix, Sx, Zx, Iy, Sy, Zy, J, Cw, rts, ho, massPerLength } = shape.figures
    expect(section).toMatchObject({ A, Ix, SxTop: Sx, SxBottom: Sx, Zx, Iy, Sy, Zy, J, Cw, rts, ho, massPerLength })
    expect(section).toMatchObject({ makeUp: 'rolled', doublySymmetric: true })
    expect(section.yBar).toBeCloseTo(shape.d / 2, 12)
    expect(section.yPlastic).toBe(section.yBar)
    expect(section.yShear).toBe(section.yBar)
    expect(section.hc).toBeCloseTo(section.h, 12)
    expect(section.hp).toBeCloseTo(section.h, 12)
    expect(section.cap).toEqual({ thickness: 0, slenderness: 0 })
  })

  test('a shape of one’s own takes the figures entered and computes the others from them and the dimensions', () => {
    const { Ix, J } = iShape('W24X76').figures
    const dimensions = [0.607, 0.228, 0.0112, 0.0173, 0.0127] as const
    const bare = sectionOf({ kind: 'rolled', shape: ownShape(dimensions) })
    const section = sectionOf({ kind: 'rolled', shape: ownShape(dimensions, { Ix: Ix!, J: J! }) })
    expect(section.Ix).toBe(Ix)
    expect(section.J).toBe(J)
    expect(section.SxTop).toBeCloseTo(Ix! / (0.607 / 2), 12)
    expect(section.A).toBe(bare.A)
    expect(section.massPerLength).toBeCloseTo(7850 * section.A, 9)
  })

  test('a web thicker than the flange has the torsion constant of its rectangles', () => {
    const section = sectionOf({ kind: 'rolled', shape: ownShape([0.4, 0.2, 0.02, 0.015, 0.02]) })
    near(section.J, 'mm4', (2 * 200 * 15 ** 3 + 370 * 20 ** 3) / 3, 1e-3)
  })

  test('r_ts by F2-7 where none is printed agrees with the printed one', () => {
    const shape = iShape('W24X76')
    const { Sx, Iy, Cw, rts } = shape.figures
    const section = sectionOf({ kind: 'rolled', shape: { ...shape, figures: { Sx: Sx!, Iy: Iy!, Cw: Cw! } } })
    // Three printed digits.
    expect(apart(section.rts, rts!)).toBeLessThan(0.003)
  })
})

describe('plate caps', () => {
  test('the same plates make the same section, named flange or cap', () => {
    const flange = sectionOf(plated(plate(0.4, 0.03), 0.8, 0.01, plate(0.3, 0.02)))
    const cap = { kind: 'plate', plate: plate(0.4, 0.01) } as const
    const section = sectionOf({ ...plated(plate(0.4, 0.02), 0.8, 0.01, plate(0.3, 0.02)), cap })
    const same = [
      'A',
      'depth',
      'yBar',
      'Ix',
      'Iy',
      'SxTop',
      'SxBottom',
      'Sy',
      'yPlastic',
      'Zx',
      'Zy',
      'yShear',
      'massPerLength',
      'ho',
      'hc',
      'hp',
      'Iyc',
      'Iyt',
    ] as const
    for (const name of same) expect(apart(section[name], flange[name]), name).toBeLessThan(1e-12)
    // Two plates are less stiff in torsion than one of both thicknesses, and warp each in its own plane.
    expect(section.J).toBeLessThan(flange.J)
    expect(apart(section.Cw, flange.Cw)).toBeLessThan(1e-3)
    expect(section.rt).toBeCloseTo(Math.sqrt(section.top.I / (section.top.A + (section.hc * 0.01) / 6)), 12)
    // F4-11 with the whole top flange is the same radius of gyration.
    expect(apart(section.rt, flange.rt)).toBeLessThan(1e-12)
  })

  test('the element between the welds is as wide as the narrower of cap and flange', () => {
    const on = (width: number): Section =>
      sectionOf({ kind: 'rolled', shape: iShape('W24X76'), cap: { kind: 'plate', plate: plate(width, 0.01) } })
    expect(on(0.2).cap.slenderness).toBeCloseTo(20, 12)
    expect(on(0.3).cap.slenderness).toBeCloseTo(iShape('W24X76').bf / 0.01, 12)
    expect(on(0.3).top.width).toBe(0.3)
    expect(on(0.2).top.width).toBe(iShape('W24X76').bf)
  })

  test('a plastic axis in the top flange leaves no web to be compressed', () => {
    const section = sectionOf(plated(plate(0.6, 0.05), 0.4, 0.006, plate(0.1, 0.006)))
    expect(section.yPlastic).toBeGreaterThan(0.406)
    expect(section.hp).toBe(0)
    // The centroid stands even higher here, inside the flange: F4-11 then is the radius of gyration of the flange alone.
    expect(section.yBar).toBeGreaterThan(0.406)
    expect(section.hc).toBe(0)
    expect(section.rt).toBeCloseTo(0.6 / Math.sqrt(12), 12)
  })

  test('an axis where width changes is found on the spot: a section cut into equal halves at the flange’s underside', () => {
    // Top flange 0.3 x 0.02 = web 0.4 x 0.01 + bottom flange 0.1 x 0.02.
    const section = sectionOf(plated(plate(0.3, 0.02), 0.4, 0.01, plate(0.1, 0.02)))
    expect(section.yPlastic).toBeCloseTo(0.42, 12)
    expect(section.Zx).toBeCloseTo(0.006 * 0.01 + 0.004 * 0.2 + 0.002 * 0.41, 12)
  })

  test('equal flanges are doubly symmetric: r_ts by F2-7, C_w = I_f ho^2/2', () => {
    const section = sectionOf(plated(plate(0.3, 0.02), 0.6, 0.01, plate(0.3, 0.02)))
    expect(section.doublySymmetric).toBe(true)
    expect(apart(section.Cw, (section.Iyc * 0.62 ** 2) / 2)).toBeLessThan(1e-12)
    expect(section.rts ** 2).toBeCloseTo(Math.sqrt(section.Iy * section.Cw) / section.SxTop, 12)
    expect(section.hp).toBeCloseTo(section.hc, 12)
  })
})
