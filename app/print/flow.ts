/** Slabs on to pages: what is not torn apart, and what stands again at the head of a page. Lengths in points. */
import type { Pen } from './pen.ts'

/** A piece that stays on one page. */
export interface Slab {
  readonly height: number
  /** Space above; none at the head of a page. */
  readonly gap: number
  /** Stays on the page of the next one. */
  readonly keep: boolean
  readonly draw: (pen: Pen, top: number) => void
  /** Stands above it again where it begins a page: the head of its table. */
  readonly head?: Head
}

export interface Head {
  readonly height: number
  readonly draw: (pen: Pen, top: number) => void
}

export interface Placed {
  /** Index of the slab. */
  readonly index: number
  readonly top: number
  readonly head: boolean
}

/** Slabs of which the last one stays with what follows, where `keep` is true. */
export const keptOn = (slabs: readonly Slab[], keep: boolean): readonly Slab[] =>
  slabs.map((slab, index) => (keep && index === slabs.length - 1 ? { ...slab, keep } : slab))

/**
 * Places slabs on pages of height `room`. Slabs that keep together go to the next page together; where even a whole page
 * does not hold them they are parted between slabs. A slab higher than a page is the fault of whoever made it and throws.
 */
export function flow(slabs: readonly Slab[], room: number): readonly (readonly Placed[])[] {
  const pages: Placed[][] = [[]]
  let used = 0
  const place = (index: number): void => {
    const slab = slabs[index]!
    const first = used === 0
    const top = (first ? 0 : used + slab.gap) + (first && slab.head ? slab.head.height : 0)
    if (!first && top + slab.height > room + SLACK) {
      pages.push([])
      used = 0
      place(index)
      return
    }
    if (top + slab.height > room + SLACK)
      throw new Error(`a piece of ${slab.height} points does not fit on a page that holds ${room}`)
    pages.at(-1)!.push({ index, top, head: first && slab.head !== undefined })
    used = top + slab.height
  }
  for (let index = 0; index < slabs.length;) {
    let end = index + 1
    while (end < slabs.length && slabs[end - 1]!.keep) end += 1
    const chain = slabs.slice(index, end)
    const need = chain.reduce((sum, slab) => sum + slab.gap + slab.height, 0)
    if (used > 0 && used + need > room + SLACK) {
      pages.push([])
      used = 0
    }
    for (; index < end; index += 1) place(index)
  }
  return pages
}

/** Rounding of sums of heights. */
const SLACK = 1e-6
