/**
 * Section properties by a way of their own: boundary integrals (Green) over polygons, cut by lines for the plastic moduli, and thin
 * strips with shear flow for shear centre and warping. Slow and independent of core/section.
 */
export type Point = readonly [x: number, y: number]

export interface Moments {
  readonly A: number
  readonly Sx: number
  readonly Sy: number
  readonly Ixx: number
  readonly Iyy: number
}

/** Moments about the origin's axes of polygons given counter-clockwise, which may overlap (their area then counts twice). */
export const green = (polygons: readonly (readonly Point[])[]): Moments => {
  let [A, Sx, Sy, Ixx, Iyy] = [0, 0, 0, 0, 0]
  for (const polygon of polygons) {
    polygon.forEach(([x1, y1], i) => {
      const [x2, y2] = polygon[(i + 1) % polygon.length]!
      const cross = x1 * y2 - x2 * y1
      A += cross / 2
      Sx += (cross * (y1 + y2)) / 6
      Sy += (cross * (x1 + x2)) / 6
      Ixx += (cross * (y1 * y1 + y1 * y2 + y2 * y2)) / 12
      Iyy += (cross * (x1 * x1 + x1 * x2 + x2 * x2)) / 12
    })
  }
  return { A, Sx, Sy, Ixx, Iyy }
}

/** What of each polygon lies on the side where nx x + ny y <= c. */
const cut = (polygons: readonly (readonly Point[])[], nx: number, ny: number, c: number): Point[][] =>
  polygons.map((polygon) => {
    const kept: Point[] = []
    polygon.forEach((from, i) => {
      const to = polygon[(i + 1) % polygon.length]!
      const [a, b] = [nx * from[0] + ny * from[1] - c, nx * to[0] + ny * to[1] - c]
      if (a <= 0) kept.push(from)
      if (a * b < 0)
        kept.push([from[0] + ((to[0] - from[0]) * a) / (a - b), from[1] + ((to[1] - from[1]) * a) / (a - b)])
    })
    return kept
  })

/** Height that halves the area, by bisection, and the first moments of the two halves about it, added up. */
export const plastic = (polygons: readonly (readonly Point[])[]): { readonly height: number; readonly Z: number } => {
  const heights = polygons.flat().map(([, y]) => y)
  let [low, high] = [Math.min(...heights), Math.max(...heights)]
  const whole = green(polygons)
  for (let step = 0; step < 40; step += 1) {
    const middle = (low + high) / 2
    if (green(cut(polygons, 0, 1, middle)).A < whole.A / 2) low = middle
    else high = middle
  }
  const height = (low + high) / 2
  const below = green(cut(polygons, 0, 1, height))
  return { height, Z: whole.Sx - 2 * below.Sx - height * (whole.A - 2 * below.A) }
}

/** First moments about x = 0 of the halves left and right of it, added up. */
export const sideways = (polygons: readonly (readonly Point[])[]): number =>
  -2 * green(cut(polygons, 1, 0, 0)).Sy + green(polygons).Sy

export const box = (width: number, bottom: number, top: number): Point[] => [
  [-width / 2, bottom],
  [width / 2, bottom],
  [width / 2, top],
  [-width / 2, top],
]

/** A wall of the right half, from the web outwards; walls of one branch follow one another. */
export interface Run {
  readonly from: Point
  readonly to: Point
  readonly thickness: number
}

/**
 * Shear centre height by the moment of the shear flow under a horizontal shear, and the warping constant by summing the swept area
 * about it, both over `n` strips a wall. Branches start in the plane of symmetry; only the right half is given.
 */
export const strips = (
  branches: readonly (readonly Run[])[],
  n: number,
): { readonly height: number; readonly Cw: number } => {
  const cuts = branches.map((branch) =>
    branch.flatMap(({ from, to, thickness }) =>
      Array.from({ length: n }, (_, i) => {
        const [dx, dy] = [(to[0] - from[0]) / n, (to[1] - from[1]) / n]
        const [x, y] = [from[0] + (i + 0.5) * dx, from[1] + (i + 0.5) * dy]
        return { x, y, dx, dy, area: thickness * Math.hypot(dx, dy) }
      }),
    ),
  )
  let [force, moment] = [0, 0]
  for (const branch of cuts) {
    let flow = 0
    for (const { x, y, dx, dy, area } of branch.toReversed()) {
      // Flow at the middle of the strip, walking from the free end in.
      const q = flow + (x * area) / 2
      flow += x * area
      force -= q * dx
      moment -= q * (x * dy - y * dx)
    }
  }
  const height = -moment / force
  let Cw = 0
  for (const branch of cuts) {
    let w = 0
    for (const { x, y, dx, dy, area } of branch) {
      const swept = x * dy - (y - height) * dx
      Cw += 2 * (w + swept / 2) ** 2 * area
      w += swept
    }
  }
  return { height, Cw }
}
