/** Two cranes on one rail: what free gaps can do, against what contact does. */
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Wheel, WheelTrain } from '../../core/crane/types.ts'
import type { Newton } from '../../core/quantity/kinds.ts'
import { drive } from '../../core/travel/drive.ts'
import type { Effect, Extreme, MomentTerm } from '../../core/travel/types.ts'
import { ends, lineLoad, m, plainSum, term, type Acting } from './trains.ts'

interface Crane {
  readonly loads: readonly number[]
  readonly offsets: readonly number[]
}

const anyCrane: fc.Arbitrary<Crane> = fc.integer({ min: 1, max: 4 }).chain((n) =>
  fc.record({
    loads: fc.array(fc.double({ min: 1, max: 200, noNaN: true }), { minLength: n, maxLength: n }),
    offsets: fc
      .array(fc.double({ min: 0.3, max: 5, noNaN: true }), { minLength: n - 1, maxLength: n - 1 })
      .map((spacings) => [0, ...spacings.map((_, i) => spacings.slice(0, i + 1).reduce((a, b) => a + b, 0))]),
  }),
)

const wheelsOf = ({ loads, offsets }: Crane, crane: number, start: number): Wheel[] =>
  loads.map((load, wheel) => ({ crane, wheel, offset: m(start + offsets[wheel]!), load: load as Newton }))

const rigid = (cranes: readonly number[], wheels: readonly Wheel[]): WheelTrain => ({
  cranes,
  turned: cranes.map(() => false),
  wheels,
  mayMirror: false,
})

/** Both cranes alone and in contact; forces of a term are given for all wheels, the left crane's first. */
const worstOfThree = (
  L: number,
  [a, b]: readonly [Crane, Crane],
  gap: number,
  effect: (forces: (all: readonly number[]) => number[]) => Effect,
): Extreme => {
  const n = a.loads.length
  const start = a.offsets.at(-1)! + gap
  const trains = [
    rigid([0], wheelsOf(a, 0, 0)),
    rigid([1], wheelsOf(b, 1, 0)),
    rigid([0, 1], [...wheelsOf(a, 0, 0), ...wheelsOf(b, 1, start)]),
  ]
  const parts = [
    (all: readonly number[]) => all.slice(0, n),
    (all: readonly number[]) => all.slice(n),
    (all: readonly number[]) => [...all],
  ]
  return trains
    .map((_, train) =>
      drive(
        { beam: { continuity: 'simple', spans: [m(L)] }, span: 0, trains, train, eitherWay: true },
        effect(parts[train]!),
      ),
    )
    .reduce((x, y) => (y.value > x.value ? y : x))
}

/** Best of many positions of both cranes with any gap from the least upwards, then of small moves about the best. */
const marchBoth = (L: number, [a, b]: readonly [Crane, Crane], gap: number, terms: readonly Acting[]): number => {
  const at = (left: number, right: number): number =>
    plainSum(L, [...a.offsets.map((o) => left + o), ...b.offsets.map((o) => right + o)], terms, 12)
  const [lengthA, lengthB] = [a.offsets.at(-1)!, b.offsets.at(-1)!]
  const N = 24
  let best = { value: -Infinity, left: 0, right: 0 }
  const read = (left: number, right: number): void => {
    if (right - left < lengthA + gap) return
    const value = at(left, right)
    if (value > best.value) best = { value, left, right }
  }
  for (let i = 0; i <= N; i++)
    for (let k = 0; k <= N; k++) read(-lengthA + ((L + lengthA) * i) / N, -lengthB + ((L + lengthB) * k) / N)
  for (let half = (L + Math.max(lengthA, lengthB)) / N; half > 1e-4 * L; half /= 2) {
    const { left, right } = best
    for (let i = -2; i <= 2; i++) for (let k = -2; k <= 2; k++) read(left + (half * i) / 2, right + (half * k) / 2)
  }
  return best.value
}

const pair = fc.tuple(anyCrane, anyCrane)
const parts = fc.array(
  fc.oneof(
    { weight: 3, arbitrary: fc.double({ min: 0.01, max: 1, noNaN: true }) },
    { weight: 1, arbitrary: fc.constant(0) },
  ),
  { minLength: 8, maxLength: 8 },
)

const forcesOf = (cranes: readonly [Crane, Crane], part: readonly number[]): number[] =>
  cranes.flatMap(({ loads }) => loads).map((load, i) => load * part[i]!)

const acting = (forces: readonly number[], more: Partial<Acting> = {}): Acting => ({
  factor: 1,
  at: 'worst',
  forces,
  uniform: 0,
  ends: [0, 0],
  ...more,
})

const asked = ({ factor, at, forces, uniform, ends: [left, right] }: Acting): MomentTerm =>
  term(forces, { factor, at: at === 'worst' ? at : m(at), uniform: lineLoad(uniform), ends: ends(left, right) })

const spans = fc.double({ min: 2, max: 20, noNaN: true })
const gaps = fc.double({ min: 0.1, max: 3, noNaN: true })

describe('free gaps between two cranes', () => {
  it('never make two greatest moments worse than contact or one crane alone', () => {
    fc.assert(
      fc.property(
        spans,
        gaps,
        pair,
        parts,
        parts,
        fc.double({ min: 0, max: 20, noNaN: true }),
        (L, gap, cranes, a, b, q) => {
          const terms = [acting(forcesOf(cranes, a), { uniform: q }), acting(forcesOf(cranes, b), { factor: 0.7 })]
          const exact = worstOfThree(L, cranes, gap, (forces) => ({
            kind: 'moments',
            terms: terms.map((one) => ({ ...asked(one), wheels: forces(one.forces) })),
          }))
          expect(exact.method).toBe('exact')
          expect(marchBoth(L, cranes, gap, terms)).toBeLessThanOrEqual(exact.value * (1 + 1e-12))
        },
      ),
      { numRuns: 60 },
    )
  })

  it('nor with the quarter points of a bending diagram among the terms, or end moments of the size a crane makes', () => {
    fc.assert(
      fc.property(spans, gaps, pair, parts, (L, gap, cranes, part) => {
        const vertical = cranes.flatMap(({ loads }) => loads)
        const end = 0.9 * Math.min(...vertical) * gap
        const terms = [
          acting(vertical, { factor: 2.5, ends: [end, 0] }),
          acting(vertical, { factor: 3, at: L / 4, ends: [end, 0] }),
          acting(vertical, { factor: 4, at: L / 2, ends: [end, 0] }),
          acting(vertical, { factor: 3, at: (3 * L) / 4, ends: [end, 0] }),
          acting(forcesOf(cranes, part), { factor: 5 }),
        ]
        const exact = worstOfThree(L, cranes, gap, (forces) => ({
          kind: 'moments',
          terms: terms.map((one) => ({ ...asked(one), wheels: forces(one.forces) })),
        }))
        expect(exact.method).toBe('exact')
        expect(marchBoth(L, cranes, gap, terms)).toBeLessThanOrEqual(exact.value * (1 + 1e-12))
      }),
      { numRuns: 40 },
    )
  })

  it('do so where two fixed stations ask for one crane each: then the cranes stand apart', () => {
    const one: Crane = { loads: [10], offsets: [0] }
    const terms = [acting([10, 0], { at: 2 }), acting([0, 10], { at: 8 })]
    const worst = worstOfThree(10, [one, one], 1, (forces) => ({
      kind: 'moments',
      terms: terms.map((t) => ({ ...asked(t), wheels: forces(t.forces) })),
    }))
    expect(worst.value).toBeCloseTo(32, 9)
    expect(worst.method).toBe('refined')
    expect(worst.positions).toEqual([
      { crane: 0, lead: 2, mirrored: false },
      { crane: 1, lead: 8, mirrored: false },
    ])
    expect(worst.on).toEqual([0, 1])
  })

  it('and where great end moments pull at one term only', () => {
    const one: Crane = { loads: [10], offsets: [0] }
    const terms = [acting([10, 0], { ends: [80, 0] }), acting([0, 10])]
    const worst = worstOfThree(10, [one, one], 1, (forces) => ({
      kind: 'moments',
      terms: terms.map((t) => ({ ...asked(t), wheels: forces(t.forces) })),
    }))
    // First term: 80 (1 - x/10) + x (10 - x), greatest at x = 1: 81. Second: 25 at midspan.
    expect(worst.value).toBeCloseTo(106, 6)
    expect(worst.positions[0]!.lead).toBeCloseTo(1, 6)
    expect(worst.positions[1]!.lead).toBeCloseTo(5, 6)
  })

  it('whatever the terms: no position of both cranes is worse than the one reported', () => {
    const anyTerm = fc.record({
      at: fc.oneof(fc.constant('worst' as const), fc.double({ min: 0, max: 1, noNaN: true })),
      parts,
      left: fc.double({ min: -1, max: 1, noNaN: true }),
      right: fc.double({ min: -1, max: 1, noNaN: true }),
    })
    fc.assert(
      fc.property(spans, gaps, pair, fc.array(anyTerm, { minLength: 2, maxLength: 3 }), (L, gap, cranes, drawn) => {
        const size = cranes.flatMap(({ loads }) => loads).reduce((a, b) => a + b) * L
        const terms = drawn.map(({ at, parts: part, left, right }) =>
          acting(forcesOf(cranes, part), {
            at: at === 'worst' ? at : at * L,
            ends: [left * size, right * size],
          }),
        )
        const exact = worstOfThree(L, cranes, gap, (forces) => ({
          kind: 'moments',
          terms: terms.map((one) => ({ ...asked(one), wheels: forces(one.forces) })),
        }))
        expect(marchBoth(L, cranes, gap, terms)).toBeLessThanOrEqual(exact.value + 1e-9 * size)
      }),
      { numRuns: 60 },
    )
  })

  it('a turned crane counts its wheels from its own first one', () => {
    const wheels: Wheel[] = [
      ...wheelsOf({ loads: [1, 2], offsets: [0, 3] }, 4, 0),
      { crane: 5, wheel: 1, offset: m(5), load: 4 as Newton },
      { crane: 5, wheel: 0, offset: m(7), load: 3 as Newton },
    ]
    const both: WheelTrain = { cranes: [4, 5], turned: [false, true], wheels, mayMirror: false }
    const worst = drive(
      { beam: { continuity: 'simple', spans: [m(20)] }, span: 0, trains: [both], train: 0, eitherWay: true },
      { kind: 'moments', terms: [term([1, 2, 4, 3])] },
    )
    expect(worst.positions).toEqual([
      { crane: 4, lead: worst.lead, mirrored: false },
      { crane: 5, lead: worst.lead + 7, mirrored: true },
    ])
  })
})
