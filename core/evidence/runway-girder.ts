/**
 * A welded runway girder worked from crane data to final check in published notes: 20 t crane, 7.5 m span, flanges 350x20
 * and 250x14, web 650x8. The notes are one engineer's, not a standard: where they leave AISC 360-22 the case is put so that
 * its arithmetic alone is compared, and says what differs.
 */
import { H1_1 } from '../basis/us/both-axes.ts'
import { compressiveStrength, E3_FN } from '../basis/us/compression.ts'
import { availableFlexure, flexuralStrength, type Steel } from '../basis/us/flexure.ts'
import { flangeForces, leverArm, topFlangeStrength } from '../basis/us/flange.ts'
import { wheelLoads } from '../crane/wheels.ts'
import { working } from '../formula/working.ts'
import type { Crane } from '../job/types.ts'
import { as } from '../quantity/kinds.ts'
import { sectionOf } from '../section/properties.ts'
import { drive } from '../travel/drive.ts'
import type { Effect } from '../travel/types.ts'
import type { EvidenceCase } from './types.ts'

const mm = (value: number) => as('length', value / 1000)
const plate = (width: number, thickness: number) => ({ width: mm(width), thickness: mm(thickness) })

const section = () =>
  sectionOf({
    kind: 'plated',
    topFlange: plate(350, 20),
    web: { depth: mm(650), thickness: mm(8) },
    bottomFlange: plate(250, 14),
  })
const STEEL: Steel = { F_y: as('stress', 345e6), E: as('stress', 200e9) }
const SPAN = as('distance', 7.5)

const CRANE: Crane = {
  name: '20 t',
  ratedCapacity: as('force', 200e3),
  trolleyWeight: as('force', 40e3),
  bridgeWeight: as('force', 190e3),
  belowHook: as('force', 0),
  bridgeSpan: as('distance', 23),
  hookApproach: as('distance', 1.2),
  hookApproachFar: as('distance', 1.2),
  operation: 'cab',
  bridgeDrive: 'powered',
  trolleyDrive: 'powered',
  hoistDrive: 'powered',
  serviceClass: 'C',
  wheelSpacings: [as('distance', 3.4)],
  wheelLoad: 'derive',
  leastWheelLoad: 'derive',
  emptyWheelLoad: 'derive',
  bumperOverhang: [as('distance', 0.6), as('distance', 0.6)],
}

const TRAIN = {
  cranes: [0],
  turned: [false],
  wheels: [0, 1].map((wheel) => ({
    crane: 0,
    wheel,
    offset: as('distance', 3.4 * wheel),
    load: as('force', 161.23913e3),
  })),
  mayMirror: true,
}

const worst = (effect: Effect) =>
  drive({ beam: { continuity: 'simple', spans: [SPAN] }, span: 0, trains: [TRAIN], train: 0, eitherWay: true }, effect)

const moment = (each: number, uniform: number, at: 'worst' | number): Effect => ({
  kind: 'moments',
  terms: [
    {
      factor: 1,
      at: at === 'worst' ? at : as('distance', at),
      wheels: [each, each],
      uniform: as('lineLoad', uniform),
      ends: [as('moment', 0), as('moment', 0)],
    },
  ],
})

const deflection = (each: number, I: number): number =>
  1000 * worst({ kind: 'deflection', wheels: [each, each], stiffness: as('flexuralStiffness', STEEL.E * I) }).value

const strength = () => {
  const found = flexuralStrength(section(), STEEL, SPAN, 'shear-centre')
  if ('notCovered' in found) throw new Error(found.notCovered)
  return found
}

const FLANGE_FORCES = () =>
  flangeForces(
    section(),
    { H: as('force', 24e3), P: as('force', 309.579e3), a: leverArm(section(), mm(131.76)), e: mm(6) },
    working(),
  )

const part = (number: string): string =>
  `F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025, part ${number}`

const read = (
  what: string,
  source: string,
  printed: number,
  unit: string,
  tolerance: number,
  compute: () => number,
  why?: string,
): EvidenceCase => ({
  id: `runway girder: ${what}`,
  what,
  source,
  known: 'read',
  printed,
  unit,
  tolerance,
  compute,
  ...(why === undefined ? {} : { why }),
})

const loads = part('3')
const girder = part('8')

/** Result of the formula that gives this symbol in the derivation of the girder's strength. */
const inStrength = (symbol: string): number => {
  const step = strength().working.steps.find((each) => each.step === 'rule' && each.rule.symbol === symbol)
  if (step?.step !== 'rule') throw new Error(`the derivation has no ${symbol}`)
  return step.result
}

const force = (kN: number) => as('force', kN * 1e3)
const kNm = (value: number) => as('moment', value * 1e3)

export const RUNWAY_GIRDER: readonly EvidenceCase[] = [
  read('greatest wheel load', loads, 161.23913, 'kN', 5e-6, () => wheelLoads(CRANE, 0).greatest[0]! / 1e3),
  read('least wheel load', loads, 53.76087, 'kN', 5e-6, () => wheelLoads(CRANE, 0).least![0]! / 1e3),
  read('depth', girder, 684, 'mm', 0.5, () => section().depth * 1e3),
  read('area', girder, 15_700, 'mm2', 0.5, () => section().A * 1e6),
  read('centroid below the top', girder, 269.64968, 'mm', 5e-6, () => (section().depth - section().yBar) * 1e3),
  read('Ix', girder, 1_265_593_407, 'mm4', 0.5, () => section().Ix * 1e12),
  read('Sx top', girder, 4_693_473, 'mm3', 0.5, () => section().SxTop * 1e9),
  read('Sx bottom', girder, 3_054_404, 'mm3', 0.5, () => section().SxBottom * 1e9),
  read('plastic axis below the top', girder, 126.25, 'mm', 0.005, () => (section().depth - section().yPlastic) * 1e3),
  read('Zx', girder, 3_969_188, 'mm3', 0.5, () => section().Zx * 1e9),
  read('J', girder, 1_272_933, 'mm4', 0.5, () => section().J * 1e12),
  read('Iy', girder, 89_715_233, 'mm4', 0.5, () => section().Iy * 1e12),
  read('hc', girder, 499.299, 'mm', 5e-4, () => section().hc * 1e3),
  read('hp', girder, 212.5, 'mm', 0.05, () => section().hp * 1e3),
  read('ho', girder, 667, 'mm', 0.05, () => section().ho * 1e3),
  read('aw', girder, 0.57063, '', 5e-6, () => section().aw),
  read(
    'rt by the short form F4-11',
    girder,
    96.549,
    'mm',
    5e-4,
    () => section().rt * 1e3,
    'the notes print 97.986 mm from the longer form of older editions; AISC 360-22 F4-11 has the short one',
  ),
  read(
    'greatest moment without impact',
    girder,
    361.605,
    'kN m',
    0.005,
    () => worst(moment(161.23913e3, 0, 'worst')).value / 1e3,
    'the notes round the coefficient to 2.24266 m',
  ),
  read(
    'factored moment, dead load added at station 2.90 m',
    girder,
    707.267,
    'kN m',
    0.005,
    () => worst(moment(309.579e3, 1947.14, 2.9)).value / 1e3,
    'the notes add dead load where the live load is worst; the program seeks the worst place of the sum, which is greater',
  ),
  read('couple on the flanges', girder, 7.8856, 'kN', 5e-5, () => FLANGE_FORCES().bottom / 1e3),
  read('lateral force on the top flange', girder, 31.8856, 'kN', 5e-5, () => FLANGE_FORCES().top / 1e3),
  read(
    'lateral moment of the top flange',
    girder,
    71.509,
    'kN m',
    0.005,
    () => worst(moment(31.8856e3, 0, 'worst')).value / 1e3,
    'the notes round the coefficient to 2.24266 m',
  ),
  read('strength, yielding governs with Cb 1.2146', girder, 1232.433, 'kN m', 5e-4, () => {
    const { cap, buckling } = strength()
    const M_n = as('moment', Math.min(cap, 1.21458 * buckling!))
    return availableFlexure(working(), 'LRFD', M_n) / 1e3
  }),
  read(
    'strength of the top flange sideways',
    girder,
    190.181,
    'kN m',
    5e-4,
    () => (0.9 * topFlangeStrength(section(), STEEL).M_n) / 1e3,
  ),
  read(
    'yielding at the bottom flange, Rpt Myt = Mp',
    girder,
    1369.37,
    'kN m',
    0.005,
    () => strength().bottomYield / 1e3,
  ),
  read('web plastification factor of the compression flange', girder, 0.84568, '', 5e-6, () => inStrength('R_pc')),
  read(
    'stress FL by F4-6b',
    girder,
    224.519,
    'MPa',
    0.001,
    () => inStrength('F_L') / 1e6,
    'the notes multiply by the ratio rounded to 0.65078',
  ),
  read(
    'flexural buckling stress by E3-2',
    girder,
    167.913,
    'MPa',
    5e-4,
    () => {
      const { elastic } = compressiveStrength(section(), STEEL, SPAN, SPAN)
      return E3_FN.value({ F_y: STEEL.F_y, F_e: as('stress', elastic.y / section().A) }) / 1e6
    },
    'the notes stop at E3; the program also takes E4 (one axis of symmetry) and E7 (slender web), which give less',
  ),
  read(
    'interaction H1-1b with the notes’ own figures',
    girder,
    0.96438,
    '',
    5e-6,
    () =>
      H1_1.value({
        P_r: force(68.8),
        P_c: force(2372.61),
        M_rx: kNm(707.267),
        M_cx: kNm(1232.433),
        M_ry: kNm(71.509),
        M_cy: kNm(190.181),
      }),
    'formula alone: the notes’ C_b of 1.2146, their r_t and their axial strength stand behind these figures',
  ),
  read(
    'elastic buckling load about y',
    girder,
    200.527 * 15_700e-3,
    'kN',
    0.02,
    () => compressiveStrength(section(), STEEL, SPAN, SPAN).elastic.y / 1e3,
    'printed as a stress of 200.527 MPa on 15 700 mm2',
  ),
  read(
    'vertical deflection, pair centred on the span',
    girder,
    8.26725,
    'mm',
    5e-6,
    () => deflection(161.23913e3, section().Ix),
    'the greatest deflection of this pair is at midspan with the pair centred',
  ),
  read('lateral deflection under 10 % of the wheel load', girder, 14.642, 'mm', 5e-4, () =>
    deflection(16.123913e3, section().top.I),
  ),
  read('lateral deflection under 15 kN a wheel', girder, 13.621, 'mm', 5e-4, () => deflection(15e3, section().top.I)),
]
