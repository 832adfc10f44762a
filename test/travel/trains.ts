/** Trains for the tests, and the second method: plain sums at many positions. Knows nothing of core/travel's search. */
import * as fc from 'fast-check'
import type { WheelTrain } from '../../core/crane/types.ts'
import type { Metre, Newton, NewtonMetre, NewtonPerMetre } from '../../core/quantity/kinds.ts'
import type { Drive, MomentTerm } from '../../core/travel/types.ts'

export const m = (value: number): Metre => value as Metre
export const lineLoad = (value: number): NewtonPerMetre => value as NewtonPerMetre
export const ends = (left: number, right: number): MomentTerm['ends'] => [left as NewtonMetre, right as NewtonMetre]

/** One crane; spacings in m. */
export const train = (loads: readonly number[], spacings: readonly number[], mayMirror = true): WheelTrain => ({
  cranes: [0],
  turned: [false],
  wheels: loads.map((load, wheel) => ({
    crane: 0,
    wheel,
    offset: m(spacings.slice(0, wheel).reduce((a, b) => a + b, 0)),
    load: load as Newton,
  })),
  mayMirror,
})

export const on = (spans: readonly number[], only: WheelTrain, span = 0, eitherWay = true): Drive => ({
  beam: { continuity: 'simple', spans: spans.map(m) },
  span,
  trains: [only],
  train: 0,
  eitherWay,
})

export const term = (wheels: readonly number[], more: Partial<MomentTerm> = {}): MomentTerm => ({
  factor: 1,
  at: 'worst',
  wheels,
  uniform: lineLoad(0),
  ends: ends(0, 0),
  ...more,
})

/** 1 to 8 wheels, now and then two in one place, on a span of 2 to 30 m. */
export const anyTrain = (least = 1): fc.Arbitrary<{ span: number; loads: number[]; spacings: number[] }> =>
  fc.integer({ min: least, max: 8 }).chain((n) =>
    fc.record({
      span: fc.double({ min: 2, max: 30, noNaN: true }),
      loads: fc.array(fc.double({ min: 1, max: 400, noNaN: true }), { minLength: n, maxLength: n }),
      spacings: fc.array(
        fc.oneof(
          { weight: 9, arbitrary: fc.double({ min: 0.2, max: 6, noNaN: true }) },
          { weight: 1, arbitrary: fc.constantFrom(1e-9, 1e-14) },
        ),
        { minLength: n - 1, maxLength: n - 1 },
      ),
    }),
  )

export interface Acting {
  readonly factor: number
  readonly at: number | 'worst'
  readonly forces: readonly number[]
  readonly uniform: number
  readonly ends: readonly [number, number]
}

/** Moment at x of a simple girder, load by load. */
export const plainMoment = (L: number, stations: readonly number[], acting: Acting, x: number): number => {
  let M = acting.ends[0] * (1 - x / L) + (acting.ends[1] * x) / L + (acting.uniform * x * (L - x)) / 2
  for (const [i, p] of stations.entries()) {
    if (p < 0 || p > L) continue
    M += acting.forces[i]! * (x <= p ? (x * (L - p)) / L : (p * (L - x)) / L)
  }
  return M
}

/** Greatest moment anywhere: at the wheels and supports, and by trisection between each two of them. */
const plainWorst = (L: number, stations: readonly number[], acting: Acting, steps: number): number => {
  const places = [0, ...stations.filter((p) => p > 0 && p < L), L].sort((a, b) => a - b)
  const at = (x: number): number => plainMoment(L, stations, acting, x)
  let best = -Infinity
  for (const [i, x] of places.entries()) {
    best = Math.max(best, at(x))
    const next = places[i + 1]
    if (acting.uniform <= 0 || next === undefined) continue
    let [a, b] = [x, next]
    for (let k = 0; k < steps; k++) {
      const [c, d] = [a + (b - a) / 3, b - (b - a) / 3]
      if (at(c) < at(d)) a = c
      else b = d
    }
    best = Math.max(best, at((a + b) / 2))
  }
  return best
}

export const plainSum = (L: number, stations: readonly number[], terms: readonly Acting[], steps = 45): number =>
  terms.reduce((sum, t) => {
    return sum + t.factor * (t.at === 'worst' ? plainWorst(L, stations, t, steps) : plainMoment(L, stations, t, t.at))
  }, 0)

/**
 * March of a function of the lead from `from` to `to`, by a coarse reading of it, then closer and closer about the best
 * places by a fine one. What it finds is reached at a real position, so it is a lower bound of the true maximum.
 */
export const march = (
  coarse: (lead: number) => number,
  fine: (lead: number) => number,
  from: number,
  to: number,
  steps: number,
): number => {
  const step = (to - from) / steps
  const found = Array.from({ length: steps + 1 }, (_, k) => ({
    lead: from + k * step,
    value: coarse(from + k * step),
  }))
  const peaks = found
    .filter(
      ({ value }, k) => value >= (found[k - 1]?.value ?? -Infinity) && value >= (found[k + 1]?.value ?? -Infinity),
    )
    .sort((a, b) => b.value - a.value)
    .slice(0, 3)
  return Math.max(
    ...peaks.map(({ lead }) => {
      let best = { lead, value: fine(lead) }
      for (let half = step; half > 1e-9 * (to - from); half /= 5) {
        const centre = best.lead
        for (let k = -6; k <= 6; k++) {
          const next = centre + (k * half) / 6
          const value = fine(next)
          if (value > best.value) best = { lead: next, value }
        }
      }
      return best.value
    }),
  )
}
