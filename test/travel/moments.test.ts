import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drive } from '../../core/travel/drive.ts'
import type { Drive, Extreme } from '../../core/travel/types.ts'
import { anyTrain, ends, lineLoad, m, on, plainMoment, term, train } from './trains.ts'

const worst = (asked: Drive, loads: readonly number[]): Extreme =>
  drive(asked, { kind: 'moments', terms: [term(loads)] })

describe('absolute maximum moment of a simple span', () => {
  it('two equal loads at a/L = 2 - sqrt 2: both branches give P L / 4', () => {
    const a = (2 - Math.SQRT2) * 10
    expect(worst(on([10], train([1, 1], [a])), [1, 1]).value).toBeCloseTo(2.5, 12)
    expect((10 - a / 2) ** 2 / 20).toBeCloseTo(2.5, 12)
  })

  it('two equal loads farther apart: one at midspan, the other off the span', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 100, noNaN: true }),
        fc.double({ min: 0.01, max: 3, noNaN: true }),
        (L, part) => {
          const a = part * L
          const { value, on: standing } = worst(on([L], train([1, 1], [a])), [1, 1])
          const closed = part < 2 - Math.SQRT2 ? (L - a / 2) ** 2 / (2 * L) : L / 4
          expect(Math.abs(value / closed - 1)).toBeLessThan(1e-12)
          if (part > 1) expect(standing).toHaveLength(1)
        },
      ),
    )
  })

  it('two unequal loads: the sum of both closed forms of the handbook', () => {
    // AISC Manual Table 3-23 (from memory): (P1 + P2) x^2 / L at x = (L - P2 a / (P1 + P2)) / 2, or P1 L / 4.
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 9, noNaN: true }),
        fc.double({ min: 0.1, max: 1, noNaN: true }),
        fc.double({ min: 0.01, max: 1.5, noNaN: true }),
        (P1, ratio, a) => {
          const P2 = ratio * P1
          const x = (1 - (P2 * a) / (P1 + P2)) / 2
          const both = x + a <= 1 ? (P1 + P2) * x * x : 0
          const { value } = worst(on([1], train([P1, P2], [a])), [P1, P2])
          expect(Math.abs(value / Math.max(both, P1 / 4) - 1)).toBeLessThan(1e-12)
        },
      ),
    )
  })

  it('lies between the heaviest wheel at midspan and all wheels there', () => {
    fc.assert(
      fc.property(anyTrain(), ({ span: L, loads, spacings }) => {
        const { value } = worst(on([L], train(loads, spacings)), loads)
        expect(value).toBeGreaterThanOrEqual((Math.max(...loads) * L) / 4 - 1e-12 * value)
        expect(value).toBeLessThanOrEqual((loads.reduce((a, b) => a + b) * L) / 4 + 1e-12 * value)
      }),
    )
  })

  it('wheels in one place act as one', () => {
    const { value } = worst(on([8], train([3, 5], [1e-12])), [3, 5])
    expect(value).toBeCloseTo(16, 9)
    expect(worst(on([8], train([3, 5], [0])), [3, 5]).value).toBe(16)
  })

  it('the mirror image of a train gives the same moment at the mirrored place', () => {
    fc.assert(
      fc.property(anyTrain(), ({ span: L, loads, spacings }) => {
        const uniform = lineLoad(3)
        const one = drive(on([L], train(loads, spacings, false)), {
          kind: 'moments',
          terms: [term(loads, { uniform })],
        })
        const mirrored = loads.toReversed()
        const other = drive(on([L], train(mirrored, spacings.toReversed(), false)), {
          kind: 'moments',
          terms: [term(mirrored, { uniform })],
        })
        expect(Math.abs(one.value - other.value)).toBeLessThanOrEqual(1e-12 * one.value)
      }),
    )
    const there = worst(on([10], train([40, 80], [3], false)), [40, 80])
    const back = worst(on([10], train([80, 40], [3], false)), [80, 40])
    expect(there.station + back.station).toBeCloseTo(10, 12)
    const either = worst(on([10], train([40, 80], [3])), [40, 80])
    expect(either.value).toBe(there.value)
    expect(either.mirrored).toBe(false)
  })

  it('may be driven mirrored only where both the train and the job allow it', () => {
    const only = train([10, 50], [1])
    const at = { kind: 'moments', terms: [term([10, 50], { at: m(2) })] } as const
    const listed = drive(on([10], only, 0, false), at)
    const either = drive(on([10], only), at)
    expect(listed.mirrored).toBe(false)
    expect(either.value).toBeGreaterThan(listed.value)
    expect(either.mirrored).toBe(true)
    expect(either.positions).toEqual([{ crane: 0, lead: either.lead, mirrored: true }])
    expect(drive(on([10], { ...only, mayMirror: false }), at)).toMatchObject({ value: listed.value, mirrored: false })
  })

  it('in a later span the stations run along the runway', () => {
    const alone = worst(on([15], train([125, 100, 50], [2, 3])), [125, 100, 50])
    const third = worst(on([9, 4, 15], train([125, 100, 50], [2, 3]), 2), [125, 100, 50])
    expect(third.value).toBeCloseTo(alone.value, 9)
    expect(third.station).toBeCloseTo(alone.station + 13, 9)
    expect(third.lead).toBeCloseTo(alone.lead + 13, 9)
    const fixed = drive(on([9, 4, 15], train([1], []), 2), { kind: 'moments', terms: [term([1], { at: m(13 + 5) })] })
    expect(fixed.value).toBeCloseTo((5 * 10) / 15, 12)
  })

  it('without wheels the dead load acts alone', () => {
    const asked = { ...on([10], train([1], [])), train: undefined }
    const found = drive(asked, { kind: 'moments', terms: [term([], { uniform: lineLoad(8), ends: ends(10, 10) })] })
    expect(found).toMatchObject({ value: 110, station: 5, train: undefined, positions: [], on: [] })
    // Wheels that push up are driven off the span: the dead load alone is worse.
    const up = drive(on([10], train([1], [])), { kind: 'moments', terms: [term([-1], { uniform: lineLoad(8) })] })
    expect(up.value).toBe(100)
  })

  it('reports a second moment at the section of the first', () => {
    const loads = [40, 80]
    const found = drive(on([10], train(loads, [3])), {
      kind: 'moments',
      terms: [term(loads), term([1, 0], { factor: 0, at: 'same' })],
    })
    expect(found.value).toBeCloseTo(243, 9)
    expect(found.terms[1]!.station).toBe(found.terms[0]!.station)
    const stations = [0, 3].map((offset) => (found.mirrored ? found.lead - offset : found.lead + offset))
    const acting = { factor: 1, at: 'worst', forces: [1, 0], uniform: 0, ends: [0, 0] } as const
    expect(found.terms[1]!.value).toBeCloseTo(plainMoment(10, stations, acting, found.station), 9)
  })

  it('gives the coincident shear at the section', () => {
    const found = worst(on([10], train([40, 80], [3], false)), [40, 80])
    // R_A = 66 kN; under the 80 kN wheel: 66 - 40 before it, 66 - 120 after it.
    expect(found.with.moment).toBeCloseTo(243, 9)
    expect(found.with.shear).toBeCloseTo(-54, 9)
  })
})

describe('long and odd trains', () => {
  it('a hundred wheels', () => {
    const loads = Array.from({ length: 100 }, (_, i) => 10 + (i % 7))
    const spacings = Array.from({ length: 99 }, (_, i) => 0.3 + (i % 5) * 0.2)
    for (const span of [0.1, 7, 100]) {
      const found = drive(on([span], train(loads, spacings)), {
        kind: 'moments',
        terms: [term(loads, { uniform: lineLoad(1) }), term(loads.map((load) => load % 3))],
      })
      expect(found.value).toBeGreaterThanOrEqual((16 * span) / 4)
      expect(Number.isFinite(found.value)).toBe(true)
    }
  })

  it('wheels farther apart than the runway act one by one', () => {
    const found = worst(on([5], train([10, 30, 20], [1e9, 1e9])), [10, 30, 20])
    expect(found.value).toBeCloseTo(37.5, 6)
    expect(found.on).toEqual([1])
  })

  it.each([1e-9, 1e9])('a span of %d m', (span) => {
    const found = worst(on([span], train([2, 2], [span / 10])), [2, 2])
    expect(found.value / span).toBeCloseTo(2 * 0.5 * 0.95 ** 2, 12)
  })
})

describe('refusals', () => {
  const asked = on([10], train([1, 2], [3]))
  it.each([
    ['another number of forces', { kind: 'moments', terms: [term([1])] } as const, '1 forces for 2 wheels'],
    [
      'a negative factor of a greatest moment',
      { kind: 'moments', terms: [term([1, 2], { factor: -1 })] } as const,
      /-1/,
    ],
    ['no term', { kind: 'moments', terms: [] } as const, 'first term'],
    ['a station off the span', { kind: 'moments', terms: [term([1, 2], { at: m(10.1) })] } as const, '10.1'],
    ['NaN', { kind: 'moments', terms: [term([1, NaN])] } as const, 'NaN'],
    ['uplift at a reaction', { kind: 'shear', wheels: [1, -2], uniform: lineLoad(0) } as const, '-2'],
    ['no such wheel', { kind: 'stand', wheel: 2, at: m(1), value: 1 } as const, 'wheel 2 of 2'],
    [
      'no such support',
      { kind: 'bracketReaction', support: 2, wheels: [1, 2], uniform: lineLoad(0) } as const,
      'support 2',
    ],
  ])('%s', (_, effect, message) => {
    expect(() => drive(asked, effect)).toThrow(message)
  })

  it('a span or a train that does not exist, or has no length', () => {
    const effect = { kind: 'moments', terms: [term([1, 2])] } as const
    expect(() => drive({ ...asked, span: 1 }, effect)).toThrow('span 1 of 1')
    expect(() => drive({ ...asked, train: 1 }, effect)).toThrow('train 1 of 1')
    for (const length of [0, -1, NaN, Infinity])
      expect(() => drive(on([length], train([1, 2], [3])), effect)).toThrow('span 0 has the length')
  })
})
