/** A checker for the few keywords of JSON Schema that the job's schema uses; any other keyword is an error of the test. */
type Schema = boolean | Record<string, unknown>

const NOTES = new Set(['$schema', '$id', '$comment', 'title', 'description', 'default'])

/** Where and why a value does not fit a schema; empty where it fits. */
export const misfits = (schema: Schema, value: unknown, path = '$'): readonly string[] => {
  if (schema === true) return []
  if (schema === false) return [`${path}: not allowed`]
  return Object.entries(schema).flatMap(([keyword, rule]) => {
    if (NOTES.has(keyword)) return []
    const check = KEYWORDS[keyword]
    if (!check) throw new Error(`The checker does not know the keyword ${keyword}`)
    return check(rule, value, path, schema)
  })
}

type Check = (rule: unknown, value: unknown, path: string, schema: Record<string, unknown>) => readonly string[]

const unless = (fits: boolean, path: string, why: string): readonly string[] => (fits ? [] : [`${path}: ${why}`])
const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const typeOf = (value: unknown): string => {
  if (value === null) return 'null'
  return Array.isArray(value) ? 'array' : typeof value
}

const KEYWORDS: Record<string, Check> = {
  type: (rule, value, path) => {
    const types = [rule].flat() as string[]
    const fits = types.includes(typeOf(value)) || (types.includes('integer') && Number.isInteger(value))
    return unless(fits, path, `is no ${types.join(' or ')}`)
  },
  const: (rule, value, path) => unless(value === rule, path, `is not ${JSON.stringify(rule)}`),
  enum: (rule, value, path) => unless((rule as unknown[]).includes(value), path, 'is no choice'),
  minLength: (rule, value, path) =>
    unless(typeof value !== 'string' || value.length >= Number(rule), path, 'is too short'),
  maxLength: (rule, value, path) =>
    unless(typeof value !== 'string' || value.length <= Number(rule), path, 'is too long'),
  pattern: (rule, value, path) =>
    unless(typeof value !== 'string' || new RegExp(rule as string, 'u').test(value), path, 'does not fit the pattern'),
  minimum: (rule, value, path) => unless(typeof value !== 'number' || value >= Number(rule), path, 'is too small'),
  exclusiveMinimum: (rule, value, path) =>
    unless(typeof value !== 'number' || value > Number(rule), path, 'is too small'),
  maximum: (rule, value, path) => unless(typeof value !== 'number' || value <= Number(rule), path, 'is too large'),
  minItems: (rule, value, path) =>
    unless(!Array.isArray(value) || value.length >= Number(rule), path, 'has too few items'),
  maxItems: (rule, value, path) =>
    unless(!Array.isArray(value) || value.length <= Number(rule), path, 'has too many items'),
  items: (rule, value, path) =>
    Array.isArray(value) ? value.flatMap((item, index) => misfits(rule as Schema, item, `${path}[${index}]`)) : [],
  minProperties: (rule, value, path) =>
    unless(!isObject(value) || Object.keys(value).length >= Number(rule), path, 'has too few fields'),
  maxProperties: (rule, value, path) =>
    unless(!isObject(value) || Object.keys(value).length <= Number(rule), path, 'has too many fields'),
  required: (rule, value, path) =>
    isObject(value) ? (rule as string[]).flatMap((key) => unless(Object.hasOwn(value, key), path, `lacks ${key}`)) : [],
  properties: (rule, value, path) =>
    isObject(value)
      ? Object.entries(rule as Record<string, Schema>).flatMap(([key, schema]) =>
          Object.hasOwn(value, key) ? misfits(schema, value[key], `${path}.${key}`) : [],
        )
      : [],
  additionalProperties: (rule, value, path, schema) =>
    isObject(value)
      ? Object.keys(value)
          .filter((key) => !Object.hasOwn(schema.properties ?? {}, key))
          .flatMap((key) => misfits(rule as Schema, value[key], `${path}.${key}`))
      : [],
  anyOf: (rule, value, path) =>
    unless(
      (rule as Schema[]).some((one) => misfits(one, value).length === 0),
      path,
      'fits no choice',
    ),
  oneOf: (rule, value, path) =>
    unless((rule as Schema[]).filter((one) => misfits(one, value).length === 0).length === 1, path, 'fits not one way'),
}
