/** Expressions set in either hand, with as few brackets as keep their meaning. */
import type { Unit } from '../quantity/units.ts'
import { readExpression, type Expression } from './expression.ts'
import type { Script, Sign } from './script.ts'

/** What stands for a symbol: the symbol itself, or its value as a number and a unit. */
export type Leaf = (name: string) => { readonly symbol: string } | { readonly number: string; readonly unit: Unit }

/** Sets an expression with its symbols as they are. */
export const setSymbols = (tree: Expression, script: Script): string => setExpression(tree, script, bySymbol)

/** Sets an expression, each symbol as `leaf` says. */
export const setExpression = (tree: Expression, script: Script, leaf: Leaf): string => set(tree, script, leaf).out

/** Sets a name that may be several symbols: "phi_b M_n", "M_n/Omega", "h/t_w", or words. */
export function setLabel(label: string, script: Script): string {
  try {
    return setSymbols(readExpression(label.trim().replace(/\s+/g, '*')), script)
  } catch {
    return script.words(label)
  }
}

const bySymbol: Leaf = (name) => ({ symbol: name })

/** How tightly a part binds: what stands lower than its place asks is bracketed. */
const NEGATIVE = 0
const SUM = 1
const QUOTIENT = 2
const PRODUCT = 3
const POWER = 4
const ATOM = 5

interface Piece {
  readonly out: string
  readonly binds: number
  /** Brackets inside, one in another. */
  readonly depth: number
  /** Begins with a figure, so that a multiplication sign must stand before it. */
  readonly figure: boolean
}

function set(tree: Expression, script: Script, leaf: Leaf): Piece {
  const of = (part: Expression): Piece => set(part, script, leaf)
  const within = (part: Expression, least: number): Piece => bracketed(of(part), least, script)
  const piece = (out: string, binds: number, parts: readonly Piece[] = []): Piece => ({
    out,
    binds,
    depth: Math.max(0, ...parts.map((part) => part.depth)),
    figure: parts[0]?.figure ?? false,
  })
  switch (tree.node) {
    case 'number':
      return { ...piece(script.number(grouped(tree.text)), ATOM), figure: true }
    case 'pi':
      return piece(script.symbol('pi'), ATOM)
    case 'symbol':
      return setLeaf(leaf(tree.name), script)
    case 'negative': {
      const inner = within(tree.of, QUOTIENT)
      return { ...piece(`${script.sign('-').trim()}${inner.out}`, NEGATIVE, [inner]), figure: false }
    }
    case 'sum':
    case 'difference': {
      const left = of(tree.left)
      const right = within(tree.right, tree.node === 'sum' ? SUM : QUOTIENT)
      return piece(`${left.out}${script.sign(tree.node === 'sum' ? '+' : '-')}${right.out}`, SUM, [left, right])
    }
    case 'product': {
      // A minus sign in front of a product stands before all of it.
      if (tree.left.node === 'negative')
        return of({ node: 'negative', of: { node: 'product', left: tree.left.of, right: tree.right } })
      const [left, right] = [within(tree.left, PRODUCT), within(tree.right, PRODUCT)]
      const sign: Sign = right.figure ? 'times' : 'beside'
      return piece(`${left.out}${script.sign(sign)}${right.out}`, PRODUCT, [left, right])
    }
    case 'quotient': {
      const [top, bottom] = script.fractionsStack
        ? [of(tree.left), of(tree.right)]
        : [within(tree.left, PRODUCT), within(tree.right, POWER)]
      const binds = script.fractionsStack ? POWER : QUOTIENT
      return { ...piece(script.fraction(top.out, bottom.out), binds, [top, bottom]), figure: top.figure }
    }
    case 'power': {
      const base = within(tree.base, ATOM)
      const exponent = script.fractionsStack ? of(tree.exponent) : within(tree.exponent, ATOM)
      return piece(script.power(base.out, exponent.out), POWER, [base, exponent])
    }
    case 'function': {
      const args = tree.args.map(of)
      const inner = args.map((arg) => arg.out)
      const out =
        tree.name === 'sqrt' || tree.name === 'cbrt'
          ? script.root(inner[0]!, tree.name === 'sqrt' ? 2 : 3)
          : tree.name === 'abs'
            ? script.absolute(inner[0]!)
            : script.call(tree.name, inner)
      return { ...piece(out, ATOM, args), figure: false }
    }
  }
}

function setLeaf(leaf: ReturnType<Leaf>, script: Script): Piece {
  if ('symbol' in leaf) return { out: script.symbol(leaf.symbol), binds: ATOM, depth: 0, figure: false }
  const { number, unit } = leaf
  const negative = /^[\u2212-]/.test(number)
  const binds = negative ? NEGATIVE : unit !== '' ? QUOTIENT : number.includes('×') ? PRODUCT : ATOM
  return { out: script.quantity(number, unit), binds, depth: 0, figure: true }
}

function bracketed(piece: Piece, least: number, script: Script): Piece {
  if (piece.binds >= least) return piece
  return { out: script.group(piece.out, piece.depth), binds: ATOM, depth: piece.depth + 1, figure: false }
}

/** A number of the text with its thousands set apart, as figures in a line are. */
function grouped(text: string): string {
  const [whole = '', ...rest] = text.split('.')
  return /e/i.test(text) ? text : [whole.replace(/\B(?=(\d{3})+$)/g, ','), ...rest].join('.')
}
