/** What a user sees of a review on a screen of plain text. */
import { describe, expect, it } from 'vitest'
import { reviewTable } from '../../app/command/table.ts'
import type { Review } from '../../core/review/types.ts'
import { failing, holding, open, standIn } from '../review/stand-in.ts'

const table = reviewTable(standIn)
const lines = table.split('\n')
const line = (start: string, of = lines): string => of.find((text) => text.startsWith(start)) ?? ''

/** The made-up review with other checks. */
const withChecks = (checks: Review['checks'], ok: boolean | null): string => reviewTable({ ...standIn, checks, ok })

describe('the table of a review', () => {
  it('begins with the project, the girder, the rules and the fingerprint', () => {
    expect(lines.slice(0, 4)).toEqual([
      'A made-up bay',
      `W24X84, span 19' 8 1/4"`,
      'US rules, LRFD; fingerprint 0123456789ab; longtravel 0.1.0',
      '',
    ])
  })

  it('lists the checks worst first, with demand, resistance, utilisation and a word', () => {
    const [bending, shear] = [failing, holding].map(({ title }) => lines.findIndex((text) => text.startsWith(title)))
    expect(bending).toBeLessThan(shear!)
    // 500 050 N m = 368.82 kip-ft; 500 000 N m = 368.78 kip-ft; 100 000 N = 22.481 kip; 400 000 N = 89.924 kip
    expect(line(failing.title)).toMatch(/AISC 360-22 F2-2 +368\.8 of 368\.8 kip-ft +1\.001 {2}FAILS$/)
    expect(line(holding.title)).toMatch(/AISC 360-22 G2\.1 +22\.48 of 89\.92 kip +0\.250 {2}holds$/)
  })

  it('shows where each was judged', () => {
    expect(lines[lines.indexOf(line(failing.title)) + 1]).toBe(`    at 9' 10 1/8"; 1.2D + 1.6L; North alone`)
    expect(lines[lines.indexOf(line(holding.title)) + 1]).toBe(`    at just right of 0' 0"; 1.2D + 1.6L; North alone`)
  })

  it('shows values in the unit system of the job', () => {
    const si = reviewTable({ ...standIn, job: { ...standIn.job, units: 'si' } }).split('\n')
    expect(line(failing.title, si)).toContain('500.1 of 500 kN·m')
    expect(si[si.indexOf(line(failing.title, si)) + 1]).toBe('    at 3 m; 1.2D + 1.6L; North alone')
  })

  it('names the span where there are several', () => {
    const { runway } = standIn.job
    const two = { ...standIn.job, runway: { ...runway, spans: [runway.spans[0]!, runway.spans[0]!] } }
    expect(reviewTable({ ...standIn, job: two })).toContain('in span 1 of 2; 1.2D')
  })

  it('says what is not covered and what does not apply, with the reason', () => {
    expect(table).toContain('  Sidesway of the web (AISC 360-22 J10.4): this version does not check it\n')
    expect(table).toContain('  Bearing stiffeners (AISC 360-22 J10.8): there are none\n')
  })

  it('ends with cautions, editions and the verdict', () => {
    expect(table).toContain('The deflection is that of one crane.')
    expect(table).toContain('checked independently')
    expect(table).toContain('Editions\n  AISC 360-22\n  ASCE 7-22\n')
    expect(lines.at(-2)).toBe('1 check fails. Governing: Bending about the strong axis, utilisation 1.001.')
    expect(withChecks([holding], true)).toMatch(/All checks hold\.\n$/)
    expect(withChecks([holding, open], null)).toMatch(/Nothing fails, but 1 subject is not covered\.\n$/)
  })

  it('never shows a failure as 1.000 nor a check that holds as failing', () => {
    const just = { ...holding, utilisation: 0.9996 }
    expect(withChecks([just], true)).toMatch(/1\.000 {2}holds/)
    expect(withChecks([{ ...failing, utilisation: 1 + 1e-9 }], false)).toMatch(/1\.001 {2}FAILS/)
    expect(withChecks([{ ...failing, utilisation: 12345 }], false)).toMatch(/12,345 {2}FAILS/)
  })

  it('keeps within the width of a screen', () => {
    const long = { ...standIn, cautions: ['word '.repeat(100)] }
    const widest = Math.max(
      ...reviewTable(long)
        .split('\n')
        .map((text) => text.length),
    )
    expect(widest).toBeLessThanOrEqual(110)
  })

  it('shows control characters of the job as question marks', () => {
    const { project } = standIn.job
    const evil = { ...standIn.job, project: { ...project, title: 'Bay\u001B[2J\u0007 \u202E7' } }
    expect(reviewTable({ ...standIn, job: evil }).split('\n')[0]).toBe('Bay?[2J? ?7')
  })
})
