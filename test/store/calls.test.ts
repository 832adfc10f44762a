import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { labelOf } from '../../app/store/label.ts'
import { openForReading } from '../../app/store/open.ts'
import { errorOf, newFile, opened, valueOf } from './folder.ts'
import { LONG_NOTE, newRevision, ODD_NAMES } from './texts.ts'

describe('projects and jobs', () => {
  test('come back as they were made, in the order they were made', async () => {
    const { calls } = await opened(newFile())
    const made = ODD_NAMES.map((name) => valueOf(calls.createProject(name, 'letters')))
    expect(valueOf(calls.projects())).toEqual(made)
    const jobs = ODD_NAMES.map((name) => valueOf(calls.createJob(made[0]!.id, name)))
    expect(valueOf(calls.jobs(made[0]!.id))).toEqual(jobs)
    expect(valueOf(calls.jobs(made[1]!.id))).toEqual([])
    expect(jobs.map(({ name }) => name)).toEqual(ODD_NAMES)
  })

  test('a job is renamed and its revisions stay', async () => {
    const { calls } = await opened(newFile())
    const project = valueOf(calls.createProject('P', 'letters'))
    const job = valueOf(calls.createJob(project.id, 'old'))
    valueOf(calls.keepRevision(job.id, newRevision()))
    expect(valueOf(calls.renameJob(job.id, 'new'))).toEqual({ ...job, name: 'new' })
    expect(valueOf(calls.revisions(job.id))).toHaveLength(1)
  })

  test('what is not there is named', async () => {
    const { calls } = await opened(newFile())
    const missing = [
      calls.jobs(7),
      calls.createJob(7, 'x'),
      calls.renameJob(7, 'x'),
      calls.revisions(7),
      calls.revision(7),
      calls.keepRevision(7, newRevision()),
    ]
    for (const outcome of missing) {
      expect(errorOf(outcome)).toEqual({
        kind: 'not-found',
        message: expect.stringMatching(/^there is no \w+ 7/) as string,
      })
    }
  })
})

describe('revisions', () => {
  test.each([
    ['letters', ['A', 'B', 'C']],
    ['numbers', ['0', '1', '2']],
  ] as const)('are numbered by %s within each job', async (numbering, labels) => {
    const { calls } = await opened(newFile())
    const project = valueOf(calls.createProject('P', numbering))
    for (const name of ['one', 'two']) {
      const job = valueOf(calls.createJob(project.id, name))
      labels.forEach(() => valueOf(calls.keepRevision(job.id, newRevision())))
      const kept = valueOf(calls.revisions(job.id))
      expect(kept.map(({ label }) => label)).toEqual(labels)
      expect(kept.map(({ sequence }) => sequence)).toEqual([0, 1, 2])
    }
  })

  test('letters go on after Z as columns of a table do, and no two labels are alike', () => {
    expect([0, 25, 26, 27, 51, 52, 701, 702].map((each) => labelOf(each, 'letters'))).toEqual([
      'A',
      'Z',
      'AA',
      'AB',
      'AZ',
      'BA',
      'ZZ',
      'AAA',
    ])
    expect(new Set(Array.from({ length: 2000 }, (_, each) => labelOf(each, 'letters'))).size).toBe(2000)
  })

  test('any text comes back letter by letter, after the record was closed and opened as well', async () => {
    const file = newFile()
    const first = await opened(file)
    const project = valueOf(first.calls.createProject('P', 'letters'))
    const job = valueOf(first.calls.createJob(project.id, 'J'))
    const kept = new Map<number, ReturnType<typeof newRevision>>()
    const text = fc.string({ unit: 'grapheme', maxLength: 300 })
    fc.assert(
      fc.property(text, text, text, (note, author, entered) => {
        const revision = newRevision({ note, author, text: `{ ${entered}\r\n` })
        kept.set(valueOf(first.calls.keepRevision(job.id, revision)).id, revision)
      }),
      { numRuns: 50 },
    )
    const odd = newRevision({ note: LONG_NOTE, author: ODD_NAMES.join(' '), purpose: ODD_NAMES[0]! })
    kept.set(valueOf(first.calls.keepRevision(job.id, odd)).id, odd)
    valueOf(first.close())

    const second = valueOf(await openForReading(file))
    for (const [id, revision] of kept) expect(valueOf(second.calls.revision(id))).toMatchObject(revision)
    expect(valueOf(second.calls.verify())).toEqual({ revisions: kept.size })
    expect(LONG_NOTE.trim().split(/\s+/)).toHaveLength(3000)
    valueOf(second.close())
  })
})

describe('settings', () => {
  test('are kept as JSON values and overwritten', async () => {
    const { calls } = await opened(newFile())
    expect(valueOf(calls.setting('units'))).toBeNull()
    for (const value of ['si', 3.5, null, true, { a: ['Ω', { b: null }] }]) {
      valueOf(calls.set('units', value))
      expect(valueOf(calls.setting('units'))).toEqual(value)
    }
  })
})
