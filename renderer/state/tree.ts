/** The tree of a job file as plain values: read, set and taken out by path, never changed in place. */
import type { Json, JsonObject } from '../../core/job/json.ts'
import { isObject } from '../../core/job/walk.ts'

type Step = string | number

/** "cranes[0].name" -> cranes, 0, name. Odd names stand in quotes: `project["a b"]`. */
const stepsOf = (path: string): readonly Step[] =>
  [...path.matchAll(/\[(\d+)\]|\[("(?:[^"\\]|\\.)*")\]|[^.[\]]+/g)].map(([step, index, quoted]) => {
    if (index !== undefined) return Number(index)
    return quoted === undefined ? step : String(JSON.parse(quoted))
  })

/** The dictionary's path of a path in the file: "cranes[0].name" -> "cranes[].name". */
export const patternOf = (path: string): string => path.replace(/\[\d+\]/g, '[]')

export const valueAt = (tree: Json, path: string): Json | undefined =>
  stepsOf(path).reduce<Json | undefined>((inner, step) => stepInto(inner, step), tree)

/** The tree with a value at a path; undefined takes the entry out. Objects on the way are made where they are missing. */
export const withValue = (tree: JsonObject, path: string, value: Json | undefined): JsonObject =>
  put(tree, stepsOf(path), value) as JsonObject

/** The object without one of its fields. */
export const without = (json: JsonObject, name: string): JsonObject =>
  Object.fromEntries(Object.entries(json).filter(([each]) => each !== name))

const stepInto = (json: Json | undefined, step: Step): Json | undefined => {
  if (typeof step === 'number') return Array.isArray(json) ? (json as readonly Json[])[step] : undefined
  return isObject(json) && Object.hasOwn(json, step) ? json[step] : undefined
}

const put = (json: Json | undefined, steps: readonly Step[], value: Json | undefined): Json | undefined => {
  const [step, ...further] = steps
  if (step === undefined) return value
  const inner = put(stepInto(json, step), further, value)
  if (typeof step === 'number') {
    const list: readonly Json[] = Array.isArray(json) ? (json as readonly Json[]) : []
    return inner === undefined ? list.filter((_, index) => index !== step) : list.with(step, inner)
  }
  const fields = isObject(json) ? json : {}
  return inner === undefined ? without(fields, step) : { ...fields, [step]: inner }
}
