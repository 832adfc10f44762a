import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { DIMENSIONS, type Kind, type UnitSystem } from '../../core/quantity/kinds.ts'
import { readQuantity } from '../../core/quantity/read.ts'
import { UNITS_OF } from '../../core/quantity/unit-names.ts'
import { UNIT, WEIGHT_OF, fromUnit, shownUnit, type Unit } from '../../core/quantity/units.ts'
import { writeUnit } from '../../core/quantity/write.ts'

type Wanted = Kind | 'forceOrMass'
const WANTED = Object.keys(UNITS_OF) as Wanted[]
const KINDS = Object.keys(DIMENSIONS) as Kind[]

const inches = (count: number): number => (count * 254) / 10000
const kip = 4448.2216152605
const pound = 4.4482216152605

describe('a quantity is read', () => {
  test.each<[text: string | number, kind: Wanted, value: number, unit: Unit]>([
    [9.144, 'distance', 9.144, 'm'],
    [-0, 'force', 0, 'N'],
    ['30 ft', 'distance', 9.144, 'ft'],
    ['12 ft 6 in', 'distance', 3.81, 'ft'],
    ['12 ft 6 in.', 'distance', 3.81, 'ft'],
    ['12ft6in', 'distance', 3.81, 'ft'],
    ['12 FT 6 IN', 'distance', 3.81, 'ft'],
    ["12' 6", 'distance', 3.81, 'ft'],
    ['12\'-6"', 'distance', 3.81, 'ft'],
    ['12 ft-6 in', 'distance', 3.81, 'ft'],
    ['-12\' 6"', 'distance', -3.81, 'ft'],
    ['3\' 5 7/32"', 'length', inches(41 + 7 / 32), 'ft'],
    ['3′ 5 7⁄32″', 'length', inches(41 + 7 / 32), 'ft'],
    ['2\'6"', 'length', 0.762, 'ft'],
    ["2' 6''", 'length', 0.762, 'ft'],
    ['3\' 5/8"', 'length', inches(36.625), 'ft'],
    ['11 ft 6-7/8 in', 'length', inches(138.875), 'ft'],
    ['6-7/8 in', 'length', inches(6.875), 'in'],
    ['7/8 in', 'length', inches(0.875), 'in'],
    ['½ in', 'length', 0.0127, 'in'],
    ['6½"', 'length', 0.1651, 'in'],
    ['10-1/2 ft', 'length', 3.2004, 'ft'],
    ['9144 mm', 'distance', 9.144, 'mm'],
    ['914,4 cm', 'distance', 9.144, 'cm'],
    ['30 yards', 'distance', 27.432, 'yd'],
    ['7,5 m', 'distance', 7.5, 'm'],
    ['0,250 m', 'distance', 0.25, 'm'],
    ['1234,567 m', 'distance', 1234.567, 'm'],
    ['1.250,5 m', 'distance', 1250.5, 'm'],
    ['1,250.5 m', 'distance', 1250.5, 'm'],
    ['.5 m', 'distance', 0.5, 'm'],
    ['1e3 mm', 'distance', 1, 'mm'],
    ['−3 ft', 'distance', -0.9144, 'ft'],
    ['30\u00A0ft', 'distance', 9.144, 'ft'],
    ['38.1 kip', 'force', 38.1 * kip, 'kip'],
    ['10 k', 'force', 10 * kip, 'kip'],
    ['10 K', 'force', 10 * kip, 'kip'],
    ['10 kips', 'force', 10 * kip, 'kip'],
    ['1,250 kip', 'force', 1250 * kip, 'kip'],
    ['1\u2009250 kip', 'force', 1250 * kip, 'kip'],
    ['1,250,000 N', 'force', 1250000, 'N'],
    ['500 lb', 'force', 500 * pound, 'lb'],
    ['500 lbf', 'force', 500 * pound, 'lbf'],
    ['170 kN', 'force', 170000, 'kN'],
    ['1 tf', 'force', 9806.65, 'tf'],
    ['20 t', 'forceOrMass', 196133, 't'],
    ['20 tonnes', 'forceOrMass', 196133, 't'],
    ['20 metric tons', 'forceOrMass', 196133, 't'],
    ['20 ton', 'forceOrMass', 40 * kip, 'ton'],
    ['20 short tons', 'forceOrMass', 40 * kip, 'ton'],
    ['40000 lbs', 'forceOrMass', 40 * kip, 'lb'],
    ['2000 kg', 'forceOrMass', 19613.3, 'kg'],
    ['170 kN', 'forceOrMass', 170000, 'kN'],
    ['20 t + 5 kip', 'forceOrMass', 196133 + 5 * kip, 't'],
    ['40 lb/ft', 'lineLoad', (40 * pound) / 0.3048, 'lb/ft'],
    ['40 plf', 'lineLoad', (40 * pound) / 0.3048, 'lbf/ft'],
    ['1.2 klf', 'lineLoad', (1.2 * kip) / 0.3048, 'kip/ft'],
    ['60 kg/m', 'lineLoad', 588.399, 'kg/m'],
    ['0.6 kN / m', 'lineLoad', 600, 'kN/m'],
    ['50 ksi', 'stress', (50 * kip) / 0.0254 ** 2, 'ksi'],
    ['36 kip/in²', 'stress', (36 * kip) / 0.0254 ** 2, 'ksi'],
    ['345 N/mm²', 'stress', 345e6, 'N/mm2'],
    ['345 mpa', 'stress', 345e6, 'MPa'],
    ['12 ft/min', 'speed', 0.06096, 'ft/min'],
    ['200 fpm', 'speed', 1.016, 'ft/min'],
    ['60 m/min', 'speed', 1, 'm/min'],
    ['25 %', 'ratio', 0.25, '%'],
    ['0.25', 'ratio', 0.25, ''],
    ['1/4', 'ratio', 0.25, ''],
    ['30 ft / 15 ft', 'ratio', 2, ''],
    ['250 kip-ft', 'moment', 250 * kip * 0.3048, 'kip ft'],
    ['250 ft-kips', 'moment', 250 * kip * 0.3048, 'kip ft'],
    ['250 k-ft', 'moment', 250 * kip * 0.3048, 'kip ft'],
    ['250 lb-ft', 'moment', 250 * pound * 0.3048, 'lbf ft'],
    ['340 kN·m', 'moment', 340000, 'kN m'],
    ['340 kN*m', 'moment', 340000, 'kN m'],
    ['340 kN.m', 'moment', 340000, 'kN m'],
    ['340 kNm', 'moment', 340000, 'kN m'],
    ['24.7 in²', 'area', 24.7 * 0.0254 ** 2, 'in2'],
    ['24.7 sq. in.', 'area', 24.7 * 0.0254 ** 2, 'in2'],
    ['2850 in^4', 'inertia', 2850 * 0.0254 ** 4, 'in4'],
    ['416×10⁶ mm⁴', 'inertia', 416e-6, 'mm4'],
    ['416 x 10^6 mm4', 'inertia', 416e-6, 'mm4'],
    ['84 lb/ft', 'lineMass', (84 * 0.45359237) / 0.3048, 'lb/ft'],
    ['85 lb/yd', 'lineMass', (85 * 0.45359237) / 0.9144, 'lb/yd'],
    ['2000 lb', 'mass', 907.18474, 'lb'],
  ])('%s as %s', (text, kind, value, unit) => {
    const read = readQuantity(text, kind)
    expect(read).toMatchObject({ ok: true, unit })
    expect(read.ok && Math.abs(read.value - value)).toBeLessThanOrEqual(4e-16 * Math.abs(value))
  })

  test.each<[text: string, kind: Wanted, value: number]>([
    ['3*7.5 m', 'distance', 22.5],
    ['3×7.5 m', 'distance', 22.5],
    ['3x7.5m', 'distance', 22.5],
    ['3 x 7.5 m', 'distance', 22.5],
    ['3·7.5 m', 'distance', 22.5],
    ['30 ft x 2', 'distance', 18.288],
    ['30 ft / 2', 'distance', 4.572],
    ['30/2 ft', 'distance', 4.572],
    ['(12 ft + 6 in)*2', 'distance', 7.62],
    ['12 ft + 6 in * 2', 'distance', 3.9624],
    ['12 ft - 6 in', 'distance', 3.5052],
    ['30 ft / (1 1/2)', 'distance', 6.096],
    ['(3 + 4) ft', 'distance', 2.1336],
    ['-(3 ft)', 'distance', -0.9144],
    ['2*(3 ft - -1 ft)', 'distance', 2.4384],
    ['60 kip-ft / 30 ft', 'force', 2 * kip],
    ['10 kip * 3 ft', 'moment', 30 * kip * 0.3048],
    ['60 kip / 30 ft', 'lineLoad', (2 * kip) / 0.3048],
    ['120 kg / 3 m', 'lineLoad', 392.266],
    ['25 % * 4 kip', 'force', kip],
    ['10 kip / (2 in * 5 in)', 'stress', kip / 0.0254 ** 2],
  ])('arithmetic: %s', (text, kind, value) => {
    const read = readQuantity(text, kind)
    expect(read.ok && Math.abs(read.value - value)).toBeLessThanOrEqual(1e-15 * Math.abs(value))
  })

  test('a bare number in a window takes the unit shown, a written unit wins', () => {
    for (const kind of KINDS) {
      for (const system of ['us', 'si'] satisfies UnitSystem[]) {
        const unit = shownUnit(kind, system)
        expect(readQuantity('12.5', kind, system)).toEqual({ ok: true, value: fromUnit(12.5, unit), unit })
        const other = `2 ${writeUnit(UNITS_OF[kind].at(-1) ?? '')}`
        expect(readQuantity(other, kind, system)).toEqual(readQuantity(other, kind))
      }
    }
    expect(readQuantity('5 7/32', 'length', 'us')).toMatchObject({ value: inches(5 + 7 / 32), unit: 'in' })
    expect(readQuantity('3*7.5', 'distance', 'si')).toMatchObject({ value: 22.5, unit: 'm' })
    expect(readQuantity('20', 'forceOrMass', 'us')).toMatchObject({ value: 20 * kip, unit: 'kip' })
    expect(readQuantity('1,250', 'distance', 'us')).toMatchObject({ value: 381, unit: 'ft' })
    expect(readQuantity('1,250', 'distance', 'si')).toMatchObject({ ok: false })
  })

  test('each kind takes its units and no others', () => {
    for (const kind of WANTED) {
      for (const unit of Object.keys(UNIT) as Unit[]) {
        const read = readQuantity(`2 ${writeUnit(unit)}`, kind)
        expect(`${kind} ${unit} ${read.ok}`).toBe(`${kind} ${unit} ${UNITS_OF[kind].includes(unit)}`)
        const weighed = kind === 'forceOrMass' || kind === 'force' || kind === 'lineLoad' ? WEIGHT_OF[unit] : undefined
        if (read.ok) expect(read.value).toBe(weighed === undefined ? fromUnit(2, unit) : 2 * weighed)
      }
    }
  })
})

describe('what cannot be read is refused', () => {
  test.each<[text: string | number, kind: Wanted, message: RegExp]>([
    ['', 'distance', /^an empty text says nothing; a length is wanted, such as 12 ft 6 in or 3\.81 m$/],
    ['   ', 'distance', /^an empty text/],
    ['30 kip', 'distance', /^“30 kip” is a force; a length is wanted, such as/],
    ['30 ft', 'force', /is a length; a force is wanted, such as 38\.1 kip or 170 kN/],
    ['5 t', 'force', /is a mass; a force is wanted/],
    ['5 kN', 'mass', /is a force; a mass is wanted/],
    ['0.6 kN/m', 'lineMass', /is a force per length; a mass per length is wanted/],
    ['25 %', 'force', /is a number without a unit; a force is wanted/],
    ['5 ft * 3 kg', 'force', /no kind that is used here/],
    ['30', 'distance', /“30” has no unit/],
    ['3*7.5', 'distance', /has no unit/],
    ['30 furlong', 'distance', /has the unit “furlong”, which is not known/],
    ['20 T', 'forceOrMass', /metric tonnes \(write t\) or US tons \(write ton\)/],
    ['20 mN', 'force', /“mN”/],
    ['20 Mm', 'distance', /“Mm”/],
    ['1,250 m', 'distance', /may mean 1250 m or 1\.25 m/],
    ['-1,250 kN', 'force', /may mean 1250 kN or 1\.25 kN/],
    ['1,250', 'ratio', /may mean 1250 or 1\.25:/],
    ['1,250 * 2 ft', 'distance', /comma that can be read both ways/],
    ['2 ft * 1,250', 'distance', /comma that can be read both ways/],
    ['1,25,000 m', 'distance', /points and commas make no number/],
    ['1.250.000 m', 'distance', /points and commas make no number/],
    ['3..5 m', 'distance', /points and commas make no number/],
    ['7, m', 'distance', /points and commas make no number/],
    ['1 250 kip', 'force', /“250 kip” after “1”/],
    ['3 ft 2 kip', 'distance', /“2 kip” after “3 ft”/],
    ['12.5 ft 6 in', 'distance', /not whole/],
    ['12\' - 6"', 'distance', /feet and inches or a difference/],
    ['12 ft -6 in', 'distance', /feet and inches or a difference/],
    ['5 9/8 in', 'length', /no whole number with a fraction/],
    ['7/8 7/8 in', 'length', /needs parentheses/],
    ['½ 7/8 in', 'length', /needs parentheses/],
    ['1/2×10⁶ N', 'force', /needs parentheses/],
    ['½x10^6 N', 'force', /needs parentheses/],
    ['½12 in', 'length', /“12 in” after “1\/2”/],
    ['10⁶0 N', 'force', /“0 N” after “10\^6”/],
    ['2 + 3 ft', 'distance', /a number that has no unit/],
    ['3 ft + 2 kip', 'distance', /different kinds/],
    ['3 ft / 0', 'distance', /divides by zero/],
    ['3/0 ft', 'distance', /divides by zero/],
    ['3 ft)', 'distance', /a closing parenthesis too many/],
    ['(3 ft', 'distance', /lacks a closing parenthesis/],
    ['3 ft *', 'distance', /ends where a number should follow/],
    ['0x10 ft', 'distance', /not a decimal number/],
    ['ft', 'distance', /does not begin with a number/],
    ['NaN', 'distance', /does not begin with a number/],
    ['Infinity m', 'distance', /does not begin with a number/],
    ['∞ m', 'distance', /has the sign “∞” \(U\+221E\)/],
    ['1e400 m', 'distance', /too large/],
    ['1e308\' 6"', 'distance', /too large/],
    ['1e308 kip', 'force', /too large/],
    ['1e300 m * 1e300', 'distance', /too large/],
    ['1e-400 m', 'distance', /too small/],
    ['1e-320 mm6', 'warping', /too small/],
    ['1e-200 m * 1e-200 m', 'area', /too small/],
    [NaN, 'distance', /^NaN is not a finite number; a length is wanted/],
    [Infinity, 'force', /^Infinity is not a finite number/],
    ['😀 3 m', 'distance', /has the sign “😀” \(U\+1F600\)/],
    ['٣ متر', 'distance', /has the sign U\+0663, which is no part of a quantity/],
    ['3 m\u202E', 'distance', /“3 m\\u\{202E\}” has the sign U\+202E/],
    ['3\u0000 m', 'distance', /U\+0000/],
    ['3 m; drop', 'distance', /“; drop” after “3 m”/],
    ['constructor', 'distance', /does not begin/],
    ['3 constructor', 'distance', /“constructor”, which is not known/],
    ['3 __proto__', 'distance', /not understood/],
    ['9'.repeat(201), 'ratio', /longer than the 200 signs/],
  ])('%s as %s', (text, kind, message) => {
    const read = readQuantity(text, kind)
    expect(read).toMatchObject({ ok: false })
    expect(!read.ok && read.message).toMatch(message)
  })

  test('any text at all: a finite value, or a message without control signs', () => {
    const pieces = [
      '1',
      '12',
      '6.5',
      '1,250',
      '7,5',
      '1e9',
      '1e308',
      '1e-308',
      '0',
      '7/8',
      ' ',
      '-',
      '+',
      '*',
      '/',
      '(',
      ')',
      'ft',
      'in',
      "'",
      '"',
    ]
    const units = [
      'kip',
      'kN',
      'm',
      'mm⁴',
      'lb/ft',
      '%',
      '×10⁶',
      '½',
      '\u2009',
      'x',
      '^',
      '.',
      ',',
      'e',
      '10^6',
      '·',
      'T',
      '😀',
    ]
    const text = fc.oneof(
      fc.string({ unit: 'binary', maxLength: 250 }),
      fc.string({ unit: 'grapheme' }),
      fc.array(fc.constantFrom(...pieces, ...units), { maxLength: 60 }).map((parts) => parts.join('')),
    )
    const system = fc.constantFrom(undefined, 'us', 'si')
    fc.assert(
      fc.property(text, fc.constantFrom(...WANTED), system, (written, kind, shown) => {
        const read = readQuantity(written, kind, shown)
        if (read.ok) {
          expect(Number.isFinite(read.value)).toBe(true)
          expect(UNITS_OF[kind].includes(read.unit)).toBe(true)
        } else {
          expect(read.message).toMatch(/^\P{C}+$/u)
        }
      }),
      { numRuns: 10_000 },
    )
  })

  test('the longest entries are read or refused at once', () => {
    const began = performance.now()
    for (const text of [
      '('.repeat(200),
      '-'.repeat(200),
      '1 ft '.repeat(40),
      'm '.repeat(100),
      '1/'.repeat(100),
      '1 m-'.repeat(50),
      `1 ${'m-'.repeat(99)}`,
    ]) {
      expect(readQuantity(text, 'distance').ok).toBe(false)
    }
    expect(performance.now() - began).toBeLessThan(500)
  })
})
