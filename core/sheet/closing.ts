/** What is handed on, what to take care of, the editions, and the place for a seal. */
import type { UnitSystem } from '../quantity/kinds.ts'
import { STANDING_CAUTIONS } from '../review/cautions.ts'
import type { Review } from '../review/types.ts'
import { caution, heading, left, plain, right, shown } from './block.ts'
import type { Block } from './types.ts'

export function handedOnPart({ handedOn }: Review, units: UnitSystem, number: string): readonly Block[] {
  const turned = handedOn.brackets.some(({ moment }) => moment !== undefined)
  return [
    heading(1, number, 'Handed on to brackets and bracing'),
    plain('Greatest of any set of cranes, without load factors.'),
    {
      block: 'table',
      columns: [
        left('Support', 12),
        right('Dead load', 17),
        right('Wheels, static', 18),
        right('With impact', 17),
        right('Side thrust', 17),
        ...(turned ? [right('Bracket moment', 19)] : []),
      ],
      rows: handedOn.brackets.map(({ support, dead, wheels, wheelsWithImpact, sideThrust, moment }) => [
        `${support + 1}`,
        shown(dead, units),
        shown(wheels, units),
        shown(wheelsWithImpact, units),
        shown(sideThrust, units),
        ...(turned ? [shown(moment, units)] : []),
      ]),
    },
    plain(`Longitudinal force of this rail: ${shown(handedOn.longitudinal, units)}.`),
  ]
}

export function closingPart({ cautions, editions }: Review, _units: UnitSystem, number: string): readonly Block[] {
  return [
    heading(1, number, 'Cautions'),
    ...[...cautions, ...STANDING_CAUTIONS].map(caution),
    heading(2, `${number}.1`, 'Editions'),
    ...editions.map((edition) => plain(edition)),
    { block: 'seal', text: 'Reviewed and sealed by' },
  ]
}
