/** A job, read and completed with its defaults: SI, shapes looked up. Optional entries without a default stay optional. */
import type { KilogramPerMetre, Metre, Newton, NewtonPerMetre, Pascal, Metre4, UnitSystem } from '../quantity/kinds.ts'
import type { Channel, IShape } from '../catalogue/types.ts'

export interface Job {
  readonly project: {
    readonly title: string
    readonly number?: string
    readonly client?: string
    readonly site?: string
    readonly subject?: string
    readonly preparedBy?: string
    readonly checkedBy?: string
    readonly date?: string
    readonly notes?: string
  }
  readonly units: UnitSystem
  readonly basis: Basis
  readonly cranes: readonly Crane[]
  readonly runway: Runway
  readonly girder: Girder
  /** SHA-256 of the job as entered, hex. */
  readonly fingerprint: string
  /** What stood in the file, leaf by leaf, in its own order. */
  readonly entered: readonly { readonly path: string; readonly value: string }[]
  /** Paths whose value is a default, with where it comes from: `cranes[0].bumperOverhang` -> "0.6 m, ...". */
  readonly defaults: readonly DefaultTaken[]
}

export interface DefaultTaken {
  readonly path: string
  readonly value: string
  readonly source: string
}

export interface Basis {
  readonly standard: 'us'
  readonly method: 'LRFD' | 'ASD'
  readonly sideThrust: 'building'
  /** Part of the side thrust that this rail takes, 0 to 1. */
  readonly sideThrustShare: number
  readonly sideThrustPerWheel: 'equal' | 'by-load'
  /** 'standard' or a fraction of the wheel load. */
  readonly impact: 'standard' | number
  readonly cb: 'one' | 'diagram'
  readonly loadHeight: 'shear-centre' | 'rail'
  readonly craneDeadFactor: 'as-live' | 'split'
  readonly cranesTogether: 'building' | 'half-both' | readonly CraneSet[]
  /** n of span/n; undefined: by service class. */
  readonly deflection: { readonly vertical?: number; readonly lateral?: number }
}

/** One set of cranes acting together; a crane that is not named is away. Keys are indices of `cranes`. */
export type CraneSet = ReadonlyMap<
  number,
  { readonly vertical: number; readonly impact: number; readonly sideThrust: number; readonly longitudinal: number }
>

export interface Crane {
  readonly name: string
  readonly ratedCapacity: Newton
  readonly bridgeWeight?: Newton
  readonly trolleyWeight?: Newton
  readonly belowHook: Newton
  readonly bridgeSpan: Metre
  readonly hookApproach: Metre
  readonly hookApproachFar: Metre
  readonly operation: 'cab' | 'remote' | 'pendant' | 'hand'
  readonly bridgeDrive: 'powered' | 'hand'
  readonly trolleyDrive: 'powered' | 'hand'
  readonly hoistDrive: 'powered' | 'hand'
  readonly serviceClass: 'A' | 'B' | 'C' | 'D' | 'E' | 'F'
  readonly wheelSpacings: readonly Metre[]
  readonly wheelLoad: readonly Newton[] | 'derive'
  readonly leastWheelLoad: readonly Newton[] | 'derive'
  readonly emptyWheelLoad: readonly Newton[] | 'derive'
  readonly bumperOverhang: readonly [first: Metre, last: Metre]
}

export interface Runway {
  readonly spans: readonly Metre[]
  readonly continuity: 'simple'
  readonly eitherWay: boolean
  readonly checkSpan?: number
  /** Undefined: the span itself. */
  readonly unbracedLength?: Metre
  readonly unbracedLengthBottom?: Metre
  readonly rail: {
    readonly name: string
    /** As rolled; the worn height is height - wear. */
    readonly height: Metre
    readonly headWidth: Metre
    readonly footWidth: Metre
    readonly massPerLength: KilogramPerMetre
    readonly Ix?: Metre4
    readonly wear: Metre
    /** Undefined: 3/4 of the web's thickness. */
    readonly eccentricity?: Metre
  }
  readonly bearingLength?: Metre
  readonly bracketEccentricity?: Metre
  readonly endDistance?: Metre
}

export interface Plate {
  readonly width: Metre
  readonly thickness: Metre
}

export type Cap =
  { readonly kind: 'channel'; readonly channel: Channel } | { readonly kind: 'plate'; readonly plate: Plate }

export type SectionEntry =
  | { readonly kind: 'rolled'; readonly shape: IShape; readonly cap?: Cap }
  | {
      readonly kind: 'plated'
      readonly topFlange: Plate
      readonly web: { readonly depth: Metre; readonly thickness: Metre }
      readonly bottomFlange: Plate
      readonly cap?: Cap
    }

export interface SteelEntry {
  readonly name: string
  readonly fy: Pascal
  readonly fu: Pascal
  readonly E: Pascal
}

export interface Girder {
  readonly section: SectionEntry
  readonly steel: SteelEntry
  /** Undefined: the girder's own steel; a cap plate of `plateSteel` has it here as well. */
  readonly capSteel?: SteelEntry
  /** Of a welded girder's plates; undefined: the girder's own steel. */
  readonly plateSteel?: SteelEntry
  readonly addedDeadLoad: NewtonPerMetre
  readonly addedLiveLoad: NewtonPerMetre
}
