import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { as } from '../../core/quantity/kinds.ts'
import { beamOf, scaleOf, SIDE } from '../../core/figure/standing.ts'
import { cranesApart, governingPlaces, standsAt, whatGoverns } from '../../renderer/girder/governing.ts'
import { driven, held, limitsOf, snapped, stepOf, stepped } from '../../renderer/girder/moving.ts'
import { acrossOf, paperOf } from '../../renderer/girder/paper.ts'
import { railOf, roomFor } from '../../renderer/girder/room.ts'
import { elevationFigure } from '../../core/figure/elevation.ts'
import {
  extremeApart,
  extremeAt,
  leadInSpan,
  leadText,
  presentOf,
  shownStand,
  stationText,
  trainName,
  viewOf,
} from '../../renderer/girder/standing.ts'
import { sample } from './plant.ts'

const ten = sample('ten-ton-pendant')
const fifty = sample('fifty-ton-cab')
const two = sample('two-crane-plate-girder')
const none = { id: undefined, place: 0 }
const stoodAt = (extreme: (typeof ten)['envelope']['moment']['max']) => ({ ...extreme, train: extreme.train ?? 0 })

describe('paper', () => {
  test('a usual column has 4.2 px for a millimetre, a narrow one is drawn smaller but never under 120 mm', () => {
    expect(paperOf(742.6)).toEqual({ pixels: 742, perMillimetre: 4.2, width: 742 / 4.2 })
    const narrow = paperOf(360)
    expect(narrow).toEqual({ pixels: 360, perMillimetre: 3, width: 120 })
    expect(paperOf(491).width).toBeGreaterThanOrEqual(120)
  })

  test('the ends of the span lie SIDE from the edges, and stations and pixels are each other’s inverse', () => {
    const paper = paperOf(800)
    const stood = stoodAt(ten.envelope.moment.max)
    const view = viewOf(ten, stood, false)
    const scale = scaleOf(ten, ten.envelope.moment.max, { units: 'us', width: paper.width, view })
    const across = acrossOf(paper, scale)
    const length = ten.job.runway.spans[0]!
    expect(across.toPixels(0)).toBeCloseTo(SIDE * 4.2, 9)
    expect(across.toPixels(length)).toBeCloseTo(800 - SIDE * 4.2, 9)
    expect(across.pixelsPerMetre).toBeCloseTo((800 - 2 * SIDE * 4.2) / length, 9)
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), (station) => {
        expect(across.toStation(across.toPixels(station))).toBeCloseTo(station, 9)
      }),
    )
  })
})

describe('moving', () => {
  const [train, beam] = [fifty.trains[0]!, beamOf(fifty)]
  const reach = train.wheels.at(-1)!.offset
  const length = fifty.job.runway.spans[0]!

  test('the limits leave one wheel on the span; home and end stand the outer wheels over the supports', () => {
    const limits = limitsOf(beam, 0, train, false)
    expect(limits).toEqual({ from: 0 - reach, to: length, home: 0, end: length - reach })
    const second = limitsOf(beam, 1, train, false)
    expect(second.home).toBeCloseTo(length, 12)
    const turned = limitsOf(beam, 0, train, true)
    expect(turned).toEqual({ from: 0, to: length + reach, home: reach, end: length })
  })

  test('a step is 0.1 ft or 25 mm, with Shift ten times that', () => {
    expect([stepOf('us', false), stepOf('us', true), stepOf('si', false), stepOf('si', true)]).toEqual([
      0.03048, 0.3048, 0.025, 0.25,
    ])
  })

  test('a step stops at what lies on its way, leaves a stop it stands on, and never passes the limits', () => {
    const limits = { from: 0, to: 10, home: 0, end: 10 } as ReturnType<typeof limitsOf>
    expect(stepped(2, 0.5, limits, [2.3, 2.4])).toBe(2.3)
    expect(stepped(2, -0.5, limits, [1.6, 1.7])).toBe(1.7)
    expect(stepped(2.3, 0.5, limits, [2.3])).toBeCloseTo(2.8, 12)
    expect(stepped(2, 0.5, limits, [2.5])).toBe(2.5)
    expect(stepped(9.9, 0.5, limits, [])).toBe(10)
    expect(stepped(0.1, -0.5, limits, [])).toBe(0)
  })

  test('snapping takes the nearest stop within reach and nothing beyond it', () => {
    expect(snapped(5, [4.8, 5.1, 7], 0.25)).toBe(5.1)
    expect(snapped(5, [4.7, 5.3], 0.25)).toBe(5)
    fc.assert(
      fc.property(
        fc.double({ min: -20, max: 20, noNaN: true }),
        fc.array(fc.double({ min: -20, max: 20, noNaN: true })),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (lead, stops, within) => {
          const rest = snapped(lead, stops, within)
          expect(rest === lead || (stops.includes(rest) && Math.abs(rest - lead) <= within)).toBe(true)
        },
      ),
    )
  })

  test('the drive takes 24 s from limit to limit and is over there', () => {
    const limits = limitsOf(beam, 0, train, false)
    expect(driven(limits.from, 6000, limits)).toEqual({
      lead: limits.from + (limits.to - limits.from) / 4,
      over: false,
    })
    expect(driven(limits.to - 1e-3, 1000, limits)).toEqual({ lead: limits.to, over: true })
    expect(held(99, limits)).toBe(limits.to)
  })
})

describe('governing positions', () => {
  test('have a button for each effect, the brackets among them, and the check that governs', () => {
    const ids = governingPlaces(ten, 0, none).map(({ words }) => words)
    expect(ids.slice(0, 3)).toEqual(['moment', 'shear left', 'shear right'])
    expect(ids).toContain('reaction 1')
    expect(ids).toContain('deflection')
    expect(ids.at(-1)).toBe('deflection, lateral')
  })

  test('name every check that fails, and the chosen one at its chosen place', () => {
    const places = governingPlaces(two, 0, { id: 'us.web.yielding.end', place: 2 })
    const failing = two.checks.filter(({ status }) => status === 'fails').map(({ id }) => id)
    expect(failing.length).toBeGreaterThan(0)
    expect(places.filter(({ fails }) => fails).map(({ id }) => id)).toEqual(failing)
    const chosen = places.find(({ id }) => id === 'us.web.yielding.end')!
    expect(chosen.extreme).toEqual(two.checks.find(({ id }) => id === chosen.id)!.places[1]!.at)
  })

  test('of another span of the same length lie as far from its own left support', () => {
    const [first, second] = [0, 1].map((span) => governingPlaces(two, span, none)[0]!.extreme)
    const length = two.job.runway.spans[0]!
    expect(second!.span).toBe(1)
    expect(second!.lead - first!.lead).toBeCloseTo(length, 9)
    expect(second!.positions[1]!.lead - first!.positions[1]!.lead).toBeCloseTo(length, 9)
  })

  test('of many brackets only those of the span shown have buttons', () => {
    const words = governingPlaces(fifty, 2, none).map((place) => place.words)
    expect(words.filter((word) => word.startsWith('reaction'))).toEqual(['reaction 3', 'reaction 4'])
  })

  test('standing there is said in words, nothing elsewhere', () => {
    const places = governingPlaces(fifty, 0, none)
    const stood = stoodAt(fifty.envelope.moment.max)
    expect(whatGoverns(places, stood)).toBe('stands where moment governs')
    expect(whatGoverns(places, { ...stood, lead: stood.lead + 0.01 })).toBe('')
    const end = places.find(({ id }) => id === 'shear-left')!.extreme
    expect(whatGoverns(places, stoodAt(end))).toBe('stands where shear left and reaction 1 govern')
    expect(standsAt({ ...stood, span: 1 }, fifty.envelope.moment.max)).toBe(false)
  })
})

describe('cranes that stand apart', () => {
  const { max } = two.envelope.moment
  const away = { ...max, positions: max.positions.map((of, i) => ({ ...of, lead: as('distance', of.lead + 8 * i) })) }

  test('are known from those that stand bumper to bumper', () => {
    expect(cranesApart(two, max)).toBe(false)
    expect(cranesApart(two, away)).toBe(true)
  })

  test('stand as they were found, with only those wheels on the span that are there', () => {
    const shown = extremeApart(two, away)
    const { wheels, length } = presentOf(two, shown)
    const second = wheels.filter(({ crane }) => crane === 1)
    expect(second[0]!.station).toBeCloseTo(max.positions[1]!.lead + 8, 9)
    expect(wheels.filter(({ on }) => on).every(({ station }) => station <= length)).toBe(true)
    expect(second.some(({ on }) => !on)).toBe(true)
    expect(shown.value).toBeLessThan(max.value)
  })
})

describe('what is shown', () => {
  test('is read under the wheel with the greatest moment: at the greatest moment both proof distances are equal', () => {
    const stood = stoodAt(fifty.envelope.moment.max)
    const shown = extremeAt(fifty, stood)
    expect(shown.station).toBeCloseTo(fifty.envelope.moment.max.station, 9)
    expect(shown.value).toBeCloseTo(fifty.envelope.moment.max.value, 3)
    const { wheels, start, length } = presentOf(fifty, shown)
    const resultant = wheels.reduce((sum, { station, force }) => sum + station * force, 0)
    const centre = resultant / wheels.reduce((sum, { force }) => sum + force, 0)
    const middle = start + length / 2
    expect(middle - shown.station).toBeCloseTo(centre - middle, 6)
  })

  test('stays within the limits, and goes back to the greatest moment where the job has no such span or train any more', () => {
    const stood = { span: 0, train: 0, mirrored: false, lead: 1000 }
    expect(shownStand(fifty, stood).lead).toBe(fifty.job.runway.spans[0])
    const { max } = fifty.envelope.moment
    for (const gone of [
      { ...stood, span: 9 },
      { ...stood, train: 9 },
    ])
      expect(shownStand(fifty, gone)).toEqual({
        span: max.span,
        train: max.train,
        lead: max.lead,
        mirrored: max.mirrored,
      })
  })

  test('says where wheel 1 is in feet and inches or metres', () => {
    const shown = extremeAt(two, { span: 0, train: 2, mirrored: false, lead: 0.3048 * (12 + 1 / 12) })
    expect(leadText(two, shown, 'us')).toBe('wheel 1 of crane 1 at 12\' 1"')
    expect(leadText(two, shown, 'si')).toBe('wheel 1 of crane 1 at 3.683 m')
    expect(stationText(-1e-12, 'si')).toBe('0 m')
    expect(trainName(two, 2)).toBe('Crane 1, 40 ton with Crane 2, 25 ton')
  })

  test('of its neighbours shows what the train reaches over, the same at every place', () => {
    const [L, stood] = [two.job.runway.spans[0]!, { span: 1, train: 2, mirrored: false }]
    const reach = two.trains[2]!.wheels.at(-1)!.offset
    expect(viewOf(two, stood, false)).toEqual({ from: L, to: 2 * L })
    expect(viewOf(two, stood, true).from).toBeCloseTo(L - reach, 9)
    expect(viewOf(two, { ...stood, span: 0 }, true).from).toBe(0)
  })

  test('keeps its place in the span where another span is chosen', () => {
    expect(leadInSpan(two, { span: 0, train: 0, mirrored: false, lead: 3 }, 2)).toBeCloseTo(
      3 + 2 * two.job.runway.spans[0]!,
      9,
    )
  })

  test('has room reserved for every place of the crane', () => {
    const stood = { span: 0, train: 2, mirrored: false }
    const shown = { units: 'us', width: 170, view: viewOf(two, stood, false) } as const
    const room = roomFor(two, stood, shown)
    const { from, to } = limitsOf(beamOf(two), 0, two.trains[2]!, false)
    for (let part = 0; part <= 10; part++) {
      const figure = elevationFigure(two, extremeAt(two, { ...stood, lead: from + ((to - from) * part) / 10 }), shown)
      expect(railOf(figure)).toBeLessThanOrEqual(room.above + 1e-9)
      expect(railOf(figure)).toBeGreaterThan(0)
    }
  })
})
