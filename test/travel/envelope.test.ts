import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { NewtonSquareMetre } from '../../core/quantity/kinds.ts'
import { drive } from '../../core/travel/drive.ts'
import { envelopeCurve, staticEnvelope } from '../../core/travel/envelope.ts'
import { momentProof } from '../../core/travel/proof.ts'
import type { Beam } from '../../core/travel/types.ts'
import { anyTrain, ends, lineLoad, m, on, term, train } from './trains.ts'

const EI = 5e7 as NewtonSquareMetre
const beam: Beam = { continuity: 'simple', spans: [6, 8, 6].map(m) }

describe('static envelope', () => {
  const light = train([30, 30], [2])
  const heavy = train([100, 40], [3])
  const found = staticEnvelope(beam, [light, heavy], EI)

  it('takes the worst of all spans and trains', () => {
    expect(found.moment.max).toMatchObject({ span: 1, train: 1 })
    expect(found.moment.max.value).toBeCloseTo((140 * ((8 - (40 * 3) / 140) / 2) ** 2) / 8, 9)
    expect(found.deflection.max).toMatchObject({ span: 1, train: 1, method: 'refined' })
    expect(found.shear.max).toMatchObject({ value: 125, side: 'right', span: 1, station: 6, with: { moment: 0 } })
    expect(found.shear.max.value).toBe(found.shear.max.with.shear)
    expect(found.shear.min).toMatchObject({ value: -125, side: 'left', span: 1, station: 14, mirrored: true })
  })

  it('has every support and every end', () => {
    expect(found.reaction.map(({ support }) => support)).toEqual([0, 1, 2, 3])
    expect(found.reaction[0]!.max.value).toBeCloseTo(100 + (40 * 3) / 6, 9)
    expect(found.reaction[1]!.max.value).toBeCloseTo(100 + (40 * 5) / 8, 9)
    expect(found.reaction.map(({ max }) => max.station)).toEqual([0, 6, 14, 20])
    expect(found.endReaction.map(({ span, end }) => `${span} ${end}`)).toEqual([
      '0 left',
      '0 right',
      '1 left',
      '1 right',
      '2 left',
      '2 right',
    ])
  })

  it('is least without a wheel', () => {
    for (const { min } of [found.moment, ...found.reaction, ...found.endReaction])
      expect(min).toMatchObject({ value: 0, train: undefined, on: [] })
  })

  it('without trains everything is zero', () => {
    const none = staticEnvelope(beam, [], EI)
    expect(none.moment.max.value).toBe(0)
    expect(Math.abs(none.shear.min.value)).toBe(0)
    expect(none.deflection.max.value).toBe(0)
  })
})

describe('envelope at stations', () => {
  it('touches the absolute maximum at its station and stays below it elsewhere', () => {
    fc.assert(
      fc.property(anyTrain(), ({ span: L, loads, spacings }) => {
        const only = train(loads, spacings)
        const runway: Beam = { continuity: 'simple', spans: [m(3), m(L)] }
        const { moment, shear } = staticEnvelope({ continuity: 'simple', spans: [m(L)] }, [only], EI)
        const there = m(3 + moment.max.station)
        const parts = Array.from({ length: 21 }, (_, k) => m(3 + (L * k) / 20))
        const [at, ...others] = envelopeCurve(runway, 1, [only], [there, ...parts])
        expect(Math.abs(at!.moment.max / moment.max.value - 1)).toBeLessThan(1e-11)
        for (const point of others) {
          expect(point.moment.max).toBeLessThanOrEqual(moment.max.value * (1 + 1e-12))
          expect(point.moment.min).toBe(0)
        }
        expect(Math.abs(others[0]!.shear.max / shear.max.value - 1)).toBeLessThan(1e-12)
        expect(Math.abs(others[20]!.shear.min / shear.min.value - 1)).toBeLessThan(1e-12)
        expect(others[0]!.shear.min).toBe(0)
      }),
    )
  })
})

describe('proof of an absolute maximum', () => {
  it('Kassimali, Structural Analysis, 6th ed., Problem 9.22: resultant 1.64 m from the first load', () => {
    const loads = [125, 100, 50]
    const only = train(loads, [2, 3])
    const asked = term(loads)
    const worst = drive(on([15], only), { kind: 'moments', terms: [asked] })
    const proof = momentProof(on([15], only), worst, asked)!
    expect(proof.resultant).toBe(275)
    expect(Math.abs(proof.resultantStation - worst.lead - 1.64)).toBeLessThan(0.005)
    expect(proof).toMatchObject({ wheel: 1, on: [0, 1, 2] })
    expect(proof.wheelFromMidspan).toBeCloseTo(0.1818, 4)
    expect(proof.wheelFromMidspan + proof.resultantFromMidspan).toBeCloseTo(0, 9)
  })

  it('both distances from midspan are opposite, or apart by what other loads make it', () => {
    fc.assert(
      fc.property(
        anyTrain(),
        fc.double({ min: 0, max: 50, noNaN: true }),
        fc.double({ min: -20, max: 20, noNaN: true }),
        ({ span: L, loads, spacings }, uniform, right) => {
          const only = train(loads, spacings)
          const asked = term(loads, { uniform: lineLoad(uniform), ends: ends(0, right) })
          const worst = drive(on([L], only), { kind: 'moments', terms: [asked] })
          if (worst.station === 0 || worst.station === L) return
          const proof = momentProof(on([L], only), worst, asked)!
          expect(Math.abs(proof.shift - proof.shiftByOtherLoads)).toBeLessThan(1e-7 * L)
          expect(L / 2 + proof.wheelFromMidspan).toBeCloseTo(worst.station, 9)
        },
      ),
    )
  })

  it('there is none without a wheel at the section', () => {
    const asked = on([4], train([1], []))
    const dead = term([], { uniform: lineLoad(1) })
    const alone = { ...asked, train: undefined }
    expect(momentProof(alone, drive(alone, { kind: 'moments', terms: [dead] }), dead)).toBeUndefined()
    const pulled = term([1], { ends: ends(0, 100) })
    expect(momentProof(asked, drive(asked, { kind: 'moments', terms: [pulled] }), pulled)).toBeUndefined()
  })
})

describe('other effects', () => {
  const loads = [125, 125]
  const only = train(loads, [3.6])

  it('the shear names the end and the side, dead load included', () => {
    const worst = drive(on([5, 10], only, 1), { kind: 'shear', wheels: loads, uniform: lineLoad(0.3) })
    expect(worst.value).toBeCloseTo(206.5, 9)
    expect(worst).toMatchObject({ station: 5, side: 'right', lead: 5, on: [0, 1], terms: [] })
    const loaded = drive(on([10], train([10, 90], [3], false)), {
      kind: 'shear',
      wheels: [10, 90],
      uniform: lineLoad(0),
    })
    expect(loaded.value).toBeCloseTo(-97, 9)
    expect(loaded).toMatchObject({ station: 10, side: 'left', lead: 7 })
  })

  it('a wheel stands where it is stood', () => {
    const worst = drive(on([5, 10], only, 1), { kind: 'stand', wheel: 1, at: m(7), value: 3 })
    expect(worst).toMatchObject({ value: 3, station: 7, on: [1] })
    expect(worst.lead).toBeCloseTo(3.4, 12)
    expect(worst.with.moment).toBeCloseTo((125 * 2 * 8) / 10, 9)
  })

  it('the train may stand astride the support, and further spans do not count', () => {
    const worst = drive(on([5, 2, 10], train([10, 10, 10], [1, 4])), {
      kind: 'bracketReaction',
      support: 1,
      wheels: [10, 10, 10],
      uniform: lineLoad(6),
    })
    // Wheels 1 m left of it, at it and 4 m right of it (off the 2 m span), or mirrored: 4 m left, at it, 1 m right.
    const [listed, mirrored] = [10 * 0.8 + 10, 10 * 0.2 + 10 + 10 * 0.5]
    expect(worst.value).toBeCloseTo(Math.max(listed, mirrored) + 6 * 3.5, 9)
    expect(worst.on).toHaveLength(2)
  })
})
