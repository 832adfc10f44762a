/** Girders and jobs for the tests of the US rules. Plant and figures are invented. */
import { catalogue } from '../../../core/catalogue/load.ts'
import { reviewText } from '../../../core/review/review-text.ts'
import type { Check, Review } from '../../../core/review/types.ts'
import { as } from '../../../core/quantity/kinds.ts'
import { UNIT } from '../../../core/quantity/units.ts'
import { sectionOf } from '../../../core/section/properties.ts'
import type { Section } from '../../../core/section/types.ts'
import type { Steel } from '../../../core/basis/us/flexure.ts'

export const FIFTY: Steel = { F_y: as('stress', 50 * UNIT.ksi), E: as('stress', 29_000 * UNIT.ksi) }

export const shape = (name: string): Section => sectionOf({ kind: 'rolled', shape: catalogue.iShape(name)! })

export const capped = (name: string, channel: string): Section =>
  sectionOf({
    kind: 'rolled',
    shape: catalogue.iShape(name)!,
    cap: { kind: 'channel', channel: catalogue.channel(channel)! },
  })

/** Plates in inches. */
export const plated = (
  top: readonly [width: number, thickness: number],
  web: readonly [depth: number, thickness: number],
  bottom: readonly [width: number, thickness: number],
): Section => {
  const inches = (value: number) => as('length', value * UNIT.in)
  const flange = ([width, thickness]: readonly [number, number]) => ({
    width: inches(width),
    thickness: inches(thickness),
  })
  return sectionOf({
    kind: 'plated',
    topFlange: flange(top),
    web: { depth: inches(web[0]), thickness: inches(web[1]) },
    bottomFlange: flange(bottom),
  })
}

const BRANTOFT = {
  format: 'longtravel-job',
  version: 1,
  project: { title: 'Brantoft Winding Shed (invented)' },
  basis: { standard: 'us' },
  cranes: [
    {
      name: 'A',
      ratedCapacity: '30 kip',
      bridgeWeight: '24 kip',
      trolleyWeight: '6 kip',
      bridgeSpan: '50 ft',
      hookApproach: '4 ft',
      operation: 'cab',
      serviceClass: 'C',
      wheelSpacings: ['9 ft'],
    },
  ],
  runway: { spans: ['25 ft'], rail: { name: 'ASCE 60' }, bearingLength: '8 in' },
  girder: { steel: { name: 'A992' }, section: { kind: 'rolled', shape: 'W27X94' } },
} as const

/** The job's file while a test changes it. */
interface Draft {
  readonly basis: Record<string, unknown>
  readonly cranes: Record<string, unknown>[]
  readonly runway: Record<string, unknown>
  readonly girder: { readonly section: Record<string, unknown> }
}

/** The review of the invented job with a change made to its file. */
export function reviewed(change: (job: Draft) => void = () => undefined): Review {
  const job = structuredClone(BRANTOFT) as unknown as Draft
  change(job)
  const result = reviewText(JSON.stringify(job), catalogue)
  if (!result.ok) throw new Error(result.findings.map(({ path, message }) => `${path}: ${message}`).join('; '))
  return result.review
}

export const check = (review: Review, id: string): Check => {
  const found = review.checks.find((each) => each.id === id)
  if (found === undefined) throw new Error(`no check ${id}`)
  return found
}
