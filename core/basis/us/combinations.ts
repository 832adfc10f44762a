/** Load combinations of ASCE 7-22 chapter 2 and the sets of cranes that act together. */
import { chapter } from '../../formula/chapter.ts'
import type { Basis, Crane } from '../../job/types.ts'
import type { Clause } from '../../sources/clause.ts'

export interface Combination {
  readonly name: string
  readonly clause: Clause
  readonly text: string
  /** Factors on dead load and on live load, crane forces included. */
  readonly dead: number
  readonly live: number
}

const strength = chapter('ASCE 7-22', '2.3')
const allowable = chapter('ASCE 7-22', '2.4')

const LRFD: readonly Combination[] = [
  {
    name: '1.2D + 1.6L',
    clause: strength.clause('2.3.1'),
    text: 'dead load 1.2, crane and live load 1.6',
    dead: 1.2,
    live: 1.6,
  },
  { name: '1.4D', clause: strength.clause('2.3.1'), text: 'dead load alone 1.4', dead: 1.4, live: 0 },
]
const ASD: readonly Combination[] = [
  { name: 'D + L', clause: allowable.clause('2.4.1'), text: 'dead, crane and live load 1.0', dead: 1, live: 1 },
]

/**
 * Combinations that can govern a simple span. 0.9D is left out: dead load relieves no effect of a girder that bears
 * downward loads only.
 */
export const combinationsOf = (method: Basis['method']): readonly Combination[] => (method === 'LRFD' ? LRFD : ASD)

/** What each crane of a set brings, as parts of its full forces. */
export interface Share {
  readonly vertical: number
  readonly impact: number
  readonly sideThrust: number
  readonly longitudinal: number
}

export interface Together {
  readonly name: string
  /** Crane index -> its share; in the order the cranes stand. */
  readonly shares: ReadonlyMap<number, Share>
}

const EVERYTHING: Share = { vertical: 1, impact: 1, sideThrust: 1, longitudinal: 1 }
const VERTICAL: Share = { vertical: 1, impact: 0, sideThrust: 0, longitudinal: 0 }

/**
 * Sets of cranes that act together (common practice).
 * 'building': one crane with everything; two neighbours, with impact, side thrust and longitudinal force of one of them.
 * 'half-both': the same, and two neighbours with half the side thrust and half the longitudinal force of both, impact of one.
 */
export function setsOfCranes(basis: Basis, cranes: readonly Crane[]): readonly Together[] {
  if (typeof basis.cranesTogether !== 'string') {
    return basis.cranesTogether.map((set, index) => ({
      name: `set ${index + 1}`,
      shares: new Map([...set].sort(([a], [b]) => a - b)),
    }))
  }
  const name = (index: number): string => cranes[index]!.name
  const sets: Together[] = cranes.map((crane, index) => ({
    name: `${crane.name} alone`,
    shares: new Map([[index, EVERYTHING]]),
  }))
  for (let left = 0; left + 1 < cranes.length; left++) {
    for (const full of [left, left + 1]) {
      const other = full === left ? left + 1 : left
      sets.push({
        name: `${name(full)} in full, ${name(other)} vertical`,
        shares: inOrder([full, EVERYTHING], [other, VERTICAL]),
      })
      if (basis.cranesTogether === 'half-both') {
        const half = { vertical: 1, sideThrust: 0.5, longitudinal: 0.5 }
        sets.push({
          name: `both with half thrust, impact of ${name(full)}`,
          shares: inOrder([full, { ...half, impact: 1 }], [other, { ...half, impact: 0 }]),
        })
      }
    }
  }
  return sets
}

const inOrder = (...shares: [number, Share][]): ReadonlyMap<number, Share> => new Map(shares.sort(([a], [b]) => a - b))

/** Groups of neighbours within a set that may stand on one span while the others are off it, each once. */
export function groupsOf(sets: readonly Together[]): readonly (readonly number[])[] {
  const groups = new Map<string, readonly number[]>()
  for (const set of sets) {
    const cranes = [...set.shares.keys()]
    for (let from = 0; from < cranes.length; from++) {
      for (let to = from + 1; to <= cranes.length; to++) {
        const group = cranes.slice(from, to)
        groups.set(group.join(), group)
      }
    }
  }
  return [...groups.values()].sort((a, b) => a.length - b.length || a[0]! - b[0]!)
}
