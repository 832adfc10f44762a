/** The girder's section: drawing and properties. */
import { sectionFigure } from '../figure/section.ts'
import type { Kind, KindValue, UnitSystem } from '../quantity/kinds.ts'
import type { Review } from '../review/types.ts'
import { sectionName } from '../section/name.ts'
import { heading, left, plain, right, shown } from './block.ts'
import { FIGURE_WIDTH } from './governing.ts'
import type { Block } from './types.ts'

export function sectionPart({ section, job }: Review, units: UnitSystem, number: string): readonly Block[] {
  const q = <K extends Kind>(kind: K, value: KindValue[K]): string => shown({ kind, value }, units)
  const { top, bottom } = section
  const table = (rows: readonly (readonly string[])[]): Block => ({
    block: 'table',
    columns: [left('Property', 30), right('Value', 20), left('Property', 30), right('Value', 20)],
    rows: pairs(rows),
  })
  return [
    heading(1, number, 'Section'),
    plain(`${sectionName(job.girder.section, units)}, ${job.girder.steel.name}.`),
    {
      block: 'figure',
      figure: sectionFigure(section, job.girder.section, { units, width: FIGURE_WIDTH, rail: job.runway.rail }),
      caption: 'Cross-section with rail',
    },
    table([
      ['Area A', q('area', section.A)],
      ['Depth', q('length', section.depth)],
      ['Centroid above bottom', q('length', section.yBar)],
      ['Plastic axis above bottom', q('length', section.yPlastic)],
      ['Ix', q('inertia', section.Ix)],
      ['Iy', q('inertia', section.Iy)],
      ['Sx, top', q('modulus', section.SxTop)],
      ['Sx, bottom', q('modulus', section.SxBottom)],
      ['Zx', q('modulus', section.Zx)],
      ['Zy', q('modulus', section.Zy)],
      ['J', q('inertia', section.J)],
      ['Cw', q('warping', section.Cw)],
      ['rx', q('length', section.rx)],
      ['ry', q('length', section.ry)],
      ['ho', q('length', section.ho)],
      section.doublySymmetric ? ['rts', q('length', section.rts)] : ['rt', q('length', section.rt)],
      ['Top flange system: A', q('area', top.A)],
      ['Top flange system: I', q('inertia', top.I)],
      ['Top flange system: S', q('modulus', top.S)],
      ['Top flange system: Z', q('modulus', top.Z)],
      ['Bottom flange: S', q('modulus', bottom.S)],
      ['Bottom flange: Z', q('modulus', bottom.Z)],
      ['Mass', q('lineMass', section.massPerLength)],
    ]),
  ]
}

/** Two properties side by side. */
const pairs = (rows: readonly (readonly string[])[]): readonly (readonly string[])[] =>
  Array.from({ length: Math.ceil(rows.length / 2) }, (_, index) => [
    ...rows[2 * index]!,
    ...(rows[2 * index + 1] ?? ['', '']),
  ])
