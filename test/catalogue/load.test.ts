import { describe, expect, test } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import { inUnit, type Unit } from '../../core/quantity/units.ts'

/** Figures as the handbook prints them: [A in2, Ix in4, Sx in3, Zx in3, Iy in4, Sy in3, Zy in3, J in4, Cw in6]. */
const FIGURES = ['A', 'Ix', 'Sx', 'Zx', 'Iy', 'Sy', 'Zy', 'J', 'Cw'] as const
const UNITS: readonly Unit[] = ['in2', 'in4', 'in3', 'in3', 'in4', 'in3', 'in3', 'in4', 'in6']

// AISC Steel Construction Manual, Table 1-1 (W) and 1-5, 1-6 (C, MC).
const PRINTED = {
  W27X84: [24.7, 2850, 213, 244, 106, 21.2, 33.2, 2.81, 17900],
  W24X76: [22.4, 2100, 176, 200, 82.5, 18.4, 28.6, 2.68, 11100],
  W36X150: [44.3, 9040, 504, 581, 270, 45.1, 70.9, 10.1, 82200],
  W18X35: [10.3, 510, 57.6, 66.5, 15.3, 5.12, 8.06, 0.506, 1140],
  W14X90: [26.5, 999, 143, 157, 362, 49.9, 75.6, 4.06, 16000],
  'C15X33.9': [10.0, 315, 42.0, 50.8, 8.07, 3.09, 6.19, 1.01, 358],
  'C12X20.7': [6.08, 129, 21.5, 25.6, 3.86, 1.72, 3.47, 0.369, 112],
  'MC18X42.7': [12.6, 554, 61.5, 75.1, 14.3, 4.64, 8.82, 1.23, 852],
}

describe('the catalogue', () => {
  test('has every W, S, HP, C and MC of the handbook, each name once', () => {
    const count = (all: readonly { readonly family: string }[], family: string): number =>
      all.filter((each) => each.family === family).length
    expect(['W', 'S', 'HP'].map((family) => count(catalogue.iShapes, family))).toEqual([289, 28, 22])
    expect(['C', 'MC'].map((family) => count(catalogue.channels, family))).toEqual([32, 40])
    expect(catalogue.rails.map((rail) => rail.name).join(', ')).toBe(
      'ASCE 40, ASCE 60, ASCE 80, ASCE 85, 104 lb, 105 lb, 135 lb, 171 lb, 175 lb',
    )
    expect(catalogue.steels.map((steel) => steel.name).join(', ')).toBe('A36, A572-50, A992, A709-50, A529-50')
    for (const all of [catalogue.iShapes, catalogue.channels, catalogue.rails, catalogue.steels]) {
      expect(new Set(all.map((each) => each.name)).size).toBe(all.length)
      expect(all.filter((each) => each.source.length < 10)).toEqual([])
    }
    expect(catalogue.iShapes).toBe(catalogue.iShapes)
  })

  test.each(Object.entries(PRINTED))('%s has the printed figures', (name, printed) => {
    const shape = catalogue.iShape(name) ?? catalogue.channel(name)
    const read = FIGURES.map((figure, i) => inUnit(shape?.figures[figure] ?? NaN, UNITS[i] ?? ''))
    read.forEach((value, i) => {
      expect(value).toBeCloseTo(printed[i] ?? NaN, 9)
    })
  })

  test('dimensions, and what belongs to one family only', () => {
    const w = catalogue.iShape('W24X76')
    const inches = (value: number | undefined): number => Number(inUnit(value ?? NaN, 'in').toPrecision(12))
    expect([w?.d, w?.bf, w?.tw, w?.tf, w?.k, w?.figures.rts, w?.figures.ho].map(inches)).toEqual([
      23.9, 8.99, 0.44, 0.68, 1.18, 2.33, 23.2,
    ])
    const c = catalogue.channel('C15X33.9')
    expect([c?.d, c?.bf, c?.tw, c?.tf, c?.k, c?.figures.xBar, c?.figures.eo].map(inches)).toEqual([
      15, 3.4, 0.4, 0.65, 1.44, 0.788, 0.896,
    ])
    expect(inUnit(w?.figures.massPerLength ?? NaN, 'lb/ft')).toBeCloseTo(76, 10)
    const rail = catalogue.rail('135 lb')
    expect([rail?.height, rail?.headWidth, rail?.footWidth].map(inches)).toEqual([5.75, 3.4375, 5.1875])
    // Published beside the US weight: 67.39 and 42.16 kg/m.
    expect(rail?.massPerLength).toBeCloseTo(67.39, 2)
    expect(catalogue.rail('ASCE 85')?.massPerLength).toBeCloseTo(42.16, 2)
  })

  test.each([
    [
      'A36',
      [
        [8, 36, 58],
        [undefined, 32, 58],
      ],
    ],
    ['A572-50', [[undefined, 50, 65]]],
    ['A992', [[undefined, 50, 65]]],
  ])('%s has its standard’s strengths', (name, steps) => {
    const read = catalogue
      .steel(name)
      ?.steps.map(({ upTo, fy, fu }) => [
        upTo === undefined ? undefined : Math.round(inUnit(upTo, 'in')),
        Math.round(inUnit(fy, 'ksi')),
        Math.round(inUnit(fu, 'ksi')),
      ])
    expect(read).toEqual(steps)
  })
})

describe('look-up', () => {
  test.each([
    ['W27X84', ['w27x84', 'W 27 × 84', ' w27 x 84 ', 'W-27-X-84']],
    ['C15X33.9', ['c15x33.9', 'C 15 x 33.9', 'C15×33.9']],
    ['MC18X42.7', ['mc18x42.7', 'MC 18×42.7']],
    ['HP14X73', ['hp 14 x 73']],
    ['ASCE 85', ['ASCE85', 'asce-85', '85', '85 lb', '85 lb/yd', 'ASCE 85 lb']],
    ['135 lb', ['135', '135 LB', '135lb', 'CR 135', '135-lb rail', '135#']],
    ['A992', ['a992', 'ASTM A992', 'ASTM A992/A992M']],
    ['A572-50', ['A572 Gr. 50', 'a572 grade 50', 'ASTM A572/A572M Gr 50', 'A57250']],
    ['A36', ['a 36', 'ASTM A36']],
  ])('%s is found as typed', (name, typed) => {
    const c = catalogue
    for (const text of [name, ...typed]) {
      expect((c.iShape(text) ?? c.channel(text) ?? c.rail(text) ?? c.steel(text))?.name).toBe(name)
    }
  })

  test('every name is found as it stands', () => {
    for (const shape of catalogue.iShapes) expect(catalogue.iShape(shape.name)).toBe(shape)
    for (const shape of catalogue.channels) expect(catalogue.channel(shape.name)).toBe(shape)
    for (const rail of catalogue.rails) expect(catalogue.rail(rail.name)).toBe(rail)
    for (const steel of catalogue.steels) expect(catalogue.steel(steel.name)).toBe(steel)
  })

  test.each(['', 'W24X77', 'W24X760', 'C15X33.9', '__proto__', 'constructor', 'W24X76\u0000', '85.0.0'])(
    '%s is no I shape',
    (name) => {
      expect(catalogue.iShape(name)).toBeUndefined()
    },
  )

  test.each<[family: 'iShape' | 'channel' | 'rail' | 'steel', typed: string, nearest: string[]]>([
    ['iShape', 'W24X77', ['W24X76', 'W24X84', 'W24X68', 'W24X62', 'W24X94']],
    ['iShape', 'w 26 x 84', ['W27X84', 'W24X84', 'W27X94', 'W24X76', 'W27X102']],
    ['iShape', 'W2476', ['W24X76', 'W24X176', 'W24X68', 'W24X62']],
    ['channel', 'C15X34', ['C15X33.9', 'C15X40', 'C15X50', 'C12X30', 'C12X25']],
    ['rail', 'ASCE 90', ['ASCE 85', 'ASCE 80', '104 lb', '105 lb', 'ASCE 40']],
    ['steel', 'A572', ['A572-50', 'A992', 'A36', 'A529-50', 'A709-50']],
    ['iShape', 'banana', []],
    ['iShape', '', []],
  ])('near to the %s %s', (family, typed, nearest) => {
    expect(catalogue.nearest(family, typed)).toEqual(nearest)
  })

  test('a name of a million letters is no trouble', () => {
    const began = performance.now()
    expect(catalogue.nearest('iShape', 'W'.repeat(1e6))).toEqual([])
    expect(performance.now() - began).toBeLessThan(500)
  })
})
