/** The two hands a line is written in: plain text, and presentation MathML (the elements of MathML Core). */
import type { Unit } from '../quantity/units.ts'
import { writeNumber, writeUnit } from '../quantity/write.ts'
import type { Comparison } from './types.ts'

export interface Script {
  /** Whether a fraction shows by itself where its parts end. */
  readonly fractionsStack: boolean
  /** A number as it was written: "0.70", "12,200", "4.162×10⁸". */
  number(text: string): string
  symbol(name: string): string
  /** A number and its unit, which may be none. */
  quantity(number: string, unit: Unit): string
  words(text: string): string
  /** The bound behind an equation: "<= M_p", or complete, "0.35 <= k_c <= 0.76". */
  bound(inner: string, complete: boolean): string
  /** A sign between two parts: what is printed of a sum, a product or a relation. */
  sign(sign: Sign): string
  fraction(top: string, bottom: string): string
  power(base: string, exponent: string): string
  root(of: string, degree: 2 | 3): string
  absolute(of: string): string
  call(name: string, args: readonly string[]): string
  /** In brackets; `depth` counts the brackets inside. */
  group(inner: string, depth: number): string
}

export type Sign = '+' | '-' | 'times' | 'beside' | '=' | ',' | Comparison

/** Plain text with the symbols' names as they are spelled: "M_n = C_b [M_p - ...]". */
export const plain: Script = {
  fractionsStack: false,
  number: (text) => text,
  symbol: (name) => name,
  quantity: (number, unit) => (unit === '' ? number : `${number} ${writeUnit(unit)}`),
  words: (text) => text,
  bound: (inner) => ` (${inner.trim()})`,
  sign: (sign) => (sign === 'beside' ? ' ' : sign === ',' ? ', ' : ` ${sign === 'times' ? '*' : sign} `),
  fraction: (top, bottom) => `${top}/${bottom}`,
  power: (base, exponent) => `${base}^${exponent}`,
  root: (of, degree) => `${degree === 2 ? 'sqrt' : 'cbrt'}(${of})`,
  absolute: (of) => `abs(${of})`,
  call: (name, args) => `${name}(${args.join(', ')})`,
  group: (inner, depth) => brackets(depth).join(inner),
}

/** MathML without the math element round it; `math` puts that on. */
export const mathml: Script = {
  fractionsStack: true,
  number: mathNumber,
  symbol: mathSymbol,
  quantity: (number, unit) =>
    unit === '' ? mathNumber(number) : `<mrow>${mathNumber(number)}<mspace width="0.2em"/>${mathUnit(unit)}</mrow>`,
  // MathML drops spaces at the ends of a text; those that do not break stay.
  words: (text) => `<mtext>${escaped(text.replace(/^ | $/g, '\u00a0'))}</mtext>`,
  bound: (inner, complete) => (complete ? `${SIGNS[',']}${inner}` : inner),
  sign: (sign) => SIGNS[sign],
  fraction: (top, bottom) => `<mfrac>${row(top)}${row(bottom)}</mfrac>`,
  power: (base, exponent) => `<msup>${row(base)}${row(exponent)}</msup>`,
  root: (of, degree) => (degree === 2 ? `<msqrt>${of}</msqrt>` : `<mroot>${row(of)}<mn>3</mn></mroot>`),
  absolute: (of) => `<mrow><mo>|</mo>${of}<mo>|</mo></mrow>`,
  call: (name, args) =>
    `<mrow><mi>${escaped(name)}</mi><mo>\u2061</mo><mrow><mo>(</mo>${args.join(SIGNS[','])}<mo>)</mo></mrow></mrow>`,
  group: (inner, depth) => {
    const [open, close] = brackets(depth)
    return `<mrow><mo>${open}</mo>${inner}<mo>${close}</mo></mrow>`
  },
}

/** A complete MathML element, set as a displayed equation; nothing for nothing. */
export const math = (inner: string): string =>
  inner === '' ? '' : `<math xmlns="http://www.w3.org/1998/Math/MathML" display="block"><mrow>${inner}</mrow></math>`

/** Round, then square, then curly, from the inside out, as standards print them. */
function brackets(depth: number): readonly [open: string, close: string] {
  if (depth % 3 === 1) return ['[', ']']
  return depth % 3 === 2 ? ['{', '}'] : ['(', ')']
}

const SIGNS: Readonly<Record<Sign, string>> = {
  '+': '<mo>+</mo>',
  '-': '<mo>\u2212</mo>',
  times: '<mo>\u00d7</mo>',
  beside: '<mo>\u2062</mo>',
  '=': '<mo>=</mo>',
  ',': '<mo separator="true">,</mo>',
  '<=': '<mo>\u2264</mo>',
  '<': '<mo>&lt;</mo>',
  '>=': '<mo>\u2265</mo>',
  '>': '<mo>&gt;</mo>',
}

const escaped = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;')

/** One element where one is wanted: an argument of a fraction or a power. */
const row = (inner: string): string => `<mrow>${inner}</mrow>`

const GREEK: Readonly<Record<string, string>> = {
  ...{ alpha: 'α', beta: 'β', gamma: 'γ', delta: 'δ', epsilon: 'ε', eta: 'η', theta: 'θ', kappa: 'κ', lambda: 'λ' },
  ...{ mu: 'μ', nu: 'ν', xi: 'ξ', pi: 'π', rho: 'ρ', sigma: 'σ', tau: 'τ', phi: 'φ', psi: 'ψ', omega: 'ω' },
  ...{ Gamma: 'Γ', Delta: 'Δ', Theta: 'Θ', Lambda: 'Λ', Sigma: 'Σ', Phi: 'Φ', Psi: 'Ψ', Omega: 'Ω' },
}

/** M_p as M with subscript p; several subscripts are set apart by commas. */
function mathSymbol(name: string): string {
  const [main = '', ...below] = name.split('_')
  if (below.length === 0) return mathName(main)
  return `<msub>${mathName(main)}${row(below.map(mathName).join(SIGNS[',']))}</msub>`
}

function mathName(name: string): string {
  if (/^\d+$/.test(name)) return `<mn>${name}</mn>`
  return `<mi>${escaped(Object.hasOwn(GREEK, name) ? GREEK[name]! : name)}</mi>`
}

/** The number as writeNumber gives it, its power of ten set as a power. */
function mathNumber(text: string): string {
  const [, minus = '', digits = text, exponent] = /^([\u2212-]?)([^×]*)(?:×10(.+))?$/.exec(text) ?? []
  const parts = [minus === '' ? '' : SIGNS['-'], `<mn>${escaped(digits)}</mn>`]
  if (exponent !== undefined) {
    const power = exponent.replace(/./g, (sign) => (sign === '⁻' ? '\u2212' : String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign))))
    parts.push(SIGNS.times, `<msup><mn>10</mn><mn>${power}</mn></msup>`)
  }
  return minus === '' && exponent === undefined ? parts[1]! : row(parts.join(''))
}

/** A unit upright, its power set as a power: kip-ft, N·mm, in with 3 above. */
function mathUnit(unit: Unit): string {
  const power = /\d$/.exec(unit)?.[0]
  if (power === undefined) return `<mtext>${writeUnit(unit)}</mtext>`
  const base = writeUnit(unit).slice(0, -1)
  return `<msup><mtext>${base}</mtext><mn>${power}</mn></msup>`
}

/** A figure to the four digits that lines are written with. */
export const lineNumber = (value: number): string => writeNumber(value, 4)
