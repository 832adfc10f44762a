/** A crane and a job for the tests of this room; SI. */
import type { Crane, Job } from '../../core/job/types.ts'
import { as } from '../../core/quantity/kinds.ts'

/** F. Carrasco, published worked notes on a runway girder (NCh 2369 series), 2025, part 3: the crane of its example. */
export const crane = (more: Partial<Crane> = {}): Crane => ({
  name: 'bay crane',
  ratedCapacity: as('force', 200e3),
  bridgeWeight: as('force', 190e3),
  trolleyWeight: as('force', 40e3),
  belowHook: as('force', 0),
  bridgeSpan: as('distance', 23),
  hookApproach: as('distance', 1.2),
  hookApproachFar: as('distance', 1.2),
  operation: 'remote',
  bridgeDrive: 'powered',
  trolleyDrive: 'powered',
  hoistDrive: 'powered',
  serviceClass: 'D',
  wheelSpacings: [as('distance', 3.4)],
  wheelLoad: 'derive',
  leastWheelLoad: 'derive',
  emptyWheelLoad: 'derive',
  bumperOverhang: [as('distance', 0.6), as('distance', 0.6)],
  ...more,
})

export const job = (cranes: readonly Crane[], spans: readonly number[] = [7.5], eitherWay = true): Job =>
  ({
    cranes,
    runway: { spans: spans.map((span) => as('distance', span)), continuity: 'simple', eitherWay },
  }) as unknown as Job
