/** The commands as a user's script meets them: what goes where, and the exit code. */
import { existsSync, mkdirSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import manifest from '../../package.json' with { type: 'json' }
import { checkText } from '../../app/command/check.ts'
import type { Result } from '../../core/review/result.ts'
import { ran, smallJob } from './doors.ts'

let folder = ''
let job = ''
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'longtravel-cli-'))
  job = join(folder, 'job.json')
  writeFileSync(job, JSON.stringify(smallJob))
})
afterEach(() => {
  rmSync(folder, { recursive: true })
})

const at = (...parts: string[]): string => join(folder, ...parts)
const text = (path: string): string => readFileSync(path, 'utf8')
const changed = (change: object): string => JSON.stringify({ ...smallJob, ...change })
const girder = (shape: string) => ({ girder: { ...smallJob.girder, section: { kind: 'rolled', shape } } })

describe('check', () => {
  it('prints the table and nothing else, and ends with what the review says', async () => {
    const { exit, out, err } = await ran(['check', job])
    const { exit: expected } = checkText(JSON.stringify(smallJob))
    expect([0, 1, 4]).toContain(expected)
    expect([exit, err]).toEqual([expected, ''])
    expect(out).toMatch(/^Test bay\nW24X84, span 20' 0"\n/)
    expect(readdirSync(folder)).toEqual(['job.json'])
  })

  it('ends with 1 where a check fails', async () => {
    const { exit, out } = await ran(['check', '-'], changed(girder('W12X26')))
    expect(exit).toBe(1)
    expect(out).toContain('FAILS')
  })

  it('writes the result beside the table', async () => {
    const { out } = await ran(['check', job, '--json', at('result.json')])
    const result = JSON.parse(text(at('result.json'))) as Result
    expect(result.format).toBe('longtravel-result')
    expect(result.program).toBe(manifest.version)
    expect(result.trains[0]?.cranes).toEqual(['North'])
    expect(out).toContain(`fingerprint ${result.fingerprint.slice(0, 12)}`)
  })

  it('gives nothing but the result on standard output with --json -', async () => {
    const { exit, out, err } = await ran(['check', '-', '--json', '-'], JSON.stringify(smallJob))
    const result = JSON.parse(out) as Result
    expect(err).toBe('')
    expect(exit).toBe({ true: 0, false: 1, null: 4 }[String(result.ok)])
  })

  it('gives the same bytes for the same job, and shows it the same whatever its spacing', async () => {
    const first = await ran(['check', job, '--json', '-'])
    const second = await ran(['check', '-', '--json', '-'], JSON.stringify(smallJob, null, 3))
    expect(second).toEqual(first)
  })

  it('writes two tables into a folder that it makes', async () => {
    const { err } = await ran(['check', job, '--csv', at('tables')])
    expect(err).toBe('')
    const checks = text(at('tables', 'checks.csv')).split('\r\n')
    expect(checks[0]).toBe('id,title,clause,status,demand,unit,resistance,utilisation,combination,set')
    expect(checks.some((row) => row.startsWith('us.flexure.major,'))).toBe(true)
    const envelope = text(at('tables', 'envelope.csv')).trimEnd().split('\r\n')
    expect(envelope).toHaveLength(1 + 41)
  })

  it('says everything that is wrong, one line an entry, and writes nothing', async () => {
    const wrong = changed({ runway: { spans: ['abc'], rail: { name: 'ASCE 41' } }, girth: 1 })
    const { exit, out, err } = await ran(['check', '-', '--json', at('r.json'), '--csv', at('c')], wrong)
    expect([exit, out]).toEqual([2, ''])
    const paths = err
      .trimEnd()
      .split('\n')
      .map((line) => line.split(':')[0])
    expect(paths.sort()).toEqual(['girth', 'runway.rail.name', 'runway.spans[0]'])
    expect(err).toMatch(/^runway\.spans\[0\]: read .abc.; /m)
    expect(readdirSync(folder)).toEqual(['job.json'])
  })

  it.each([
    ['empty', ''],
    ['not JSON', 'W24X84'],
    ['half a file', JSON.stringify(smallJob).slice(0, 200)],
    ['a list', '[]'],
    ['without end in depth', '['.repeat(100_000)],
    ['deep inside', `{"notes":${'{"a":'.repeat(100_000)}`],
  ])('refuses a job that is %s in one line', async (_, input) => {
    const { exit, out, err } = await ran(['check', '-'], input)
    expect([exit, out]).toEqual([2, ''])
    expect(err).toMatch(/^standard input: [^\n]+\n$/)
  })

  it('refuses standard input without end', async () => {
    const endless = async function* () {
      for (;;) yield await Promise.resolve(Buffer.alloc(1_000_000, ' '))
    }
    const { exit, err } = await ran(['check', '-'], endless)
    expect([exit, err]).toEqual([2, 'standard input: is larger than 10 MB; a job is a few kilobytes\n'])
  })

  it.each([
    ['a folder', (): string => folder],
    ['a file that is not there', (): string => at('none.json')],
    ['a device without end', (): string => '/dev/zero'],
  ])('refuses %s as a job', async (_, path) => {
    const { exit, out, err } = await ran(['check', path(), '--json', at('result.json')])
    expect([exit, out, existsSync(at('result.json'))]).toEqual([2, '', false])
    expect(err).toMatch(/^[^\n]+\n$/)
  })

  it('leaves a former result as it was where another file cannot be written', async () => {
    writeFileSync(at('result.json'), 'former')
    mkdirSync(at('tables', 'checks.csv'), { recursive: true })
    const { exit, out, err } = await ran(['check', job, '--json', at('result.json'), '--csv', at('tables')])
    expect([exit, out, text(at('result.json'))]).toEqual([2, '', 'former'])
    expect(err).toBe(`${at('tables', 'checks.csv')}: is a folder; a file is needed\n`)
  })

  it('does not overwrite the job', async () => {
    const { exit } = await ran(['check', job, '--json', job])
    expect([exit, text(job)]).toEqual([2, JSON.stringify(smallJob)])
  })
})

describe('evidence', () => {
  it('holds, with every source named and every difference shown', async () => {
    const { exit, out, err } = await ran(['evidence'])
    expect([exit, err]).toEqual([0, ''])
    expect(out.split('\n').length).toBeGreaterThan(10)
  })

  it('lists clauses on demand', async () => {
    const [plain, listed] = await Promise.all([ran(['evidence']), ran(['evidence', '--coverage'])])
    expect(plain.out).not.toContain('AISC 360-22 F2-2')
    expect(listed.out.startsWith(plain.out)).toBe(true)
    expect(listed.out.slice(plain.out.length)).toContain('F2-2')
  })
})

describe('the command line', () => {
  it('tells its version and its use', async () => {
    expect(await ran(['--version'])).toEqual({ exit: 0, out: `${manifest.version}\n`, err: '' })
    const { exit, out, err } = await ran(['--help'])
    expect([exit, err]).toEqual([0, ''])
    expect(out).toContain('longtravel check JOB')
  })

  it.each([
    [['search', 'job.json', '--lightest'], 'search: not covered by this version'],
    [['rate', 'job.json'], 'rate: not covered by this version'],
    [['compare', 'a.json', 'b.json'], 'compare: not covered by this version'],
    [['check', 'job.json', '--pdf', ''], '--pdf: read ""; a file is needed, or - for standard output'],
    [['check', 'job.json', '--pdf', '-', '--json', '-'], '--json and --pdf: only one of them can be standard output'],
    [['check'], 'check: which job file? longtravel check JOB'],
    [['check', 'a.json', 'b.json'], 'b.json: one job at a time'],
    [['check', 'a.json', '--csv', '-'], '--csv: read "-"; a folder is needed'],
    [['check', 'a.json', '--json', ''], '--json: read ""; a file is needed, or - for standard output'],
    [['check', 'a.json', '--json', 'b', '--json', 'c'], '--json: is given twice'],
    [['check', 'a.json', '--coverage'], '--coverage: goes with evidence, not with check'],
    [['check', 'a.json', '--jsn', 'b'], `Unknown option '--jsn' ("longtravel --help" lists the options)`],
    [['evidence', 'a.json'], 'a.json: evidence takes no job'],
    [['evidence', '--json', 'a'], '--json, --csv and --pdf go with check, not with evidence'],
    [['chekc', 'a.json'], 'chekc: no such command; there are check and evidence ("longtravel --help")'],
  ])('refuses %j in one line', async (args, message) => {
    expect(await ran(args)).toEqual({ exit: 2, out: '', err: `${message}\n` })
  })

  it('shows its use where no command is given', async () => {
    const { exit, out, err } = await ran([])
    expect([exit, out]).toEqual([2, ''])
    expect(err).toContain('longtravel check JOB')
  })

  it('tells a fault of the program in one line, and where only on demand', async () => {
    const broken = () => {
      throw new TypeError('a fault')
    }
    const short = await ran(['check', '-'], broken)
    expect([short.exit, short.out]).toEqual([3, ''])
    expect(short.err).toMatch(/^longtravel: a fault of the program [^\n]*: a fault\n$/)
    const long = await ran(['check', '-'], broken, { LONGTRAVEL_DEBUG: '1' })
    expect(long.err).toMatch(/\n {4}at /)
  })
})
