/** The window on a loopback address, for a machine without Electron or without its binary. */
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http'
import type { AddressInfo } from 'node:net'
import type { TokenHeader } from '../../core/contract/carriers.ts'
import { refuse, type CallError } from '../../core/contract/errors.ts'
import type { LastingDesk } from '../shell/lasting-desk.ts'
import { windowFiles, type WindowFiles } from '../shell/files.ts'
import { HEADERS } from '../shell/policy.ts'
import { bodyOf } from './body.ts'
import { answerCall, beginLines, lineOf } from './call.ts'
import { keysOf, type Keys } from './keys.ts'
import { refusalOf, type Refusal } from './refusal.ts'
import { visitorsOf, type Patience, type Visitors } from './visitors.ts'

export interface Page {
  /** An address with a key of its own, good for one page. */
  readonly newAddress: () => string
  /** Settles when the last page has gone, or when none ever came. */
  readonly gone: Promise<void>
  /** Ends every connection; calls that run are cancelled. */
  readonly close: () => Promise<void>
}

export interface Limits extends Patience {
  /** Milliseconds for a request's headers, and for the whole request. */
  readonly headers: number
  readonly request: number
}

export const LIMITS: Limits = { first: 15 * 60_000, last: 5_000, headers: 5_000, request: 20_000 }

/** A job text of a million characters, each written as an escape of six. */
const MOST_CALL_BYTES = 8_000_000
const MOST_TOKEN_BYTES = 200
const MOST_HEADER_BYTES = 8_192
const MOST_CONNECTIONS = 100

const TOKEN: TokenHeader = 'x-longtravel-token'

/** Serves the built window of a folder and carries its calls to the desk, on 127.0.0.1 and a port that the system chooses. */
export const startPage = async (desk: LastingDesk, folder: string, limits: Limits = LIMITS): Promise<Page> => {
  const server = createServer({
    maxHeaderSize: MOST_HEADER_BYTES,
    headersTimeout: limits.headers,
    requestTimeout: limits.request,
    connectionsCheckingInterval: Math.min(limits.headers, 1_000),
  })
  server.maxConnections = MOST_CONNECTIONS
  const room = { desk, files: windowFiles(folder), keys: keysOf(), visitors: visitorsOf(limits) }
  server.on('request', (request: IncomingMessage, response: ServerResponse) => {
    answer(room, request, response, authorityOf(server)).catch((error: unknown) => fail(error, response))
  })
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen({ host: '127.0.0.1', port: 0 }, resolve)
  })
  return {
    newAddress: () => `http://${authorityOf(server)}/#key=${room.keys.newKey()}`,
    gone: room.visitors.gone,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve())
        server.closeAllConnections()
      }),
  }
}

interface Room {
  readonly desk: LastingDesk
  readonly files: WindowFiles
  readonly keys: Keys
  readonly visitors: Visitors
}

const authorityOf = (server: Server): string => `127.0.0.1:${(server.address() as AddressInfo).port}`

const answer = async (
  { desk, files, keys, visitors }: Room,
  request: IncomingMessage,
  response: ServerResponse,
  authority: string,
): Promise<void> => {
  const refusal = refusalOf(request, authority)
  if (refusal !== undefined) {
    turnAway(response, refusal)
    return
  }
  const url = request.url ?? ''
  if (request.method === 'GET') return answerFile(files, url, response)
  if (url === '/token') return answerToken(keys, visitors, request, response)
  if (!keys.isToken(tokenOf(request))) {
    say(response, 401, STRANGER)
    return
  }
  const body = await bodyOf(request, MOST_CALL_BYTES)
  if ('status' in body) {
    turnAway(response, body)
    return
  }
  if (url !== '/watch') return answerCall(desk, url.slice('/call/'.length), body.value, response)
  beginLines(response, 200)
  visitors.welcome(response)
}

const tokenOf = ({ headers }: IncomingMessage): string | undefined => {
  const token = headers[TOKEN]
  return typeof token === 'string' ? token : undefined
}

const answerFile = async (files: WindowFiles, url: string, response: ServerResponse): Promise<void> => {
  const found = await files(url)
  if (found === undefined) {
    turnAway(response, { status: 404, message: 'no such file' })
    return
  }
  response.writeHead(200, { ...HEADERS, 'content-type': found.type, 'content-length': found.bytes.length })
  response.end(found.bytes)
}

const answerToken = async (
  keys: Keys,
  visitors: Visitors,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> => {
  const body = await bodyOf(request, MOST_TOKEN_BYTES)
  if ('status' in body) {
    turnAway(response, body)
    return
  }
  if (visitors.isFull()) {
    say(response, 429, FULL)
    return
  }
  const token = keys.swap(keyIn(body.value))
  if (token === undefined) {
    say(response, 403, USED)
    return
  }
  response.writeHead(200, { ...HEADERS, 'content-type': 'application/json' })
  response.end(JSON.stringify({ token }))
}

const keyIn = (value: unknown): string =>
  typeof value === 'object' && value !== null && 'key' in value && typeof value.key === 'string' ? value.key : ''

const STRANGER = refuse('no-right', 'This page has no key to the program that runs here: start the program again').error
const USED = refuse('no-right', 'The key in this address is used or foreign: start the program again').error
const FULL = refuse('in-use', 'The window is open in four pages already: close one of them').error

/** An error that the window shows. */
const say = (response: ServerResponse, status: number, error: CallError): void => {
  response.shouldKeepAlive = false
  beginLines(response, status)
  response.end(lineOf({ kind: 'answer', ok: false, error }), () => response.req.destroy())
}

/** Ends the connection with the answer, as `say` does: what else it sends is not read. */
const turnAway = (response: ServerResponse, { status, message }: Refusal): void => {
  response.shouldKeepAlive = false
  response.writeHead(status, { ...HEADERS, 'content-type': 'text/plain; charset=utf-8' })
  response.end(`${message}\n`, () => response.req.destroy())
}

/** A request that broke off needs no answer. Anything else is a fault of the program, and is told without its inside. */
const fail = (error: unknown, response: ServerResponse): void => {
  if (response.req.errored === null) process.stderr.write(`longtravel: a fault of the page: ${String(error)}\n`)
  if (response.headersSent) response.destroy()
  else turnAway(response, { status: 500, message: 'a fault of the program' })
}
