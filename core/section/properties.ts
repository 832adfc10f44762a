/** A make-up as parts, and the properties that the checks read from them. */
import type { IShape } from '../catalogue/types.ts'
import type { Cap, SectionEntry } from '../job/types.ts'
import { as } from '../quantity/kinds.ts'
import { channelLegsDown, flatPlate, join, rolledFlange, rolledI, standingPlate, type Part } from './parts.ts'
import { plasticAxis } from './plastic.ts'
import { sectorialOf } from './sectorial.ts'
import type { FlangeSystem, Section } from './types.ts'

/**
 * Properties of a make-up, SI, the girder standing with its cap and rail on top.
 *
 * - Handbook figures win for a rolled shape and for a channel; dimensions give what is not printed. A capped shape sums them.
 * - The channel lies legs down with its web on the top flange, so that its back is the new top face.
 * - Plates weigh 7850 kg/m3. J is the sum over the parts (F4 asks no more); contact between flange and cap is not counted.
 * - Shear centre and C_w of what is not a rolled shape alone come from sectorial coordinates on the middle lines: exact for the
 *   thin-walled tree in which flange and cap each bend in their own plane about the girder's plane of symmetry.
 * - h, h_c, h_p as in AISC 360-22, B4.1b: rolled webs less k, also under a cap; welded webs between the flanges' inside faces, the
 *   weld's leg left out. h_p = 0 where the plastic axis lies at or above the web's toe (commentary F4); so is h_c with the centroid.
 * - r_t is F4-11 (F4.2(c)(7)(i)); with a cap it is that of flange, cap and a third of the web between centroid and flange (ii).
 *
 * Valid for an entry without a refusal of `sectionFindings`; it raises nothing.
 */
export function sectionOf(entry: SectionEntry): Section {
  const girder = entry.kind === 'rolled' ? rolledGirder(entry.shape) : platedGirder(entry)
  const { d, tw, topFlange, bottomFlange } = girder
  const capThickness = entry.cap === undefined ? 0 : thicknessOf(entry.cap)
  const depth = d + capThickness
  const cap = entry.cap === undefined ? undefined : capPart(entry.cap, d)
  const whole = cap === undefined ? girder.part : join([girder.part, cap])
  // A rolled shape alone keeps the handbook's rounding in its moduli too.
  const printed = entry.kind === 'rolled' && cap === undefined ? entry.shape.figures : {}
  const doublySymmetric =
    cap === undefined && topFlange.width === bottomFlange.width && topFlange.thickness === bottomFlange.thickness

  const plastic = plasticAxis(whole.bands)
  const warping = sectorialOf(whole.walls)
  const { A, y: yBar, Ix, Iy } = whole
  const Cw = printed.Cw ?? warping.Cw
  const SxTop = printed.Sx ?? Ix / (depth - yBar)
  const capWidth = entry.cap === undefined ? 0 : widthOf(entry.cap)
  const topPart = cap === undefined ? girder.topPart : join([girder.topPart, cap])
  const top = flangeSystem(topPart, Math.max(topFlange.width, capWidth))
  const bottom = flangeSystem(girder.bottomPart, bottomFlange.width)
  const toe = d - topFlange.k
  const hc = Math.max(0, 2 * (toe - yBar))
  const aw = (hc * tw) / top.A
  const webInCompression = Math.max(0, d - topFlange.thickness - yBar) * tw

  return {
    makeUp: entry.kind === 'plated' ? 'plated' : entry.cap === undefined ? 'rolled' : 'capped',
    doublySymmetric,
    A: as('area', A),
    depth: as('length', depth),
    yBar: as('length', yBar),
    Ix: as('inertia', Ix),
    Iy: as('inertia', Iy),
    SxTop: as('modulus', SxTop),
    SxBottom: as('modulus', printed.Sx ?? Ix / yBar),
    Sy: as('modulus', printed.Sy ?? (2 * Iy) / Math.max(top.width, bottom.width)),
    yPlastic: as('length', doublySymmetric ? yBar : plastic.height),
    Zx: as('modulus', printed.Zx ?? plastic.Z),
    Zy: as('modulus', whole.Zy),
    J: as('inertia', whole.J),
    Cw: as('warping', Cw),
    rx: as('length', Math.sqrt(Ix / A)),
    ry: as('length', Math.sqrt(Iy / A)),
    yShear: as('length', doublySymmetric ? yBar : warping.yShear),
    massPerLength: as('lineMass', whole.massPerLength),
    d: as('length', d),
    tw: as('length', tw),
    h: as('length', d - topFlange.k - bottomFlange.k),
    topFlange,
    bottomFlange,
    cap: {
      thickness: as('length', capThickness),
      slenderness: entry.cap === undefined ? 0 : betweenWelds(entry.cap, topFlange.width) / capThickness,
    },
    ho: printed.ho ?? as('length', top.height - bottom.height),
    rts: printed.rts ?? as('length', Math.sqrt(Math.sqrt(Iy * Cw) / SxTop)),
    hc: as('length', hc),
    hp: as('length', Math.max(0, 2 * (toe - (doublySymmetric ? yBar : plastic.height)))),
    aw,
    // F4-11 leaves the web's own inertia about the vertical axis out; so does the form with a cap here.
    rt: as(
      'length',
      cap === undefined ? topFlange.width / Math.sqrt(12 * (1 + aw / 6)) : rtCapped(top, webInCompression),
    ),
    Iyc: top.I,
    Iyt: bottom.I,
    top,
    bottom,
  }
}

/** The I without its cap; `topPart` and `bottomPart` are its flanges alone, without web and fillets. */
interface Girder {
  readonly part: Part
  readonly topPart: Part
  readonly bottomPart: Part
  readonly d: number
  readonly tw: number
  readonly topFlange: Section['topFlange']
  readonly bottomFlange: Section['bottomFlange']
}

function rolledGirder(shape: IShape): Girder {
  const { d, tw } = shape
  const flange = { width: shape.bf, thickness: shape.tf, k: shape.k }
  const [topPart, bottomPart] = [rolledFlange(shape, d, -1), rolledFlange(shape, 0, 1)]
  return { part: rolledI(shape), topPart, bottomPart, d, tw, topFlange: flange, bottomFlange: flange }
}

function platedGirder({ topFlange, web, bottomFlange }: Extract<SectionEntry, { kind: 'plated' }>): Girder {
  const underside = bottomFlange.thickness + web.depth
  const topPart = flatPlate(topFlange.width, topFlange.thickness, underside)
  const bottomPart = flatPlate(bottomFlange.width, bottomFlange.thickness, 0)
  return {
    part: join([bottomPart, standingPlate(web.depth, web.thickness, bottomFlange.thickness), topPart]),
    topPart,
    bottomPart,
    d: underside + topFlange.thickness,
    tw: web.thickness,
    topFlange: { ...topFlange, k: topFlange.thickness },
    bottomFlange: { ...bottomFlange, k: bottomFlange.thickness },
  }
}

function capPart(cap: Cap, seat: number): Part {
  return cap.kind === 'plate'
    ? flatPlate(cap.plate.width, cap.plate.thickness, seat)
    : channelLegsDown(cap.channel, seat + cap.channel.tw)
}

const thicknessOf = (cap: Cap): number => (cap.kind === 'plate' ? cap.plate.thickness : cap.channel.tw)

const widthOf = (cap: Cap): number => (cap.kind === 'plate' ? cap.plate.width : cap.channel.d)

/** Width of the cap between the two welds along the flange's edges, or along its own where it is narrower. */
const betweenWelds = (cap: Cap, flangeWidth: number): number => Math.min(widthOf(cap), flangeWidth)

/** A flange, with the cap if there is one, about the vertical axis. */
const flangeSystem = ({ A, y, Iy, Zy }: Part, width: number): FlangeSystem => ({
  A: as('area', A),
  height: as('length', y),
  I: as('inertia', Iy),
  S: as('modulus', (2 * Iy) / width),
  Z: as('modulus', Zy),
  width: as('length', width),
})

const rtCapped = (top: FlangeSystem, webInCompression: number): number =>
  Math.sqrt(top.I / (top.A + webInCompression / 3))
