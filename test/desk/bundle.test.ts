import { execFile } from 'node:child_process'
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { expect, onTestFinished, test } from 'vitest'
import { build } from 'vite'
import { newFolder } from '../store/folder.ts'

const PROJECT = new URL('../..', import.meta.url).pathname

test('the desk finds its worker in a bundle as well: two entries of one build for Node', async () => {
  // Inside the project, so that the one package that cannot be bundled is found.
  mkdirSync(join(PROJECT, '.reports'), { recursive: true })
  const outDir = mkdtempSync(join(PROJECT, '.reports', 'bundle-'))
  onTestFinished(() => rmSync(outDir, { recursive: true }))
  await build({
    root: PROJECT,
    configFile: false,
    logLevel: 'error',
    ssr: { noExternal: true, external: ['better-sqlite3'] },
    build: {
      ssr: true,
      outDir,
      minify: true,
      rolldownOptions: {
        input: { main: 'app/desk/desk.ts', worker: 'app/desk/worker.ts' },
        output: { entryFileNames: '[name].js', chunkFileNames: '[name].js' },
      },
    },
  })
  const script = join(outDir, 'use.js')
  writeFileSync(
    script,
    `import { startDesk } from './main.js'
     const desk = startDesk({ home: ${JSON.stringify(newFolder())} })
     const about = await desk.call('about', {})
     const made = await desk.call('projects.create', { name: 'P', numbering: 'letters' })
     console.log(JSON.stringify({ about, made, closed: await desk.close() }))`,
  )
  const { stdout } = await promisify(execFile)(process.execPath, [script])
  expect(JSON.parse(stdout)).toMatchObject({
    about: { ok: true, value: { record: { access: 'write' } } },
    made: { ok: true, value: { id: 1, name: 'P', numbering: 'letters' } },
    closed: { ok: true, value: null },
  })
})
