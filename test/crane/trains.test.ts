import { describe, expect, it } from 'vitest'
import { wheelTrains } from '../../core/crane/trains.ts'
import { wheelLoads } from '../../core/crane/wheels.ts'
import type { Crane } from '../../core/job/types.ts'
import { as, type Newton } from '../../core/quantity/kinds.ts'
import { crane, job } from './cranes.ts'

const uneven = (more: Partial<Crane> = {}): Crane =>
  crane({
    name: 'uneven',
    wheelSpacings: [2, 3].map((d) => as('distance', d)),
    wheelLoad: [1e5, 2e5, 2e5] as Newton[],
    ...more,
  })
const bumpers = (first: number, last: number): Pick<Crane, 'bumperOverhang'> => ({
  bumperOverhang: [as('distance', first), as('distance', last)],
})
const trainsOf = (
  cranes: readonly Crane[],
  groups: readonly (readonly number[])[],
  spans?: number[],
  eitherWay?: boolean,
) => wheelTrains(job(cranes, spans, eitherWay), cranes.map(wheelLoads), groups)

const rows = (found: ReturnType<typeof wheelTrains>) =>
  found.trains.map(({ wheels }) => wheels.map(({ crane: of, wheel, offset }) => [of, wheel, Number(offset.toFixed(9))]))

describe('wheel trains', () => {
  it('a single crane is listed once, and mirrored only where that is another load', () => {
    const { trains } = trainsOf([crane(), uneven()], [[0], [1]])
    expect(trains.map(({ mayMirror }) => mayMirror)).toEqual([false, true])
    expect(trains[1]!.wheels).toEqual([
      { crane: 1, wheel: 0, offset: 0, load: 1e5 },
      { crane: 1, wheel: 1, offset: 2, load: 2e5 },
      { crane: 1, wheel: 2, offset: 5, load: 2e5 },
    ])
    expect(trainsOf([uneven()], [[0]], [7.5], false).trains[0]!.mayMirror).toBe(false)
    const heavier = crane({ wheelLoad: [1.5e5, 1.7e5] as Newton[] })
    expect(trainsOf([heavier], [[0]]).trains[0]!.mayMirror).toBe(true)
  })

  it('neighbours stand bumper to bumper, each way about once', () => {
    const found = trainsOf([uneven(bumpers(0.4, 0.7)), crane({ ...bumpers(0.5, 0.5) })], [[0, 1]], [30])
    expect(found.trains.map(({ turned }) => turned)).toEqual([
      [false, false],
      [true, false],
    ])
    expect(found.trains.every(({ mayMirror }) => !mayMirror)).toBe(true)
    expect(rows(found)).toEqual([
      [
        [0, 0, 0],
        [0, 1, 2],
        [0, 2, 5],
        [1, 0, 5 + 0.7 + 0.5],
        [1, 1, 5 + 0.7 + 0.5 + 3.4],
      ],
      [
        [0, 2, 0],
        [0, 1, 3],
        [0, 0, 5],
        [1, 0, 5 + 0.4 + 0.5],
        [1, 1, 5 + 0.4 + 0.5 + 3.4],
      ],
    ])
  })

  it('a crane with even wheels and uneven bumpers is another gap when turned', () => {
    const found = trainsOf([crane(), crane({ ...bumpers(0.3, 0.9) })], [[0, 1]], [30])
    expect(rows(found).map((row) => row[2])).toEqual([
      [1, 0, 3.4 + 0.6 + 0.3],
      [1, 1, 3.4 + 0.6 + 0.9],
    ])
  })

  it('three uneven cranes stand in eight ways, in one where the job fixes them', () => {
    const cranes = [uneven(), uneven(), uneven()]
    const { trains } = trainsOf(cranes, [[0, 1, 2]], [40])
    expect(new Set(trains.map(({ turned }) => turned.join())).size).toBe(8)
    for (const { wheels } of trains)
      expect(wheels.every(({ offset }, i) => i === 0 || offset > wheels[i - 1]!.offset)).toBe(true)
    expect(trainsOf(cranes, [[0, 1, 2]], [40], false).trains).toHaveLength(1)
  })

  it('a train longer than a span is a caution, once for all its ways', () => {
    const { cautions } = trainsOf([uneven(), crane()], [[0], [1], [0, 1]], [12, 6])
    expect(cautions).toHaveLength(1)
    expect(cautions[0]).toContain('uneven and bay crane')
    expect(trainsOf([crane()], [[0]], [3.4]).cautions).toEqual([])
  })

  it('a crane that does not exist is a fault', () => {
    expect(() => trainsOf([crane()], [[1]])).toThrow('crane 1 of 1')
  })
})
