/** What travels between an interface and the desk, whatever carries it: asks and cancels one way, progress and answers the other. */
import * as v from 'valibot'
import { CallError } from './errors.ts'

const MOST_CALL_NAME = 40

/** Chosen by the asking side, never used twice while the call runs. */
const CallId = v.pipe(v.number(), v.safeInteger(), v.minValue(1))

/** The argument is judged by the call's own schema. A cancel of a call that is over changes nothing. */
export const ToDesk = v.variant('kind', [
  v.strictObject({
    kind: v.literal('ask'),
    id: CallId,
    call: v.pipe(v.string(), v.maxLength(MOST_CALL_NAME)),
    argument: v.unknown(),
  }),
  v.strictObject({ kind: v.literal('cancel'), id: CallId }),
])

/** A call has any number of progress envelopes and then one answer. `done` of `of` parts are finished. */
export const FromDesk = v.variant('kind', [
  v.strictObject({ kind: v.literal('progress'), id: CallId, done: v.number(), of: v.number() }),
  v.strictObject({ kind: v.literal('answer'), id: CallId, ok: v.literal(true), value: v.unknown() }),
  v.strictObject({ kind: v.literal('answer'), id: CallId, ok: v.literal(false), error: CallError }),
])

export type ToDesk = Readonly<v.InferOutput<typeof ToDesk>>
export type FromDesk = Readonly<v.InferOutput<typeof FromDesk>>
