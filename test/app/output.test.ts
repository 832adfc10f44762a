/** Files are written whole or not at all, and the former ones outlive a failure. */
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  rmSync,
  statSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { refusals, writeAll } from '../../app/command/output.ts'

let folder = ''
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'longtravel-output-'))
})
afterEach(() => {
  rmSync(folder, { recursive: true })
})

const at = (...parts: string[]): string => join(folder, ...parts)
const text = (path: string): string => readFileSync(path, 'utf8')

describe('writeAll', () => {
  it('writes new files and replaces old ones, keeping their mode and leaving nothing beside', async () => {
    writeFileSync(at('old'), 'before', { mode: 0o640 })
    const targets = [
      { path: at('old'), content: 'after' },
      { path: at('new'), content: 'first' },
    ]
    expect(await writeAll(targets, undefined)).toBeUndefined()
    expect([text(at('old')), text(at('new'))]).toEqual(['after', 'first'])
    expect(statSync(at('old')).mode & 0o777).toBe(0o640)
    expect(readdirSync(folder).sort()).toEqual(['new', 'old'])
  })

  it('writes what a link points to and keeps the link', async () => {
    writeFileSync(at('real'), 'before')
    symlinkSync(at('real'), at('link'))
    expect(await writeAll([{ path: at('link'), content: 'after' }], undefined)).toBeUndefined()
    expect(text(at('real'))).toBe('after')
    expect(readdirSync(folder).sort()).toEqual(['link', 'real'])
  })

  it('leaves every former file as it was where one cannot be written', async () => {
    writeFileSync(at('old'), 'before')
    const targets = [
      { path: at('old'), content: 'after' },
      { path: at('missing', 'new'), content: 'never' },
    ]
    expect(await writeAll(targets, undefined)).toBe(
      `${at('missing', 'new')}: cannot be written: there is no such file or folder`,
    )
    expect(text(at('old'))).toBe('before')
    expect(readdirSync(folder)).toEqual(['old'])
  })

  it('takes a folder back that it made in vain', async () => {
    const targets = [{ path: at('old', 'below'), content: 'never' }]
    writeFileSync(at('old'), 'before')
    expect(await writeAll(targets, at('fresh'))).toBe(
      `${at('old', 'below')}: cannot be written: a part of the path is a file, not a folder`,
    )
    expect(existsSync(at('fresh'))).toBe(false)
  })

  it('refuses a folder in the place of a file and leaves no half-written file', async () => {
    mkdirSync(at('taken'))
    const message = await writeAll([{ path: at('taken'), content: 'never' }], undefined)
    expect(message).toMatch(/cannot be written: it is a folder$/)
    expect(readdirSync(folder)).toEqual(['taken'])
  })
})

describe('refusals', () => {
  it('lets what can be written pass', async () => {
    writeFileSync(at('job'), '{}')
    expect(await refusals([at('a'), at('made', 'b')], at('job'), at('made'))).toEqual([])
    expect(existsSync(at('made'))).toBe(false)
  })

  it('names every path that cannot be written', async () => {
    writeFileSync(at('leaf'), '')
    mkdirSync(at('sub'))
    expect(await refusals([at('sub'), at('leaf', 'x'), at('none', 'x'), '/dev/null'], undefined, undefined)).toEqual([
      `${at('sub')}: is a folder; a file is needed`,
      `${at('leaf', 'x')}: cannot be written: a part of the path is a file, not a folder`,
      `${at('none', 'x')}: cannot be written: there is no such file or folder`,
      '/dev/null: is not a plain file; "-" writes to standard output',
    ])
  })

  it('does not let the job be overwritten, nor one file be written twice', async () => {
    writeFileSync(at('job'), '{}')
    symlinkSync(at('job'), at('link'))
    expect(await refusals([at('link')], at('job'), undefined)).toEqual([
      `${at('link')}: this command already reads or writes that file`,
    ])
    expect(await refusals([at('made', 'x'), at('made', '..', 'made', 'x')], undefined, at('made'))).toHaveLength(1)
  })

  it('refuses a file where a folder is needed', async () => {
    writeFileSync(at('leaf'), '')
    expect(await refusals([at('leaf', 'checks.csv')], undefined, at('leaf'))).toEqual([
      `${at('leaf')}: is a file; a folder is needed`,
    ])
    expect(await refusals([], undefined, at('none', 'deep'))).toEqual([
      `${at('none', 'deep')}: cannot be written: there is no such file or folder`,
    ])
  })
})
