/** The desk as the window sees it, whatever carries the calls. */
import type { Answer, Argument, CallName } from '../../core/contract/calls.ts'
import type { CallError, Outcome } from '../../core/contract/errors.ts'

export interface CallOptions {
  /** Cancels: the answer is then of kind `cancelled`, unless the call was over before. */
  readonly signal?: AbortSignal
  /** `done` of `of` parts are finished. */
  readonly onProgress?: (done: number, of: number) => void
}

export interface Desk {
  /** What goes wrong is an outcome, never a rejection. The argument is copied, so that reactive state may be given. */
  readonly call: <N extends CallName>(
    name: N,
    argument: Argument<N>,
    options?: CallOptions,
  ) => Promise<Outcome<Answer<N>>>
  /** Why the desk can no longer be reached: the program behind the page was closed or died. Pending while all is well. */
  readonly ended: Promise<CallError>
}

/** A call whose name and argument prove nothing yet. */
export type Ask = (name: string, argument: unknown, options?: CallOptions) => Promise<Outcome<unknown>>

/** Made here and not with the contract's own function, which would bring the schemas into the page. */
export const refused = (kind: CallError['kind'], message: string): { ok: false; error: CallError } => ({
  ok: false,
  error: { kind, message },
})
