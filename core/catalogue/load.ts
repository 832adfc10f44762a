/** The catalogue of rolled shapes, rails and steels, from the tables in resources/ (each names its source), in SI. */
import railTable from '../../resources/rails.json' with { type: 'json' }
import usC from '../../resources/sections/us-c.json' with { type: 'json' }
import usHp from '../../resources/sections/us-hp.json' with { type: 'json' }
import usMc from '../../resources/sections/us-mc.json' with { type: 'json' }
import usS from '../../resources/sections/us-s.json' with { type: 'json' }
import usW from '../../resources/sections/us-w.json' with { type: 'json' }
import steelTable from '../../resources/steels.json' with { type: 'json' }
import { as, type Kind, type KindValue } from '../quantity/kinds.ts'
import { UNIT, fromUnit, type Unit } from '../quantity/units.ts'
import { nearestNames, railKey, shapeKey, steelKey } from './name.ts'
import type { Catalogue, Channel, IShape, Rail, Steel } from './types.ts'

/** Everything that can be looked up by name. Tables are turned into SI at first use. */
export const catalogue: Catalogue = {
  get iShapes() {
    return iShapes().all
  },
  get channels() {
    return channels().all
  },
  get rails() {
    return rails().all
  },
  get steels() {
    return steels().all
  },
  iShape: (name) => iShapes().find(name),
  channel: (name) => channels().find(name),
  rail: (name) => rails().find(name),
  steel: (name) => steels().find(name),
  nearest: (family, name) => FAMILY[family]().nearest(name),
}

const iShapes = once(() =>
  index(
    [usW, usS, usHp].flatMap((table) => sectionRows(table).map(iShape)),
    shapeKey,
  ),
)
const channels = once(() =>
  index(
    [usC, usMc].flatMap((table) => sectionRows(table).map(channel)),
    shapeKey,
  ),
)
const rails = once(() => index(railTable.rails.map(rail), railKey))
const steels = once(() => index(steelTable.steels.map(steel), steelKey))
const FAMILY = { iShape: iShapes, channel: channels, rail: rails, steel: steels }

interface SectionTable {
  readonly family: string
  readonly source: string
  readonly units: Readonly<Record<string, string>>
  readonly columns: readonly string[]
  readonly rows: readonly (readonly (string | number)[])[]
}

/** One line of a section table: its figures by column, in SI. */
interface SectionRow {
  readonly name: string
  readonly family: string
  readonly source: string
  readonly figure: <K extends Kind>(column: string, kind: K) => KindValue[K]
}

function sectionRows(table: SectionTable): SectionRow[] {
  const { family, source, units, columns } = table
  const places = new Map(columns.map((column, place) => [column, place]))
  return table.rows.map((row) => ({
    name: String(row[places.get('name') ?? 0]),
    family,
    source,
    figure: (column, kind) => as(kind, inSI(row[places.get(column) ?? -1], units[column])),
  }))
}

/** A published figure in SI. Throws where the table lacks the figure or its unit. */
function inSI(figure: string | number | undefined, unit: string | undefined): number {
  if (typeof figure !== 'number' || unit === undefined || !(unit in UNIT)) {
    throw new Error(`a table has ${String(figure)} ${String(unit)}`)
  }
  return fromUnit(figure, unit as Unit)
}

const common = ({ name, family, source, figure }: SectionRow) => ({
  name,
  family,
  source,
  d: figure('d', 'length'),
  bf: figure('bf', 'length'),
  tw: figure('tw', 'length'),
  tf: figure('tf', 'length'),
  k: figure('k', 'length'),
})

const properties = ({ figure }: SectionRow) => ({
  A: figure('A', 'area'),
  Ix: figure('Ix', 'inertia'),
  Sx: figure('Sx', 'modulus'),
  Zx: figure('Zx', 'modulus'),
  Iy: figure('Iy', 'inertia'),
  Sy: figure('Sy', 'modulus'),
  Zy: figure('Zy', 'modulus'),
  J: figure('J', 'inertia'),
  Cw: figure('Cw', 'warping'),
  massPerLength: figure('weight', 'lineMass'),
})

const iShape = (row: SectionRow): IShape => ({
  ...common(row),
  figures: { ...properties(row), rts: row.figure('rts', 'length'), ho: row.figure('ho', 'length') },
})

const channel = (row: SectionRow): Channel => ({
  ...common(row),
  figures: { ...properties(row), xBar: row.figure('xBar', 'length'), eo: row.figure('eo', 'length') },
})

const rail = (row: (typeof railTable.rails)[number]): Rail => ({
  name: row.name,
  source: `published rail dimensions; from memory of AISC Manual Table 1-21, to 1 %: ${row.fromMemory.join(', ')}`,
  height: as('length', inSI(row.height, railTable.units.height)),
  headWidth: as('length', inSI(row.headWidth, railTable.units.headWidth)),
  footWidth: as('length', inSI(row.footWidth, railTable.units.footWidth)),
  massPerLength: as('lineMass', inSI(row.weight, railTable.units.weight)),
  Ix: as('inertia', inSI(row.Ix, railTable.units.Ix)),
})

const steel = (row: (typeof steelTable.steels)[number]): Steel => ({
  name: row.name,
  source: row.source,
  steps: row.steps.map((step) => ({
    ...('upTo' in step ? { upTo: as('length', inSI(step.upTo, steelTable.units.upTo)) } : {}),
    fy: as('stress', inSI(step.fy, steelTable.units.fy)),
    fu: as('stress', inSI(step.fu, steelTable.units.fu)),
  })),
})

function index<T extends { readonly name: string }>(all: readonly T[], key: (name: string) => string) {
  const byKey = new Map(all.map((each) => [key(each.name), each]))
  const names = all.map((each) => each.name)
  return {
    all,
    find: (name: string): T | undefined => byKey.get(key(name)),
    nearest: (name: string) => nearestNames(names, name, key),
  }
}

function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | undefined
  return () => (made ??= { value: make() }).value
}
