/** Everything that was entered, and every default with where it comes from. */
import { echoOf, type Echo } from '../job/echo.ts'
import type { Review } from '../review/types.ts'
import type { UnitSystem } from '../quantity/kinds.ts'
import { heading, plain } from './block.ts'
import type { Block } from './types.ts'

export function entriesPart({ job }: Review, _units: UnitSystem, number: string): readonly Block[] {
  const echo = echoOf(job).filter(({ path }) => path !== 'project.notes')
  const groups = [...new Set(echo.map(({ group }) => group))]
  const blocks: Block[] = [
    heading(1, number, 'Entries'),
    plain('As entered. What was left out took the default shown, with its source.'),
  ]
  groups.forEach((group, index) => {
    blocks.push(heading(2, `${number}.${index + 1}`, titleOf(group, job.cranes)), {
      block: 'entries',
      rows: echo.filter((entry) => entry.group === group).map(rowOf),
    })
  })
  if (job.project.notes !== undefined) {
    blocks.push(heading(2, `${number}.${groups.length + 1}`, 'Notes'))
    blocks.push(...job.project.notes.split(/\n+/).map((text) => plain(text)))
  }
  return blocks
}

const rowOf = ({ name, value, isDefault, source }: Echo) => ({
  label: name,
  value,
  isDefault,
  ...(source === undefined ? {} : { source }),
})

function titleOf(group: string, cranes: Review['job']['cranes']): string {
  const crane = /^cranes\[(\d+)\]$/.exec(group)?.[1]
  if (crane !== undefined) return cranes[Number(crane)]!.name
  return { project: 'Project', basis: 'Rules', runway: 'Runway', girder: 'Girder' }[group] ?? group
}
