/** Quantities from text: job files and entries in a window. */
import { DIMENSIONS, type Dimension, type Kind, type UnitSystem } from './kinds.ts'
import { ambiguity, evaluate, isCustomary } from './entry.ts'
import type { Entry, Weighing } from './terms.ts'
import { echo, plainSigns } from './signs.ts'
import { SI_UNIT, UNITS_OF } from './unit-names.ts'
import { fromUnit, shownUnit, type Unit } from './units.ts'

/** What a text was read as: SI with the unit it was written in, or what is wrong with it and what would be right. */
export type Reading =
  { readonly ok: true; readonly value: number; readonly unit: Unit } | { readonly ok: false; readonly message: string }

/**
 * Reads a quantity of one kind. A plain number is SI. A string carries its unit ("30 ft", "12' 6 1/2"", "38.1 kip"), except
 * of a ratio; where `system` is given (entry in a window) a bare number takes the unit shown in that system. Arithmetic is
 * read ("3*7.5 m", "(12 ft + 6 in)*2"). A comma is read where it can mean one thing only and refused otherwise.
 * `forceOrMass` gives newtons: a mass counts as its weight under standard gravity, "ton" is the US short ton, "t" the
 * metric one. Never throws; the value is finite and never negative zero.
 */
export function readQuantity(text: string | number, kind: Kind | 'forceOrMass', system?: UnitSystem): Reading {
  const refused = (why: string): Reading => {
    const read = typeof text === 'number' ? String(text) : text.trim() === '' ? 'an empty text' : echo(text)
    return { ok: false, message: `${read} ${why}; ${wanted(kind)}` }
  }
  const plainKind = kind === 'forceOrMass' ? 'force' : kind
  if (typeof text === 'number') {
    return Number.isFinite(text)
      ? { ok: true, value: text + 0, unit: SI_UNIT[plainKind] }
      : refused('is not a finite number')
  }
  if (text.trim() === '') return refused('says nothing')
  if (text.length > LONGEST) return refused(`is longer than the ${LONGEST} signs of an entry`)
  const signs = plainSigns(text)
  if ('strange' in signs) return refused(`has the sign ${signs.strange}, which is no part of a quantity`)
  const entry = evaluate(signs.text, weighing(kind))
  if ('why' in entry) return refused(entry.why)

  if (entry.units.length === 0 && kind !== 'ratio') {
    if (system === undefined) return refused('has no unit')
    return readBare(entry, shownUnit(plainKind, system), refused)
  }
  if (entry.orElse !== undefined) return readBare(entry, '', refused)
  if (!sameDimension(entry.dimension, DIMENSIONS[plainKind])) return refused(`is ${describe(entry.dimension)}`)
  const unit = entry.units.find((each) => UNITS_OF[kind].includes(each)) ?? SI_UNIT[plainKind]
  return { ok: true, value: entry.si + 0, unit }
}

/** Signs an entry may have; enough for any sum of lengths, and short enough to be read at once. */
const LONGEST = 200

/** Kind -> its name in a message, and two examples of what would be right. */
const WORDS: Record<Kind | 'forceOrMass', readonly [name: string, examples: string]> = {
  ratio: ['a number without a unit', '0.25 or 25 %'],
  length: ['a length', '12 1/2 in or 318 mm'],
  distance: ['a length', '12 ft 6 in or 3.81 m'],
  area: ['an area', '24.7 in2 or 15900 mm2'],
  modulus: ['a section modulus', '213 in3 or 3490000 mm3'],
  inertia: ['a moment of inertia', '2850 in4 or 1186000000 mm4'],
  warping: ['a warping constant', '17900 in6 or 4.8e12 mm6'],
  force: ['a force', '38.1 kip or 170 kN'],
  moment: ['a moment', '250 kip-ft or 340 kN·m'],
  stress: ['a stress', '50 ksi or 345 MPa'],
  lineLoad: ['a force per length', '40 lb/ft or 0.58 kN/m'],
  mass: ['a mass', '2000 lb or 900 kg'],
  lineMass: ['a mass per length', '84 lb/ft or 125 kg/m'],
  speed: ['a speed', '200 ft/min or 60 m/min'],
  flexuralStiffness: ['a flexural stiffness', '8e7 kip-in2 or 230000 kN·m2'],
  forceOrMass: ['a force or a mass', '38.1 kip, 170 kN, 20 ton (US) or 20 t (metric)'],
}

const wanted = (kind: Kind | 'forceOrMass'): string => `${WORDS[kind][0]} is wanted, such as ${WORDS[kind][1]}`

function weighing(kind: Kind | 'forceOrMass'): Weighing {
  if (kind === 'forceOrMass' || kind === 'lineLoad') return 'all'
  return DIMENSIONS[kind][2] === -2 ? 'lb' : 'none'
}

/** A number without a unit, in the unit shown. */
function readBare(entry: Entry, unit: Unit, refused: (why: string) => Reading): Reading {
  if (entry.orElse !== undefined && !isCustomary(unit)) {
    return refused(ambiguity({ thousands: entry.si, decimal: entry.orElse }, unit))
  }
  const value = fromUnit(entry.si, unit)
  if (!Number.isFinite(value)) return refused('is too large a number')
  if (value === 0 && entry.si !== 0) return refused('is too small a number')
  return { ok: true, value: value + 0, unit }
}

const sameDimension = (a: Dimension, b: Dimension): boolean => a.every((power, i) => power === b[i])

/** What a quantity of this dimension is called. */
function describe(dimension: Dimension): string {
  const kind = (Object.keys(DIMENSIONS) as Kind[]).find((each) => sameDimension(DIMENSIONS[each], dimension))
  return kind === undefined ? 'a quantity of no kind that is used here' : WORDS[kind][0]
}
