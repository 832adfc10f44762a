/** The absolute maximum moment by stepping train and section: the method whose error shrinks only with its step. */

export interface March {
  readonly span: number
  readonly loads: readonly number[]
  readonly offsets: readonly number[]
}

/** Greatest moment under any wheel over `steps` evenly spaced positions of the first wheel. */
export function marchedMoment({ span, loads, offsets }: March, steps: number): number {
  const length = offsets.at(-1)!
  let greatest = 0
  for (let step = 0; step <= steps; step++) {
    const lead = -length + ((span + length) * step) / steps
    let reaction = 0
    for (let i = 0; i < loads.length; i++) {
      const x = lead + offsets[i]!
      if (x >= 0 && x <= span) reaction += (loads[i]! * (span - x)) / span
    }
    let left = 0
    for (let i = 0; i < loads.length; i++) {
      const x = lead + offsets[i]!
      if (x < 0 || x > span) continue
      // Moment of the wheels left of x about x, carried from wheel to wheel.
      const moment = reaction * x - left * x + weighted(loads, offsets, lead, i)
      left += loads[i]!
      if (moment > greatest) greatest = moment
    }
  }
  return greatest
}

function weighted(loads: readonly number[], offsets: readonly number[], lead: number, until: number): number {
  let sum = 0
  for (let i = 0; i < until; i++) {
    const x = lead + offsets[i]!
    if (x >= 0) sum += loads[i]! * x
  }
  return sum
}
