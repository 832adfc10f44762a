/** The worst place of a reaction or of the shear at a support: exact, on their influence lines. Effects as drive.ts checked them. */
import { as } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'
import { endReactionLine, spanOf, supportReactionLine, type Influence } from './influence.ts'
import { EQUAL, passLine } from './passage.ts'
import { inOrder, onSpan, placed, stationsOf, worse, type Way } from './place.ts'
import { proveEquilibrium, proveValue, reactions, sizeOf, standingOf } from './statics.ts'
import type { Drive, EffectOf, Extreme } from './types.ts'

/** The reaction of one end is the shear beside it; the greater of the two ends governs. */
export const driveShear = (
  drive: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { wheels, uniform }: EffectOf<'shear'>,
): Extreme => {
  const at = (end: 'left' | 'right'): Extreme =>
    driveEnd(drive, train, ways, { kind: 'endReaction', end, wheels, uniform })
  const [left, right] = [at('left'), at('right')]
  return right.value > left.value + EQUAL * left.value
    ? { ...right, value: -right.value, side: 'left' }
    : { ...left, side: 'right' }
}

export const driveEnd = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { end, wheels, uniform }: EffectOf<'endReaction'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const found = passWorst(endReactionLine(beam, span, end), ways, wheels)
  const stations = stationsOf(train, found.way.mirrored, found.lead)
  const on = onSpan(beam, span, stations)
  const standing = standingOf(length, on, wheels, uniform)
  const value = found.value + (uniform * length) / 2
  const x = end === 'left' ? 0 : length
  const reaction = reactions(standing)[end]
  proveEquilibrium(standing, x)
  proveValue(value, reaction, sizeOf(standing) / length)
  return {
    value,
    span,
    station: as('distance', start + x),
    side: 'at',
    ...placed(index, train, found.way.mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: [],
    with: { moment: as('moment', 0), shear: as('force', end === 'left' ? reaction : -reaction) },
    method: 'exact',
  }
}

export const driveBracket = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { support, wheels, uniform }: EffectOf<'bracketReaction'>,
): Extreme => {
  const found = passWorst(supportReactionLine(beam, support), ways, wheels)
  const stations = stationsOf(train, found.way.mirrored, found.lead)
  const neighbours = [support - 1, support].filter((s) => s >= 0 && s < beam.spans.length)
  const on = new Set<number>()
  let shear = 0
  let sum = 0
  let dead = 0
  for (const girder of neighbours) {
    const { length } = spanOf(beam, girder)
    // A wheel at the support itself is carried once, by the first girder that holds it.
    const here = onSpan(beam, girder, stations).filter(({ wheel }) => !on.has(wheel))
    for (const { wheel } of here) on.add(wheel)
    const standing = standingOf(length, here, wheels, uniform)
    const end = girder === support ? 'left' : 'right'
    const reaction = reactions(standing)[end]
    proveEquilibrium(standing, end === 'left' ? 0 : length)
    if (reaction > Math.abs(shear)) shear = end === 'left' ? reaction : -reaction
    sum += reaction
    dead += (uniform * length) / 2
  }
  const value = found.value + dead
  const { start, length } = spanOf(beam, neighbours.at(-1)!)
  proveValue(value, sum, Math.abs(sum))
  return {
    value,
    span,
    station: as('distance', neighbours.at(-1) === support ? start : start + length),
    side: 'at',
    ...placed(index, train, found.way.mirrored, stations),
    on: [...on].sort((a, b) => a - b),
    terms: [],
    with: { moment: as('moment', 0), shear: as('force', shear) },
    method: 'exact',
  }
}

/** The way and lead (runway station) with the greatest sum over an influence line. */
const passWorst = (line: Influence, ways: readonly Way[], wheels: readonly number[]) =>
  ways.map((way) => ({ way, ...passLine(line, way.offsets, inOrder(way, wheels)).max })).reduce(worse)
