/** JSON values of any shape, bounded: settings are the interface's own affair, and the desk only keeps them. */
import * as v from 'valibot'
import type { Json } from '../job/json.ts'
import type { Result } from '../review/result.ts'
import { MOST } from './texts.ts'

const DEEPEST = 16

/** A JSON value of at most 16 levels whose texts, names and items count at most 100,000 together. */
export const JsonValue = v.custom<Json>(
  (value) => sizeOf(value, 0) <= MOST.settingValue,
  `right would be a JSON value of at most ${DEEPEST} levels and ${MOST.settingValue} characters`,
)

/** A result file, version 1. What the review room makes is whole; here it is told from anything else. */
export const ResultFile = v.custom<Result>(
  (value) =>
    isRecord(value) &&
    value['format'] === 'longtravel-result' &&
    value['version'] === 1 &&
    RESULT_PARTS.every((part) => part in value),
  'right would be a result file, version 1',
)

const RESULT_PARTS = ['program', 'fingerprint', 'trains', 'envelope', 'section', 'checks', 'ok', 'complete', 'cautions']

/** Characters and items of a JSON value, infinite for what is no JSON value. Ends as soon as the limit is passed. */
function sizeOf(value: unknown, level: number): number {
  if (value === null || typeof value === 'boolean') return 1
  if (typeof value === 'number') return Number.isFinite(value) ? 1 : Infinity
  if (typeof value === 'string') return value.isWellFormed() ? 1 + value.length : Infinity
  if (level >= DEEPEST || !(Array.isArray(value) || isRecord(value))) return Infinity
  let size = 1
  for (const [name, inner] of Object.entries(value)) {
    size += (Array.isArray(value) ? 0 : sizeOf(name, DEEPEST)) + sizeOf(inner, level + 1)
    if (size > MOST.settingValue) return Infinity
  }
  return size
}

function isRecord(value: unknown): value is Record<string, unknown> {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return false
  const prototype: unknown = Object.getPrototypeOf(value)
  return prototype === null || prototype === Object.prototype
}
