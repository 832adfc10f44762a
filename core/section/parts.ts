/**
 * The parts a girder's section is put together from, all symmetric about the vertical plane of the web. Parts joined are a part
 * again, so every make-up is summed by the same few lines. SI throughout; heights are measured up from the girder's bottom face.
 */
import type { Channel, IShape } from '../catalogue/types.ts'
import type { Band } from './plastic.ts'
import type { Wall } from './sectorial.ts'

export interface Part {
  readonly A: number
  /** Height of the centroid. */
  readonly y: number
  /** Moment of inertia about its own horizontal centroidal axis. */
  readonly Ix: number
  /** Moment of inertia about the plane of symmetry. */
  readonly Iy: number
  /** First moments of its two halves about the plane of symmetry, added up. */
  readonly Zy: number
  readonly J: number
  readonly massPerLength: number
  /** Where its area lies over the height, for the plastic axis; their area is A. */
  readonly bands: readonly Band[]
  /** Middle lines of its plates, for the shear centre and warping. */
  readonly walls: readonly Wall[]
}

/**
 * Density of steel for plates and shapes without a printed mass, kg/m3: EN 1991-1-1, table A.4 (77.0 to 78.5 kN/m3, the upper end);
 * the AISC Manual's 490 lb/ft3 is 7849 kg/m3.
 */
const STEEL_DENSITY = 7850

/** Parts side by side as one part: sums, with the moments of inertia carried over to the common centroid. */
export const join = (parts: readonly Part[]): Part => {
  let [A, moment, Iy, Zy, J, massPerLength] = [0, 0, 0, 0, 0, 0]
  const bands: Band[] = []
  const walls: Wall[] = []
  for (const part of parts) {
    A += part.A
    moment += part.A * part.y
    Iy += part.Iy
    Zy += part.Zy
    J += part.J
    massPerLength += part.massPerLength
    for (const band of part.bands) bands.push(band)
    const before = walls.length
    for (const wall of part.walls) walls.push(wall.from < 0 ? wall : { ...wall, from: wall.from + before })
  }
  const y = moment / A
  let Ix = 0
  for (const part of parts) Ix += part.Ix + part.A * (part.y - y) ** 2
  return { A, y, Ix, Iy, Zy, J, massPerLength, bands, walls }
}

/** A plate lying flat, middle on the plane of symmetry. J = b t^3/3 without end correction, as US practice adds plates up. */
export const flatPlate = (width: number, thickness: number, bottom: number): Part => {
  const y = bottom + thickness / 2
  return {
    ...rectangle(width, thickness, bottom),
    J: (width * thickness ** 3) / 3,
    walls: [
      { x1: 0, y1: y, x2: width / 2, y2: y, thickness, from: -1 },
      { x1: 0, y1: y, x2: -width / 2, y2: y, thickness, from: -1 },
    ],
  }
}

/** A plate standing in the plane of symmetry. */
export const standingPlate = (depth: number, thickness: number, bottom: number): Part => ({
  ...rectangle(thickness, depth, bottom),
  J: (depth * thickness ** 3) / 3,
  walls: [{ x1: 0, y1: bottom, x2: 0, y2: bottom + depth, thickness, from: -1 }],
})

const rectangle = (width: number, height: number, bottom: number): Omit<Part, 'J' | 'walls'> => ({
  A: width * height,
  y: bottom + height / 2,
  Ix: (width * height ** 3) / 12,
  Iy: (height * width ** 3) / 12,
  Zy: (height * width ** 2) / 4,
  massPerLength: STEEL_DENSITY * width * height,
  bands: [{ bottom, top: bottom + height, widthBottom: width, widthTop: width }],
})

/**
 * A rolled I standing on height 0. A handbook figure, where there is one, takes the place of what the drawing from dimensions gives.
 * The widths of its bands are scaled by the ratio of the handbook area to the drawn one (within 1 % of 1 for nearly all W shapes), so
 * that the plastic axis of a capped shape halves the area that is counted.
 */
export const rolledI = (shape: IShape): Part => {
  const drawn = drawnI(shape)
  const { A = drawn.A, Ix, Iy, Zy, J, massPerLength } = shape.figures
  const scale = A / drawn.A
  return {
    A,
    y: drawn.y,
    Ix: Ix ?? drawn.Ix,
    Iy: Iy ?? drawn.Iy,
    Zy: Zy ?? drawn.Zy,
    J: J ?? drawn.J,
    massPerLength: massPerLength ?? STEEL_DENSITY * A,
    bands: drawn.bands.map(({ bottom, top, widthBottom, widthTop }) => ({
      bottom,
      top,
      widthBottom: widthBottom * scale,
      widthTop: widthTop * scale,
    })),
    walls: drawn.walls,
  }
}

/** A rolled I from its dimensions alone: flanges, web and fillets. */
export const drawnI = (shape: IShape): Part => {
  const { d, tw } = shape
  const { tip, root } = flangeThickness(shape)
  const r = filletRadius(shape)
  const parts = [rolledFlange(shape, 0, 1), standingPlate(d - 2 * tip, tw, tip), rolledFlange(shape, d, -1)]
  if (r > 0) parts.push(fillets(r, tw / 2, root, 1), fillets(r, tw / 2, d - root, -1))
  return { ...join(parts), J: torsionOfI(shape, r) }
}

/**
 * A flange of a rolled I, growing up or down from its outer face: a plate, and for tapered flanges a wedge on either side of the web.
 * Its wall has the thickness that gives the flange's own moment of inertia about the vertical axis.
 */
export const rolledFlange = (shape: IShape, face: number, up: 1 | -1): Part => {
  const { bf, tw } = shape
  const { tip, root } = flangeThickness(shape)
  const plate = flatPlate(bf, tip, up === 1 ? face : face - tip)
  if (root === tip) return plate
  const flange = join([plate, wedges((bf - tw) / 2, root - tip, tw / 2, face + up * tip, up)])
  const thickness = (12 * flange.Iy) / bf ** 3
  return { ...flange, walls: plate.walls.map((wall) => ({ ...wall, y1: flange.y, y2: flange.y, thickness })) }
}

/**
 * Radius of the fillet, as published or from k, the distance of the web's toe from the outer face of the flange. Zero or less: none.
 */
export const filletRadius = (shape: IShape): number => shape.r ?? shape.k - flangeThickness(shape).root

/**
 * Thickness of a flange at its tip and at the web. The inner faces of S shapes slope by 1 in 6 (16 2/3 %, AISC Manual, part 1) about the
 * published thickness, which is that at the middle of the outstand; all other families are taken as parallel.
 */
const flangeThickness = ({ family, bf, tw, tf }: IShape): { readonly tip: number; readonly root: number } => {
  const rise = family === 'S' ? (bf - tw) / 2 / 6 : 0
  return { tip: tf - rise / 2, root: tf + rise / 2 }
}

/**
 * Fillets on either side of the web: corners between a quarter circle and its tangents. Area (1 - pi/4) r^2, centroid
 * (10 - 3 pi)/(12 - 3 pi) r from either tangent, second moment about a tangent (1 - 5 pi/16) r^4: exact.
 */
const fillets = (r: number, side: number, face: number, up: 1 | -1): Part => {
  const A = (1 - Math.PI / 4) * r * r
  const c = ((10 - 3 * Math.PI) / (12 - 3 * Math.PI)) * r
  const own = (1 - (5 * Math.PI) / 16) * r ** 4 - A * c * c
  return corners({ A, x: c, y: c, Ix: own, Iy: own }, side, face, up)
}

/** Wedges on either side of the web, thickest at the web. */
const wedges = (width: number, rise: number, side: number, face: number, up: 1 | -1): Part => {
  const own = { Ix: (width * rise ** 3) / 36, Iy: (rise * width ** 3) / 36 }
  return corners({ A: (width * rise) / 2, x: width / 3, y: rise / 3, ...own }, side, face, up)
}

/**
 * A pair of corner pieces given by area, centroid (from the vertical line at distance `side` from the plane of symmetry, and from
 * `face`, above or below it) and own moments of inertia. For the plastic axis each is a triangle of this area and height of centroid.
 */
const corners = (
  piece: { readonly A: number; readonly x: number; readonly y: number; readonly Ix: number; readonly Iy: number },
  side: number,
  face: number,
  up: 1 | -1,
): Part => {
  const A = 2 * piece.A
  const x = side + piece.x
  const height = 3 * piece.y
  const foot = (2 * A) / height
  return {
    A,
    y: face + up * piece.y,
    Ix: 2 * piece.Ix,
    Iy: 2 * piece.Iy + A * x * x,
    Zy: A * x,
    J: 0,
    massPerLength: STEEL_DENSITY * A,
    bands: [
      up === 1
        ? { bottom: face, top: face + height, widthBottom: foot, widthTop: 0 }
        : { bottom: face - height, top: face, widthBottom: 0, widthTop: foot },
    ],
    walls: [],
  }
}

/** Whether the torsion constant by dimensions counts the fillets: parallel flanges no thinner than the web. */
export const torsionFitHolds = (shape: IShape): boolean => {
  const { tip, root } = flangeThickness(shape)
  return tip === root && shape.tw <= shape.tf
}

/**
 * Torsion constant of a rolled I with parallel flanges, fillets counted: J = 2 bf tf^3/3 + (d - 2 tf) tw^3/3 + 2 alpha D^4 - 0.420 tf^4
 * with D the diameter of the circle inscribed in the joint. F. K. El Darwish and B. G. Johnston, Torsion of Structural Shapes, ASCE
 * Journal of the Structural Division 91 (1965); coefficients from memory, confirmed by the printed J of the W shapes (test/section).
 * Beyond the range of their fit the three rectangles alone are counted.
 */
const torsionOfI = (shape: IShape, r: number): number => {
  const { d, bf, tw, tf } = shape
  const rectangles = (2 * bf * tf ** 3 + (d - 2 * tf) * tw ** 3) / 3
  if (!torsionFitHolds(shape)) return rectangles
  const D = ((tf + r) ** 2 + tw * (r + tw / 4)) / (2 * r + tf)
  const [web, fillet] = [tw / tf, r / tf]
  const alpha = -0.042 + 0.2204 * web + 0.1355 * fillet - 0.0865 * web * fillet - 0.0725 * web * web
  return rectangles + 2 * alpha * D ** 4 - 0.42 * tf ** 4
}

/**
 * A channel lying on its legs, back up at height `top`; all figures are the handbook's. For the plastic axis the web is a rectangle and
 * the thickness of the two legs varies linearly such that area and centroid are the handbook's: slope and fillets are in it.
 */
export const channelLegsDown = (channel: Channel, top: number): Part => {
  const { d, bf, tw, tf, figures } = channel
  const leg = bf - tw
  const legs = figures.A - d * tw
  const mean = legs / leg
  const centroidBelowWeb = (figures.A * figures.xBar - (d * tw * tw) / 2) / legs - tw
  // Width of both legs at height s from their middle: mean + slope s; its first moment is slope leg^3/12.
  const half = (6 * legs * (leg / 2 - centroidBelowWeb)) / (leg * leg)
  const [line, side] = [top - tw / 2, (d - tf) / 2]
  return {
    A: figures.A,
    y: top - figures.xBar,
    Ix: figures.Iy,
    Iy: figures.Ix,
    Zy: figures.Zx,
    J: figures.J,
    massPerLength: figures.massPerLength,
    bands: [
      { bottom: top - tw, top, widthBottom: d, widthTop: d },
      { bottom: top - bf, top: top - tw, widthBottom: mean - half, widthTop: mean + half },
    ],
    walls: [
      { x1: 0, y1: line, x2: side, y2: line, thickness: tw, from: -1 },
      { x1: side, y1: line, x2: side, y2: top - bf, thickness: tf, from: 0 },
      { x1: 0, y1: line, x2: -side, y2: line, thickness: tw, from: -1 },
      { x1: -side, y1: line, x2: -side, y2: top - bf, thickness: tf, from: 2 },
    ],
  }
}
