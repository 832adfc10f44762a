/** Checks that US practice owes a runway girder and this version does not make: named, each with its reason. */
import { leaveOutClause } from '../../sources/coverage.ts'
import type { Verdict } from '../types.ts'
import type { Design } from './design.ts'

const LEFT_OUT = [
  ['F5', 'slender webs in bending'],
  ['F13.1', 'holes in a flange: none can be entered'],
  ['H3.3', 'mixed torsion with its warping stresses'],
  ['J2.4', 'welds'],
  ['J10.4', 'web sidesway buckling'],
  ['J10.5', 'web compression buckling'],
  ['J10.8', 'bearing stiffeners: none can be entered'],
  ['App. 3', 'fatigue'],
] as const
for (const [clause, reason] of LEFT_OUT) {
  leaveOutClause({ document: 'AISC 360-22', clause }, 'not-covered', `Not in this version: ${reason}.`)
}
leaveOutClause(
  { document: 'AISC 360-22', clause: 'G2.2' },
  'not-applicable',
  'No tension field is counted on in a runway girder (common practice).',
)
leaveOutClause(
  { document: 'AISC 360-22', clause: 'J10.1' },
  'not-applicable',
  'A wheel presses on the flange; J10.1 is for tension.',
)

export function owed({ job, section }: Design): readonly Verdict[] {
  const aisc = 'AISC 360-22'
  const later = 'This version does not make this check.'
  const fatigue = `${later} A runway girder is loaded often enough for appendix 3 to apply.`
  const verdicts: Verdict[] = [
    {
      id: 'us.torsion',
      title: 'Torsion',
      clause: { document: aisc, clause: 'H3' },
      status: 'not-applicable',
      why: 'Torsion is carried as a couple on the flanges, judged with their bending.',
    },
    {
      id: 'us.web.sidesway',
      title: 'Web sidesway buckling under a wheel',
      clause: { document: aisc, clause: 'J10.4' },
      status: 'not-covered',
      why: later,
    },
    {
      id: 'us.web.compression.support',
      title: 'Web compression buckling, wheel over the bearing',
      clause: { document: aisc, clause: 'J10.5' },
      status: 'not-covered',
      why: later,
    },
    {
      id: 'us.bearing-stiffener',
      title: 'Bearing stiffeners',
      clause: { document: aisc, clause: 'J10.8' },
      status: 'not-covered',
      why: `${later} J10.7 asks full-depth stiffeners where the girder’s end is not otherwise held against rotation.`,
    },
    {
      id: 'us.stiffener',
      title: 'Intermediate stiffeners',
      clause: { document: aisc, clause: 'G2.4' },
      status: 'not-applicable',
      why: 'The girder has none.',
    },
    {
      id: 'us.fatigue.peak',
      title: 'Fatigue, peak stress',
      clause: { document: aisc, clause: 'App. 3' },
      status: 'not-covered',
      why: fatigue,
    },
    {
      id: 'us.fatigue.flange',
      title: 'Fatigue, flange away from welds',
      clause: { document: aisc, clause: 'App. 3' },
      status: 'not-covered',
      why: fatigue,
    },
  ]
  const welds: [when: boolean, id: string, title: string][] = [
    [section.makeUp === 'plated', 'flange-web', 'web to flange'],
    [job.girder.section.cap !== undefined, 'cap', 'cap to flange'],
  ]
  for (const [when, id, title] of welds) {
    if (!when) continue
    verdicts.push(
      {
        id: `us.weld.${id}`,
        title: `Weld, ${title}`,
        clause: { document: aisc, clause: 'J2.4' },
        status: 'not-covered',
        why: later,
      },
      {
        id: `us.fatigue.${id}`,
        title: `Fatigue, weld ${title}`,
        clause: { document: aisc, clause: 'App. 3' },
        status: 'not-covered',
        why: fatigue,
      },
    )
  }
  return verdicts
}
