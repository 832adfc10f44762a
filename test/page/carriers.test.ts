/** Both carriers keep one contract: the same calls, asked by the window's own client, over each of them. */
import { describe, expect, test } from 'vitest'
import type { CallName } from '../../core/contract/calls.ts'
import type { Desk } from '../../renderer/desk/desk.ts'
import { smallJob } from '../app/doors.ts'
import { overShell } from '../shell/carried.ts'
import { errorOf, valueOf } from '../store/folder.ts'
import { jobText, LONG_NOTE, ODD_NAMES, result } from '../store/texts.ts'
import { overPage, realDesk, stubDesk } from './doors.ts'

const titled = (title: string): string => JSON.stringify({ ...smallJob, project: { title } })
const printed = (title: string) => ({ of: { from: 'text', text: titled(title) }, paper: 'a4', units: 'us' }) as const
const statement = { purpose: 'For approval', author: 'A', checker: 'C', date: '2026-03-31', note: LONG_NOTE }
/** A name that the client's types do not know. */
const foreign = (desk: Desk, name: string) => desk.call(name as CallName, {})

describe.each([
  ['loopback page', overPage],
  ['shell', overShell],
])('over the %s', (_name, over) => {
  test('projects, jobs, revisions and settings go there and back letter by letter', async () => {
    const desk = await over(realDesk())
    for (const name of ODD_NAMES) valueOf(await desk.call('projects.create', { name, numbering: 'letters' }))
    expect(valueOf(await desk.call('projects.list', {})).map(({ name }) => name)).toEqual(ODD_NAMES)
    valueOf(await desk.call('jobs.create', { project: 1, name: 'old' }))
    valueOf(await desk.call('jobs.rename', { job: 1, name: 'new' }))
    expect(valueOf(await desk.call('jobs.list', { project: 1 }))).toEqual([{ id: 1, project: 1, name: 'new' }])
    const summary = valueOf(await desk.call('revisions.keep', { job: 1, text: jobText, ...statement }))
    expect(valueOf(await desk.call('revisions.list', { job: 1 }))).toEqual([summary])
    const revision = valueOf(await desk.call('revisions.open', { revision: 1 }))
    expect(revision).toEqual({ ...summary, note: LONG_NOTE, text: jobText, result })
    expect(valueOf(await desk.call('settings.get', { name: 'window.units' }))).toEqual({ value: null })
    const value = { bytes: { pdf: 'AA==' }, list: [1, null, 'Ω'], ['__proto__']: 1 }
    valueOf(await desk.call('settings.set', { name: 'window.units', value }))
    expect(valueOf(await desk.call('settings.get', { name: 'window.units' }))).toEqual({ value })
  })

  test('a review is the desk’s own, and findings are an answer', async () => {
    const desk = await over(realDesk())
    expect(valueOf(await desk.call('review', { text: jobText }))).toEqual({ ok: true, result })
    expect(valueOf(await desk.call('review', { text: '' })).ok).toBe(false)
  })

  test('the longest text that a call may bring, in signs of three bytes', async () => {
    const desk = await over(realDesk())
    expect(valueOf(await desk.call('review', { text: '網'.repeat(1_000_000) })).ok).toBe(false)
    expect(errorOf(await desk.call('review', { text: '網'.repeat(1_000_001) })).kind).toBe('argument')
  })

  test('a calc sheet arrives byte by byte', async () => {
    const behind = realDesk()
    const desk = await over(behind)
    const argument = { of: { from: 'text', text: jobText }, paper: 'a4', units: 'us' } as const
    const sheet = valueOf(await desk.call('sheet.print', argument))
    expect(sheet.pdf).toBeInstanceOf(Uint8Array)
    const own = valueOf(await behind.ask('sheet.print', argument)) as typeof sheet
    expect(Buffer.compare(sheet.pdf, own.pdf)).toBe(0)
    expect(sheet).toMatchObject({ kept: false, caution: '' })
  })

  test('progress comes in order and before the answer', async () => {
    const desk = await over(stubDesk())
    const seen: string[] = []
    const outcome = desk.call('sheet.print', printed('Bay'), { onProgress: (done, of) => seen.push(`${done}/${of}`) })
    valueOf(await outcome)
    expect(seen).toEqual(Array.from({ length: 10 }, (_, page) => `${page + 1}/10`))
  })

  test('what goes wrong is told as a value', async () => {
    const desk = await over(stubDesk())
    const wrong = errorOf(await desk.call('jobs.list', { project: 'one' } as never))
    expect(wrong).toMatchObject({ kind: 'argument', at: [{ path: 'project', read: expect.any(String) as string }] })
    expect(errorOf(await desk.call('revisions.open', { revision: 9 })).kind).toBe('not-found')
    expect(errorOf(await desk.call('sheet.print', printed('refuse'))).kind).toBe('not-covered')
    expect(errorOf(await desk.call('sheet.print', printed('throw'))).kind).toBe('fault')
    for (const name of ['', 'close', 'toString', '__proto__', '../token', 'a/b', 'é', 'x'.repeat(1000)])
      expect(errorOf(await foreign(desk, name)).kind, name).toBe('unknown-call')
  })

  test('a cancel ends a sheet, and the desk goes on', async () => {
    const desk = await over(stubDesk())
    const cancel = new AbortController()
    const outcome = desk.call('sheet.print', printed('endless'), {
      signal: cancel.signal,
      onProgress: (done) => {
        if (done === 3) cancel.abort()
      },
    })
    expect(errorOf(await outcome)).toEqual({ kind: 'cancelled', message: 'sheet.print: cancelled' })
    valueOf(await desk.call('projects.list', {}))
    const late = await desk.call('projects.list', {}, { signal: AbortSignal.abort() })
    expect(errorOf(late).kind).toBe('cancelled')
  })

  test('a cancelled call no longer runs behind the carrier', async () => {
    const behind = stubDesk()
    let ended: unknown
    const watched = {
      ...behind,
      ask: async (...given: Parameters<typeof behind.ask>) => {
        const outcome = await behind.ask(...given)
        ended = outcome
        return outcome
      },
    }
    const desk = await over(watched)
    const cancel = new AbortController()
    const outcome = desk.call('sheet.print', printed('endless'), {
      signal: cancel.signal,
      onProgress: () => cancel.abort(),
    })
    await outcome
    await expect.poll(() => ended, { timeout: 5_000 }).toMatchObject({ ok: false, error: { kind: 'cancelled' } })
  })

  test('many calls at once each get their own answer', async () => {
    const desk = await over(realDesk())
    const names = Array.from({ length: 30 }, (_, index) => `P${index}`)
    const made = await Promise.all(names.map((name) => desk.call('projects.create', { name, numbering: 'letters' })))
    expect(made.map((outcome) => valueOf(outcome).name)).toEqual(names)
  })

  test('a desk that dies is told, and the next call has a new one', async () => {
    const desk = await over(stubDesk())
    valueOf(await desk.call('projects.create', { name: 'kept', numbering: 'letters' }))
    expect(errorOf(await desk.call('sheet.print', printed('die'))).kind).toBe('stopped')
    expect(valueOf(await desk.call('projects.list', {})).map(({ name }) => name)).toEqual(['kept'])
  })

  test('state that is no plain data is copied, as the window’s reactive state is', async () => {
    const desk = await over(realDesk())
    const state = new Proxy({ name: 'P', numbering: 'letters' } as const, {})
    expect(valueOf(await desk.call('projects.create', state)).name).toBe('P')
  })
})
