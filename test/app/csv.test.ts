/** Comma-separated values: RFC 4180, and nothing that a spreadsheet would run. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checksCsv, csv, envelopeCsv } from '../../app/command/csv.ts'
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

describe('envelope.csv', () => {
  it('has 41 stations a span, in m, N m and N', () => {
    const [heading, ...rows] = read(envelopeCsv(standIn))
    expect(heading).toEqual(['span', 'station', 'momentMax', 'momentMin', 'shearMax', 'shearMin'])
    expect(rows.map(([, station]) => Number(station))).toEqual(Array.from({ length: 41 }, (_, i) => (6 * i) / 40))
    // 50 kN over the support and 40 kN 2 m on: 50 + 40 (6 - 2)/6 = 76.667 kN.
    expect(Number(rows[0]?.[4])).toBeCloseTo(76_666.667, 2)
    expect(Number(rows[40]?.[5])).toBeCloseTo(-76_666.667, 2)
    // Midspan, 50 kN there and 40 kN at 5 m: 50 x 6/4 + 40 (6 - 5)/2 = 95 kN m.
    expect(Number(rows[20]?.[2])).toBeCloseTo(95_000, 2)
    expect(rows.every(([, , , least]) => least === '0')).toBe(true)
  })

  it('goes on along the runway in the next span', () => {
    const spans = [standIn.job.runway.spans[0]!, standIn.job.runway.spans[0]!]
    const two = { ...standIn, job: { ...standIn.job, runway: { ...standIn.job.runway, spans } } }
    const rows = read(envelopeCsv(two)).slice(1)
    expect(rows.map(([span]) => Number(span))).toEqual([...Array<number>(41).fill(0), ...Array<number>(41).fill(1)])
    expect(rows.slice(41).map(([, station]) => Number(station))[40]).toBe(12)
    expect(rows[61]?.slice(2)).toEqual(rows[20]?.slice(2))
  })
})
