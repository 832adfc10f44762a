/** Static wheel loads of one crane on this rail, from its weights or as given. */
import { chapter } from '../formula/chapter.ts'
import { working, type Working, type WorkingRecorder } from '../formula/working.ts'
import type { Crane } from '../job/types.ts'
import type { Newton, Ratio } from '../quantity/kinds.ts'

/** Without impact and without any design factor, by wheel in the crane's own order, N. */
export interface CraneWheels {
  /** Rated load, trolley as near to this rail as it comes. */
  readonly greatest: readonly Newton[]
  /**
   * Rated load, trolley as near to the far rail as it comes: this rail's wheels while the far ones have their greatest.
   * Undefined where it is not given and the weights to derive it from are not either; so too for the empty crane.
   */
  readonly least?: readonly Newton[]
  /** No load, trolley as near to the far rail as it comes. */
  readonly empty?: readonly Newton[]
  /** Part of each greatest load that is bridge and trolley; undefined where the weights do not tell it. */
  readonly dead?: readonly Newton[]
  readonly working: Working
  readonly cautions: readonly string[]
}

const bridge = chapter('statics', 'bridge on two rails')

/** Lifted load and trolley at a distance a from one rail, half the bridge on either: what the n wheels of that rail carry. */
const NEAR = bridge.formula('near rail', {
  gives: ['P_max', 'force'],
  where: {
    W_bridge: 'force',
    Q: 'force',
    W_hook: 'force',
    W_trolley: 'force',
    L_bridge: 'distance',
    a: 'distance',
    n: 'ratio',
  },
  text: '(W_bridge/2 + (Q + W_hook + W_trolley)*(L_bridge - a)/L_bridge)/n',
})

const FAR = bridge.formula('far rail', {
  gives: ['P_min', 'force'],
  where: {
    W_bridge: 'force',
    Q: 'force',
    W_hook: 'force',
    W_trolley: 'force',
    L_bridge: 'distance',
    a_far: 'distance',
    n: 'ratio',
  },
  text: '(W_bridge/2 + (Q + W_hook + W_trolley)*a_far/L_bridge)/n',
})

const EMPTY = bridge.formula('unloaded crane', {
  gives: ['P_empty', 'force'],
  where: { W_bridge: 'force', W_trolley: 'force', L_bridge: 'distance', a_far: 'distance', n: 'ratio' },
  text: '(W_bridge/2 + W_trolley*a_far/L_bridge)/n',
})

const DEAD = bridge.formula('bridge and trolley', {
  gives: ['P_dead', 'force'],
  where: { W_bridge: 'force', W_trolley: 'force', L_bridge: 'distance', a: 'distance', n: 'ratio' },
  text: '(W_bridge/2 + W_trolley*(L_bridge - a)/L_bridge)/n',
})

/**
 * Wheel loads of a crane; `index` is its place in the job, for the paths that cautions name. Derived by statics, each rail
 * taking half the bridge, every wheel of a rail the same (common practice); lifting gear below the hook counts with the
 * lifted load. Given loads are taken as they are; where the weights give any wheel a load more than 10 % off, a caution
 * names both. Throws RangeError where the greatest loads are to be derived and a weight is missing, or where a list does not
 * fit the number of wheels: reading a job refuses both.
 */
export const wheelLoads = (crane: Crane, index: number): CraneWheels => {
  const on = working()
  const cautions: string[] = []
  const count = crane.wheelSpacings.length + 1
  const derived = derive(crane, count)
  const entered = [
    ['wheelLoad', crane.wheelLoad],
    ['leastWheelLoad', crane.leastWheelLoad],
    ['emptyWheelLoad', crane.emptyWheelLoad],
  ] as const

  if (derived !== undefined && entered.some(([, list]) => list === 'derive')) startFrom(crane, count, on)
  const [greatest, least, empty] = entered.map(([field, list]) => {
    const path = `cranes[${index}].${field}`
    if (list === 'derive') {
      if (derived === undefined) {
        if (field === 'wheelLoad') throw new RangeError(`${path}: to be derived, but a weight is missing`)
        return undefined
      }
      return new Array<Newton>(count).fill(derived[field](on))
    }
    if (list.length !== count) throw new RangeError(`${path}: ${list.length} loads for ${count} wheels`)
    list.forEach((load, wheel) =>
      on.given(`${SYMBOL[field]}_${wheel + 1}`, 'force', load, `as given, wheel ${wheel + 1}`),
    )
    const expected = derived?.[field](working())
    if (expected !== undefined) cautions.push(...differences(crane.name, path, list, expected))
    return list
  }) as [readonly Newton[], readonly Newton[] | undefined, readonly Newton[] | undefined]

  const part = derived?.dead(crane.wheelLoad === 'derive' ? on : working())
  const within = part === undefined || greatest.every((load) => load >= part)
  if (!within)
    cautions.push(
      `cranes[${index}].wheelLoad: a wheel of ${crane.name} is given less than bridge and trolley make it by their weights. The whole wheel load is taken as lifted.`,
    )
  const dead = part !== undefined && within ? { dead: new Array<Newton>(count).fill(part) } : {}
  return { greatest, ...(least && { least }), ...(empty && { empty }), ...dead, working: on, cautions }
}

const SYMBOL = { wheelLoad: 'P_max', leastWheelLoad: 'P_min', emptyWheelLoad: 'P_empty' } as const

type Take = (on: WorkingRecorder) => Newton

/** The loads by statics, each recorded in the working it is asked with; undefined where a weight is missing. */
const derive = (
  { bridgeWeight, trolleyWeight, ratedCapacity, belowHook, bridgeSpan, hookApproach, hookApproachFar }: Crane,
  count: number,
): Record<keyof typeof SYMBOL | 'dead', Take> | undefined => {
  if (bridgeWeight === undefined || trolleyWeight === undefined) return undefined
  const n: Ratio = count
  const weights = { W_bridge: bridgeWeight, W_trolley: trolleyWeight, L_bridge: bridgeSpan, n }
  const lifted = { ...weights, Q: ratedCapacity, W_hook: belowHook }
  return {
    wheelLoad: (on) => on.take(NEAR, { ...lifted, a: hookApproach }),
    leastWheelLoad: (on) => on.take(FAR, { ...lifted, a_far: hookApproachFar }),
    emptyWheelLoad: (on) => on.take(EMPTY, { ...weights, a_far: hookApproachFar }),
    dead: (on) => on.take(DEAD, { ...weights, a: hookApproach }),
  }
}

const startFrom = (crane: Crane, count: number, on: WorkingRecorder): void => {
  on.given('Q', 'force', crane.ratedCapacity, 'rated capacity')
  if (crane.belowHook > 0) on.given('W_hook', 'force', crane.belowHook, 'lifting gear below the hook')
  if (crane.bridgeWeight !== undefined) on.given('W_bridge', 'force', crane.bridgeWeight, 'bridge with end trucks')
  if (crane.trolleyWeight !== undefined) on.given('W_trolley', 'force', crane.trolleyWeight, 'trolley with hoist')
  on.given('L_bridge', 'distance', crane.bridgeSpan, 'bridge span, rail to rail')
  on.given('a', 'distance', crane.hookApproach, 'least distance of the hook from this rail')
  on.given('a_far', 'distance', crane.hookApproachFar, 'least distance of the hook from the far rail')
  on.given('n', 'ratio', count, 'wheels on this rail')
}

const differences = (name: string, path: string, given: readonly Newton[], expected: Newton): readonly string[] => {
  const worst = given.reduce((a, b) => (Math.abs(b - expected) > Math.abs(a - expected) ? b : a))
  if (Math.abs(worst - expected) <= 0.1 * expected) return []
  const [entry, weights] = [worst, expected].map((load) => `${Number((load / 1000).toPrecision(4))} kN`)
  return [
    `${path}: a wheel of ${name} is given as ${entry}, the weights make it ${weights}. The given loads are used; ask the crane's maker.`,
  ]
}
