/** The JSON of a request, at most so many bytes of it. */
import type { IncomingMessage } from 'node:http'
import type { Refusal } from './refusal.ts'

export type Body = { readonly value: unknown } | Refusal

/** Ends at the limit without reading on. Slow bodies are cut off by the server's own limit; the request then fails. */
export const bodyOf = async (request: IncomingMessage, mostBytes: number): Promise<Body> => {
  const tooMuch = { status: 413, message: `more than ${mostBytes} bytes` }
  if (Number(request.headers['content-length'] ?? 0) > mostBytes) return tooMuch
  const parts: Buffer[] = []
  let bytes = 0
  for await (const part of request as AsyncIterable<Buffer>) {
    bytes += part.length
    if (bytes > mostBytes) return tooMuch
    parts.push(part)
  }
  try {
    return { value: JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(parts))) as unknown }
  } catch {
    return { status: 400, message: 'no JSON' }
  }
}
