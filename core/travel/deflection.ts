/**
 * The greatest downward deflection of a simple girder anywhere, under wheels anywhere. The place of the greatest
 * deflection moves with the wheels, so this is no sum of influence ordinates: break points, then bracketed refinement.
 *
 * For a given position the deflection curve under downward loads is concave: one root of its slope, by a bracketed Newton
 * iteration. That root lies within 0.423 L and 0.577 L, where it does for every single load (a load at the very support
 * bends the girder most at L / sqrt 3), so also for their sum. As the wheels move, the greatest deflection
 * changes by the change at that station (the station's own movement adds nothing): the root of that derivative is bracketed
 * between the places where a wheel comes on or leaves, in PARTS parts each, and closed in on to 1e-12 of the span. Where
 * both ends of such an interval lie too far below what is known for the steepest rise, it is left out.
 */
import { EQUAL } from './passage.ts'

const PARTS = 12

export interface Deflected {
  readonly value: number
  readonly lead: number
  /** Distance of the place from the left support. */
  readonly at: number
}

/** Offsets ascending, forces not negative, lead from the left support; stiffness E I in N m2. */
export const greatestDeflection = (
  length: number,
  offsets: Float64Array,
  forces: Float64Array,
  stiffness: number,
): Deflected => {
  const curve = makeCurve(length, offsets, forces, stiffness)
  const events = Float64Array.from(
    [...offsets, ...offsets].map((offset, i) => (i < offsets.length ? 0 : length) - offset),
  ).sort()
  const values = events.map((lead) => curve(lead).value)
  const known = values.reduce((a, b) => Math.max(a, b), 0)
  let best: Deflected = { value: 0, lead: offsets.length > 0 ? events.at(-1)! + length : 0, at: length / 2 }
  const read = (lead: number): number => {
    const { value, change, at } = curve(lead)
    if (value > best.value + EQUAL * best.value) best = { value, lead, at }
    return change
  }
  for (let e = events.length - 2; e >= 0; e--) {
    const from = events[e]!
    const reach = events[e + 1]! - from
    if (!(reach > 1e-12 * length)) continue
    if ((values[e]! + values[e + 1]! + reach * steepest(from + reach / 2)) / 2 < known * (1 - EQUAL)) continue
    // Just within the interval, so that the wheels on the girder are those of the interval.
    let a = from + 1e-13 * length
    let rising = read(a) > 0
    for (let part = 1; part <= PARTS; part++) {
      const b = part === PARTS ? from + reach - 1e-13 * length : from + (reach * part) / PARTS
      const rises = read(b) > 0
      if (rising && !rises) read(closeIn(a, b, 1e-12 * length, (lead) => curve(lead).change))
      a = b
      rising = rises
    }
  }
  return best

  /** No deflection line is steeper than the greatest end slope under one load, L^2 / (9 sqrt 3 E I). */
  function steepest(lead: number): number {
    let force = 0
    for (let i = 0; i < offsets.length; i++)
      if (offsets[i]! + lead >= 0 && offsets[i]! + lead <= length) force += forces[i]!
    return (force * length * length) / (9 * Math.sqrt(3) * stiffness)
  }
}

/** Root of a function that is positive at a and not at b: Illinois steps, halving where they crawl. */
const closeIn = (a: number, b: number, width: number, f: (x: number) => number): number => {
  let [low, high] = [a, b]
  let [atLow, atHigh] = [f(a), f(b)]
  for (let step = 0; step < 100 && high - low > width; step++) {
    const secant = low + (atLow * (high - low)) / (atLow - atHigh)
    const x = step % 3 === 2 || !(secant > low && secant < high) ? (low + high) / 2 : secant
    const y = f(x)
    if (y > 0) {
      low = x
      atLow = y
      atHigh /= 2
    } else {
      high = x
      atHigh = y
      atLow /= 2
    }
    if (y === 0) return x
  }
  return (low + high) / 2
}

/** Greatest deflection at a lead, its place, and its change with the lead. */
const makeCurve = (L: number, offsets: Float64Array, forces: Float64Array, stiffness: number) => {
  const k = 1 / (6 * L * stiffness)
  const first = L * (1 - 1 / Math.sqrt(3))
  const last = L / Math.sqrt(3)
  let start = L / 2
  return (lead: number): { readonly value: number; readonly change: number; readonly at: number } => {
    let [low, high] = [first, last]
    let x = start
    for (let step = 0; step < 60; step++) {
      let slope = 0
      let bend = 0
      for (let i = 0; i < offsets.length; i++) {
        const p = offsets[i]! + lead
        if (p < 0 || p > L) continue
        const right = p >= x
        const c = right ? L - p : p
        const z = right ? x : L - x
        const w = forces[i]! * c
        slope += (right ? w : -w) * (L * L - c * c - 3 * z * z)
        bend -= 6 * w * z
      }
      if (bend === 0) break
      if (slope > 0) low = x
      else high = x
      const newton = x - slope / bend
      const next = newton >= low && newton <= high ? newton : (low + high) / 2
      const moved = Math.abs(next - x)
      x = next
      if (moved <= 1e-14 * L) break
    }
    start = x
    let value = 0
    let change = 0
    for (let i = 0; i < offsets.length; i++) {
      const p = offsets[i]! + lead
      if (p < 0 || p > L) continue
      const right = p >= x
      const c = right ? L - p : p
      const z = right ? x : L - x
      value += k * forces[i]! * c * z * (L * L - c * c - z * z)
      change += (right ? -k : k) * forces[i]! * z * (L * L - 3 * c * c - z * z)
    }
    return { value, change, at: x }
  }
}
