/** The hand a calc sheet is drawn in: paper, columns, colours, sizes of type. Lengths in points, y downward from the top. */

export type Paper = 'a4' | 'letter'

/** Where things stand on a page. */
export interface Frame {
  readonly width: number
  readonly height: number
  readonly left: number
  /** Right edge of everything. */
  readonly right: number
  /** Upper edge of the title block. */
  readonly top: number
  /** Lower edge of the foot. */
  readonly bottom: number
  /** Right edge of what is not clause column. */
  readonly body: number
  /** The rule left of the clause column. */
  readonly clauseRule: number
  readonly clause: number
}

export const COLOUR = {
  ink: '#18222E',
  accent: '#B4430F',
  shade: '#F0EADC',
  hair: '#CFC9BB',
  /** Words that stand back: clauses, defaults, the foot. 5.9:1 on white. */
  grey: '#5A6470',
  paper: '#FFFFFF',
} as const

export type Face = 'regular' | 'semibold'

export interface Style {
  readonly face: Face
  readonly size: number
  readonly colour: string
  /** From one baseline to the next. */
  readonly leading: number
  /** Letterspacing. */
  readonly spacing?: number
}

const style = (face: Face, size: number, leading: number, colour: string = COLOUR.ink): Style => ({
  face,
  size,
  leading,
  colour,
})

export const STYLE = {
  h1: style('semibold', 13, 17),
  h2: style('semibold', 11, 14.5),
  h3: style('semibold', 9.2, 12.5),
  plain: style('regular', 9.2, 12.8),
  note: style('regular', 8.2, 11.2, COLOUR.grey),
  strong: style('semibold', 9.2, 12.8),
  cell: style('regular', 8.4, 11.2),
  cellStrong: style('semibold', 8.4, 11.2),
  clause: style('regular', 7.6, 10, COLOUR.grey),
  caption: style('regular', 8, 10.8, COLOUR.grey),
  foot: style('regular', 7, 9, COLOUR.grey),
  footStrong: style('semibold', 7, 9, COLOUR.accent),
  title: style('regular', 9, 11.4),
  /** Small letterspaced capitals over what they name. */
  label: { ...style('regular', 6.2, 8, COLOUR.grey), spacing: 0.5 },
} as const

/** Formulas: the size of their letters. Their smallest scripts stand at half of it. */
export const FORMULA_SIZE = 11.5

export const POINTS_PER_MM = 72 / 25.4

const SIZES: Readonly<Record<Paper, readonly [width: number, height: number]>> = {
  a4: [595.28, 841.89],
  letter: [612, 792],
}

/** The frame of a paper; the left margin is wide enough for holes, the clause column for a citation on two lines. */
export function frameOf(paper: Paper): Frame {
  const [width, height] = SIZES[paper]
  const right = width - 40
  return {
    width,
    height,
    left: 52,
    right,
    top: 30,
    bottom: height - 26,
    body: right - 86,
    clauseRule: right - 74,
    clause: right - 67,
  }
}
