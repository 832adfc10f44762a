/** The command as it is started from a shell: found through a link, from any folder, on whatever Node the machine has. */
import { execFileSync, spawnSync } from 'node:child_process'
import { copyFileSync, existsSync, mkdirSync, mkdtempSync, rmSync, symlinkSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { delimiter, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, describe, expect, it } from 'vitest'
import manifest from '../../package.json' with { type: 'json' }

const launcher = fileURLToPath(new URL('../../app/longtravel.mjs', import.meta.url))
const folder = mkdtempSync(join(tmpdir(), 'longtravel-launcher-'))
afterAll(() => {
  rmSync(folder, { recursive: true })
})

/** A Node of the machine that is older than the sources need, if there is one. */
const older = (process.env['PATH'] ?? '')
  .split(delimiter)
  .filter((path) => !path.includes('node_modules'))
  .map((path) => join(path, 'node'))
  .filter((path) => existsSync(path))
  .find((path) => Number(execFileSync(path, ['-p', 'parseInt(process.versions.node)'], { encoding: 'utf8' })) < 24)

const start = (node: string, path: string, args: readonly string[], input = '') => {
  const { status, stdout, stderr } = spawnSync(node, [path, ...args], { cwd: folder, input, encoding: 'utf8' })
  return { status, stdout, stderr }
}

describe.each([
  ['a new enough Node', process.execPath],
  ['an older Node', older],
])('on %s', (_, node) => {
  const available = it.skipIf(node === undefined)

  available('starts through a link from another folder', () => {
    const link = join(folder, `link-${node === older ? 'older' : 'newer'}`)
    symlinkSync(launcher, link)
    expect(start(node!, link, ['--version'])).toEqual({ status: 0, stdout: `${manifest.version}\n`, stderr: '' })
  })

  available('passes arguments, standard input and the exit code on', () => {
    const { status, stdout, stderr } = start(node!, launcher, ['check', '-', '--json', '-'], 'no job')
    expect([status, stdout]).toEqual([2, ''])
    expect(stderr).toMatch(/^[^\n]+\n$/)
  })
})

describe('without an installed Node', () => {
  it.skipIf(older === undefined)('says in one line what to run', () => {
    const lonely = join(folder, 'app')
    mkdirSync(lonely)
    copyFileSync(launcher, join(lonely, 'longtravel.mjs'))
    const { status, stdout, stderr } = start(older!, join(lonely, 'longtravel.mjs'), ['--version'])
    expect([status, stdout]).toEqual([2, ''])
    expect(stderr).toMatch(/^longtravel: needs Node 24 or newer and this is [\d.]+: run "npm ci" in [^\n]+\n$/)
  })
})
