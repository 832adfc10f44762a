/** A review made up by hand, so that what is written from a review can be told figure by figure. No engineering in it. */
import type { Job } from '../../core/job/types.ts'
import { as, type Kind, type Quantity } from '../../core/quantity/kinds.ts'
import type { Check, Review } from '../../core/review/types.ts'
import type { Section } from '../../core/section/types.ts'
import type { Extreme } from '../../core/travel/types.ts'

const m = (value: number) => as('distance', value)
const N = (value: number) => as('force', value)
const Nm = (value: number) => as('moment', value)

export const quantity = <K extends Kind>(kind: K, value: number): Quantity<K> => ({ kind, value: as(kind, value) })

export const extreme = (value: number, station = 3): Extreme => ({
  value,
  span: 0,
  station: m(station),
  side: 'at',
  lead: m(2),
  mirrored: false,
  train: 0,
  positions: [{ crane: 0, lead: m(2), mirrored: false }],
  on: [0, 1],
  terms: [{ station: m(station), value: Nm(value) }],
  with: { moment: Nm(value), shear: N(10) },
  method: 'exact',
})

const range = { max: extreme(50_000), min: extreme(0) }

export const holding: Check = {
  id: 'us.shear',
  title: 'Shear in the web',
  clause: { document: 'AISC 360-22', clause: 'G2.1' },
  status: 'holds',
  demand: quantity('force', 100_000),
  resistance: quantity('force', 400_000),
  utilisation: 0.25,
  at: { ...extreme(100_000, 0), side: 'right' },
  combination: '1.2D + 1.6L',
  set: 'North alone',
  places: [],
}

export const failing: Check = {
  id: 'us.flexure.major',
  title: 'Bending about the strong axis',
  clause: { document: 'AISC 360-22', clause: 'F2', equation: 'F2-2' },
  status: 'fails',
  demand: quantity('moment', 500_050),
  resistance: quantity('moment', 500_000),
  utilisation: 1.0001,
  at: extreme(500_050),
  combination: '1.2D + 1.6L',
  set: 'North alone',
  places: [],
}

export const open: Check = {
  id: 'us.web.sidesway',
  title: 'Sidesway of the web',
  clause: { document: 'AISC 360-22', clause: 'J10.4' },
  status: 'not-covered',
  why: 'this version does not check it',
  places: [],
}

const idle: Check = {
  id: 'us.bearing-stiffener',
  title: 'Bearing stiffeners',
  clause: { document: 'AISC 360-22', clause: 'J10.8' },
  status: 'not-applicable',
  why: 'there are none',
  places: [],
}

const job = {
  project: { title: 'A made-up bay' },
  units: 'us',
  basis: { standard: 'us', method: 'LRFD' },
  cranes: [{ name: 'North' }],
  runway: { spans: [m(6)], continuity: 'simple' },
  girder: { section: { kind: 'rolled', shape: { name: 'W24X84' } } },
  fingerprint: '0123456789abcdef'.repeat(4),
} as unknown as Job

const section = {
  A: 0.016,
  depth: 0.6,
  yBar: 0.3,
  Ix: 1e-3,
  Iy: 4e-5,
  SxTop: 3e-3,
  SxBottom: 3e-3,
  Zx: 3.6e-3,
  Zy: 5e-4,
  J: 1.5e-6,
  Cw: 3e-6,
  massPerLength: 125,
  top: { A: 4e-3, I: 2e-5, S: 1.7e-4, Z: 2.6e-4, height: 0.59, width: 0.23 },
  rt: 0.06,
} as unknown as Section

export const standIn: Review = {
  program: '0.1.0',
  job,
  section,
  wheels: [],
  trains: [
    {
      cranes: [0],
      turned: [false],
      wheels: [
        { crane: 0, wheel: 0, offset: m(0), load: N(50_000) },
        { crane: 0, wheel: 1, offset: m(2), load: N(40_000) },
      ],
      mayMirror: true,
    },
  ],
  envelope: {
    moment: range,
    shear: range,
    reaction: [{ support: 0, ...range }],
    endReaction: [{ span: 0, end: 'left', ...range }],
    deflection: { max: extreme(0.004) },
  },
  actions: [
    {
      crane: 0,
      impact: 0.25,
      sideThrustPerWheel: [quantity('force', 5000), quantity('force', 5000)],
      longitudinal: quantity('force', 9000),
      working: { steps: [] },
    },
  ],
  deadLoad: { value: { kind: 'lineLoad', value: as('lineLoad', 1500) }, working: { steps: [] } },
  combinations: [{ name: '1.2D + 1.6L', clause: 'ASCE 7-22 2.3.1', text: 'dead load 1.2, crane 1.6' }],
  checks: [holding, failing, open, idle],
  governing: 'us.flexure.major',
  ok: false,
  complete: false,
  handedOn: {
    brackets: [
      {
        support: 0,
        dead: quantity('force', 8000),
        wheels: quantity('force', 80_000),
        wheelsWithImpact: quantity('force', 100_000),
        sideThrust: quantity('force', 9000),
      },
    ],
    longitudinal: quantity('force', 9000),
  },
  cautions: ['The deflection is that of one crane.'],
  editions: ['AISC 360-22', 'ASCE 7-22'],
}
