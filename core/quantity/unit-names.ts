/** Which units each kind takes, and how units are spelled. */
import { DIMENSIONS, type Kind } from './kinds.ts'
import { UNIT, type Unit } from './units.ts'

const force = ['kip', 'lbf', 'kN', 'N', 'MN', 'kgf', 'tf'] as const
const length = ['in', 'ft', 'yd', 'mm', 'cm', 'm'] as const
const mass = ['lb', 'ton', 'kg', 't'] as const
const lineMass = ['lb/ft', 'lb/yd', 'kg/m'] as const

/**
 * The units each kind is read in, those of the trade first. Where a force is wanted "lb" is the pound-force; where force or
 * mass is taken, or a force per length, a mass counts as its weight under standard gravity.
 */
export const UNITS_OF = {
  ratio: ['', '%'],
  length,
  distance: length,
  area: ['in2', 'mm2', 'cm2', 'm2'],
  modulus: ['in3', 'mm3', 'cm3', 'm3'],
  inertia: ['in4', 'mm4', 'cm4', 'm4'],
  warping: ['in6', 'mm6', 'cm6', 'dm6', 'm6'],
  force: [...force, 'lb'],
  moment: ['kip ft', 'kip in', 'lbf ft', 'lbf in', 'kN m', 'N m', 'MN m', 'kN cm', 'N mm'],
  stress: ['ksi', 'psi', 'MPa', 'N/mm2', 'kN/cm2', 'GPa', 'kPa', 'Pa'],
  lineLoad: ['kip/ft', 'kip/in', 'lbf/ft', 'lbf/in', 'kN/m', 'N/m', 'N/mm', ...lineMass],
  mass,
  lineMass,
  speed: ['ft/min', 'ft/s', 'm/min', 'm/s'],
  flexuralStiffness: ['kip in2', 'kip ft2', 'kN m2', 'N m2', 'N mm2'],
  forceOrMass: [...force, ...mass],
} as const satisfies Record<Kind | 'forceOrMass', readonly Unit[]> as Record<Kind | 'forceOrMass', readonly Unit[]>

/** The unit of SI for each kind: what a plain number means. */
export const SI_UNIT: Record<Kind, Unit> = {
  ratio: '',
  length: 'm',
  distance: 'm',
  area: 'm2',
  modulus: 'm3',
  inertia: 'm4',
  warping: 'm6',
  force: 'N',
  moment: 'N m',
  stress: 'Pa',
  lineLoad: 'N/m',
  mass: 'kg',
  lineMass: 'kg/m',
  speed: 'm/s',
  flexuralStiffness: 'N m2',
}

/**
 * The unit spelled by `text` ("kips", "kip-ft", "ft-k", "lb/in^2", "kN*m", "SQ IN"), or undefined. Capitals do not matter
 * where they cannot change the meaning: "mN", "Mm" and a lone "T" are not read.
 */
export function findUnit(text: string): Unit | undefined {
  const joined = text
    .replace(/\^|\./g, '')
    .trim()
    .replace(/ ?\/ ?/g, '/')
    .replace(/[-·* ]+/g, ' ')
  const direct = joined.replace(/[A-Za-z]+/g, (word) => ATOM.get(word) ?? atomInOtherCase(word) ?? `?${word}`)
  if (direct === '%' || direct in UNIT) return direct as Unit
  return SAME_AS.get(direct)
}

/** The kind a unit measures; a mass is a mass here, whatever it may be read as. */
export const kindOf = (unit: Unit): Kind => KIND_OF.get(unit) ?? 'ratio'

function atomInOtherCase(word: string): string | undefined {
  const lower = word.toLowerCase()
  const plain = word === lower || word === word.toUpperCase() || (word.length > 2 && word.slice(1) === lower.slice(1))
  return plain && lower !== 't' && lower !== 'mn' ? ATOM_IN_LOWER_CASE.get(lower) : undefined
}

/** Unit -> its spellings. */
const SPELLINGS: Record<string, string> = {
  m: 'm metre metres meter meters',
  cm: 'cm centimetre centimetres centimeter centimeters',
  mm: 'mm millimetre millimetres millimeter millimeters',
  dm: 'dm',
  in: 'in inch inches',
  ft: 'ft foot feet',
  yd: 'yd yds yard yards',
  N: 'N newton newtons',
  kN: 'kN kilonewton kilonewtons',
  MN: 'MN meganewton meganewtons',
  kgf: 'kgf',
  tf: 'tf',
  lbf: 'lbf lbsf',
  kip: 'kip kips k kipf',
  kg: 'kg kgs kilogram kilograms',
  t: 't tonne tonnes',
  ton: 'ton tons',
  lb: 'lb lbs lbm pound pounds',
  Pa: 'Pa',
  kPa: 'kPa',
  MPa: 'MPa',
  GPa: 'GPa',
  psi: 'psi',
  ksi: 'ksi',
  s: 's sec second seconds',
  min: 'min minute minutes',
  plf: 'plf',
  klf: 'klf',
  fpm: 'fpm',
  fps: 'fps',
  sq: 'sq square',
  cu: 'cu cubic',
  metric: 'metric',
  short: 'short',
  percent: 'percent',
  kNm: 'kNm',
  Nm: 'Nm',
  Nmm: 'Nmm',
  kNcm: 'kNcm',
}

const ATOM = new Map(
  Object.entries(SPELLINGS).flatMap(([atom, spellings]) => spellings.split(' ').map((word) => [word, atom] as const)),
)
const ATOM_IN_LOWER_CASE = new Map([...ATOM].map(([word, atom]) => [word.toLowerCase(), atom] as const))

/** Other names of units, and other orders of their factors. */
const SAME_AS = new Map<string, Unit>([
  ['percent', '%'],
  ['plf', 'lbf/ft'],
  ['klf', 'kip/ft'],
  ['fpm', 'ft/min'],
  ['fps', 'ft/s'],
  ['sq in', 'in2'],
  ['sq mm', 'mm2'],
  ['sq cm', 'cm2'],
  ['sq m', 'm2'],
  ['cu in', 'in3'],
  ['cu mm', 'mm3'],
  ['cu cm', 'cm3'],
  ['cu m', 'm3'],
  ['metric ton', 't'],
  ['metric t', 't'],
  ['short ton', 'ton'],
  ['ft kip', 'kip ft'],
  ['in kip', 'kip in'],
  ['lb ft', 'lbf ft'],
  ['ft lb', 'lbf ft'],
  ['ft lbf', 'lbf ft'],
  ['lb in', 'lbf in'],
  ['in lb', 'lbf in'],
  ['in lbf', 'lbf in'],
  ['m kN', 'kN m'],
  ['kNm', 'kN m'],
  ['Nm', 'N m'],
  ['Nmm', 'N mm'],
  ['kNcm', 'kN cm'],
  ['lb/in2', 'psi'],
  ['lbf/in2', 'psi'],
  ['kip/in2', 'ksi'],
  ['MN/m2', 'MPa'],
  ['kN/m2', 'kPa'],
  ['N/m2', 'Pa'],
  ['kN/mm2', 'GPa'],
  ['lb/in', 'lbf/in'],
])

/** Later kinds win: a unit of mass is listed with forces too. */
const KIND_OF = new Map(
  (Object.keys(DIMENSIONS) as Kind[]).flatMap((kind) => UNITS_OF[kind].map((unit) => [unit, kind] as const)),
)
