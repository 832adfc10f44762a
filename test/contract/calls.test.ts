import fc from 'fast-check'
import * as v from 'valibot'
import { describe, expect, test } from 'vitest'
import { CALLS, isCall, type CallName } from '../../core/contract/calls.ts'
import { readAnswer, readArgument } from '../../core/contract/check.ts'
import { FromDesk, ToDesk } from '../../core/contract/envelopes.ts'
import { CallError, ERROR_KINDS, refuse } from '../../core/contract/errors.ts'
import { result } from '../store/texts.ts'

const statement = { purpose: '', author: '', checker: '', date: '2026-03-31', note: '' }

/** A right argument of every call; a new call does not compile without one. */
const RIGHT: Readonly<Record<CallName, Readonly<Record<string, unknown>>>> = {
  'projects.list': {},
  'projects.create': { name: 'Γραμμή 3/4', numbering: 'letters' },
  'jobs.list': { project: 1 },
  'jobs.create': { project: 1, name: 'Цех № 7' },
  'jobs.rename': { job: 1, name: '🏗️' },
  'revisions.keep': { job: 1, text: '{}', ...statement },
  'revisions.list': { job: 1 },
  'revisions.open': { revision: 1 },
  review: { text: '' },
  'sheet.print': { of: { from: 'revision', revision: 1 }, paper: 'a4', units: 'us' },
  'settings.get': { name: 'window.units' },
  'settings.set': { name: 'units', value: { a: [1, 'x', null, true] } },
  about: {},
}
const NAMES = Object.keys(CALLS) as CallName[]

/** The paths that are refused, or none. */
const refusedAt = (name: CallName, argument: unknown): readonly string[] => {
  const read = readArgument(name, argument)
  if (read.ok) return []
  expect(read.error.kind).toBe('argument')
  expect(read.error.message.startsWith(`${name}: `)).toBe(true)
  return read.error.at!.map(({ path }) => path)
}

describe('every call', () => {
  test.each(NAMES)('%s takes its right argument and gives it on unchanged', (name) => {
    expect(readArgument(name, RIGHT[name])).toEqual({ ok: true, value: RIGHT[name] })
    expect(isCall(name)).toBe(true)
  })

  test.each(NAMES)('%s names a field that is missing, wrong or unknown', (name) => {
    for (const field of Object.keys(RIGHT[name])) {
      const rest = Object.fromEntries(Object.entries(RIGHT[name]).filter(([other]) => other !== field))
      // A setting's value may be any JSON value, but it must be there.
      expect(refusedAt(name, rest)).toEqual([field])
      expect(refusedAt(name, { ...rest, [field]: Symbol('wrong') })).toEqual([field])
    }
    expect(refusedAt(name, { ...RIGHT[name], path: '/etc/passwd' })).toEqual(['path'])
  })

  test.each(NAMES)('%s refuses what is no argument at all', (name) => {
    for (const wrong of [undefined, null, 1, 'text', [], () => 1]) expect(refusedAt(name, wrong)).not.toEqual([])
  })

  test.each(NAMES)('%s never throws, whatever it is given', (name) => {
    fc.assert(
      fc.property(fc.anything({ withBigInt: true, withNullPrototype: true, maxDepth: 4 }), (argument) => {
        const read = readArgument(name, argument)
        if (!read.ok) expect(v.is(CallError, read.error)).toBe(true)
      }),
      { numRuns: 200 },
    )
  })

  test.each(NAMES)('%s: no field asks for a path, and every text is bounded', (name) => {
    const right = RIGHT[name]
    for (const [field, value] of Object.entries(right)) {
      expect(field).not.toMatch(/path|file|folder/i)
      if (typeof value === 'string')
        expect(refusedAt(name, { ...right, [field]: 'a'.repeat(2_000_000) })).toEqual([field])
    }
  })
})

describe('fields', () => {
  const names = (name: string) => refusedAt('projects.create', { name, numbering: 'letters' })

  test('a name: one line, some sign, at most 200 characters, no half characters', () => {
    for (const right of ['a', '../x', "'); --", 'a'.repeat(200), 'Ж/Ω\\🏗️']) expect(names(right)).toEqual([])
    for (const wrong of ['', '  ', '\u00a0', 'a'.repeat(201), 'a\nb', 'a\0', '\ud83c', 'a\u0085'])
      expect(names(wrong), JSON.stringify(wrong)).toEqual(['name'])
  })

  const dates = (date: string) => refusedAt('revisions.keep', { ...RIGHT['revisions.keep'], date })

  test('a date: a day that the calendar has', () => {
    for (const right of ['2026-03-31', '2024-02-29', '2000-02-29', '1999-12-31']) expect(dates(right)).toEqual([])
    for (const wrong of [
      '',
      '2026-02-29',
      '1900-02-29',
      '2026-04-31',
      '2026-13-01',
      '2026-00-01',
      '2026-01-00',
      '31.3.2026',
      '2026-3-1',
      '2026-03-31T00:00',
      '0000-01-01',
      '٢٠٢٦-٠٣-٣١',
    ])
      expect(dates(wrong), wrong).toEqual(['date'])
  })

  test('an id: a whole number from 1', () => {
    for (const wrong of [0, -1, 1.5, NaN, Infinity, 2 ** 53, '1', null, [1]])
      expect(refusedAt('jobs.list', { project: wrong }), String(wrong)).toEqual(['project'])
  })

  test('a note has many lines and at most 100,000 characters; a job text at most a million', () => {
    const keep = (changes: object) => refusedAt('revisions.keep', { ...RIGHT['revisions.keep'], ...changes })
    expect(keep({ note: 'a\r\n\tb'.repeat(10_000) })).toEqual([])
    expect(keep({ note: 'a'.repeat(100_001) })).toEqual(['note'])
    expect(keep({ note: 'bell \u0007' })).toEqual(['note'])
    expect(keep({ text: 'a'.repeat(1_000_000) })).toEqual([])
    expect(keep({ text: 'a'.repeat(1_000_001) })).toEqual(['text'])
    expect(keep({ date: 'x', job: 0, author: 'a\n' }).toSorted()).toEqual(['author', 'date', 'job'])
  })

  test('what is printed is a text or a revision, never both', () => {
    const print = (of: unknown) => refusedAt('sheet.print', { ...RIGHT['sheet.print'], of })
    expect(print({ from: 'text', text: 'x' })).toEqual([])
    expect(print({ from: 'text', text: 'x', revision: 1 })).toEqual(['of.revision'])
    expect(print({ from: 'text', revision: 1 })).toContain('of.text')
    expect(print({ from: 'result', result: {} })).toEqual(['of.from'])
  })

  test('a setting: a plain name, and JSON that is not too deep or too much', () => {
    const set = (name: string, value: unknown) => refusedAt('settings.set', { name, value })
    for (const wrong of ['', 'A', 'a.', '.a', 'a b', '__proto__', 'a/b', 'a'.repeat(65)])
      expect(set(wrong, 1), wrong).toEqual(['name'])
    const deep = (levels: number): unknown => (levels === 0 ? 1 : [deep(levels - 1)])
    const circle: unknown[] = []
    circle.push(circle)
    expect(set('a', deep(16))).toEqual([])
    expect(set('a', 'x'.repeat(99_000))).toEqual([])
    for (const wrong of [
      deep(17),
      circle,
      NaN,
      1n,
      new Date(0),
      new Map(),
      'x'.repeat(100_001),
      ['\ud800'],
      { '\ud800': 1 },
      Array(100_001).fill(1),
      { a: undefined },
    ])
      expect(set('a', wrong)).toEqual(['value'])
  })

  test('what was read and what would be right are said', () => {
    expect(readArgument('jobs.create', { project: 'one' })).toEqual(
      refuse('argument', expect.any(String) as string, [
        { path: 'project', read: '“one”', message: 'right would be number' },
        { path: 'name', read: 'nothing', message: expect.stringContaining('is missing') as string },
      ]),
    )
  })
})

describe('answers', () => {
  test('are judged as well: a wrong one is a fault of the program', () => {
    expect(readAnswer('projects.list', [{ id: 1, name: 'P', numbering: 'letters' }]).ok).toBe(true)
    expect(readAnswer('projects.list', [{ id: 1, name: 'P', numbering: 'roman' }])).toMatchObject({
      ok: false,
      error: { kind: 'fault', at: [{ path: '[0].numbering' }] },
    })
    expect(readAnswer('review', { ok: true, result })).toEqual({ ok: true, value: { ok: true, result } })
    expect(readAnswer('review', { ok: true, result: { ...result, version: 2 } }).ok).toBe(false)
    expect(readAnswer('sheet.print', { pdf: new Uint8Array(3), kept: true, caution: '' }).ok).toBe(true)
    expect(readAnswer('sheet.print', { pdf: '/tmp/sheet.pdf', kept: true, caution: '' }).ok).toBe(false)
  })
})

describe('envelopes', () => {
  test('carry asks, cancels, progress and answers', () => {
    for (const right of [
      { kind: 'ask', id: 1, call: 'about', argument: {} },
      { kind: 'cancel', id: 1 },
    ])
      expect(v.is(ToDesk, right)).toBe(true)
    for (const right of [
      { kind: 'progress', id: 1, done: 1, of: 9 },
      { kind: 'answer', id: 1, ok: true, value: {} },
      { kind: 'answer', id: 1, ...refuse('fault', 'x') },
    ])
      expect(v.is(FromDesk, right)).toBe(true)
  })

  test('and nothing else', () => {
    for (const wrong of [
      { kind: 'close' },
      { kind: 'ask', id: 0, call: 'about', argument: {} },
      { kind: 'ask', id: 1, call: 'x'.repeat(41), argument: {} },
      { kind: 'cancel', id: 1, more: 1 },
    ])
      expect(v.is(ToDesk, wrong)).toBe(false)
    expect(v.is(FromDesk, { kind: 'answer', id: 1, ok: false, error: { kind: 'odd', message: '' } })).toBe(false)
  })

  test('every kind of error passes', () => {
    for (const kind of ERROR_KINDS) expect(v.is(CallError, refuse(kind, 'x', []).error)).toBe(true)
  })
})
