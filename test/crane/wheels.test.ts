import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { wheelLoads } from '../../core/crane/wheels.ts'
import type { Crane } from '../../core/job/types.ts'
import { as, type Newton } from '../../core/quantity/kinds.ts'
import { crane } from './cranes.ts'

const N = (value: number): Newton => as('force', value)

const without = (from: Crane, ...fields: readonly ('bridgeWeight' | 'trolleyWeight')[]): Crane =>
  Object.fromEntries(Object.entries(from).filter(([key]) => !fields.some((field) => field === key))) as unknown as Crane

describe('wheel loads', () => {
  // F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025, part 3: printed 161.23913 and 53.76087 kN.
  it('as printed in a worked example', () => {
    const { greatest, least } = wheelLoads(crane(), 0)
    expect(greatest).toHaveLength(2)
    for (const load of greatest) expect(Math.abs(load - 161239.13)).toBeLessThan(0.005)
    for (const load of least!) expect(Math.abs(load - 53760.87)).toBeLessThan(0.005)
  })

  it('both rails together carry the loaded crane, lifting gear included; the trolley near either rail', () => {
    const length = fc.double({ min: 0, max: 5, noNaN: true })
    const force = fc.double({ min: 0, max: 1e6, noNaN: true })
    fc.assert(
      fc.property(force, force, force, length, (Q, hook, trolley, a) => {
        const entry = crane({
          ratedCapacity: N(Q),
          belowHook: N(hook),
          trolleyWeight: N(trolley),
          hookApproach: as('distance', a),
          hookApproachFar: as('distance', a),
        })
        const { greatest, least, empty, dead } = wheelLoads(entry, 0)
        const total = Q + hook + trolley + 190e3
        expect(Math.abs(2 * greatest[0]! + 2 * least![0]! - total)).toBeLessThan(1e-9 * total)
        expect(empty![0]).toBeLessThanOrEqual(least![0]! * (1 + 1e-12))
        expect(Math.abs(2 * dead![0]! + 2 * empty![0]! - trolley - 190e3)).toBeLessThan(1e-9 * total)
      }),
    )
  })

  it('the bridge and trolley part of a greatest wheel load', () => {
    // (190/2 + 40 x 21.8/23)/2 = 66.4565 kN; the rest of 161.2391 is 200 x 21.8/23/2 = 94.7826 kN.
    const { greatest, dead } = wheelLoads(crane(), 0)
    expect(dead![0]).toBeCloseTo(66456.52, 2)
    expect(greatest[0]! - dead![0]!).toBeCloseTo(94782.61, 2)
  })

  it('given loads win; more than 10 % off is a caution that names both', () => {
    const near = wheelLoads(crane({ wheelLoad: [N(170e3), N(150e3)] }), 2)
    expect(near.greatest).toEqual([170e3, 150e3])
    expect(near.cautions).toEqual([])
    const far = wheelLoads(crane({ wheelLoad: [N(180e3), N(140e3)], emptyWheelLoad: [N(70e3), N(50e3)] }), 2)
    expect(far.greatest).toEqual([180e3, 140e3])
    expect(far.cautions).toHaveLength(2)
    expect(far.cautions[0]).toMatch(/^cranes\[2\]\.wheelLoad: .*bay crane.*140 kN.*161\.2 kN/)
    expect(far.cautions[1]).toMatch(/^cranes\[2\]\.emptyWheelLoad: .*70 kN.*48\.54 kN/)
    expect(far.dead![0]).toBeCloseTo(66456.52, 2)
  })

  it('a given load below bridge and trolley is not split', () => {
    const { dead, cautions } = wheelLoads(crane({ wheelLoad: [N(60e3), N(60e3)] }), 0)
    expect(dead).toBeUndefined()
    expect(cautions).toHaveLength(2)
    expect(cautions[1]).toContain('taken as lifted')
  })

  it('given loads need no weights', () => {
    const bare = without(crane(), 'bridgeWeight', 'trolleyWeight')
    const given = { wheelLoad: [N(5), N(4)], leastWheelLoad: [N(3), N(2)], emptyWheelLoad: [N(1), N(1)] }
    const loads = wheelLoads({ ...bare, ...given }, 0)
    expect(loads).toMatchObject({ greatest: [5, 4], least: [3, 2], empty: [1, 1], cautions: [] })
    expect(loads.dead).toBeUndefined()
    expect(() => wheelLoads({ ...bare, ...given, wheelLoad: 'derive' }, 1)).toThrow('cranes[1].wheelLoad')
    expect(wheelLoads({ ...bare, ...given, emptyWheelLoad: 'derive' }, 0).empty).toBeUndefined()
    expect(() => wheelLoads({ ...bare, ...given, leastWheelLoad: [N(1)] }, 0)).toThrow('1 loads for 2 wheels')
  })

  it('the working gives every entry and every formula once', () => {
    const { steps } = wheelLoads(crane({ leastWheelLoad: [N(50e3), N(51e3)] }), 0).working
    const symbols = steps.map((step) =>
      step.step === 'rule' ? step.rule.symbol : step.step === 'given' ? step.figure[0] : step.step,
    )
    expect(symbols).toEqual([
      ...['Q', 'W_bridge', 'W_trolley', 'L_bridge', 'a', 'a_far', 'n'],
      ...['P_max', 'P_min_1', 'P_min_2', 'P_empty', 'P_dead'],
    ])
  })
})
