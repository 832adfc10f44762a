/** Every outside check, computed. */
import { MOVING_LOADS } from './moving-loads.ts'
import { CAPPED_SECTIONS } from './capped-sections.ts'
import { MEMBERS } from './members.ts'
import { RUNWAY_GIRDER } from './runway-girder.ts'
import type { EvidenceCase, EvidenceResult } from './types.ts'

const CASES: readonly EvidenceCase[] = [...MOVING_LOADS, ...CAPPED_SECTIONS, ...MEMBERS, ...RUNWAY_GIRDER]

/** All cases with the program's own values, in the order of their subjects. A value that is not finite is a fault and throws. */
export function evidence(): readonly EvidenceResult[] {
  return CASES.map((each) => {
    const computed = each.compute()
    if (!Number.isFinite(computed)) throw new Error(`evidence ${each.id}: the computed value is not a finite number`)
    const difference = computed - each.printed
    return { ...each, computed, difference, within: Math.abs(difference) <= each.tolerance }
  })
}
