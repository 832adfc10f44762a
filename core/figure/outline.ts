/** Outlines of a make-up's parts as polygons: metres, x from the plane of symmetry, heights up from the bottom face. */
import type { Channel, IShape } from '../catalogue/types.ts'
import type { Cap, SectionEntry } from '../job/types.ts'
import { channelLegsDown, filletRadius, rolledFlange } from '../section/parts.ts'
import type { Point } from './types.ts'

export interface Outline {
  readonly part: 'girder' | 'topFlange' | 'web' | 'bottomFlange' | 'cap'
  readonly points: readonly Point[]
}

/** A rolled shape is one outline, fillets and sloping flanges included; plates and caps are each their own. */
export const outlinesOf = (entry: SectionEntry): readonly Outline[] => {
  if (entry.kind === 'rolled') {
    const { shape, cap } = entry
    return [{ part: 'girder', points: shapeOutline(shape) }, ...capOutline(cap, shape.d)]
  }
  const { topFlange, web, bottomFlange, cap } = entry
  const underside = bottomFlange.thickness + web.depth
  const top = underside + topFlange.thickness
  return [
    { part: 'bottomFlange', points: rectangle(bottomFlange.width, 0, bottomFlange.thickness) },
    { part: 'web', points: rectangle(web.thickness, bottomFlange.thickness, underside) },
    { part: 'topFlange', points: rectangle(topFlange.width, underside, top) },
    ...capOutline(cap, top),
  ]
}

/**
 * A rail from its three measures, standing on a height; the profile between foot and head is a sign of one, not that of the maker.
 */
export const railOutline = (
  rail: { readonly height: number; readonly headWidth: number; readonly footWidth: number },
  seat: number,
): readonly Point[] => {
  const { height, headWidth, footWidth } = rail
  const web = Math.min(headWidth, footWidth) / 4
  return mirrored([
    [footWidth / 2, seat],
    [footWidth / 2, seat + 0.08 * height],
    [web / 2, seat + 0.22 * height],
    [web / 2, seat + 0.66 * height],
    [headWidth / 2, seat + 0.74 * height],
    [headWidth / 2, seat + 0.96 * height],
    [0.45 * headWidth, seat + height],
  ])
}

const shapeOutline = (shape: IShape): readonly Point[] => {
  const { d, bf, tw } = shape
  const [plate, wedge] = rolledFlange(shape, 0, 1).bands
  const tip = plate!.top
  const root = wedge?.top ?? tip
  const outstand = (bf - tw) / 2
  const r = Math.min(Math.max(filletRadius(shape), 0), outstand, d / 2 - root)
  const face = root - (root - tip) * (r / outstand)
  const arc = Array.from({ length: ARC - 1 }, (_, i): Point => {
    const angle = ((i + 1) / ARC) * (Math.PI / 2)
    return [tw / 2 + r * (1 - Math.sin(angle)), face + (root + r - face) * (1 - Math.cos(angle))]
  })
  const lower: readonly Point[] = [[bf / 2, 0], [bf / 2, tip], [tw / 2 + r, face], ...arc, [tw / 2, root + r]]
  return mirrored([...lower, ...[...lower].reverse().map(([x, y]): Point => [x, d - y])])
}

/** Chords that a fillet is drawn with. */
const ARC = 6

const capOutline = (cap: Cap | undefined, seat: number): readonly Outline[] => {
  if (cap === undefined) return []
  const points =
    cap.kind === 'plate'
      ? rectangle(cap.plate.width, seat, seat + cap.plate.thickness)
      : channelOutline(cap.channel, seat + cap.channel.tw)
  return [{ part: 'cap', points }]
}

/** Legs down, each as thick at toe and root as its area and centroid ask (core/section/parts.ts). */
const channelOutline = (channel: Channel, top: number): readonly Point[] => {
  const { d, bf, tw } = channel
  const legs = channelLegsDown(channel, top).bands[1]!
  const inner: readonly Point[] = [
    [d / 2 - legs.widthTop / 2, top - tw],
    [d / 2 - legs.widthBottom / 2, top - bf],
  ]
  const right: readonly Point[] = [...inner, [d / 2, top - bf], [d / 2, top]]
  return mirrored(right)
}

const rectangle = (width: number, bottom: number, top: number): readonly Point[] =>
  mirrored([
    [width / 2, bottom],
    [width / 2, top],
  ])

/** The right half, from below upward, with its mirror image. */
const mirrored = (right: readonly Point[]): readonly Point[] => [
  ...right,
  ...[...right].reverse().map(([x, y]): Point => [-x, y]),
]
