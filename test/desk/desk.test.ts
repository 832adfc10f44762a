import { Worker } from 'node:worker_threads'
import Database from 'better-sqlite3'
import { existsSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, onTestFinished, test } from 'vitest'
import { deskOf, startDesk, type Desk } from '../../app/desk/desk.ts'
import { RECORD_FILE } from '../../app/store/open.ts'
import type { CallName } from '../../core/contract/calls.ts'
import { VERSION } from '../../core/review/version.ts'
import { smallJob } from '../app/doors.ts'
import { errorOf, newFolder, valueOf } from '../store/folder.ts'
import { jobText, LONG_NOTE, ODD_NAMES, result } from '../store/texts.ts'

const closing = (desk: Desk): Desk => {
  onTestFinished(async () => {
    await desk.close()
  })
  return desk
}
const started = (home = newFolder()): Desk => closing(startDesk({ home }))
/** A desk whose printer does what a job's title says. */
const stubbed = (home = newFolder()): Desk =>
  closing(deskOf(new Worker(new URL('./stub-worker.ts', import.meta.url), { workerData: { home } })))

const titled = (title: string): string => JSON.stringify({ ...smallJob, project: { title } })
const kept = { job: 1, text: jobText, purpose: 'For approval', author: 'A', checker: 'C', date: '2026-03-31', note: '' }
const printed = (title: string) => ({ of: { from: 'text', text: titled(title) }, paper: 'a4', units: 'us' }) as const
const asText = (bytes: Uint8Array) => new TextDecoder().decode(bytes)

/** A project and a job in a desk's record; both have the id 1. */
const withJob = async (desk: Desk): Promise<Desk> => {
  valueOf(await desk.call('projects.create', { name: 'P', numbering: 'letters' }))
  valueOf(await desk.call('jobs.create', { project: 1, name: 'J' }))
  return desk
}

describe('every call goes through the worker and back', () => {
  test('projects, jobs, revisions, settings', async () => {
    const home = join(newFolder(), 'made', 'anew')
    const desk = started(home)
    for (const [index, name] of ODD_NAMES.entries()) {
      const project = valueOf(await desk.call('projects.create', { name, numbering: 'numbers' }))
      expect(project).toEqual({ id: index + 1, name, numbering: 'numbers' })
    }
    expect(valueOf(await desk.call('projects.list', {})).map(({ name }) => name)).toEqual(ODD_NAMES)
    valueOf(await desk.call('jobs.create', { project: 1, name: 'old' }))
    valueOf(await desk.call('jobs.rename', { job: 1, name: 'new' }))
    expect(valueOf(await desk.call('jobs.list', { project: 1 }))).toEqual([{ id: 1, project: 1, name: 'new' }])
    const summary = valueOf(await desk.call('revisions.keep', { ...kept, note: LONG_NOTE }))
    expect(summary).toMatchObject({ label: '0', sequence: 0, program: VERSION, fingerprint: result.fingerprint })
    expect(valueOf(await desk.call('revisions.list', { job: 1 }))).toEqual([summary])
    expect(valueOf(await desk.call('revisions.open', { revision: 1 }))).toEqual({
      ...summary,
      note: LONG_NOTE,
      text: jobText,
      result,
    })
    expect(valueOf(await desk.call('settings.get', { name: 'window.units' }))).toEqual({ value: null })
    valueOf(await desk.call('settings.set', { name: 'window.units', value: { a: ['Ω'] } }))
    expect(valueOf(await desk.call('settings.get', { name: 'window.units' }))).toEqual({ value: { a: ['Ω'] } })
    expect(existsSync(join(home, RECORD_FILE))).toBe(true)
  })

  test('review gives the result, or the findings as its answer', async () => {
    const desk = started()
    expect(valueOf(await desk.call('review', { text: jobText }))).toEqual({ ok: true, result })
    const refused = valueOf(await desk.call('review', { text: '{"format": "longtravel-job", "odd": 1}' }))
    expect(refused.ok).toBe(false)
    expect(!refused.ok && refused.findings.map(({ path }) => path)).toContain('odd')
    expect(valueOf(await desk.call('review', { text: '' })).ok).toBe(false)
  })

  test('about names the versions and how the record stands', async () => {
    expect(valueOf(await started().call('about', {}))).toEqual({
      program: VERSION,
      node: process.version,
      sqlite: expect.stringMatching(/^3\.\d+\.\d+$/) as string,
      schema: 1,
      record: { access: 'write', cautions: [] },
    })
  })

  test('a job that is refused is not kept, and its entries are named', async () => {
    const desk = await withJob(started())
    const error = errorOf(
      await desk.call('revisions.keep', { ...kept, text: '{"format": "longtravel-job", "odd": 1}' }),
    )
    expect(error.kind).toBe('job')
    expect(error.at!.map(({ path }) => path)).toContain('odd')
    expect(valueOf(await desk.call('revisions.list', { job: 1 }))).toEqual([])
  })

  test('what comes from outside is refused by field, before it reaches the worker', async () => {
    const desk = started()
    expect(
      errorOf(await desk.ask('revisions.keep', { ...kept, result, job: 'one' })).at!.map(({ path }) => path),
    ).toEqual(['job', 'result'])
    for (const name of ['', 'close', 'toString', '__proto__', 'projects.drop', 'x'.repeat(1e6)]) {
      const error = errorOf(await desk.ask(name, {}))
      expect(error.kind).toBe('unknown-call')
      expect(error.message.length).toBeLessThan(100)
    }
  })

  test('the worker judges arguments by itself as well', async () => {
    const worker = new Worker(new URL('./stub-worker.ts', import.meta.url), { workerData: { home: newFolder() } })
    const heard = new Promise((resolve) => worker.once('message', resolve))
    worker.postMessage({ kind: 'ask', id: 1, call: 'jobs.list', argument: { project: 'one' } })
    expect(await heard).toMatchObject({ kind: 'answer', id: 1, ok: false, error: { kind: 'argument' } })
    await worker.terminate()
  })

  test('many calls at once each get their own answer', async () => {
    const desk = started()
    const names = Array.from({ length: 50 }, (_, index) => `P${index}`)
    const made = await Promise.all(names.map((name) => desk.call('projects.create', { name, numbering: 'letters' })))
    expect(made.map((outcome) => valueOf(outcome).name)).toEqual(names)
    expect(new Set(made.map((outcome) => valueOf(outcome).id)).size).toBe(50)
  })
})

describe('printing', () => {
  test('of a text, with progress; it was not kept', async () => {
    const desk = stubbed()
    const seen: string[] = []
    const sheet = valueOf(
      await desk.call('sheet.print', printed('Bay'), { onProgress: (done, of) => seen.push(`${done}/${of}`) }),
    )
    expect(asText(sheet.pdf)).toBe('%PDF {"title":"Bay","revision":null,"paper":"a4","units":"us"}')
    expect(sheet).toMatchObject({ kept: false, caution: '' })
    expect(seen).toEqual(Array.from({ length: 10 }, (_, page) => `${page + 1}/10`))
  })

  test('of a revision bears its label where the result is the kept one', async () => {
    const desk = await withJob(stubbed())
    valueOf(await desk.call('revisions.keep', kept))
    const sheet = valueOf(
      await desk.call('sheet.print', { of: { from: 'revision', revision: 1 }, paper: 'letter', units: 'si' }),
    )
    expect(asText(sheet.pdf)).toContain('"revision":"A","paper":"letter","units":"si"')
    expect(sheet).toMatchObject({ kept: true, caution: '' })
  })

  test('of a revision that another program had computed otherwise says so and bears no label', async () => {
    const home = newFolder()
    const first = await withJob(stubbed(home))
    valueOf(await first.close())
    const { openForWriting } = await import('../../app/store/open.ts')
    const store = valueOf(await openForWriting(join(home, RECORD_FILE)))
    valueOf(store.calls.keepRevision(1, { ...kept, result: { ...result, program: '0.0.9' } }))
    valueOf(store.close())
    const desk = stubbed(home)
    const sheet = valueOf(
      await desk.call('sheet.print', { of: { from: 'revision', revision: 1 }, paper: 'a4', units: 'us' }),
    )
    expect(sheet.kept).toBe(false)
    expect(sheet.caution).toContain('0.0.9')
    expect(asText(sheet.pdf)).toContain('"revision":null')
  })

  test('what is refused, missing or broken is told', async () => {
    const desk = stubbed()
    expect(errorOf(await desk.call('sheet.print', printed('refuse')))).toEqual({
      kind: 'not-covered',
      message: 'no typeface draws this',
    })
    expect(errorOf(await desk.call('sheet.print', printed('throw')))).toEqual({
      kind: 'fault',
      message: expect.stringContaining('the pen broke') as string,
    })
    expect(errorOf(await desk.call('sheet.print', { ...printed('x'), of: { from: 'text', text: '{}' } })).kind).toBe(
      'job',
    )
    expect(
      errorOf(await desk.call('sheet.print', { ...printed('x'), of: { from: 'revision', revision: 9 } })).kind,
    ).toBe('not-found')
    // The desk goes on after a fault.
    expect(valueOf(await desk.call('sheet.print', printed('Bay'))).pdf.length).toBeGreaterThan(10)
  })

  test('a real sheet, twice the same bytes', async () => {
    const desk = await withJob(started())
    valueOf(await desk.call('revisions.keep', kept))
    const print = async () =>
      valueOf(await desk.call('sheet.print', { of: { from: 'revision', revision: 1 }, paper: 'a4', units: 'us' }))
    const [first, second] = [await print(), await print()]
    expect(asText(first.pdf.subarray(0, 5))).toBe('%PDF-')
    expect(first.kept).toBe(true)
    expect(Buffer.compare(first.pdf, second.pdf)).toBe(0)
  })
})

describe('cancel', () => {
  test('ends a sheet between its pages, and the desk goes on', async () => {
    const desk = stubbed()
    const cancel = new AbortController()
    let pages = 0
    const outcome = desk.call('sheet.print', printed('endless'), {
      signal: cancel.signal,
      onProgress: () => {
        pages++
        if (pages === 3) cancel.abort()
      },
    })
    // Other calls are answered while a sheet is made.
    valueOf(await desk.call('projects.list', {}))
    expect(errorOf(await outcome)).toEqual({ kind: 'cancelled', message: 'sheet.print: cancelled' })
    expect(pages).toBeGreaterThanOrEqual(3)
    valueOf(await desk.call('projects.list', {}))
  })

  test('before the call, before its turn, and after it is over', async () => {
    const desk = stubbed()
    expect(errorOf(await desk.call('about', {}, { signal: AbortSignal.abort() })).kind).toBe('cancelled')
    const early = new AbortController()
    const outcome = desk.call('projects.create', { name: 'P', numbering: 'letters' }, { signal: early.signal })
    early.abort()
    const late = new AbortController()
    const told = await outcome
    // Cancelled or done, and the record agrees with what was said.
    expect(valueOf(await desk.call('projects.list', {}, { signal: late.signal }))).toHaveLength(told.ok ? 1 : 0)
    late.abort()
    valueOf(await desk.call('about', {}))
  })
})

describe('the worker dies', () => {
  test.each(['die', 'exit'])(
    '(%s) every pending call is told so, and a new desk goes on with the record',
    async (how) => {
      const home = newFolder()
      const desk = await withJob(stubbed(home))
      valueOf(await desk.call('revisions.keep', kept))
      const pending = [
        desk.call('sheet.print', printed('endless')),
        desk.call('sheet.print', printed(how)),
        desk.call('sheet.print', printed('endless')),
      ]
      for (const outcome of await Promise.all(pending)) expect(errorOf(outcome).kind).toBe('stopped')
      expect((await desk.ended).kind).toBe('stopped')
      expect(errorOf(await desk.call('about', {})).kind).toBe('stopped')
      expect(errorOf(await desk.close()).kind).toBe('stopped')
      const next = stubbed(home)
      expect(valueOf(await next.call('about', {})).record.access).toBe('write')
      expect(valueOf(await next.call('revisions.list', { job: 1 }))).toHaveLength(1)
    },
  )
})

describe('close', () => {
  test('cancels what runs, brings the log into the file, gives the lock back, and refuses later calls', async () => {
    const home = newFolder()
    const desk = await withJob(stubbed(home))
    const running = desk.call('sheet.print', printed('endless'))
    const closed = desk.close()
    expect(errorOf(await desk.call('about', {})).kind).toBe('closed')
    expect(errorOf(await running).kind).toBe('cancelled')
    expect(valueOf(await closed)).toBeNull()
    expect(await desk.close()).toEqual(await closed)
    expect((await desk.ended).kind).toBe('closed')
    expect(errorOf(await desk.call('about', {})).kind).toBe('closed')
    expect(existsSync(join(home, `${RECORD_FILE}-wal`))).toBe(false)
    const file = new Database(join(home, RECORD_FILE), { readonly: true })
    expect(file.prepare('SELECT count(*) FROM jobs').pluck().get()).toBe(1)
    file.close()
    expect(valueOf(await stubbed(home).call('about', {})).record.access).toBe('write')
  })
})

describe('a record that cannot be used', () => {
  const writes: readonly (readonly [CallName, unknown])[] = [
    ['projects.create', { name: 'Q', numbering: 'letters' }],
    ['jobs.create', { project: 1, name: 'K' }],
    ['jobs.rename', { job: 1, name: 'K' }],
    ['revisions.keep', kept],
    ['settings.set', { name: 'a', value: 1 }],
  ]

  test('open elsewhere: it is read here, and each call that writes says why it does not', async () => {
    const home = newFolder()
    const first = await withJob(started(home))
    const second = started(home)
    expect(valueOf(await second.call('about', {})).record).toMatchObject({
      access: 'read',
      because: { kind: 'in-use' },
    })
    for (const [name, argument] of writes) expect(errorOf(await second.ask(name, argument)).kind).toBe('in-use')
    valueOf(await first.call('revisions.keep', kept))
    expect(valueOf(await second.call('revisions.open', { revision: 1 })).text).toBe(jobText)
    expect(valueOf(await second.call('review', { text: jobText })).ok).toBe(true)
  })

  test('damaged: it is named, and what needs no record goes on', async () => {
    const home = newFolder()
    writeFileSync(join(home, RECORD_FILE), Buffer.alloc(10_000, 0xa5))
    const desk = stubbed(home)
    for (const [name, argument] of [...writes, ['projects.list', {}], ['revisions.open', { revision: 1 }]] as const) {
      const error = errorOf(await desk.ask(name, argument))
      expect(error.kind).toBe('damaged')
      expect(error.message).toContain(join(home, RECORD_FILE))
    }
    expect(valueOf(await desk.call('about', {})).record).toMatchObject({ access: 'none', because: { kind: 'damaged' } })
    expect(valueOf(await desk.call('review', { text: jobText })).ok).toBe(true)
    expect(valueOf(await desk.call('sheet.print', printed('Bay'))).kept).toBe(false)
    valueOf(await desk.close())
  })
})
