/** Jobs of an invented plant, as objects to be changed and written out. Nothing here exists. */
import { catalogue } from '../../core/catalogue/load.ts'
import type { Json } from '../../core/job/json.ts'
import { readJob, type Finding } from '../../core/job/read.ts'
import type { Job } from '../../core/job/types.ts'

/** A job that tests change. */
export interface Draft {
  [key: string]: Json | Draft | Draft[]
}

/** Everything left out that may be left out. */
export const smallest = (): Draft => ({
  format: 'longtravel-job',
  version: 1,
  project: { title: 'Alder Quay Works (invented), bay 3' },
  basis: { standard: 'us' },
  cranes: [
    {
      ratedCapacity: '10 ton',
      bridgeWeight: '20 kip',
      trolleyWeight: '4 kip',
      bridgeSpan: '60 ft',
      operation: 'pendant',
      serviceClass: 'C',
      wheelSpacings: ['8 ft'],
    },
  ],
  runway: { spans: ['20 ft', '6096 mm'], rail: { name: 'ASCE 40' } },
  girder: { steel: { name: 'A992' }, section: { kind: 'rolled', shape: 'W18X50' } },
})

/** Every covered entry given, as far as they go together: a rolled shape with a channel cap, two cranes, loads derived. */
export const rolledInFull = (): Draft => ({
  format: 'longtravel-job',
  version: 1,
  project: {
    title: 'Alder Quay Works (invented), bay 4',
    number: 'AQW-104',
    client: 'Alder Quay Works (invented)',
    site: 'Hall 2, aisle B',
    subject: 'Girder line B, columns 1 to 4',
    preparedBy: 'M. Invented',
    checkedBy: 'N. Invented',
    date: '1 March 2026',
    notes: 'First line.\nSecond line.',
  },
  units: 'si',
  basis: {
    standard: 'us',
    method: 'ASD',
    sideThrust: 'building',
    sideThrustShare: 1,
    sideThrustPerWheel: 'by-load',
    impact: 0.3,
    cb: 'diagram',
    loadHeight: 'rail',
    torsion: 'couple',
    craneDeadFactor: 'split',
    cranesTogether: [
      { North: { vertical: 1, impact: 1, sideThrust: 1, longitudinal: 1 } },
      { North: { sideThrust: 0.5 }, 1: { impact: 0 } },
    ],
    fatigueImpact: false,
    deflection: { vertical: 750, lateral: 500 },
  },
  cranes: [
    {
      name: 'North',
      ratedCapacity: '20 t',
      bridgeWeight: '190 kN',
      trolleyWeight: '40 kN',
      belowHook: '2 t',
      bridgeSpan: '23 m',
      hookApproach: '1.2 m',
      hookApproachFar: '1.5 m',
      operation: 'remote',
      bridgeDrive: 'powered',
      trolleyDrive: 'powered',
      hoistDrive: 'hand',
      serviceClass: 'D',
      wheelSpacings: ['3.4 m'],
      wheelLoad: 'derive',
      leastWheelLoad: 'derive',
      emptyWheelLoad: 'derive',
      drivenWheels: 2,
      rigidGuided: false,
      bumperOverhang: ['0.5 m', '0.7 m'],
    },
    {
      name: 'South crane',
      ratedCapacity: 200000,
      trolleyWeight: '40 kN',
      bridgeSpan: '23 m',
      operation: 'cab',
      serviceClass: 'A',
      wheelSpacings: ['1 m', '2.5 m', '1 m'],
      wheelLoad: ['80 kN', '81 kN', '82 kN', '83 kN'],
      leastWheelLoad: [20000, 20000, 20000, 20000],
      emptyWheelLoad: ['40 kN', '41 kN', '42 kN', '43 kN'],
    },
  ],
  runway: {
    spans: ['30 ft', '7.5 m'],
    continuity: 'simple',
    eitherWay: false,
    checkSpan: 1,
    unbracedLength: '5 m',
    unbracedLengthBottom: '6 m',
    topFlangeRestraint: 'none',
    rail: { name: 'ASCE 85', fixing: 'clips', wear: '2 mm', pad: false, eccentricity: '6 mm' },
    bearingLength: '200 mm',
    bracketEccentricity: '400 mm',
    endDistance: '10 in',
  },
  girder: {
    steel: { fy: '345 MPa', fu: '450 MPa', E: '200 GPa' },
    capSteel: { name: 'A36', E: '200 GPa' },
    section: { kind: 'rolled', shape: 'w 27 x 84', cap: { shape: 'C15X33.9' } },
    holes: [],
    addedDeadLoad: '1.5 kN/m',
    addedLiveLoad: '0.1 kip/ft',
    addedAxial: 0,
  },
})

/** The other ways: plates, a cap plate, a rail by its dimensions. */
export const platedInFull = (): Draft => {
  const job = rolledInFull()
  Object.assign(at(job, 'runway'), {
    rail: { height: '131.76 mm', headWidth: '65 mm', footWidth: '132 mm', mass: '42.16 kg/m', ix: '12.5e6 mm4' },
  })
  Object.assign(at(job, 'girder'), {
    steel: { name: 'A36' },
    capSteel: { fy: '345 MPa', fu: '450 MPa' },
    plateSteel: { name: 'A572-50', E: '29000 ksi' },
    section: {
      kind: 'plated',
      topFlange: { width: '350 mm', thickness: '20 mm' },
      web: { depth: '650 mm', thickness: '8 mm' },
      bottomFlange: { width: '250 mm', thickness: '14 mm' },
      cap: { plate: { width: '300 mm', thickness: '12 mm' } },
    },
  })
  return job
}

/** A shape of one's own with every figure (about those of a W18X50), and plates of an own steel. */
export const ownShape = (): Draft => {
  const job = smallest()
  Object.assign(at(job, 'girder'), {
    plateSteel: { fy: '36 ksi', fu: '58 ksi' },
    section: {
      kind: 'rolled',
      shape: {
        d: '457 mm',
        bf: '190 mm',
        tw: '9 mm',
        tf: '14.5 mm',
        r: '10 mm',
        A: '9484 mm2',
        Ix: '333e6 mm4',
        Sx: '1457e3 mm3',
        Zx: '1655e3 mm3',
        Iy: '16.7e6 mm4',
        Sy: '175e3 mm3',
        Zy: '272e3 mm3',
        J: '516e3 mm4',
        Cw: '816e9 mm6',
        rts: '50.3 mm',
        ho: '442 mm',
        massPerLength: '74.4 kg/m',
      },
      cap: { plate: { width: '200 mm', thickness: '10 mm' } },
    },
  })
  return job
}

/** The object at a path of keys. */
export const at = (job: Draft, ...keys: readonly (string | number)[]): Draft => {
  let here: Draft = job
  for (const key of keys) here = here[key] as Draft
  return here
}

export const read = (job: Draft | string) => readJob(typeof job === 'string' ? job : JSON.stringify(job), catalogue)

/** The job, where there must be one. */
export const accepted = (job: Draft | string): Job => {
  const result = read(job)
  if (!result.ok) throw new Error(JSON.stringify(result.findings, null, 1))
  return result.job
}

/** The findings, where there must be some. */
export const refused = (job: Draft | string): readonly Finding[] => {
  const result = read(job)
  if (result.ok) throw new Error('A job that should be refused was accepted')
  return result.findings
}
