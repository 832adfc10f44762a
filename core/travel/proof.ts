/** The rule by which a person checks an absolute maximum moment of a simple span by hand. */
import { as, type Metre, type Newton } from '../quantity/kinds.ts'
import { STATION_TOLERANCE, spanOf } from './influence.ts'
import { stationsOf } from './place.ts'
import type { Drive, Extreme, MomentTerm } from './types.ts'

/** Distances are signed, positive to the right. */
export interface MomentProof {
  /** Wheels on the span, by index in the train, and the resultant of their forces. */
  readonly on: readonly number[]
  readonly resultant: Newton
  readonly resultantStation: Metre
  /** The wheel under which the moment is greatest, by index in the train. */
  readonly wheel: number
  /** From that wheel to the resultant. */
  readonly distance: Metre
  /** From midspan to the wheel and to the resultant: equal and opposite where wheels act alone. */
  readonly wheelFromMidspan: Metre
  readonly resultantFromMidspan: Metre
  /** Sum of the two distances from midspan, by which they are not equal and opposite... */
  readonly shift: Metre
  /** ... and what uniform load and end moments make it: (M_right - M_left - w L e) / R, e the wheel's distance from midspan. */
  readonly shiftByOtherLoads: Metre
}

/**
 * Proof of the greatest moment of one 'worst' term: the moment under a wheel is greatest where its derivative by the train's
 * position is zero, with R at the distance f from midspan and the wheel at e: R (e + f) + w L e - (M_right - M_left) = 0.
 * Without other load the wheel and the resultant of the wheels on the span are equidistant from midspan (statics; stated in
 * the general rules of AISC Manual Table 3-23, from memory). `extreme` is what driving that one term has given. Undefined where
 * the section is not under a wheel: no wheel on the span, or end moments that are greatest at a support.
 */
export const momentProof = ({ beam, trains }: Drive, extreme: Extreme, term: MomentTerm): MomentProof | undefined => {
  const { start, length: L } = spanOf(beam, extreme.span)
  const middle = start + L / 2
  const train = extreme.train === undefined ? undefined : trains[extreme.train]
  const stations = stationsOf(train, extreme.mirrored, extreme.lead)
  const resultant = extreme.on.reduce((sum, i) => sum + term.wheels[i]!, 0)
  if (!(resultant > 0)) return undefined
  const resultantStation = extreme.on.reduce((sum, i) => sum + term.wheels[i]! * stations[i]!, 0) / resultant
  const near = 1e3 * STATION_TOLERANCE * (start + L)
  const off = (i: number): number => Math.abs(stations[i]! - extreme.station)
  const wheel = extreme.on.reduce((a, b) => (off(b) < off(a) ? b : a))
  const atSupport = L / 2 - Math.abs(extreme.station - middle) <= near
  if (off(wheel) > near || atSupport) return undefined
  const e = stations[wheel]! - middle
  const f = resultantStation - middle
  return {
    on: extreme.on,
    resultant: as('force', resultant),
    resultantStation: as('distance', resultantStation),
    wheel,
    distance: as('distance', resultantStation - stations[wheel]!),
    wheelFromMidspan: as('distance', e),
    resultantFromMidspan: as('distance', f),
    shift: as('distance', e + f),
    shiftByOtherLoads: as('distance', (term.ends[1] - term.ends[0] - term.uniform * L * e) / resultant),
  }
}
