/** The rule of who may import whom bites on deliberately wrong imports, and the project itself keeps it. */
import { execFile } from 'node:child_process'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import { beforeAll, describe, expect, it } from 'vitest'

const root = fileURLToPath(new URL('../..', import.meta.url))
const fixtures = 'test/fixtures/imports/'
const config = 'test/tools/imports.config.mjs'

interface Violation {
  readonly rule: { readonly name: string }
  readonly from: string
  readonly to: string
}

interface Summary {
  readonly violations: readonly Violation[]
  readonly ruleSetUsed: { readonly forbidden: readonly { readonly name: string }[] }
}

/** Runs dependency-cruiser on the Node that runs the tests. */
const cruise = async (folders: readonly string[], under: string): Promise<Summary> => {
  const command = join(root, 'node_modules/dependency-cruiser/bin/dependency-cruiser.mjs')
  const { stdout } = await promisify(execFile)(
    process.execPath,
    [command, '--config', config, '--output-type', 'json', ...folders],
    { cwd: root, env: { ...process.env, IMPORTS_UNDER: under }, maxBuffer: 1e8 },
  )
  return (JSON.parse(stdout) as { summary: Summary }).summary
}

/** Rule -> the files that break it, one subject a file; a circle is reported from one of its files. */
const expected: Record<string, readonly string[]> = {
  'core-is-pure': ['core/section/imports-app.ts', 'core/section/imports-renderer.ts'],
  'core-no-node-builtins': ['core/section/imports-newer-node.ts', 'core/section/imports-node.ts'],
  'resources-by-catalogue-only': ['core/section/imports-resources.ts'],
  'us-and-eu-apart': ['core/basis/eu/imports-us.ts', 'core/basis/us/imports-eu.ts'],
  'doors-apart': ['app/imports-renderer.ts', 'renderer/imports-app.ts'],
  'tests-are-leaves': ['core/travel/imports-test.ts'],
  'no-circle': ['core/travel/circle-here.ts'],
  resolvable: ['core/travel/imports-nothing.ts'],
}

describe('the import rule', () => {
  let violations: readonly Violation[] = []
  let rules: readonly string[] = []

  beforeAll(async () => {
    const summary = await cruise([fixtures], fixtures)
    violations = summary.violations
    rules = summary.ruleSetUsed.forbidden.map(({ name }) => name)
  })

  const broken = (rule: string): readonly string[] =>
    violations
      .filter((violation) => violation.rule.name === rule)
      .map(({ from }) => from.slice(fixtures.length))
      .sort()

  it.each(Object.entries(expected))('%s bites', (rule, files) => {
    expect(broken(rule)).toEqual(files)
  })

  it('bites in every room of core', () => {
    const rooms = rules.filter((name) => /^core-(?!is-pure|no-node)/.test(name))
    expect(rooms).toHaveLength(15)
    for (const room of rooms) {
      expect(broken(room), room).toContain(`core/${room.slice('core-'.length)}/wrong-room.ts`)
    }
  })

  it('has no rule that nothing proves', () => {
    expect([...new Set(violations.map(({ rule }) => rule.name))].sort()).toEqual([...rules].sort())
  })

  it('lets what is right pass', () => {
    const files = violations.map(({ from }) => from.slice(fixtures.length))
    expect(files).not.toContain('core/catalogue/imports-resources.ts')
  })

  it('is kept by the project', async () => {
    const found = (await cruise(['core', 'app', 'test'], '')).violations
    expect(found.map(({ rule, from, to }) => `${rule.name}: ${from} -> ${to}`)).toEqual([])
  })
})
