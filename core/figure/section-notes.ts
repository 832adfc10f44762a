/** The column of notes beside a cross-section: what each part is, and where the axes are. */
import type { Runway, SectionEntry } from '../job/types.ts'
import type { Section } from '../section/types.ts'
import { EDGE, spread } from './layout.ts'
import { LINE, RISE, textWidth, type Text } from './text.ts'
import type { Item, Point } from './types.ts'

interface Note {
  /** What it speaks of. */
  readonly at: Point
  /** From the fullest to the shortest. */
  readonly texts: readonly string[]
}

/** From above downward. */
export const notesOf = (
  section: Section,
  entry: SectionEntry,
  rail: Runway['rail'],
  length: (metres: number) => string,
): readonly Note[] => {
  const { topFlange, bottomFlange, depth, d, tw } = section
  const plate = (of: { readonly width: number; readonly thickness: number }): string =>
    `${length(of.width).replace(/ \S+$/, '')} × ${length(of.thickness)}`
  const high = `${length(rail.height - rail.wear)} high`
  const { cap } = entry
  const capNote = (): readonly Note[] => {
    if (cap === undefined) return []
    const name = cap.kind === 'channel' ? `${cap.channel.name}, ${length(cap.channel.d)} wide` : plate(cap.plate)
    const x = (cap.kind === 'channel' ? cap.channel.d : cap.plate.width) / 2
    return [{ at: [x, depth - section.cap.thickness / 2], texts: [`cap ${name}`, 'cap'] }]
  }
  const axes: readonly Note[] = section.doublySymmetric
    ? [{ at: [Infinity, section.yBar], texts: ['centroid and plastic axis'] }]
    : [
        { at: [Infinity, section.yBar], texts: [`centroid at ${length(section.yBar)}`] },
        { at: [Infinity, section.yPlastic], texts: [`plastic axis at ${length(section.yPlastic)}`] },
      ]
  const web: Note = { at: [tw / 2, 0.3 * d], texts: [`web ${length(tw)}`] }
  const shape = entry.kind === 'rolled' ? [entry.shape.name] : []
  const notes: readonly Note[] = [
    {
      at: [rail.headWidth / 2, depth + 0.85 * (rail.height - rail.wear)],
      texts: [`rail ${rail.name}, ${high}`, `rail, ${high}`],
    },
    ...capNote(),
    {
      at: [topFlange.width / 2, d - topFlange.thickness / 2],
      texts: [...shape.map((name) => `${name}, flange ${plate(topFlange)}`), `flange ${plate(topFlange)}`],
    },
    ...axes,
    web,
    { at: [bottomFlange.width / 2, bottomFlange.thickness / 2], texts: [`flange ${plate(bottomFlange)}`] },
  ]
  return [...notes].sort((a, b) => b.at[1] - a.at[1])
}

/** From one line of the notes to the next, mm. */
export const NOTE = LINE + 0.7

/** Notes in a column beside the section, each with a line that leads to what it speaks of. */
export const noteItems = (
  notes: readonly Note[],
  room: {
    readonly column: number
    readonly reach: number
    readonly width: number
    readonly from: number
    readonly to: number
  },
): readonly Item[] => {
  const { column, reach, width } = room
  const centres = spread(
    notes.map(({ at }) => at[1]),
    notes.map(() => NOTE),
    room.from,
    room.to,
  )
  if (centres === undefined) throw new RangeError(`no room for ${notes.length} notes`)
  return notes.flatMap(({ at: [x, y], texts }, i): readonly Item[] => {
    const text = texts.find((of) => column + textWidth(of) <= width - EDGE) ?? texts.at(-1)!
    const middle = centres[i]!
    const written: Text = {
      item: 'text',
      at: [column, middle + RISE - LINE / 2],
      text,
      role: 'dimension',
      anchor: 'start',
    }
    const points: readonly Point[] = [...(x < reach ? [[x + 0.4, y] as const] : []), [reach, y], [column - 0.8, middle]]
    return [{ item: 'line', points, role: 'hair' }, written]
  })
}
