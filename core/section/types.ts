/**
 * Properties of a make-up, in SI. x is the strong axis (horizontal), y the vertical one; "top" is the flange under the rail,
 * which is the compression flange of a simple span. Heights are measured up from the bottom face.
 */
import type { CubicMetre, KilogramPerMetre, Metre, Metre4, Metre6, SquareMetre } from '../quantity/kinds.ts'

/** A flange (with its cap) bending about the vertical axis. */
export interface FlangeSystem {
  readonly A: SquareMetre
  /** Height of its own centroid above the girder's bottom face. */
  readonly height: Metre
  readonly I: Metre4
  readonly S: CubicMetre
  readonly Z: CubicMetre
  /** Overall width across. */
  readonly width: Metre
}

export interface Section {
  /** 'rolled' alone has handbook figures; 'capped' is rolled with a cap; 'plated' is welded from plates. */
  readonly makeUp: 'rolled' | 'capped' | 'plated'
  readonly doublySymmetric: boolean

  readonly A: SquareMetre
  /** Overall depth, cap included. */
  readonly depth: Metre
  /** Height of the centroid. */
  readonly yBar: Metre
  readonly Ix: Metre4
  readonly Iy: Metre4
  readonly SxTop: CubicMetre
  readonly SxBottom: CubicMetre
  readonly Sy: CubicMetre
  /** Height of the plastic neutral axis of bending about x. */
  readonly yPlastic: Metre
  readonly Zx: CubicMetre
  readonly Zy: CubicMetre
  readonly J: Metre4
  readonly Cw: Metre6
  readonly rx: Metre
  readonly ry: Metre
  /** Height of the shear centre. */
  readonly yShear: Metre
  readonly massPerLength: KilogramPerMetre

  /** The I alone, without cap: depth, flanges, web, clear web height h = d - 2k (rolled) or between flanges (welded). */
  readonly d: Metre
  readonly tw: Metre
  readonly h: Metre
  readonly topFlange: { readonly width: Metre; readonly thickness: Metre; readonly k: Metre }
  readonly bottomFlange: { readonly width: Metre; readonly thickness: Metre; readonly k: Metre }
  /** Thickness of the cap where the rail stands (0 without a cap) and slenderness of its element between welds (0 without). */
  readonly cap: { readonly thickness: Metre; readonly slenderness: number }

  /** Distance between the flanges' centroids, cap and flange taken together. */
  readonly ho: Metre
  /** Effective radius of gyration of F2-7; handbook figure where printed. */
  readonly rts: Metre
  /** Twice the distance from the centroid (hc) and from the plastic axis (hp) to the web's toe at the compression flange. */
  readonly hc: Metre
  readonly hp: Metre
  /** Web area in compression over compression flange area, F4-12: hc tw / (bfc tfc), the cap's area counted with the flange. */
  readonly aw: number
  /** Effective radius of gyration for lateral-torsional buckling, F4-11 or, capped, of flange, cap and a third of the web in compression. */
  readonly rt: Metre
  /** Moments of inertia of the compression and tension flange about the vertical axis, cap included. */
  readonly Iyc: Metre4
  readonly Iyt: Metre4
  readonly top: FlangeSystem
  readonly bottom: FlangeSystem
}
