/** Calls that outlive their page, and files by dialogs. */
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test, vi } from 'vitest'
import type { LastingDesk } from '../../app/shell/lasting-desk.ts'
import { done, refuse } from '../../core/contract/errors.ts'
import { newFolder } from '../store/folder.ts'
import { carried } from './carried.ts'

/** A desk whose calls run until they are cancelled. */
const endlessDesk = () => {
  const signals: AbortSignal[] = []
  const ask = vi.fn<LastingDesk['ask']>((_name, _argument, { signal } = {}) => {
    signals.push(signal!)
    return new Promise((resolve) => {
      signal!.addEventListener('abort', () => resolve(refuse('cancelled', 'cancelled')))
    })
  })
  return { desk: { ask, close: () => Promise.resolve(done(null)) }, signals }
}

describe('calls of a page that is gone', () => {
  test.each([
    ['loaded anew', 'did-start-navigation', { isMainFrame: true, isSameDocument: false }],
    ['crashed', 'render-process-gone', {}],
    ['closed', 'destroyed', {}],
  ])('are cancelled when it is %s', async (_name, event, details) => {
    const { desk, signals } = endlessDesk()
    const fake = await carried(desk)
    const outcome = fake.invoke('longtravel:call', 1, 'about', {})
    fake.contents.emitWith(event, details)
    expect(signals.map(({ aborted }) => aborted)).toEqual([true])
    expect(await outcome).toMatchObject({ ok: false, error: { kind: 'cancelled' } })
    // The new page counts from one again.
    void fake.invoke('longtravel:call', 1, 'about', {})
    expect(signals).toHaveLength(2)
    expect(signals[1]!.aborted).toBe(false)
  })

  test('go on while a frame or a place in the page changes', async () => {
    const { desk, signals } = endlessDesk()
    const fake = await carried(desk)
    void fake.invoke('longtravel:call', 1, 'about', {})
    fake.contents.emitWith('did-start-navigation', { isMainFrame: false, isSameDocument: false })
    fake.contents.emitWith('did-start-navigation', { isMainFrame: true, isSameDocument: true })
    expect(signals[0]!.aborted).toBe(false)
    expect(await fake.invoke('longtravel:call', 1, 'about', {})).toMatchObject({ error: { kind: 'argument' } })
  })
})

describe('saving', () => {
  const open = async () => carried(endlessDesk().desk)

  test('writes where the user says, under the name that is proposed', async () => {
    const fake = await open()
    const filePath = join(newFolder(), 'sheet.pdf')
    fake.dialogs.save = { canceled: false, filePath }
    expect(await fake.bridge().saveBytes('Bay 3.pdf', new Uint8Array([1, 2, 255]))).toEqual(done(true))
    expect([...readFileSync(filePath)]).toEqual([1, 2, 255])
    expect(fake.dialogs.proposed).toEqual(['Bay 3.pdf'])
  })

  test('proposes no path, whatever the name', async () => {
    const fake = await open()
    for (const name of ['../../etc/passwd', 'C:\\a\\b', '/etc/x', '\u0000\n', 'x'.repeat(999)])
      expect(await fake.bridge().saveBytes(name, new Uint8Array())).toEqual(done(false))
    expect(fake.dialogs.proposed.every((name) => name.length <= 120 && !/[\p{Cc}/\\:]/u.test(name))).toBe(true)
    expect(fake.dialogs.proposed[3]).toBe('longtravel')
  })

  test('says why it cannot', async () => {
    const fake = await open()
    fake.dialogs.save = { canceled: false, filePath: join(newFolder(), 'missing', 'sheet.pdf') }
    const refused = await fake.bridge().saveBytes('a', new Uint8Array())
    expect(refused).toMatchObject({ ok: false, error: { kind: 'disk' } })
    expect(await fake.bridge().saveBytes(1 as never, new Uint8Array())).toMatchObject({ error: { kind: 'argument' } })
    expect(await fake.bridge().saveBytes('a', 'text' as never)).toMatchObject({ error: { kind: 'argument' } })
  })
})

describe('opening', () => {
  const pick = async (content: string | Uint8Array | undefined) => {
    const fake = await carried(endlessDesk().desk)
    const path = join(newFolder(), 'bay.json')
    if (content !== undefined) writeFileSync(path, content)
    fake.dialogs.open = { filePaths: [path] }
    return fake.bridge().pickText()
  }

  test('gives the text and the name, no path', async () => {
    expect(await pick('{"é": "網"}')).toEqual(done({ name: 'bay.json', text: '{"é": "網"}' }))
  })

  test('gives nothing where the user thought better of it', async () => {
    const fake = await carried(endlessDesk().desk)
    expect(await fake.bridge().pickText()).toEqual(done(null))
  })

  test('refuses a picture, a film and a file that is gone, by name', async () => {
    for (const content of [new Uint8Array([0x89, 0x50, 0x4e, 0x47]), new Uint8Array(4_000_001), undefined]) {
      const refused = await pick(content)
      expect(refused.ok).toBe(false)
      expect(!refused.ok && refused.error.message).toMatch(/^bay\.json/)
    }
  })
})
