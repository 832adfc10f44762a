import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import { writeUtilisation } from '../../core/quantity/write.ts'
import { STANDING_CAUTIONS } from '../../core/review/cautions.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'
import { sheetOf } from '../../core/sheet/sheet.ts'
import type { Block, Sheet } from '../../core/sheet/types.ts'

const JOBS = new URL('../../resources/jobs/', import.meta.url)
const samples = readdirSync(JOBS).sort()

function reviewOf(name: string, change: (job: Record<string, unknown>) => void = () => undefined): Review {
  const job = JSON.parse(readFileSync(new URL(name, JOBS), 'utf8')) as Record<string, unknown>
  change(job)
  const reviewed = reviewText(JSON.stringify(job), catalogue)
  if (!reviewed.ok) throw new Error(reviewed.findings[0]!.message)
  return reviewed.review
}

const only = <K extends Block['block']>(sheet: Sheet, kind: K) =>
  sheet.blocks.filter((block): block is Extract<Block, { block: K }> => block.block === kind)

const everyText = (sheet: Sheet): string => JSON.stringify(sheet)

describe.each(samples.flatMap((name) => (['us', 'si'] as const).map((units) => [name, units] as const)))(
  '%s in %s units',
  (name, units: UnitSystem) => {
    const review = reviewOf(name)
    const sheet = sheetOf(review, units)

    it('begins with the summary: every check that was judged, the worst first, and every one that is open with its reason', () => {
      const tables = only(sheet, 'table')
      const listed = tables[0]!.rows.map(([title]) => title)
      const judged = review.checks.filter(({ utilisation }) => utilisation !== undefined)
      expect([...listed].sort()).toEqual(judged.map(({ title }) => title).sort())
      const utilisations = tables[0]!.rows.map((row) => (row.at(-1) as { utilisation: number }).utilisation)
      expect(utilisations).toEqual([...utilisations].sort((a, b) => b - a))
      const open = review.checks.filter(({ status }) => status === 'not-covered')
      expect(tables[1]!.rows).toEqual(open.map(({ title, why }) => [title, expect.any(String) as string, why]))
    })

    it('marks every default, with its source, and no entry as one', () => {
      const rows = only(sheet, 'entries').flatMap((block) => block.rows)
      const defaults = rows.filter(({ isDefault }) => isDefault)
      // What stands outside the parts of the form (units) is told by the sheet itself.
      expect(defaults.length).toBe(review.job.defaults.filter(({ path }) => path.includes('.')).length)
      for (const { source } of defaults) expect(source).toBeTruthy()
      for (const { isDefault, source } of rows) expect(isDefault || source === undefined).toBe(true)
    })

    it('has a working and a verdict for every check that was judged, the verdict as the check', () => {
      const judged = review.checks.filter(({ working }) => working !== undefined)
      const verdicts = only(sheet, 'verdict')
      expect(verdicts.map(({ holds }) => holds)).toEqual(judged.map(({ status }) => status === 'holds'))
      expect(verdicts.map(({ text }) => text.split(', ')[1])).toEqual(
        judged.map(({ utilisation }) => writeUtilisation(utilisation!)),
      )
      for (const { lines } of only(sheet, 'working')) expect(lines.length).toBeGreaterThan(0)
    })

    it('numbers its headings once each, and skips no level', () => {
      const headings = only(sheet, 'heading')
      expect(new Set(headings.map(({ number }) => number)).size).toBe(headings.length)
      for (const { level, number } of headings) expect(number.split('.').length).toBe(level)
    })

    it('prints every caution, those of the job and those that always stand', () => {
      const printed = only(sheet, 'paragraph').filter(({ tone }) => tone === 'caution')
      expect(printed.map(({ text }) => text)).toEqual([...review.cautions, ...STANDING_CAUTIONS])
    })

    it('shows no figure that is not one', () => {
      expect(everyText(sheet)).not.toMatch(/NaN|Infinity|undefined|\[object/)
    })

    it('draws the greatest moment with its proof', () => {
      const proof = only(sheet, 'paragraph').find(({ text }) => text.startsWith('Proof'))!
      const [wheel, resultant] = /stands (.+?) and the resultant (.+?) from midspan/.exec(proof.text)!.slice(1)
      expect(wheel).toBe(resultant)
      expect(only(sheet, 'figure').length).toBeGreaterThanOrEqual(4)
    })
  },
)

it('prints a derivation in full once and refers to it after', () => {
  const sheet = sheetOf(reviewOf('fifty-ton-cab.json'), 'us')
  const lines = only(sheet, 'working').flatMap((block) => block.lines)
  const lengths = lines.filter(({ clause }) => clause === 'AISC 360-22 F4-8')
  expect(lengths.length).toBe(1)
  expect(lines.some(({ note }) => /strong-axis strength at C_b = 1, from 6\.\d+/.test(note))).toBe(true)
})

it('says on the sheet whether it is a kept revision', () => {
  const review = reviewOf('ten-ton-pendant.json')
  expect(sheetOf(review, 'us').kept).toBe(false)
  const kept = sheetOf(review, 'us', { label: 'B', date: '2026-11-30', preparedBy: 'R. Ilsley', checkedBy: '' })
  expect(kept).toMatchObject({ kept: true, date: '2026-11-30', title: { revision: 'B', preparedBy: 'R. Ilsley' } })
})

it('carries long notes whole', () => {
  const words = Array.from({ length: 3000 }, (_, index) => `word${index}`).join(' ')
  const review = reviewOf('ten-ton-pendant.json', (job) => {
    job.project = { ...(job.project as object), notes: words }
  })
  expect(only(sheetOf(review, 'us'), 'paragraph').some(({ text }) => text === words)).toBe(true)
})
