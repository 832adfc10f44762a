/** Errors as values: what went wrong, in one word for the program and in plain words for the user. */
import * as v from 'valibot'

/**
 * - `argument`: the call's argument is wrong; `at` names the fields. `job`: the job text has findings; `at` holds them.
 * - `unknown-call`, `not-found`: no such call; no such project, job or revision.
 * - `in-use`: another process writes to the record, which can be read meanwhile. `locked`: nothing can be read either.
 * - `damaged`, `foreign`, `newer`, `place`: the record is damaged, is no record, was written by a newer program, lies where
 *   none can be kept.
 * - `no-right`, `no-room`, `disk`: the system refuses to read or write, the disk is full, the disk fails.
 * - `not-covered`: this version cannot do it. `cancelled`: as asked.
 * - `stopped`: the desk ended on its own. `closed`: it was closed. `fault`: a fault of the program.
 */
export const ERROR_KINDS = [
  'argument',
  'job',
  'unknown-call',
  'not-found',
  'in-use',
  'locked',
  'damaged',
  'foreign',
  'newer',
  'place',
  'no-right',
  'no-room',
  'disk',
  'not-covered',
  'cancelled',
  'stopped',
  'closed',
  'fault',
] as const

export type ErrorKind = (typeof ERROR_KINDS)[number]

/** A fault of one field: its path, what was read there, what would be right. */
export const Fault = v.strictObject({ path: v.string(), read: v.string(), message: v.string() })

export const CallError = v.strictObject({
  kind: v.picklist(ERROR_KINDS),
  message: v.string(),
  /** Field by field, for `argument` and `job`. */
  at: v.exactOptional(v.pipe(v.array(Fault), v.readonly())),
})

export type CallError = Readonly<v.InferOutput<typeof CallError>>

export type Outcome<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly error: CallError }

export const done = <T>(value: T): Outcome<T> => ({ ok: true, value })

export const refuse = (kind: ErrorKind, message: string, at?: CallError['at']): { ok: false; error: CallError } => ({
  ok: false,
  error: { kind, message, ...(at === undefined ? {} : { at }) },
})
