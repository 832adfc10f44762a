/**
 * Units as quotients of exact definitions: the international yard (so foot and inch) and pound (1959), standard gravity
 * (3rd CGPM, 1901), the SI. A unit is named as the trade writes it; its factor gives SI.
 */
import { STANDARD_GRAVITY, type Kind, type UnitSystem } from './kinds.ts'

const inch = 0.0254
const foot = 0.3048
const pound = 0.45359237
const poundForce = pound * STANDARD_GRAVITY
const kip = 1000 * poundForce

/** Unit name -> how much SI one of it is. Which kinds a unit belongs to stands in unit-names.ts. */
export const UNIT = {
  '': 1,
  '%': 1 / 100,
  m: 1,
  cm: 1 / 100,
  mm: 1 / 1000,
  in: inch,
  ft: foot,
  yd: 3 * foot,
  m2: 1,
  cm2: 1e-4,
  mm2: 1e-6,
  in2: inch ** 2,
  m3: 1,
  cm3: 1e-6,
  mm3: 1e-9,
  in3: inch ** 3,
  m4: 1,
  cm4: 1e-8,
  mm4: 1e-12,
  in4: inch ** 4,
  m6: 1,
  dm6: 1e-6,
  cm6: 1e-12,
  mm6: 1e-18,
  in6: inch ** 6,
  N: 1,
  kN: 1000,
  MN: 1e6,
  kgf: STANDARD_GRAVITY,
  tf: 1000 * STANDARD_GRAVITY,
  lbf: poundForce,
  kip,
  'N m': 1,
  'kN m': 1000,
  'MN m': 1e6,
  'kN cm': 10,
  'N mm': 1e-3,
  'kip in': kip * inch,
  'kip ft': kip * foot,
  'lbf ft': poundForce * foot,
  'lbf in': poundForce * inch,
  Pa: 1,
  kPa: 1000,
  MPa: 1e6,
  GPa: 1e9,
  'N/mm2': 1e6,
  'kN/cm2': 1e7,
  psi: poundForce / inch ** 2,
  ksi: kip / inch ** 2,
  'N/m': 1,
  'kN/m': 1000,
  'N/mm': 1000,
  'lbf/ft': poundForce / foot,
  'lbf/in': poundForce / inch,
  'kip/ft': kip / foot,
  'kip/in': kip / inch,
  kg: 1,
  t: 1000,
  lb: pound,
  ton: 2000 * pound,
  'kg/m': 1,
  'lb/ft': pound / foot,
  'lb/yd': pound / (3 * foot),
  'm/s': 1,
  'm/min': 1 / 60,
  'ft/min': foot / 60,
  'ft/s': foot,
  'N m2': 1,
  'kN m2': 1000,
  'N mm2': 1e-6,
  'kip in2': kip * inch ** 2,
  'kip ft2': kip * foot ** 2,
} as const satisfies Record<string, number>

export type Unit = keyof typeof UNIT

/**
 * What a unit of mass weighs, N, for entries that take force or mass. "lb" and "ton" are the pound-force and 2 kip there.
 */
export const WEIGHT_OF: Partial<Record<Unit, number>> = {
  kg: STANDARD_GRAVITY,
  t: 1000 * STANDARD_GRAVITY,
  lb: poundForce,
  ton: 2 * kip,
  'kg/m': STANDARD_GRAVITY,
  'lb/ft': poundForce / foot,
  'lb/yd': poundForce / (3 * foot),
}

/**
 * How each kind is shown, and the unit in which products of a printed formula come out coherent
 * (kip and inch, newton and millimetre), so that no stray 12 or 1000 appears between its factors.
 */
export const SHOWN = {
  ratio: { us: '', si: '', coherent: { us: '', si: '' } },
  length: { us: 'in', si: 'mm', coherent: { us: 'in', si: 'mm' } },
  distance: { us: 'ft', si: 'm', coherent: { us: 'in', si: 'mm' } },
  area: { us: 'in2', si: 'mm2', coherent: { us: 'in2', si: 'mm2' } },
  modulus: { us: 'in3', si: 'mm3', coherent: { us: 'in3', si: 'mm3' } },
  inertia: { us: 'in4', si: 'mm4', coherent: { us: 'in4', si: 'mm4' } },
  warping: { us: 'in6', si: 'mm6', coherent: { us: 'in6', si: 'mm6' } },
  force: { us: 'kip', si: 'kN', coherent: { us: 'kip', si: 'N' } },
  moment: { us: 'kip ft', si: 'kN m', coherent: { us: 'kip in', si: 'N mm' } },
  stress: { us: 'ksi', si: 'MPa', coherent: { us: 'ksi', si: 'MPa' } },
  lineLoad: { us: 'kip/ft', si: 'kN/m', coherent: { us: 'kip/in', si: 'N/mm' } },
  mass: { us: 'lb', si: 'kg', coherent: { us: 'lb', si: 'kg' } },
  lineMass: { us: 'lb/ft', si: 'kg/m', coherent: { us: 'lb/ft', si: 'kg/m' } },
  speed: { us: 'ft/min', si: 'm/min', coherent: { us: 'ft/s', si: 'm/s' } },
  flexuralStiffness: { us: 'kip in2', si: 'kN m2', coherent: { us: 'kip in2', si: 'N mm2' } },
} as const satisfies Record<Kind, { us: Unit; si: Unit; coherent: { us: Unit; si: Unit } }>

/** The SI figure of a value in a named unit. */
export const fromUnit = (value: number, unit: Unit): number => {
  const [over, under] = quotient(UNIT[unit])
  return (value * over) / under
}

/** The value of an SI figure in a named unit. */
export const inUnit = (si: number, unit: Unit): number => {
  const [over, under] = quotient(UNIT[unit])
  return (si * under) / over
}

/**
 * The factor as a quotient of whole numbers where it has one (1 mm = 1/1000 m, 1 ft = 3048/10000 m): 3 x 3048 / 10000 is the
 * double nearest to 0.9144, 3 x 0.3048 is not.
 */
function quotient(factor: number): readonly [over: number, under: number] {
  const parts = Math.round(1 / factor)
  if (factor < 1 && 1 / parts === factor) return [1, parts]
  const tenThousandths = Math.round(factor * 10_000)
  return factor < 1 && tenThousandths / 10_000 === factor ? [tenThousandths, 10_000] : [factor, 1]
}

/** The unit a kind is shown in. */
export const shownUnit = (kind: Kind, system: UnitSystem): Unit => SHOWN[kind][system]
