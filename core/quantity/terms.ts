/** Sums, products and quotients of quantities. What cannot be computed is refused with a SyntaxError that `evaluate` turns into a value. */
import { DIMENSIONS, type Dimension } from './kinds.ts'
import { kindOf } from './unit-names.ts'
import { WEIGHT_OF, fromUnit, type Unit } from './units.ts'

/** The value of an entry: SI, its dimension, and the units that were written in it (none: a bare number). */
export interface Entry {
  readonly si: number
  readonly dimension: Dimension
  readonly units: readonly Unit[]
  /** A bare number whose comma can be read both ways: `si` takes it as the thousands comma, this as the decimal one. */
  readonly orElse?: number
}

/** Which masses count as their weight: every one, the pound alone, or none. */
export type Weighing = 'all' | 'lb' | 'none'

/** A part of an entry. */
export interface Term extends Entry {
  /** The number before the unit, where the term is one number with one unit. */
  readonly count?: number
}

/** Refuses the entry: `why` continues the quoted text. */
export function refuse(why: string): never {
  throw new SyntaxError(why)
}

/** A number without a unit. */
export const bare = (number: number): Term => ({ si: number, dimension: DIMENSIONS.ratio, units: [], count: number })

/** A number with its unit; a mass as its weight where masses are weighed. */
export function withUnit(count: number, unit: Unit, weighing: Weighing): Term {
  const weight = weighing === 'all' || (weighing === 'lb' && unit === 'lb') ? WEIGHT_OF[unit] : undefined
  if (weight !== undefined) return { si: kept(count * weight, count), dimension: weightOf(unit), units: [unit], count }
  return { si: kept(fromUnit(count, unit), count), dimension: DIMENSIONS[kindOf(unit)], units: [unit], count }
}

const weightOf = (unit: Unit): Dimension => (unit.includes('/') ? DIMENSIONS.lineLoad : DIMENSIONS.force)

/** Holds what arithmetic gives to numbers that a double can carry. */
export function kept(result: number, ...factors: readonly number[]): number {
  if (!Number.isFinite(result)) return refuse('is too large a number')
  if (result === 0 && factors.length > 0 && factors.every((factor) => factor !== 0))
    return refuse('is too small a number')
  return result
}

/** Sum or difference of two quantities of one kind. */
export function add(left: Term, right: Term, sign: string): Term {
  if (left.orElse !== undefined || right.orElse !== undefined) refuse('has a comma that can be read both ways')
  if (!left.dimension.every((power, i) => power === right.dimension[i])) {
    const bareOne = left.units.length === 0 || right.units.length === 0
    refuse(bareOne ? 'adds or subtracts a number that has no unit' : 'adds or subtracts quantities of different kinds')
  }
  const si = kept(sign === '+' ? left.si + right.si : left.si - right.si, 0)
  return { si, dimension: left.dimension, units: [...left.units, ...right.units] }
}

/** Product of two quantities. */
export function multiply(left: Term, right: Term): Term {
  if (left.orElse !== undefined || right.orElse !== undefined) refuse('has a comma that can be read both ways')
  const [kg, m, s] = left.dimension
  const dimension: Dimension = [kg + right.dimension[0], m + right.dimension[1], s + right.dimension[2]]
  return { si: kept(left.si * right.si, left.si, right.si), dimension, units: [...left.units, ...right.units] }
}

/** Quotient of two quantities; a number over a number with a unit is a fraction of that unit. */
export function divide(left: Term, right: Term, weighing: Weighing): Term {
  if (left.orElse !== undefined || right.orElse !== undefined) refuse('has a comma that can be read both ways')
  if (right.si === 0) refuse('divides by zero')
  const unit = right.units[0]
  if (left.units.length === 0 && unit !== undefined && right.count !== undefined && right.count !== 0) {
    return withUnit(kept(left.si / right.count, left.si), unit, weighing)
  }
  const [kg, m, s] = left.dimension
  const dimension: Dimension = [kg - right.dimension[0], m - right.dimension[1], s - right.dimension[2]]
  return { si: kept(left.si / right.si, left.si), dimension, units: [...left.units, ...right.units] }
}

/** The quantity with its sign turned. */
export function negative(term: Term): Term {
  const { count, orElse, ...rest } = term
  return {
    ...rest,
    si: 0 - term.si,
    ...(count === undefined ? {} : { count: 0 - count }),
    ...(orElse === undefined ? {} : { orElse: 0 - orElse }),
  }
}
