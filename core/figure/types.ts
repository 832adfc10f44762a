/**
 * A drawing as lines, areas and texts with roles. Lengths in millimetres on paper, x to the right, y downward, so that any
 * renderer draws the same one: SVG takes them as user units, a PDF scales them. Colour, weight and face belong to the role.
 */

/** What a stroke or a text stands for; the renderer knows how each looks. */
export type Role =
  /** Outline of what is drawn. */
  | 'ink'
  /** Thinner parts of it, and the present state of a diagram. */
  | 'thin'
  /** Baselines, grids. */
  | 'hair'
  /** Dimension lines and their texts. */
  | 'dimension'
  /** Centre lines, chain-dotted. */
  | 'centre'
  /** What governs: the resultant, dashed in the accent. */
  | 'accent'
  /** An envelope's edge. */
  | 'envelope'

export type Fill = 'shade' | 'solid' | 'hatch' | 'accentHatch' | 'paper'

export type Point = readonly [x: number, y: number]

export type Item =
  | { readonly item: 'line'; readonly points: readonly Point[]; readonly role: Role }
  | {
      readonly item: 'area'
      readonly points: readonly Point[]
      readonly fill: Fill
      /** Outline; none where left out. */
      readonly role?: Role
    }
  | {
      readonly item: 'circle'
      readonly centre: Point
      readonly radius: number
      readonly fill?: Fill
      readonly role: Role
    }
  | { readonly item: 'arrow'; readonly from: Point; readonly to: Point; readonly role: Role }
  | {
      readonly item: 'text'
      readonly at: Point
      readonly text: string
      readonly role: Role
      readonly anchor: 'start' | 'middle' | 'end'
      /** Degrees, clockwise. */
      readonly turn?: number
    }

export interface Figure {
  readonly width: number
  readonly height: number
  readonly items: readonly Item[]
  /** What the drawing says, for one who cannot see it. */
  readonly alt: string
}
