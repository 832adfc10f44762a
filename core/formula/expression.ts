/** The text of a formula as a tree of its own, small enough to be checked, computed and typeset by a few lines each. */
import { parse, type MathNode } from 'mathjs/number'

export type Expression =
  | { readonly node: 'number'; readonly value: number; readonly text: string }
  | { readonly node: 'pi' }
  | { readonly node: 'symbol'; readonly name: string }
  | {
      readonly node: 'sum' | 'difference' | 'product' | 'quotient'
      readonly left: Expression
      readonly right: Expression
    }
  /** `value` where the exponent is a plain number, as it must be unless the base is a ratio. */
  | {
      readonly node: 'power'
      readonly base: Expression
      readonly exponent: Expression
      readonly value: number | undefined
    }
  | { readonly node: 'negative'; readonly of: Expression }
  | { readonly node: 'function'; readonly name: FunctionName; readonly args: readonly Expression[] }

export type Condition =
  | {
      readonly node: 'compare'
      readonly left: Expression
      readonly op: '<=' | '<' | '>=' | '>'
      readonly right: Expression
    }
  | { readonly node: 'and' | 'or'; readonly left: Condition; readonly right: Condition }

/** The functions a formula may use, with the least and greatest number of arguments. */
const FUNCTIONS = { sqrt: [1, 1], cbrt: [1, 1], abs: [1, 1], min: [2, Infinity], max: [2, Infinity] } as const
type FunctionName = keyof typeof FUNCTIONS

/** Reads a formula's right-hand side. Throws, naming the part, for whatever is no formula. */
export function readExpression(text: string): Expression {
  return fromNode(parseText(text), printedNumbers(text))
}

/** Reads a condition: comparisons joined by `and` and `or`; "a < x <= b" is both. */
export function readCondition(text: string): Condition {
  return conditionFromNode(parseText(text), printedNumbers(text))
}

/** The symbols of an expression or condition, in the order in which they stand, each once. */
export function symbolsOf(tree: Expression | Condition): readonly string[] {
  const found = new Set<string>()
  const visit = (part: Expression | Condition): void => {
    switch (part.node) {
      case 'symbol':
        found.add(part.name)
        break
      case 'power':
        visit(part.base)
        visit(part.exponent)
        break
      case 'negative':
        visit(part.of)
        break
      case 'function':
        part.args.forEach(visit)
        break
      case 'number':
      case 'pi':
        break
      default:
        visit(part.left)
        visit(part.right)
    }
  }
  visit(tree)
  return [...found]
}

function parseText(text: string): Node {
  try {
    return parse(text)
  } catch (error) {
    throw new Error(`"${text}" cannot be read: ${error instanceof Error ? error.message : String(error)}`, {
      cause: error,
    })
  }
}

/** What is read of the parser's nodes. */
type Node = MathNode & {
  readonly type: string
  readonly value?: unknown
  readonly name?: string
  readonly op?: string
  readonly implicit?: boolean
  readonly content?: Node
  readonly args?: readonly Node[]
  readonly fn?: unknown
  readonly conditionals?: readonly string[]
  readonly params?: readonly Node[]
}

/**
 * The numbers of a text as they are printed there (1.10 stays 1.10), in order; the parser keeps only their values.
 * Every operator stands between or before its operands, so the tree read left to right meets them in the same order.
 */
const printedNumbers = (text: string): Iterator<string> =>
  (text.match(/(?<![\w.])(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?/g) ?? [])[Symbol.iterator]()

const BINARY = { '+': 'sum', '-': 'difference', '*': 'product', '/': 'quotient' } as const

function fromNode(node: Node, numbers: Iterator<string>): Expression {
  const refuse = (why: string): never => {
    throw new Error(`"${node.toString()}" ${why}`)
  }
  const args = node.args ?? []
  switch (node.type) {
    case 'ParenthesisNode':
      return fromNode(node.content!, numbers)
    case 'ConstantNode': {
      if (typeof node.value !== 'number') return refuse('is no number')
      const text = numbers.next()
      if (text.done === true || Number(text.value) !== node.value) return refuse('is no plain decimal number')
      return { node: 'number', value: node.value, text: text.value }
    }
    case 'SymbolNode':
      return node.name === 'pi' ? { node: 'pi' } : { node: 'symbol', name: node.name! }
    case 'FunctionNode':
      return call(node, args, numbers)
    case 'OperatorNode': {
      const [left, right] = [fromNode(args[0]!, numbers), args[1] && fromNode(args[1], numbers)]
      if (node.implicit === true) return refuse('leaves out a multiplication sign')
      if (right === undefined) return node.op === '-' ? { node: 'negative', of: left } : refuse('is no operation here')
      if (node.op === '^') return { node: 'power', base: left, exponent: right, value: constant(right) }
      const name = BINARY[node.op as keyof typeof BINARY] as (typeof BINARY)[keyof typeof BINARY] | undefined
      return name ? { node: name, left, right } : refuse('is no operation of a formula')
    }
    default:
      return refuse('has no place in a formula')
  }
}

function call(node: Node, args: readonly Node[], numbers: Iterator<string>): Expression {
  const name = String(node.fn)
  if (!Object.hasOwn(FUNCTIONS, name))
    throw new Error(`function ${name} is not one of ${Object.keys(FUNCTIONS).join(', ')}`)
  const [least, most] = FUNCTIONS[name as FunctionName]
  if (args.length < least || args.length > most) throw new Error(`"${node.toString()}" has ${args.length} arguments`)
  return { node: 'function', name: name as FunctionName, args: args.map((arg) => fromNode(arg, numbers)) }
}

const OPERATORS = { smallerEq: '<=', smaller: '<', largerEq: '>=', larger: '>' } as const

function conditionFromNode(node: Node, numbers: Iterator<string>): Condition {
  if (node.type === 'ParenthesisNode') return conditionFromNode(node.content!, numbers)
  const args = node.args ?? []
  if (node.type === 'OperatorNode' && (node.op === 'and' || node.op === 'or')) {
    const left = conditionFromNode(args[0]!, numbers)
    return { node: node.op, left, right: conditionFromNode(args[1]!, numbers) }
  }
  const [names, parts] =
    node.type === 'RelationalNode'
      ? [node.conditionals ?? [], node.params ?? []]
      : [node.type === 'OperatorNode' ? [String(node.fn)] : [], args]
  const comparisons = names.map((name) => {
    const op = OPERATORS[name as keyof typeof OPERATORS] as (typeof OPERATORS)[keyof typeof OPERATORS] | undefined
    if (!op) throw new Error(`"${node.toString()}" is no comparison by <=, <, >= or >`)
    return op
  })
  if (comparisons.length === 0) throw new Error(`"${node.toString()}" is no condition`)
  const sides = parts.map((part) => fromNode(part, numbers))
  return comparisons
    .map((op, index): Condition => ({ node: 'compare', left: sides[index]!, op, right: sides[index + 1]! }))
    .reduce((left, right) => ({ node: 'and', left, right }))
}

/** The value of an exponent: a number, a quotient of numbers, or one of them negative. */
function constant(tree: Expression): number | undefined {
  if (tree.node === 'number') return tree.value
  if (tree.node === 'negative') {
    const value = constant(tree.of)
    return value === undefined ? undefined : -value
  }
  if (tree.node !== 'quotient') return undefined
  const [left, right] = [constant(tree.left), constant(tree.right)]
  return left === undefined || right === undefined || right === 0 ? undefined : left / right
}
