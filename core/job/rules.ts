/** What no single entry shows: entries that must fit each other, and entries that another one makes necessary or idle. */
import { find, placed, seen, type Walked } from './walk.ts'
import { steelOf, STEELS } from './steel.ts'
import type { FieldPath } from './fields.ts'

/** Notes a finding for every rule between entries that is broken, as far as the entries themselves could be read. */
export const checkTogether = (walked: Walked): void => {
  const cranes = seen(walked, 'cranes') ?? []
  for (const crane of cranes.keys()) {
    wheels(walked, crane)
    weights(walked, crane)
    hookApproaches(walked, crane)
  }
  names(walked, cranes.length)
  cranesTogether(walked, cranes.length)
  runway(walked)
  section(walked)
  steels(walked)
}

/** How a crane is called: as entered, else by its number. */
export const craneName = (walked: Walked, crane: number): string =>
  (seen(walked, 'cranes[].name', crane) ?? `Crane ${crane + 1}`).trim()

/** The crane a key of a set means, by name or else by its index from 0; undefined where there is none. */
export const craneOfKey = (walked: Walked, key: string, count: number): number | undefined => {
  const named = Array.from({ length: count }, (_, crane) => craneName(walked, crane)).indexOf(key.trim())
  if (named >= 0) return named
  return /^\d{1,3}$/.test(key) && Number(key) < count ? Number(key) : undefined
}

/** The drive of a motion as entered; left out, all are by hand where the crane is operated by hand. */
export const driveOf = (
  walked: Walked,
  path: 'cranes[].bridgeDrive' | 'cranes[].trolleyDrive' | 'cranes[].hoistDrive',
  crane: number,
): 'powered' | 'hand' =>
  seen(walked, path, crane) ?? (seen(walked, 'cranes[].operation', crane) === 'hand' ? 'hand' : 'powered')

const LOADS = ['cranes[].wheelLoad', 'cranes[].leastWheelLoad', 'cranes[].emptyWheelLoad'] as const

const wheels = (walked: Walked, crane: number): void => {
  const spacings = seen(walked, 'cranes[].wheelSpacings', crane)
  if (!spacings) return
  const count = spacings.length + 1
  for (const path of LOADS) {
    const loads = seen(walked, path, crane)
    if (Array.isArray(loads) && loads.length !== count)
      note(
        walked,
        path,
        crane,
        `a list of ${loads.length} values`,
        `must be a list of ${count} values, one for each wheel that wheelSpacings gives`,
      )
  }
  const driven = seen(walked, 'cranes[].drivenWheels', crane)
  if (driven === undefined || driven === count) return
  note(
    walked,
    'cranes[].drivenWheels',
    crane,
    String(driven),
    driven > count
      ? `must be a whole number from 0 to ${count}, the wheels on this rail`
      : `any number but all ${count} wheels is not covered by this version`,
  )
}

const weights = (walked: Walked, crane: number): void => {
  const isDerived = (path: (typeof LOADS)[number]) =>
    seen(walked, path, crane) === 'derive' && (path === LOADS[0] || !walked.defaults.has(placed(path, [crane])))
  const derived = LOADS.filter(isDerived).map((path) => path.slice('cranes[].'.length))
  const split =
    seen(walked, 'basis.craneDeadFactor') === 'split' && seen(walked, 'cranes[].emptyWheelLoad', crane) === 'derive'
  if (split && !derived.includes('emptyWheelLoad')) derived.push('emptyWheelLoad')
  const why = [
    ...(derived.length > 0 ? [`${derived.join(', ')} ${derived.length > 1 ? 'are' : 'is'} derived from it`] : []),
    ...(split ? ['basis.craneDeadFactor is "split"'] : []),
  ]
  if (derived.length > 0) require(walked, 'cranes[].bridgeWeight', crane, why)
  const thrust = driveOf(walked, 'cranes[].trolleyDrive', crane) === 'powered'
  if (derived.length > 0 || thrust)
    require(walked, 'cranes[].trolleyWeight', crane, [
      ...why,
      ...(thrust ? ['a powered trolley causes side thrust'] : []),
    ])
}

const require = (walked: Walked, path: FieldPath, crane: number, why: readonly string[]): void => {
  if (seen(walked, path, crane) === undefined)
    note(walked, path, crane, undefined, `is required, since ${why.join(' and ')}`)
}

const hookApproaches = (walked: Walked, crane: number): void => {
  const span = seen(walked, 'cranes[].bridgeSpan', crane)
  const near = seen(walked, 'cranes[].hookApproach', crane)
  if (span === undefined || near === undefined) return
  if (near >= span) {
    note(
      walked,
      'cranes[].hookApproach',
      crane,
      metres(near),
      `must be less than the span of the bridge, ${metres(span)}`,
    )
    return
  }
  const far = seen(walked, 'cranes[].hookApproachFar', crane) ?? near
  // A rounding error in the last digits of "1.2 m" and "21.8 m" of 23 m must not refuse a hook that cannot travel.
  if (near + far > span * (1 + 1e-12))
    note(
      walked,
      'cranes[].hookApproachFar',
      crane,
      metres(far),
      `both hook approaches together must be at most the span of the bridge, ${metres(span)}`,
    )
}

const names = (walked: Walked, count: number): void => {
  const taken = new Map<string, number>()
  for (let crane = 0; crane < count; crane++) {
    const name = craneName(walked, crane)
    const other = taken.get(name)
    if (other === undefined) taken.set(name, crane)
    else
      note(
        walked,
        'cranes[].name',
        crane,
        JSON.stringify(name),
        `cranes[${other}] has the same name; each crane needs its own`,
      )
  }
}

const cranesTogether = (walked: Walked, count: number): void => {
  const sets = seen(walked, 'basis.cranesTogether')
  if (sets === undefined || typeof sets === 'string') return
  for (const [index, keys] of sets.entries()) {
    const taken = new Map<number, string>()
    for (const key of keys) {
      const path = placed('basis.cranesTogether[].{crane}.vertical', [index, key]).replace(/\.vertical$/, '')
      const crane = craneOfKey(walked, key, count)
      const known = Array.from({ length: count }, (_, one) => JSON.stringify(craneName(walked, one))).join(', ')
      if (crane === undefined) find(walked, path, key, `names no crane; the cranes are ${known}, or their index from 0`)
      else if (taken.has(crane)) find(walked, path, key, `means the same crane as ${JSON.stringify(taken.get(crane))}`)
      else taken.set(crane, key)
    }
  }
}

const runway = (walked: Walked): void => {
  const spans = seen(walked, 'runway.spans')
  const checkSpan = seen(walked, 'runway.checkSpan')
  if (spans && checkSpan !== undefined && checkSpan >= spans.length)
    find(
      walked,
      'runway.checkSpan',
      checkSpan,
      `Span checked: must be a whole number from 0 to ${spans.length - 1}, counted from 0`,
    )
  const height = seen(walked, 'runway.rail.height') ?? seen(walked, 'runway.rail.name')?.height
  const wear = seen(walked, 'runway.rail.wear')
  if (height !== undefined && wear !== undefined && wear >= height)
    find(walked, 'runway.rail.wear', metres(wear), `Wear: must be less than the height of the rail, ${metres(height)}`)
}

const section = (walked: Walked): void => {
  const at = <K extends 'd' | 'bf' | 'tw' | 'tf' | 'r'>(key: K) => seen(walked, `girder.section.shape.${key}`)
  const [d, bf, tw, tf, r] = [at('d'), at('bf'), at('tw'), at('tf'), at('r')]
  if (d !== undefined && tf !== undefined && r !== undefined && 2 * (tf + r) >= d)
    find(walked, 'girder.section.shape.d', metres(d), 'Depth d: must be more than two flange thicknesses and two radii')
  if (bf !== undefined && tw !== undefined && r !== undefined && tw + 2 * r > bf)
    find(
      walked,
      'girder.section.shape.bf',
      metres(bf),
      'Flange width bf: must be at least the web’s thickness and two radii',
    )
  const web = seen(walked, 'girder.section.web.thickness')
  for (const path of ['girder.section.topFlange.width', 'girder.section.bottomFlange.width'] as const) {
    const width = seen(walked, path)
    if (web !== undefined && width !== undefined && web > width)
      find(walked, path, metres(width), `Width: must be at least the web’s thickness, ${metres(web)}`)
  }
}

const steels = (walked: Walked): void => {
  for (const part of STEELS) {
    const fy = seen(walked, `${part}.fy`)
    const fu = seen(walked, `${part}.fu`)
    if (fy !== undefined && fu !== undefined && fu < fy)
      find(
        walked,
        `${part}.fu`,
        `${fu / 1e6} MPa`,
        `Tensile strength: must not be below the yield stress, ${fy / 1e6} MPa`,
      )
    else if (seen(walked, part)) steelOf(walked, part)
  }
}

const note = (walked: Walked, path: FieldPath, crane: number, read: string | undefined, message: string): void =>
  find(walked, placed(path, [crane]), read, message)

const metres = (value: number): string => `${Number(value.toPrecision(6))} m`
