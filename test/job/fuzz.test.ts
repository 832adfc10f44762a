import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Json } from '../../core/job/json.ts'
import { jobSchema } from '../../core/job/schema.ts'
import { ownShape, platedInFull, read, rolledInFull, smallest, type Draft } from './plant.ts'
import { misfits } from './schema-check.ts'

/** A job whose every number is finite, or findings that each say something. */
const judge = (text: string): boolean => {
  const result = read(text)
  if (result.ok) {
    finite(result.job)
    return true
  }
  expect(result.findings.length).toBeGreaterThan(0)
  expect(new Set(result.findings.map(({ path }) => path)).size).toBe(result.findings.length)
  for (const { message } of result.findings) expect(message).toMatch(/\S/)
  return false
}

const finite = (value: unknown): void => {
  if (typeof value === 'number') expect(value).toSatisfy(Number.isFinite)
  else if (value instanceof Map) [...value].forEach(finite)
  else if (typeof value === 'object' && value !== null) Object.values(value).forEach(finite)
  else expect(value).toBeDefined()
}

const odd = fc.constantFrom<Json>(
  null,
  true,
  false,
  0,
  -0,
  -1,
  1e-320,
  1e308,
  0.5,
  3,
  '',
  ' ',
  'NaN',
  'Infinity',
  '1e999 m',
  '0 m',
  '-3 ft',
  '12 ft 6 in',
  '3*7.5 m',
  '10 ton',
  '1,5 m',
  '100 kN/m',
  'derive',
  'hand',
  'W24X76',
  '__proto__',
  'constructor',
  [],
  {},
  [[]],
  ['1 m', '2 m'],
  { name: 'A36' },
  { shape: 'C15X33.9' },
)
const anything = fc.oneof({ weight: 3, arbitrary: odd }, fc.jsonValue() as fc.Arbitrary<Json>)

/** One change of a job: something put in place of an entry, an entry taken out, doubled or moved. */
const change = fc.record({
  where: fc.nat(),
  how: fc.constantFrom('replace', 'remove', 'add', 'repeat', 'swap'),
  key: fc.oneof(fc.constantFrom('__proto__', 'constructor', 'name', 'cap', 'wheelLoad', 'E'), fc.string()),
  value: anything,
})

const mutate = (
  job: Draft,
  { where, how, key, value: shared }: { where: number; how: string; key: string; value: Json },
): void => {
  // The value may be one of the list above, and a further change may reach into it.
  const value = structuredClone(shared)
  const all: [parent: Draft, key: string][] = []
  const gather = (parent: Draft) => {
    for (const [name, child] of Object.entries(parent)) {
      all.push([parent, name])
      if (typeof child === 'object' && child !== null) gather(child as Draft)
    }
  }
  gather(job)
  if (all.length === 0) return
  const [parent, name] = all[where % all.length]!
  if (how === 'replace') parent[name] = value
  else if (how === 'swap')
    parent[name] = all[(where * 7) % all.length]![0] === parent ? value : structuredClone(Object.values(parent)[0]!)
  else if (Array.isArray(parent)) {
    if (how === 'remove') parent.splice(Number(name), 1)
    else parent.push(how === 'add' ? value : structuredClone(parent[0] as Json))
  } else if (how === 'remove')
    delete parent[name] // eslint-disable-line @typescript-eslint/no-dynamic-delete
  else Object.defineProperty(parent, key, { value, enumerable: true, configurable: true, writable: true })
}

describe('whatever is read, there is a job of finite numbers or there are findings', () => {
  test('any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        judge(text)
      }),
      { numRuns: 1000 },
    )
  })

  test('any JSON', () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 6 }), (text) => {
        judge(text)
      }),
      { numRuns: 1000 },
    )
  })

  test('a job cut short or with letters changed', () => {
    const text = JSON.stringify(rolledInFull())
    fc.assert(
      fc.property(fc.nat(text.length), fc.nat(8), fc.string({ maxLength: 4 }), (place, cut, put) => {
        judge(text.slice(0, place) + put + text.slice(place + cut))
        judge(text.slice(0, place))
      }),
      { numRuns: 1000 },
    )
  })

  test('jobs with up to four changes; the schema accepts all that are read', () => {
    const schema = jobSchema()
    const drafts = [smallest, rolledInFull, platedInFull, ownShape]
    let accepted = 0
    fc.assert(
      fc.property(fc.constantFrom(...drafts), fc.array(change, { maxLength: 4 }), (draft, changes) => {
        const job = draft()
        for (const one of changes) mutate(job, one)
        const text = JSON.stringify(job)
        if (!judge(text)) return
        accepted++
        expect(misfits(schema, JSON.parse(text))).toEqual([])
      }),
      { numRuns: 4000 },
    )
    // Else the changes would be so wild that nothing is tried but refusals.
    expect(accepted).toBeGreaterThan(400)
  })
})
