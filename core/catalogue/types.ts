/** Rolled shapes, steels and rails as published, carried in SI. A figure the source does not give is left out, never guessed. */
import type { CubicMetre, KilogramPerMetre, Metre, Metre4, Metre6, Pascal, SquareMetre } from '../quantity/kinds.ts'

/** Handbook figures of an I shape; x is the strong axis. `rts` and `ho` only where the handbook prints them. */
export interface IShapeFigures {
  readonly A: SquareMetre
  readonly Ix: Metre4
  readonly Sx: CubicMetre
  readonly Zx: CubicMetre
  readonly Iy: Metre4
  readonly Sy: CubicMetre
  readonly Zy: CubicMetre
  readonly J: Metre4
  readonly Cw: Metre6
  readonly rts?: Metre
  readonly ho?: Metre
  readonly massPerLength: KilogramPerMetre
}

/** A rolled I shape: dimensions, fillet given as k (outer face of the flange to the web's toe) and, where published, radius r. */
export interface IShape {
  readonly name: string
  readonly family: string
  readonly source: string
  readonly d: Metre
  readonly bf: Metre
  readonly tw: Metre
  readonly tf: Metre
  readonly k: Metre
  readonly r?: Metre
  /** Figures from the handbook; for a shape of one's own those that were entered. */
  readonly figures: Partial<IShapeFigures>
}

/** A rolled channel. `xBar`: back of the web to the centroid; `eo`: back of the web to the shear centre, as published. */
export interface Channel {
  readonly name: string
  readonly family: string
  readonly source: string
  readonly d: Metre
  readonly bf: Metre
  readonly tw: Metre
  readonly tf: Metre
  readonly k: Metre
  readonly figures: {
    readonly A: SquareMetre
    readonly xBar: Metre
    readonly eo: Metre
    readonly Ix: Metre4
    readonly Sx: CubicMetre
    readonly Zx: CubicMetre
    readonly Iy: Metre4
    readonly Sy: CubicMetre
    readonly Zy: CubicMetre
    readonly J: Metre4
    readonly Cw: Metre6
    readonly massPerLength: KilogramPerMetre
  }
}

export interface Rail {
  readonly name: string
  readonly source: string
  readonly height: Metre
  readonly headWidth: Metre
  readonly footWidth: Metre
  readonly massPerLength: KilogramPerMetre
  readonly Ix?: Metre4
}

export interface Steel {
  readonly name: string
  readonly source: string
  /** Strengths by thickness: the first step whose `upTo` is not below the thickness holds; the last has no `upTo`. */
  readonly steps: readonly { readonly upTo?: Metre; readonly fy: Pascal; readonly fu: Pascal }[]
}

/** What can be looked up. Names are found whatever their case, spaces and hyphens; x, X and the multiplication sign are the same. */
export interface Catalogue {
  readonly iShapes: readonly IShape[]
  readonly channels: readonly Channel[]
  readonly rails: readonly Rail[]
  readonly steels: readonly Steel[]
  iShape(name: string): IShape | undefined
  channel(name: string): Channel | undefined
  rail(name: string): Rail | undefined
  steel(name: string): Steel | undefined
  /** Up to five names of the family nearest to what was typed, best first. */
  nearest(family: 'iShape' | 'channel' | 'rail' | 'steel', name: string): readonly string[]
}
