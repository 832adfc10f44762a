/**
 * A simple girder by plain statics, written apart from the search: every extreme is computed once more with it before it is
 * handed out. Distances from the left support in m; signs as in types.ts.
 */

/** All that stands on one girder. */
export interface Standing {
  readonly length: number
  readonly loads: readonly { readonly x: number; readonly force: number }[]
  readonly uniform: number
  readonly left: number
  readonly right: number
}

/** The girder under some of a train's wheels and a uniform load. */
export const standingOf = (
  length: number,
  on: readonly { readonly wheel: number; readonly x: number }[],
  wheels: readonly number[],
  uniform: number,
): Standing => ({
  length,
  loads: on.map(({ wheel, x }) => ({ x, force: wheels[wheel]! })),
  uniform,
  left: 0,
  right: 0,
})

/** Size of the moments' addends, by which rounding is measured, N m. */
export const sizeOf = ({ length, loads, uniform, left, right }: Standing): number =>
  loads.reduce((sum, { force }) => sum + Math.abs(force), Math.abs(uniform) * length) * length +
  Math.abs(left) +
  Math.abs(right)

/** Reactions, each from the moments about the other support. */
export const reactions = ({ length: L, loads, uniform, left, right }: Standing) => {
  const about = (arm: (x: number) => number): number => loads.reduce((sum, { x, force }) => sum + force * arm(x), 0)
  return {
    left: (about((x) => L - x) + (uniform * L * L) / 2 + right - left) / L,
    right: (about((x) => x) + (uniform * L * L) / 2 + left - right) / L,
  }
}

/** Moment at x from what stands left of it. */
export const momentAt = (standing: Standing, x: number): number =>
  standing.left +
  reactions(standing).left * x -
  (standing.uniform * x * x) / 2 -
  standing.loads.reduce((sum, load) => sum + load.force * Math.max(x - load.x, 0), 0)

/** Shear at x, of the two sides the one with the greater magnitude; at a support the side within the girder. */
export const shearAt = (standing: Standing, x: number): number => {
  const { left } = reactions(standing)
  const { loads, uniform, length } = standing
  const near = 1e-9 * length
  const side = (counts: (at: number) => boolean): number =>
    left - uniform * x - loads.reduce((sum, load) => sum + (counts(load.x) ? load.force : 0), 0)
  const before = side((at) => at < x - near)
  const after = side((at) => at <= x + near)
  if (x <= near) return side(() => false)
  if (x >= length - near) return side((at) => at < length - near)
  return Math.abs(after) > Math.abs(before) ? after : before
}

/** Throws an EquilibriumError unless the reactions carry the loads and the moment at x is the same from both sides. */
export const proveEquilibrium = (standing: Standing, x: number): void => {
  const { length: L, loads, uniform, right } = standing
  const support = reactions(standing)
  const total = loads.reduce((sum, { force }) => sum + force, 0) + uniform * L
  const moments = sizeOf(standing)
  const fromRight =
    right +
    support.right * (L - x) -
    (uniform * (L - x) ** 2) / 2 -
    loads.reduce((sum, load) => sum + load.force * Math.max(load.x - x, 0), 0)
  const vertical = Math.abs(support.left + support.right - total)
  const bending = Math.abs(momentAt(standing, x) - fromRight)
  if (vertical * L <= CLOSED * moments + NOTHING && bending <= CLOSED * moments + NOTHING) return
  throw equilibriumError(`girder of ${L} m at ${x} m: reactions are off by ${vertical} N, the moment by ${bending} N m`)
}

/** Throws an EquilibriumError unless the value found is the one plain statics gives; `size` is that of its addends. */
export const proveValue = (found: number, statics: number, size: number): void => {
  if (Math.abs(found - statics) <= CLOSED * size + NOTHING) return
  throw equilibriumError(`the search found ${found}, plain statics at that place gives ${statics}`)
}

const equilibriumError = (message: string): Error => {
  const error = new Error(message)
  error.name = 'EquilibriumError'
  return error
}

/** What rounding may leave open, as a part of the loads. */
const CLOSED = 1e-9

/** Below this a number has lost digits to underflow; no load is as small. */
const NOTHING = 1e-290
