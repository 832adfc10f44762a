import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { fieldList } from '../../core/job/fields.ts'
import { fieldReference } from '../../core/job/reference.ts'
import { jobSchema } from '../../core/job/schema.ts'
import { at, ownShape, platedInFull, rolledInFull, smallest, type Draft } from './plant.ts'
import { misfits } from './schema-check.ts'

const resource = (name: string): string => readFileSync(new URL(`../../resources/${name}`, import.meta.url), 'utf8')

describe('the written files are those of the dictionary (else: npm run schema)', () => {
  test('job.schema.json', () => {
    expect(resource('job.schema.json')).toBe(`${JSON.stringify(jobSchema(), null, 2)}\n`)
  })

  test('fields.md, with a row for every field', () => {
    expect(resource('fields.md')).toBe(fieldReference())
    for (const [path] of fieldList) expect(resource('fields.md')).toContain(`| \`${path}\` |`)
  })
})

describe('the schema', () => {
  test.each([
    ['the smallest job', smallest],
    ['a rolled girder in full', rolledInFull],
    ['a plate girder in full', platedInFull],
    ['a shape of one’s own', ownShape],
  ])('accepts %s', (_, draft) => {
    expect(misfits(jobSchema(), draft())).toEqual([])
  })

  const refused: readonly (readonly [string, (job: Draft) => unknown, RegExp])[] = [
    ['an unknown field', (job) => (job.colour = 'red'), /\$\.colour: not allowed/],
    ['a missing title', (job) => (job.project = {}), /\$\.project: lacks title/],
    ['a word that is no choice', (job) => (at(job, 'cranes', 0).operation = 'steam'), /operation: is no choice/],
    ['a quantity without a figure', (job) => (at(job, 'cranes', 0).bridgeSpan = 'wide'), /bridgeSpan: does not fit/],
    ['a plain number beyond its limits', (job) => (at(job, 'runway').spans = [101]), /spans\[0\]: is too large/],
    ['no crane', (job) => (job.cranes = []), /cranes: has too few items/],
    [
      'a rolled section without a shape',
      (job) => (at(job, 'girder').section = { kind: 'rolled' }),
      /section: fits not one/,
    ],
    [
      'two ways of a steel',
      (job) => (at(job, 'girder').steel = { name: 'A36', fy: 1e8, fu: 2e8 }),
      /steel: fits not one/,
    ],
    ['a newer version', (job) => (job.version = 2), /version: is not 1/],
  ]
  test.each(refused)('refuses %s', (_, spoil, why) => {
    const job = smallest()
    spoil(job)
    expect(misfits(jobSchema(), job).join('\n')).toMatch(why)
  })
})
