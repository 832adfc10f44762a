import { svelte } from '@sveltejs/vite-plugin-svelte'
import { defineConfig } from 'vitest/config'

const root = new URL('..', import.meta.url).pathname
const common = { root, testTimeout: 120_000 }

// The report in .reports/ is what .ci/run counts; the screen keeps the default one. The window's state is compiled as for a
// page, and only its own tests see the packages as a page does.
export default defineConfig({
  test: {
    root,
    reporters: ['default', ['json', { outputFile: '.reports/vitest.json' }]],
    coverage: { include: ['core/**', 'app/**', 'renderer/**/*.ts'] },
    projects: [
      {
        test: { ...common, name: 'program', include: ['test/**/*.test.ts'], exclude: ['test/renderer/**'] },
      },
      {
        plugins: [svelte({ configFile: false, compilerOptions: { generate: 'client' } })],
        resolve: { conditions: ['browser'] },
        test: { ...common, name: 'window', include: ['test/renderer/**/*.test.ts'] },
      },
    ],
  },
})
