/** Dimensions of an expression: what is added, compared or returned must be of one kind. */
import { DIMENSIONS, type Dimension, type Kind } from '../quantity/kinds.ts'
import { plainExpression } from './plain.ts'
import type { Condition, Expression } from './expression.ts'

/** The dimension of an expression whose symbols have these kinds. Throws, naming the parts, where they do not fit. */
export function dimensionOf(tree: Expression, kindOf: (symbol: string) => Kind): Dimension {
  const of = (part: Expression): Dimension => dimensionOf(part, kindOf)
  switch (tree.node) {
    case 'number':
    case 'pi':
      return NONE
    case 'symbol':
      return DIMENSIONS[kindOf(tree.name)]
    case 'negative':
      return of(tree.of)
    case 'sum':
    case 'difference':
      return alike(tree.node === 'sum' ? 'adds' : 'subtracts', [tree.left, tree.right], of)
    case 'product':
      return combine(of(tree.left), of(tree.right), 1)
    case 'quotient':
      return combine(of(tree.left), of(tree.right), -1)
    case 'power':
      if (tree.value !== undefined) return scale(of(tree.base), tree.value)
      if (!sameDimension(of(tree.base), NONE) || !sameDimension(of(tree.exponent), NONE))
        throw new Error(`"${plainExpression(tree)}" has an exponent that is no number, and is not a ratio to a ratio`)
      return NONE
    case 'function':
      switch (tree.name) {
        case 'sqrt':
          return scale(of(tree.args[0]!), 1 / 2)
        case 'cbrt':
          return scale(of(tree.args[0]!), 1 / 3)
        case 'abs':
          return of(tree.args[0]!)
        default:
          return alike(`takes the ${tree.name} of`, tree.args, of)
      }
  }
}

/** Checks a condition: both sides of each comparison alike, and of a kind that can be written. Throws as dimensionOf does. */
export function checkCondition(condition: Condition, kindOf: (symbol: string) => Kind): void {
  if (condition.node !== 'compare') {
    checkCondition(condition.left, kindOf)
    checkCondition(condition.right, kindOf)
    return
  }
  const dimension = alike('compares', [condition.left, condition.right], (part) => dimensionOf(part, kindOf))
  if (kindWith(dimension) === undefined)
    throw new Error(`compares quantities of ${dimensionText(dimension)}, which is no kind that can be written`)
}

export const sameDimension = (a: Dimension, b: Dimension): boolean =>
  a.every((exponent, index) => Math.abs(exponent - b[index]!) < 1e-9)

/** The first kind of a dimension. */
export const kindWith = (dimension: Dimension): Kind | undefined =>
  (Object.keys(DIMENSIONS) as Kind[]).find((kind) => sameDimension(DIMENSIONS[kind], dimension))

/** "kg m2 s-2", or "a ratio". */
export function dimensionText(dimension: Dimension): string {
  const units = ['kg', 'm', 's'].flatMap((unit, index) => {
    const exponent = dimension[index]!
    return Math.abs(exponent) < 1e-9 ? [] : [exponent === 1 ? unit : `${unit}${Number(exponent.toFixed(3))}`]
  })
  return units.length === 0 ? 'a ratio' : units.join(' ')
}

const NONE: Dimension = DIMENSIONS.ratio

/** A zero is a zero of every kind. */
const isZero = (tree: Expression): boolean => tree.node === 'number' && tree.value === 0

function alike(verb: string, parts: readonly Expression[], of: (part: Expression) => Dimension): Dimension {
  const counted = parts.filter((part) => !isZero(part))
  const dimensions = counted.map(of)
  const first = dimensions[0] ?? NONE
  const misfit = dimensions.findIndex((dimension) => !sameDimension(dimension, first))
  if (misfit > 0)
    throw new Error(
      `${verb} "${plainExpression(counted[0]!)}" (${dimensionText(first)}) and ` +
        `"${plainExpression(counted[misfit]!)}" (${dimensionText(dimensions[misfit]!)})`,
    )
  return first
}

const combine = (a: Dimension, b: Dimension, sign: 1 | -1): Dimension => [
  a[0] + sign * b[0],
  a[1] + sign * b[1],
  a[2] + sign * b[2],
]

const scale = (a: Dimension, factor: number): Dimension => [a[0] * factor, a[1] * factor, a[2] * factor]
