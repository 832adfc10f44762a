/**
 * Influence lines: the effect of a unit load downward at a station, as piecewise cubics in that station.
 * Lines of a simple span are straight pieces (deflection: cubics); continuous girders need nothing but more pieces.
 * All stations run along the runway from the first support, in m.
 */
import type { Beam } from './types.ts'

/** Coefficients of (station - left end of the piece) to the powers 0, 1, 2, 3. */
export type Cubic = readonly [number, number, number, number]

/** Piece i reaches from breaks[i] to breaks[i + 1]; the line is zero outside and may jump at a break. */
export interface Influence {
  readonly breaks: readonly number[]
  readonly polynomials: readonly Cubic[]
}

/** Start and length of a span. Throws RangeError where the beam has no such span or its length is not positive. */
export const spanOf = (beam: Beam, span: number): { readonly start: number; readonly length: number } => {
  const length = beam.spans[span]
  if (length === undefined) throw new RangeError(`span ${span} of ${beam.spans.length} does not exist`)
  if (!(length > 0 && length < Infinity)) throw new RangeError(`span ${span} has the length ${length} m`)
  let start = 0
  for (let i = 0; i < span; i++) start += beam.spans[i]!
  return { start, length }
}

/** Distance of a runway station from its span's left support. Throws RangeError where it lies outside the span. */
export const withinSpan = (beam: Beam, span: number, station: number): number => {
  const { start, length } = spanOf(beam, span)
  const x = station - start
  if (!(x >= -STATION_TOLERANCE * (start + length) && x <= length + STATION_TOLERANCE * (start + length)))
    throw new RangeError(`station ${station} m is not within span ${span}, ${start} to ${start + length} m`)
  return Math.min(Math.max(x, 0), length)
}

/** Stations closer than this part of the runway are one station: rounding, not a distance. */
export const STATION_TOLERANCE = 1e-12

/** Moment at a station of a span, N m per N, sagging positive. */
export const momentLine = (beam: Beam, span: number, station: number): Influence => {
  const { start, length: L } = spanOf(beam, span)
  const x = withinSpan(beam, span, station)
  return pieces([
    [start, [0, (L - x) / L, 0, 0]],
    [start + x, [(x * (L - x)) / L, -x / L, 0, 0]],
    [start + L, undefined],
  ])
}

/**
 * Shear at a station of a span, positive when the left part pushes up. The line jumps by 1 at the station: the wheel
 * just right of it counts fully, just left of it the rest; at a support only the side within the span exists.
 */
export const shearLine = (beam: Beam, span: number, station: number): Influence => {
  const { start, length: L } = spanOf(beam, span)
  const x = withinSpan(beam, span, station)
  return pieces([
    [start, [0, -1 / L, 0, 0]],
    [start + x, [(L - x) / L, -1 / L, 0, 0]],
    [start + L, undefined],
  ])
}

/** Upward reaction at one end of a girder: 1 with the wheel at that end, zero once it is past it. */
export const endReactionLine = (beam: Beam, span: number, end: 'left' | 'right'): Influence => {
  const { start, length: L } = spanOf(beam, span)
  return pieces([
    [start, end === 'left' ? [1, -1 / L, 0, 0] : [0, 1 / L, 0, 0]],
    [start + L, undefined],
  ])
}

/** Upward reaction of a support: of simple girders the sum of the two that rest on it. */
export const supportReactionLine = (beam: Beam, support: number): Influence => {
  if (!(Number.isInteger(support) && support >= 0 && support <= beam.spans.length))
    throw new RangeError(`support ${support} of ${beam.spans.length + 1} does not exist`)
  const left = support > 0 ? endReactionLine(beam, support - 1, 'right') : undefined
  const right = support < beam.spans.length ? endReactionLine(beam, support, 'left') : undefined
  if (left === undefined) return right!
  if (right === undefined) return left
  return {
    breaks: [left.breaks[0]!, ...right.breaks],
    polynomials: [...left.polynomials, ...right.polynomials],
  }
}

/**
 * Downward deflection at a station of a simple span, m per N, of flexural stiffness E I in N m2. From the elastic curve under one load,
 * P b x (L^2 - b^2 - x^2) / (6 E I L) for x up to the load (any strength of materials; Gere and Goodno, table of beams).
 */
export const deflectionLine = (beam: Beam, span: number, station: number, stiffness: number): Influence => {
  const { start, length: L } = spanOf(beam, span)
  const x = withinSpan(beam, span, station)
  const d = L - x
  const k = 1 / (6 * L * stiffness)
  return pieces([
    [start, [0, k * d * (L * L - d * d), 0, -k * d]],
    [start + x, [k * x * d * (L * L - x * x - d * d), k * x * (3 * d * d - L * L + x * x), -3 * k * x * d, k * x]],
    [start + L, undefined],
  ])
}

/** Pieces of no length are left out, so that every piece can be divided by its length. */
const pieces = (list: readonly (readonly [at: number, piece: Cubic | undefined])[]): Influence => {
  const breaks: number[] = []
  const polynomials: Cubic[] = []
  for (const [i, [at, piece]] of list.entries()) {
    const next = list[i + 1]
    if (piece !== undefined && next !== undefined && next[0] <= at) continue
    breaks.push(at)
    if (piece !== undefined) polynomials.push(piece)
  }
  return { breaks, polynomials }
}

/** Ordinate of a line at a station of the runway; beyond its ends that of its end. */
export const ordinateAt = ({ breaks, polynomials }: Influence, station: number): number => {
  const piece = Math.max(
    0,
    Math.min(
      breaks.findLastIndex((at) => at <= station),
      polynomials.length - 1,
    ),
  )
  const t = station - breaks[piece]!
  const [a, b, c, d] = polynomials[piece]!
  return a + t * (b + t * (c + t * d))
}
