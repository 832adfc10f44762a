/** A package made without a network and without Electron's binary: its configuration, its files, and that they run. */
import { spawn } from 'node:child_process'
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { build, Platform } from 'electron-builder'
import { afterAll, beforeAll, expect, onTestFinished, test, vi } from 'vitest'
import { packaging } from '../../electron.config.ts'
import { pageDesk } from '../../renderer/desk/page.ts'
import { bridgeDesk } from '../../renderer/desk/bridge.ts'
import type { Desk } from '../../renderer/desk/desk.ts'
import { placeOf } from '../page/doors.ts'
import { install, standIn } from '../shell/electron.ts'
import { newFolder, valueOf } from '../store/folder.ts'
import { jobText } from '../store/texts.ts'
import { built } from '../tools/built.ts'

const PROJECT = join(import.meta.dirname, '../..')
const require = createRequire(import.meta.url)

/** The archive's own tool, which comes with the packer. */
const asar = createRequire(require.resolve('electron-builder'))('@electron/asar') as {
  listPackage: (archive: string, options: object) => string[]
  extractAll: (archive: string, folder: string) => void
}

const folder = mkdtempSync(join(tmpdir(), 'longtravel-package-'))
const resources = join(folder, 'packages/linux-unpacked/resources')
/** The package's files, on a disk where nothing else of the project can be found. */
const unpacked = join(folder, 'app')
let files: readonly string[] = []

/** What stands where Electron would: a folder that looks like it, with an empty program. */
const electronDist = (): string => {
  const dist = join(folder, 'electron')
  for (const name of ['resources', 'locales']) mkdirSync(join(dist, name), { recursive: true })
  writeFileSync(join(dist, 'electron'), '')
  chmodSync(join(dist, 'electron'), 0o755)
  writeFileSync(join(dist, 'version'), (require('electron/package.json') as { version: string }).version)
  return dist
}

beforeAll(async () => {
  await built()
  await build({
    targets: Platform.LINUX.createTarget('dir'),
    projectDir: PROJECT,
    publish: 'never',
    config: {
      ...packaging,
      directories: { ...packaging.directories, output: join(folder, 'packages') },
      electronDist: electronDist(),
      electronFuses: null,
    },
  })
  const archive = join(resources, 'app.asar')
  files = asar.listPackage(archive, {}).map((path) => path.replaceAll('\\', '/'))
  asar.extractAll(archive, unpacked)
})

afterAll(() => rmSync(folder, { recursive: true, force: true }))

test('it holds the program and what cannot be bundled, and nothing else', () => {
  expect(files).toEqual(
    expect.arrayContaining([
      '/package.json',
      '/out/main/main.js',
      '/out/main/worker.js',
      '/out/preload/preload.cjs',
      '/out/renderer/index.html',
      '/resources/licences/IBM-Plex-Sans.txt',
      '/node_modules/better-sqlite3/lib/index.js',
    ]),
  )
  const tops = new Set(files.map((path) => path.split('/').slice(1, 3).join('/')))
  expect([...tops].filter((top) => top.includes('/')).sort()).toEqual([
    'node_modules/better-sqlite3',
    'out/main',
    'out/preload',
    'out/renderer',
    'resources/licences',
  ])
  expect(files.filter((path) => /\.(?:ts|map|cpp|c|h|gyp|svelte)$/.test(path))).toEqual([])
})

test('the licences of all that was bundled go with it', () => {
  const main = readFileSync(join(unpacked, 'out/main/licences.txt'), 'utf8')
  const window = readFileSync(join(unpacked, 'out/renderer/licences.txt'), 'utf8')
  for (const name of ['pdfkit', 'fontkit', '@mathjax/src', 'valibot', 'mathjs'])
    expect(main, name).toMatch(new RegExp(`^${name} \\d`, 'm'))
  for (const name of ['svelte', 'chart.js']) expect(window, name).toMatch(new RegExp(`^${name} \\d`, 'm'))
  expect(main).toContain('THE SOFTWARE IS PROVIDED "AS IS"')
  expect(files).toContain('/node_modules/better-sqlite3/LICENSE')
})

test('the binaries lie beside the archive, for every system that it may be unpacked on', () => {
  const prebuilds = join(resources, 'app.asar.unpacked/node_modules/better-sqlite3/prebuilds')
  expect(readdirSync(prebuilds).sort()).toEqual(
    ['darwin', 'linux', 'win32'].flatMap((system) => ['arm64', 'x64'].map((kind) => `${system}-${kind}.node`)),
  )
})

test('the bridge requires Electron and nothing else', () => {
  const bridge = readFileSync(join(unpacked, 'out/preload/preload.cjs'), 'utf8')
  expect([...bridge.matchAll(/\brequire\(([^)]*)\)|\bimport\b/g)].map(([found]) => found)).toEqual([
    'require("electron")',
  ])
  expect(readdirSync(join(unpacked, 'out/preload'))).toEqual(['preload.cjs'])
})

test('the page holds nothing inline and asks nobody outside', () => {
  const index = readFileSync(join(unpacked, 'out/renderer/index.html'), 'utf8')
  expect(index).not.toMatch(/<script(?![^>]*\bsrc=)|<style|\son\w+=|\sstyle=|javascript:|(?:src|href)="(?!\.\/)/)
})

test('its icon and its fuses are set', () => {
  for (const { icon } of [packaging.linux!, packaging.win!, packaging.mac!])
    expect(existsSync(join(PROJECT, String(icon)))).toBe(true)
  expect(packaging.electronFuses).toMatchObject({ runAsNode: false, onlyLoadAppFromAsar: true })
})

/** Asks for what needs every part: the record, the tables, the typefaces and the formulas. */
const use = async (desk: Desk): Promise<void> => {
  expect(valueOf(await desk.call('about', {})).record.access).toBe('write')
  valueOf(await desk.call('projects.create', { name: 'P', numbering: 'letters' }))
  const sheet = valueOf(
    await desk.call('sheet.print', { of: { from: 'text', text: jobText }, paper: 'a4', units: 'us' }),
  )
  expect(new TextDecoder().decode(sheet.pdf.subarray(0, 5))).toBe('%PDF-')
  expect(sheet.pdf.length).toBeGreaterThan(50_000)
}

test('the packed program runs by itself as a page', async () => {
  const child = spawn(process.execPath, [join(unpacked, 'out/main/page.js'), '--no-open'], {
    cwd: unpacked,
    env: { LONGTRAVEL_HOME: newFolder() },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  onTestFinished(() => void child.kill('SIGKILL'))
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]()
  const address = String((await lines.next()).value)
  await use(pageDesk(placeOf(address)))
})

test('the packed program runs by itself as an application, with a stand-in for Electron', async () => {
  vi.stubEnv('LONGTRAVEL_HOME', newFolder())
  onTestFinished(() => void vi.unstubAllEnvs())
  const fake = standIn()
  install(fake)
  await import(join(unpacked, 'out/main/main.js'))
  await expect.poll(() => fake.windows[0]?.address(), { timeout: 10_000 }).toBe('longtravel://window/')
  onTestFinished(async () => {
    fake.app.emit('will-quit')
    await fake.exited
  })
  const { preload } = fake.windows[0]!.options['webPreferences'] as { preload: string }
  expect(existsSync(preload)).toBe(true)
  expect((await fake.serve({ url: 'longtravel://window/', method: 'GET' })).status).toBe(200)
  await import('../../app/preload.ts')
  await use(bridgeDesk(fake.bridge()))
})
