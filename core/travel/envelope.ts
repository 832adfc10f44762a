/** Envelopes of the static wheel loads: no impact, no factor, no dead load. */
import type { WheelTrain } from '../crane/types.ts'
import { as, type Metre, type Newton, type NewtonMetre, type NewtonSquareMetre } from '../quantity/kinds.ts'
import { drive } from './drive.ts'
import { momentLine, shearLine, spanOf, type Influence } from './influence.ts'
import { passLine } from './passage.ts'
import { inOrder, waysOf } from './place.ts'
import type { Beam, Effect, Extreme, Side } from './types.ts'

export interface Range {
  readonly max: Extreme
  readonly min: Extreme
}

export interface StaticEnvelope {
  readonly moment: Range
  readonly shear: Range
  /** By support: of simple girders the sum of the two that rest on it. */
  readonly reaction: readonly (Range & { readonly support: number })[]
  readonly endReaction: readonly (Range & { readonly span: number; readonly end: 'left' | 'right' })[]
  readonly deflection: { readonly max: Extreme }
}

/**
 * Greatest and least effects over all spans, trains and positions. Of equal ones the first span, then the first train. The
 * least moment and reaction of a simple girder are those without a wheel on it: 0, with no train. Stiffness E I in N m2.
 */
export const staticEnvelope = (
  beam: Beam,
  trains: readonly WheelTrain[],
  stiffness: NewtonSquareMetre,
): StaticEnvelope => {
  const indices = trains.length === 0 ? [undefined] : trains.map((_, i) => i)
  const worst = (span: number, effect: (wheels: readonly number[]) => Effect): Extreme =>
    indices
      .map((train) =>
        drive(
          { beam, span, trains, train, eitherWay: true },
          effect(train === undefined ? [] : trains[train]!.wheels.map(({ load }) => load)),
        ),
      )
      .reduce(greater)
  // A span as long as an earlier one gives the same values again.
  const spans = beam.spans.flatMap((length, span) => (beam.spans.indexOf(length) === span ? [span] : []))

  const moment = spans.map((span) =>
    worst(span, (wheels) => ({
      kind: 'moments',
      terms: [{ factor: 1, at: 'worst', wheels, uniform: as('lineLoad', 0), ends: [as('moment', 0), as('moment', 0)] }],
    })),
  )
  const deflection = spans.map((span) => worst(span, (wheels) => ({ kind: 'deflection', wheels, stiffness })))
  const endReaction = beam.spans.flatMap((length, span) =>
    (['left', 'right'] as const).map((end) => ({
      span,
      end,
      max: worst(span, (wheels) => ({ kind: 'endReaction', end, wheels, uniform: as('lineLoad', 0) })),
      min: unloaded(beam, span, end === 'left' ? 0 : length, 'at'),
    })),
  )
  const greatestEnd = (end: 'left' | 'right'): Extreme =>
    endReaction.flatMap((reaction) => (reaction.end === end ? [reaction.max] : [])).reduce(greater)
  const right = greatestEnd('right')
  return {
    moment: { max: moment.reduce(greater), min: unloaded(beam, 0, 0, 'at') },
    shear: {
      max: { ...greatestEnd('left'), side: 'right' },
      min: { ...right, value: -right.value, side: 'left' },
    },
    reaction: [...beam.spans, undefined].map((_, support) => {
      const span = Math.min(support, beam.spans.length - 1)
      return {
        support,
        max: worst(span, (wheels) => ({ kind: 'bracketReaction', support, wheels, uniform: as('lineLoad', 0) })),
        min: unloaded(beam, span, support === span ? 0 : beam.spans[span]!, 'at'),
      }
    }),
    endReaction,
    deflection: { max: deflection.reduce(greater) },
  }
}

export interface CurvePoint {
  readonly station: Metre
  readonly moment: { readonly max: NewtonMetre; readonly min: NewtonMetre }
  readonly shear: { readonly max: Newton; readonly min: Newton }
}

/**
 * Greatest and least moment and shear of the static wheel loads at each of the stations (along the runway, within the span),
 * over all trains and positions; exact. Shear just left and just right of a station have the same extremes, since a wheel
 * may stand on either side of it; at a support the side within the span is meant. Throws RangeError for a station outside.
 */
export const envelopeCurve = (
  beam: Beam,
  span: number,
  trains: readonly WheelTrain[],
  stations: readonly Metre[],
): readonly CurvePoint[] => {
  const rows = trains.flatMap((train) =>
    waysOf(train, true).map(({ offsets, ...way }) => ({
      offsets,
      loads: inOrder(
        { offsets, ...way },
        train.wheels.map(({ load }) => load),
      ),
    })),
  )
  const heaviest = Math.max(0, ...rows.map(({ loads }) => loads.reduce((sum, load) => sum + load, 0)))
  const { length } = spanOf(beam, span)
  return stations.map((station) => {
    // Rounding at the ends of a line is not an effect of its own.
    const read = (value: number, size: number): number => (Math.abs(value) < 1e-13 * size ? 0 : value)
    const extremes = (line: Influence, size: number) => {
      const passed = rows.map(({ offsets, loads }) => passLine(line, offsets, loads))
      return {
        max: read(Math.max(0, ...passed.map(({ max }) => max.value)), size),
        min: read(Math.min(0, ...passed.map(({ min }) => min.value)), size),
      }
    }
    const moment = extremes(momentLine(beam, span, station), heaviest * length)
    const shear = extremes(shearLine(beam, span, station), heaviest)
    return {
      station,
      moment: { max: as('moment', moment.max), min: as('moment', moment.min) },
      shear: { max: as('force', shear.max), min: as('force', shear.min) },
    }
  })
}

const greater = (a: Extreme, b: Extreme): Extreme => (b.value > a.value * (1 + 1e-13) ? b : a)

const unloaded = (beam: Beam, span: number, x: number, side: Side): Extreme => ({
  value: 0,
  span,
  station: as('distance', spanOf(beam, span).start + x),
  side,
  lead: as('distance', 0),
  mirrored: false,
  train: undefined,
  positions: [],
  on: [],
  terms: [],
  with: { moment: as('moment', 0), shear: as('force', 0) },
  method: 'exact',
})
