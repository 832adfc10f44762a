/** Timing that a noisy machine disturbs least: the least of several rounds, each long enough for the clock. */

export interface Row {
  readonly name: string
  readonly milliseconds: number
  /** The same work another way, or work to compare with, in the same run. */
  readonly reference: number
  /** Reference over measured: above 1 where the program is faster. */
  readonly ratio: number
}

/** Milliseconds of one call: warmed up, then the least mean of nine rounds of at least 20 ms. */
export function timed(work: () => unknown): number {
  const round = (calls: number): number => {
    const start = performance.now()
    for (let i = 0; i < calls; i++) work()
    return performance.now() - start
  }
  let calls = 1
  while (round(calls) < 20) calls *= 2
  let least = Infinity
  for (let i = 0; i < 9; i++) least = Math.min(least, round(calls) / calls)
  return least
}
