import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  deflectionLine,
  endReactionLine,
  momentLine,
  shearLine,
  supportReactionLine,
  type Influence,
} from '../../core/travel/influence.ts'
import { passLine } from '../../core/travel/passage.ts'
import type { Beam } from '../../core/travel/types.ts'
import { anyTrain, m } from './trains.ts'

const beam: Beam = { continuity: 'simple', spans: [4, 10, 6].map(m) }

const pieceAt = ({ breaks, polynomials }: Influence, piece: number, station: number): number => {
  const t = station - breaks[piece]!
  const [a, b, c, d] = polynomials[piece]!
  return a + b * t + c * t * t + d * t * t * t
}

describe('influence lines of simple spans', () => {
  it('moment: a triangle of x (L - x) / L', () => {
    const line = momentLine(beam, 1, 7)
    expect(line.breaks).toEqual([4, 7, 14])
    expect(pieceAt(line, 0, 7)).toBeCloseTo(2.1, 12)
    expect(pieceAt(line, 1, 7)).toBeCloseTo(2.1, 12)
    expect(pieceAt(line, 1, 14)).toBeCloseTo(0, 12)
  })

  it('shear: jumps by 1 at the station, one piece at a support', () => {
    const line = shearLine(beam, 1, 7)
    expect(pieceAt(line, 0, 7)).toBeCloseTo(-0.3, 12)
    expect(pieceAt(line, 1, 7)).toBeCloseTo(0.7, 12)
    expect(shearLine(beam, 1, 4)).toEqual(endReactionLine(beam, 1, 'left'))
    expect(shearLine(beam, 1, 14).breaks).toEqual([4, 14])
  })

  it('support reaction: both girders, one at the ends', () => {
    const line = supportReactionLine(beam, 1)
    expect(line.breaks).toEqual([0, 4, 14])
    expect([0, 1].map((piece) => pieceAt(line, piece, 4))).toEqual([1, 1])
    expect(supportReactionLine(beam, 0)).toEqual(endReactionLine(beam, 0, 'left'))
    expect(supportReactionLine(beam, 3)).toEqual(endReactionLine(beam, 2, 'right'))
  })

  it('deflection: reciprocal, smooth at the station', () => {
    const [a, b] = [6.5, 11]
    expect(pieceAt(deflectionLine(beam, 1, a, 1), 1, b)).toBeCloseTo(pieceAt(deflectionLine(beam, 1, b, 1), 0, a), 10)
    const line = deflectionLine(beam, 1, 7, 1)
    const [left, right] = line.polynomials
    expect(pieceAt(line, 0, 7)).toBeCloseTo(pieceAt(line, 1, 7), 10)
    expect(left![1] + 3 * left![3] * 9).toBeCloseTo(right![1], 10)
    expect(6 * left![3] * 3).toBeCloseTo(2 * right![2], 10)
  })

  it('stations at the ends of a span, however they were rounded', () => {
    expect(momentLine(beam, 1, 14 + 1e-13).breaks).toEqual([4, 14])
    expect(() => momentLine(beam, 1, 14.001)).toThrow('14.001')
  })
})

describe('wheels passing a line', () => {
  /** A line with jumps and cubics, as continuous girders will have. */
  const line: Influence = {
    breaks: [0, 2, 5, 6],
    polynomials: [
      [0.5, 0.3, -0.4, 0.1],
      [-0.2, 0.7, -0.05, -0.03],
      [0.4, -1, 0.9, 0.2],
    ],
  }

  it('neither extreme is passed by a march, and both are reached', () => {
    const ordinate = (station: number): number => {
      const piece = line.breaks.findLastIndex((at) => at <= station)
      return piece < 0 || piece > 2 ? 0 : pieceAt(line, piece, station)
    }
    fc.assert(
      fc.property(anyTrain(), ({ loads, spacings }) => {
        // Whole millimetres: extremes that last for less than the steps below cannot be looked for.
        const apart = spacings.map((spacing) => Math.ceil(spacing * 1000) / 1000)
        const offsets = Float64Array.from(loads, (_, i) => apart.slice(0, i).reduce((a, b) => a + b, 0))
        const { max, min } = passLine(line, offsets, Float64Array.from(loads))
        const sum = (lead: number): number =>
          loads.reduce((all, load, i) => all + load * ordinate(lead + offsets[i]!), 0)
        const size = loads.reduce((a, b) => a + b)
        for (let lead = -offsets.at(-1)!; lead < 6; lead += 0.013) {
          expect(max.value).toBeGreaterThanOrEqual(sum(lead) - 1e-12 * size)
          expect(min.value).toBeLessThanOrEqual(sum(lead) + 1e-12 * size)
        }
        for (const { value, lead } of [max, min]) {
          const near = [0, 1e-12, -1e-12].map((step) => Math.abs(sum(lead + step) - value))
          expect(Math.min(...near)).toBeLessThan(1e-9 * size)
        }
      }),
      { numRuns: 100 },
    )
  })

  it('nothing passes: zero', () => {
    expect(passLine(line, new Float64Array(0), new Float64Array(0))).toEqual({
      max: { value: 0, lead: 0 },
      min: { value: 0, lead: 0 },
    })
  })
})
