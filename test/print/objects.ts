/** A reader of the objects of a PDF with a plain cross-reference table, as the printer writes it. */
import { inflateSync } from 'node:zlib'

export type Value =
  | number
  | boolean
  | null
  | { readonly name: string }
  | { readonly bytes: string }
  | { readonly ref: number }
  | readonly Value[]
  | Dictionary

export interface Dictionary {
  readonly entries: Readonly<Record<string, Value>>
}

export interface Pdf {
  readonly trailer: Dictionary
  /** An object, or what a reference leads to. */
  readonly get: (value: Value | undefined) => Value | undefined
  /** The unpacked stream of an object. */
  readonly stream: (value: Value | undefined) => string
  readonly count: number
}

export function readPdf(bytes: Uint8Array): Pdf {
  const text = Buffer.from(bytes).toString('latin1')
  const start = Number(/startxref\s+(\d+)\s+%%EOF\s*$/.exec(text)?.[1])
  const table = /^xref\s+0 (\d+)\s+/.exec(text.slice(start, start + 60))
  if (!table) throw new Error('no cross-reference table where startxref says')
  const count = Number(table[1])
  const offsets: number[] = []
  const from = start + table[0].length
  for (let index = 0; index < count; index += 1)
    offsets.push(Number(text.slice(from + index * 20, from + index * 20 + 10)))
  const object = (id: number): { value: Value; end: number } => {
    const at = offsets[id] ?? -1
    const head = new RegExp(`^${id} 0 obj\\s+`).exec(text.slice(at, at + 24))
    if (!head) throw new Error(`object ${id} does not stand where the table says`)
    const [value, end] = parse(text, at + head[0].length)
    return { value, end }
  }
  const get = (value: Value | undefined): Value | undefined => {
    const id = refOf(value)
    return id === undefined ? value : get(object(id).value)
  }
  const stream = (value: Value | undefined): string => {
    const id = refOf(value)
    if (id === undefined) throw new Error('a stream must be referred to')
    const { value: own, end } = object(id)
    const begin = end + /^\s*stream\r?\n/.exec(text.slice(end, end + 20))![0].length
    const raw = bytes.subarray(begin, begin + (get(entry(own, 'Length')) as number))
    return Buffer.from(nameOf(entry(own, 'Filter')) === 'FlateDecode' ? inflateSync(raw) : raw).toString('latin1')
  }
  const trailer = parse(text, text.lastIndexOf('trailer') + 7)[0] as Dictionary
  return { trailer, get, stream, count }
}

export const refOf = (value: Value | undefined): number | undefined =>
  typeof value === 'object' && value !== null && 'ref' in value ? value.ref : undefined

export const nameOf = (value: Value | undefined): string | undefined =>
  typeof value === 'object' && value !== null && 'name' in value ? value.name : undefined

export const entry = (value: Value | undefined, key: string): Value | undefined =>
  typeof value === 'object' && value !== null && !Array.isArray(value) && 'entries' in value
    ? (value as Dictionary).entries[key]
    : undefined

export const listOf = (value: Value | undefined): readonly Value[] => (Array.isArray(value) ? (value as Value[]) : [])

/** A text string: UTF-16 where it begins with its mark. */
export function stringOf(value: Value | undefined): string | undefined {
  if (typeof value !== 'object' || value === null || !('bytes' in value)) return undefined
  if (!value.bytes.startsWith('\xfe\xff')) return value.bytes
  return Buffer.from(value.bytes.slice(2), 'latin1').swap16().toString('utf16le')
}

const SPACE = /[\0\t\n\f\r ]*/y
const TOKEN = /-?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?|[A-Za-z'"*][A-Za-z0-9'"*]*/y

/** One value from `at` on, and where it ends. A word that is no value is given as a name with a mark before it: an operator. */
export function parse(text: string, at: number): [value: Value, end: number] {
  let position = skip(text, at)
  const sign = text[position]
  if (sign === '/') {
    const name = /[^\0\t\n\f\r ()<>[\]{}/%]*/y
    name.lastIndex = position + 1
    const found = name.exec(text)![0]
    return [{ name: found }, position + 1 + found.length]
  }
  if (sign === '(') return literal(text, position)
  if (text.startsWith('<<', position)) {
    const entries: Record<string, Value> = {}
    position = skip(text, position + 2)
    while (!text.startsWith('>>', position)) {
      const [key, afterKey] = parse(text, position)
      const [value, afterValue] = parse(text, afterKey)
      entries[nameOf(key)!] = value
      position = skip(text, afterValue)
    }
    return [{ entries }, position + 2]
  }
  if (sign === '<') {
    const end = text.indexOf('>', position)
    return [{ bytes: Buffer.from(text.slice(position + 1, end).replace(/\s/g, ''), 'hex').toString('latin1') }, end + 1]
  }
  if (sign === '[') {
    const list: Value[] = []
    position = skip(text, position + 1)
    while (text[position] !== ']') {
      const [value, end] = parse(text, position)
      list.push(value)
      position = skip(text, end)
    }
    return [list, position + 1]
  }
  const reference = /(\d+) (\d+) R\b/y
  reference.lastIndex = position
  const ref = reference.exec(text)
  if (ref) return [{ ref: Number(ref[1]) }, position + ref[0].length]
  TOKEN.lastIndex = position
  const token = TOKEN.exec(text)?.[0]
  if (token === undefined) throw new Error(`cannot read "${text.slice(position, position + 20)}"`)
  const end = position + token.length
  if (/^[-.\d]/.test(token)) return [Number(token), end]
  return [token === 'true' ? true : token === 'false' ? false : token === 'null' ? null : { name: `!${token}` }, end]
}

export function skip(text: string, at: number): number {
  SPACE.lastIndex = at
  return at + SPACE.exec(text)![0].length
}

function literal(text: string, at: number): [Value, number] {
  let depth = 0
  let bytes = ''
  for (let position = at; position < text.length; position += 1) {
    const sign = text[position]!
    if (sign === '\\') {
      position += 1
      const next = text[position]!
      bytes += { n: '\n', r: '\r', t: '\t', b: '\b', f: '\f' }[next] ?? next
      continue
    }
    if (sign === '(') depth += 1
    if (sign === ')') depth -= 1
    if (depth === 0) return [{ bytes: bytes.slice(1) }, position + 1]
    bytes += sign
  }
  throw new Error('a string does not end')
}
