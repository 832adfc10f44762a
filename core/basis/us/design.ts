/** What every US check reads: the girder, its loads, and the loadings (cranes together x combination) to be tried. */
import type { CraneWheels } from '../../crane/wheels.ts'
import type { WheelTrain } from '../../crane/types.ts'
import { chapter } from '../../formula/chapter.ts'
import { working, type Working } from '../../formula/working.ts'
import type { Job } from '../../job/types.ts'
import { as, STANDARD_GRAVITY, type Metre, type Newton, type NewtonPerMetre } from '../../quantity/kinds.ts'
import type { Section } from '../../section/types.ts'
import { combinationsOf, setsOfCranes, type Combination, type Share, type Together } from './combinations.ts'
import {
  bottomFlangeStrength,
  flangeForces,
  leverArm,
  topFlangeStrength,
  type FlangeForces,
  type FlangeStrength,
} from './flange.ts'
import type { Steel } from './flexure.ts'
import { craneForces, type CraneForces } from './forces.ts'
import { COVER_COMPACT } from './slenderness.ts'

export interface Design {
  readonly job: Job
  readonly section: Section
  /** The lowest yield strength of the parts: one strength for the whole girder. */
  readonly steel: Steel
  readonly wheels: readonly CraneWheels[]
  readonly trains: readonly WheelTrain[]
  readonly forces: readonly CraneForces[]
  readonly dead: NewtonPerMetre
  readonly live: NewtonPerMetre
  readonly deadWorking: Working
  /** Rail head above the centroid of the top flange with its cap; beside the web; above the girder's centroid. */
  readonly railArm: Metre
  readonly eccentricity: Metre
  readonly headAboveCentroid: Metre
  /** Strength of the two flanges about the vertical axis. */
  readonly topFlange: FlangeStrength
  readonly bottomFlange: FlangeStrength
  readonly loadings: readonly Loading[]
  readonly cautions: readonly string[]
}

const DEAD = chapter('statics').formula('dead load', {
  gives: ['g', 'lineLoad'],
  where: { g_girder: 'lineLoad', g_rail: 'lineLoad', g_added: 'lineLoad' },
  text: 'g_girder + g_rail + g_added',
})
const cranes = chapter('ASCE 7-22', '4.9')
const WHEEL = cranes.formula('4.9.3', {
  gives: ['P', 'force'],
  where: { gamma: 'ratio', v: 'ratio', i: 'ratio', I: 'ratio', P_s: 'force' },
  text: 'gamma*(v + i*I)*P_s',
  note: 'heaviest wheel: P_s static, I impact; v and i parts of both that this set of cranes takes, gamma load factor',
})
const SPLIT_WHEEL = cranes.formula('4.9.3', {
  gives: ['P', 'force'],
  where: {
    gamma_D: 'ratio',
    gamma: 'ratio',
    v: 'ratio',
    i: 'ratio',
    I: 'ratio',
    P_s: 'force',
    P_D: 'force',
  },
  text: 'gamma_D*v*P_D + gamma*(v*(P_s - P_D) + i*I*P_s)',
  note: 'heaviest wheel: P_D bridge and trolley in the static load P_s, I impact; v and i parts that this set of cranes takes',
})
const THRUST = cranes.formula('4.9.4', {
  gives: ['H', 'force'],
  where: { gamma: 'ratio', s: 'ratio', H_w: 'force' },
  text: 'gamma*s*H_w',
  note: 'its side thrust H_w, part s taken',
})

/** One combination of one set of cranes with one train on the span; forces factored. */
export interface Loading {
  readonly set: string
  readonly combination: Combination
  /** Undefined: dead load alone. */
  readonly train: number | undefined
  /** By wheel of the train, N: vertical with impact, horizontal on the top and on the bottom flange. */
  readonly vertical: readonly number[]
  readonly top: readonly number[]
  readonly bottom: readonly number[]
  /** Side thrust alone, without the couple. */
  readonly thrust: readonly number[]
  /** Axial force in the girder, N. */
  readonly longitudinal: Newton
  readonly uniform: NewtonPerMetre
  /** How the forces of the heaviest wheel came about. */
  readonly working: Working
}

export const designOf = (
  job: Job,
  section: Section,
  wheels: readonly CraneWheels[],
  trains: readonly WheelTrain[],
): Design => {
  const { girder, runway, basis } = job
  const forces = job.cranes.map((crane, index) => craneForces(basis, crane, wheels[index]!.greatest))
  const on = working()
  const ownWeight = on.given('g_girder', 'lineLoad', as('lineLoad', section.massPerLength * STANDARD_GRAVITY), 'girder')
  const rail = on.given('g_rail', 'lineLoad', as('lineLoad', runway.rail.massPerLength * STANDARD_GRAVITY), 'rail')
  const added = on.given('g_added', 'lineLoad', girder.addedDeadLoad, 'added dead load')
  const dead = on.take(DEAD, { g_girder: ownWeight, g_rail: rail, g_added: added })
  const eccentricity = runway.rail.eccentricity ?? as('length', 0.75 * section.tw)
  const steels = [girder.steel, girder.capSteel, girder.plateSteel].filter((steel) => steel !== undefined)
  const weakest = steels.reduce((a, b) => (b.fy < a.fy ? b : a))
  const steel = { F_y: weakest.fy, E: girder.steel.E }
  const base = {
    job,
    section,
    steel,
    wheels,
    trains,
    forces,
    dead,
    live: girder.addedLiveLoad,
    deadWorking: on,
    topFlange: topFlangeStrength(section, steel),
    bottomFlange: bottomFlangeStrength(section, steel),
    railArm: leverArm(section, runway.rail.height),
    eccentricity,
    headAboveCentroid: as('length', section.depth - section.yBar + runway.rail.height),
  }
  return { ...base, loadings: loadingsOf(base, combinationsOf(basis.method)), cautions: cautionsOf(base) }
}

type Base = Omit<Design, 'loadings' | 'cautions'>

/** Every train in every set of cranes, without load factors: what brackets, stops and bracing are handed. */
export const serviceLoadings = (design: Design): readonly Loading[] => loadingsOf(design, combinationsOf('ASD'))

function loadingsOf(base: Base, combinations: readonly Combination[]): readonly Loading[] {
  const { job, trains } = base
  const sets = setsOfCranes(job.basis, job.cranes)
  const loadings: Loading[] = []
  for (const combination of combinations) {
    const uniform = as('lineLoad', combination.dead * base.dead + combination.live * base.live)
    if (combination.live === 0) {
      const none = {
        vertical: [],
        top: [],
        bottom: [],
        thrust: [],
        longitudinal: as('force', 0),
        working: base.deadWorking,
      }
      loadings.push({ set: 'no crane', combination, train: undefined, uniform, ...none })
      continue
    }
    trains.forEach((train, index) => {
      for (const set of withoutWeaker(sets, train.cranes)) {
        loadings.push({ set: set.name, combination, train: index, uniform, ...factored(base, train, set, combination) })
      }
    })
  }
  return loadings
}

/** Sets that hold all cranes of the train, less those in which no crane brings more than in another. */
function withoutWeaker(sets: readonly Together[], cranes: readonly number[]): readonly Together[] {
  const holding = sets.filter((set) => cranes.every((crane) => set.shares.has(crane)) && neighbours(set, cranes))
  return holding.filter(
    (set, index) =>
      !holding.some(
        (other, at) => at !== index && brings(other, set, cranes) && !(brings(set, other, cranes) && index < at),
      ),
  )
}

/** Cranes of a set that stands between others of the same set cannot be left out. */
function neighbours(set: Together, cranes: readonly number[]): boolean {
  const order = [...set.shares.keys()]
  return order.indexOf(cranes.at(-1)!) - order.indexOf(cranes[0]!) === cranes.length - 1
}

const PARTS = ['vertical', 'impact', 'sideThrust', 'longitudinal'] as const satisfies readonly (keyof Share)[]

/** Whether every crane brings at least as much in `strong` as in `weak`. */
const brings = (strong: Together, weak: Together, cranes: readonly number[]): boolean =>
  cranes.every((crane) => PARTS.every((part) => strong.shares.get(crane)![part] >= weak.shares.get(crane)![part]))

function factored(base: Base, train: WheelTrain, set: Together, { dead, live }: Combination) {
  const { job, section, wheels, forces } = base
  const vertical: number[] = []
  const flanges: FlangeForces[] = []
  const thrust: number[] = []
  let heaviest: Working = { steps: [] }
  for (const wheel of train.wheels) {
    const { vertical: v, impact: i, sideThrust: s } = set.shares.get(wheel.crane)!
    const { impact: I, sideThrust } = forces[wheel.crane]!
    const on = working()
    const parts = { gamma: live, v, i, I, P_s: wheel.load }
    const P_D = job.basis.craneDeadFactor === 'split' ? wheels[wheel.crane]!.dead?.[wheel.wheel] : undefined
    const P = P_D === undefined ? on.take(WHEEL, parts) : on.take(SPLIT_WHEEL, { ...parts, gamma_D: dead, P_D })
    const H = on.take(THRUST, { gamma: live, s, H_w: sideThrust[wheel.wheel]! })
    flanges.push(flangeForces(section, { H, P, a: base.railArm, e: base.eccentricity }, on))
    thrust.push(H)
    if (P > Math.max(0, ...vertical)) heaviest = on
    vertical.push(P)
  }
  const longitudinal = train.cranes.reduce(
    (sum, crane) => sum + live * set.shares.get(crane)!.longitudinal * forces[crane]!.longitudinal,
    0,
  )
  return {
    vertical,
    top: flanges.map((flange) => flange.top),
    bottom: flanges.map((flange) => flange.bottom),
    thrust,
    longitudinal: as('force', longitudinal),
    working: heaviest,
  }
}

function cautionsOf(base: Base): readonly string[] {
  const { job, section, forces, wheels } = base
  const cautions = forces.flatMap((force) => force.cautions)
  if (job.basis.craneDeadFactor === 'split' && wheels.some((crane) => crane.dead === undefined)) {
    cautions.push(
      'The crane’s own weight cannot be told from the wheel loads given, so that the live-load factor stands on the whole wheel load.',
    )
  }
  if (section.cap.thickness > 0) {
    const limit = COVER_COMPACT.value(base.steel)
    if (section.cap.slenderness > limit) {
      cautions.push(
        `The cap between its welds has a width over thickness of ${section.cap.slenderness.toFixed(1)}, above ${limit.toFixed(1)} of AISC 360-22 Table B4.1b case 18; F4 has no formula for its buckling: judge it.`,
      )
    }
  }
  return cautions
}
