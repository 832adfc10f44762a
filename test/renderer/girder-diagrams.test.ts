import { describe, expect, test } from 'vitest'
import { as } from '../../core/quantity/kinds.ts'
import { spanOf } from '../../core/travel/influence.ts'
import { beamOf } from '../../core/figure/standing.ts'
import { deflectionsAt } from '../../core/travel/stand-at.ts'
import {
  boundsAt,
  EFFECTS,
  envelopeOf,
  peakOf,
  presentLine,
  tableRows,
  valueAt,
} from '../../renderer/girder/diagram-data.ts'
import { endsOf, labelsOf, quantityText, valueText } from '../../renderer/girder/labels.ts'
import { driveOf, extremeAt, presentOf, stiffnessOf } from '../../renderer/girder/standing.ts'
import { sample } from './plant.ts'

const fifty = sample('fifty-ton-cab')
const two = sample('two-crane-plate-girder')
const at = (review: typeof fifty, lead: number, span = 0, train = 0) =>
  presentOf(review, extremeAt(review, { span, train, mirrored: false, lead }))
const atMoment = (review: typeof fifty) => {
  const { max } = review.envelope.moment
  return presentOf(review, extremeAt(review, { ...max, train: max.train! }))
}

describe('present lines', () => {
  test('of moment peak where and as high as the search found, under a wheel', () => {
    const present = atMoment(fifty)
    const line = presentLine(fifty, present, 'moment')
    const peak = peakOf(fifty, present, 'moment', line)!
    const { value, station } = fifty.envelope.moment.max
    expect(peak.y).toBeCloseTo(value, 3)
    expect(peak.x).toBeCloseTo(station, 9)
    expect(peak.where).toBe(', under wheel 2')
    expect([line[0]!.y, line.at(-1)!.y / value]).toEqual([0, expect.closeTo(0, 12) as number])
  })

  test('of shear fall by each wheel, close on the base line and sum to nothing', () => {
    const present = atMoment(two)
    const line = presentLine(two, present, 'shear')
    expect(line).toHaveLength(2 + 2 * 4 + 2)
    const wheels = present.wheels.map(({ force }) => force)
    wheels.forEach((force, i) => {
      expect(line[2 + 2 * i]!.y - line[3 + 2 * i]!.y).toBeCloseTo(force, 6)
      expect(line[2 + 2 * i]!.x).toBe(line[3 + 2 * i]!.x)
    })
    const [left, right] = [line[1]!.y, -line.at(-2)!.y]
    expect(left + right).toBeCloseTo(
      wheels.reduce((a, b) => a + b, 0),
      6,
    )
    expect([line[0]!.y, line.at(-1)!.y]).toEqual([0, 0])
  })

  test('of deflection are those of the travelling train', () => {
    const { max } = two.envelope.moment
    const present = atMoment(two)
    const line = presentLine(two, present, 'deflection')
    const drive = driveOf(two, { ...max, train: max.train! })
    const other = deflectionsAt(drive, max.lead, max.mirrored, stiffnessOf(two), 48)
    other.forEach(({ station, value }, i) => {
      expect(line[i]!.x).toBeCloseTo(station, 9)
      expect(line[i]!.y).toBeCloseTo(value, 12)
    })
  })

  test('without a wheel on the span have no peak', () => {
    const present = at(fifty, -100)
    for (const effect of EFFECTS)
      expect(peakOf(fifty, present, effect, presentLine(fifty, present, effect))).toBeUndefined()
  })
})

describe('envelopes', () => {
  test('hold every position and reach what the review says is greatest', () => {
    const envelope = envelopeOf(two, 0)
    const { moment, shear, deflection } = two.envelope
    const most = (of: (typeof EFFECTS)[number]) => Math.max(...envelope.map((point) => point[of].max))
    // Read at 96 parts of the span, a crest between two of them is missed by less than 0.1 %.
    expect(most('moment') / moment.max.value).toBeGreaterThan(0.999)
    expect(most('moment')).toBeLessThanOrEqual(moment.max.value * (1 + 1e-9))
    expect(most('shear')).toBeCloseTo(shear.max.value, 3)
    expect(most('deflection') / deflection.max.value).toBeGreaterThan(0.9999)
    expect(most('deflection')).toBeLessThanOrEqual(deflection.max.value * (1 + 1e-9))
    const { start, length } = spanOf(beamOf(two), 0)
    for (const lead of [-3, 0, 2.9, 5, 8, 13])
      for (const effect of EFFECTS) {
        const present = at(two, lead, 0, 2)
        for (const part of [0.2, 0.5, 0.7]) {
          const station = start + part * length
          const bounds = boundsAt(two, 0, [as('distance', station)])[0]![effect]
          const value = valueAt(two, present, effect, station)
          expect(value).toBeLessThanOrEqual(bounds.max * (1 + 1e-9) + 1e-9)
          expect(value).toBeGreaterThanOrEqual(bounds.min * (1 + 1e-9) - 1e-9)
        }
      }
  })
})

describe('the table', () => {
  test('has the tenths of the span and the wheels on it, each with greatest, least and here', () => {
    const present = atMoment(fifty)
    const rows = tableRows(fifty, present, 'moment')
    expect(rows).toHaveLength(11 + 4)
    expect([rows[0]!.name, rows.at(-1)!.name]).toEqual(['support 1', 'support 2'])
    const peak = rows.find(({ name }) => name === 'wheel 2')!
    expect(peak.here).toBeCloseTo(fifty.envelope.moment.max.value, 3)
    expect(peak.max).toBeCloseTo(fifty.envelope.moment.max.value, 3)
    for (const { here, max, min } of rows) {
      expect(here).toBeLessThanOrEqual(max * (1 + 1e-9) + 1e-6)
      expect(here).toBeGreaterThanOrEqual(min - 1e-6)
    }
  })

  test('names a wheel that stands over a support once, with it', () => {
    const rows = tableRows(fifty, at(fifty, 0), 'shear')
    expect(rows[0]).toMatchObject({ station: 0, name: 'support 1, wheel 1' })
    expect(rows).toHaveLength(11 + 3)
  })
})

describe('labels', () => {
  const place = { toPixels: (station: number) => 50 + station * 70, perMillimetre: 4.2, pixels: 742 }
  const ends = [
    { x: 0, value: 500_000 },
    { x: 9.144, value: -500_000 },
  ]

  test('tell the peak with its place, below what hangs and within the paper', () => {
    const peak = { x: 0.1, y: 968_966, where: ', under wheel 1' }
    const [label, ...others] = labelsOf('moment', peak, [], 'us', place)
    expect(others).toEqual([])
    expect(label).toMatchObject({ text: '714.7 at 0\' 3 15/16", under wheel 1', row: 'below', role: 'ink', left: 0 })
    expect(labelsOf('shear', { ...peak, where: '' }, [], 'si', place)[0]).toMatchObject({
      text: '969.0 at 0.1 m',
      row: 'above',
    })
  })

  test('the ends of the shear envelope give way to the peak beside them', () => {
    const free = labelsOf('shear', { x: 4, y: 300_000, where: '' }, ends, 'si', place)
    expect(free.map(({ text, row }) => [text, row])).toEqual([
      ['300 at 4 m', 'above'],
      ['500', 'above'],
      ['−500', 'below'],
    ])
    const taken = labelsOf('shear', { x: 0, y: 500_000, where: '' }, ends, 'si', place)
    expect(taken.map(({ text }) => text)).toEqual(['500 at 0 m', '−500'])
  })

  test('ends are those of shear alone, and figures have their unit where no heading tells it', () => {
    const envelope = envelopeOf(fifty, 0)
    expect(endsOf('moment', envelope)).toEqual([])
    expect(endsOf('shear', envelope)[0]!.value).toBeCloseTo(fifty.envelope.shear.max.value, 3)
    expect([valueText('shear', 101_000, 'si'), quantityText('shear', 101_000, 'si')]).toEqual(['101', '101 kN'])
  })
})
