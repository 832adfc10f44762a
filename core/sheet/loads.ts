/** Wheel loads and crane forces, each crane with its derivation. */
import { writeWorking } from '../formula/write.ts'
import type { Review } from '../review/types.ts'
import { as, type UnitSystem } from '../quantity/kinds.ts'
import { heading, left, plain, right, shown } from './block.ts'
import type { Block } from './types.ts'

export function loadsPart(review: Review, units: UnitSystem, number: string): readonly Block[] {
  const { job, wheels, actions, deadLoad, combinations } = review
  const force = (value: number | undefined): string =>
    shown(value === undefined ? undefined : { kind: 'force', value: as('force', value) }, units)
  const blocks: Block[] = [heading(1, number, 'Cranes and wheel loads')]
  job.cranes.forEach((crane, index) => {
    const { greatest, least, empty, working } = wheels[index]!
    const action = actions[index]!
    blocks.push(
      heading(2, `${number}.${index + 1}`, crane.name),
      { block: 'working', lines: writeWorking(working, units) },
      {
        block: 'table',
        columns: [
          left('Wheel', 14),
          right('Greatest', 21),
          right('Least', 21),
          right('Empty', 21),
          right('Side thrust', 23),
        ],
        rows: greatest.map((load, wheel) => [
          `${wheel + 1}`,
          force(load),
          force(least?.[wheel]),
          force(empty?.[wheel]),
          shown(action.sideThrustPerWheel[wheel], units),
        ]),
        caption: 'Static, without impact and load factors.',
      },
      { block: 'working', lines: writeWorking(action.working, units) },
    )
  })
  blocks.push(
    heading(2, `${number}.${job.cranes.length + 1}`, 'Dead load'),
    { block: 'working', lines: writeWorking(deadLoad.working, units) },
    heading(2, `${number}.${job.cranes.length + 2}`, 'Combinations'),
    ...combinations.map(({ name, clause, text }) => plain(`${name}: ${text}.`, clause)),
  )
  return blocks
}
