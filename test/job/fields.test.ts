import { describe, expect, test } from 'vitest'
import type { Entry } from '../../core/job/field.ts'
import { fieldList, fieldsBelow } from '../../core/job/fields.ts'
import { inWords, limitsOf, nearestNames } from '../../core/job/phrases.ts'

const entries = (entry: Entry): readonly Entry[] => {
  if (entry.is === 'list' || entry.is === 'map') return [entry, ...entries(entry.of)]
  return entry.is === 'either' ? [entry, ...entry.of.flatMap(entries)] : [entry]
}

describe('the dictionary', () => {
  test.each(fieldList)('%s says what it is', (path, field) => {
    expect(field.name).toMatch(/^[A-Z]/)
    expect(field.meaning).toMatch(/\.$/)
    expect(inWords(field.entry)).not.toMatch(/undefined|NaN/)
    for (const entry of entries(field.entry)) {
      if (entry.is === 'number' || entry.is === 'quantity') {
        const { from, above, to } = limitsOf(entry)
        expect(from ?? above ?? -Infinity).toBeLessThan(to)
      }
      if (entry.is === 'object')
        for (const way of entry.ways ?? [])
          for (const key of [...way.needs, ...(way.may ?? [])])
            expect(fieldsBelow(path).has(key), `${path}.${key}`).toBe(true)
    }
    if (field.default) {
      expect(field.default.entry === undefined).not.toBe(field.default.text === undefined)
      expect(field.default.source).not.toBe('')
      expect(field.required).not.toBe(true)
    }
  })

  test('every field stands below one that is in the dictionary as well', () => {
    const known = new Set(fieldList.map(([path]) => path))
    const parents = fieldList.map(([path]) => path.replace(/\.[^.]+$/, '').replace(/(\[\]|\.\{\w+\})+$/, ''))
    expect(parents.filter((parent) => !known.has(parent))).toEqual([])
  })

  test('what stands below a field that is not covered is not covered either', () => {
    for (const [path, field] of fieldList)
      if (field.notCovered === 'all')
        for (const [, below] of fieldsBelow(path)) expect(below.field.notCovered, below.path).toBe('all')
  })
})

test('the nearest names come first, far ones not at all', () => {
  expect(nearestNames('wheelLoads', ['name', 'wheelLoad', 'leastWheelLoad', 'wheelSpacings'], 2)).toEqual([
    'wheelLoad',
    'leastWheelLoad',
  ])
  expect(nearestNames('SPAN', ['spans', 'rail'], 3)).toEqual(['spans'])
  expect(nearestNames('xxxxxxxx', ['spans', 'rail'], 3)).toEqual([])
})
