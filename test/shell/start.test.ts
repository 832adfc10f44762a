/** `npm start`: what is built, which window opens, and that it never hangs. */
import { spawn } from 'node:child_process'
import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { describe, expect, onTestFinished, test } from 'vitest'
import { electronIn, fetchElectron } from '../../app/start/electron.ts'
import { failedAtOnce, run } from '../../app/start/run.ts'
import { isStale } from '../../app/start/stale.ts'
import { newFolder } from '../store/folder.ts'
import { built } from '../tools/built.ts'

const PROJECT = join(import.meta.dirname, '../..')
const ADDRESS = /^http:\/\/127\.0\.0\.1:\d+\/#key=/

/** Starts the program; the lines that it prints until its address. */
const started = async (given: readonly string[], environment: Readonly<Record<string, string>>) => {
  await built()
  const child = spawn(process.execPath, ['app/start.ts', ...given], {
    cwd: PROJECT,
    env: { PATH: '/nowhere', LONGTRAVEL_HOME: newFolder(), HOME: newFolder(), ...environment },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const exit = new Promise<number | null>((resolve) => child.on('exit', resolve))
  onTestFinished(async () => {
    child.kill('SIGTERM')
    await exit
  })
  const lines: string[] = []
  for await (const line of createInterface({ input: child.stdout })) {
    // A file may be changed while the tests run; it is then built anew.
    if (line !== 'Building the window.') lines.push(line)
    if (ADDRESS.test(line)) break
  }
  return { lines, child, exit }
}

describe('the window that opens', () => {
  test('is the page where it is asked for, and the address is all that is printed', async () => {
    const { lines, child, exit } = await started(['--no-open'], { DISPLAY: ':9' })
    expect(lines).toEqual([expect.stringMatching(ADDRESS)])
    child.kill('SIGTERM')
    expect(await exit).toBe(0)
  })

  test('is the page by a setting', async () => {
    const { lines } = await started([], { LONGTRAVEL_PAGE: '1' })
    expect(lines).toEqual([expect.stringMatching(ADDRESS)])
  })

  test.skipIf(process.platform !== 'linux')('is the page where there is no display, and that is said', async () => {
    const { lines } = await started([], {})
    expect(lines[0]).toContain('no display')
    expect(lines[1]).toMatch(ADDRESS)
  })

  // Where Electron was fetched already, this would open it.
  test.skipIf(process.platform !== 'linux' || electronIn(join(PROJECT, 'node_modules/electron')) !== undefined)(
    'is the page where Electron cannot be fetched, and that is said',
    async () => {
      // A mirror that refuses every connection stands for a machine without a network.
      const offline = { ELECTRON_MIRROR: 'http://127.0.0.1:1/', electron_config_cache: newFolder() }
      const { lines } = await started([], { DISPLAY: ':9', ...offline })
      expect(lines[0]).toContain('Fetching Electron')
      expect(lines[1]).toContain('could not be fetched')
      expect(lines[2]).toMatch(ADDRESS)
    },
  )
})

describe('Electron’s own program', () => {
  const INSTALLS = `const fs = require('node:fs'), path = require('node:path')
    fs.mkdirSync(path.join(__dirname, 'dist'))
    fs.writeFileSync(path.join(__dirname, 'dist/electron'), '')
    fs.writeFileSync(path.join(__dirname, 'path.txt'), 'electron')`

  const packageWith = (installer: string): string => {
    const folder = newFolder()
    writeFileSync(join(folder, 'install.js'), installer)
    return folder
  }

  test('is there where the package names it and the file exists', () => {
    const folder = newFolder()
    expect(electronIn(folder)).toBeUndefined()
    writeFileSync(join(folder, 'path.txt'), 'electron\n')
    expect(electronIn(folder)).toBeUndefined()
    mkdirSync(join(folder, 'dist'))
    writeFileSync(join(folder, 'dist/electron'), '')
    expect(electronIn(folder)).toBe(join(folder, 'dist/electron'))
  })

  test('is fetched by the package’s own installer', async () => {
    const folder = packageWith(INSTALLS)
    expect(await fetchElectron(folder, 10_000)).toBe(join(folder, 'dist/electron'))
  })

  test.each([
    ['fails', 'process.exit(1)'],
    ['does nothing', ''],
    [
      'is not there to be found after it ended',
      `require('node:fs').writeFileSync(__dirname + '/path.txt', 'electron')`,
    ],
  ])('is not used where the installer %s', async (_name, installer) => {
    expect(await fetchElectron(packageWith(installer), 10_000)).toBeUndefined()
  })

  test('is not waited for beyond the limit', async () => {
    const began = Date.now()
    expect(await fetchElectron(packageWith('setInterval(() => {}, 1000)'), 500)).toBeUndefined()
    expect(Date.now() - began).toBeLessThan(5_000)
  })
})

describe('Electron that cannot run here', () => {
  const node = (script: string) => run(process.execPath, ['-e', script], PROJECT)

  test('is told by its end: a signal or a code that is not the program’s own, at once', async () => {
    for (const script of ['process.exit(1)', 'process.exit(133)', 'process.kill(process.pid, 9)'])
      expect(failedAtOnce(await node(script)), script).toBe(true)
    for (const script of ['', 'process.exit(2)', 'process.exit(3)'])
      expect(failedAtOnce(await node(script)), script).toBe(false)
    expect(failedAtOnce(await run('/nowhere/electron', [], PROJECT))).toBe(true)
  })

  test('is not one that was used, or that was told to end', () => {
    const end = { code: undefined, milliseconds: 100, told: false }
    expect(failedAtOnce(end)).toBe(true)
    expect(failedAtOnce({ ...end, milliseconds: 60_000 })).toBe(false)
    expect(failedAtOnce({ ...end, told: true })).toBe(false)
  })
})

test('what was built from other files is stale', async () => {
  await built()
  expect(isStale()).toBe(false)
})
