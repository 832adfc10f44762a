import { describe, expect, test } from 'vitest'
import { DIMENSIONS, type Kind } from '../../core/quantity/kinds.ts'
import { SI_UNIT, UNITS_OF } from '../../core/quantity/unit-names.ts'
import { SHOWN, UNIT, fromUnit, inUnit, type Unit } from '../../core/quantity/units.ts'

// NIST Special Publication 811 (2008), appendix B.8: factors as printed there, each good to half its last digit.
const NIST: readonly (readonly [unit: Unit, factor: number, halfDigit: number])[] = [
  ['in', 2.54e-2, 0],
  ['ft', 3.048e-1, 0],
  ['yd', 9.144e-1, 0],
  ['in2', 6.4516e-4, 0],
  ['in3', 1.638706e-5, 5e-12],
  ['in4', 4.162314e-7, 5e-14],
  ['lb', 4.535924e-1, 5e-8],
  ['ton', 9.071847e2, 5e-5],
  ['lb/ft', 1.488164, 5e-7],
  ['lb/yd', 4.960546e-1, 5e-8],
  ['kgf', 9.80665, 0],
  ['lbf', 4.448222, 5e-7],
  ['kip', 4.448222e3, 5e-4],
  ['lbf ft', 1.355818, 5e-7],
  ['lbf in', 1.129848e-1, 5e-8],
  ['lbf/ft', 1.45939e1, 5e-6],
  ['lbf/in', 1.751268e2, 5e-5],
  ['psi', 6.894757e3, 5e-4],
  ['ksi', 6.894757e6, 5e-1],
  ['ft/min', 5.08e-3, 0],
  ['ft/s', 3.048e-1, 0],
]

describe('units', () => {
  test.each(NIST)('%s is %d in SI, as NIST SP 811 prints it', (unit, factor, halfDigit) => {
    expect(Math.abs(UNIT[unit] - factor)).toBeLessThanOrEqual(halfDigit + 4e-16 * factor)
  })

  test('whole quotients are exact where a product would not be', () => {
    expect(fromUnit(3, 'ft')).toBe(0.9144)
    expect(fromUnit(7, '%')).toBe(0.07)
    expect(fromUnit(9144, 'mm')).toBe(9.144)
    expect(inUnit(9.144, 'mm')).toBe(9144)
    expect(inUnit(9.144, 'ft')).toBe(30)
  })

  test('every unit belongs to a kind, and every kind takes the units it is shown in', () => {
    const taken = new Set<Unit>(Object.values(UNITS_OF).flat())
    expect((Object.keys(UNIT) as Unit[]).filter((unit) => !taken.has(unit))).toEqual([])
    for (const kind of Object.keys(DIMENSIONS) as Kind[]) {
      const { us, si, coherent } = SHOWN[kind]
      expect(UNITS_OF[kind]).toEqual(expect.arrayContaining([us, si, coherent.us, coherent.si, SI_UNIT[kind]]))
      expect(UNIT[SI_UNIT[kind]]).toBe(1)
    }
  })
})
