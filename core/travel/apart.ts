/**
 * Two or more cranes on one girder with gaps of any size from bumper to bumper upwards.
 *
 * Contact is worst for one moment (and for a reaction, a shear at a support, a deflection at a station). All wheels then
 * read one line that rises to one peak and falls after it. While the left crane has all its wheels on the girder left of
 * the peak, driving it to the right lowers nothing; while the right crane has all of its right of the peak, driving it to
 * the left lowers nothing. With a gap between them one of the two always holds, so the gap closes, or one is off the girder.
 *
 * It is worst as well for a sum of moments each at its worst section, of wheels and uniform load that bear down. Let rho be
 * the left crane's last wheel on the girder and lambda the right crane's first; lambda - rho is d or more, so rho <= (L - d)/2
 * or, as the mirror image, lambda >= (L + d)/2. Drive the left crane to the right: a section x at or left of rho goes
 * along, and its moment changes by W (L - x - r)/L + (what the right crane's wheels add, not negative) + q (L/2 - x) +
 * (M_right - M_left)/L, where W is the crane's load and r its resultant's station, both at most rho: so by W d/L or more,
 * less the difference of the end moments over L. A section right of rho stays, and its moment does not fall. So the gap
 * closes while that difference is smaller than the smallest wheel times d. Moments at fixed stations join in where each wheel's
 * share of them, taken together, rises up to midspan and falls from there.
 *
 * Without these conditions it is not so: a moment at the left quarter caused by one crane only and a moment at the right
 * quarter caused by the other only want the cranes apart. Then the cranes are driven one by one and in blocks, each move
 * exact (sweep.ts), from many starts until no move makes it worse.
 */
import type { Row } from './crest.ts'
import { EQUAL } from './passage.ts'
import { sweep, valueAt, type Swept, type SweepTerm } from './sweep.ts'

const STARTS = 24

/** True where cranes in contact, or single ones, are certain to be worst. `cranes` names the crane of each wheel of the row. */
export const contactGoverns = (row: Row, cranes: readonly number[], terms: readonly SweepTerm[]): boolean => {
  const bearsDown = terms.every(({ weights, uniform }) => uniform >= 0 && weights.every((force) => force >= 0))
  if (!bearsDown) return false
  const [first] = terms
  if (terms.every(({ at }) => at !== undefined && at === first!.at)) return terms.every(({ factor }) => factor >= 0)
  if (terms.length === 1) return true
  const d = leastGap(row, cranes)
  return (
    terms.every(({ at, left, right, weights }) => at !== undefined || Math.abs(right - left) < least(weights) * d) &&
    fixedTermsPeakAtMidspan(row, terms)
  )
}

export interface Apart {
  readonly value: number
  /** Station of each wheel of the row from the left support. */
  readonly stations: Float64Array
}

/** The worst place found with free gaps: at least as bad as `contact`, the worst with the cranes bumper to bumper. */
export const apart = (row: Row, cranes: readonly number[], terms: readonly SweepTerm[], contact: Swept): Apart => {
  const L = row.length
  const ends = cranes.flatMap((crane, i) => (cranes[i + 1] === crane ? [] : [i + 1]))
  const at = (shift: number): Float64Array => row.offsets.map((offset) => offset + shift)
  let best = climb({ ...row, offsets: at(contact.lead) }, ends, terms)
  for (const end of ends.slice(0, -1)) {
    const [left, right] = [row.offsets[end - 1]!, row.offsets[end]!]
    for (let k = 0; k <= STARTS; k++) {
      const station = (L * k) / STARTS
      // The right part with its first wheel at the station and the left part off the girder, and the other way round.
      const off = Math.min(station - right, -L - left)
      const away = Math.max(station - left, 2 * L - right)
      for (const [shiftLeft, shiftRight] of [
        [off, station - right],
        [station - left, away],
      ] as const) {
        const offsets = row.offsets.map((offset, i) => offset + (i < end ? shiftLeft : shiftRight))
        const found = climb({ ...row, offsets }, ends, terms)
        if (found.value > best.value + EQUAL * Math.abs(best.value)) best = found
      }
    }
  }
  return best

  /** Moves every block of neighbouring cranes to its worst place between its neighbours until nothing gets worse. */
  function climb(from: Row, ends: readonly number[], list: readonly SweepTerm[]): Apart {
    let stations = from.offsets
    let value = valueAt({ ...from, moves: new Uint8Array(stations.length) }, list, 0)
    for (let round = 0, moved = true; moved && round < 100; round++) {
      moved = false
      for (const [i, start] of [0, ...ends.slice(0, -1)].entries())
        for (const end of ends.slice(i)) {
          const moves = Uint8Array.from(stations, (_, k) => (k >= start && k < end ? 1 : 0))
          const slack = (k: number): number => stations[k]! - stations[k - 1]! - (row.offsets[k]! - row.offsets[k - 1]!)
          const low = start === 0 ? -Infinity : -Math.max(slack(start), 0)
          const high = end === stations.length ? Infinity : Math.max(slack(end), 0)
          const found = sweep({ length: L, offsets: stations, moves }, list, low, high)
          if (!(found.value > value + EQUAL * Math.abs(value))) continue
          value = found.value
          stations = stations.map((station, k) => (moves[k] === 1 ? station + found.lead : station))
          moved = true
        }
    }
    return { value, stations }
  }
}

/** Least distance between the outer wheels of neighbours. */
const leastGap = (row: Row, cranes: readonly number[]): number => {
  let gap = Infinity
  for (let i = 1; i < cranes.length; i++)
    if (cranes[i] !== cranes[i - 1]) gap = Math.min(gap, row.offsets[i]! - row.offsets[i - 1]!)
  return gap
}

/** The least force that is not zero; without any the term does not change and nothing is asked of it. */
const least = (forces: Float64Array): number => {
  let min = Infinity
  for (const force of forces) if (force > 0 && force < min) min = force
  return min
}

const fixedTermsPeakAtMidspan = ({ length: L, offsets }: Row, terms: readonly SweepTerm[]): boolean => {
  const fixed = terms.filter(({ at }) => at !== undefined)
  const breaks = [0, L / 2, L, ...fixed.map(({ at }) => at!)].sort((a, b) => a - b)
  return breaks.slice(1).every((to, k) => {
    const middle = (breaks[k]! + to) / 2
    return offsets.every((_, i) => {
      const slope = fixed.reduce(
        (sum, { at, factor, weights }) => sum + factor * weights[i]! * (middle < at! ? L - at! : -at!),
        0,
      )
      return to - breaks[k]! <= 0 || (middle < L / 2 ? slope >= 0 : slope <= 0)
    })
  })
}
