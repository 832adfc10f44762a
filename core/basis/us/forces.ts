/**
 * Crane forces of ASCE 7-22 section 4.9 on one rail, before any load factor: impact, side thrust, longitudinal force.
 * The percentages are from memory of the standard; compare them with the book in use.
 */
import { chapter } from '../../formula/chapter.ts'
import { working, type Working, type WorkingRecorder } from '../../formula/working.ts'
import type { Basis, Crane } from '../../job/types.ts'
import { as, type Newton } from '../../quantity/kinds.ts'

const cranes = chapter('ASCE 7-22', '4.9')

const TOTAL_SIDE_THRUST = cranes.formula('4.9.4', {
  gives: ['H', 'force'],
  where: { Q: 'force', W_l: 'force', W_t: 'force' },
  text: '0.20*(Q + W_l + W_t)',
  note: 'Q rated capacity, W_l lifting gear below the hook, W_t trolley with hoist',
})
const EQUAL_SHARE = cranes.formula('4.9.4', {
  gives: ['H_w', 'force'],
  where: { s: 'ratio', H: 'force', n: 'ratio' },
  text: 's*H/n',
  note: 's part of the thrust that this rail takes, shared equally by its n wheels',
})
const SHARE_BY_LOAD = cranes.formula('4.9.4', {
  gives: ['H_w', 'force'],
  where: { s: 'ratio', H: 'force', P: 'force', P_sum: 'force' },
  text: 's*H*P/P_sum',
  note: 's part of the thrust that this rail takes, shared by its wheels as their loads',
})
const LONGITUDINAL = cranes.formula('4.9.5', {
  gives: ['F_L', 'force'],
  where: { P_sum: 'force' },
  text: '0.10*P_sum',
  note: 'P_sum sum of the greatest wheel loads of this rail, without impact',
})

export interface CraneForces {
  /** Part of the wheel load that impact adds. */
  readonly impact: number
  /** Horizontal force on each wheel, either way, at the rail's head. */
  readonly sideThrust: readonly Newton[]
  /** Along the rail, either way, of all its wheels together. */
  readonly longitudinal: Newton
  readonly working: Working
  readonly cautions: readonly string[]
}

/**
 * Impact (4.9.3), side thrust (4.9.4) and longitudinal force (4.9.5) of one crane on this rail.
 * @param wheels static greatest wheel loads of this rail, N
 */
export function craneForces(basis: Basis, crane: Crane, wheels: readonly Newton[]): CraneForces {
  const on = working()
  const cautions: string[] = []
  const impact = impactOf(basis, crane, cautions)
  if (basis.impact === 'standard')
    on.row('Impact', impact.reason, [['I', 'ratio', impact.fraction]], cranes.clause('4.9.3'))
  else on.given('I', 'ratio', impact.fraction, impact.reason)

  const sum = as('force', total(wheels))
  const sideThrust = sideThrustOf(basis, crane, wheels, sum, on)
  let longitudinal = as('force', 0)
  if (crane.bridgeDrive === 'hand') on.note('No longitudinal force: the bridge is hand-geared.', cranes.clause('4.9.5'))
  else longitudinal = on.take(LONGITUDINAL, { P_sum: sum })
  return { impact: impact.fraction, sideThrust, longitudinal, working: on, cautions }
}

function impactOf(basis: Basis, crane: Crane, cautions: string[]): { fraction: number; reason: string } {
  if (basis.impact !== 'standard') return { fraction: basis.impact, reason: 'impact, as entered' }
  const drives = [crane.bridgeDrive, crane.trolleyDrive, crane.hoistDrive]
  if (drives.every((drive) => drive === 'hand')) {
    return { fraction: 0, reason: 'bridge, trolley and hoist all hand-geared' }
  }
  switch (crane.operation) {
    case 'pendant':
      return { fraction: 0.1, reason: 'powered, pendant-operated' }
    case 'cab':
    case 'remote':
      return { fraction: 0.25, reason: `powered, ${crane.operation}-operated` }
    case 'hand':
      cautions.push(
        `${crane.name}: operated by hand but with a powered drive, which ASCE 7-22 4.9.3 does not list; the 25 % of powered cranes is used.`,
      )
      return { fraction: 0.25, reason: 'hand-operated with a powered drive, taken as powered' }
  }
}

function sideThrustOf(
  basis: Basis,
  crane: Crane,
  wheels: readonly Newton[],
  sum: Newton,
  on: WorkingRecorder,
): readonly Newton[] {
  if (crane.trolleyDrive === 'hand') {
    on.note('No side thrust: the trolley is not powered.', cranes.clause('4.9.4'))
    return wheels.map(() => as('force', 0))
  }
  if (crane.trolleyWeight === undefined) throw new Error(`${crane.name}: side thrust needs the trolley's weight`)
  const H = on.take(TOTAL_SIDE_THRUST, { Q: crane.ratedCapacity, W_l: crane.belowHook, W_t: crane.trolleyWeight })
  const s = basis.sideThrustShare
  if (basis.sideThrustPerWheel === 'by-load') {
    return wheels.map((P) => on.take(SHARE_BY_LOAD, { s, H, P, P_sum: sum }))
  }
  const each = on.take(EQUAL_SHARE, { s, H, n: wheels.length })
  return wheels.map(() => each)
}

const total = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0)
