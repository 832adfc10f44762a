/** Every row of the tables against itself: dimensions, figures and weight must tell of one shape. */
import { describe, expect, test } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import type { Channel, IShape } from '../../core/catalogue/types.ts'

/** Density behind the handbook's weights: 490 lb/ft3 (AISC Manual, Part 1), in kg/m3. */
const DENSITY = (490 * 0.45359237) / 0.3048 ** 3

/** Rows outside a band, with the reason. The names carry nominal weights, which light channels miss by more than 2 %. */
const OUTSIDE: Readonly<Record<string, string>> = {
  'C3X3.5 weight': 'A = 1.09 in2 weighs 3.71 lb/ft, the nominal weight is 3.5',
  'MC10X6.5 weight': 'A = 1.95 in2 weighs 6.64 lb/ft, the nominal weight is 6.5',
  'MC6X6.5 weight': 'A = 1.95 in2 weighs 6.64 lb/ft, the nominal weight is 6.5',
}

type Row = (IShape | Channel) & { readonly figures: Channel['figures'] | IShape['figures'] }

const within = (value: number, low: number, high: number): boolean => value >= low && value <= high
const near = (value: number, other: number): boolean => Math.abs(value / other - 1) <= 0.02

/** What all shapes of two flanges and a web must satisfy; fillets add up to a tenth, published digits take up to 2 %. */
function faults({ name, d, bf, tw, tf, k, figures }: Row): string[] {
  const f = { A: NaN, Ix: NaN, Sx: NaN, Zx: NaN, Iy: NaN, Sy: NaN, Zy: NaN, J: NaN, massPerLength: NaN, ...figures }
  const A = 2 * bf * tf + (d - 2 * tf) * tw
  const Ix = (bf * d ** 3 - (bf - tw) * (d - 2 * tf) ** 3) / 12
  const Zx = bf * tf * (d - tf) + (tw * (d - 2 * tf) ** 2) / 4
  const J = (2 * bf * tf ** 3 + (d - tf) * tw ** 3) / 3
  const rules: Record<string, boolean> = {
    area: within((f.A - A) / f.A, -0.02, 0.1),
    inertia: within((f.Ix - Ix) / f.Ix, -0.02, 0.1),
    plastic: within((f.Zx - Zx) / f.Zx, -0.02, 0.1),
    torsion: within(f.J / J, 0.9, 1.6),
    elastic: near(f.Sx, (2 * f.Ix) / d),
    weight: near(f.massPerLength, f.A * DENSITY),
    fillet: tf < k && k < d / 2,
    shape: f.Zx > f.Sx && f.Zy > f.Sy && f.Zx < 1.35 * f.Sx,
  }
  return Object.keys(rules).flatMap((rule) => (rules[rule] === true ? [] : [`${name} ${rule}`]))
}

describe('every row', () => {
  test('dimensions, figures and weight agree, but for the rows listed with their reason', () => {
    const found = [...catalogue.iShapes, ...catalogue.channels].flatMap(faults)
    expect(found.sort()).toEqual(Object.keys(OUTSIDE).sort())
  })

  test('I shapes: Sy, ho and rts follow from the other figures', () => {
    const found = catalogue.iShapes.flatMap(({ name, d, bf, tf, figures }) => {
      const { Iy = NaN, Sx = NaN, Sy = NaN, Cw = NaN, rts = NaN, ho = NaN } = figures
      const warping = (Iy * (d - tf) ** 2) / 4
      return [
        ...(near(Sy, (2 * Iy) / bf) ? [] : [`${name} Sy`]),
        ...(near(ho, d - tf) ? [] : [`${name} ho`]),
        // F2-7: rts squared is the root of Iy Cw over Sx.
        ...(near(rts, Math.sqrt(Math.sqrt(Iy * Cw) / Sx)) ? [] : [`${name} rts`]),
        ...(within(Cw / warping, 0.95, 1.05) ? [] : [`${name} Cw`]),
      ]
    })
    expect(found).toEqual([])
  })

  test('channels: Sy follows from the centroid, and the shear centre lies within the flange', () => {
    const found = catalogue.channels.flatMap(({ name, bf, figures: { Iy, Sy, xBar, eo } }) => [
      ...(near(Sy, Iy / (bf - xBar)) ? [] : [`${name} Sy`]),
      ...(within(eo, 0, bf / 2) ? [] : [`${name} eo`]),
    ])
    expect(found).toEqual([])
  })

  test('the number in the name is the nominal weight', () => {
    for (const shape of [...catalogue.iShapes, ...catalogue.channels]) {
      const nominal = Number(shape.name.split('X')[1])
      expect((shape.figures.massPerLength ?? NaN) / ((nominal * 0.45359237) / 0.3048)).toBeCloseTo(1, 9)
    }
  })
})
