/** What cannot be, or is hardly meant, in a make-up whose entries each lie within their own limits. */
import type { Channel, IShape } from '../catalogue/types.ts'
import type { Plate, SectionEntry } from '../job/types.ts'
import { as, type Kind, type UnitSystem } from '../quantity/kinds.ts'
import { writeNumber, writeQuantity } from '../quantity/write.ts'
import { drawnI, filletRadius, torsionFitHolds } from './parts.ts'
import { plasticAxis } from './plastic.ts'

/** A make-up with a refusal has no properties worth computing; a caution is told beside the result. */
export interface SectionFinding {
  readonly level: 'refused' | 'caution'
  readonly path: string
  readonly read: string
  readonly message: string
}

/**
 * Figures may differ by this much from the dimensions, far beyond three printed digits; J by more, since the fillets, whose radius is
 * seldom printed, carry up to a fifth of it.
 */
const [FIGURE_TOLERANCE, J_TOLERANCE] = [0.05, 0.2]

/**
 * A cap wider than its flange is looked at where its edge stands out by more than 0.38 sqrt(E/F_y) thicknesses, the compact limit of
 * AISC 360-22, table B4.1b, case 10, taken at the highest strength usual here, 345 MPa (50 ksi).
 */
const COMPACT_OUTSTAND = 0.38 * Math.sqrt(199_948 / 344.7)

/** Room beside a cap's edge for the fillet weld that holds it: 8 mm (5/16 in), common practice. */
const WELD_ROOM = 0.008

/**
 * Everything wrong with a make-up, at once, refusals and cautions; empty where there is nothing to say.
 * Lengths are written in the units of the job. `read` is the value as understood.
 */
export function sectionFindings(entry: SectionEntry, units: UnitSystem): SectionFinding[] {
  const say = sayIn(units)
  const flange = entry.kind === 'rolled' ? entry.shape.bf : entry.topFlange.width
  const found = entry.kind === 'rolled' ? ofShape(entry.shape, say) : ofPlates(entry, say)
  if (entry.cap === undefined) return found
  return found.concat(
    entry.cap.kind === 'plate'
      ? ofPlateCap(entry.cap.plate, flange, say)
      : ofChannelCap(entry.cap.channel, flange, say),
  )
}

const AT = 'girder.section'

type Say = ReturnType<typeof sayIn>

/** Makers of findings and the text of a length in the job's units. */
const sayIn = (units: UnitSystem) => {
  const length = (metres: number): string => writeQuantity({ kind: 'length', value: as('length', metres) }, units)
  const finding =
    (level: SectionFinding['level']) =>
    (path: string, read: number, message: string): SectionFinding => ({
      level,
      path: `${AT}.${path}`,
      read: length(read),
      message,
    })
  return { units, length, refused: finding('refused'), caution: finding('caution') }
}

function ofShape(shape: IShape, say: Say): SectionFinding[] {
  const { d, bf, tw, tf, k } = shape
  const found: SectionFinding[] = []
  if (tw >= bf)
    found.push(say.refused('shape.tw', tw, `the web must be thinner than its flange is wide (${say.length(bf)})`))
  if (2 * tf >= d)
    found.push(say.refused('shape.tf', tf, `the flanges must be thinner than half the depth (${say.length(d / 2)})`))
  if (found.length > 0) return found

  const r = filletRadius(shape)
  if (k > d / 2) {
    const most = say.length(d / 2 - tf)
    found.push(say.refused('shape.r', r, `the fillets of the two flanges must not meet: at most ${most} between them`))
  } else if (r > (bf - tw) / 2) {
    found.push(say.refused('shape.r', r, `the fillet must lie under the flange: at most ${say.length((bf - tw) / 2)}`))
  }
  return found.length > 0 ? found : figuresApart(shape, say.units)
}

/** Printed or entered figures against those of the dimensions. */
function figuresApart(shape: IShape, units: UnitSystem): SectionFinding[] {
  const drawn = drawnI(shape)
  const ho = shape.d - shape.tf
  const compared = [
    ['A', 'area', drawn.A],
    ['Ix', 'inertia', drawn.Ix],
    ['Sx', 'modulus', (2 * drawn.Ix) / shape.d],
    ['Zx', 'modulus', plasticAxis(drawn.bands).Z],
    ['Iy', 'inertia', drawn.Iy],
    ['Sy', 'modulus', (2 * drawn.Iy) / shape.bf],
    ['Zy', 'modulus', drawn.Zy],
    ['J', 'inertia', torsionFitHolds(shape) ? drawn.J : undefined],
    ['Cw', 'warping', (drawn.Iy * ho ** 2) / 4],
    ['rts', 'length', Math.sqrt((drawn.Iy * ho * shape.d) / (4 * drawn.Ix))],
    ['ho', 'length', ho],
    ['massPerLength', 'lineMass', drawn.massPerLength],
  ] as const
  const found: SectionFinding[] = []
  for (const [name, kind, byDimensions] of compared) {
    const figure = shape.figures[name]
    if (figure === undefined || byDimensions === undefined) continue
    if (Math.abs(figure / byDimensions - 1) <= (name === 'J' ? J_TOLERANCE : FIGURE_TOLERANCE)) continue
    const apart = writeNumber(100 * (figure / byDimensions - 1), 2)
    found.push({
      level: 'caution',
      path: `${AT}.shape.${name}`,
      read: write(kind, figure, units),
      message: `differs by ${apart} % from ${write(kind, byDimensions, units)} by the dimensions; the figure given is used`,
    })
  }
  return found
}

const write = (kind: Kind, si: number, units: UnitSystem): string => writeQuantity({ kind, value: as(kind, si) }, units)

function ofPlates(entry: Extract<SectionEntry, { kind: 'plated' }>, say: Say): SectionFinding[] {
  const found: SectionFinding[] = []
  const narrower = Math.min(entry.topFlange.width, entry.bottomFlange.width)
  const { thickness } = entry.web
  if (thickness >= narrower) {
    found.push(
      say.refused(
        'web.thickness',
        thickness,
        `the web must be thinner than the flanges are wide (${say.length(narrower)})`,
      ),
    )
  }
  for (const name of ['topFlange', 'bottomFlange'] as const) {
    const flange = entry[name]
    if (flange.thickness > flange.width) {
      const message = `a flange must not be thicker than it is wide (${say.length(flange.width)})`
      found.push(say.refused(`${name}.thickness`, flange.thickness, message))
    }
  }
  return found
}

function ofPlateCap({ width, thickness }: Plate, flange: number, say: Say): SectionFinding[] {
  const found: SectionFinding[] = []
  const path = 'cap.plate.width'
  if (thickness > width) {
    const message = `a cap plate must not be thicker than it is wide (${say.length(width)})`
    found.push(say.refused('cap.plate.thickness', thickness, message))
  }
  const ledge = Math.abs(width - flange) / 2
  if (width < flange / 2) {
    found.push(
      say.refused(path, width, `a cap plate is at least half as wide as its flange: ${say.length(flange / 2)} or more`),
    )
  } else if (width > 3 * flange) {
    found.push(
      say.refused(
        path,
        width,
        `a cap plate is at most three times as wide as its flange: ${say.length(3 * flange)} or less`,
      ),
    )
  } else if (ledge < WELD_ROOM) {
    const [less, more] = [say.length(flange - 2 * WELD_ROOM), say.length(flange + 2 * WELD_ROOM)]
    found.push(
      say.caution(path, width, `no room for a fillet weld along the edges: at most ${less} or at least ${more}`),
    )
  } else if (width > flange && ledge > COMPACT_OUTSTAND * thickness) {
    const slenderness = writeNumber(ledge / thickness, 3)
    const message = `stands out by ${say.length(ledge)} on either side, ${slenderness} times its thickness: not checked for local buckling`
    found.push(say.caution(path, width, message))
  }
  return found
}

function ofChannelCap({ d, tf }: Channel, flange: number, say: Say): SectionFinding[] {
  const inside = d - 2 * tf
  if (inside >= flange) return []
  const message = `the legs do not pass the flange: ${say.length(flange)} wide, the channel ${say.length(inside)} between its legs`
  return [say.refused('cap.shape', d, `${message}; take a deeper channel or a narrower flange`)]
}
