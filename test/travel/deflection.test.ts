import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { NewtonSquareMetre } from '../../core/quantity/kinds.ts'
import { deflectionLine } from '../../core/travel/influence.ts'
import { passLine } from '../../core/travel/passage.ts'
import { drive } from '../../core/travel/drive.ts'
import { anyTrain, m, march, on, train } from './trains.ts'

const EI = 7
const worst = (L: number, loads: readonly number[], spacings: readonly number[]) =>
  drive(on([L], train(loads, spacings)), {
    kind: 'deflection',
    wheels: loads,
    stiffness: EI as NewtonSquareMetre,
  })

/** Deflection at x by the unit-load theorem: the integral of M m / E I, exact by Simpson between the kinks of both diagrams. */
const plainDeflection = (L: number, loads: readonly number[], stations: readonly number[], x: number): number => {
  const kinks = [0, x, ...stations.filter((p) => p > 0 && p < L), L].sort((a, b) => a - b)
  const M = (at: number): number =>
    stations.reduce(
      (sum, p, i) => sum + (p < 0 || p > L ? 0 : (loads[i]! * Math.min(p, at) * (L - Math.max(p, at))) / L),
      0,
    )
  const unit = (at: number): number => (Math.min(x, at) * (L - Math.max(x, at))) / L
  return (
    kinks.slice(1).reduce((sum, b, k) => {
      const a = kinks[k]!
      const c = (a + b) / 2
      return sum + ((b - a) / 6) * (M(a) * unit(a) + 4 * M(c) * unit(c) + M(b) * unit(b))
    }, 0) / EI
  )
}

describe('greatest deflection anywhere', () => {
  it('one load: P L^3 / 48 E I at midspan', () => {
    const found = worst(6, [3], [])
    expect(found.value).toBeCloseTo((3 * 216) / (48 * EI), 12)
    expect(found.station).toBeCloseTo(3, 8)
    expect(found.lead).toBeCloseTo(3, 6)
  })

  // Two equal loads b from either support, P b (3 L^2 - 4 b^2) / (24 E I) each pair: F. Carrasco, worked notes on a runway
  // girder, part 8. The centred pair governs to a = 0.653 L, beyond it one wheel at midspan alone.
  it('two equal loads: the centred pair, or one wheel, about 0.653 L apart', () => {
    const pair = (a: number): number => (((1 - a) / 2) * (3 - (1 - a) ** 2)) / (24 * EI)
    for (const a of [0.05, 0.3, 0.5, 0.6, 0.65, 0.652]) expect(worst(1, [1, 1], [a]).value / pair(a)).toBeCloseTo(1, 11)
    for (const a of [0.655, 0.7, 0.9, 1.3]) expect(worst(1, [1, 1], [a]).value * 48 * EI).toBeCloseTo(1, 11)
  })

  it('against a march over positions and stations', () => {
    fc.assert(
      fc.property(anyTrain(), ({ span: L, loads, spacings }) => {
        const found = worst(L, loads, spacings)
        const offsets = loads.map((_, i) => spacings.slice(0, i).reduce((a, b) => a + b, 0))
        const standing = (lead: number, mirrored: boolean): number[] =>
          offsets.map((offset) => (mirrored ? lead - offset : lead + offset))
        const best = (mirrored: boolean, grid: number) => (lead: number) => {
          const stations = standing(lead, mirrored)
          let value = 0
          for (let k = 0; k <= grid; k++)
            value = Math.max(value, plainDeflection(L, loads, stations, L * (0.4 + (0.2 * k) / grid)))
          return value
        }
        for (const mirrored of [false, true]) {
          const [from, to] = mirrored ? [0, L + offsets.at(-1)!] : [-offsets.at(-1)!, L]
          const marched = march(best(mirrored, 1), best(mirrored, 10), from, to, 100)
          expect(found.value).toBeGreaterThanOrEqual(marched * (1 - 1e-9))
        }
        const again = plainDeflection(L, loads, standing(found.lead, found.mirrored), found.station)
        expect(Math.abs(found.value / again - 1)).toBeLessThan(1e-9)
      }),
      { numRuns: 40 },
    )
  })

  it('is never less than the exact maximum at any one station', () => {
    fc.assert(
      fc.property(anyTrain(), fc.double({ min: 0.4, max: 0.6, noNaN: true }), ({ span: L, loads, spacings }, part) => {
        const offsets = Float64Array.from(loads, (_, i) => spacings.slice(0, i).reduce((a, b) => a + b, 0))
        const line = deflectionLine({ continuity: 'simple', spans: [m(L)] }, 0, part * L, EI)
        const there = passLine(line, offsets, Float64Array.from(loads))
        expect(worst(L, loads, spacings).value).toBeGreaterThanOrEqual(there.max.value * (1 - 1e-9))
      }),
      { numRuns: 1000 },
    )
  })
})
