import { expect, test } from 'vitest'
import { killRounds } from './kill.ts'

// `node test/soak/kill.ts` runs 100.
test('a process that keeps revisions is killed, and every acknowledged revision is there and whole', async () => {
  const seed = Date.now() % 2 ** 32
  const report = await killRounds(6, seed)
  expect(report.faults, `seed ${seed}`).toEqual([])
  expect(report.acknowledged, `seed ${seed}`).toBeGreaterThan(0)
})
