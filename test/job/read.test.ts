import { describe, expect, test } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import { FIELDS, fieldList } from '../../core/job/fields.ts'
import { accepted, at, ownShape, platedInFull, read, rolledInFull, smallest, type Draft } from './plant.ts'

const kip = 4448.2216152605
const foot = 0.3048

describe('a job with everything left out that may be', () => {
  const job = accepted(smallest())

  test('carries its entries in SI', () => {
    expect(job.cranes[0]!.ratedCapacity).toBeCloseTo(20 * kip, 6)
    expect(job.cranes[0]!.bridgeWeight).toBeCloseTo(20 * kip, 6)
    expect(job.cranes[0]!.bridgeSpan).toBeCloseTo(60 * foot, 12)
    expect(job.cranes[0]!.wheelSpacings).toEqual([8 * foot])
    expect(job.runway.spans).toEqual([20 * foot, 6.096])
    expect(job.girder.section).toEqual({ kind: 'rolled', shape: catalogue.iShape('W18X50') })
    expect(job.girder.steel.name).toBe('A992')
    expect(job.girder.steel.fy).toBeCloseTo(50 * 6894757.293168361, 3)
    expect(job.runway.rail).toMatchObject({ name: 'ASCE 40', height: 0.0889, wear: 0 })
  })

  test('one wheel load stands for every wheel', () => {
    const draft = smallest()
    const [crane] = draft.cranes as [Draft]
    const { cranes } = accepted({
      ...draft,
      cranes: [{ ...crane, wheelSpacings: ['4 ft', '8 ft'], wheelLoad: '30 kip' }],
    })
    expect(cranes[0]!.wheelLoad).toEqual(
      [30 * kip, 30 * kip, 30 * kip].map((load) => expect.closeTo(load, 6) as number),
    )
  })

  test('takes the defaults', () => {
    expect(job.units).toBe('us')
    expect(job.basis).toEqual({
      standard: 'us',
      method: 'LRFD',
      sideThrust: 'building',
      sideThrustShare: 0.5,
      sideThrustPerWheel: 'equal',
      impact: 'standard',
      cb: 'one',
      loadHeight: 'shear-centre',
      craneDeadFactor: 'as-live',
      cranesTogether: 'building',
      deflection: {},
    })
    expect(job.cranes[0]).toMatchObject({
      name: 'Crane 1',
      belowHook: 0,
      hookApproach: 0,
      hookApproachFar: 0,
      bridgeDrive: 'powered',
      trolleyDrive: 'powered',
      hoistDrive: 'powered',
      wheelLoad: 'derive',
      leastWheelLoad: 'derive',
      emptyWheelLoad: 'derive',
      bumperOverhang: [0.6, 0.6],
    })
    expect(job.runway).toMatchObject({ continuity: 'simple', eitherWay: true })
    expect(job.runway).not.toHaveProperty('unbracedLength')
    expect(job.runway).not.toHaveProperty('checkSpan')
    expect(job.runway.rail).not.toHaveProperty('eccentricity')
    expect(job.girder).not.toHaveProperty('capSteel')
    expect(job.girder.addedDeadLoad).toBe(0)
    // 29,000 ksi: AISC 360-22, list of symbols.
    expect(job.girder.steel.E).toBeCloseTo(29000 * 6894757.293168361, 0)
  })

  test('lists every default with its value and where it comes from', () => {
    const taken = new Map(job.defaults.map(({ path, value }) => [path, value]))
    expect(Object.fromEntries(taken)).toMatchObject({
      units: 'us',
      'basis.method': 'LRFD',
      'basis.sideThrustShare': '0.5',
      'basis.deflection.lateral': '400',
      'cranes[0].name': 'Crane 1',
      'cranes[0].bridgeDrive': 'powered',
      'cranes[0].wheelLoad': 'derive',
      'cranes[0].bumperOverhang': '0.6 m, 0.6 m',
      'runway.unbracedLength': 'the span',
      'runway.rail.eccentricity': '3/4 of the web’s thickness',
      'girder.steel.E': '29000 ksi',
    })
    expect(new Set(job.defaults.map(({ path }) => path)).size).toBe(job.defaults.length)
    for (const { value, source } of job.defaults) {
      expect(value).not.toBe('')
      expect(source).not.toBe('')
    }
    // Nothing that is not there, or has no default, is said to be taken.
    for (const path of [
      'girder.capSteel',
      'girder.plateSteel',
      'runway.bearingLength',
      'runway.bracketEccentricity',
      'project.client',
      'cranes[0].years',
    ])
      expect(taken.has(path), path).toBe(false)
  })
})

describe('a job with every covered entry given', () => {
  const job = accepted(rolledInFull())

  test('carries them all', () => {
    expect(job).toMatchObject({
      project: rolledInFull().project as object,
      units: 'si',
      basis: { method: 'ASD', impact: 0.3, craneDeadFactor: 'split', deflection: { vertical: 750, lateral: 500 } },
      runway: {
        eitherWay: false,
        checkSpan: 1,
        unbracedLength: 5,
        unbracedLengthBottom: 6,
        bearingLength: 0.2,
        bracketEccentricity: 0.4,
        endDistance: 0.254,
      },
    })
    expect(job.cranes[0]).toMatchObject({
      name: 'North',
      belowHook: 2000 * 9.80665,
      hoistDrive: 'hand',
      hookApproachFar: 1.5,
    })
    expect(job.cranes[1]).toMatchObject({
      wheelLoad: [80e3, 81e3, 82e3, 83e3],
      leastWheelLoad: [20e3, 20e3, 20e3, 20e3],
    })
    expect(job.girder.steel).toEqual({ name: 'as entered', fy: 345e6, fu: 450e6, E: 200e9 })
    expect(job.girder.capSteel).toMatchObject({ name: 'A36', E: 200e9 })
    expect(job.girder.section.cap).toEqual({ kind: 'channel', channel: catalogue.channel('C15X33.9') })
  })

  test('reads sets of cranes by name or index, what is left out acting in full', () => {
    const full = { vertical: 1, impact: 1, sideThrust: 1, longitudinal: 1 }
    expect(job.basis.cranesTogether).toEqual([
      new Map([[0, full]]),
      new Map([
        [0, { ...full, sideThrust: 0.5 }],
        [1, { ...full, impact: 0 }],
      ]),
    ])
    const taken = job.defaults.map(({ path }) => path)
    expect(taken).toContain('basis.cranesTogether[1].North.vertical')
    expect(taken).not.toContain('basis.cranesTogether[1].North.sideThrust')
  })

  test('leaves no covered field out, over the three ways', () => {
    const given = new Set([smallest(), rolledInFull(), platedInFull(), ownShape()].flatMap((draft) => paths(draft)))
    const covered = fieldList.filter(([, field]) => field.notCovered !== 'all').map(([path]) => path)
    expect(covered.filter((path) => !given.has(path))).toEqual([])
  })

  test('reads plates, a cap plate and a rail by its dimensions', () => {
    const plated = accepted(platedInFull())
    expect(plated.girder.section).toEqual({
      kind: 'plated',
      topFlange: { width: 0.35, thickness: 0.02 },
      web: { depth: 0.65, thickness: 0.008 },
      bottomFlange: { width: 0.25, thickness: 0.014 },
      cap: { kind: 'plate', plate: { width: 0.3, thickness: 0.012 } },
    })
    expect(plated.girder.plateSteel?.name).toBe('A572-50')
    expect(plated.runway.rail.height).toBeCloseTo(0.13176, 12)
    expect(plated.runway.rail.massPerLength).toBe(42.16)
    expect(plated.runway.rail.Ix).toBeCloseTo(12.5e-6, 15)
  })

  test('reads a shape of one’s own with its figures; k is flange and radius', () => {
    const own = accepted(ownShape())
    expect(own.girder.section).toMatchObject({
      kind: 'rolled',
      shape: { family: 'own', d: 0.457, r: 0.01, figures: { massPerLength: 74.4, rts: 0.0503 } },
    })
    expect(own.girder.section.kind === 'rolled' ? own.girder.section.shape.k : 0).toBeCloseTo(0.0245, 15)
    // The cap plate is one of the plates.
    expect(own.girder.capSteel).toEqual(own.girder.plateSteel)
    expect(own.girder.capSteel?.fy).toBeCloseTo(36 * 6894757.293168361, 3)
  })
})

describe('what follows from other entries', () => {
  test('all drives are by hand where the crane is operated by hand', () => {
    const job = smallest()
    at(job, 'cranes', 0).operation = 'hand'
    delete at(job, 'cranes', 0).trolleyWeight
    delete at(job, 'cranes', 0).bridgeWeight
    Object.assign(at(job, 'cranes', 0), {
      wheelLoad: [3e4, 3e4],
      leastWheelLoad: [1e4, 1e4],
      emptyWheelLoad: [1e4, 1e4],
    })
    const crane = accepted(job).cranes[0]!
    expect([crane.bridgeDrive, crane.trolleyDrive, crane.hoistDrive]).toEqual(['hand', 'hand', 'hand'])
    expect(accepted(job).defaults).toContainEqual({
      path: 'cranes[0].hoistDrive',
      value: 'hand',
      source: 'common practice',
    })
  })

  test('where all wheel loads are given no weight of the bridge is needed', () => {
    const job = smallest()
    delete at(job, 'cranes', 0).bridgeWeight
    Object.assign(at(job, 'cranes', 0), {
      wheelLoad: [3e4, 3e4],
      leastWheelLoad: [1e4, 1e4],
      emptyWheelLoad: [1e4, 1e4],
    })
    expect(accepted(job).cranes[0]).not.toHaveProperty('bridgeWeight')
  })

  test('the strength of a listed steel is that of its thickest part', () => {
    const thick = (thickness: string): Draft => {
      const job = platedInFull()
      delete at(job, 'girder').plateSteel
      at(job, 'girder', 'section', 'web').thickness = thickness
      return job
    }
    // ASTM A36: 36 ksi up to 8 in, 32 ksi above.
    const ksi = 6894757.293168361
    expect(accepted(thick('8 in')).girder.steel.fy).toBeCloseTo(36 * ksi, 3)
    expect(accepted(thick('8.01 in')).girder.steel.fy).toBeCloseTo(32 * ksi, 3)
  })

  test('a byte order mark is accepted and changes nothing', () => {
    expect(accepted(`\uFEFF${JSON.stringify(smallest())}`)).toEqual(accepted(smallest()))
  })

  test('an unbraced length beyond every span is allowed with a caution', () => {
    const job = smallest()
    at(job, 'runway').unbracedLength = '21 ft'
    expect(read(job)).toMatchObject({ ok: true, cautions: [expect.stringContaining('runway.unbracedLength ')] })
    at(job, 'runway').unbracedLength = '20 ft'
    expect(read(job)).toMatchObject({ ok: true, cautions: [] })
  })

  test('the fingerprint is of the job as entered', () => {
    const job = smallest()
    const before = accepted(job).fingerprint
    expect(before).toMatch(/^[0-9a-f]{64}$/)
    expect(accepted(JSON.stringify(job, null, 4)).fingerprint).toBe(before)
    job.units = 'us'
    expect(accepted(job).fingerprint).not.toBe(before)
  })
})

/** The dictionary's paths that occur in a job. */
const paths = (draft: unknown, here = ''): readonly string[] => {
  const below = here === '' ? '' : `${here}.`
  if (Array.isArray(draft)) return [here, ...draft.flatMap((item) => paths(item, `${here}[]`))]
  if (typeof draft !== 'object' || draft === null) return [here]
  return [
    here,
    ...Object.entries(draft).flatMap(([key, value]) =>
      paths(value, `${below}${`${below}${key}` in FIELDS || here !== 'basis.cranesTogether[]' ? key : '{crane}'}`),
    ),
  ]
}
