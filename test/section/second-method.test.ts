/** Random make-ups against boundary integrals of their outlines and thin strips along their middle lines. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Channel } from '../../core/catalogue/types.ts'
import type { Cap, SectionEntry } from '../../core/job/types.ts'
import { as } from '../../core/quantity/kinds.ts'
import { plasticAxis } from '../../core/section/plastic.ts'
import { sectionOf } from '../../core/section/properties.ts'
import { sectorialOf, type Wall } from '../../core/section/sectorial.ts'
import { apart, ownShape, plate, plated } from './make-up.ts'
import { box, green, plastic, sideways, strips, type Point, type Run } from './second-method.ts'

interface Made {
  readonly entry: SectionEntry
  readonly outline: Point[][]
  readonly runs: Run[][]
}

const within = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true })

const flat = (width: number, y: number, thickness: number): Run[] => [{ from: [0, y], to: [width / 2, y], thickness }]

/** The random numbers of a make-up; kept apart from what is made of them, so that a counterexample prints short. */
type Drawn = { readonly kind: 'plates' | 'rolled'; readonly of: readonly number[]; readonly cap?: DrawnCap | undefined }
type DrawnCap = { readonly kind: 'plate' | 'channel'; readonly of: readonly number[] }

const draw = <K extends string>(kind: K, ...of: fc.Arbitrary<number>[]) =>
  fc.record({ kind: fc.constant(kind), of: fc.tuple(...of) })

const plateSize = [within(0.1, 1), within(0.006, 0.06)]

const makeUps: fc.Arbitrary<Drawn> = fc
  .tuple(
    fc.oneof(
      draw('plates', ...plateSize, within(0.2, 2), within(0.005, 0.03), ...plateSize),
      draw('rolled', within(0.3, 1.1), within(0.1, 0.42), within(0.005, 0.03), within(0.008, 0.05), within(0, 0.03)),
    ),
    fc.option(
      fc.oneof(
        draw('plate', ...plateSize),
        draw(
          'channel',
          within(0.15, 0.5),
          within(0.05, 0.11),
          within(0.006, 0.02),
          within(0.008, 0.018),
          within(0, 0.5),
        ),
      ),
      { nil: undefined },
    ),
  )
  .map(([girder, cap]) => ({ ...girder, cap }))

const make = (drawn: Drawn): Made => {
  const girder = drawn.kind === 'plates' ? ofPlates(drawn.of) : rolled(drawn.of)
  if (drawn.cap === undefined) return girder
  const seat = Math.max(...girder.outline.flat().map(([, y]) => y))
  const on = drawn.cap.kind === 'plate' ? plateCap(drawn.cap.of, seat) : channelCap(drawn.cap.of, seat)
  return {
    entry: { ...girder.entry, cap: on.cap },
    outline: [...girder.outline, ...on.outline],
    runs: [...girder.runs, ...on.runs],
  }
}

const ofPlates = ([b1 = 0, t1 = 0, hw = 0, tw = 0, b2 = 0, t2 = 0]: readonly number[]): Made => ({
  entry: plated(plate(b1, t1), hw, tw, plate(b2, t2)),
  outline: [box(b2, 0, t2), box(tw, t2, t2 + hw), box(b1, t2 + hw, t2 + hw + t1)],
  runs: [flat(b2, t2 / 2, t2), flat(b1, t2 + hw + t1 / 2, t1)],
})

const rolled = ([d = 0, bf = 0, tw = 0, tf = 0, r = 0]: readonly number[]): Made => ({
  entry: { kind: 'rolled', shape: ownShape([d, bf, tw, tf, r]) },
  outline: [box(bf, 0, tf), web(d, tw, tf, r), box(bf, d - tf, d)],
  runs: [flat(bf, tf / 2, tf), flat(bf, d - tf / 2, tf)],
})

/** A fillet's quarter circle as chords: they leave 2e-5 of the fillet's area. */
const CHORDS = 300

/** The web with its four fillets as one polygon. */
const web = (d: number, tw: number, tf: number, r: number): Point[] => {
  const arc = Array.from({ length: CHORDS + 1 }, (_, i): Point => {
    const angle = ((i / CHORDS) * Math.PI) / 2
    return [tw / 2 + r * (1 - Math.sin(angle)), tf + r * (1 - Math.cos(angle))]
  })
  const right = [...arc, ...arc.map(([x, y]): Point => [x, d - y]).toReversed()]
  return [...right, ...right.map(([x, y]): Point => [-x, y]).toReversed()]
}

/** A channel with legs that taper evenly; its "handbook" figures are the boundary integrals of its outline. */
const channelOf = (
  d: number,
  bf: number,
  tw: number,
  tf: number,
  taper: number,
): { cap: Channel; outline: Point[][] } => {
  const [root, toe] = [tf * (1 + taper), tf * (1 - taper)]
  const leg: Point[] = [
    [d / 2 - toe, -bf],
    [d / 2, -bf],
    [d / 2, -tw],
    [d / 2 - root, -tw],
  ]
  const outline = [box(d, -tw, 0), leg, leg.map(([x, y]): Point => [-x, y]).toReversed()]
  const { A, Sx, Ixx, Iyy } = green(outline)
  const cap: Channel = {
    name: 'channel',
    family: 'own',
    source: 'test',
    d: as('length', d),
    bf: as('length', bf),
    tw: as('length', tw),
    tf: as('length', tf),
    k: as('length', root),
    figures: {
      A: as('area', A),
      xBar: as('length', -Sx / A),
      eo: as('length', 0),
      Ix: as('inertia', Iyy),
      Sx: as('modulus', (2 * Iyy) / d),
      Zx: as('modulus', sideways(outline)),
      Iy: as('inertia', Ixx - Sx ** 2 / A),
      Sy: as('modulus', 1),
      Zy: as('modulus', 1),
      J: as('inertia', 1),
      Cw: as('warping', 1),
      massPerLength: as('lineMass', 7850 * A),
    },
  }
  return { cap, outline }
}

const lifted = (outline: readonly Point[][], by: number): Point[][] =>
  outline.map((polygon) => polygon.map(([x, y]): Point => [x, y + by]))

interface MadeCap {
  readonly cap: Cap
  readonly outline: Point[][]
  readonly runs: Run[][]
}

const plateCap = ([b = 0, t = 0]: readonly number[], seat: number): MadeCap => ({
  cap: { kind: 'plate', plate: plate(b, t) },
  outline: [box(b, seat, seat + t)],
  runs: [flat(b, seat + t / 2, t)],
})

const channelCap = ([d = 0, bf = 0, tw = 0, tf = 0, taper = 0]: readonly number[], seat: number): MadeCap => {
  const { cap, outline } = channelOf(d, bf, tw, tf, taper)
  const corner: Point = [(d - tf) / 2, seat + tw / 2]
  return {
    cap: { kind: 'channel', channel: cap },
    outline: lifted(outline, seat + tw),
    runs: [
      [
        { from: [0, seat + tw / 2], to: corner, thickness: tw },
        { from: corner, to: [corner[0], seat + tw - bf], thickness: tf },
      ],
    ],
  }
}

describe('500 random make-ups', () => {
  test('A, centroid, inertia, moduli and plastic moduli are those of the outline', () => {
    fc.assert(
      fc.property(makeUps, (drawn) => {
        const { entry, outline } = make(drawn)
        const section = sectionOf(entry)
        const { A, Sx, Ixx, Iyy } = green(outline)
        const { height, Z } = plastic(outline)
        // Fillets: the outline has chords for their arcs, the plastic axis triangles.
        const [close, plasticClose] = drawn.kind === 'rolled' ? [2e-5, 5e-4] : [1e-9, 1e-9]
        expect(apart(section.A, A)).toBeLessThan(close)
        expect(apart(section.yBar, Sx / A)).toBeLessThan(close)
        expect(apart(section.Ix, Ixx - Sx ** 2 / A)).toBeLessThan(close)
        expect(apart(section.Iy, Iyy)).toBeLessThan(close)
        expect(apart(section.Zy, sideways(outline))).toBeLessThan(close)
        expect(apart(section.SxBottom, (Ixx - Sx ** 2 / A) / (Sx / A))).toBeLessThan(close)
        expect(apart(section.SxTop, (Ixx - Sx ** 2 / A) / (section.depth - Sx / A))).toBeLessThan(close)
        expect(apart(section.Zx, Z)).toBeLessThan(plasticClose)
        expect(Math.abs(section.yPlastic - height)).toBeLessThan(20 * plasticClose * section.depth)
        expect(apart(section.massPerLength, 7850 * A)).toBeLessThan(close)
      }),
      { numRuns: 500 },
    )
  })

  test('shear centre and warping constant are those of shear flow and swept area', () => {
    fc.assert(
      fc.property(makeUps, (drawn) => {
        const { entry, runs } = make(drawn)
        const section = sectionOf(entry)
        const { height, Cw } = strips(runs, 400)
        expect(Math.abs(section.yShear - height)).toBeLessThan(1e-4 * section.depth)
        // The strips' own error grows where the shear centre lies near a flange that holds nearly all.
        expect(Math.abs(section.Cw - Cw)).toBeLessThan(1e-4 * section.Iy * section.depth ** 2)
      }),
      { numRuns: 500 },
    )
  })

  test('every property is a finite number, and the parts keep their order', () => {
    fc.assert(
      fc.property(makeUps, (drawn) => {
        const section = sectionOf(make(drawn).entry)
        for (const value of Object.values(section))
          if (typeof value === 'number') expect(value).toBeGreaterThanOrEqual(0)
        expect(section.J).toBeGreaterThan(0)
        expect(section.Zx).toBeGreaterThan(Math.min(section.SxTop, section.SxBottom))
        expect(section.Iyc + section.Iyt).toBeLessThan(section.Iy)
        expect(section.bottom.height).toBeLessThan(section.yBar)
        expect(section.top.height).toBeGreaterThan(section.yBar)
        expect(section.rt).toBeLessThan(section.top.width / 2)
      }),
      { numRuns: 200 },
    )
  })
})

describe('plastic axis', () => {
  test('halves a triangle at 1/sqrt(2) of its height from the tip', () => {
    const { height, Z } = plasticAxis([{ bottom: 0, top: 3, widthBottom: 2, widthTop: 0 }])
    expect(height).toBeCloseTo(3 - 3 / Math.SQRT2, 12)
    expect(Z).toBeCloseTo(
      plastic([
        [
          [-1, 0],
          [1, 0],
          [0, 3],
        ],
      ]).Z,
      9,
    )
  })

  test('of bands apart lies at the edge of the one that completes half', () => {
    const legs = { widthBottom: 1, widthTop: 1 }
    expect(
      plasticAxis([
        { bottom: 0, top: 1, ...legs },
        { bottom: 1, top: 4, ...legs },
      ]).height,
    ).toBeCloseTo(2, 12)
  })
})

describe('sectorial coordinates of a tree', () => {
  const link = (x1: number, y1: number, x2: number, y2: number, thickness: number, from: number): Wall => ({
    x1,
    y1,
    x2,
    y2,
    thickness,
    from,
  })

  test('a Z section warps as in closed form: t b^3 h^2 (b + 2h)/(12 (2b + h)), shear centre at its centre', () => {
    const [b, h, t] = [0.08, 0.2, 0.005]
    const { xShear, yShear, Cw } = sectorialOf([
      link(0, 0, 0, h / 2, t, -1),
      link(0, h / 2, b, h / 2, t, 0),
      link(0, 0, 0, -h / 2, t, -1),
      link(0, -h / 2, -b, -h / 2, t, 2),
    ])
    expect(xShear).toBeCloseTo(0, 12)
    expect(yShear).toBeCloseTo(0, 12)
    // S. P. Timoshenko and J. M. Gere, Theory of Elastic Stability, 2nd ed., appendix, table A-3.
    expect(apart(Cw, (t * b ** 3 * h ** 2 * (b + 2 * h)) / (12 * (2 * b + h)))).toBeLessThan(1e-12)
  })

  test('two plates that meet in a corner have their shear centre in it and do not warp', () => {
    const { xShear, yShear, Cw } = sectorialOf([link(0, 0, 0.1, 0, 0.01, -1), link(0, 0, 0, 0.15, 0.008, -1)])
    expect(Math.hypot(xShear, yShear)).toBeLessThan(1e-15)
    expect(Math.abs(Cw)).toBeLessThan(1e-20)
  })

  test('turning and moving a section turns and moves its shear centre and leaves C_w', () => {
    fc.assert(
      fc.property(within(0, 6), within(-1, 1), within(-1, 1), (angle, dx, dy) => {
        // A channel with unequal flanges, entered from one toe to the other.
        const points: Point[] = [
          [0.09, 0],
          [0, 0],
          [0, 0.2],
          [0.06, 0.2],
        ]
        const chain = (at: readonly Point[]): Wall[] =>
          at.slice(1).map(([x, y], i) => link(at[i]![0], at[i]![1], x, y, 0.004 + 0.002 * i, i - 1))
        const moved = ([x, y]: Point): Point => [
          dx + x * Math.cos(angle) - y * Math.sin(angle),
          dy + x * Math.sin(angle) + y * Math.cos(angle),
        ]
        const still = sectorialOf(chain(points))
        const turned = sectorialOf(chain(points.map(moved)))
        const [x, y] = moved([still.xShear, still.yShear])
        expect(Math.hypot(turned.xShear - x, turned.yShear - y)).toBeLessThan(1e-9)
        expect(apart(turned.Cw, still.Cw)).toBeLessThan(1e-6)
      }),
    )
  })
})
