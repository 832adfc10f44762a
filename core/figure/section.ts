/** The cross-section of a girder with its rail: to scale, with dimensions, axes and what acts on the rail. */
import type { Runway, SectionEntry } from '../job/types.ts'
import { as, type UnitSystem } from '../quantity/kinds.ts'
import { writeQuantity } from '../quantity/write.ts'
import { sectionName } from '../section/name.ts'
import type { Section } from '../section/types.ts'
import { ABOVE, over, tick } from './dimension.ts'
import { EDGE, spread } from './layout.ts'
import { outlinesOf, railOutline } from './outline.ts'
import { LINE, RISE, boxOf, textWidth } from './text.ts'
import { NOTE, noteItems, notesOf } from './section-notes.ts'
import type { Figure, Item, Point } from './types.ts'
import { forceText } from './wheel-loads.ts'

export interface SectionShown {
  readonly units: UnitSystem
  /** Of the figure, mm; 110 or more. */
  readonly width: number
  readonly rail: Runway['rail']
  /** On the rail's head, N; drawn where given. */
  readonly wheelLoad?: number
  readonly sideThrust?: number
}

const LEAST_WIDTH = 110
/** Greatest height and width of girder with rail on paper, mm and part of the figure's width. */
const TALLEST = 62
const WIDEST = 0.34
/** Left of the section: two dimension lines with their texts. */
const LEFT = 14
const ARROW = 9

/**
 * Girder, cap and rail in cross-section, both directions to the same scale. Heights of the centroid and of the plastic axis are
 * measured up from the bottom face. Throws RangeError for less than 110 mm.
 */
export const sectionFigure = (section: Section, entry: SectionEntry, shown: SectionShown): Figure => {
  const { units, width, rail, wheelLoad, sideThrust } = shown
  if (!(width >= LEAST_WIDTH && width < Infinity)) throw new RangeError(`a figure of ${width} mm`)
  const railHeight = rail.height - rail.wear
  const widest = Math.max(section.top.width, section.bottom.width, rail.footWidth, rail.headWidth)
  const perMetre = Math.min(TALLEST / (section.depth + railHeight), (WIDEST * width) / widest)
  const half = (widest * perMetre) / 2
  const length = (metres: number): string => writeQuantity({ kind: 'length', value: as('length', metres) }, units)

  const acting = wheelLoad !== undefined || sideThrust !== undefined
  const head = EDGE + (acting ? LINE + 0.6 + ARROW : 0)
  const top = head + railHeight * perMetre
  const bottom = top + section.depth * perMetre
  const push = sideThrust === undefined ? '' : `side thrust ${forceText(sideThrust, units)}`
  const headHalf = (rail.headWidth * perMetre) / 2
  const centre = Math.max(LEFT + half, EDGE + textWidth(push) + headHalf + 1.5)
  const paper = ([x, y]: Point): Point => [centre + x * perMetre, bottom - y * perMetre]

  const steel = outlinesOf(entry).map(({ points }): Item => {
    return { item: 'area', points: points.map(paper), fill: 'hatch', role: 'ink' }
  })
  const railArea: Item = {
    item: 'area',
    points: railOutline({ ...rail, height: railHeight }, section.depth).map(paper),
    fill: 'shade',
    role: 'ink',
  }
  const inner = centre - half - 4.5
  // Below the words of the side thrust.
  const room = [Math.max(top - 0.5, head + 2), bottom] as const
  const heights = upright(
    inner,
    [bottom, bottom - section.yBar * perMetre, top],
    [section.yBar, section.depth - section.yBar],
    length,
    room,
  )
  const depth = upright(inner - 5, [bottom, top], [section.depth], length, room)
  const foot = bottom + 1.5 + ABOVE
  const from = centre - (section.bottom.width * perMetre) / 2
  const to = centre + (section.bottom.width * perMetre) / 2
  const lowest = [...heights, ...depth].flatMap((item) => (item.item === 'text' ? [boxOf(item).bottom] : []))
  const extension = (points: readonly Point[]): Item => ({ item: 'line', points, role: 'hair' })
  const bottomWidth: readonly Item[] = [
    extension([
      [from, bottom + 0.6],
      [from, foot + 0.8],
    ]),
    extension([
      [to, bottom + 0.6],
      [to, foot + 0.8],
    ]),
    {
      item: 'line',
      points: [
        [from, foot],
        [to, foot],
      ],
      role: 'dimension',
    },
    tick([from, foot]),
    tick([to, foot]),
    { item: 'text', at: [centre, over(foot)], text: length(section.bottom.width), role: 'dimension', anchor: 'middle' },
  ]
  const edges: readonly Item[] = [
    extension([
      [inner - 5.8, top],
      [centre - (section.top.width * perMetre) / 2 - 0.6, top],
    ]),
    extension([
      [inner - 5.8, bottom],
      [from - 0.6, bottom],
    ]),
  ]
  const reach = centre + half + 3
  const axis = (height: number): Item => ({
    item: 'line',
    points: [
      [height === section.yBar ? inner : inner + 1, bottom - height * perMetre],
      [reach, bottom - height * perMetre],
    ],
    role: 'centre',
  })
  const axes = section.doublySymmetric ? [section.yBar] : [section.yBar, section.yPlastic]
  const notes = notesOf(section, entry, rail, length).map(({ at: [x, y], texts }) => ({ at: paper([x, y]), texts }))
  const column = reach + 3.5
  const noteFoot = Math.max(foot + 0.8, head + 1.1 + notes.length * NOTE)
  return {
    width,
    height: Math.max(noteFoot, ...lowest) + EDGE,
    items: [
      ...steel,
      railArea,
      ...axes.map(axis),
      ...edges,
      ...heights,
      ...depth,
      ...bottomWidth,
      ...noteItems(notes, { column, reach, width, from: head + 1, to: noteFoot }),
      ...(acting
        ? actions([centre, head], headHalf, wheelLoad === undefined ? '' : forceText(wheelLoad, units), push)
        : []),
    ],
    alt: altText(section, entry, shown, length),
  }
}

/** A vertical chain of dimensions at x, from below upward; texts stand upright left of it, moved apart where they would meet. */
const upright = (
  x: number,
  marks: readonly number[],
  metres: readonly number[],
  length: (metres: number) => string,
  [from, bottom]: readonly [number, number],
): readonly Item[] => {
  const texts = metres.map(length)
  const sizes = texts.map((text) => textWidth(text) + 1.2)
  const total = sizes.reduce((sum, size) => sum + size, 0)
  const wanted = texts.map((_, i) => (marks[i]! + marks[i + 1]!) / 2)
  // Listed from below upward; on paper the uppermost comes first.
  const centres = spread(
    [...wanted].reverse(),
    [...sizes].reverse(),
    from,
    Math.max(bottom, from) + total,
  )!.toReversed()
  return [
    { item: 'line', points: marks.map((y): Point => [x, y]), role: 'dimension' },
    ...marks.map((y) => tick([x, y])),
    ...texts.map((text, i): Item => ({
      item: 'text',
      at: [x - 0.5 - (LINE - RISE), centres[i]!],
      text,
      role: 'dimension',
      anchor: 'middle',
      turn: -90,
    })),
  ]
}

/** Wheel load and side thrust on the rail's head. */
const actions = ([x, head]: Point, half: number, load: string, push: string): readonly Item[] => {
  const tail = head - ARROW
  const y = head + 1.2
  const text = (at: Point, of: string, anchor: 'middle' | 'end'): Item => ({
    item: 'text',
    at,
    text: of,
    role: 'ink',
    anchor,
  })
  return [
    ...(load === ''
      ? []
      : [
          { item: 'arrow', from: [x, tail], to: [x, head], role: 'ink' } as const,
          text([x, tail - 0.6 - (LINE - RISE)], load, 'middle'),
        ]),
    ...(push === ''
      ? []
      : [
          { item: 'arrow', from: [x - half - 11, y], to: [x - half, y], role: 'ink' } as const,
          text([x - half - 1, y - 1.5], push, 'end'),
        ]),
  ]
}

const altText = (
  section: Section,
  entry: SectionEntry,
  { rail, wheelLoad, sideThrust, units }: SectionShown,
  length: (metres: number) => string,
): string => {
  const sentences = [
    `Cross-section of ${sectionName(entry, units)}, ${length(section.depth)} deep, with rail ${rail.name}.`,
    `Centroid ${length(section.yBar)} and plastic axis ${length(section.yPlastic)} above the bottom.`,
    `Web ${length(section.tw)} thick, top flange ${length(section.topFlange.width)} by ${length(section.topFlange.thickness)}, bottom flange ${length(section.bottomFlange.width)} by ${length(section.bottomFlange.thickness)}.`,
  ]
  if (wheelLoad !== undefined) sentences.push(`Wheel load ${forceText(wheelLoad, units)}.`)
  if (sideThrust !== undefined) sentences.push(`Side thrust ${forceText(sideThrust, units)} at the rail's head.`)
  return sentences.join(' ')
}
