import { describe, expect, test } from 'vitest'
import { JOB_VERSION, UPGRADES, upgradeJob, type Upgrade } from '../../core/job/upgrade.ts'

/** A stand-in chain: a field is renamed, then one is added; the last step passes over a version that was never released. */
const chain: readonly Upgrade[] = [
  { from: 1, to: 2, upgrade: ({ name, ...rest }) => ({ ...rest, title: name ?? '' }) },
  { from: 2, to: 4, upgrade: (job) => ({ ...job, added: true }) },
]

describe('the upgrade chain', () => {
  test('runs every step in turn and raises the version', () => {
    expect(upgradeJob({ version: 1, name: 'Bay 3' }, 1, 4, chain)).toEqual({ version: 4, title: 'Bay 3', added: true })
    expect(upgradeJob({ version: 2, title: 'Bay 3' }, 2, 4, chain)).toEqual({ version: 4, title: 'Bay 3', added: true })
    expect(upgradeJob({ version: 1, name: 'Bay 3' }, 1, 2, chain)).toEqual({ version: 2, title: 'Bay 3' })
  })

  test('leaves the older job as it was, and one of the present version alone', () => {
    const old = Object.freeze({ version: 1, name: 'Bay 3' })
    upgradeJob(old, 1, 4, chain)
    expect(old).toEqual({ version: 1, name: 'Bay 3' })
    expect(upgradeJob(old, JOB_VERSION)).toBe(old)
  })

  test('a missing step is the program’s fault and thrown', () => {
    expect(() => upgradeJob({ version: 3 }, 3, 4, chain)).toThrow('from version 3 to version 4')
    expect(() => upgradeJob({ version: 1 }, 1, 3, chain)).toThrow('from version 2 to version 3')
  })

  test('the released chain leads from every older version to the present one', () => {
    for (let version = 1; version < JOB_VERSION; version++)
      expect(UPGRADES.filter(({ from }) => from === version)).toHaveLength(1)
    expect(UPGRADES.every(({ from, to }) => from >= 1 && to > from && to <= JOB_VERSION)).toBe(true)
  })
})
