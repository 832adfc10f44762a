/**
 * Shear centre and warping constant of an open thin-walled section by sectorial coordinates (V. Z. Vlasov, Thin-Walled Elastic
 * Beams, 2nd ed., 1959, chapter I). The section is a tree of straight walls on the middle lines of its plates.
 */

/** A straight wall of a tree. Metres; `from` is the index of the wall at whose end it begins, -1 at the root. */
export interface Wall {
  readonly x1: number
  readonly y1: number
  readonly x2: number
  readonly y2: number
  readonly thickness: number
  readonly from: number
}

/**
 * Shear centre (m) and warping constant (m6) of the tree. A wall may only stand after the one it begins at.
 * The sectorial coordinate is taken about the point (0, 0) and is zero at the root; all walls with `from` -1 are understood to be
 * joined along the line x = 0, where it stays zero. Walls of no thickness may be used as links. Exact for the middle-line model:
 * every integrand is a product of functions linear along a wall. The walls must not all lie on one line.
 */
export const sectorialOf = (
  walls: readonly Wall[],
): { readonly xShear: number; readonly yShear: number; readonly Cw: number } => {
  const ends: number[] = []
  let A = 0
  let [Sx, Sy, Sw] = [0, 0, 0]
  let [Ixx, Iyy, Ixy] = [0, 0, 0]
  let [Iwx, Iwy, Iww] = [0, 0, 0]
  for (const { x1, y1, x2, y2, thickness, from } of walls) {
    const w1 = from < 0 ? 0 : ends[from]!
    // Twice the area swept by the ray from the pole: dw = x dy - y dx.
    const w2 = w1 + x1 * y2 - x2 * y1
    ends.push(w2)
    const area = thickness * Math.hypot(x2 - x1, y2 - y1)
    A += area
    Sx += (area * (x1 + x2)) / 2
    Sy += (area * (y1 + y2)) / 2
    Sw += (area * (w1 + w2)) / 2
    Ixx += area * product(y1, y2, y1, y2)
    Iyy += area * product(x1, x2, x1, x2)
    Ixy += area * product(x1, x2, y1, y2)
    Iwx += area * product(w1, w2, x1, x2)
    Iwy += area * product(w1, w2, y1, y2)
    Iww += area * product(w1, w2, w1, w2)
  }
  Ixx -= (Sy * Sy) / A
  Iyy -= (Sx * Sx) / A
  Ixy -= (Sx * Sy) / A
  Iwx -= (Sw * Sx) / A
  Iwy -= (Sw * Sy) / A
  Iww -= (Sw * Sw) / A
  // Moving the pole by (dx, dy) adds dy x - dx y; about the shear centre the coordinate is orthogonal to x and y.
  const determinant = Ixx * Iyy - Ixy * Ixy
  const dx = (Iyy * Iwy - Ixy * Iwx) / determinant
  const dy = (Ixy * Iwy - Ixx * Iwx) / determinant
  return { xShear: dx, yShear: dy, Cw: Iww - dx * Iwy + dy * Iwx }
}

/** Mean over a wall of the product of two functions linear along it, given by their end values. */
const product = (f1: number, f2: number, g1: number, g2: number): number =>
  (2 * f1 * g1 + f1 * g2 + f2 * g1 + 2 * f2 * g2) / 6
