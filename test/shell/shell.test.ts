/** The Electron shell against a stand-in: what it asks of Electron, and whom it hears. */
import { join } from 'node:path'
import { describe, expect, onTestFinished, test, vi } from 'vitest'
import { windowFolder } from '../page/doors.ts'
import { newFolder } from '../store/folder.ts'
import { install, standIn, type StandIn } from './electron.ts'

/** Starts the shell on a data folder of its own. */
const started = async (given: Parameters<typeof standIn>[0] = {}, folder = windowFolder()): Promise<StandIn> => {
  const home = newFolder()
  vi.stubEnv('LONGTRAVEL_HOME', home)
  onTestFinished(() => void vi.unstubAllEnvs())
  const fake = standIn(given)
  install(fake)
  const { start } = await import('../../app/shell/shell.ts')
  await start(folder)
  if (given.first !== false && fake.windows.length > 0)
    onTestFinished(async () => {
      fake.app.emit('will-quit')
      await fake.exited
    })
  await import('../../app/preload.ts')
  return fake
}

describe('the window', () => {
  test('is sandboxed, isolated, without Node, and shows the program’s own address', async () => {
    const { windows, calls, schemes } = await started()
    expect(windows).toHaveLength(1)
    const [window] = windows
    expect(window!.options['webPreferences']).toMatchObject({
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      nodeIntegrationInWorker: false,
      nodeIntegrationInSubFrames: false,
      webSecurity: true,
      webviewTag: false,
      spellcheck: false,
      preload: expect.stringMatching(/preload\.cjs$/) as string,
    })
    expect([window!.address(), window!.shown()]).toEqual(['longtravel://window/', true])
    expect(calls).toContain('enableSandbox')
    expect(schemes).toEqual([
      { scheme: 'longtravel', privileges: { standard: true, secure: true, supportFetchAPI: true } },
    ])
    expect(schemes[0]!.privileges).not.toHaveProperty('bypassCSP')
  })

  test('asks no server for anything', async () => {
    const { calls, session } = await started()
    expect(calls).toContain('appendSwitch host-resolver-rules MAP * ~NOTFOUND')
    expect(session.requests()).toEqual({
      urls: expect.arrayContaining(['http://*/*', 'https://*/*', 'ws://*/*', 'wss://*/*', 'file://*/*']) as string[],
      cancel: true,
    })
  })

  test('its files come with the policy, and no others come', async () => {
    const { serve } = await started()
    const get = (path: string, method = 'GET') => serve({ url: `longtravel://window${path}`, method })
    const index = await get('/')
    expect([index.status, await index.text()]).toEqual([200, '<!doctype html><title>Window</title>'])
    expect(index.headers.get('content-security-policy')).toContain("default-src 'none'; script-src 'self'")
    expect((await get('/assets/main-1a_B.js')).headers.get('content-type')).toContain('text/javascript')
    for (const path of [
      '/../secret.json',
      '/..%2fsecret.json',
      '/%2e%2e/secret.json',
      '//secret.json',
      '/assets',
      '/x',
    ])
      expect((await get(path)).status, path).toBe(404)
    expect((await get('/', 'POST')).status).toBe(404)
    for (const url of ['longtravel://other/', 'longtravel:/', 'longtravel://window.evil/', 'longtravel://window@evil/'])
      expect((await serve({ url, method: 'GET' })).status, url).toBe(404)
  })

  test('goes nowhere, opens nothing and takes nothing in', async () => {
    const { contents, session } = await started()
    for (const name of ['will-navigate', 'will-frame-navigate', 'will-redirect', 'will-attach-webview'])
      expect(contents.emit(name).defaultPrevented, name).toBe(true)
    for (const url of ['https://evil.example/', 'longtravel://window/', 'file:///etc/passwd'])
      expect(contents.opens({ url })).toEqual({ action: 'deny' })
    for (const permission of ['media', 'geolocation', 'notifications', 'clipboard-read', 'openExternal', 'fileSystem'])
      expect(session.asks(permission), permission).toBe(false)
    expect([session.checks(), session.device(), session.download().defaultPrevented]).toEqual([false, false, true])
  })
})

describe('one program on one record', () => {
  test('a second one hands over and opens nothing', async () => {
    const { windows, calls } = await started({ first: false })
    expect(windows).toEqual([])
    expect(calls).toContain('quit')
  })

  test('the first one then shows its window', async () => {
    const { app, calls } = await started()
    app.emit('second-instance')
    expect(calls.slice(-2)).toEqual(['restore', 'focus'])
  })

  test('the lock is that of the data folder', async () => {
    const { calls } = await started()
    const lock = calls.indexOf('requestSingleInstanceLock')
    const path = calls.findIndex((call) => call.startsWith('setPath userData'))
    expect(path).toBeGreaterThanOrEqual(0)
    expect(path).toBeLessThan(lock)
    expect(calls[path]).toContain(join(process.env['LONGTRAVEL_HOME']!, 'window'))
  })

  test('ends with its window, once the record is closed', async () => {
    const { app, calls, exited, invoke } = await started()
    app.emit('window-all-closed')
    expect(calls.at(-1)).toBe('quit')
    expect(app.emit('will-quit').defaultPrevented).toBe(true)
    expect(app.emit('will-quit').defaultPrevented).toBe(true)
    expect(await exited).toBe(0)
    expect(await invoke('longtravel:call', 1, 'projects.list', {})).toMatchObject({
      ok: false,
      error: { kind: 'closed' },
    })
  })

  test('what keeps it from starting is shown', async () => {
    const { calls, exited } = await started({}, join(newFolder(), 'not-there'))
    expect(calls.some((call) => call.startsWith('showErrorBox Longtravel The window cannot be opened'))).toBe(true)
    expect(await exited).toBe(3)
  })

  test('no place for the record is shown', async () => {
    for (const name of ['LONGTRAVEL_HOME', 'HOME', 'XDG_DATA_HOME', 'USERPROFILE', 'LOCALAPPDATA']) vi.stubEnv(name, '')
    onTestFinished(() => void vi.unstubAllEnvs())
    const fake = standIn()
    install(fake)
    const { start } = await import('../../app/shell/shell.ts')
    await start(windowFolder())
    expect(fake.calls.join()).toContain('showErrorBox Longtravel there is no folder for data')
    expect(await fake.exited).toBe(2)
    expect(fake.windows).toEqual([])
  })
})

describe('whom the shell hears', () => {
  test.each([
    ['a foreign page', { url: 'https://evil.example/' }],
    ['a file', { url: 'file:///tmp/index.html' }],
    ['another host of the scheme', { url: 'longtravel://evil/' }],
    ['a scheme that begins alike', { url: 'longtravels://window/' }],
    ['a host that begins alike', { url: 'longtravel://window.evil/' }],
    ['an empty page', { url: 'about:blank' }],
    ['no address', { url: '' }],
    ['a frame inside the window', { inner: true }],
    ['a frame that is gone', { none: true }],
  ])('not %s', async (_name, sender) => {
    const fake = await started()
    Object.assign(fake.sender, sender)
    const refusal = 'only the window of the program is heard'
    await expect(fake.invoke('longtravel:call', 1, 'about', {})).rejects.toThrow(refusal)
    await expect(fake.invoke('longtravel:save', 'a', new Uint8Array())).rejects.toThrow(refusal)
    await expect(fake.invoke('longtravel:pick')).rejects.toThrow(refusal)
    expect(() => fake.send('longtravel:cancel', 1)).toThrow(refusal)
  })

  test('the window itself, by its bridge', async () => {
    const fake = await started()
    expect(Object.keys(fake.bridge()).sort()).toEqual(['call', 'cancel', 'pickText', 'saveBytes'])
    expect(await fake.bridge().call(1, 'projects.list', {}, () => undefined)).toEqual({ ok: true, value: [] })
  })

  test('not what is no call', async () => {
    const { invoke, send } = await started()
    for (const given of [[], ['1', 'about'], [1], [1, 7], [Number.NaN]])
      expect(await invoke('longtravel:call', ...given)).toMatchObject({ ok: false, error: { kind: 'argument' } })
    send('longtravel:cancel', 'x')
    send('longtravel:cancel', 99)
  })
})
