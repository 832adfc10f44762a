/** W shapes with a channel cap, against properties summed by hand from the handbook figures of the two shapes. */
import { catalogue } from '../catalogue/load.ts'
import { UNIT, type Unit } from '../quantity/units.ts'
import { sectionOf } from '../section/properties.ts'
import type { Section } from '../section/types.ts'
import type { EvidenceCase } from './types.ts'

function capped(shape: string, channel: string): Section {
  return sectionOf({
    kind: 'rolled',
    shape: catalogue.iShape(shape)!,
    cap: { kind: 'channel', channel: catalogue.channel(channel)! },
  })
}

const FIGURES = [
  { name: 'A', unit: 'in2', tolerance: 0.002, of: (s: Section) => s.A },
  { name: 'yBar', unit: 'in', tolerance: 0.002, of: (s: Section) => s.yBar },
  { name: 'Ix', unit: 'in4', tolerance: 0.005, of: (s: Section) => s.Ix },
  { name: 'Sx bottom', unit: 'in3', tolerance: 0.005, of: (s: Section) => s.SxBottom },
  { name: 'Sx top', unit: 'in3', tolerance: 0.007, of: (s: Section) => s.SxTop },
  { name: 'Iy', unit: 'in4', tolerance: 0.003, of: (s: Section) => s.Iy },
  { name: 'I of the top flange system', unit: 'in4', tolerance: 0.003, of: (s: Section) => s.top.I },
  { name: 'Z of the top flange system', unit: 'in3', tolerance: 0.005, of: (s: Section) => s.top.Z },
  { name: 'rt', unit: 'in', tolerance: 0.005, of: (s: Section) => s.rt },
] as const satisfies readonly { name: string; unit: Unit; tolerance: number; of: (section: Section) => number }[]

const ROWS: readonly (readonly [shape: string, channel: string, ...printed: number[]])[] = [
  ['W18X50', 'C12X20.7', 20.78, 11.512, 1120.8, 97.4, 165.5, 169, 149.0, 33.6, 3.672],
  ['W21X62', 'C12X20.7', 24.38, 13.015, 1797.9, 138.1, 217.5, 186, 157.7, 36.0, 3.605],
  ['W24X76', 'C12X20.7', 28.48, 14.412, 2740.0, 190.1, 280.5, 212, 170.2, 39.3, 3.552],
  ['W24X84', 'C15X33.9', 34.7, 15.411, 3346.2, 217.1, 368.1, 409, 362.1, 66.5, 4.462],
  ['W27X84', 'C15X33.9', 34.7, 17.085, 4054.0, 237.3, 404.8, 421, 368.3, 66.8, 4.552],
  ['W30X116', 'C15X33.9', 44.2, 18.306, 6590.1, 360.0, 544.9, 479, 397.0, 74.2, 4.351],
  ['W36X150', 'C15X33.9', 54.3, 21.184, 11564.3, 545.9, 765.1, 585, 450.4, 84.6, 4.318],
]

const byHand = ROWS.flatMap(([shape, channel, ...printed]) =>
  FIGURES.map(({ name, unit, tolerance, of }, index): EvidenceCase => ({
    id: `${shape}+${channel} ${name}`,
    what: `${name} of ${shape} with ${channel}`,
    source: 'sums over the handbook figures of both shapes (AISC Shapes Database v16), by hand',
    known: 'arithmetic from the source’s inputs',
    printed: printed[index]!,
    unit,
    tolerance: tolerance * printed[index]!,
    why: 'rounding of the handbook figures of both shapes',
    compute: () => of(capped(shape, channel)) / UNIT[unit],
  })),
)

const manual = 'AISC Manual, Table 1-19, W27X84 with C15X33.9'
const published: readonly (readonly [what: string, printed: number, unit: Unit, of: (section: Section) => number])[] = [
  ['Ix', 4050, 'in4', (s) => s.Ix],
  ['S1 (bottom)', 237, 'in3', (s) => s.SxBottom],
  ['S2 (top)', 403, 'in3', (s) => s.SxTop],
  ['Iy', 420, 'in4', (s) => s.Iy],
]

export const CAPPED_SECTIONS: readonly EvidenceCase[] = [
  ...byHand,
  ...published.map(([what, printed, unit, of]): EvidenceCase => ({
    id: `table-1-19 ${what}`,
    what: `${what} of W27X84 with C15X33.9`,
    source: manual,
    known: 'from memory',
    printed,
    unit,
    tolerance: 0.005 * printed,
    why: 'three digits, of shapes whose own figures have three digits',
    compute: () => of(capped('W27X84', 'C15X33.9')) / UNIT[unit],
  })),
  {
    id: 'rt W30X116',
    what: 'rt of W30X116 with C15X33.9',
    source: 'AISC Manual, 9th ed. (1989), table of W shapes with channels, quoted in a public thread',
    known: 'read',
    printed: 4.34,
    unit: 'in',
    tolerance: 0.015,
    why: 'the older edition’s shapes differ slightly in area and fillet',
    compute: () => capped('W30X116', 'C15X33.9').rt / UNIT.in,
  },
]
