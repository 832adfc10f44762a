import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { momentFigure, shearFigure } from '../../core/figure/diagram.ts'
import { elevationFigure } from '../../core/figure/elevation.ts'
import type { Figure, Point } from '../../core/figure/types.ts'
import { as } from '../../core/quantity/kinds.ts'
import { writeQuantity } from '../../core/quantity/write.ts'
import { anyStanding, expectDrawable, textsOf, withTrain, worst } from './plant.ts'

const lineOf = (figure: Figure, role: 'ink' | 'envelope'): readonly (readonly Point[])[] =>
  figure.items.flatMap((item) => (item.item === 'line' && item.role === role ? [item.points] : []))

describe('moment and shear', () => {
  it('never let texts overlap or anything leave the frame', () => {
    fc.assert(
      fc.property(
        anyStanding,
        fc.constantFrom('moment' as const, 'shear' as const),
        fc.constantFrom('us' as const, 'si' as const),
        fc.double({ min: 120, max: 400, noNaN: true }),
        fc.constantFrom(0, 3000),
        (standing, kind, units, width, dead) => {
          const review = withTrain(standing)
          const extreme = worst(review, kind, standing.span, dead)
          const shown = { units, width, uniform: as('lineLoad', dead) }
          for (const figure of [momentFigure(review, extreme, shown), shearFigure(review, extreme, shown)]) {
            expectDrawable(figure)
            const label = /: (.*?)\. Envelope/.exec(figure.alt)?.[1]
            expect(textsOf(figure).map(({ text }) => text)).toContain(label)
          }
        },
      ),
      { numRuns: 150 },
    )
  })

  it('mark the value that travel found, and say it', () => {
    fc.assert(
      fc.property(anyStanding, fc.constantFrom(0, 3000), (standing, dead) => {
        const review = withTrain(standing)
        const shown = { units: 'si', width: 150, uniform: as('lineLoad', dead) } as const
        const moment = worst(review, 'moment', standing.span, dead)
        const written = writeQuantity({ kind: 'moment', value: as('moment', moment.value) }, 'si', 4)
        expect(momentFigure(review, moment, shown).alt).toContain(`: ${written} at station`)
        const shear = worst(review, 'shear', standing.span, dead)
        const force = writeQuantity({ kind: 'force', value: as('force', shear.value) }, 'si', 4)
        expect(shearFigure(review, shear, shown).alt).toContain(`: ${force} at station`)
      }),
      { numRuns: 60 },
    )
  })

  it('lie within the envelope of the same loads', () => {
    fc.assert(
      fc.property(anyStanding, (standing) => {
        const review = withTrain(standing)
        const extreme = worst(review, 'moment', standing.span)
        const figure = momentFigure(review, extreme, { units: 'si', width: 150 })
        const [maxima] = lineOf(figure, 'envelope')
        const [present] = lineOf(figure, 'ink')
        for (const [x, y] of present!) {
          // Wheels are break points of both.
          const most = maxima!.filter((point) => Math.abs(point[0] - x) < 1e-9).map((point) => point[1])
          expect(y).toBeLessThanOrEqual(Math.max(...most) + 1e-6)
        }
      }),
      { numRuns: 60 },
    )
  })

  it('hang under the elevation on the same scale', () => {
    const review = withTrain({ spans: [9, 9], cranes: [{ loads: [1e5, 1e5], spacings: [2], overhang: 0.5 }] })
    const extreme = worst(review, 'moment', 1)
    const shown = { units: 'si', width: 150 } as const
    const wheels = elevationFigure(review, extreme, shown).items.flatMap((item) =>
      item.item === 'circle' && item.fill === 'paper' ? [item.centre[0]] : [],
    )
    const moment = momentFigure(review, extreme, shown)
    const mark = moment.items.find((item) => item.item === 'circle')
    expect(mark?.item === 'circle' && wheels.some((x) => Math.abs(x - mark.centre[0]) < 1e-9)).toBe(true)
    // 2 P on 9 m, the governing wheel 0.5 m left of midspan: R = 2 P 4 / 9, M = R 4 (statics).
    const value = writeQuantity({ kind: 'moment', value: as('moment', ((2e5 * 4) / 9) * 4) }, 'si')
    expect(textsOf(moment).map(({ text }) => text)).toContain(`${value} at station 13 m, under wheel 1`)
    // Sagging is drawn downward: the mark lies below the base line.
    const [base] = lineOf(moment, 'ink')[0]!
    expect(mark?.item === 'circle' && mark.centre[1] > base![1]).toBe(true)
    expect(shearFigure(review, extreme, shown).alt).toContain('of wheel')
  })

  it('take given loads with an envelope of their own', () => {
    const review = withTrain({ spans: [9], cranes: [{ loads: [1e5, 1e5], spacings: [2], overhang: 0.5 }] })
    const extreme = worst(review, 'moment', 0)
    const alt = momentFigure(review, extreme, { units: 'si', width: 150, loads: [2e5, 2e5] }).alt
    const value = writeQuantity({ kind: 'moment', value: as('moment', ((4e5 * 4) / 9) * 4) }, 'si')
    expect(alt).toContain(`: ${value} at station 4 m`)
    expect(alt).toContain(`to ${value}.`)
  })

  it('say so where the position makes no moment', () => {
    const review = withTrain({ spans: [9], cranes: [{ loads: [1e5], spacings: [], overhang: 0.5 }] })
    const figure = momentFigure(review, worst(review, 'shear', 0), { units: 'si', width: 150 })
    expect(textsOf(figure).map(({ text }) => text)).toContain('0 kN·m at this position')
    expectDrawable(figure)
  })
})
