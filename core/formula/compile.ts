/**
 * Expressions as nested closures over the object of values: no code is made from text, so a page that forbids it can run
 * them, and they are as good as written by hand to within a small factor.
 */
import { symbolsOf, type Condition, type Expression } from './expression.ts'
import type { Numbers } from './types.ts'

type Compute = (values: Numbers) => number

/**
 * The closure of an expression; constants stand in it as numbers. A missing value, a division by zero and a root of a
 * negative number give NaN, which no operation of a formula loses again: a function above never hides a fault below.
 */
export function compile(tree: Expression, constants: Numbers): Compute {
  const compute = compileParts(tree, constants)
  // What has no symbol of its own is computed once: pi^2, 1.6/1.5.
  return symbolsOf(tree).every((name) => Object.hasOwn(constants, name)) ? literal(compute({})) : compute
}

function compileParts(tree: Expression, constants: Numbers): Compute {
  const of = (part: Expression): Compute => compile(part, constants)
  switch (tree.node) {
    case 'number':
      return literal(tree.value)
    case 'pi':
      return literal(Math.PI)
    case 'symbol': {
      const { name } = tree
      return Object.hasOwn(constants, name) ? literal(constants[name]!) : (values) => values[name] as number
    }
    case 'negative': {
      const inner = of(tree.of)
      return (values) => -inner(values)
    }
    case 'sum': {
      const [left, right] = [of(tree.left), of(tree.right)]
      return (values) => left(values) + right(values)
    }
    case 'difference': {
      const [left, right] = [of(tree.left), of(tree.right)]
      return (values) => left(values) - right(values)
    }
    case 'product':
      return product(tree.left, tree.right, of)
    case 'quotient': {
      const [left, right] = [of(tree.left), of(tree.right)]
      return (values) => {
        const divisor = right(values)
        return divisor === 0 ? NaN : left(values) / divisor
      }
    }
    case 'power':
      return tree.value === undefined ? powerOf(of(tree.base), of(tree.exponent)) : power(of(tree.base), tree.value)
    case 'function':
      return call(tree.name, tree.args.map(of))
  }
}

/** The closure of a condition. `fault` is called where a side is not a finite number, and must throw. */
export function compileCondition(
  condition: Condition,
  fault: (values: Numbers) => never,
): (values: Numbers) => boolean {
  if (condition.node === 'compare') {
    const left = compile(condition.left, {})
    const right = compile(condition.right, {})
    const test = TESTS[condition.op]
    return (values) => {
      const a = left(values)
      const b = right(values)
      // The difference is finite where both are; two far ends of the number line are no lengths or loads.
      return Number.isFinite(a - b) ? test(a, b) : fault(values)
    }
  }
  const left = compileCondition(condition.left, fault)
  const right = compileCondition(condition.right, fault)
  return condition.node === 'and'
    ? (values) => left(values) && right(values)
    : (values) => left(values) || right(values)
}

/** The comparisons themselves, for conditions and for checks alike. */
export const TESTS = {
  '<=': (a: number, b: number) => a <= b,
  '<': (a: number, b: number) => a < b,
  '>=': (a: number, b: number) => a >= b,
  '>': (a: number, b: number) => a > b,
} as const

const literal =
  (value: number): Compute =>
  () =>
    value

/** Products are most of what formulas do; a number or a symbol in front is multiplied without a call of its own. */
function product(left: Expression, right: Expression, of: (part: Expression) => Compute): Compute {
  const second = of(right)
  if (left.node === 'number') {
    const { value } = left
    return (values) => value * second(values)
  }
  const first = of(left)
  return (values) => first(values) * second(values)
}

function power(base: Compute, exponent: number): Compute {
  if (exponent === 2)
    return (values) => {
      const value = base(values)
      return value * value
    }
  if (exponent === 3)
    return (values) => {
      const value = base(values)
      return value * value * value
    }
  // NaN ** 0 and a zero divisor in disguise are faults like the others.
  if (exponent <= 0)
    return (values) => {
      const value = base(values)
      return value === 0 || Number.isNaN(value) ? NaN : value ** exponent
    }
  return (values) => base(values) ** exponent
}

function powerOf(base: Compute, exponent: Compute): Compute {
  return (values) => {
    const value = base(values)
    const to = exponent(values)
    return Number.isNaN(value) || (value === 0 && to <= 0) ? NaN : value ** to
  }
}

function call(name: 'sqrt' | 'cbrt' | 'abs' | 'min' | 'max', args: readonly Compute[]): Compute {
  const first = args[0]!
  switch (name) {
    case 'sqrt':
      return (values) => Math.sqrt(first(values))
    case 'cbrt':
      return (values) => Math.cbrt(first(values))
    case 'abs':
      return (values) => Math.abs(first(values))
    case 'min':
      return args.reduce((left, right) => (values) => Math.min(left(values), right(values)))
    case 'max':
      return args.reduce((left, right) => (values) => Math.max(left(values), right(values)))
  }
}
