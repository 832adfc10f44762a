/**
 * The dictionary as a JSON Schema (draft 2020-12) of the whole format. It accepts every job that this program reads; what this
 * version refuses as not covered stays in it and is said in its description, since a later version may read it.
 */
import type { Entry, Field } from './field.ts'
import { fieldsBelow } from './fields.ts'
import type { Json } from './json.ts'
import { inWords, limitsOf } from './phrases.ts'

type Schema = Record<string, Json>

export const jobSchema = (): Schema => ({
  $schema: 'https://json-schema.org/draft/2020-12/schema',
  $id: 'urn:longtravel:job:1',
  title: 'Longtravel job, version 1',
  description:
    'One girder line and the cranes on it. A quantity is a text with its unit ("30 ft", "12 ft 6 in", "38.1 kip"); a plain ' +
    'number is SI (N, m, Pa, kg, m/s).',
  ...objectOf('', undefined),
})

/** What this version does not read of a field, as a sentence; '' where it reads all. */
export const coverageInWords = ({ notCovered }: Field): string => {
  if (notCovered === undefined) return ''
  if (notCovered === 'all') return 'Not covered by this version: refused.'
  if ('unless' in notCovered) return `Not covered by this version: anything but ${JSON.stringify(notCovered.unless)}.`
  if ('values' in notCovered)
    return `Not covered by this version: ${notCovered.values.map((value) => JSON.stringify(value)).join(', ')}.`
  return `Not covered by this version: ${notCovered.text}.`
}

const objectOf = (path: string, ways: readonly { kind?: string; needs: readonly string[] }[] | undefined): Schema => {
  const fields = [...fieldsBelow(path)]
  const required = fields.filter(([, { field }]) => field.required === true).map(([key]) => key)
  return {
    type: 'object',
    ...(fields.length > 0
      ? {
          properties: Object.fromEntries(fields.map(([key, below]) => [key, propertyOf(below.field, below.path)])),
          additionalProperties: false,
        }
      : {}),
    ...(required.length > 0 ? { required } : {}),
    ...(ways ? { oneOf: ways.map((way) => wayOf(way, ways)) } : {}),
  }
}

/** One way has all it needs and nothing that only the others need. */
const wayOf = (
  way: { kind?: string; needs: readonly string[] },
  ways: readonly { kind?: string; needs: readonly string[] }[],
): Schema => ({
  required: way.needs,
  properties: {
    ...(way.kind === undefined ? {} : { kind: { const: way.kind } }),
    ...Object.fromEntries(
      ways.filter((other) => other !== way).flatMap(({ needs }) => needs.map((key) => [key, false] as const)),
    ),
  },
})

const propertyOf = (field: Field, path: string): Schema => ({
  title: field.name,
  description: [field.meaning, coverageInWords(field)].filter((part) => part !== '').join(' '),
  ...schemaOf(field.entry, path),
  ...(field.default?.entry === undefined || field.entry.is === 'object' ? {} : { default: field.default.entry }),
})

const schemaOf = (entry: Entry, path: string): Schema => {
  switch (entry.is) {
    case 'text':
      return { type: 'string', minLength: 1, maxLength: entry.most, pattern: '\\S' }
    case 'constant':
      return { const: entry.value }
    case 'choice':
      return { enum: entry.of }
    case 'flag':
      return { type: 'boolean' }
    case 'number':
      return { type: entry.whole ? 'integer' : 'number', ...limits(entry) }
    case 'quantity':
      return {
        $comment: inWords(entry),
        type: ['string', 'number'],
        pattern: '[0-9¼-¾⅐-⅞]',
        ...limits(entry),
      }
    case 'lookUp':
      return { type: 'string', minLength: 1 }
    case 'list':
      return { type: 'array', minItems: entry.least, maxItems: entry.most, items: schemaOf(entry.of, `${path}[]`) }
    case 'map':
      return {
        type: 'object',
        minProperties: 1,
        maxProperties: entry.most,
        additionalProperties: schemaOf(entry.of, `${path}.{${entry.key}}`),
      }
    case 'either':
      return { anyOf: entry.of.map((one) => schemaOf(one, path)) }
    case 'object':
      return objectOf(path, entry.ways)
  }
}

/** Limits bind plain numbers, which are SI; a text with its unit is held to them when it is read. */
const limits = (entry: Parameters<typeof limitsOf>[0]): Schema => {
  const { from, above, to } = limitsOf(entry)
  return {
    ...(from === undefined ? {} : { minimum: from }),
    ...(above === undefined ? {} : { exclusiveMinimum: above }),
    maximum: to,
  }
}
