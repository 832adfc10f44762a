/** The US rules, visited once: everything that is asked of this girder. */
import type { Ask, Plan, Verdict } from '../types.ts'
import { bendingOf } from './bending.ts'
import type { Design } from './design.ts'
import { shearAsks, webPlan } from './local.ts'
import { owed } from './owed.ts'
import { proportions } from './proportions.ts'
import { deflectionAsks } from './service.ts'

/** Spans to be checked: the one chosen, or every one that differs from those before it. */
function spansOf({ job }: Design): readonly number[] {
  if (job.runway.checkSpan !== undefined) return [job.runway.checkSpan]
  const { spans } = job.runway
  return spans.flatMap((length, index) => (spans.indexOf(length) === index ? [index] : []))
}

/** Asks and verdicts of AISC 360-22 and ASCE 7-22 for a simple-span runway girder. */
export function plan(design: Design): Plan {
  const asks: Ask[] = []
  const verdicts: Verdict[] = [proportions(design.section, design.steel), ...owed(design)]
  const cautions: string[] = [...design.cautions]
  for (const span of spansOf(design)) {
    const bending = bendingOf(design, span)
    const web = webPlan(design, span)
    asks.push(...bending.asks, ...shearAsks(design, span), ...web.asks, ...deflectionAsks(design, span))
    verdicts.push(...bending.verdicts, ...web.verdicts)
    cautions.push(...bending.cautions)
  }
  return { asks, verdicts, cautions: [...new Set([...cautions, ...PRACTICE])] }
}

/** What common practice asks of every runway girder, beyond what is computed. */
const PRACTICE = [
  'Points of support must be held against rotation about the girder’s axis (AISC 360-22 F1(b), J10.7); tie-backs must let the girder’s end rotate and shorten.',
  'Rail alignment, clips and the eccentricity entered are to be kept in service; nothing may be welded to the tension flange.',
]
