import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import { outlinesOf } from '../../core/figure/outline.ts'
import { sectionFigure } from '../../core/figure/section.ts'
import type { Point } from '../../core/figure/types.ts'
import type { Cap, SectionEntry } from '../../core/job/types.ts'
import { as, type Metre } from '../../core/quantity/kinds.ts'
import { sectionOf } from '../../core/section/properties.ts'
import { capped, channel, iShape, plate, plated } from '../section/make-up.ts'
import { expectDrawable, plain, textsOf } from './plant.ts'

const rails = catalogue.rails.map((rail) => ({ ...rail, wear: as('length', 0) }))
const size = (min: number, max: number) => fc.double({ min, max, noNaN: true })

const anyPlate = (width: number, thickness: number) =>
  fc.record({ width: size(0.08, width), thickness: size(0.005, thickness) }).map((of) => plate(of.width, of.thickness))

const anyCap: fc.Arbitrary<Cap | undefined> = fc.oneof(
  fc.constant(undefined),
  anyPlate(0.6, 0.04).map((of): Cap => ({ kind: 'plate', plate: of })),
  fc.constantFrom(...catalogue.channels).map((of): Cap => ({ kind: 'channel', channel: of })),
)

const anyEntry: fc.Arbitrary<SectionEntry> = fc
  .oneof(
    fc.constantFrom(...catalogue.iShapes).map((shape): SectionEntry => ({ kind: 'rolled', shape })),
    fc
      .tuple(anyPlate(0.8, 0.06), size(0.2, 2.5), size(0.005, 0.03), anyPlate(0.8, 0.06))
      .map(([top, depth, web, bottom]) => plated(top, depth, web, bottom)),
  )
  .chain((entry) => anyCap.map((cap) => (cap === undefined ? entry : { ...entry, cap })))

const area = (points: readonly Point[]): number =>
  Math.abs(
    points.reduce((sum, [x, y], i) => {
      const [nextX, nextY] = points[(i + 1) % points.length]!
      return sum + (x * nextY - nextX * y) / 2
    }, 0),
  )

const drawnArea = (entry: SectionEntry): number => outlinesOf(entry).reduce((sum, { points }) => sum + area(points), 0)

describe('the cross-section', () => {
  it('never lets texts overlap or anything leave the frame', () => {
    fc.assert(
      fc.property(
        anyEntry,
        fc.constantFrom(...rails),
        fc.constantFrom('us' as const, 'si' as const),
        size(110, 200),
        fc.constantFrom(
          {},
          { wheelLoad: 196_166.4 },
          { sideThrust: 13_000 },
          { wheelLoad: 1.5e6, sideThrust: 123_456 },
        ),
        (entry, rail, units, width, acting) => {
          const figure = sectionFigure(sectionOf(entry), entry, { units, width, rail, ...acting })
          expectDrawable(figure)
          expect(figure.alt).not.toMatch(/NaN|undefined|Infinity/)
        },
      ),
      { numRuns: 400 },
    )
  })

  it('draws the area that is computed with', () => {
    const welded = plated(plate(0.35, 0.02), 0.65, 0.008, plate(0.25, 0.014))
    expect(drawnArea(welded)).toBeCloseTo(0.35 * 0.02 + 0.65 * 0.008 + 0.25 * 0.014, 12)
    // Printed areas are rounded, fillets differ from mill to mill.
    for (const name of ['W24X76', 'W36X182', 'S24X80', 'HP14X89']) {
      const entry: SectionEntry = { kind: 'rolled', shape: iShape(name) }
      expect(drawnArea(entry) / sectionOf(entry).A).toBeCloseTo(1, 1.7)
    }
    const cap = channel('C15X33.9')
    const entry = capped(iShape('W27X84'), cap)
    const alone: SectionEntry = { kind: 'rolled', shape: iShape('W27X84') }
    expect(drawnArea(entry) - drawnArea(alone)).toBeCloseTo(cap.figures.A, 9)
  })

  it('gives the dimensions and both axes', () => {
    const entry = capped(iShape('W27X84'), channel('C15X33.9'))
    const section = sectionOf(entry)
    const { rail } = plain.job.runway
    const figure = sectionFigure(section, entry, { units: 'us', width: 120, rail, sideThrust: 13_700 })
    const texts = textsOf(figure).map(({ text }) => text)
    // d = 26.7 in and C15's web of 0.400 in (ASTM A6 dimensions, AISC Shapes Database v15.0).
    expect(texts).toContain('27.1 in')
    expect(texts).toContain('10 in')
    expect(texts.some((text) => text.startsWith('centroid at '))).toBe(true)
    expect(texts.some((text) => text.startsWith('plastic axis at '))).toBe(true)
    expect(texts.some((text) => text.startsWith('cap C15X33.9'))).toBe(true)
    expect(figure.alt).toContain('Side thrust 3.080 kip')
    const alone: SectionEntry = { kind: 'rolled', shape: iShape('W27X84') }
    const symmetric = sectionFigure(sectionOf(alone), alone, { units: 'us', width: 120, rail })
    expect(textsOf(symmetric).map(({ text }) => text)).toContain('centroid and plastic axis')
  })

  it('draws the worn rail', () => {
    const entry: SectionEntry = { kind: 'rolled', shape: iShape('W24X76') }
    const rail = { ...plain.job.runway.rail, height: 0.1 as Metre, wear: 0.01 as Metre }
    const texts = textsOf(sectionFigure(sectionOf(entry), entry, { units: 'si', width: 120, rail }))
    expect(texts.some(({ text }) => text.includes('90 mm high'))).toBe(true)
    expect(() => sectionFigure(sectionOf(entry), entry, { units: 'si', width: 90, rail })).toThrow(RangeError)
  })
})
