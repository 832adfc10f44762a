import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { DIMENSIONS, as, type Kind, type UnitSystem } from '../../core/quantity/kinds.ts'
import { readQuantity } from '../../core/quantity/read.ts'
import { UNITS_OF } from '../../core/quantity/unit-names.ts'
import { writeExact, writeFeetInches, writeNumber, writeQuantity, writeUtilisation } from '../../core/quantity/write.ts'

const KINDS = Object.keys(DIMENSIONS) as Kind[]
const SYSTEMS: readonly UnitSystem[] = ['us', 'si']

describe('writeUtilisation', () => {
  test.each([
    [0, '0.000'],
    [0.95044, '0.950'],
    [0.9999, '1.000'],
    [1, '1.000'],
    [1.00001, '1.001'],
    [1.1903, '1.190'],
    [1.1906, '1.191'],
    [250.04, '250.0'],
  ])('%s is written %s', (value, text) => {
    expect(writeUtilisation(value)).toBe(text)
  })
})

describe('writeNumber', () => {
  test.each([
    [0, '0'],
    [-0, '0'],
    [38.1, '38.1'],
    [38.0998, '38.10'],
    [0.9, '0.9'],
    [30, '30'],
    [100, '100'],
    [9.99999, '10.00'],
    [999.96, '1,000'],
    [1234.5678, '1,235'],
    [12345.6, '12,346'],
    [1234567.8, '1,234,568'],
    [9999999.7, '1.000×10⁷'],
    [416231426, '4.162×10⁸'],
    [0.0001, '0.0001'],
    [0.000123456, '0.0001235'],
    [0.0000123456, '1.235×10⁻⁵'],
    [1e-300, '1×10⁻³⁰⁰'],
    [-38.0498, '−38.05'],
    [-12345, '−12,345'],
    [1e22, '1×10²²'],
    [Number.MAX_VALUE, '1.798×10³⁰⁸'],
    [Number.MIN_VALUE, '4.941×10⁻³²⁴'],
  ])('%d is %s', (value, text) => {
    expect(writeNumber(value)).toBe(text)
  })

  test('digits are the caller’s', () => {
    expect(writeNumber(Math.PI, 1)).toBe('3')
    expect(writeNumber(Math.PI, 8)).toBe('3.1415927')
    expect(writeNumber(0.5, 2)).toBe('0.5')
    expect(writeNumber(123.456, 2)).toBe('123')
  })

  test('what is not a finite number, or digits out of range, is a fault of the program', () => {
    for (const value of [NaN, Infinity, -Infinity]) expect(() => writeNumber(value)).toThrow(RangeError)
    for (const digits of [0, 16, 2.5, NaN]) expect(() => writeNumber(1, digits)).toThrow(RangeError)
  })

  test('is good to half its last digit and never shows a value as zero', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e300, max: 1e300 }), (value) => {
        const text = writeNumber(value)
        const read = readQuantity(text, 'ratio')
        if (!read.ok) {
          expect(text).toMatch(/^−?\d{1,3},\d{3}$/)
          expect(read.message).toContain('may mean')
        } else {
          expect(Math.abs(read.value - value)).toBeLessThanOrEqual(0.5001e-3 * Math.abs(value))
          expect(read.value === 0).toBe(value === 0)
        }
      }),
    )
  })
})

describe('writeQuantity', () => {
  test.each([
    ['force', 169477.24354142504, '38.1 kip', '169.5 kN'],
    ['distance', 9.144, '30 ft', '9.144 m'],
    ['length', 0.0254, '1 in', '25.4 mm'],
    ['moment', 1355817.9483314005, '1,000 kip-ft', '1,356 kN·m'],
    ['stress', 344737864.65841806, '50 ksi', '344.7 MPa'],
    ['area', 0.015935452, '24.7 in²', '15,935 mm²'],
    ['inertia', 0.00118625956296, '2,850 in⁴', '1.186×10⁹ mm⁴'],
    ['warping', 4.806792e-6, '17,900 in⁶', '4.807×10¹² mm⁶'],
    ['lineLoad', 14593.902937206365, '1 kip/ft', '14.59 kN/m'],
    ['lineMass', 125.00577, '84.00 lb/ft', '125.0 kg/m'],
    ['speed', 1.016, '200 ft/min', '60.96 m/min'],
    ['flexuralStiffness', 2.372e8, '8.265×10⁷ kip-in²', '237,200 kN·m²'],
    ['ratio', 0.9, '0.9', '0.9'],
  ] as const)('%s %d', (kind, value, us, si) => {
    expect(writeQuantity({ kind, value: as(kind, value) }, 'us')).toBe(us)
    expect(writeQuantity({ kind, value: as(kind, value) }, 'si')).toBe(si)
  })

  test('what is written is read back to its digits, or refused by name where its comma is ambiguous', () => {
    const size = fc.double({ noNaN: true, min: 1e-6, max: 1e9 })
    fc.assert(
      fc.property(
        fc.constantFrom(...KINDS),
        fc.constantFrom(...SYSTEMS),
        size,
        fc.boolean(),
        (kind, system, si, minus) => {
          const value = minus ? -si : si
          const text = writeQuantity({ kind, value: as(kind, value) }, system)
          const read = readQuantity(text, kind)
          if (read.ok) expect(Math.abs(read.value - value)).toBeLessThanOrEqual(0.5001e-3 * si)
          else expect(`${text} ${read.message}`).toMatch(/^−?\d{1,3},\d{3}( (mm|m|MPa|k[NPg]).*)? .*may mean/)
        },
      ),
    )
  })
})

describe('writeExact', () => {
  test.each([
    [9.144, 'ft', '30 ft'],
    [9.144, 'mm', '9144 mm'],
    [3.81, 'ft', '12.5 ft'],
    [0.07, '%', '7 %'],
    [0.25, '', '0.25'],
    [-0, 'kip', '0 kip'],
    [13558.179483314005, 'kip ft', '10 kip-ft'],
    [Number.MIN_VALUE, 'MPa', '5e-324 Pa'],
  ] as const)('%d in %s is %s', (si, unit, text) => {
    expect(writeExact(si, unit)).toBe(text)
  })

  test('reads back to the very same double, in every unit of every kind', () => {
    const pairs = KINDS.flatMap((kind) => UNITS_OF[kind].map((unit) => [kind, unit] as const))
    const plain = pairs.filter(
      ([kind, unit]) => !(kind === 'force' && unit === 'lb') && !(kind === 'lineLoad' && /[bg]\//.test(unit)),
    )
    fc.assert(
      fc.property(
        fc.constantFrom(...plain),
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        ([kind, unit], si) => {
          expect(readQuantity(writeExact(si, unit), kind)).toMatchObject({ ok: true, value: si + 0 })
        },
      ),
      { numRuns: 2000 },
    )
  })

  test('what is not finite is a fault of the program', () => {
    expect(() => writeExact(NaN, 'm')).toThrow(RangeError)
    expect(() => writeExact(Infinity, 'm')).toThrow(RangeError)
  })
})

describe('writeFeetInches', () => {
  test.each([
    [3.81, '12\' 6"'],
    [3.8227, '12\' 6 1/2"'],
    [1.04695625, '3\' 5 1/4"'],
    [0, '0\' 0"'],
    [-0.0001, '0\' 0"'],
    [-3.8227, '−12\' 6 1/2"'],
    [30.4799, '100\' 0"'],
    [0.3047, '1\' 0"'],
    [0.30321, '0\' 11 15/16"'],
  ])('%d m is %s', (metres, text) => {
    expect(writeFeetInches(metres)).toBe(text)
  })

  test('every 64th of an inch up to 20 ft, both ways', () => {
    for (let parts = 0; parts <= 20 * 12 * 64; parts++) {
      const metres = ((parts / 64) * 254) / 10000
      const read = readQuantity(writeFeetInches(metres, 64), 'distance')
      if (!read.ok || read.value !== metres)
        expect.fail(`${parts}/64 in: ${writeFeetInches(metres, 64)} ${JSON.stringify(read)}`)
    }
  })

  test('is good to half its fraction and never shows twelve inches', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.constantFrom(1, 2, 8, 16, 64),
        (metres, under) => {
          const text = writeFeetInches(metres, under)
          expect(text).not.toContain(' 12')
          const read = readQuantity(text, 'distance')
          expect(read.ok && Math.abs(read.value - metres)).toBeLessThanOrEqual((0.0254 * 0.5) / under + 1e-9)
        },
      ),
    )
  })

  test('other denominators and values without end are faults of the program', () => {
    for (const denominator of [0, 3, 10, -16, 256]) expect(() => writeFeetInches(1, denominator)).toThrow(RangeError)
    for (const metres of [NaN, Infinity, 1e300]) expect(() => writeFeetInches(metres)).toThrow(RangeError)
  })
})
