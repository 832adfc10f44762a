/** How long the page lives: as long as someone looks at it, and a little longer. */
import { execFileSync, spawn } from 'node:child_process'
import { chmodSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { createInterface } from 'node:readline'
import { join } from 'node:path'
import { describe, expect, onTestFinished, test } from 'vitest'
import { hasDisplay, openerFor } from '../../app/page/open.ts'
import { pageDesk } from '../../renderer/desk/page.ts'
import { newFolder, valueOf } from '../store/folder.ts'
import { built } from '../tools/built.ts'
import { pageOf, placeOf, realDesk } from './doors.ts'

/** Whether a promise settles within so many milliseconds. */
const settles = (promise: Promise<unknown>, milliseconds: number): Promise<boolean> =>
  Promise.race([
    promise.then(() => true),
    new Promise<boolean>((resolve) => setTimeout(() => resolve(false), milliseconds)),
  ])

/** A place whose requests all end at once, as when its tab is closed. */
const closable = (address: string, stored?: { token: string | null }) => {
  const place = placeOf(address, stored)
  const closed = new AbortController()
  const all = (signal: AbortSignal | null | undefined) =>
    AbortSignal.any(signal ? [signal, closed.signal] : [closed.signal])
  return {
    place: {
      ...place,
      fetch: (path: string, init: RequestInit) => place.fetch(path, { ...init, signal: all(init.signal) }),
    },
    close: () => closed.abort(),
  }
}

describe('the end', () => {
  test('comes soon after the last page, not before', async () => {
    const page = await pageOf(realDesk(), { last: 300 })
    const first = closable(page.newAddress())
    const second = closable(page.newAddress())
    for (const { place } of [first, second]) valueOf(await pageDesk(place).call('projects.list', {}))
    first.close()
    expect(await settles(page.gone, 900)).toBe(false)
    second.close()
    expect(await settles(page.gone, 2_000)).toBe(true)
  })

  test('does not come while a page is loaded anew, which keeps its token', async () => {
    const page = await pageOf(realDesk(), { last: 600 })
    const stored = { token: null }
    const address = page.newAddress()
    const before = closable(address, stored)
    valueOf(await pageDesk(before.place).call('projects.list', {}))
    before.close()
    await new Promise((resolve) => setTimeout(resolve, 200))
    const after = closable(address.split('#')[0]!, stored)
    valueOf(await pageDesk(after.place).call('projects.list', {}))
    expect(await settles(page.gone, 1_200)).toBe(false)
    after.close()
    expect(await settles(page.gone, 2_000)).toBe(true)
  })

  test('comes where no page ever comes', async () => {
    const page = await pageOf(realDesk(), { first: 100 })
    expect(await settles(page.gone, 2_000)).toBe(true)
  })

  test('is told to the pages that still stand', async () => {
    const page = await pageOf(realDesk())
    const desk = pageDesk(placeOf(page.newAddress()))
    valueOf(await desk.call('projects.list', {}))
    expect(await settles(desk.ended, 300)).toBe(false)
    await page.close()
    expect((await desk.ended).kind).toBe('stopped')
    const late = await desk.call('projects.list', {})
    expect(late).toMatchObject({ ok: false, error: { kind: 'stopped' } })
  })

  test('a page without a good key says so at once', async () => {
    const page = await pageOf(realDesk())
    const address = page.newAddress()
    valueOf(await pageDesk(placeOf(address)).call('projects.list', {}))
    for (const bad of [address, address.split('#')[0]!, `${address.split('#')[0]!}#key=x`]) {
      const desk = pageDesk(placeOf(bad))
      expect(await desk.call('projects.list', {})).toMatchObject({ ok: false, error: { kind: 'no-right' } })
      expect((await desk.ended).kind).toBe('no-right')
    }
  })
})

describe('the program as a page', () => {
  /** Starts the built page carrier; `lines` gives what it prints, one by one. */
  const started = async (given: readonly string[], environment: Readonly<Record<string, string>>) => {
    await built()
    const child = spawn(process.execPath, ['out/main/page.js', ...given], {
      env: { PATH: process.env['PATH'], LONGTRAVEL_HOME: newFolder(), TMPDIR: newFolder(), ...environment },
      stdio: ['ignore', 'pipe', 'inherit'],
    })
    onTestFinished(() => void child.kill('SIGKILL'))
    const exit = new Promise<number | null>((resolve) => child.on('exit', resolve))
    const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]()
    const line = async () => String((await lines.next()).value)
    return { child, exit, line }
  }

  test('prints its address, serves, and ends with its last page', async () => {
    const { exit, line } = await started(['--no-open'], {})
    const address = await line()
    expect(address).toMatch(/^http:\/\/127\.0\.0\.1:\d+\/#key=[\w-]{43}$/)
    const { place, close } = closable(address)
    const about = valueOf(await pageDesk(place).call('about', {}))
    expect(about.record.access).toBe('write')
    expect(await (await fetch(address)).text()).toContain('<script type="module"')
    close()
    expect(await exit).toBe(0)
  })

  test('ends when it is told to, and in order when it is told twice', async () => {
    const { child, exit, line } = await started(['--no-open'], {})
    await line()
    child.kill('SIGINT')
    child.kill('SIGTERM')
    child.kill('SIGINT')
    expect(await exit).toBe(0)
  })

  test.skipIf(process.platform !== 'linux')(
    'opens the browser by a file that only the user can read; the key is in no process list',
    async () => {
      const folder = newFolder()
      const told = join(folder, 'told')
      const browser = join(folder, 'bin', 'xdg-open')
      mkdirSync(join(folder, 'bin'))
      writeFileSync(browser, `#!/bin/sh\nprintf %s "$1" > "${told}.part"\nmv "${told}.part" "${told}"\nexec sleep 5\n`)
      chmodSync(browser, 0o755)
      const { child, exit, line } = await started([], {
        PATH: `${join(folder, 'bin')}:${process.env['PATH'] ?? ''}`,
        DISPLAY: ':9',
      })
      const printed = await line()
      await expect.poll(() => existsSync(told), { timeout: 5_000 }).toBe(true)
      const file = readFileSync(told, 'utf8')
      expect(statSync(file).mode & 0o777).toBe(0o600)
      expect(statSync(join(file, '..')).mode & 0o777).toBe(0o700)
      const address = /url=(http:[^"]+)"/.exec(readFileSync(file, 'utf8'))![1]!
      const key = address.split('#key=')[1]!
      // The address that is printed has a key of its own.
      expect(printed).not.toContain(key)
      const processes = execFileSync('sh', ['-c', 'cat /proc/[0-9]*/cmdline /proc/[0-9]*/environ 2>/dev/null || true'])
      expect(processes.includes(key)).toBe(false)
      valueOf(await pageDesk(closable(address).place).call('projects.list', {}))
      child.kill('SIGINT')
      expect(await exit).toBe(0)
      expect(existsSync(file)).toBe(false)
    },
  )

  test('a machine without a display or a browser is told the address and nothing else happens', async () => {
    expect(openerFor('linux', {})).toBeUndefined()
    expect(openerFor('linux', { DISPLAY: '', WAYLAND_DISPLAY: 'wayland-0' })).toEqual({ file: 'xdg-open', before: [] })
    expect(openerFor('darwin', {})?.file).toBe('open')
    expect(openerFor('win32', {})?.file).toBe('explorer.exe')
    expect([hasDisplay('linux', { DISPLAY: ':0' }), hasDisplay('linux', {}), hasDisplay('win32', {})]).toEqual([
      true,
      false,
      true,
    ])
    const { line, child, exit } = await started([], { PATH: '/nowhere', DISPLAY: ':9' })
    expect(await line()).toContain('#key=')
    child.kill('SIGTERM')
    expect(await exit).toBe(0)
  })

  test('without a place for the record it says which setting is missing', async () => {
    const { exit } = await started(['--no-open'], { LONGTRAVEL_HOME: '', HOME: '', USERPROFILE: '', LOCALAPPDATA: '' })
    expect(await exit).toBe(2)
  })
})
