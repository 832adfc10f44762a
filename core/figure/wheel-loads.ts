/** Loads written over the arrows of a train: level where there is room, else equal ones together, else upright. */
import type { UnitSystem } from '../quantity/kinds.ts'
import { writeQuantity } from '../quantity/write.ts'
import { EDGE, spread } from './layout.ts'
import { CLEAR, LINE, RISE, textWidth } from './text.ts'
import type { Item } from './types.ts'
import type { StandingWheel } from './standing.ts'

export interface Arrow {
  readonly x: number
  readonly wheel: StandingWheel
}

export interface LoadLabels {
  /** From the top of the labels down to the tails of the arrows, mm. */
  readonly height: number
  /** The labels over tails at this height on paper. */
  readonly draw: (tails: number) => readonly Item[]
}

export const forceText = (force: number, units: UnitSystem): string =>
  writeQuantity({ kind: 'force', value: force }, units)

/** Labels of arrows listed from left to right, between the edges of a frame of this width. */
export const loadLabels = (arrows: readonly Arrow[], units: UnitSystem, width: number): LoadLabels => {
  if (arrows.length === 0) return { height: 0, draw: () => [] }
  const single = arrows.map(({ x, wheel: { force, on, crane } }): Group => {
    return { from: x, to: x, text: forceText(force, units), on, crane, forces: [force] }
  })
  const joined = (joins: (a: Group, b: Group) => boolean): readonly Group[] => together(single, joins, units)
  return (
    level(single, width) ??
    level(joined(sameLoad), width) ??
    upright(single, width) ??
    level(
      joined((a, b) => a.crane === b.crane),
      width,
      Infinity,
    ) ??
    level(
      joined(() => true),
      width,
      Infinity,
    )!
  )
}

interface Group {
  readonly from: number
  readonly to: number
  readonly text: string
  readonly on: boolean
  readonly crane: number
  readonly forces: readonly number[]
}

const sameLoad = (a: Group, b: Group): boolean => a.text === b.text && a.crane === b.crane && a.on === b.on

const together = (
  groups: readonly Group[],
  joins: (a: Group, b: Group) => boolean,
  units: UnitSystem,
): readonly Group[] => {
  const runs: [Group, ...Group[]][] = []
  for (const group of groups) {
    const run = runs.at(-1)
    if (run !== undefined && joins(run[0], group)) run.push(group)
    else runs.push([group])
  }
  return runs.map((run) => {
    const forces = run.flatMap((group) => group.forces)
    const [least, greatest] = [Math.min(...forces), Math.max(...forces)].map((force) => forceText(force, units))
    const text =
      run.length === 1
        ? run[0].text
        : least === greatest
          ? `${run.length} × ${run[0].text}`
          : `${run.length} wheels, ${least} to ${greatest}`
    return { ...run[0], to: run.at(-1)!.to, text, on: run.some(({ on }) => on), forces }
  })
}

/** How far a level label may stand off its arrow without a line that leads to it, mm. */
const NEAR = 2.2

const level = (groups: readonly Group[], width: number, near = NEAR): LoadLabels | undefined => {
  const wanted = groups.map(({ from, to }) => (from + to) / 2)
  const centres = spread(
    wanted,
    groups.map(({ text }) => textWidth(text) + 2 * CLEAR),
    EDGE,
    width - EDGE,
  )
  if (centres === undefined || centres.some((centre, i) => Math.abs(centre - wanted[i]!) > near)) return undefined
  const rail = groups.some(({ forces }) => forces.length > 1) ? 0.8 : 0
  return {
    height: LINE + 0.6 + rail,
    draw: (tails) =>
      groups.flatMap(({ from, to, text, on, forces }, i): readonly Item[] => [
        {
          item: 'text',
          at: [centres[i]!, tails - rail - 0.6 - (LINE - RISE)],
          text,
          role: on ? 'ink' : 'dimension',
          anchor: 'middle',
        },
        ...(forces.length > 1
          ? [
              {
                item: 'line',
                points: [
                  [from, tails],
                  [to, tails],
                ],
                role: on ? 'ink' : 'thin',
              } as const,
            ]
          : []),
      ]),
  }
}

/** From the arrows' tails to upright labels, mm. */
const LEAD = 2.4

const upright = (groups: readonly Group[], width: number): LoadLabels | undefined => {
  const size = LINE + 2 * CLEAR
  const wanted = groups.map(({ from }) => from)
  const centres = spread(
    wanted,
    groups.map(() => size),
    EDGE,
    width - EDGE,
  )
  if (centres === undefined || centres.some((centre, i) => Math.abs(centre - wanted[i]!) > width / 4)) return undefined
  return {
    height: LEAD + 0.4 + Math.max(...groups.map(({ text }) => textWidth(text))),
    draw: (tails) =>
      groups.flatMap(({ from, text, on }, i): readonly Item[] => [
        {
          item: 'line',
          points: [
            [from, tails],
            [centres[i]!, tails - LEAD],
          ],
          role: 'hair',
        },
        {
          item: 'text',
          at: [centres[i]! + RISE - LINE / 2, tails - LEAD - 0.4],
          text,
          role: on ? 'ink' : 'dimension',
          anchor: 'start',
          turn: -90,
        },
      ]),
  }
}
