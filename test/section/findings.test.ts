import { describe, expect, test } from 'vitest'
import type { IShape } from '../../core/catalogue/types.ts'
import type { SectionEntry } from '../../core/job/types.ts'
import { as } from '../../core/quantity/kinds.ts'
import { sectionFindings } from '../../core/section/findings.ts'
import { capped, channel, iShape, ownShape, plate, plated } from './make-up.ts'

const own = (...dimensions: [number, number, number, number, number]): SectionEntry => ({
  kind: 'rolled',
  shape: ownShape(dimensions),
})

const withPlate = (width: number, thickness: number): SectionEntry => ({
  kind: 'rolled',
  shape: iShape('W24X76'),
  cap: { kind: 'plate', plate: plate(width, thickness) },
})

const told = (entry: SectionEntry): string[] =>
  sectionFindings(entry, 'si').map(({ level, path, read }) => `${level} ${path} ${read}`)

describe('a sensible make-up', () => {
  test.each([
    ['welded', plated(plate(0.35, 0.02), 0.65, 0.008, plate(0.25, 0.014))],
    ['own shape', own(0.6, 0.22, 0.012, 0.019, 0.024)],
    ['channel cap', capped(iShape('W27X84'), channel('C15X33.9'))],
    ['wide W under a channel just wide enough', capped(iShape('W36X150'), channel('C15X33.9'))],
    ['narrow plate cap', withPlate(0.2, 0.012)],
    ['wide plate cap', withPlate(0.3, 0.012)],
  ])('%s: nothing to say', (_name, entry) => {
    expect(told(entry)).toEqual([])
  })
})

describe('refused', () => {
  test.each([
    ['a web thicker than its flange is wide', own(0.6, 0.1, 0.1, 0.02, 0), 'refused girder.section.shape.tw 100 mm'],
    ['flanges that fill the depth', own(0.1, 0.2, 0.01, 0.05, 0), 'refused girder.section.shape.tf 50 mm'],
    ['fillets that meet in the web', own(0.1, 0.2, 0.01, 0.02, 0.031), 'refused girder.section.shape.r 31 mm'],
    ['a fillet beyond the flange', own(0.3, 0.06, 0.01, 0.02, 0.026), 'refused girder.section.shape.r 26 mm'],
    [
      'a web thicker than the narrower flange is wide',
      plated(plate(0.3, 0.02), 0.5, 0.05, plate(0.05, 0.02)),
      'refused girder.section.web.thickness 50 mm',
    ],
    [
      'a flange on edge',
      plated(plate(0.3, 0.02), 0.5, 0.01, plate(0.1, 0.11)),
      'refused girder.section.bottomFlange.thickness 110 mm',
    ],
    ['a plate cap on edge', withPlate(0.2, 0.21), 'refused girder.section.cap.plate.thickness 210 mm'],
    [
      'a plate cap narrower than half the flange',
      withPlate(0.1, 0.01),
      'refused girder.section.cap.plate.width 100 mm',
    ],
    ['a plate cap wider than three flanges', withPlate(0.7, 0.1), 'refused girder.section.cap.plate.width 700 mm'],
    [
      'a channel whose legs do not pass the flange',
      capped(iShape('W36X232'), channel('C12X20.7')),
      'refused girder.section.cap.shape 304.8 mm',
    ],
  ])('%s', (_name, entry, finding) => {
    expect(told(entry)).toEqual([finding])
  })

  test('says what would be right, in the units of the job', () => {
    const entry = capped(iShape('W36X232'), channel('C12X20.7'))
    expect(sectionFindings(entry, 'us')[0]!.message).toBe(
      'the legs do not pass the flange: 12.1 in wide, the channel 11.00 in between its legs; take a deeper channel or a narrower flange',
    )
  })

  test('tells all at once, girder and cap', () => {
    const entry: SectionEntry = {
      ...plated(plate(0.3, 0.31), 0.5, 0.3, plate(0.1, 0.11)),
      cap: { kind: 'plate', plate: plate(1, 0.02) },
    }
    expect(sectionFindings(entry, 'si').map(({ path }) => path)).toEqual([
      'girder.section.web.thickness',
      'girder.section.topFlange.thickness',
      'girder.section.bottomFlange.thickness',
      'girder.section.cap.plate.width',
    ])
  })
})

describe('cautioned about', () => {
  test('a plate cap as wide as its flange: no room for the welds', () => {
    expect(told(withPlate(iShape('W24X76').bf, 0.02))).toEqual(['caution girder.section.cap.plate.width 228.3 mm'])
  })

  test('a thin plate cap that stands out far', () => {
    expect(told(withPlate(0.45, 0.008))).toEqual(['caution girder.section.cap.plate.width 450 mm'])
  })

  test('an entered figure more than 5 % off its dimensions, and what they give', () => {
    const dimensions = [0.6, 0.22, 0.012, 0.019, 0.024] as const
    const figures: IShape['figures'] = { A: as('area', 0.0155), Ix: as('inertia', 9.2e-3), J: as('inertia', 1.6e-6) }
    const found = sectionFindings({ kind: 'rolled', shape: ownShape(dimensions, figures) }, 'si')
    expect(found.map(({ level, path }) => `${level} ${path}`)).toEqual(['caution girder.section.shape.Ix'])
    // IPE 600, EN 10365: Ix 92 080 cm4.
    expect(found[0]!.message).toMatch(/^differs by 899 % from 9\.20\d×10⁸ mm⁴ by the dimensions/)
  })
})
