import { describe, expect, it } from 'vitest'
import { as } from '../../core/quantity/kinds.ts'
import { drive } from '../../core/travel/drive.ts'
import { deflectionsAt, standAt } from '../../core/travel/stand-at.ts'
import type { Drive } from '../../core/travel/types.ts'

const m = (value: number) => as('distance', value)
const [L, a, P] = [9, 3.5, 80e3]
const wheels = [0, a].map((offset, wheel) => ({ crane: 0, wheel, offset: m(offset), load: as('force', P) }))
const asked: Drive = {
  beam: { continuity: 'simple', spans: [m(6), m(L)] },
  span: 1,
  trains: [{ cranes: [0], turned: [false], wheels, mayMirror: false }],
  train: 0,
  eitherWay: false,
}
const noLoad = as('lineLoad', 0)

describe('a train stood by hand', () => {
  it('has at the worst position the worst moment, and nowhere more', () => {
    const terms = [
      { factor: 1, at: 'worst', wheels: [P, P], uniform: noLoad, ends: [as('moment', 0), as('moment', 0)] },
    ] as const
    const worst = drive(asked, { kind: 'moments', terms })
    expect(standAt(asked, worst.lead, worst.mirrored, worst.station).value).toBeCloseTo(worst.value, 3)
    for (let lead = 6 - a; lead <= 6 + L; lead += 0.25) {
      for (const at of [lead, lead + a]) {
        expect(standAt(asked, m(lead), false, m(at)).value).toBeLessThanOrEqual(worst.value * (1 + 1e-12))
      }
    }
  })

  it('reads moment and shear by hand: both wheels on the span', () => {
    const here = standAt(asked, m(8), false, m(8))
    const R = (P * (L - 2) + P * (L - 2 - a)) / L
    expect(here.value).toBeCloseTo(R * 2, 6)
    expect(Math.abs(here.with.shear)).toBeCloseTo(Math.max(R, Math.abs(R - P)), 6)
    expect(here.on).toEqual([0, 1])
  })

  it('off the span nothing acts', () => {
    const here = standAt(asked, m(40), false, m(9))
    expect(here.value).toBe(0)
    expect(here.on).toEqual([])
  })

  it('deflects as the formula for two equal loads placed symmetrically: 2 P b (3 L^2 - 4 b^2) / (48 E I) at midspan', () => {
    const EI = as('flexuralStiffness', 3e8)
    const b = (L - a) / 2
    const line = deflectionsAt(asked, m(6 + b), false, EI, 10)
    expect(line[5]!.value).toBeCloseTo((2 * P * b * (3 * L * L - 4 * b * b)) / (48 * EI), 12)
    expect(line[0]!.value).toBeCloseTo(0, 12)
    expect(line[10]!.value).toBeCloseTo(0, 12)
  })
})
