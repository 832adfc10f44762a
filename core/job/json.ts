/**
 * JSON as RFC 8259 has it, read so that nothing is lost: a name written twice in one object is reported (JSON.parse keeps the
 * last one silently), `__proto__` is a name like any other, and a fault is told with its line and column.
 */
import { echo } from '../quantity/signs.ts'

export type Json = null | boolean | number | string | readonly Json[] | JsonObject
export interface JsonObject {
  readonly [name: string]: Json
}

export type Parsed =
  | { readonly ok: true; readonly value: Json; readonly repeated: readonly string[] }
  | { readonly ok: false; readonly read: string; readonly message: string }

/**
 * Reads a JSON text of at most `deepest` nested levels. Never throws. Objects have no prototype. A number beyond the range of
 * a double is read as infinite: the caller refuses it where it knows the field. `repeated` are the paths of names written twice.
 */
export const parseJson = (text: string, deepest: number): Parsed => {
  const fault = new Error('not JSON')
  let at = text.startsWith('\uFEFF') ? 1 : 0
  let wrong = { at: 0, message: '' }
  const trail: (string | number)[] = []
  const repeated: string[] = []

  const fail = (message: string, where = at): never => {
    wrong = { at: where, message }
    throw fault
  }
  const skip = () => {
    while (at < text.length && ' \t\n\r'.includes(text[at]!)) at++
  }
  const expect = (mark: string, place: string) => {
    skip()
    if (text[at] !== mark) fail(`${mark} is expected ${place}`)
    at++
  }

  const string = (): string => {
    const start = at++
    let escaped = false
    for (;;) {
      const code = text.charCodeAt(at)
      if (code < 0x20) fail('a line break or control character stands inside a text; write it as \\n, \\t or \\u0000')
      if (Number.isNaN(code)) fail('the closing quotation mark of a text is missing')
      at++
      if (code === 0x22) break
      if (code !== 0x5c) continue
      escaped = true
      if (text[at] === 'u' && /^[0-9a-fA-F]{4}$/.test(text.slice(at + 1, at + 5))) at += 5
      else if (at < text.length && '"\\/bfnrt'.includes(text[at]!)) at++
      else fail('a backslash must be followed by one of " \\ / b f n r t or by u and four hexadecimal digits')
    }
    const value = escaped ? (JSON.parse(text.slice(start, at)) as string) : text.slice(start + 1, at - 1)
    return value.isWellFormed() ? value : fail('a text holds half of a surrogate pair, which is no character', start)
  }

  const object = (level: number): JsonObject => {
    const value = Object.create(null) as Record<string, Json>
    at++
    skip()
    if (text[at] === '}') at++
    else
      for (;;) {
        skip()
        if (text[at] !== '"') fail('a field name in quotation marks is expected')
        const name = string()
        expect(':', `after the field name ${echo(name.slice(0, 100))}`)
        trail.push(name)
        if (Object.hasOwn(value, name)) repeated.push(trail.reduce<string>(join, ''))
        value[name] = any(level + 1)
        trail.pop()
        skip()
        if (text[at] === '}') {
          at++
          break
        }
        expect(',', 'between two fields, or } after the last')
      }
    return value
  }

  const list = (level: number): readonly Json[] => {
    const value: Json[] = []
    at++
    skip()
    if (text[at] === ']') at++
    else
      for (;;) {
        trail.push(value.length)
        value.push(any(level + 1))
        trail.pop()
        skip()
        if (text[at] === ']') {
          at++
          break
        }
        expect(',', 'between two values, or ] after the last')
      }
    return value
  }

  const any = (level: number): Json => {
    skip()
    if (level > deepest) fail(`nested deeper than ${deepest} levels, which no job needs`)
    const mark = text[at]
    if (mark === '{') return object(level)
    if (mark === '[') return list(level)
    if (mark === '"') return string()
    const word = takeWord(text, at)
    if (/^-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?$/.test(word)) {
      at += word.length
      return Number(word)
    }
    const named = { true: true, false: false, null: null }[word]
    if (named === undefined)
      return fail(word === '' ? 'a value is expected' : `${echo(word)} is no JSON value; texts need quotation marks`)
    at += word.length
    return named
  }

  try {
    skip()
    if (at === text.length) fail('the file is empty')
    const value = any(0)
    skip()
    if (at < text.length) fail('nothing may follow the end of the job')
    return { ok: true, value, repeated }
  } catch (thrown) {
    if (thrown !== fault) throw thrown
    return { ok: false, read: sample(text, wrong.at), message: place(text, wrong.at) + wrong.message }
  }
}

/** The path of a field or list item below `path`, as messages write it: `cranes[0].wheelLoad`, odd names as `["…"]`. */
export const join = (path: string, step: string | number): string => {
  if (typeof step === 'number') return `${path}[${step}]`
  if (!/^[A-Za-z_$][\w$]*$/.test(step)) return `${path}[${JSON.stringify(step)}]`
  return path === '' ? step : `${path}.${step}`
}

/** No number needs a thousand digits; a longer run of them is no JSON value here. */
const takeWord = (text: string, at: number): string => {
  const word = /^[-+\w.]*/.exec(text.slice(at, at + 1001))?.[0] ?? ''
  return word.length > 1000 ? `${word}...` : word
}

const sample = (text: string, at: number): string =>
  at >= text.length ? 'the end of the file' : echo(text.slice(at, at + 100).split(/[\r\n]/)[0] ?? '')

const place = (text: string, at: number): string => {
  if (text.trim() === '' || text === '\uFEFF') return ''
  const before = text.slice(0, at).split(/\r\n|\r|\n/)
  const where = `line ${before.length}, column ${(before.at(-1) ?? '').length + 1}: `
  return at >= text.length ? `${where}the file ends too early, perhaps only part of it was saved: ` : where
}
