/** Wheel loads moving over a simple span, against printed problems and handbook formulas. */
import type { WheelTrain } from '../crane/types.ts'
import { as } from '../quantity/kinds.ts'
import { inUnit, UNIT, type Unit } from '../quantity/units.ts'
import { drive } from '../travel/drive.ts'
import type { Effect } from '../travel/types.ts'
import type { EvidenceCase } from './types.ts'

interface Problem {
  readonly length: Unit
  readonly force: Unit
  readonly span: number
  readonly loads: readonly number[]
  readonly spacings: readonly number[]
}

/** The problem's train on its span, or on several of that length, asked for one effect. */
function worst(problem: Problem, ask: (wheels: readonly number[]) => Effect, spans = 1) {
  const { length, force, span, loads, spacings } = problem
  const wheels = loads.map((load, index) => ({
    crane: 0,
    wheel: index,
    offset: as('distance', spacings.slice(0, index).reduce((a, b) => a + b, 0) * UNIT[length]),
    load: as('force', load * UNIT[force]),
  }))
  const train: WheelTrain = { cranes: [0], turned: [false], wheels, mayMirror: true }
  const beam = {
    continuity: 'simple',
    spans: Array.from({ length: spans }, () => as('distance', span * UNIT[length])),
  } as const
  const effect = ask(wheels.map((wheel) => wheel.load))
  return drive({ beam, span: 0, trains: [train], train: 0, eitherWay: true }, effect)
}

const none = as('lineLoad', 0)
const noEnds = [as('moment', 0), as('moment', 0)] as const

const moment = (wheels: readonly number[]): Effect => ({
  kind: 'moments',
  terms: [{ factor: 1, at: 'worst', wheels, uniform: none, ends: noEnds }],
})
const shear = (wheels: readonly number[]): Effect => ({ kind: 'shear', wheels, uniform: none })
const reaction = (wheels: readonly number[], uniform = none): Effect => ({
  kind: 'endReaction',
  end: 'left',
  wheels,
  uniform,
})

/** The greatest reaction of the support between two such spans, in loads of one wheel. */
const bracketInWheels = (problem: Problem): number => {
  const asked = (wheels: readonly number[]): Effect => ({ kind: 'bracketReaction', support: 1, wheels, uniform: none })
  return worst(problem, asked, 2).value / (problem.loads[0]! * UNIT[problem.force])
}

const KASSIMALI: Problem = { length: 'm', force: 'kN', span: 15, loads: [125, 100, 50], spacings: [2, 3] }
const GERE: Problem = { length: 'm', force: 'kN', span: 12, loads: [10, 20], spacings: [2.4] }
const UNEQUAL: Problem = { length: 'm', force: 'kN', span: 10, loads: [40, 80], spacings: [3] }
const CARRASCO: Problem = { length: 'm', force: 'kN', span: 7.5, loads: [161.239, 161.239], spacings: [3.4] }
const TWENTY_TON: Problem = { length: 'ft', force: 'kip', span: 30, loads: [38.1, 38.1], spacings: [12] }
const GANTRY: Problem = { length: 'm', force: 'kN', span: 10, loads: [125, 125], spacings: [3.6] }

const kassimali = 'Kassimali, Structural Analysis, 6th ed., Problem 9.22'
const gere = 'Gere, Mechanics of Materials, Problem 4.5-30'
const carrasco = 'F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025, part 8'
const table323 = 'AISC Manual, Table 3-23, two equal moving loads'
const theory = 'arizval.com, Theory of Structures, module 4, two unequal moving loads'
const gantry = 'Design of gantry girder, published calculation sheet'

export const MOVING_LOADS: readonly EvidenceCase[] = [
  {
    id: 'kassimali-9-22-moment',
    what: 'absolute maximum moment of three unequal loads',
    source: kassimali,
    known: 'arithmetic from the source’s inputs',
    printed: 831.86,
    unit: 'kN m',
    tolerance: 0.005,
    compute: () => inUnit(worst(KASSIMALI, moment).value, 'kN m'),
  },
  {
    id: 'kassimali-9-22-station',
    what: 'station of the governing load',
    source: kassimali,
    known: 'arithmetic from the source’s inputs',
    printed: 7.682,
    unit: 'm',
    tolerance: 0.0005,
    compute: () => worst(KASSIMALI, moment).station,
  },
  {
    id: 'gere-4-5-30-shear',
    what: 'greatest shear of loads P and 2P',
    source: gere,
    known: 'read',
    printed: 28,
    unit: 'kN',
    tolerance: 0.05,
    compute: () => inUnit(Math.abs(worst(GERE, shear).value), 'kN'),
  },
  {
    id: 'gere-4-5-30-moment',
    what: 'absolute maximum moment of loads P and 2P',
    source: gere,
    known: 'from memory',
    printed: 78.4,
    unit: 'kN m',
    tolerance: 0.05,
    compute: () => inUnit(worst(GERE, moment).value, 'kN m'),
  },
  {
    id: 'two-unequal-moment',
    what: 'absolute maximum moment of 40 and 80 kN',
    source: theory,
    known: 'arithmetic from the source’s inputs',
    printed: 243,
    unit: 'kN m',
    tolerance: 0.05,
    compute: () => inUnit(worst(UNEQUAL, moment).value, 'kN m'),
  },
  {
    id: 'two-unequal-shear',
    what: 'greatest shear of 40 and 80 kN',
    source: theory,
    known: 'arithmetic from the source’s inputs',
    printed: 108,
    unit: 'kN',
    tolerance: 0.05,
    compute: () => inUnit(Math.abs(worst(UNEQUAL, shear).value), 'kN'),
  },
  {
    id: 'two-equal-7-5-m-moment',
    what: 'absolute maximum moment of two wheels 3.4 m apart on 7.5 m',
    source: carrasco,
    known: 'read',
    printed: 361.6,
    unit: 'kN m',
    tolerance: 0.05,
    compute: () => inUnit(worst(CARRASCO, moment).value, 'kN m'),
  },
  {
    id: 'two-equal-7-5-m-reaction',
    what: 'greatest bracket reaction between two such spans, in wheel loads: both girders together',
    source: carrasco,
    known: 'read',
    printed: 1.54667,
    unit: '',
    tolerance: 0.000005,
    compute: () => bracketInWheels(CARRASCO),
  },
  {
    id: 'two-equal-7-5-m-shear',
    what: 'greatest shear of two wheels 3.4 m apart on 7.5 m',
    source: carrasco,
    known: 'arithmetic from the source’s inputs',
    printed: 249.38,
    unit: 'kN',
    tolerance: 0.005,
    compute: () => inUnit(Math.abs(worst(CARRASCO, shear).value), 'kN'),
  },
  {
    id: 'two-equal-30-ft-moment',
    what: 'absolute maximum moment of two 38.1 kip wheels 12 ft apart on 30 ft',
    source: table323,
    known: 'from memory',
    printed: 365.76,
    unit: 'kip ft',
    tolerance: 0.005,
    compute: () => inUnit(worst(TWENTY_TON, moment).value, 'kip ft'),
  },
  {
    id: 'two-equal-30-ft-shear',
    what: 'greatest shear of two 38.1 kip wheels 12 ft apart on 30 ft',
    source: table323,
    known: 'from memory',
    printed: 60.96,
    unit: 'kip',
    tolerance: 0.005,
    compute: () => inUnit(Math.abs(worst(TWENTY_TON, shear).value), 'kip'),
  },
  {
    id: 'gantry-reaction',
    what: 'greatest reaction of two 125 kN wheels with 0.3 kN/m of rail',
    source: gantry,
    known: 'read',
    printed: 206.5,
    unit: 'kN',
    tolerance: 0.05,
    compute: () => inUnit(worst(GANTRY, (wheels) => reaction(wheels, as('lineLoad', 300))).value, 'kN'),
  },
  {
    id: 'gantry-moment',
    what: 'absolute maximum moment of two 125 kN wheels 3.6 m apart on 10 m',
    source: gantry,
    known: 'arithmetic from the source’s inputs',
    printed: 420.25,
    unit: 'kN m',
    tolerance: 0.005,
    compute: () => inUnit(worst(GANTRY, moment).value, 'kN m'),
  },
]
