import { defineConfig } from 'vitest/config'

// The report in .reports/ is what .ci/run counts; the screen keeps the default one.
export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.test.ts'],
    testTimeout: 120_000,
    reporters: ['default', ['json', { outputFile: '.reports/vitest.json' }]],
    coverage: { include: ['core/**', 'app/**'] },
  },
})
