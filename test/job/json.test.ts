import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { join, parseJson, type Json } from '../../core/job/json.ts'

const parsed = (text: string): Json => {
  const result = parseJson(text, 100)
  if (!result.ok) throw new Error(result.message)
  return result.value
}

/** Plain objects of the reading, for comparison with JSON.parse. */
const plain = (value: Json): unknown => JSON.parse(JSON.stringify(value))

describe('reading JSON', () => {
  test('gives what JSON.parse gives, for any JSON', () => {
    fc.assert(
      fc.property(fc.json(), fc.constantFrom(0, 1, 3), (text, indent) => {
        const spaced = JSON.stringify(JSON.parse(text), null, indent)
        expect(plain(parsed(spaced))).toEqual(JSON.parse(spaced))
      }),
      { numRuns: 500 },
    )
  })

  test('accepts and refuses the texts that JSON.parse accepts and refuses', () => {
    const marks = fc.constantFrom(...'{}[]",:0123456789.eE+-\\/ntrufalse \n\t\u0000\u20AC'.split(''))
    const damaged = fc
      .tuple(fc.json(), fc.nat(), fc.nat({ max: 3 }), fc.array(marks, { maxLength: 3 }))
      .map(([text, at, cut, put]) => {
        const place = at % (text.length + 1)
        return text.slice(0, place) + put.join('') + text.slice(place + cut)
      })
    fc.assert(
      fc.property(
        fc.oneof(
          damaged,
          fc.array(marks).map((all) => all.join('')),
        ),
        (text) => {
          expect(parseJson(text, 100).ok).toBe(acceptedByPlatform(text))
        },
      ),
      { numRuns: 5000 },
    )
  })

  test('reports names written twice with their paths, and keeps the last as JSON.parse does', () => {
    const text = '{"a":1,"b":[{"c":1,"c":2}],"a":{"a":0},"x y":0,"x y":0}'
    expect(parseJson(text, 9)).toMatchObject({ ok: true, repeated: ['b[0].c', 'a', '["x y"]'] })
    expect(plain(parsed(text))).toEqual(JSON.parse(text))
  })

  test('takes __proto__ as a name', () => {
    const value = parsed('{"__proto__":{"polluted":true}}') as Record<string, Json>
    expect(Object.keys(value)).toEqual(['__proto__'])
    expect(({} as Record<string, unknown>).polluted).toBeUndefined()
  })

  test.each([
    ['{"a":1,}', /line 1, column 8: a field name/],
    ['{"a" 1}', /: is expected after the field name “a”/],
    ['[1 2]', /, is expected between two values/],
    ['{"a":1}\r\n{', /line 2, column 1: nothing may follow/],
    ['["a\nb"]', /line 1, column 4: a line break/],
    ['["\\x"]', /backslash/],
    ['["\\ud800"]', /surrogate/],
    ['["a', /ends too early.*closing quotation mark/],
    ['01', /“01” is no JSON value/],
    ['.5', /no JSON value/],
    ['True', /“True” is no JSON value/],
    ['{"a":\n\n', /line 3, column 1: the file ends too early/],
    [`[${'1'.repeat(5000)}]`, /no JSON value/],
    ['[[[[]]]]', /nested deeper than 2 levels/],
  ])('%j is refused with its place', (text, message) => {
    const result = parseJson(text, 2)
    expect(result.ok ? 'accepted' : result.message).toMatch(message)
  })

  test('paths are written as messages write them', () => {
    expect([join('', 'cranes'), join('cranes', 0), join('cranes[0]', 'name'), join('', 'a b'), join('a', '0')]).toEqual(
      ['cranes', 'cranes[0]', 'cranes[0].name', '["a b"]', 'a["0"]'],
    )
  })
})

/** JSON.parse's opinion, save for what is refused on purpose: broken surrogate pairs. */
const acceptedByPlatform = (text: string): boolean => {
  try {
    return JSON.stringify(JSON.parse(text)).search(/\\ud[89a-f]/) < 0
  } catch {
    return false
  }
}
