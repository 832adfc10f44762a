/** What README.md promises is what the program does. */
import { existsSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { STANDING_CAUTIONS } from '../../core/review/cautions.ts'
import { ran } from './doors.ts'

const root = new URL('../../', import.meta.url)
const readme = readFileSync(new URL('README.md', root), 'utf8')
const blocks = [...readme.matchAll(/```\w*\n([^]*?)```/g)].map((block) => block[1] ?? '')
const [, sample = ''] = /npx longtravel check ([^`\s]+)/.exec(readme) ?? []

describe('README.md', () => {
  it('begins with one paragraph and two commands', () => {
    expect(readme).toMatch(/^# Longtravel\n\n[^\n]+\n\n```\nnpm ci && npm start\nnpm ci && npm test\n```\n/)
  })

  it('shows what its sample command prints (npm run readme writes it again)', async () => {
    const { exit, out, err } = await ran(['check', fileURLToPath(new URL(sample, root))])
    const [shown = '', rest] = (blocks[1] ?? '').split(/^\.\.\.\n/m)
    expect(rest).toBe('')
    expect(out.slice(0, shown.length)).toBe(shown)
    expect([0, 1, 4]).toContain(exit)
    expect(err).toBe('')
  })

  it('names only files that are there', () => {
    const named = [...readme.matchAll(/`((?:resources|core|test|app)\/[\w./-]*)`/g)].map((found) => found[1] ?? '')
    expect(named.length).toBeGreaterThan(2)
    for (const path of [sample, ...named]) expect(existsSync(new URL(path, root)), path).toBe(true)
  })

  it('gives the cautions word for word', () => {
    for (const caution of STANDING_CAUTIONS) expect(readme).toContain(caution)
  })
})
