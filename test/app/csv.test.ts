/** Comma-separated values: RFC 4180, and nothing that a spreadsheet would run. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checksCsv, csv } from '../../app/command/csv.ts'
import { resultOf } from '../../core/review/result.ts'
import { standIn } from '../review/stand-in.ts'

/** A reader of its own, after the grammar of RFC 4180. */
const read = (text: string): string[][] => {
  const rows: string[][] = []
  let row: string[] = []
  const cell = /(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/gy
  for (let found = cell.exec(text); found !== null; found = cell.exec(text)) {
    row.push(found[1] === undefined ? (found[2] ?? '') : found[1].replaceAll('""', '"'))
    if (found[3] === '\r\n') {
      rows.push(row)
      row = []
    }
  }
  return rows
}

describe('csv', () => {
  it('quotes what needs it', () => {
    expect(csv([['a', 'b, c', 'say "d"', 'two\nlines', 1.5, null]])).toBe('a,"b, c","say ""d""","two\nlines",1.5,\r\n')
  })

  it.each(['=1+1', '+1', '-1', '@sum', '\t=1', '\r=1', ' =1', '=cmd|x!y', '-', '=1,"2"'])('disarms %j', (text) => {
    expect(read(csv([[text]]))).toEqual([[`'${text}`]])
  })

  it('never touches a number, however small or negative', () => {
    expect(csv([[-1e-9, 1e21, 0.1]])).toBe('-1e-9,1e+21,0.1\r\n')
  })

  it('reads back to what was written', () => {
    const plain = fc.string({ unit: 'grapheme' }).filter((text) => !/^(\s*[=+\-@]|[\t\r\n])/.test(text))
    const rows = fc.array(fc.array(plain, { minLength: 1, maxLength: 4 }), { maxLength: 4 })
    fc.assert(
      fc.property(rows, (table) => {
        expect(read(csv(table))).toEqual(table)
      }),
    )
  })
})

describe('checks.csv', () => {
  it('has a row for every check, with SI figures and empty cells where there is no value', () => {
    const rows = read(checksCsv(resultOf(standIn)))
    expect(rows.map(([id]) => id)).toEqual([
      'id',
      'us.shear',
      'us.flexure.major',
      'us.web.sidesway',
      'us.bearing-stiffener',
    ])
    expect(rows[1]?.slice(3)).toEqual(['holds', '100000', 'N', '400000', '0.25', '1.2D + 1.6L', 'North alone'])
    expect(rows[3]?.slice(3)).toEqual(['not-covered', '', '', '', '', '', ''])
  })
})
