/** Short ways to write make-ups in the tests of this folder. */
import type { Channel, IShape } from '../../core/catalogue/types.ts'
import { catalogue } from '../../core/catalogue/load.ts'
import type { Plate, SectionEntry } from '../../core/job/types.ts'
import { as } from '../../core/quantity/kinds.ts'

export const plate = (width: number, thickness: number): Plate => ({
  width: as('length', width),
  thickness: as('length', thickness),
})

export const plated = (top: Plate, depth: number, web: number, bottom: Plate): SectionEntry => ({
  kind: 'plated',
  topFlange: top,
  web: { depth: as('length', depth), thickness: as('length', web) },
  bottomFlange: bottom,
})

/** A shape of one's own: dimensions and fillet, no figures unless given. */
export const ownShape = (
  [d, bf, tw, tf, r]: readonly [number, number, number, number, number],
  figures: IShape['figures'] = {},
): IShape => ({
  name: 'own',
  family: 'own',
  source: 'entered',
  d: as('length', d),
  bf: as('length', bf),
  tw: as('length', tw),
  tf: as('length', tf),
  k: as('length', tf + r),
  r: as('length', r),
  figures,
})

export const iShape = (name: string): IShape => known(catalogue.iShape(name), name)

export const channel = (name: string): Channel => known(catalogue.channel(name), name)

export const capped = (shape: IShape, cap: Channel): SectionEntry => ({
  kind: 'rolled',
  shape,
  cap: { kind: 'channel', channel: cap },
})

const known = <T>(found: T | undefined, name: string): T => {
  if (found === undefined) throw new Error(`${name} is not in the catalogue`)
  return found
}

/** Relative difference of a value from an outside figure. */
export const apart = (value: number, figure: number): number => Math.abs(value / figure - 1)
