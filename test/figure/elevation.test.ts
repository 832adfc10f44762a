import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { elevationFigure } from '../../core/figure/elevation.ts'
import { viewOf, wheelsAt } from '../../core/figure/standing.ts'
import type { Figure } from '../../core/figure/types.ts'
import { as } from '../../core/quantity/kinds.ts'
import { writeQuantity } from '../../core/quantity/write.ts'
import { anyStanding, expectDrawable, textsOf, withTrain, worst } from './plant.ts'

const drawnWheels = (figure: Figure): readonly number[] =>
  figure.items.flatMap((item) => (item.item === 'circle' && item.fill === 'paper' ? [item.centre[0]] : []))

describe('the elevation', () => {
  it('never lets texts overlap or anything leave the frame, and says every load', () => {
    fc.assert(
      fc.property(
        anyStanding,
        fc.constantFrom('moment' as const, 'shear' as const),
        fc.constantFrom('us' as const, 'si' as const),
        fc.double({ min: 120, max: 400, noNaN: true }),
        (standing, kind, units, width) => {
          const review = withTrain(standing)
          const extreme = worst(review, kind, standing.span)
          const figure = elevationFigure(review, extreme, { units, width })
          expectDrawable(figure)
          for (const { load } of review.trains[0]!.wheels)
            expect(figure.alt).toContain(writeQuantity({ kind: 'force', value: load }, units))
          expect(figure.alt).not.toMatch(/NaN|undefined|Infinity/)
        },
      ),
      { numRuns: 250 },
    )
  })

  it('holds whatever more than the span the view takes in, and refuses less', () => {
    const beyond = fc.double({ min: 0, max: 40, noNaN: true })
    fc.assert(
      fc.property(anyStanding, beyond, beyond, (standing, before, after) => {
        const review = withTrain(standing)
        const extreme = worst(review, 'moment', standing.span)
        const start = standing.spans.slice(0, standing.span).reduce((a, b) => a + b, 0)
        const end = start + standing.spans[standing.span]!
        const view = { from: as('distance', start - before), to: as('distance', end + after) }
        const figure = elevationFigure(review, extreme, { units: 'us', width: 150, view })
        expectDrawable(figure)
        const texts = textsOf(figure).map(({ text }) => text)
        expect(texts).toContain('midspan')
        if (extreme.on.length > 1) expect(texts.some((text) => text.startsWith('resultant '))).toBe(true)
        const distances = /From midspan (\S+ ft) .* and (\S+ ft) to/.exec(figure.alt)?.slice(1) ?? []
        for (const distance of distances)
          if (!distance.includes('×') && !distance.startsWith('0 ')) expect(texts).toContain(distance)
        const less = { ...view, to: as('distance', end - 0.05) }
        expect(() => elevationFigure(review, extreme, { units: 'us', width: 150, view: less })).toThrow(RangeError)
      }),
      { numRuns: 150 },
    )
  })

  it('stands every wheel where its station is, to scale', () => {
    fc.assert(
      fc.property(anyStanding, (standing) => {
        const review = withTrain(standing)
        const extreme = worst(review, 'moment', standing.span)
        const view = viewOf(review, extreme)
        const figure = elevationFigure(review, extreme, { units: 'si', width: 180 })
        const near = 1e-9 * (view.to - view.from)
        const stations = wheelsAt(review, extreme)
          .map(({ station }) => station)
          .filter((station) => station >= view.from - near && station <= view.to + near)
        const drawn = drawnWheels(figure)
        expect(drawn).toHaveLength(stations.length)
        const middle = (view.from + view.to) / 2
        for (const [i, x] of drawn.entries()) {
          // The view's middle is the figure's, and its ends are 12 mm from the frame.
          const expected = 90 + ((stations[i]! - middle) / (view.to - view.from)) * (180 - 24)
          expect(Math.abs(x - expected)).toBeLessThan(1e-9 * 180)
        }
      }),
      { numRuns: 100 },
    )
  })

  it('dimensions two equal distances from midspan where wheels act alone', () => {
    // Two wheels P at the distance a on a span L: the governing wheel is a/4 from midspan (statics).
    const review = withTrain({ spans: [9], cranes: [{ loads: [1e5, 1e5], spacings: [2], overhang: 0.5 }] })
    const figure = elevationFigure(review, worst(review, 'moment', 0), { units: 'si', width: 150 })
    const equal = textsOf(figure).filter(({ text }) => text === '0.5 m')
    expect(equal).toHaveLength(2)
    expect(figure.alt).toContain('From midspan 0.5 m to wheel 1 and 0.5 m to the resultant.')
    const [left, right] = equal.map(({ at }) => at[0]) as [number, number]
    expect(left + right).toBeCloseTo(150, 9)
    const chain = textsOf(figure).map(({ text }) => text)
    for (const text of ['4 m', '2 m', '3 m', 'resultant 200 kN', 'midspan', 'support 1', 'support 2'])
      expect(chain).toContain(text)
  })

  it('dimensions the distances as they are where dead load acts too', () => {
    const review = withTrain({ spans: [9], cranes: [{ loads: [1e5, 1e5], spacings: [2], overhang: 0.5 }] })
    const uniform = as('lineLoad', 2e4)
    const extreme = worst(review, 'moment', 0, 2e4)
    const figure = elevationFigure(review, extreme, { units: 'si', width: 150, uniform })
    // R (e + f) + w L e = 0 with f = e + 1: e = -R/(2 R + w L).
    const e = -2e5 / (2 * 2e5 + 2e4 * 9)
    const [wheel, resultant] = [-e, e + 1].map((metres) =>
      writeQuantity({ kind: 'distance', value: as('distance', metres) }, 'si'),
    ) as [string, string]
    expect(figure.alt).toContain(`From midspan ${wheel} to wheel 1 and ${resultant} to the resultant.`)
    expect(wheel).not.toBe(resultant)
  })

  it('writes the loads it is given, factors and all', () => {
    const review = withTrain({ spans: [9], cranes: [{ loads: [1e5, 1e5], spacings: [2], overhang: 0.5 }] })
    const extreme = worst(review, 'moment', 0)
    const figure = elevationFigure(review, extreme, { units: 'si', width: 150, loads: [2e5, 2e5] })
    expect(textsOf(figure).filter(({ text }) => text === '200 kN')).toHaveLength(2)
    expect(figure.alt).toContain('Resultant on the span 400 kN')
    expect(() => elevationFigure(review, extreme, { units: 'si', width: 150, loads: [1] })).toThrow(RangeError)
    expect(() => elevationFigure(review, extreme, { units: 'si', width: 100 })).toThrow(RangeError)
  })

  it('writes equal loads together where they stand close, and each where they differ', () => {
    const spacings = new Array<number>(7).fill(0.75)
    const equal = withTrain({
      spans: [14],
      cranes: [{ loads: new Array<number>(8).fill(1e5), spacings, overhang: 0.5 }],
    })
    const texts = textsOf(elevationFigure(equal, worst(equal, 'moment', 0), { units: 'si', width: 130 }))
    expect(texts.map(({ text }) => text)).toContain('8 × 100 kN')
    expect(texts.map(({ text }) => text)).toContain('7 × 0.75 m')
    const loads = [101e3, 102e3, 103e3, 104e3, 105e3, 106e3, 107e3, 108e3]
    const unequal = withTrain({ spans: [14], cranes: [{ loads, spacings, overhang: 0.5 }] })
    const each = textsOf(elevationFigure(unequal, worst(unequal, 'moment', 0), { units: 'si', width: 130 }))
    for (const load of loads) expect(each.map(({ text }) => text)).toContain(`${load / 1000} kN`)
  })

  it('counts the wheels that the view leaves out', () => {
    const review = withTrain({ spans: [2, 2, 2], cranes: [{ loads: [1e5, 1e5], spacings: [9], overhang: 0.5 }] })
    const figure = elevationFigure(review, worst(review, 'moment', 1), { units: 'si', width: 150 })
    expect(textsOf(figure).map(({ text }) => text)).toContain('+ 1')
    expect(drawnWheels(figure)).toHaveLength(1)
    expect(figure.alt).toContain('off the span')
  })
})
