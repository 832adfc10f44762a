/** Roots of a continuous function between two places where its sign differs. */
import { FormulaError } from './types.ts'

export interface Root {
  readonly root: number
  /** The function's value there. */
  readonly residual: number
  readonly evaluations: number
}

/** Far more than Brent's method needs for a bracket of any width in double precision. */
const MOST_EVALUATIONS = 200

/**
 * The root of f between a and b by Brent's method (R. P. Brent, Algorithms for Minimization without Derivatives, 1973,
 * chapter 4), to within `tolerance` of x, by default 1e-14 of the end farther from zero. `name` is what an error is told
 * under. Throws FormulaError where the signs at a and b are alike, or f is not finite at a place visited.
 */
export function iterate(
  name: string,
  f: (x: number) => number,
  a: number,
  b: number,
  tolerance = 1e-14 * Math.max(Math.abs(a), Math.abs(b)),
): Root {
  let evaluations = 0
  const at = (x: number): number => {
    const y = f(x)
    evaluations += 1
    if (!Number.isFinite(y))
      throw new FormulaError('the function is not finite where its root is sought', name, { x, y })
    return y
  }
  let [x0, x1] = [a, b]
  let [y0, y1] = [at(a), at(b)]
  if (y0 === 0) return { root: a, residual: y0, evaluations }
  if (y1 === 0) return { root: b, residual: y1, evaluations }
  if (y0 > 0 === y1 > 0) throw new FormulaError('no change of sign between the ends', name, { a, b, fa: y0, fb: y1 })

  // x1 is the best place so far, x0 the one before, x2 the other side of the bracket.
  let [x2, y2] = [x0, y0]
  let step = x1 - x0
  let stepBefore = step
  while (evaluations < MOST_EVALUATIONS) {
    if (Math.abs(y2) < Math.abs(y1)) {
      ;[x0, x1, x2] = [x1, x2, x1]
      ;[y0, y1, y2] = [y1, y2, y1]
    }
    const least = 2 * Number.EPSILON * Math.abs(x1) + tolerance / 2
    const half = (x2 - x1) / 2
    if (Math.abs(half) <= least || y1 === 0) return { root: x1, residual: y1, evaluations }
    const may = Math.abs(stepBefore) >= least && Math.abs(y0) > Math.abs(y1)
    const guess = may ? interpolate(x0, y0, x1, y1, x2, y2) : 0
    const most = Math.min(1.5 * Math.abs(half) - least / 2, Math.abs(stepBefore) / 2)
    const inside = guess * half > 0 && Math.abs(guess) < most
    stepBefore = inside ? step : half
    step = inside ? guess : half
    ;[x0, y0] = [x1, y1]
    x1 += Math.abs(step) > least ? step : Math.sign(half) * least
    y1 = at(x1)
    if (y1 > 0 === y2 > 0) {
      ;[x2, y2] = [x0, y0]
      step = x1 - x0
      stepBefore = step
    }
  }
  throw new FormulaError(`no root after ${evaluations} evaluations`, name, { x: x1, y: y1 })
}

/** The step from x1 by inverse quadratic interpolation, or by the secant where two places coincide. */
function interpolate(x0: number, y0: number, x1: number, y1: number, x2: number, y2: number): number {
  const s = y1 / y0
  if (x0 === x2) return ((x2 - x1) * s) / (s - 1)
  const [q, r] = [y0 / y2, y1 / y2]
  const p = s * ((x2 - x1) * q * (q - r) - (x1 - x0) * (r - 1))
  return -p / ((q - 1) * (r - 1) * (s - 1))
}
