/** Attacks on the loopback page, by name. None reaches the desk. */
import { request, type IncomingHttpHeaders } from 'node:http'
import { connect } from 'node:net'
import { networkInterfaces } from 'node:os'
import { afterEach, describe, expect, test, vi } from 'vitest'
import type { Page } from '../../app/page/page.ts'
import type { LastingDesk } from '../../app/shell/lasting-desk.ts'
import { done } from '../../core/contract/errors.ts'
import { pageOf } from './doors.ts'

const ask = vi.fn<LastingDesk['ask']>(() => Promise.resolve(done([])))
const desk: LastingDesk = { ask, close: () => Promise.resolve(done(null)) }

afterEach(() => {
  ask.mockClear()
})

interface Given {
  readonly method?: string
  readonly path?: string
  readonly headers?: Readonly<Record<string, string>>
  readonly body?: string | AsyncIterable<Buffer>
}

interface Answered {
  readonly status: number
  readonly headers: IncomingHttpHeaders
  readonly text: string
}

/** One request as written, no header added but those of the transfer; status 0 where the connection was cut. */
const raw = (port: number, { method = 'GET', path = '/', headers = {}, body = '' }: Given): Promise<Answered> =>
  new Promise((resolve) => {
    const cut = () => resolve({ status: 0, headers: {}, text: '' })
    const sent = request(
      { host: '127.0.0.1', port, method, path, headers: { host: `127.0.0.1:${port}`, ...headers }, agent: false },
      (response) => {
        let text = ''
        response.on('data', (part: Buffer) => (text += part.toString()))
        response.on('end', () => resolve({ status: response.statusCode!, headers: response.headers, text }))
        response.on('error', cut)
      },
    )
    sent.on('error', cut)
    if (typeof body === 'string') sent.end(body)
    else void send(body, sent)
  })

const send = async (parts: AsyncIterable<Buffer>, to: ReturnType<typeof request>): Promise<void> => {
  for await (const part of parts) {
    if (to.destroyed) return
    if (!to.write(part)) await roomIn(to)
  }
  to.end()
}

/** Settles when more can be written, or when nothing can any more. */
const roomIn = (to: ReturnType<typeof request>): Promise<void> =>
  new Promise((resolve) => {
    const go = () => {
      to.off('drain', go).off('close', go)
      resolve()
    }
    to.on('drain', go).on('close', go)
  })

const portOf = (page: Page): number => Number(new URL(page.newAddress()).port)
const keyOf = (page: Page): string => page.newAddress().split('#key=')[1]!
const posting = (port: number) => ({ origin: `http://127.0.0.1:${port}`, 'content-type': 'application/json' })

const swap = (port: number, key: string) =>
  raw(port, { method: 'POST', path: '/token', headers: posting(port), body: JSON.stringify({ key }) })

/** A page, its port and a good token: what an attacker does not have. */
const opened = async () => {
  const page = await pageOf(desk, { headers: 500, request: 1_000 })
  const port = portOf(page)
  const { token } = JSON.parse((await swap(port, keyOf(page))).text) as { token: string }
  const calling: Given = {
    method: 'POST',
    path: '/call/projects.list',
    headers: { ...posting(port), 'x-longtravel-token': token },
    body: '{}',
  }
  return { page, port, token, calling }
}

/** A good call with some headers otherwise; undefined leaves a header out. */
const withHeaders = (calling: Given, headers: Readonly<Record<string, string | undefined>>): Given => ({
  ...calling,
  headers: Object.fromEntries(
    Object.entries({ ...calling.headers, ...headers }).filter(
      (pair): pair is [string, string] => pair[1] !== undefined,
    ),
  ),
})

test('what the attacks are measured by: a page with its token gets in', async () => {
  const { port, calling } = await opened()
  const { status, text, headers } = await raw(port, calling)
  expect([status, JSON.parse(text)]).toEqual([200, { kind: 'answer', ok: true, value: [] }])
  expect(headers['cache-control']).toBe('no-store')
  expect(ask).toHaveBeenCalledTimes(1)
})

describe('a foreign page or name', () => {
  test.each([
    ['foreign Host', { host: 'evil.example' }],
    ['foreign Host with the right port', { host: 'evil.example:PORT' }],
    ['localhost instead of the address', { host: 'localhost:PORT' }],
    ['another port as Host', { host: '127.0.0.1:1' }],
    ['foreign Origin', { origin: 'https://evil.example' }],
    ['null Origin', { origin: 'null' }],
    ['Origin of another port', { origin: 'http://127.0.0.1:1' }],
    ['Origin by https', { origin: 'https://127.0.0.1:PORT' }],
    ['no Origin', { origin: undefined }],
    ['cross-site Sec-Fetch-Site', { 'sec-fetch-site': 'cross-site' }],
    ['same-site Sec-Fetch-Site', { 'sec-fetch-site': 'same-site' }],
    [
      'a navigation that posts',
      { 'sec-fetch-site': 'none', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'document' },
    ],
  ])('%s', async (_name, headers) => {
    const { page, port, calling } = await opened()
    const here = Object.fromEntries(
      Object.entries(headers).map(([name, value]) => [name, value?.replace('PORT', String(port))]),
    )
    expect((await raw(port, withHeaders(calling, here))).status).toBe(403)
    // Nor does a key help.
    const given = { method: 'POST', path: '/token', headers: posting(port), body: JSON.stringify({ key: keyOf(page) }) }
    expect((await raw(port, withHeaders(given, here))).status).toBe(403)
    expect(ask).not.toHaveBeenCalled()
  })

  test('a form of a foreign page cannot post', async () => {
    const { port, calling } = await opened()
    for (const type of [
      'text/plain',
      'application/x-www-form-urlencoded',
      'multipart/form-data; boundary=x',
      undefined,
    ])
      expect((await raw(port, withHeaders(calling, { 'content-type': type }))).status).toBe(415)
    expect(ask).not.toHaveBeenCalled()
  })

  test('a foreign page gets no answer to a preflight, and no file as a script, picture or frame', async () => {
    const { port } = await opened()
    const foreign = { 'sec-fetch-site': 'cross-site' }
    const preflight = await raw(port, { method: 'OPTIONS', path: '/call/projects.list' })
    expect([preflight.status, preflight.headers['access-control-allow-origin']]).toEqual([405, undefined])
    for (const [path, mode, dest] of [
      ['/assets/main-1a_B.js', 'no-cors', 'script'],
      ['/assets/main-1a_B.js', 'navigate', 'document'],
      ['/', 'navigate', 'iframe'],
      ['/', 'no-cors', 'image'],
      ['/', 'cors', 'empty'],
    ] as const) {
      const headers = { ...foreign, 'sec-fetch-mode': mode, 'sec-fetch-dest': dest }
      expect((await raw(port, { path, headers })).status, `${path} as ${dest}`).toBe(403)
    }
  })

  test('the file that opens the browser may lead to the window', async () => {
    const { port } = await opened()
    const headers = { 'sec-fetch-site': 'cross-site', 'sec-fetch-mode': 'navigate', 'sec-fetch-dest': 'document' }
    expect((await raw(port, { headers })).status).toBe(200)
  })

  test('the machine’s other addresses are not listened on', async () => {
    const { port } = await opened()
    const outer = Object.values(networkInterfaces())
      .flatMap((list) => list ?? [])
      .filter(({ address, internal }) => !internal && !address.startsWith('fe80'))
    for (const address of ['127.0.0.2', '::1', ...outer.map(({ address }) => address)]) {
      const heard = await new Promise((resolve) => {
        const socket = connect({ host: address, port, timeout: 1_000 }, () => resolve(true))
        socket.on('error', () => resolve(false)).on('timeout', () => resolve(false))
      })
      expect(heard, address).toBe(false)
    }
  })
})

describe('keys and tokens', () => {
  test('no key', async () => {
    const { port } = await opened()
    for (const body of [
      '{}',
      '{"key":null}',
      '{"key":["a"]}',
      '[]',
      'null',
      '"x"',
      '{"key":""}',
      '{"__proto__":{"key":"x"}}',
    ])
      expect((await raw(port, { method: 'POST', path: '/token', headers: posting(port), body })).status).toBe(403)
  })

  test('used key', async () => {
    const { page, port } = await opened()
    const key = keyOf(page)
    expect((await swap(port, key)).status).toBe(200)
    const again = await swap(port, key)
    expect([again.status, again.text.includes('token"')]).toEqual([403, false])
  })

  test('one key swapped by many at once is good for one', async () => {
    const { page, port } = await opened()
    const key = keyOf(page)
    const all = await Promise.all(Array.from({ length: 20 }, () => swap(port, key)))
    expect(all.filter(({ status }) => status === 200)).toHaveLength(1)
  })

  test('key of another page', async () => {
    const { port } = await opened()
    const other = await pageOf(desk)
    expect((await swap(port, keyOf(other))).status).toBe(403)
  })

  test('no token, wrong token, key as token', async () => {
    const { page, port, calling, token } = await opened()
    const changed = `${token.slice(0, -1)}${token.endsWith('A') ? 'B' : 'A'}`
    for (const given of [undefined, '', 'x', changed, token.slice(1), `${token} `.padEnd(60, 'x'), keyOf(page)]) {
      for (const path of ['/call/projects.list', '/watch'])
        expect((await raw(port, withHeaders({ ...calling, path }, { 'x-longtravel-token': given }))).status).toBe(401)
    }
    expect(ask).not.toHaveBeenCalled()
  })

  test('a key is no longer good when as many pages stand open as a browser can serve', async () => {
    const { page, port, calling } = await opened()
    const cut: (() => void)[] = []
    for (let count = 0; count < 4; count++)
      await new Promise((resolve) => {
        const watch = request({ host: '127.0.0.1', port, agent: false, ...calling, path: '/watch' }, resolve)
        watch.on('error', () => undefined).end('{}')
        cut.push(() => watch.destroy())
      })
    const key = keyOf(page)
    expect((await swap(port, key)).status).toBe(429)
    cut[0]!()
    await expect.poll(async () => (await swap(port, key)).status).toBe(200)
  })
})

describe('files', () => {
  test('the window’s own are served, with the policy and no cache', async () => {
    const { port } = await opened()
    const { status, text, headers } = await raw(port, {})
    expect([status, text]).toEqual([200, '<!doctype html><title>Window</title>'])
    expect(headers).toMatchObject({
      'content-security-policy':
        "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data: blob:; font-src 'self'; connect-src 'self'; worker-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
      'cache-control': 'no-store',
      'x-content-type-options': 'nosniff',
      'cross-origin-opener-policy': 'same-origin',
      'cross-origin-resource-policy': 'same-origin',
    })
    expect((await raw(port, { path: '/assets/main-1a_B.js' })).headers['content-type']).toContain('text/javascript')
  })

  test.each([
    '/../secret.json',
    '/assets/../../secret.json',
    '/..%2fsecret.json',
    '/%2e%2e/secret.json',
    '/%2e%2e%2fsecret.json',
    '/..%252fsecret.json',
    '/..\\secret.json',
    '/%5c..%5csecret.json',
    '//secret.json',
    '/./index.html',
    '/assets/',
    '/assets',
    '/index.html%00.js',
    '/index.html?x',
    '/index.html#x',
    '/etc/passwd',
    '//etc/passwd',
    'http://evil.example/',
    'file:///etc/passwd',
    '*',
    '/%c0%ae%c0%ae/secret.json',
    '/toString',
    '/__proto__',
  ])('path escape %s', async (path) => {
    const { port } = await opened()
    const { status, text } = await raw(port, { path })
    expect(status).toBeGreaterThanOrEqual(400)
    expect(text).not.toContain('secret"')
    expect(text).not.toContain('root:')
  })
})

describe('bodies', () => {
  const part = Buffer.alloc(1_000_000, 'a')
  const hundredMegabytes = async function* () {
    for (let count = 0; count < 100; count++) {
      await Promise.resolve()
      yield part
    }
  }

  test.each([
    ['announced', { 'content-length': '100000000' }],
    ['in chunks', { 'transfer-encoding': 'chunked' }],
  ])('100 MB body, %s, is not read to its end', async (_name, headers) => {
    const { port, calling } = await opened()
    const before = process.memoryUsage().rss
    const { status } = await raw(port, { ...withHeaders(calling, headers), body: hundredMegabytes() })
    // Whoever writes on without reading may find the connection cut before the answer.
    expect([413, 0]).toContain(status)
    expect(process.memoryUsage().rss - before).toBeLessThan(80_000_000)
    expect(ask).not.toHaveBeenCalled()
  })

  test('100 MB body without a token', async () => {
    const { port, calling } = await opened()
    const given = withHeaders(calling, { 'x-longtravel-token': 'x', 'content-length': '100000000' })
    expect([401, 0]).toContain((await raw(port, { ...given, body: hundredMegabytes() })).status)
    expect(ask).not.toHaveBeenCalled()
  })

  test('100 MB announced and not sent: 413', async () => {
    const { port, calling } = await opened()
    const { status } = await raw(port, { ...withHeaders(calling, { 'content-length': '100000000' }), body: one() })
    expect(status).toBe(413)
  })
  const one = async function* () {
    await Promise.resolve()
    yield Buffer.from('{')
    await new Promise((resolve) => setTimeout(resolve, 200))
  }

  test('a key of a megabyte', async () => {
    const { port } = await opened()
    expect([413, 0]).toContain((await swap(port, 'k'.repeat(1_000_000))).status)
  })

  test.each([['{'], [''], ['{"a":1}x'], ['\u0000']])('no JSON: %j', async (body) => {
    const { port, calling } = await opened()
    expect((await raw(port, { ...calling, body })).status).toBe(400)
    expect(ask).not.toHaveBeenCalled()
  })

  test('JSON nested a million deep does no harm', async () => {
    const { port, calling } = await opened()
    const { status } = await raw(port, { ...calling, body: '['.repeat(1_000_000) })
    expect(status).toBe(400)
  })

  const slowly = (port: number, head: string, piece: string): Promise<number> =>
    new Promise((resolve) => {
      const began = Date.now()
      const socket = connect({ host: '127.0.0.1', port })
      socket.write(head)
      const drip = setInterval(() => socket.write(piece), 50)
      socket.on('error', () => undefined)
      socket.on('close', () => {
        clearInterval(drip)
        resolve(Date.now() - began)
      })
      socket.resume()
    })

  test('slow body', async () => {
    const { port, token } = await opened()
    const head = [
      'POST /call/projects.list HTTP/1.1',
      `Host: 127.0.0.1:${port}`,
      `Origin: http://127.0.0.1:${port}`,
      'Content-Type: application/json',
      `X-Longtravel-Token: ${token}`,
      'Content-Length: 1000000',
    ].join('\r\n')
    expect(await slowly(port, `${head}\r\n\r\n`, ' ')).toBeLessThan(4_000)
    expect(ask).not.toHaveBeenCalled()
  })

  test('slow headers', async () => {
    const { port } = await opened()
    expect(await slowly(port, 'GET / HTTP/1.1\r\n', 'X-A: b\r\n')).toBeLessThan(4_000)
  })

  test('headers without end', async () => {
    const { port } = await opened()
    expect([431, 0]).toContain((await raw(port, { headers: { 'x-a': 'a'.repeat(100_000) } })).status)
  })
})

describe('calls', () => {
  test('unknown call', async () => {
    const { port, calling } = await opened()
    ask.mockResolvedValue({ ok: false, error: { kind: 'unknown-call', message: 'none' } })
    for (const path of [
      '/call/close',
      '/call/__proto__',
      '/call/projects.drop',
      '/call/',
      '/call/a/b',
      '/call/../token',
    ])
      expect((await raw(port, { ...calling, path })).status, path).toBe(404)
    ask.mockResolvedValue(done([]))
  })

  test.each(['GET', 'HEAD', 'PUT', 'DELETE', 'PATCH', 'OPTIONS', 'TRACE', 'PROPFIND'])(
    'wrong method %s',
    async (method) => {
      const { port, calling } = await opened()
      for (const path of ['/call/projects.list', '/token', '/watch'])
        expect((await raw(port, { ...calling, path, method, body: '' })).status).toBe(405)
      expect(ask).not.toHaveBeenCalled()
    },
  )

  test('a file cannot be posted to', async () => {
    const { port, calling } = await opened()
    expect((await raw(port, { ...calling, path: '/index.html' })).status).toBe(405)
  })

  test('CONNECT and Upgrade lead nowhere', async () => {
    const { port } = await opened()
    const upgrade = {
      connection: 'Upgrade',
      upgrade: 'websocket',
      'sec-websocket-version': '13',
      'sec-websocket-key': 'x',
    }
    expect((await raw(port, { headers: upgrade })).status).not.toBe(101)
    expect((await raw(port, { method: 'CONNECT', path: 'evil.example:80' })).status).toBe(0)
  })
})
