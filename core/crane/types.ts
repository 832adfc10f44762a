/** The wheels standing on one rail. Loads are static, in N; offsets in m from the train's first listed wheel. */
import type { Metre, Newton } from '../quantity/kinds.ts'

export interface Wheel {
  /** Index of the crane in the job. */
  readonly crane: number
  /** Its place in the crane's own list of wheels, from 0, however the crane stands. */
  readonly wheel: number
  readonly offset: Metre
  readonly load: Newton
}

/**
 * Wheels that travel as one: a crane, or neighbouring cranes as close as their bumpers let them.
 * Each crane of a train of several stands its own way about (`turned`); a single crane is listed once, unturned.
 */
export interface WheelTrain {
  readonly cranes: readonly number[]
  readonly turned: readonly boolean[]
  readonly wheels: readonly Wheel[]
  /** True where the train standing the other way about is a different load and the job allows it (single cranes only). */
  readonly mayMirror: boolean
}
