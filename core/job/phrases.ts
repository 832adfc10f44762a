/** The dictionary's entries in words, for messages, the JSON Schema and the field reference. */
import { readQuantity } from '../quantity/read.ts'
import type { Entry, Family, NumberEntry, QuantityEntry } from './field.ts'

/** What may stand in the file, as the end of the sentence "… must be". */
export const inWords = (entry: Entry): string => {
  switch (entry.is) {
    case 'text':
      return `a text of 1 to ${entry.most} characters`
    case 'constant':
      return JSON.stringify(entry.value)
    case 'choice':
      return either(entry.of.map((word) => `"${word}"`))
    case 'flag':
      return 'true or false'
    case 'number':
      return `a ${entry.whole ? 'whole ' : ''}number ${limitsInWords(entry)}`
    case 'quantity':
      return `${KIND_IN_WORDS[entry.kind]} with its unit, ${limitsInWords(entry)}`
    case 'lookUp':
      return `the name of ${FAMILY_IN_WORDS[entry.family]}`
    case 'list':
      return listInWords(entry.least, entry.most, inWords(entry.of))
    case 'map':
      return `an object with a key for each ${entry.key}`
    case 'either':
      return either(entry.of.map(inWords))
    case 'object':
      return entry.ways === undefined
        ? 'an object'
        : `an object with ${either(entry.ways.map((way) => way.needs.join(', ')))}`
  }
}

/** "above 0 m and at most 100 m", with the limits as the dictionary writes them. */
export const limitsInWords = (entry: NumberEntry | QuantityEntry): string =>
  entry.above === undefined
    ? entry.from === undefined
      ? `of at most ${entry.to}`
      : `from ${entry.from} to ${entry.to}`
    : `above ${entry.above}, at most ${entry.to}`

/** The limits in SI. */
export const limitsOf = (entry: NumberEntry | QuantityEntry): { from?: number; above?: number; to: number } => {
  const si = (limit: string | number): number => {
    if (entry.is === 'number') return Number(limit)
    const read = readQuantity(limit, entry.kind)
    if (!read.ok) throw new Error(`The dictionary's limit ${limit} cannot be read: ${read.message}`)
    return read.value
  }
  return {
    ...(entry.from === undefined ? {} : { from: si(entry.from) }),
    ...(entry.above === undefined ? {} : { above: si(entry.above) }),
    to: si(entry.to),
  }
}

/** "a", "a or b", "a, b or c". */
export const either = (words: readonly string[]): string =>
  words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} or ${words.at(-1)!}`

/** The names nearest to what was typed, best first, at most `count`; none that are farther than half their length. */
export const nearestNames = (typed: string, names: readonly string[], count: number): readonly string[] =>
  names
    .map((name) => ({ name, far: distance(typed.toLowerCase().slice(0, 60), name.toLowerCase()) }))
    .filter(({ name, far }) => far <= Math.max(1, name.length / 2))
    .sort((one, other) => one.far - other.far)
    .slice(0, count)
    .map(({ name }) => name)

const KIND_IN_WORDS: Record<QuantityEntry['kind'], string> = {
  ratio: 'a ratio',
  length: 'a length',
  distance: 'a length',
  area: 'an area',
  modulus: 'a section modulus',
  inertia: 'a moment of inertia',
  warping: 'a warping constant',
  force: 'a force',
  forceOrMass: 'a force or a mass',
  moment: 'a moment',
  stress: 'a stress',
  lineLoad: 'a force per length',
  mass: 'a mass',
  lineMass: 'a mass per length',
  speed: 'a speed',
  flexuralStiffness: 'a flexural stiffness',
}

export const FAMILY_IN_WORDS: Record<Family, string> = {
  iShape: 'a rolled I shape',
  channel: 'a rolled channel',
  rail: 'a rail',
  steel: 'a steel',
}

const listInWords = (least: number, most: number, item: string): string =>
  least === most ? `a list of ${least} values, each ${item}` : `a list of ${least} to ${most} values, each ${item}`

/** Levenshtein's edit distance. */
const distance = (one: string, other: string): number => {
  let row = Array.from({ length: other.length + 1 }, (_, column) => column)
  for (let line = 1; line <= one.length; line++) {
    const next = [line]
    for (let column = 1; column <= other.length; column++) {
      const change = row[column - 1]! + (one[line - 1] === other[column - 1] ? 0 : 1)
      next.push(Math.min(change, row[column]! + 1, next[column - 1]! + 1))
    }
    row = next
  }
  return row[other.length]!
}
