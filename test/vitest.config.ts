import { svelte } from '@sveltejs/vite-plugin-svelte'
import { defineConfig } from 'vitest/config'

const root = new URL('..', import.meta.url).pathname
// Left to itself a machine of two cores would be given one worker.
const common = { root, testTimeout: 120_000, maxWorkers: '100%' }
const ofState = 'test/**/*.svelte.test.ts'
const ofBrowser = 'test/window/**/*.test.ts'
// Pictures to look at are taken only when asked for.
const pictures = process.env['LONGTRAVEL_SHOTS'] === '1' ? ['test/window/shots.ts'] : []

// The report in .reports/ is what .ci/run counts; the screen keeps the default one. Tests of the window's state are compiled as
// for a page, and only they see the packages as a page does.
export default defineConfig({
  test: {
    root,
    reporters: ['default', ['json', { outputFile: '.reports/vitest.json' }]],
    coverage: { include: ['core/**', 'app/**', 'renderer/**/*.ts'] },
    projects: [
      { test: { ...common, name: 'program', include: ['test/**/*.test.ts'], exclude: [ofState, ofBrowser] } },
      {
        plugins: [svelte({ configFile: false })],
        resolve: { conditions: ['browser'] },
        test: {
          ...common,
          name: 'state',
          include: [ofState],
          environment: `${root}test/renderer/page-environment.ts`,
          server: { deps: { inline: ['svelte'] } },
        },
      },
      {
        // One browser for all files, after the other projects: at most two files at a time, whatever the machine has.
        test: {
          ...common,
          name: 'browser',
          include: [ofBrowser, ...pictures],
          globalSetup: 'test/window/set-up.ts',
          maxWorkers: 2,
          sequence: { groupOrder: 1 },
        },
      },
    ],
  },
})
