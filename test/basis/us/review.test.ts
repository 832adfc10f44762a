import { describe, expect, it } from 'vitest'
import { writeWorking } from '../../../core/formula/write.ts'
import { inUnit, UNIT } from '../../../core/quantity/units.ts'
import type { Review } from '../../../core/review/types.ts'
import { check, reviewed, shape } from './girders.ts'

// The invented job by hand, kip and feet: 25 ft span, two wheels 9 ft apart, cab crane, W27X94, ASCE 60 (4.25 in high).
const HAND = (() => {
  const [L, a] = [25, 9]
  const P = (24 / 2 + (36 * (50 - 4)) / 50) / 2 // static wheel
  const factored = 1.6 * 1.25 * P
  const H = 1.6 * ((0.2 * 36 * 0.5) / 2)
  const section = shape('W27X94')
  const inches = (value: number) => inUnit(value, 'in')
  const arm = 4.25 + inches(section.topFlange.thickness) / 2
  const couple = (H * arm + factored * 0.75 * inches(section.tw)) / inches(section.ho)
  const weight = (94 + 60 / 3) / 1000
  return { L, a, P, factored, H, couple, weight }
})()

const kipFeet = (review: Review, id: string): number => inUnit(check(review, id).demand!.value, 'kip ft')

describe('a job by hand', () => {
  const review = reviewed()

  it('wheel loads and crane forces', () => {
    expect(inUnit(review.wheels[0]!.greatest[0]!, 'kip')).toBeCloseTo(HAND.P, 9)
    expect(review.actions[0]!.impact).toBe(0.25)
    expect(inUnit(review.actions[0]!.sideThrustPerWheel[0]!.value, 'kip')).toBeCloseTo((0.2 * 36 * 0.5) / 2, 9)
    expect(inUnit(review.actions[0]!.longitudinal.value, 'kip')).toBeCloseTo(0.1 * 2 * HAND.P, 9)
  })

  it('strong-axis moment: two equal wheels and dead load at the worst place of the sum', () => {
    // M(x) under wheel 1 at x with both wheels on: 2 P (L - a/2 - x) x / L + w x (L - x) / 2, its vertex by hand.
    const { L, a, factored: P, weight } = HAND
    const w = 1.2 * weight
    const x = ((2 * P * (L - a / 2)) / L + (w * L) / 2) / ((4 * P) / L + w)
    const M = (2 * P * (L - a / 2 - x) * x) / L + (w * x * (L - x)) / 2
    expect(kipFeet(review, 'us.flexure.major')).toBeCloseTo(M, 6)
    expect(inUnit(check(review, 'us.flexure.major').at!.station, 'ft') * 2 - L).toBeCloseTo(
      Math.sign(inUnit(check(review, 'us.flexure.major').at!.station, 'ft') * 2 - L) * Math.abs(2 * x - L),
      6,
    )
  })

  it('side thrust with the couple on the top flange', () => {
    const { L, a, H, couple } = HAND
    const M = ((H + couple) / (2 * L)) * (L - a / 2) ** 2
    expect(kipFeet(review, 'us.flexure.lateral')).toBeCloseTo(M, 6)
  })

  it('shear at the support', () => {
    const { L, a, factored: P, weight } = HAND
    expect(inUnit(check(review, 'us.shear').demand!.value, 'kip')).toBeCloseTo(
      P * (2 - a / L) + (1.2 * weight * L) / 2,
      6,
    )
  })

  it('both axes: not below the sum at any position of a fine march', () => {
    const { L, a, factored: P, H, couple, weight } = HAND
    const both = check(review, 'us.flexure.biaxial')
    const section = review.section
    const e = inUnit(section.depth / 2, 'ft') + 4.25 / 12
    const P_r = 1.6 * 0.1 * 2 * HAND.P
    const Mcx = inUnit(check(review, 'us.flexure.major').resistance!.value, 'kip ft')
    const Mcy = inUnit(check(review, 'us.flexure.lateral').resistance!.value, 'kip ft')
    const axial = check(review, 'us.compression').utilisation!
    const elastic = (I: number) => (Math.PI ** 2 * 29_000 * inUnit(I, 'in4')) / (12 * L) ** 2
    const amplify = (I: number) => 1 / (1 - P_r / elastic(I))
    const moment = (wheels: readonly number[], force: number, w: number, end: number, x: number): number => {
      const on = wheels.filter((at) => at >= 0 && at <= L)
      const R = on.reduce((sum, at) => sum + (force * (L - at)) / L, 0) + (w * L) / 2 - end / L
      return end + R * x - (w * x * x) / 2 - on.reduce((sum, at) => sum + force * Math.max(0, x - at), 0)
    }
    let worst = 0
    for (let lead = -a; lead <= L; lead += L / 400) {
      const wheels = [lead, lead + a]
      const most = (force: number, w: number, end: number): number => {
        let found = 0
        for (let x = 0; x <= L; x += L / 400) found = Math.max(found, moment(wheels, force, w, end, x))
        return found
      }
      const Mx = most(P, 1.2 * weight, P_r * e)
      const My = most(H + couple, 0, 0)
      worst = Math.max(worst, axial / 2 + (amplify(section.Ix) * Mx) / Mcx + (amplify(section.Iy) * My) / Mcy)
    }
    // The march misses the peak by no more than its step lets it: half a step of 25/400 ft beside the vertex.
    expect(both.utilisation!).toBeGreaterThanOrEqual(worst * (1 - 1e-12))
    expect(both.utilisation!).toBeLessThan(worst * 1.001)
  })

  it('vertical deflection by the formula for two equal loads placed symmetrically (a below 0.653 L)', () => {
    const { L, a, P } = HAND
    const b = (12 * (L - a)) / 2
    const EI = 29_000 * inUnit(review.section.Ix, 'in4')
    const delta = (2 * P * b * (3 * (12 * L) ** 2 - 4 * b ** 2)) / (48 * EI)
    expect(inUnit(check(review, 'us.deflection.vertical').demand!.value, 'in')).toBeCloseTo(delta, 6)
    expect(inUnit(check(review, 'us.deflection.vertical').resistance!.value, 'in')).toBeCloseTo((12 * L) / 600, 9)
  })

  it('web under a wheel: J10-2 and J10-4 with the rail’s dispersal', () => {
    const section = review.section
    const inches = (value: number) => inUnit(value, 'in')
    const [t, k, d, tf] = [section.tw, section.topFlange.k, section.d, section.topFlange.thickness].map(inches) as [
      number,
      number,
      number,
      number,
    ]
    const lb = 2 * 4.25
    const yielding = 50 * t * (5 * k + lb)
    const crippling = 0.75 * 0.8 * t ** 2 * (1 + (3 * lb * (t / tf) ** 1.5) / d) * Math.sqrt((29_000 * 50 * tf) / t)
    expect(inUnit(check(review, 'us.web.yielding.wheel').resistance!.value, 'kip')).toBeCloseTo(yielding, 6)
    expect(inUnit(check(review, 'us.web.crippling.wheel').resistance!.value, 'kip')).toBeCloseTo(crippling, 6)
    expect(inUnit(check(review, 'us.web.yielding.wheel').demand!.value, 'kip')).toBeCloseTo(HAND.factored, 9)
  })
})

describe('choices', () => {
  const utilisation = (change: Parameters<typeof reviewed>[0], id: string): number =>
    check(reviewed(change), id).utilisation!

  it('allowable strength: demand without load factors against M_n / 1.67', () => {
    const [lrfd, asd] = [reviewed(), reviewed((job) => (job.basis.method = 'ASD'))]
    const ratio = check(lrfd, 'us.flexure.lateral').demand!.value / check(asd, 'us.flexure.lateral').demand!.value
    expect(ratio).toBeCloseTo(1.6, 9)
    const strength =
      check(lrfd, 'us.flexure.major').resistance!.value / check(asd, 'us.flexure.major').resistance!.value
    expect(strength).toBeCloseTo(0.9 * 1.67, 9)
  })

  it('C_b of the diagram is never worse, and the working shows it', () => {
    const diagram = reviewed((job) => (job.basis.cb = 'diagram'))
    const [one, with_] = [check(reviewed(), 'us.flexure.major'), check(diagram, 'us.flexure.major')]
    expect(with_.utilisation!).toBeLessThan(one.utilisation!)
    const lines = [with_, ...with_.places].flatMap((place) => writeWorking(place.working!(), 'us'))
    expect(lines.some(({ clause }) => clause === 'AISC 360-22 F1-1')).toBe(true)
  })

  it('C_b of the diagram: no position is worse than the one reported', () => {
    // Two wheels P at s and s + a on L, no dead load of note: U = max(M/cap, M/(C_b M_LTB)) marched over s.
    const diagram = reviewed((job) => {
      job.basis.cb = 'diagram'
      job.girder.section.shape = 'W24X68'
    })
    const found = check(diagram, 'us.flexure.major')
    const one = check(
      reviewed((job) => (job.girder.section.shape = 'W24X68')),
      'us.flexure.major',
    )
    const buckling = inUnit(one.resistance!.value, 'kip ft')
    const cap = (0.9 * 50 * inUnit(diagram.section.Zx, 'in3')) / 12
    const { L, a, factored: P } = HAND
    const w = (1.2 * (68 + 20)) / 1000
    let worst = 0
    for (let s = -a; s <= L; s += L / 800) {
      const wheels = [s, s + a].filter((at) => at >= 0 && at <= L)
      const M = (x: number): number =>
        wheels.reduce((sum, at) => sum + (P * (L - at) * x) / L - P * Math.max(0, x - at), (w * x * (L - x)) / 2)
      let most = 0
      for (let x = 0; x <= L; x += L / 800) most = Math.max(most, M(x))
      const C_b = (12.5 * most) / (2.5 * most + 3 * M(L / 4) + 4 * M(L / 2) + 3 * M((3 * L) / 4))
      worst = Math.max(worst, most / Math.min(cap, C_b * buckling))
    }
    expect(found.utilisation!).toBeGreaterThanOrEqual(worst * (1 - 1e-12))
    expect(found.utilisation!).toBeLessThan(worst * 1.001)
  })

  it('load at the rail lowers the strength where the girder buckles', () => {
    expect(utilisation((job) => (job.basis.loadHeight = 'rail'), 'us.flexure.major')).toBeGreaterThan(
      utilisation(undefined, 'us.flexure.major'),
    )
  })

  it('a braced top flange does not buckle; its strength is the plastic moment', () => {
    const braced = reviewed((job) => (job.runway.unbracedLength = '5 ft'))
    const Mp = 0.9 * 50 * UNIT.ksi * braced.section.Zx
    expect(check(braced, 'us.flexure.major').resistance!.value).toBeCloseTo(Mp, 3)
  })

  it('hand-geared cranes bring no impact, no side thrust and no longitudinal force', () => {
    const [action] = reviewed((job) => (job.cranes[0]!.operation = 'hand')).actions
    expect(action!.impact).toBe(0)
    expect(action!.sideThrustPerWheel.map(({ value }) => value)).toEqual([0, 0])
    expect(action!.longitudinal.value).toBe(0)
  })

  it('side thrust by load follows the wheel loads and keeps its sum', () => {
    const [action] = reviewed((job) => {
      job.basis.sideThrustPerWheel = 'by-load'
      job.cranes[0]!.wheelLoad = ['30 kip', '20 kip']
    }).actions
    const [first, second] = action!.sideThrustPerWheel.map(({ value }) => inUnit(value, 'kip')) as [number, number]
    expect(first / second).toBeCloseTo(1.5, 9)
    expect(first + second).toBeCloseTo(0.5 * 0.2 * 36, 9)
  })

  it('crane dead load apart takes 1.2 on bridge and trolley', () => {
    const split = reviewed((job) => (job.basis.craneDeadFactor = 'split'))
    const dead = (24 / 2 + (6 * (50 - 4)) / 50) / 2
    const P = 1.2 * dead + 1.6 * (HAND.P - dead) + 1.6 * 0.25 * HAND.P
    expect(inUnit(check(split, 'us.web.yielding.wheel').demand!.value, 'kip')).toBeCloseTo(P, 9)
  })

  it('wheels so near that their lengths of web overlap act as one', () => {
    const near = check(
      reviewed((job) => (job.cranes[0]!.wheelSpacings = ['10 in'])),
      'us.web.yielding.wheel',
    )
    expect(inUnit(near.demand!.value, 'kip')).toBeCloseTo(2 * HAND.factored, 9)
  })

  it('without a bearing length the web over the bearing is not covered, and the reason names the entry', () => {
    const open = check(
      reviewed((job) => delete job.runway.bearingLength),
      'us.web.yielding.end',
    )
    expect(open.status).toBe('not-covered')
    expect(open.why).toContain('runway.bearingLength')
  })
})

describe('cranes together', () => {
  const two = (together: unknown) =>
    reviewed((job) => {
      job.cranes.push({ ...job.cranes[0], name: 'B', ratedCapacity: '24 kip' })
      if (together !== undefined) job.basis.cranesTogether = together
    })
  const sets = (review: Review): readonly string[] => [
    ...new Set(review.checks.flatMap((each) => [each, ...each.places]).map(({ set }) => set ?? '')),
  ]

  it('by default each alone, and both with impact and thrust of one', () => {
    const names = sets(two(undefined))
    expect(names).toContain('A alone')
    expect(names).toContain('A in full, B vertical')
    expect(names).toContain('B in full, A vertical')
  })

  it('half-both adds half the thrust of both', () => {
    expect(sets(two('half-both')).some((name) => name.includes('half thrust'))).toBe(true)
  })

  it('a set as entered stands alone, its factors on the forces', () => {
    const review = two([{ A: { vertical: 1, impact: 0.5, sideThrust: 0, longitudinal: 0 } }])
    expect(inUnit(check(review, 'us.web.yielding.wheel').demand!.value, 'kip')).toBeCloseTo(1.6 * 1.125 * HAND.P, 6)
    expect(check(review, 'us.compression').status).toBe('not-applicable')
  })

  it('two cranes in full are at least as bad as the same two by default', () => {
    const full = { vertical: 1, impact: 1, sideThrust: 1, longitudinal: 1 }
    for (const id of ['us.flexure.major', 'us.flexure.biaxial', 'us.shear']) {
      expect(check(two([{ A: full, B: full }]), id).utilisation!).toBeGreaterThanOrEqual(
        check(two(undefined), id).utilisation!,
      )
    }
  })
})
