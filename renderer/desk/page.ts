/** Carries calls over HTTP to the program that served this page. */
import type { PageLine, TokenHeader } from '../../core/contract/carriers.ts'
import type { CallError, Outcome } from '../../core/contract/errors.ts'
import { refused, type Ask, type Desk } from './desk.ts'

const TOKEN: TokenHeader = 'x-longtravel-token'

/** Milliseconds before a lost connection is tried again. */
const PAUSE = 500

/** What the page knows of its place. */
export interface Place {
  /** `fetch` on the page's own origin. */
  readonly fetch: (path: string, init: RequestInit) => Promise<Response>
  /** From the address; good for one swap. */
  readonly key: string | undefined
  /** Keeps the token while the page is loaded anew. */
  readonly memory: { readonly read: () => string | null; readonly write: (token: string) => void }
}

/**
 * A desk behind the page's own origin. The key is swapped for a token at once, and a request is held open for as long as the
 * page stands: by it the program knows that it is still wanted, and the page that the program is still there.
 */
export const pageDesk = (place: Place): Desk => {
  const ending = Promise.withResolvers<CallError>()
  const token = tokenOf(place)

  const post = async (path: string, body: unknown, signal: AbortSignal | undefined): Promise<Response> => {
    const headers = { 'content-type': 'application/json', [TOKEN]: (await token) ?? '' }
    return place.fetch(path, { method: 'POST', headers, body: JSON.stringify(body), signal: signal ?? null })
  }

  const ask: Ask = async (name, argument, { signal, onProgress } = {}) => {
    if (signal?.aborted) return refused('cancelled', `${name}: cancelled`)
    try {
      const response = await post(`/call/${encodeURIComponent(name)}`, argument, signal)
      for await (const line of linesOf(response)) {
        if (line.kind === 'answer') return outcomeOf(line)
        onProgress?.(line.done, line.of)
      }
      return unreachable
    } catch {
      return signal?.aborted === true ? refused('cancelled', `${name}: cancelled`) : unreachable
    }
  }

  const stand = async (): Promise<boolean> => {
    try {
      const response = await post('/watch', {}, undefined)
      if (!response.ok) return false
      await response.text()
      return true
    } catch {
      return false
    }
  }
  const watch = async (): Promise<void> => {
    for (let failures = 0; failures < 2;) {
      failures = (await stand()) ? 0 : failures + 1
      await new Promise((resolve) => setTimeout(resolve, PAUSE))
    }
    ending.resolve(unreachable.error)
  }
  void watch()

  return { call: ask as Desk['call'], ended: ending.promise }
}

const unreachable = refused(
  'stopped',
  'The program behind this page was closed or has stopped. What was kept is safe; the last call was perhaps not carried out.',
)

/** The token of an earlier load of this page, or the one that the key is swapped for; undefined where neither is good. */
const tokenOf = async ({ fetch, key, memory }: Place): Promise<string | undefined> => {
  if (key === undefined) return memory.read() ?? undefined
  try {
    const init = { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ key }) }
    const response = await fetch('/token', init)
    if (!response.ok) return memory.read() ?? undefined
    const { token } = (await response.json()) as { token: string }
    memory.write(token)
    return token
  } catch {
    return undefined
  }
}

/** The lines of an answer as they arrive. */
async function* linesOf(response: Response): AsyncGenerator<PageLine> {
  if (response.body === null) return
  const reader = response.body.getReader()
  const decoder = new TextDecoder()
  let rest = ''
  for (;;) {
    const { done, value } = await reader.read()
    rest += done ? decoder.decode() : decoder.decode(value, { stream: true })
    const lines = rest.split('\n')
    rest = lines.pop() ?? ''
    for (const line of lines) yield JSON.parse(line) as PageLine
    if (done) return
  }
}

const outcomeOf = (line: Extract<PageLine, { kind: 'answer' }>): Outcome<unknown> => {
  if (!line.ok) return { ok: false, error: line.error }
  if (line.bytes === undefined) return { ok: true, value: line.value }
  const bytes = Object.entries(line.bytes).map(([name, base64]) => [name, fromBase64(base64)])
  return { ok: true, value: { ...(line.value as object), ...Object.fromEntries(bytes) } }
}

const fromBase64 = (text: string): Uint8Array => Uint8Array.from(atob(text), (sign) => sign.charCodeAt(0))
