import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drive } from '../../core/travel/drive.ts'
import type { MomentTerm } from '../../core/travel/types.ts'
import { anyTrain, ends, lineLoad, m, march, on, plainSum, term, train, type Acting } from './trains.ts'

/** How the moment terms of one example are drawn: parts of the loads, of the span and of the greatest simple moment. */
const anyTerm = (worstOnly: boolean, pushing: boolean) =>
  fc.record({
    factor: fc.double({ min: 0.05, max: 2, noNaN: true }),
    at: worstOnly
      ? fc.constant('worst' as const)
      : fc.oneof(fc.constant('worst' as const), fc.double({ min: 0, max: 1, noNaN: true })),
    parts: fc.array(
      fc.oneof(
        { weight: 4, arbitrary: fc.double({ min: pushing ? -1 : 0, max: 1, noNaN: true }) },
        { weight: 1, arbitrary: fc.constant(0) },
      ),
      { minLength: 8, maxLength: 8 },
    ),
    uniform: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 30, noNaN: true })),
    ends: fc.oneof(
      fc.constant([0, 0] as const),
      fc.tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true })),
    ),
  })

/** Asks for the exact value and marches over positions. Returns both with the size of the addends. */
const bothWays = (
  example: { span: number; loads: number[]; spacings: number[] },
  drawn: readonly (ReturnType<typeof anyTerm> extends fc.Arbitrary<infer T> ? T : never)[],
  steps: number,
) => {
  const { span: L, loads, spacings } = example
  const asked = train(loads, spacings)
  const size = loads.reduce((a, b) => a + b, 0) * L
  const acting: Acting[] = drawn.map(({ factor, at, parts, uniform, ends: [left, right] }) => ({
    factor,
    at: at === 'worst' ? at : at * L,
    forces: loads.map((load, i) => load * parts[i]!),
    uniform,
    ends: [(left * size) / 8, (right * size) / 8],
  }))
  const terms = acting.map(({ factor, at, forces, uniform, ends: [left, right] }): MomentTerm =>
    term(forces, {
      factor,
      at: at === 'worst' ? at : m(at),
      uniform: lineLoad(uniform),
      ends: ends(left, right),
    }),
  )
  const exact = drive(on([L], asked), { kind: 'moments', terms })
  const length = asked.wheels.at(-1)!.offset
  const at =
    (mirrored: boolean, trisections?: number) =>
    (lead: number): number =>
      plainSum(
        L,
        asked.wheels.map(({ offset }) => (mirrored ? lead - offset : lead + offset)),
        acting,
        trisections,
      )
  const marched = Math.max(
    march(at(false, 5), at(false), 0 - length, L, steps),
    march(at(true, 5), at(true), 0, L + length, steps),
  )
  const scale = acting.reduce(
    (sum, t) => sum + Math.abs(t.factor) * (size + (t.uniform * L * L) / 8 + Math.abs(t.ends[0]) + Math.abs(t.ends[1])),
    0,
  )
  return { exact, marched, scale, again: at(exact.mirrored)(exact.lead) }
}

const check = ({ exact, marched, scale, again }: ReturnType<typeof bothWays>): void => {
  expect(exact.value).toBeGreaterThanOrEqual(marched - 1e-11 * scale)
  // Reached where it is said to be: not greater than the true maximum either.
  expect(Math.abs(exact.value - again)).toBeLessThanOrEqual(1e-10 * scale)
}

describe('the exact search against a march over positions', () => {
  it('one greatest moment, with uniform load and end moments', () => {
    fc.assert(
      fc.property(anyTrain(), anyTerm(true, false), (example, drawn) => check(bothWays(example, [drawn], 300))),
      { numRuns: 120 },
    )
  })

  it('sums of two greatest moments that weigh the wheels differently', () => {
    fc.assert(
      fc.property(anyTrain(2), anyTerm(true, false), anyTerm(true, false), (example, a, b) =>
        check(bothWays(example, [a, b], 300)),
      ),
      { numRuns: 100 },
    )
  })

  it('sums of up to four moments, some at fixed stations', () => {
    fc.assert(
      fc.property(anyTrain(), fc.array(anyTerm(false, false), { minLength: 1, maxLength: 4 }), (example, drawn) =>
        check(bothWays(example, drawn, 300)),
      ),
      { numRuns: 80 },
    )
  })

  it('wheel forces that push up as well as down', () => {
    fc.assert(
      fc.property(anyTrain(2), anyTerm(true, true), anyTerm(false, true), (example, a, b) =>
        check(bothWays(example, [a, b], 500)),
      ),
      { numRuns: 60 },
    )
  })
})
