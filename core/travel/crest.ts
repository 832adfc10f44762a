/**
 * The greatest sagging moment of a simple girder under wheels of which some move together and the others stand still,
 * at one position of the moving ones, and how it changes as they move on.
 *
 * The shear falls by every wheel and along the uniform load, so the moment is greatest where the shear turns from
 * pushing up to pushing down: under a wheel, between wheels where the uniform load brings it to zero, or at a support
 * (moments entering there). Such a place is a crest. Forces that push up make more than one crest; all are read.
 */

/** One term as the search reads it; stations from the left support. */
export interface TermLoads {
  readonly factor: number
  /** Force of each wheel, in the order of `offsets`, N. */
  readonly weights: Float64Array
  readonly uniform: number
  readonly left: number
  readonly right: number
}

/** Wheels in order of station: moving ones at offset + lead, standing ones at their offset. */
export interface Row {
  readonly length: number
  readonly offsets: Float64Array
  /** 1 where the wheel moves, 0 where it stands. */
  readonly moves: Uint8Array
}

/** The crests found at one position. Overwritten by the next reading. */
export interface Crests {
  count: number
  readonly moment: Float64Array
  readonly station: Float64Array
  /** First and second derivative of the crest's moment by the lead. */
  readonly slope: Float64Array
  readonly curvature: Float64Array
}

export const makeCrests = (wheels: number): Crests => ({
  count: 0,
  moment: new Float64Array(2 * wheels + 2),
  station: new Float64Array(2 * wheels + 2),
  slope: new Float64Array(2 * wheels + 2),
  curvature: new Float64Array(2 * wheels + 2),
})

/** Reads every crest with the train at `lead` into `into`. Exact; no memory is taken. */
export const readCrests = (row: Row, term: TermLoads, lead: number, into: Crests): void => {
  const { length: L, offsets, moves } = row
  const { weights, uniform: q, left, right } = term
  let V = (right - left) / L + (q * L) / 2
  let moving = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = moves[i]! === 1 ? offsets[i]! + lead : offsets[i]!
    if (p < 0 || p > L) continue
    V += (weights[i]! * (L - p)) / L
    if (moves[i]! === 1) moving += weights[i]!
  }
  let n = 0
  const add = (moment: number, station: number, slope: number, curvature: number): void => {
    into.moment[n] = moment
    into.station[n] = station
    into.slope[n] = slope
    into.curvature[n++] = curvature
  }
  if (V < 0) add(left, 0, 0, 0)
  let x = 0
  let M = left
  // Moving weights left of the section: at a fixed section the moment grows by `passed` - moving x / L as the lead grows.
  let passed = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = moves[i]! === 1 ? offsets[i]! + lead : offsets[i]!
    if (p < 0 || p > L) continue
    const reach = p - x
    const before = V - q * reach
    if (V >= 0 && before < 0) {
      const top = x + V / q
      add(M + (V / q) * (V / 2), top, passed - (moving * top) / L, ((moving / L) * (moving / L)) / q)
    }
    M += (V - (q * reach) / 2) * reach
    V = before - weights[i]!
    if (before >= 0 && V < 0) {
      const rides = moves[i]! === 1
      add(M, p, passed - (moving * p) / L + (rides ? before : 0), rides ? -q - (2 * moving) / L : 0)
    }
    if (moves[i]! === 1) passed += weights[i]!
    x = p
  }
  const last = V - q * (L - x)
  if (V >= 0 && last < 0) {
    const top = x + V / q
    add(M + (V / q) * (V / 2), top, passed - (moving * top) / L, ((moving / L) * (moving / L)) / q)
  }
  if (last >= 0) add(right, L, 0, 0)
  into.count = n
}

/**
 * Leads strictly between `from` and `to` at which a crest moves on to its neighbour: where the shear beside a wheel or at a
 * support is zero. No wheel may come onto the girder or leave it between. Appends to `out` from `at`, returns the new length.
 */
export const crestChanges = (
  row: Row,
  term: TermLoads,
  from: number,
  to: number,
  out: Float64Array,
  at: number,
): number => {
  const { length: L, offsets, moves } = row
  const { weights, uniform: q, left, right } = term
  const middle = (from + to) / 2
  let V = (right - left) / L + (q * L) / 2
  let moving = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = moves[i]! === 1 ? offsets[i]! + middle : offsets[i]!
    if (p < 0 || p > L) continue
    V += (weights[i]! * (L - p)) / L
    if (moves[i]! === 1) moving += weights[i]!
  }
  const slope = -moving / L
  let count = at
  const add = (shear: number, change: number): void => {
    const lead = middle - shear / change
    if (lead > from && lead < to) out[count++] = lead
  }
  add(V, slope)
  let x = 0
  for (let i = 0; i < offsets.length; i++) {
    const p = moves[i]! === 1 ? offsets[i]! + middle : offsets[i]!
    if (p < 0 || p > L) continue
    V -= q * (p - x)
    add(V, slope - q * moves[i]!)
    V -= weights[i]!
    add(V, slope - q * moves[i]!)
    x = p
  }
  add(V - q * (L - x), slope)
  return count
}
