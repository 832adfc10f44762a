/**
 * What the rules ask of the moving wheels, and what they get back. Stations run left to right from the first
 * support; downward loads and deflections, sagging moments and upward reactions are positive; shear is positive
 * when the left part pushes up. All in m, N, N m.
 */
import type { Metre, Newton, NewtonMetre, NewtonPerMetre, NewtonSquareMetre } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'

/** The girder line: spans from bearing to bearing, each its own girder where `continuity` is simple. */
export interface Beam {
  readonly continuity: 'simple'
  readonly spans: readonly Metre[]
}

/**
 * One addend of an effect: `factor` times a moment that the given wheels and dead load cause.
 * `at` names a fixed station along the runway, or 'worst' for the greatest sagging moment anywhere in the span at that position
 * of the train, or 'same' for the station found for the first term: such a term has factor 0, it is reported, not searched.
 */
export interface MomentTerm {
  readonly factor: number
  readonly at: Metre | 'worst' | 'same'
  /** Force of each wheel of the train, in the train's order: vertical or horizontal, with all its factors. */
  readonly wheels: readonly number[]
  /** Force per length over the whole span. */
  readonly uniform: NewtonPerMetre
  /** Moments entering at the left and right end of the span, sagging positive, linear between. */
  readonly ends: readonly [left: NewtonMetre, right: NewtonMetre]
}

/** What is to be made worst over every position of the train. */
export type Effect =
  | { readonly kind: 'moments'; readonly terms: readonly MomentTerm[] }
  /** Greatest shear at either end of the span, both sides of each wheel read. */
  | { readonly kind: 'shear'; readonly wheels: readonly number[]; readonly uniform: NewtonPerMetre }
  /** Reaction of one end of one girder. */
  | {
      readonly kind: 'endReaction'
      readonly end: 'left' | 'right'
      readonly wheels: readonly number[]
      readonly uniform: NewtonPerMetre
    }
  /** Reaction of a support: of simple girders the sum of the two that rest on it. */
  | {
      readonly kind: 'bracketReaction'
      readonly support: number
      readonly wheels: readonly number[]
      readonly uniform: NewtonPerMetre
    }
  /** Greatest downward deflection anywhere in the span. */
  | { readonly kind: 'deflection'; readonly wheels: readonly number[]; readonly stiffness: NewtonSquareMetre }
  /** One wheel stood at a station: an effect that no position of the train changes (web under a wheel). */
  | { readonly kind: 'stand'; readonly wheel: number; readonly at: Metre; readonly value: number }

export type EffectOf<Kind extends Effect['kind']> = Extract<Effect, { readonly kind: Kind }>

/** The train and the span an effect is asked of. `train` is undefined where only dead load acts. */
export interface Drive {
  readonly beam: Beam
  readonly span: number
  readonly trains: readonly WheelTrain[]
  readonly train: number | undefined
  readonly eitherWay: boolean
}

export type Side = 'left' | 'right' | 'at'

/** A worst value with its place. */
export interface Extreme {
  readonly value: number
  readonly span: number
  readonly station: Metre
  readonly side: Side
  /**
   * Station of the train's first wheel; wheel i stands at lead + offset_i, or lead - offset_i where mirrored. Where cranes
   * of a train are worse apart than bumper to bumper, the others stand as `positions` tells.
   */
  readonly lead: Metre
  readonly mirrored: boolean
  readonly train: number | undefined
  /** By crane: wheel i of its own list stands at lead + offset_i, or lead - offset_i where mirrored. */
  readonly positions: readonly { readonly crane: number; readonly lead: Metre; readonly mirrored: boolean }[]
  /** Wheels (indices in the train) that stand on the span. */
  readonly on: readonly number[]
  /** The terms' own stations and values, in the order asked. */
  readonly terms: readonly { readonly station: Metre; readonly value: NewtonMetre }[]
  /** Effects at the same instant and station, of the first term's wheels. */
  readonly with: { readonly moment: NewtonMetre; readonly shear: Newton }
  /** How the place was found. */
  readonly method: 'exact' | 'refined'
}
