/** One call: its argument taken from the request, its progress and its answer given as lines. */
import type { ServerResponse } from 'node:http'
import { isCall } from '../../core/contract/calls.ts'
import type { PageLine } from '../../core/contract/carriers.ts'
import type { Outcome } from '../../core/contract/errors.ts'
import type { LastingDesk } from '../shell/lasting-desk.ts'
import { HEADERS } from '../shell/policy.ts'

/** Asks the desk and writes to the response. A response that is closed before its end cancels the call. */
export const answerCall = async (
  desk: LastingDesk,
  name: string,
  argument: unknown,
  response: ServerResponse,
): Promise<void> => {
  const cancel = new AbortController()
  response.on('close', () => cancel.abort())
  beginLines(response, isCall(name) ? 200 : 404)
  const onProgress = (done: number, of: number) => response.write(lineOf({ kind: 'progress', done, of }))
  const outcome = await desk.ask(name, argument, { signal: cancel.signal, onProgress })
  response.end(lineOf(answerOf(outcome)))
}

/** Sends the headers of an answer that comes line by line, at once. */
export const beginLines = (response: ServerResponse, status: number): void => {
  response.writeHead(status, { ...HEADERS, 'content-type': 'application/x-ndjson' })
  response.flushHeaders()
}

export const lineOf = (line: PageLine): string => `${JSON.stringify(line)}\n`

/** Bytes stand in the first level of an answer only. */
const answerOf = (outcome: Outcome<unknown>): PageLine => {
  if (!outcome.ok) return { kind: 'answer', ok: false, error: outcome.error }
  const { value } = outcome
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return { kind: 'answer', ok: true, value }
  const fields = Object.entries(value as Record<string, unknown>)
  const bytes = fields.flatMap(([field, inner]) =>
    inner instanceof Uint8Array ? [[field, Buffer.from(inner).toString('base64')] as const] : [],
  )
  if (bytes.length === 0) return { kind: 'answer', ok: true, value }
  const rest = Object.fromEntries(fields.filter(([, inner]) => !(inner instanceof Uint8Array)))
  return { kind: 'answer', ok: true, value: rest, bytes: Object.fromEntries(bytes) }
}
