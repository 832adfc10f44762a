/** The one implementation of the contract, in a worker thread of its own; every door of the program asks it. */
import { Worker } from 'node:worker_threads'
import * as v from 'valibot'
import { isCall, type Answer, type Argument, type CallName } from '../../core/contract/calls.ts'
import { readAnswer, readArgument } from '../../core/contract/check.ts'
import { FromDesk } from '../../core/contract/envelopes.ts'
import { done, refuse, type CallError, type Outcome } from '../../core/contract/errors.ts'
import type { FromWorker, ToWorker } from './serve.ts'

export interface CallOptions {
  /** Cancels: the answer is then of kind `cancelled`, unless the call was over before. */
  readonly signal?: AbortSignal
  /** `done` of `of` parts are finished. */
  readonly onProgress?: (done: number, of: number) => void
}

export interface Desk {
  /** What goes wrong is an outcome; only an argument that is no plain data throws. */
  readonly call: <N extends CallName>(
    name: N,
    argument: Argument<N>,
    options?: CallOptions,
  ) => Promise<Outcome<Answer<N>>>
  /** The same for a name and an argument that came from outside and prove nothing. */
  readonly ask: (name: string, argument: unknown, options?: CallOptions) => Promise<Outcome<unknown>>
  /** Cancels what runs, brings the record into its file and ends the worker. */
  readonly close: () => Promise<Outcome<null>>
  /** Why the desk ended: `closed`, or `stopped` where the worker died; a new one may then be started. */
  readonly ended: Promise<CallError>
}

/** Starts a desk on the record of a data folder. It serves even where the record cannot be opened: the calls for it say why. */
export const startDesk = ({ home }: { readonly home: string }): Desk =>
  deskOf(new Worker(workerFile(), { workerData: { home } }))

/**
 * The worker's file stands beside this one: as source, or in a bundle as an entry of its own named `worker`. Vite leaves the line
 * as it is in a build for Node; the build has two entries, entryFileNames and chunkFileNames '[name].js', so that all lies
 * in one folder.
 */
const workerFile = (): URL =>
  import.meta.url.endsWith('.ts') ? new URL('./worker.ts', import.meta.url) : new URL('./worker.js', import.meta.url)

/** Milliseconds that a worker has to close the record; after them it is ended, and the record is whole in file and log. */
const CLOSE_LIMIT = 10_000

/** A desk on a worker that serves. */
export const deskOf = (worker: Worker): Desk => {
  const pending = new Map<number, Pending>()
  const ending = Promise.withResolvers<CallError>()
  let over: CallError | undefined
  let closing: Promise<Outcome<null>> | undefined
  let closed: Outcome<null> = done(null)
  let last = 0
  const post = (message: ToWorker) => worker.postMessage(message)

  const end = (error: CallError): void => {
    if (over !== undefined) return
    over = error
    ending.resolve(error)
    for (const { settle } of [...pending.values()]) settle({ ok: false, error })
  }
  worker.on('message', (message: FromWorker) => {
    if (message.kind === 'closed') closed = message.outcome
    else hear(v.parse(FromDesk, message), pending)
  })
  worker.on('error', (error) => end(stopped(error instanceof Error ? error.message : String(error))))
  worker.on('exit', (code) => end(closing === undefined ? stopped(`exit ${code}`) : wasClosed))

  const ask = (name: string, given: unknown, { signal, onProgress }: CallOptions = {}): Promise<Outcome<unknown>> => {
    if (over !== undefined) return Promise.resolve({ ok: false, error: over })
    if (closing !== undefined) return Promise.resolve({ ok: false, error: wasClosed })
    if (!isCall(name)) return Promise.resolve(refuse('unknown-call', `${name.slice(0, 40)}: there is no such call`))
    if (signal?.aborted) return Promise.resolve(refuse('cancelled', `${name}: cancelled`))
    const argument = readArgument(name, given)
    if (!argument.ok) return Promise.resolve(argument)
    const id = ++last
    const { promise, resolve } = Promise.withResolvers<Outcome<unknown>>()
    const cancel = () => post({ kind: 'cancel', id })
    const settle = (outcome: Outcome<unknown>) => {
      pending.delete(id)
      signal?.removeEventListener('abort', cancel)
      resolve(outcome)
    }
    pending.set(id, { name, settle, onProgress })
    signal?.addEventListener('abort', cancel)
    post({ kind: 'ask', id, call: name, argument: argument.value })
    return promise
  }

  const close = async (): Promise<Outcome<null>> => {
    if (over !== undefined) return { ok: false, error: over }
    post({ kind: 'close' })
    const limit = setTimeout(() => void worker.terminate(), CLOSE_LIMIT)
    await ending.promise
    clearTimeout(limit)
    return closed
  }

  return {
    call: ask as Desk['call'],
    ask,
    close: () => (closing ??= close()),
    ended: ending.promise,
  }
}

interface Pending {
  readonly name: CallName
  readonly settle: (outcome: Outcome<unknown>) => void
  readonly onProgress: CallOptions['onProgress']
}

const hear = (message: FromDesk, pending: ReadonlyMap<number, Pending>): void => {
  const asked = pending.get(message.id)
  if (asked === undefined) return
  if (message.kind === 'progress') asked.onProgress?.(message.done, message.of)
  else asked.settle(message.ok ? readAnswer(asked.name, message.value) : { ok: false, error: message.error })
}

const stopped = (why: string): CallError =>
  refuse('stopped', `the desk has stopped (${why}); what was kept is safe, the call was perhaps not carried out`).error

const wasClosed = refuse('closed', 'the desk is closed').error
