/**
 * The worst position of moving wheels for a sum of moments in one simple girder: each term at its own station, fixed or
 * wherever it is greatest at that position. Exact.
 *
 * Why this is exact. Let s be the lead. Between two places where a wheel meets a support or a fixed station, the same wheels
 * stand on the girder and the moment at a fixed station is linear in s. A greatest moment keeps its crest (crest.ts)
 * between two places where the shear beside a wheel or at a support is zero, and these are linear equations in s; with one
 * crest per term the sum is one quadratic in s there, greatest at an end or at its vertex. Where forces push up, a term
 * has several crests: the sum of maxima is then the greatest of the sums over every choice of crests, and a place where two
 * choices are equal bends the wrong way to be a maximum, so the vertices of all choices are enough.
 * Every candidate is evaluated as it is, so none can be reported greater than it is.
 *
 * No moment changes faster with s than the moving wheels on the girder weigh together (an influence line is nowhere steeper
 * than 1), so an interval whose ends lie too far below what is already known is left out.
 */
import { crestChanges, makeCrests, readCrests, type Crests, type Row, type TermLoads } from './crest.ts'
import { EQUAL } from './passage.ts'

/** A term with its place: a fixed station from the left support, or undefined for the greatest anywhere. */
export interface SweepTerm extends TermLoads {
  readonly at: number | undefined
}

export interface Swept {
  readonly value: number
  readonly lead: number
}

/** The greatest sum for a lead within [low, high]; of equal ones the greatest lead. */
export const sweep = (row: Row, terms: readonly SweepTerm[], low = -Infinity, high = Infinity): Swept => {
  const events = eventsOf(row, terms, low, high)
  const work = new Float64Array(terms.length * (2 * row.offsets.length + 2) + 2)
  const crests = terms.map(() => makeCrests(row.offsets.length))
  const values = events.map((s) => valueAt(row, terms, s, crests))
  const known = values.reduce((a, b) => Math.max(a, b))
  let lead = events.at(-1)!
  let value = values.at(-1)!
  const keep = (s: number, sum: number): void => {
    if (!(sum > value + EQUAL * Math.abs(value))) return
    value = sum
    lead = s
  }
  const read = (s: number): void => {
    keep(s, valueAt(row, terms, s, crests))
  }

  for (let e = events.length - 2; e >= 0; e--) {
    const from = events[e]!
    const to = events[e + 1]!
    const rise = ((to - from) * steepest(row, terms, (from + to) / 2)) / 2
    if (to > from && (values[e]! + values[e + 1]!) / 2 + rise >= known - EQUAL * Math.abs(known)) {
      work[0] = from
      let count = 1
      for (const term of terms) if (term.at === undefined) count = crestChanges(row, term, from, to, work, count)
      work[count++] = to
      insertionSort(work, count)
      for (let k = count - 2; k >= 0; k--) {
        readVertices(row, terms, work[k]!, work[k + 1]!, crests, read)
        if (k > 0) read(work[k]!)
      }
    }
    keep(from, values[e]!)
  }
  return { value, lead }
}

/** Bound of the sum's derivative by the lead while the wheels on the girder are those at `lead`. */
const steepest = ({ length: L, offsets, moves }: Row, terms: readonly SweepTerm[], lead: number): number => {
  let bound = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = offsets[i]! + lead
    if (moves[i]! === 1 && p >= 0 && p <= L)
      for (const { factor, weights } of terms) bound += Math.abs(factor * weights[i]!)
  }
  return bound
}

/** Value of the sum with the train at `lead`. */
export const valueAt = (
  row: Row,
  terms: readonly SweepTerm[],
  lead: number,
  crests: readonly Crests[] = terms.map(() => makeCrests(row.offsets.length)),
): number => {
  let sum = 0
  for (let t = 0; t < terms.length; t++) {
    const term = terms[t]!
    if (term.at !== undefined) {
      sum += term.factor * fixedMoment(row, term, term.at, lead)
      continue
    }
    const found = crests[t]!
    readCrests(row, term, lead, found)
    sum += term.factor * found.moment[greatestCrest(found)]!
  }
  return sum
}

/** Where the term is read at this lead: its fixed station, or its greatest crest (the leftmost of equal ones). */
export const stationAt = (row: Row, term: SweepTerm, lead: number): number => {
  if (term.at !== undefined) return term.at
  const crests = makeCrests(row.offsets.length)
  readCrests(row, term, lead, crests)
  return crests.station[greatestCrest(crests)]!
}

const greatestCrest = ({ count, moment }: Crests): number => {
  let best = 0
  for (let i = 1; i < count; i++) if (moment[i]! > moment[best]! + EQUAL * Math.abs(moment[best]!)) best = i
  return best
}

const fixedMoment = ({ length: L, offsets, moves }: Row, term: TermLoads, x: number, lead: number): number => {
  let M = term.left + ((term.right - term.left) * x) / L + (term.uniform * x * (L - x)) / 2
  for (let i = 0; i < offsets.length; i++) {
    const p = moves[i]! === 1 ? offsets[i]! + lead : offsets[i]!
    if (p >= 0 && p <= L) M += (term.weights[i]! * Math.min(p, x) * (L - Math.max(p, x))) / L
  }
  return M
}

const fixedSlope = ({ length: L, offsets, moves }: Row, term: TermLoads, x: number, lead: number): number => {
  let slope = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = offsets[i]! + lead
    if (moves[i]! === 1 && p >= 0 && p <= L) slope += term.weights[i]! * (p < x ? (L - x) / L : -x / L)
  }
  return slope
}

/** Reads the vertex of every choice of crests between a and b, where that choice holds throughout. */
const readVertices = (
  row: Row,
  terms: readonly SweepTerm[],
  a: number,
  b: number,
  crests: readonly Crests[],
  read: (lead: number) => void,
): void => {
  const middle = (a + b) / 2
  let slope = 0
  let curvature = 0
  let several = false
  for (let t = 0; t < terms.length; t++) {
    const term = terms[t]!
    if (term.at !== undefined) {
      slope += term.factor * fixedSlope(row, term, term.at, middle)
      continue
    }
    const found = crests[t]!
    readCrests(row, term, middle, found)
    if (found.count > 1) several = true
    slope += term.factor * found.slope[0]!
    curvature += term.factor * found.curvature[0]!
  }
  if (!several) {
    const s = middle - slope / curvature
    if (s > a && s < b) read(s)
    return
  }
  // The crests are overwritten by `read`, so the vertices are collected before any is read.
  const vertices: number[] = []
  let fixed = 0
  for (const term of terms) if (term.at !== undefined) fixed += term.factor * fixedSlope(row, term, term.at, middle)
  const choose = (t: number, slopes: number, curvatures: number): void => {
    if (t === terms.length) {
      const s = middle - slopes / curvatures
      if (s > a && s < b) vertices.push(s)
      return
    }
    const { at, factor } = terms[t]!
    if (at !== undefined) {
      choose(t + 1, slopes, curvatures)
      return
    }
    const found = crests[t]!
    const least = surest(found, (b - a) / 2)
    for (let i = 0; i < found.count; i++)
      if (reach(found, i, (b - a) / 2, 1) >= least)
        choose(t + 1, slopes + factor * found.slope[i]!, curvatures + factor * found.curvature[i]!)
  }
  choose(0, fixed, 0)
  for (const s of vertices) read(s)
}

/** The most (sign 1) or least (sign -1) that a crest's moment can be within `half` of the lead it was read at. */
const reach = ({ moment, slope, curvature }: Crests, i: number, half: number, sign: 1 | -1): number =>
  moment[i]! + sign * (Math.abs(slope[i]!) * half + (Math.max(0, sign * curvature[i]!) * half * half) / 2)

/** What the greatest crest is not below anywhere within `half`: crests that cannot reach it are never the greatest. */
const surest = (crests: Crests, half: number): number => {
  let least = -Infinity
  for (let i = 0; i < crests.count; i++) least = Math.max(least, reach(crests, i, half, -1))
  return least
}

/** Leads at which a moving wheel meets a support or a fixed station, ascending, closed by the bounds where there are any. */
const eventsOf = ({ length, offsets, moves }: Row, terms: readonly SweepTerm[], low: number, high: number) => {
  const places = new Set([0, length])
  for (const { at } of terms) if (at !== undefined) places.add(at)
  const events: number[] = []
  for (let i = 0; i < offsets.length; i++)
    if (moves[i]! === 1)
      for (const place of places) {
        const lead = place - offsets[i]!
        if (lead > low && lead < high) events.push(lead)
      }
  if (low > -Infinity) events.push(low)
  if (high < Infinity) events.push(high)
  if (events.length === 0) events.push(0)
  return Float64Array.from(events).sort()
}

const insertionSort = (list: Float64Array, count: number): void => {
  for (let i = 1; i < count; i++) {
    const value = list[i]!
    let k = i - 1
    while (k >= 0 && list[k]! > value) list[k + 1] = list[k--]!
    list[k + 1] = value
  }
}
