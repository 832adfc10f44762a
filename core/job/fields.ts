/**
 * The one dictionary of the job file's fields. Reading, messages, defaults, the JSON Schema and the field reference all come
 * from it. A path is written with `[]` for the items of a list and `{…}` for a key chosen by the user.
 */
import type { Field, ValueOf } from './field.ts'
import { BASIS } from './fields/basis.ts'
import { CRANES } from './fields/cranes.ts'
import { DETAILS } from './fields/details.ts'
import { GIRDER } from './fields/girder.ts'
import { PROJECT } from './fields/project.ts'
import { RUNWAY } from './fields/runway.ts'

export const FIELDS = { ...PROJECT, ...BASIS, ...CRANES, ...RUNWAY, ...GIRDER, ...DETAILS }

export type FieldPath = keyof typeof FIELDS

type Of<P extends FieldPath> = (typeof FIELDS)[P]

/** What this version reads from a field: without the choices it refuses. */
export type FieldValue<P extends FieldPath> =
  Of<P> extends { notCovered: { values: readonly (infer R)[] } }
    ? Exclude<ValueOf<Of<P>['entry']>, R>
    : ValueOf<Of<P>['entry']>

/** The value of a field in a job without findings: there where it is required or has a default of its own. */
export type Given<P extends FieldPath> =
  Of<P> extends { required: true } | { default: { entry: unknown } } ? FieldValue<P> : FieldValue<P> | undefined

/** The dictionary as a list, in the order of the file. */
export const fieldList: readonly (readonly [path: string, field: Field])[] = Object.entries(FIELDS)

/** The fields directly below a path ('' for the file itself): name in the file -> path in the dictionary and field. */
export const fieldsBelow = (path: string): ReadonlyMap<string, { readonly path: string; readonly field: Field }> =>
  BELOW.get(path) ?? new Map<string, never>()

const BELOW = new Map<string, Map<string, { path: string; field: Field }>>()
for (const [path, field] of fieldList) {
  const cut = path.lastIndexOf('.')
  const parent = cut < 0 ? '' : path.slice(0, cut)
  const siblings = BELOW.get(parent) ?? new Map<string, { path: string; field: Field }>()
  siblings.set(path.slice(cut + 1), { path, field })
  BELOW.set(parent, siblings)
}
