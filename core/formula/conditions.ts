/** Which comparisons tell why a branch of cases was taken. */
import { compile, compileCondition } from './compile.ts'
import { plainExpression } from './plain.ts'
import type { Condition, Expression } from './expression.ts'
import type { Branch, Comparison, Numbers } from './types.ts'

/** Terms with a comparison between each and the next: L_p < L_b <= L_r. */
export interface Chain {
  readonly terms: readonly Expression[]
  readonly ops: readonly Comparison[]
}

interface Fact {
  readonly left: Expression
  readonly op: Comparison
  readonly right: Expression
}

/**
 * True comparisons that lead to the branch at `index`: the conditions before it fail, its own holds. What is bounded
 * from both sides becomes one chain; a bound that a closer one makes needless is left out.
 */
export function reasonsFor(branches: readonly Branch[], index: number, values: Numbers): readonly Chain[] {
  const facts = branches.slice(0, index + 1).flatMap((branch, at) => {
    if (branch.when === undefined) return []
    return factsOf(branch.when, at === index, values)
  })
  const needed = facts.filter(
    (fact, at) => !facts.some((other, place) => place !== at && spares(other, fact, place > at, values)),
  )
  return chained(needed)
}

/** The opposite of a comparison. */
export const OPPOSITE: Readonly<Record<Comparison, Comparison>> = { '<=': '>', '<': '>=', '>=': '<', '>': '<=' }
const MIRRORED: Readonly<Record<Comparison, Comparison>> = { '<=': '>=', '<': '>', '>=': '<=', '>': '<' }

/** What of a condition explains that it holds, or that it does not. */
function factsOf(condition: Condition, holds: boolean, values: Numbers): readonly Fact[] {
  if (condition.node === 'compare') {
    const { left, op, right } = condition
    return [{ left, op: holds ? op : OPPOSITE[op], right }]
  }
  const both = [condition.left, condition.right]
  if ((condition.node === 'and') === holds) return both.flatMap((part) => factsOf(part, holds, values))
  const telling = both.find((part) => isTrue(part, values) === holds)
  return telling ? factsOf(telling, holds, values) : []
}

const isTrue = (condition: Condition, values: Numbers): boolean =>
  compileCondition(condition, () => {
    throw new Error('a condition that was computed before cannot be computed')
  })(values)

/** The same subject: a symbol or an expression; a bare number is never what a comparison is about. */
const same = (a: Expression, b: Expression): boolean => a.node !== 'number' && plainExpression(a) === plainExpression(b)

/** Written with < or <=, so that chains can be joined. */
const upward = ({ left, op, right }: Fact): Fact =>
  op === '<' || op === '<=' ? { left, op, right } : { left: right, op: MIRRORED[op], right: left }

/** Whether `fact` follows from `other`: the same subject held on the same side by a bound at least as close. */
function spares(other: Fact, fact: Fact, later: boolean, values: Numbers): boolean {
  const [a, b] = [upward(other), upward(fact)]
  const bound = (tree: Expression): number => compile(tree, {})(values)
  const closer = (x: number, y: number): boolean => x > y || (x === y && later)
  if (same(a.right, b.right)) return closer(bound(a.left), bound(b.left))
  return same(a.left, b.left) && closer(-bound(a.right), -bound(b.right))
}

/** Joins a < x and x <= b; a comparison without a partner stays as it was written. */
function chained(facts: readonly Fact[]): readonly Chain[] {
  const left = [...facts]
  const chains: Chain[] = []
  for (let fact = left.shift(); fact !== undefined; fact = left.shift()) {
    const own = upward(fact)
    const partner = left.findIndex(
      (other) => same(upward(other).left, own.right) || same(upward(other).right, own.left),
    )
    if (partner < 0) {
      chains.push({ terms: [fact.left, fact.right], ops: [fact.op] })
      continue
    }
    const [other] = left.splice(partner, 1).map(upward)
    const [lower, upper] = same(other!.left, own.right) ? [own, other!] : [other!, own]
    chains.push({ terms: [lower.left, lower.right, upper.right], ops: [lower.op, upper.op] })
  }
  return chains
}
