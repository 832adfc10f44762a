/** What the dictionary says of one field of the job file. Everything that reads, explains or documents a job is driven by it. */
import type { Channel, IShape, Rail, Steel } from '../catalogue/types.ts'
import type { Kind, KindValue, Newton } from '../quantity/kinds.ts'
import type { Json } from './json.ts'

/** What may stand in the file. Limits of a quantity are written as a user would write them; `above` and `below` exclude the limit. */
export type Entry =
  | { readonly is: 'text'; readonly most: number }
  | { readonly is: 'constant'; readonly value: string | number }
  | { readonly is: 'choice'; readonly of: readonly string[] }
  | { readonly is: 'flag' }
  | NumberEntry
  | QuantityEntry
  | { readonly is: 'lookUp'; readonly family: Family }
  | { readonly is: 'list'; readonly of: Entry; readonly least: number; readonly most: number }
  /** An object whose keys are chosen by the user. `key` says what they name; the path of the values is `….{key}`. */
  | { readonly is: 'map'; readonly key: string; readonly of: Entry; readonly most: number }
  /** One of several, told apart by the JSON form (word, number, list, object). */
  | { readonly is: 'either'; readonly of: readonly Entry[] }
  | ObjectEntry

export interface NumberEntry {
  readonly is: 'number'
  readonly whole?: true
  readonly from?: number
  readonly above?: number
  readonly to: number
}

export interface QuantityEntry {
  readonly is: 'quantity'
  readonly kind: Kind | 'forceOrMass'
  readonly from?: string
  readonly above?: string
  readonly to: string
}

/** The fields of an object are the dictionary's own paths below it; `ways` are sets of fields of which one is used. */
interface ObjectEntry {
  readonly is: 'object'
  readonly ways?: readonly Way[]
}

/** Fields that belong together. `kind` is the value of the object's field `kind` that chooses this way. */
export interface Way {
  readonly kind?: string
  readonly needs: readonly string[]
  readonly may?: readonly string[]
}

export type Family = 'iShape' | 'channel' | 'rail' | 'steel'

export interface Field {
  /** Label in words of the trade. */
  readonly name: string
  readonly meaning: string
  readonly entry: Entry
  /** A text says when it is required. */
  readonly required?: true | string
  /** `entry` is what a user would have written; where the default depends on other fields, `text` says how. */
  readonly default?: { readonly entry?: Json; readonly text?: string; readonly source: string }
  /** Where the field's meaning comes from. */
  readonly source?: string
  /**
   * What this version does not use and therefore refuses: everything, all but one value, some values,
   * or what the text says.
   */
  readonly notCovered?:
    'all' | { readonly unless: Json } | { readonly values: readonly string[] } | { readonly text: string }
}

/** Whether every entry of this field is refused in this version. */
export const isRefused = (field: Field): boolean => field.notCovered === 'all'

interface Found {
  iShape: IShape
  channel: Channel
  rail: Rail
  steel: Steel
}

/** The type of a value read by an entry: SI, shapes looked up; an object is only marked as present, a map gives its keys. */
export type ValueOf<E> = E extends { is: 'text' }
  ? string
  : E extends { is: 'constant'; value: infer V }
    ? V
    : E extends { is: 'choice'; of: readonly (infer C)[] }
      ? C
      : E extends { is: 'flag' }
        ? boolean
        : E extends { is: 'number' }
          ? number
          : E extends { is: 'quantity'; kind: infer K }
            ? QuantityValue<K>
            : E extends { is: 'lookUp'; family: infer F extends Family }
              ? Found[F]
              : E extends { is: 'list'; of: infer I }
                ? readonly ValueOf<I>[]
                : E extends { is: 'map' }
                  ? readonly string[]
                  : E extends { is: 'either'; of: readonly (infer A)[] }
                    ? ValueOf<A>
                    : true

type QuantityValue<K> = K extends 'forceOrMass' ? Newton : K extends Kind ? KindValue[K] : never
