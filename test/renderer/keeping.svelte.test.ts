import { describe, expect, test } from 'vitest'
import type { CallName } from '../../core/contract/calls.ts'
import type { Outcome } from '../../core/contract/errors.ts'
import { today } from '../../renderer/revisions/today.ts'
import { fileName } from '../../renderer/state/files.ts'
import { Keeping } from '../../renderer/state/keeping.svelte.ts'
import { Printing } from '../../renderer/state/printing.svelte.ts'
import { revisionText, stateText } from '../../renderer/title-block.ts'
import type { CallOptions, Desk } from '../../renderer/desk/desk.ts'
import { jobOf } from './job-of.ts'

interface Asked {
  readonly name: CallName
  readonly argument: unknown
  readonly options: CallOptions | undefined
}

/** A desk that gives the answers it was told, call by call. */
const deskOf = (answers: Partial<Record<CallName, Outcome<unknown>>>) => {
  const asked: Asked[] = []
  const end = Promise.withResolvers<{ kind: 'stopped'; message: string }>()
  const call = ((name: CallName, argument: unknown, options?: CallOptions) => {
    asked.push({ name, argument, options })
    return Promise.resolve(answers[name] ?? { ok: false, error: { kind: 'not-found', message: `no ${name}` } })
  }) as Desk['call']
  return { desk: { call, ended: end.promise }, asked, end }
}

const ok = (value: unknown): Outcome<unknown> => ({ ok: true, value })
const statement = { purpose: 'for checking', author: 'A', checker: 'B', date: '2026-03-31', note: '' }
const revision = { id: 7, job: 2, sequence: 1, label: 'B', program: '0.1.0', fingerprint: '0'.repeat(64), ...statement }
const full = {
  'projects.list': ok([{ id: 1, name: 'Works', numbering: 'letters' }]),
  'projects.create': ok({ id: 1, name: 'Works', numbering: 'letters' }),
  'jobs.list': ok([{ id: 2, project: 1, name: 'Line C' }]),
  'jobs.create': ok({ id: 2, project: 1, name: 'Line C' }),
  'revisions.list': ok([revision]),
  'revisions.keep': ok(revision),
}

describe('keeping', () => {
  test('a new project and job are made, chosen, and the revision kept in them', async () => {
    const { desk, asked } = deskOf(full)
    const keeping = new Keeping(desk)
    expect(await keeping.createProject('Works', 'letters')).toBe(true)
    expect(await keeping.createJob('Line C')).toBe(true)
    expect([keeping.project, keeping.job]).toEqual([1, 2])
    expect(await keeping.keep('{}', statement)).toBe('B')
    expect(asked.find(({ name }) => name === 'revisions.keep')?.argument).toEqual({ job: 2, text: '{}', ...statement })
    expect(keeping.held).toEqual({ id: 7, label: 'B', text: '{}' })
    expect(keeping.revisions).toHaveLength(1)
  })

  test('without a job nothing is kept', async () => {
    const { desk, asked } = deskOf(full)
    expect(await new Keeping(desk).keep('{}', statement)).toBeUndefined()
    expect(asked).toEqual([])
  })

  test('a refusal is told and nothing is held', async () => {
    const refused: Outcome<unknown> = { ok: false, error: { kind: 'no-room', message: 'the disk is full' } }
    const { desk } = deskOf({ ...full, 'revisions.keep': refused })
    const keeping = new Keeping(desk)
    await keeping.createProject('Works', 'letters')
    await keeping.createJob('Line C')
    expect(await keeping.keep('{}', statement)).toBeUndefined()
    expect(keeping.refusal).toBe('the disk is full')
    expect(keeping.held).toBeUndefined()
  })

  test('another project lets go of the job of the first', async () => {
    const { desk } = deskOf(full)
    const keeping = new Keeping(desk)
    await keeping.chooseProject(1)
    await keeping.chooseJob(2)
    await keeping.chooseProject(3)
    expect(keeping.job).toBeUndefined()
    expect(keeping.revisions).toEqual([])
  })

  test('a desk that has gone away is told', async () => {
    const { desk, end } = deskOf(full)
    const keeping = new Keeping(desk)
    end.resolve({ kind: 'stopped', message: 'it has stopped' })
    await end.promise
    expect(keeping.gone).toBe('it has stopped')
  })
})

describe('printing', () => {
  const argument = { of: { from: 'text', text: '{}' }, paper: 'a4', units: 'si' } as const

  test('progress is followed and the sheet handed on', async () => {
    const sheet = { pdf: new Uint8Array([37]), kept: false, caution: '' }
    const { desk, asked } = deskOf({ 'sheet.print': ok(sheet) })
    const printing = new Printing(desk)
    const made = printing.print(argument)
    expect(printing.running).toBe(true)
    expect(await printing.print(argument)).toBeUndefined()
    asked[0]?.options?.onProgress?.(2, 9)
    expect([printing.done, printing.of]).toEqual([2, 9])
    expect(await made).toEqual(sheet)
    expect(printing.running).toBe(false)
    expect(asked).toHaveLength(1)
  })

  test('a stop is passed on and said plainly', async () => {
    const { desk, asked } = deskOf({ 'sheet.print': { ok: false, error: { kind: 'cancelled', message: 'cancelled' } } })
    const printing = new Printing(desk)
    const made = printing.print(argument)
    printing.stop()
    expect(asked[0]?.options?.signal?.aborted).toBe(true)
    expect(await made).toBeUndefined()
    expect(printing.refusal).toBe('Stopped. No sheet was made.')
  })
})

describe('words', () => {
  test('a file is named by number and subject, in signs that every system takes', () => {
    const job = jobOf()
    job.enter('project.number', 'BKW/204: a')
    job.enter('project.subject', '50 ton <crane>')
    expect(fileName(job, '.pdf')).toBe('BKW-204-a-50-ton-crane.pdf')
    for (const path of ['project.number', 'project.subject', 'project.title']) job.enter(path, '')
    expect(fileName(job, '.json')).toBe('girder.json')
  })

  test('the day is that of the machine’s calendar', () => {
    expect(today(new Date(2026, 2, 1, 23, 59))).toBe('2026-03-01')
  })

  test('the title block says whether the entries are those of the revision', () => {
    expect(revisionText(undefined, 'a')).toBe('draft, not kept')
    expect(revisionText({ id: 1, label: 'C', text: 'a' }, 'a')).toBe('C')
    expect(revisionText({ id: 1, label: 'C', text: 'a' }, 'b')).toBe('C, changed since')
  })

  test('the title block says what is to be mended before anything else', () => {
    expect(stateText(1, { fault: undefined, review: undefined })).toEqual({ text: '1 entry to mend', grave: true })
    expect(stateText(0, { fault: 'x', review: undefined }).text).toContain('A fault of the program')
  })
})
