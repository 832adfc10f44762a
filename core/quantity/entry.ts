/** Arithmetic with units: sums, products and quotients of quantities, feet with inches and fractions. No eval. */
import { DIMENSIONS } from './kinds.ts'
import { readNumber } from './number-text.ts'
import {
  add,
  bare,
  divide,
  kept,
  multiply,
  negative,
  refuse,
  withUnit,
  type Entry,
  type Term,
  type Weighing,
} from './terms.ts'
import { findUnit } from './unit-names.ts'
import { fromUnit, type Unit } from './units.ts'
import { writeUnit } from './write.ts'

/**
 * Evaluates a text in plain signs. `a / b unit` is a fraction of the unit ("7/8 in"); a hyphen that touches the feet and
 * the inches joins them as on drawings ("12'-6""). What is wrong comes back as a phrase that continues the quoted text.
 */
export function evaluate(text: string, weighing: Weighing): Entry | { readonly why: string } {
  try {
    return parse(text, weighing)
  } catch (error) {
    if (error instanceof SyntaxError) return { why: error.message }
    throw error
  }
}

const TIMES_X = /(?<=[\d)] ?| )[xX](?= ?[\d(.,])/g
const DIGITS = /[\d.,]*\d[\d.,]*/y
const EXPONENT = /[eE]([+-]?\d+)/y
const TIMES_TEN = / ?[*·] ?10 ?\^ ?([+-]?\d+)/y
const TEN = /10 ?\^ ?([+-]?\d+)/y
const MIXED = /(\d+)([ -])(\d+) ?\/ ?(\d+)(?![\d.,])/y
const FRACTION = /(\d+) ?\/ ?(\d+)(?![\d.,])/y
/** "1/2 3/4" and "1/2×10⁶": readers differ about what is divided by what. */
const UNCLEAR_DIVISOR = /^ ?(\d+ \d+ ?\/ ?\d|[\d.,]+ ?[*·] ?10 ?\^)/
const UNIT_WORDS = /[A-Za-z]+\.?(?: ?\^ ?\d+|\d(?!\d))?(?: ?[-·*/ ] ?[A-Za-z]+\.?(?: ?\^ ?\d+|\d(?!\d))?)*/y

function parse(written: string, weighing: Weighing): Entry {
  if (/(?<![\d.,])0[xX][\da-fA-F]/.test(written)) refuse('is not a decimal number')
  const text = written.replace(TIMES_X, '*').replace(/(?<=[A-Za-z])\.(?=[A-Za-z])/g, '·')
  let at = 0

  const match = (pattern: RegExp): RegExpExecArray | undefined => {
    pattern.lastIndex = at
    const found = pattern.exec(text) ?? undefined
    if (found) at += found[0].length
    return found
  }
  const skipSpace = (): void => {
    if (text[at] === ' ') at++
  }
  const next = (signs: string): string | undefined => {
    const start = at
    skipSpace()
    const sign = text[at]
    if (sign !== undefined && signs.includes(sign)) {
      at++
      return sign
    }
    at = start
    return undefined
  }

  const sum = (): Term => {
    let left = product()
    for (;;) {
      const sign = next('+-')
      if (sign === undefined) return left
      left = add(left, product(), sign)
    }
  }
  const product = (): Term => {
    let left = signed()
    for (;;) {
      const sign = next('*·/')
      if (sign === undefined) return left
      if (sign === '/' && UNCLEAR_DIVISOR.test(text.slice(at))) refuse('divides by what needs parentheses')
      const right = signed()
      left = sign === '/' ? divide(left, right, weighing) : multiply(left, right)
    }
  }
  const signed = (): Term => {
    const sign = next('+-')
    if (sign === undefined) return primary()
    const term = signed()
    return sign === '+' ? term : negative(term)
  }
  const primary = (): Term => {
    skipSpace()
    if (text[at] === '(') {
      at++
      const inner = sum()
      if (next(')') === undefined) refuse('lacks a closing parenthesis')
      const unit = inner.units.length === 0 && inner.orElse === undefined ? scanUnit() : undefined
      return unit === undefined ? inner : withUnit(inner.si, unit, weighing)
    }
    return measure()
  }

  const measure = (): Term => {
    const start = at
    const mixed = mixedNumber(false)
    if (mixed !== undefined) {
      const unit = scanUnit()
      return unit === undefined ? bare(mixed) : withUnit(mixed, unit, weighing)
    }
    const number = literal()
    const mark = text.slice(at).trimStart().startsWith("'")
    const unit = scanUnit()
    if (number.kind === 'ambiguous') {
      if (unit === undefined) return { ...bare(number.thousands), orElse: number.decimal }
      if (!isCustomary(unit)) refuse(ambiguity(number, unit))
      return withUnit(number.thousands, unit, weighing)
    }
    if (unit === undefined) return bare(number.value)
    const inches = unit === 'ft' ? inchesAfterFeet(mark) : undefined
    if (inches === undefined) return withUnit(number.value, unit, weighing)
    if (!/^\d+$/.test(/^[\d.,]+/.exec(text.slice(start))?.[0] ?? '')) refuse('has inches after feet that are not whole')
    return { si: kept(fromUnit(12 * number.value + inches, 'in')), dimension: DIMENSIONS.length, units: ['ft'] }
  }

  const literal = () => {
    const ten = match(TEN)
    const digits = ten ? '1' : match(DIGITS)?.[0]
    if (digits === undefined) refuse(missing(text, at))
    const exponent = ten ?? match(EXPONENT)
    const times = match(TIMES_TEN)
    const number = readNumber(digits, Number(exponent?.[1] ?? 0) + Number(times?.[1] ?? 0))
    if (number.kind === 'refused') refuse(number.why)
    return number
  }

  /** "5 7/32", and "6-7/8" where a unit of length follows; `fraction`: "5/8" alone as well. */
  const mixedNumber = (fraction: boolean): number | undefined => {
    const start = at
    const mixed = match(MIXED)
    if (mixed) {
      const [over, under] = [Number(mixed[3]), Number(mixed[4])]
      const value = Number(mixed[1]) + over / under
      if (mixed[2] === ' ' && over >= under) refuse(`has “${mixed[0]}”, which is no whole number with a fraction`)
      if (mixed[2] === ' ' || (over < under && POWERS_OF_TWO.includes(under) && lengthFollows())) return value
      at = start
    }
    const only = fraction ? match(FRACTION) : undefined
    if (only && Number(only[2]) !== 0) return Number(only[1]) / Number(only[2])
    at = start
    return undefined
  }

  const lengthFollows = (): boolean => {
    const start = at
    const unit = scanUnit()
    at = start
    return unit === 'in' || unit === 'ft' || unit === 'yd'
  }

  /** The inches that follow feet, or undefined where none do. */
  const inchesAfterFeet = (mark: boolean): number | undefined => {
    const start = at
    const joint = match(/ ?-? ?(?=[\d.])/y)?.[0]
    if (joint === undefined) return undefined
    const mixed = mixedNumber(true)
    const number = mixed === undefined ? literal() : undefined
    const after = at
    const unit = scanUnit()
    if (unit === undefined && mark && !joint.includes('-')) {
      at = after
    } else if (unit !== 'in') {
      at = start
      return undefined
    }
    if (joint === ' - ' && !mark) {
      at = start
      return undefined
    }
    if (joint.includes('-') && joint !== '-')
      refuse('may mean feet and inches or a difference; leave the hyphen out or write (… ft) - (… in)')
    if (number?.kind === 'ambiguous') refuse('has a comma in its inches that can be read both ways')
    return mixed ?? number?.value
  }

  /** The unit at this place, the longest that is known; undefined where none is written. */
  const scanUnit = (): Unit | undefined => {
    const start = at
    skipSpace()
    const sign = text[at]
    if (sign === "'" || sign === '"' || sign === '%') {
      at++
      return sign === '%' ? '%' : sign === '"' ? 'in' : 'ft'
    }
    const words = match(UNIT_WORDS)?.[0]
    if (words === undefined) {
      at = start
      return undefined
    }
    const first = at - words.length
    for (let end = words.length; end > 0; end--) {
      if (end < words.length && /[A-Za-z]/.test(words[end] ?? '') && /[A-Za-z]/.test(words[end - 1] ?? '')) continue
      const unit = /[\w.]$/.test(words.slice(0, end)) ? findUnit(words.slice(0, end)) : undefined
      if (unit === undefined) continue
      at = first + end
      return unit
    }
    const only = words.trim()
    if (only === 'T') refuse('has the unit T, which may mean metric tonnes (write t) or US tons (write ton)')
    return refuse(`has the unit “${only}”, which is not known`)
  }

  const whole = sum()
  skipSpace()
  if (at < text.length) refuse(leftOver(text, at))
  return whole
}

const POWERS_OF_TWO = [2, 4, 8, 16, 32, 64, 128]

function missing(text: string, at: number): string {
  if (at === 0) return 'does not begin with a number'
  return at >= text.length
    ? 'ends where a number should follow'
    : `has “${text.slice(at, at + 12)}” where a number should stand`
}

function leftOver(text: string, at: number): string {
  return text[at] === ')'
    ? 'has a closing parenthesis too many'
    : `has “${text.slice(at, at + 20)}” after “${text.slice(0, at).trim().slice(-20)}”, which is not understood`
}

/** A comma before three digits is the thousands comma beside a US customary unit; metric entries use it both ways. */
export const isCustomary = (unit: Unit): boolean => /(^|[ /])(in|ft|yd|lb|lbf|kip|ton)\d?($|[ /])|^[pk]si$/.test(unit)

/** Says both readings of a comma. */
export function ambiguity(number: { readonly thousands: number; readonly decimal: number }, unit: Unit): string {
  const sign = unit === '' ? '' : ` ${writeUnit(unit)}`
  return `may mean ${number.thousands}${sign} or ${number.decimal}${sign}: write the one that is meant without a comma`
}
