/** Reviews of an invented plant with trains and spans of any kind put in, and what every figure must hold to. */
import * as fc from 'fast-check'
import { expect } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import type { WheelTrain } from '../../core/crane/types.ts'
import { arrowParts } from '../../core/figure/arrow.ts'
import { boxOf, overlap, type Text } from '../../core/figure/text.ts'
import type { Figure, Item, Point } from '../../core/figure/types.ts'
import { as, type Metre } from '../../core/quantity/kinds.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'
import { drive } from '../../core/travel/drive.ts'
import type { Effect, Extreme } from '../../core/travel/types.ts'
import { smallest } from '../job/plant.ts'

const metre = (value: number): Metre => as('distance', value)

const reviewed = (job: object): Review => {
  const result = reviewText(JSON.stringify(job), catalogue)
  if (!result.ok) throw new Error(JSON.stringify(result.findings))
  return result.review
}

export const plain = reviewed(smallest())

export interface Standing {
  readonly spans: readonly number[]
  /** By crane, from left to right: loads in N, spacings and both overhangs in m. */
  readonly cranes: readonly {
    readonly loads: readonly number[]
    readonly spacings: readonly number[]
    readonly overhang: number
  }[]
}

/** A review whose runway and cranes are others; its checks are left as they were. */
export const withTrain = ({ spans, cranes }: Standing): Review => {
  const crane = plain.job.cranes[0]!
  let at = 0
  const wheels = cranes.flatMap(({ loads, spacings, overhang }, c) => {
    const start = c === 0 ? 0 : at + overhang
    const own = loads.map((load, wheel) => ({
      crane: c,
      wheel,
      offset: metre(start + spacings.slice(0, wheel).reduce((a, b) => a + b, 0)),
      load: as('force', load),
    }))
    at = own.at(-1)!.offset + overhang
    return own
  })
  const train: WheelTrain = {
    cranes: cranes.map((_, c) => c),
    turned: cranes.map(() => false),
    wheels,
    mayMirror: cranes.length === 1,
  }
  return {
    ...plain,
    trains: [train],
    job: {
      ...plain.job,
      cranes: cranes.map(({ overhang, spacings }) => ({
        ...crane,
        bumperOverhang: [metre(overhang), metre(overhang)],
        wheelSpacings: spacings.map(metre),
      })),
      runway: { ...plain.job.runway, spans: spans.map(metre) },
    },
  }
}

export const worst = (review: Review, kind: 'moment' | 'shear', span: number, uniform = 0): Extreme => {
  const wheels = review.trains[0]!.wheels.map(({ load }) => load)
  const loaded = { wheels, uniform: as('lineLoad', uniform) }
  const effect: Effect =
    kind === 'shear'
      ? { kind: 'shear', ...loaded }
      : { kind: 'moments', terms: [{ factor: 1, at: 'worst', ...loaded, ends: [as('moment', 0), as('moment', 0)] }] }
  const { continuity, spans } = review.job.runway
  return drive({ beam: { continuity, spans }, span, trains: review.trains, train: 0, eitherWay: true }, effect)
}

const aCrane = fc.integer({ min: 1, max: 8 }).chain((n) =>
  fc.record({
    loads: fc.oneof(
      fc.constantFrom(60e3, 196_166.4).map((load) => new Array<number>(n).fill(load)),
      fc.array(fc.double({ min: 1e3, max: 1.5e6, noNaN: true }), { minLength: n, maxLength: n }),
    ),
    spacings: fc.oneof(
      fc.double({ min: 0.3, max: 5, noNaN: true }).map((spacing) => new Array<number>(n - 1).fill(spacing)),
      fc.array(fc.double({ min: 0.01, max: 12, noNaN: true }), { minLength: n - 1, maxLength: n - 1 }),
    ),
    overhang: fc.double({ min: 0, max: 2, noNaN: true }),
  }),
)

export const anyStanding: fc.Arbitrary<Standing & { span: number }> = fc
  .array(fc.oneof(fc.constantFrom(13.716, 7.5, 0.1, 100), fc.double({ min: 1, max: 30, noNaN: true })), {
    minLength: 1,
    maxLength: 4,
  })
  .chain((spans) =>
    fc.record({
      spans: fc.constant(spans),
      span: fc.integer({ min: 0, max: spans.length - 1 }),
      cranes: fc.array(aCrane, { minLength: 1, maxLength: 3 }),
    }),
  )

export const textsOf = (figure: Figure): readonly Text[] => figure.items.filter((item) => item.item === 'text')

const pointsOf = (item: Item): readonly Point[] => {
  switch (item.item) {
    case 'line':
    case 'area':
      return item.points
    case 'arrow':
      return [item.from, ...arrowParts(item).head]
    case 'circle': {
      const [x, y] = item.centre
      return [
        [x - item.radius, y - item.radius],
        [x + item.radius, y + item.radius],
      ]
    }
    case 'text': {
      const { left, right, top, bottom } = boxOf(item)
      return [
        [left, top],
        [right, bottom],
      ]
    }
  }
}

/** Every number finite, everything inside the frame, no text over another. */
export const expectDrawable = (figure: Figure): void => {
  expect(Number.isFinite(figure.height)).toBe(true)
  for (const item of figure.items)
    for (const [x, y] of pointsOf(item)) {
      const inside = x >= -1e-9 && x <= figure.width + 1e-9 && y >= -1e-9 && y <= figure.height + 1e-9
      if (!inside) expect.fail(`${JSON.stringify(item)} leaves ${figure.width} x ${figure.height}`)
    }
  const texts = textsOf(figure)
  for (const [i, a] of texts.entries())
    for (const b of texts.slice(i + 1))
      if (overlap(boxOf(a), boxOf(b))) expect.fail(`"${a.text}" and "${b.text}" overlap`)
}
