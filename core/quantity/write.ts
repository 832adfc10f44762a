/** Quantities as text: rounded for reading, in feet and inches, or exact for keeping. No locale: the same text everywhere. */
import type { Quantity, UnitSystem } from './kinds.ts'
import { UNIT, fromUnit, inUnit, shownUnit, type Unit } from './units.ts'
import { SI_UNIT, kindOf } from './unit-names.ts'

/**
 * A number to `digits` significant digits (1 to 15). Digits left of the decimal point are never rounded away; trailing zeros
 * are kept where they tell of rounding ("38.10" of 38.0998) and left out where the number is that short ("38.1").
 * From 10 million up and below 1/10,000 as "4.162×10⁸". Throws a RangeError where the value is not finite.
 */
export function writeNumber(value: number, digits = 4): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be written as a number`)
  if (!Number.isInteger(digits) || digits < 1 || digits > 15) throw new RangeError(`${digits} significant digits`)
  if (value === 0) return '0'
  const size = Math.abs(value)
  const [mantissa = '', exponent = ''] = size.toExponential(digits - 1).split('e')
  const power = Number(exponent)
  const sign = value < 0 ? MINUS : ''
  if (power >= 7 || power < -4) return `${sign}${tidy(mantissa, size / 10 ** power)}×10${superscript(String(power))}`
  const [whole = '', fraction] = tidy(size.toFixed(Math.max(0, digits - 1 - power)), size).split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',')
  return sign + (fraction === undefined ? grouped : `${grouped}.${fraction}`)
}

/** A quantity in the unit its kind is shown in: "38.1 kip", "9.144 m", "1,250 kip-ft". */
export function writeQuantity(quantity: Quantity, system: UnitSystem, digits = 4): string {
  const unit = shownUnit(quantity.kind, system)
  const number = writeNumber(inUnit(quantity.value, unit), digits)
  return unit === '' ? number : `${number} ${writeUnit(unit)}`
}

/** A unit with the trade's signs: kip-ft, kN·m, in², N/mm². */
export function writeUnit(unit: Unit): string {
  const joint = /^(kip|lbf) /.test(unit) ? '-' : '·'
  return unit.replace(' ', joint).replace(/\d/, superscript)
}

/**
 * Feet and inches to the nearest 1/`denominator` of an inch (a power of two up to 128): 12' 6 1/2". What rounds up to twelve
 * inches is carried into the feet. Throws a RangeError where the value is not finite or too large to count in fractions.
 */
export function writeFeetInches(metres: number, denominator = 16): string {
  if (![1, 2, 4, 8, 16, 32, 64, 128].includes(denominator)) throw new RangeError(`1/${denominator} in`)
  const parts = Math.round(inUnit(Math.abs(metres), 'in') * denominator)
  if (!Number.isSafeInteger(parts)) throw new RangeError(`${metres} m cannot be written in feet and inches`)
  const feet = Math.floor(parts / (12 * denominator))
  const inches = Math.floor(parts / denominator) % 12
  let over = parts % denominator
  let under = denominator
  while (over > 0 && over % 2 === 0) {
    over /= 2
    under /= 2
  }
  const sign = metres < 0 && parts > 0 ? MINUS : ''
  const fraction = over === 0 ? '' : ` ${over}/${under}`
  return `${sign}${feet}' ${inches}${fraction}"`
}

/**
 * The shortest text that reads back to the very same double, in `unit`, or in the SI unit where no number of `unit`
 * gives that double. Negative zero is written as 0. Throws a RangeError where the value is not finite.
 */
export function writeExact(si: number, unit: Unit): string {
  if (!Number.isFinite(si)) throw new RangeError(`${si} cannot be written as a number`)
  const text = exactNumber(si, unit)
  if (text !== undefined) return unit === '' ? text : `${text} ${writeUnit(unit)}`
  return `${String(si)} ${writeUnit(SI_UNIT[kindOf(unit)])}`
}

const MINUS = '\u2212'

function exactNumber(si: number, unit: Unit): string | undefined {
  if (si === 0) return '0'
  const near = si / UNIT[unit]
  if (!Number.isFinite(near) || near === 0) return undefined
  for (let digits = 1; digits <= 17; digits++) {
    const candidate = Number(near.toPrecision(digits))
    if (fromUnit(candidate, unit) === si) return String(candidate)
  }
  return undefined
}

/** Drops trailing zeros where nothing was rounded off: where the short text is the number itself. */
function tidy(text: string, exact: number): string {
  if (!text.includes('.')) return text
  return Math.abs(Number(text) - exact) <= 1e-12 * exact ? text.replace(/\.?0+$/, '') : text
}

function superscript(text: string): string {
  return text.replace(/./g, (sign) => (sign === '-' ? '⁻' : SUPERSCRIPT.charAt(Number(sign))))
}

const SUPERSCRIPT = '⁰¹²³⁴⁵⁶⁷⁸⁹'

/** A utilisation, three decimals unless asked otherwise; one over the limit is never rounded back to it. */
export const writeUtilisation = (value: number, decimals = 3): string => {
  if (value >= 100) return writeNumber(value)
  const text = value.toFixed(decimals)
  return value > 1 && Number(text) === 1 ? (1 + 10 ** -decimals).toFixed(decimals) : text
}
