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

  const post = (path: string, body: unknown, good: string, signal?: AbortSignal): Promise<Response> => {
    const headers = { 'content-type': 'application/json', [TOKEN]: good }
    return place.fetch(path, { method: 'POST', headers, body: JSON.stringify(body), signal: signal ?? null })
  }

  const ask: Ask = async (name, argument, { signal, onProgress } = {}) => {
    if (signal?.aborted) return refused('cancelled', `${name}: cancelled`)
    // The name stands in the address as it is.
    if (!/^[\w.]*$/.test(name)) return refused('unknown-call', `${name.slice(0, 40)}: there is no such call`)
    const good = await token
    if (!good.ok) return good
    try {
      const response = await post(`/call/${name}`, argument, good.value, signal)
      for await (const line of linesOf(response)) {
        if (line.kind === 'answer') return outcomeOf(line)
        onProgress?.(line.done, line.of)
      }
      return unreachable
    } catch {
      return signal?.aborted === true ? refused('cancelled', `${name}: cancelled`) : unreachable
    }
  }

  const stand = async (good: string): Promise<boolean> => {
    try {
      const response = await post('/watch', {}, good)
      if (!response.ok) return false
      await response.text()
      return true
    } catch {
      return false
    }
  }
  const watch = async (): Promise<void> => {
    const good = await token
    if (!good.ok) {
      ending.resolve(good.error)
      return
    }
    for (let failures = 0; failures < 2;) {
      failures = (await stand(good.value)) ? 0 : failures + 1
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

/** The token that the key is swapped for, or the one of an earlier load of this page; else why there is none. */
const tokenOf = async ({ fetch, key, memory }: Place): Promise<Outcome<string>> => {
  const former = memory.read()
  if (key === undefined) return former === null ? keyless : { ok: true, value: former }
  try {
    const init = { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ key }) }
    const response = await fetch('/token', init)
    if (response.ok) {
      const { token } = (await response.json()) as { token: string }
      memory.write(token)
      return { ok: true, value: token }
    }
    if (former !== null) return { ok: true, value: former }
    for await (const line of linesOf(response)) if (line.kind === 'answer' && !line.ok) return line
    return unreachable
  } catch {
    return unreachable
  }
}

const keyless = refused(
  'no-right',
  'This address lacks its key: open the whole address that the program printed, or start the program again.',
)

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
