/** The worker's side of the desk: takes asks from its port, one record behind them, and answers. */
import type { MessagePort } from 'node:worker_threads'
import * as v from 'valibot'
import { isCall, type CallName } from '../../core/contract/calls.ts'
import { readAnswer, readArgument } from '../../core/contract/check.ts'
import { ToDesk, type FromDesk } from '../../core/contract/envelopes.ts'
import { done, refuse, type Outcome } from '../../core/contract/errors.ts'
import { handlersOf, type Context, type Handlers, type MakeSheet } from './handlers.ts'
import { openRecord, type DeskRecord } from './record.ts'

/** The desk's own words beside the contract's: no interface can close the desk. */
export type ToWorker = ToDesk | { readonly kind: 'close' }
export type FromWorker = FromDesk | { readonly kind: 'closed'; readonly outcome: Outcome<null> }

/**
 * Serves until it is told to close: it then cancels what runs, closes the record and the port. A call that throws is
 * answered as a fault and the others go on.
 */
export const serve = (port: MessagePort, home: string, makeSheet: MakeSheet): void => {
  const record = openRecord(home)
  const handlers = record.then((opened) => handlersOf(opened, makeSheet))
  const running = new Map<number, { readonly cancel: AbortController; readonly over: Promise<void> }>()
  const post = (message: FromWorker) => port.postMessage(message)

  const ask = ({ id, call, argument }: Extract<ToDesk, { kind: 'ask' }>): void => {
    const cancel = new AbortController()
    const onProgress = (finished: number, of: number) => post({ kind: 'progress', id, done: finished, of })
    const over = handlers
      .then((all) => answer(all, call, argument, { signal: cancel.signal, onProgress }))
      .then((outcome) => {
        running.delete(id)
        post({ kind: 'answer', id, ...outcome })
      })
    running.set(id, { cancel, over })
  }

  const close = async (): Promise<void> => {
    for (const { cancel } of running.values()) cancel.abort()
    await Promise.all([...running.values()].map(({ over }) => over))
    post({ kind: 'closed', outcome: closeRecord(await record) })
    port.close()
  }

  port.on('message', (message: unknown) => {
    if (isClose(message)) {
      void close()
      return
    }
    const read = v.parse(ToDesk, message)
    if (read.kind === 'ask') ask(read)
    else running.get(read.id)?.cancel.abort()
  })
}

/** One call from argument to answer, both judged by their schemas. Never throws. */
const answer = async (
  handlers: Handlers,
  name: string,
  given: unknown,
  context: Context,
): Promise<Outcome<unknown>> => {
  if (!isCall(name)) return refuse('unknown-call', `${name}: there is no such call`)
  if (isAborted(context)) return cancelled(name)
  const argument = readArgument(name, given)
  if (!argument.ok) return argument
  try {
    const outcome = await (handlers[name] as Handler)(argument.value, context)
    return outcome.ok ? readAnswer(name, outcome.value) : outcome
  } catch (error) {
    if (isAborted(context)) return cancelled(name)
    return refuse('fault', `${name}: a fault of the program: ${error instanceof Error ? error.message : String(error)}`)
  }
}

/** Asked anew each time: it changes while a call runs. */
const isAborted = ({ signal }: Context): boolean => signal.aborted

type Handler = (argument: unknown, context: Context) => Outcome<unknown> | Promise<Outcome<unknown>>

const cancelled = (name: CallName) => refuse('cancelled', `${name}: cancelled`)

const closeRecord = (record: DeskRecord): Outcome<null> =>
  record.access === 'none' ? done(null) : record.opened.close()

const isClose = (message: unknown): boolean =>
  typeof message === 'object' && message !== null && 'kind' in message && message.kind === 'close'
