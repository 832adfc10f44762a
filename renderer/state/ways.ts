/** Parts of the job that have one of several forms, and what each form consists of. */
import type { Json, JsonObject } from '../../core/job/json.ts'
import { isObject } from '../../core/job/walk.ts'
import { valueAt, withValue } from './tree.ts'

export interface Way {
  readonly word: string
  readonly label: string
  /** Fields of the part that this form has and the others have not; undefined where the whole part is one value. */
  readonly fields: readonly string[]
}

/** What a part is where a form has no fields of its own. */
const WHOLE = ''

const SHAPE = ['d', 'bf', 'tw', 'tf', 'r', 'A', 'Ix', 'Sx', 'Zx', 'Iy', 'Sy', 'Zy', 'J', 'Cw', 'rts', 'ho']
const steel: readonly Way[] = [
  { word: 'name', label: 'by name', fields: ['name'] },
  { word: 'own', label: 'by strengths', fields: ['fy', 'fu'] },
]
const otherSteel: readonly Way[] = [{ word: 'none', label: 'as the girder', fields: [] }, ...steel]

/** Path in the file -> its forms, the first of them what an empty part is taken for. */
export const WAYS: Readonly<Record<string, readonly Way[]>> = {
  'girder.section': [
    { word: 'rolled', label: 'rolled', fields: ['shape'] },
    { word: 'plated', label: 'welded plates', fields: ['topFlange', 'web', 'bottomFlange'] },
  ],
  'girder.section.shape': [
    { word: 'name', label: 'by name', fields: [WHOLE] },
    { word: 'own', label: 'by dimensions', fields: [...SHAPE, 'massPerLength'] },
  ],
  'girder.section.cap': [
    { word: 'none', label: 'none', fields: [] },
    { word: 'shape', label: 'channel', fields: ['shape'] },
    { word: 'plate', label: 'plate', fields: ['plate'] },
  ],
  'girder.steel': steel,
  'girder.capSteel': otherSteel,
  'girder.plateSteel': otherSteel,
  'runway.rail': [
    { word: 'name', label: 'by name', fields: ['name'] },
    { word: 'own', label: 'by dimensions', fields: ['height', 'headWidth', 'footWidth', 'mass', 'ix'] },
  ],
}

/** The form a part has as the file stands. */
export const wayIn = (tree: JsonObject, path: string): string => {
  const ways = WAYS[path] ?? []
  const part = valueAt(tree, path)
  if (path === 'girder.section' && isObject(part) && typeof part.kind === 'string') return part.kind
  if (path === 'girder.section.shape') return isObject(part) ? 'own' : 'name'
  if (part === undefined) return ways[0]!.word
  const given = isObject(part) ? Object.keys(part) : []
  const fits = ways.find(({ fields }) => fields.some((field) => given.includes(field)))
  return (fits ?? ways.find(({ fields }) => fields.length > 0))!.word
}

/** The tree with a part in another form. `before` is what that form held when it was last left. */
export const turned = (tree: JsonObject, path: string, word: string, before: Json | undefined): JsonObject => {
  const ways = WAYS[path] ?? []
  const way = ways.find((one) => one.word === word)
  if (way === undefined) return tree
  if (way.fields.length === 0) return withValue(tree, path, undefined)
  if (way.fields[0] === WHOLE) return withValue(tree, path, typeof before === 'string' ? before : undefined)
  const part = valueAt(tree, path)
  const ofWays = new Set(ways.flatMap(({ fields }) => fields))
  const common = isObject(part) ? Object.entries(part).filter(([name]) => !ofWays.has(name)) : []
  const own = isObject(before) ? Object.entries(before).filter(([name]) => way.fields.includes(name)) : []
  const kind = path === 'girder.section' ? { kind: word } : {}
  return withValue(tree, path, { ...kind, ...Object.fromEntries([...common, ...own].filter(([n]) => n !== 'kind')) })
}
