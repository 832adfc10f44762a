/** Goes through a job with the dictionary: every entry read to SI, every default taken, every fault noted with its path. */
import type { Catalogue } from '../catalogue/types.ts'
import { readQuantity } from '../quantity/read.ts'
import { echo } from '../quantity/signs.ts'
import {
  isRefused,
  type Entry,
  type Family,
  type Field,
  type NumberEntry,
  type QuantityEntry,
  type Way,
} from './field.ts'
import { FIELDS, fieldsBelow, type FieldPath, type FieldValue } from './fields.ts'
import { join, type Json, type JsonObject } from './json.ts'
import { either, FAMILY_IN_WORDS, inWords, limitsInWords, limitsOf, nearestNames } from './phrases.ts'
import type { DefaultTaken } from './types.ts'

/** What is wrong with one entry: where, what was read, what would be right. */
export interface Finding {
  readonly path: string
  readonly read: string
  readonly message: string
}

/** What a walk collects; keys are paths. Values are SI, an object is `true`, a map its keys; `entered` is what stood in the file. */
export interface Walked {
  readonly entered: Map<string, Json>
  readonly values: Map<string, unknown>
  readonly findings: Map<string, Finding>
  readonly defaults: Map<string, DefaultTaken>
}

/** More findings than this are not listed: the file is no job. */
const MOST_FINDINGS = 500

export const walk = (job: JsonObject, catalogue: Catalogue): Walked => {
  const walked: Walked = { entered: new Map(), values: new Map(), findings: new Map(), defaults: new Map() }
  readObject({ walked, catalogue }, job, '', '', undefined)
  return walked
}

/** Notes a finding: the first of each path is kept. */
export const find = ({ findings }: Walked, path: string, read: Json | undefined, message: string): void => {
  if (findings.has(path) || findings.size > MOST_FINDINGS) return
  if (findings.size < MOST_FINDINGS)
    findings.set(path, {
      path: cut(path.replace(UNPRINTABLE, '?'), 200),
      read: readInWords(read),
      message,
    })
  else
    findings.set('', {
      path: '',
      read: '',
      message: `more than ${MOST_FINDINGS} entries are wrong; the rest is not listed`,
    })
}

/** Notes a finding at a path of the dictionary, with the field's name and what was entered there. */
export const findAt = (walked: Walked, path: FieldPath, at: readonly (number | string)[], message: string): void => {
  const here = placed(path, at)
  find(walked, here, walked.entered.get(here), `${FIELDS[path].name}: ${message}`)
}

/** The value at a path of the dictionary; `at` fills its `[]` and `{…}` in order. Undefined where it was left out or is wrong. */
export const seen = <P extends FieldPath>(
  { values }: Walked,
  path: P,
  ...at: readonly (number | string)[]
): FieldValue<P> | undefined => values.get(placed(path, at)) as FieldValue<P> | undefined

/** The path in the file of a path in the dictionary. */
export const placed = (path: FieldPath, at: readonly (number | string)[]): string => {
  let next = 0
  return path.replace(/\[\]|\.\{\w+\}/g, () => join('_', at[next++]!).slice(1))
}

interface Tools {
  readonly walked: Walked
  readonly catalogue: Catalogue
}

const readObject = (
  tools: Tools,
  json: JsonObject,
  pattern: string,
  path: string,
  ways: readonly Way[] | undefined,
): void => {
  const { walked } = tools
  const fields = fieldsBelow(pattern)
  const way = ways && chooseWay(ways, json)
  const ofOtherWays = new Set(ways?.flatMap(keysOf).filter((key) => !way || !keysOf(way).includes(key)))
  for (const key of Object.keys(json)) {
    if (walked.findings.size > MOST_FINDINGS) return
    const known = fields.get(key)
    if (!known) find(walked, join(path, key), json[key], unknownField(key, [...fields.keys()]))
    else if (way && ofOtherWays.has(key))
      find(
        walked,
        join(path, key),
        json[key],
        `${known.field.name} does not go with ${presentKeys(way, json)}; leave one out`,
      )
  }
  for (const [key, { path: fieldPattern, field }] of fields) {
    const fieldPath = join(path, key)
    const value = json[key]
    if (value !== undefined) {
      walked.entered.set(fieldPath, value)
      if (way === undefined || !ofOtherWays.has(key)) readField(tools, field, value, fieldPattern, fieldPath)
    } else if (way?.needs.includes(key) || (field.required === true && !ofOtherWays.has(key)))
      find(
        walked,
        fieldPath,
        undefined,
        `${field.name} is required: ${inWords(field.entry)}${needsBelow(fieldPattern)}`,
      )
    else if (!ofOtherWays.has(key)) takeDefault(tools, field, fieldPattern, fieldPath)
  }
}

/** What an object needs, for the message where the whole object is missing. */
const needsBelow = (pattern: string): string => {
  const needed = [...fieldsBelow(pattern)].filter(([, { field }]) => field.required === true).map(([key]) => key)
  return needed.length > 0 ? ` with ${needed.join(', ')}` : ''
}

const takeDefault = (tools: Tools, field: Field, pattern: string, path: string): void => {
  if (field.default === undefined || isRefused(field)) return
  const { entry, text, source } = field.default
  if (entry !== undefined) readField(tools, field, entry, pattern, path)
  if (field.entry.is !== 'object' || text !== undefined)
    tools.walked.defaults.set(path, { path, value: text ?? defaultInWords(entry), source })
}

const readField = (tools: Tools, field: Field, json: Json, pattern: string, path: string): void => {
  const { walked } = tools
  const { notCovered } = field
  const refuse = (what: string) => {
    find(walked, path, json, `${what} not covered by this version`)
  }
  if (notCovered === 'all') {
    refuse(`${field.name} is`)
    return
  }
  const unless = notCovered && 'unless' in notCovered ? notCovered.unless : undefined
  if (Array.isArray(unless) && Array.isArray(json) && json.length > 0) {
    refuse(`${field.name}: values other than an empty list are`)
    return
  }
  const value = readEntry(tools, field, field.entry, json, pattern, path)
  if (value === undefined) return
  if (unless !== undefined && !Array.isArray(unless) && value !== unless)
    refuse(`${field.name}: anything but ${JSON.stringify(unless)} is`)
  else if (notCovered && 'values' in notCovered && notCovered.values.includes(value as string))
    refuse(`${field.name}: ${JSON.stringify(value)} is`)
  else walked.values.set(path, value)
}

/** The value in SI, or undefined once a finding is noted. */
const readEntry = (tools: Tools, field: Field, entry: Entry, json: Json, pattern: string, path: string): unknown => {
  const { walked, catalogue } = tools
  const wrong = (message = `must be ${inWords(entry)}`): unknown => {
    find(walked, path, json, `${field.name}: ${message}`)
    return undefined
  }
  switch (entry.is) {
    case 'text':
      return typeof json === 'string' && json.trim() !== '' && json.length <= entry.most ? json : wrong()
    case 'constant':
      return json === entry.value ? json : wrong()
    case 'choice':
      return typeof json === 'string' && entry.of.includes(json) ? json : wrong()
    case 'flag':
      return typeof json === 'boolean' ? json : wrong()
    case 'number':
      if (typeof json !== 'number') return wrong()
      return within(entry, json) && (!entry.whole || Number.isInteger(json)) ? json : wrong()
    case 'quantity': {
      if (typeof json !== 'number' && typeof json !== 'string') return wrong()
      if (typeof json === 'number' && !Number.isFinite(json)) return wrong(`must lie ${limitsInWords(entry)}`)
      const read = readQuantity(json, entry.kind)
      if (!read.ok) return wrong(read.message)
      return within(entry, read.value) ? read.value : wrong(`must lie ${limitsInWords(entry)}`)
    }
    case 'lookUp': {
      if (typeof json !== 'string') return wrong()
      const found = catalogue[entry.family](json)
      if (found) return found
      const near = catalogue.nearest(entry.family, json.slice(0, 60))
      return wrong(
        `the catalogue of this version has no such name for ${FAMILY_IN_WORDS[entry.family]}` +
          (near.length > 0 ? `; nearest: ${near.join(', ')}` : `; it has ${held(catalogue, entry.family)}`),
      )
    }
    case 'list': {
      if (!Array.isArray(json)) return wrong()
      const list = json as readonly Json[]
      if (list.length < entry.least || list.length > entry.most) return wrong()
      const items = list.map((item, index) =>
        readEntry(tools, field, entry.of, item, `${pattern}[]`, join(path, index)),
      )
      return items.includes(undefined) ? undefined : items
    }
    case 'map': {
      if (!isObject(json)) return wrong()
      const keys = Object.keys(json)
      if (keys.length === 0 || keys.length > entry.most) return wrong(`must name 1 to ${entry.most} cranes`)
      for (const key of keys) {
        const keyPath = join(path, key)
        if (FORBIDDEN.has(key)) find(walked, keyPath, json[key], `${field.name}: no name of a ${entry.key}`)
        else readEntry(tools, field, entry.of, json[key]!, `${pattern}.{${entry.key}}`, keyPath)
      }
      return keys
    }
    case 'either': {
      const fits = entry.of.find((one) => sameForm(one, json) && (one.is !== 'quantity' || beginsAsNumber(json)))
      return fits ? readEntry(tools, field, fits, json, pattern, path) : wrong()
    }
    case 'object': {
      if (!isObject(json)) return wrong()
      if (entry.ways && !chooseWay(entry.ways, json)) return wrong()
      readObject(tools, json, pattern, path, entry.ways)
      return true
    }
  }
}

/** What the catalogue has of a kind, where no name is near: the families of shapes, the names of rails and steels. */
const held = (catalogue: Catalogue, family: Family): string => {
  const families = { iShape: catalogue.iShapes, channel: catalogue.channels }
  if (family === 'rail') return catalogue.rails.map(({ name }) => name).join(', ')
  if (family === 'steel') return catalogue.steels.map(({ name }) => name).join(', ')
  return `the families ${[...new Set(families[family].map((shape) => shape.family))].join(', ')}`
}

const FORBIDDEN = new Set(['__proto__', 'constructor', 'prototype'])

/** The way whose `kind` is given; else the one with most of its fields present; none where no field is present. */
const chooseWay = (ways: readonly Way[], json: JsonObject): Way | undefined => {
  const named = ways.find((way) => way.kind !== undefined && way.kind === json.kind)
  if (named) return named
  const present = (way: Way) => keysOf(way).filter((key) => Object.hasOwn(json, key)).length
  const best = [...ways].sort((one, other) => present(other) - present(one))[0]!
  return present(best) > 0 || 'kind' in json ? best : undefined
}

const keysOf = (way: Way): readonly string[] => [...way.needs, ...(way.may ?? [])]

const presentKeys = (way: Way, json: JsonObject): string =>
  way.kind !== undefined && json.kind === way.kind
    ? `kind "${way.kind}"`
    : either(keysOf(way).filter((key) => Object.hasOwn(json, key)))

const within = (entry: NumberEntry | QuantityEntry, value: number): boolean => {
  const { from, above, to } = limitsOf(entry)
  return (
    Number.isFinite(value) &&
    value <= to &&
    !(from !== undefined && value < from) &&
    !(above !== undefined && value <= above)
  )
}

const sameForm = (entry: Entry, json: Json): boolean => {
  if (entry.is === 'choice') return typeof json === 'string' && entry.of.includes(json)
  if (entry.is === 'quantity') return typeof json === 'string' || typeof json === 'number'
  if (entry.is === 'list') return Array.isArray(json)
  if (entry.is === 'map' || entry.is === 'object') return isObject(json)
  if (entry.is === 'number') return typeof json === 'number'
  return typeof json === 'string'
}

/** Beside words of choice only what begins as a number is read as a quantity: of "derived" the choices are told. */
const beginsAsNumber = (json: Json): boolean =>
  typeof json !== 'string' || /^[\s(+\u2212-]*[\d.\u00bc-\u00be\u2150-\u215e]/.test(json)

export const isObject = (json: Json | undefined): json is JsonObject =>
  typeof json === 'object' && json !== null && !Array.isArray(json)

const unknownField = (key: string, names: readonly string[]): string => {
  const near = FORBIDDEN.has(key) ? [] : nearestNames(key, names, 3)
  return near.length > 0
    ? `there is no field of this name; did you mean ${either(near.map((name) => `"${name}"`))}?`
    : `there is no field of this name; the fields here are ${names.join(', ')}`
}

const readInWords = (json: Json | undefined): string => {
  if (json === undefined) return 'nothing'
  if (Array.isArray(json)) return json.length <= 12 ? cut(JSON.stringify(json), 60) : `a list of ${json.length} values`
  if (isObject(json)) return `an object with ${Object.keys(json).length} fields`
  if (typeof json === 'string') return echo(json.slice(0, 200))
  return typeof json === 'number' ? String(json) : JSON.stringify(json)
}

const defaultInWords = (entry: Json | undefined): string => {
  if (Array.isArray(entry)) return entry.join(', ')
  return typeof entry === 'string' ? entry : JSON.stringify(entry)
}

const cut = (text: string, most: number): string => (text.length <= most ? text : `${text.slice(0, most - 3)}...`)

/** Signs that would disturb the line a path is printed in: controls, and marks that turn the direction of writing. */
const UNPRINTABLE = /[^\p{L}\p{M}\p{N}\p{P}\p{S} ]/gu
