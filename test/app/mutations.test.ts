/** Sample jobs spoilt in every way that comes to mind: reviewed or refused, never a fault of the program, never a hang. */
import { readFileSync, readdirSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkText } from '../../app/command/check.ts'

const RUNS = 20_000

type Json = null | boolean | number | string | Json[] | { [key: string]: Json }

const folder = new URL('../../resources/jobs/', import.meta.url)
const samples = readdirSync(folder).map((name) => readFileSync(new URL(name, folder), 'utf8'))

/** Where a value stands: what holds it, and under which key. */
interface Spot {
  readonly holder: { [key: string]: Json }
  readonly key: string
}

/** Every spot of a job, the nested ones included; a list is an object with its indices as keys. */
const spotsOf = (value: Json): readonly Spot[] => {
  if (typeof value !== 'object' || value === null) return []
  const holder = value as { [key: string]: Json }
  return Object.keys(holder).flatMap((key) => [{ holder, key }, ...spotsOf(holder[key]!)])
}

type Spoil = (spot: Spot, job: Json) => void

const put =
  (value: Json): Spoil =>
  ({ holder, key }) => {
    Object.defineProperty(holder, key, { value, enumerable: true, configurable: true, writable: true })
  }

/** A figure made larger or smaller keeps its unit: the way to reach what is allowed and absurd. */
const scale =
  (factor: number): Spoil =>
  ({ holder, key }) => {
    const value = holder[key]
    if (typeof value === 'number') holder[key] = value * factor
    if (typeof value === 'string')
      holder[key] = value.replace(/\d+(\.\d+)?/, (figure) => String(Number(figure) * factor))
  }

const isFigure = ({ holder, key }: Spot): boolean => typeof holder[key] === 'string' && /^\d/.test(holder[key])

const drop: Spoil = ({ holder, key }) => {
  if (Array.isArray(holder)) holder.splice(Number(key), 1)
  else Reflect.deleteProperty(holder, key)
}

const twice: Spoil = ({ holder, key }) => {
  if (Array.isArray(holder)) holder.push(structuredClone(holder[Number(key)] as Json))
}

const exchange =
  (other: number): Spoil =>
  ({ holder, key }, job) => {
    const spots = spotsOf(job)
    const from = spots[other % spots.length]!
    holder[key] = structuredClone(from.holder[from.key]!)
  }

const words = [
  ...['', ' ', 'abc', 'NaN', 'Infinity', '-', '1/0 in', '0 ft', '-5 kip', '1e400 kip', '30 ft', '12 ft 6 in', '170 kN'],
  ...[
    '0,5 m',
    '1.000,5 mm',
    '5',
    '100 %',
    'W24X84',
    'w 24 x 84',
    'C15X33.9',
    'us',
    'si',
    'eu',
    'ASD',
    'LRFD',
    'derive',
  ],
  ...['__proto__', 'constructor', 'diagram', 'rail', 'half-both', 'A', 'F', 'hand', 'none', '50 ksi', '٣ ft', '\u0000'],
]

const spoil: fc.Arbitrary<Spoil> = fc.oneof(
  { weight: 3, arbitrary: fc.constantFrom(...words).map(put) },
  { weight: 2, arbitrary: fc.double().map(put) },
  { weight: 2, arbitrary: fc.string().map(put) },
  { weight: 1, arbitrary: fc.jsonValue({ maxDepth: 3 }).map((value) => put(value as Json)) },
  { weight: 3, arbitrary: fc.constantFrom(drop, twice) },
  { weight: 3, arbitrary: fc.nat().map(exchange) },
  {
    weight: 1,
    arbitrary: fc.constantFrom('__proto__', 'toString', 'x', '').map((key): Spoil => ({ holder }, job) => {
      put(1)({ holder, key }, job)
    }),
  },
)

/** What may be spoilt in a change, and how: figures moved within reason or beyond it, or anything made anything. */
const change = fc.oneof(
  {
    weight: 6,
    arbitrary: fc.double({ min: 0.3, max: 3, noNaN: true }).map((factor) => [isFigure, scale(factor)] as const),
  },
  {
    weight: 2,
    arbitrary: fc.double({ min: -9, max: 9, noNaN: true }).map((power) => [isFigure, scale(10 ** power)] as const),
  },
  { weight: 3, arbitrary: spoil.map((anything) => [() => true, anything] as const) },
)

/** The text itself cut short, with a piece missing or put twice. */
const tear = fc.option(
  fc.record({ at: fc.nat(), length: fc.integer({ min: 0, max: 30 }), how: fc.constantFrom('cut', 'miss', 'repeat') }),
  { freq: 10, nil: undefined },
)

const torn = (text: string, how: string, from: number, length: number): string => {
  const at = from % text.length
  if (how === 'cut') return text.slice(0, at)
  if (how === 'miss') return text.slice(0, at) + text.slice(at + length)
  return text.slice(0, at + length) + text.slice(at)
}

const mutated = fc
  .record({
    sample: fc.constantFrom(...samples),
    changes: fc.array(fc.tuple(fc.nat(), change), { minLength: 1, maxLength: 2 }),
    tear,
  })
  .map(({ sample, changes, tear: hole }) => {
    const job = JSON.parse(sample) as Json
    for (const [pick, [may, spoilt]] of changes) {
      const spots = spotsOf(job).filter(may)
      const spot = spots[pick % spots.length]
      if (spot !== undefined) spoilt(spot, job)
    }
    const text = JSON.stringify(job, null, 2)
    return hole === undefined ? text : torn(text, hole.how, hole.at, hole.length)
  })

describe('a spoilt job', () => {
  it('is reviewed or refused in words, and nothing else', { timeout: 400_000 }, () => {
    const exits = new Map<number, number>()
    fc.assert(
      fc.property(mutated, (text) => {
        const outcome = checkText(text)
        exits.set(outcome.exit, (exits.get(outcome.exit) ?? 0) + 1)
        if (outcome.exit !== 2) return outcome.result.checks.length > 0
        return outcome.messages.length > 0 && outcome.messages.every((message) => /^[^\n]{5,}$/.test(message))
      }),
      { numRuns: RUNS },
    )
    // Both ways must be met often, or the property would prove nothing.
    const refused = exits.get(2) ?? 0
    expect(refused).toBeGreaterThan(RUNS / 20)
    expect(RUNS - refused).toBeGreaterThan(RUNS / 20)
  })
})
