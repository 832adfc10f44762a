/**
 * The greatest and least effect of wheels that pass an influence line, for one fixed station. The sum over the wheels is a
 * piecewise cubic in the lead: it can only be extreme where a wheel meets a break of the line, read from both sides
 * since the line may jump there, or at a root of the derivative, a quadratic, between two such places. Exact, any weights.
 */
import type { Influence } from './influence.ts'

export interface Passed {
  readonly value: number
  /** Station of the train's reference point. */
  readonly lead: number
}

/**
 * Extremes of the sum of weights[i] times the line at lead + offsets[i] over every lead, the train off the line (0) included.
 * Of equal extremes the one with the greatest lead. Offsets in m, ascending.
 */
export const passLine = (
  line: Influence,
  offsets: Float64Array,
  weights: Float64Array,
): { readonly max: Passed; readonly min: Passed } => {
  const { breaks, polynomials } = line
  const count = offsets.length
  const events = new Float64Array(count * breaks.length)
  for (let i = 0, e = 0; i < count; i++) for (const at of breaks) events[e++] = at - offsets[i]!
  events.sort()

  // Off the line, clear of it by its own length: a place that nobody can take for a wheel at its end.
  const off = { value: 0, lead: events.length > 0 ? events.at(-1)! + breaks.at(-1)! - breaks[0]! : 0 }
  let max: Passed = off
  let min: Passed = off
  const read = (value: number, lead: number): void => {
    if (value > max.value + EQUAL * Math.abs(max.value)) max = { value, lead }
    if (value < min.value - EQUAL * Math.abs(min.value)) min = { value, lead }
  }

  for (let e = events.length - 2; e >= 0; e--) {
    const from = events[e]!
    const reach = events[e + 1]! - from
    if (!(reach > SAME * (Math.abs(from) + Math.abs(breaks.at(-1)!)))) continue
    let a = 0
    let b = 0
    let c = 0
    let d = 0
    for (let i = 0; i < count; i++) {
      const middle = from + reach / 2 + offsets[i]!
      let piece = -1
      while (piece + 1 < breaks.length && breaks[piece + 1]! <= middle) piece++
      const cubic = polynomials[piece]
      if (cubic === undefined) continue
      const w = weights[i]!
      const t = from + offsets[i]! - breaks[piece]!
      a += w * (cubic[0] + t * (cubic[1] + t * (cubic[2] + t * cubic[3])))
      b += w * (cubic[1] + t * (2 * cubic[2] + t * 3 * cubic[3]))
      c += w * (cubic[2] + 3 * t * cubic[3])
      d += w * cubic[3]
    }
    const at = (t: number): number => a + t * (b + t * (c + t * d))
    read(at(reach), from + reach)
    if (c !== 0 || d !== 0)
      for (const root of quadraticRoots(3 * d, 2 * c, b)) if (root > 0 && root < reach) read(at(root), from + root)
    read(a, from)
  }
  return { max, min }
}

/** Two places nearer than this part of their distance from the first support are one: a wheel never meets both half-way. */
const SAME = 1e-14

/** Values nearer than this part are equal: of mirror images the first stays, whatever the rounding. */
export const EQUAL = 1e-13

/** Real roots of a t^2 + b t + c, descending, without cancellation. */
const quadraticRoots = (a: number, b: number, c: number): readonly number[] => {
  if (a === 0) return b === 0 ? [] : [-c / b]
  const root = b * b - 4 * a * c
  if (root < 0) return []
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(root)) / 2
  const pair = q === 0 ? [0] : [q / a, c / q]
  return pair.sort((x, y) => y - x)
}
