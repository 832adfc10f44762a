/** What no single entry shows: entries that must fit each other, and entries that another one makes necessary or idle. */
import { echo } from '../quantity/signs.ts'
import { STEELS, steelOf } from './steel.ts'
import { find, findAt, placed, seen, type Walked } from './walk.ts'

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
      findAt(walked, path, [crane], `must be a list of ${count} values, one for each wheel that wheelSpacings gives`)
  }
  const driven = seen(walked, 'cranes[].drivenWheels', crane)
  if (driven === undefined || driven === count) return
  const why =
    driven > count
      ? `must be a whole number from 0 to ${count}, the wheels on this rail`
      : `any number but all ${count} wheels is not covered by this version`
  findAt(walked, 'cranes[].drivenWheels', [crane], why)
}

const weights = (walked: Walked, crane: number): void => {
  // Least and empty loads that were left out stay unknown where no weight tells them; nothing but the greatest is always needed.
  const asked = (path: (typeof LOADS)[number]): boolean =>
    path === 'cranes[].wheelLoad' || walked.entered.has(placed(path, [crane]))
  const derived = LOADS.filter((path) => asked(path) && seen(walked, path, crane) === 'derive').map((path) =>
    path.slice('cranes[].'.length),
  )
  const why =
    derived.length === 0
      ? []
      : [`${derived.join(', ')} ${derived.length > 1 ? 'are' : 'is'} derived from it where not given`]
  const needs = (path: 'cranes[].bridgeWeight' | 'cranes[].trolleyWeight', because: readonly string[]) => {
    if (because.length > 0 && seen(walked, path, crane) === undefined)
      findAt(walked, path, [crane], `required, since ${because.join(' and ')}`)
  }
  const thrust = driveOf(walked, 'cranes[].trolleyDrive', crane) === 'powered'
  needs('cranes[].bridgeWeight', why)
  needs('cranes[].trolleyWeight', [...why, ...(thrust ? ['a powered trolley causes side thrust'] : [])])
}

const hookApproaches = (walked: Walked, crane: number): void => {
  const span = seen(walked, 'cranes[].bridgeSpan', crane)
  const near = seen(walked, 'cranes[].hookApproach', crane)
  if (span === undefined || near === undefined) return
  if (near >= span) {
    findAt(walked, 'cranes[].hookApproach', [crane], `must be less than the span of the bridge, ${metres(span)}`)
    return
  }
  const entered = seen(walked, 'cranes[].hookApproachFar', crane)
  const far = entered ?? near
  // A rounding error in the last digits of "1.2 m" and "21.8 m" of 23 m must not refuse a hook that cannot travel.
  if (near + far <= span * (1 + 1e-12)) return
  const taken = entered === undefined ? `left out it is taken as ${metres(near)}, like the other; ` : ''
  const why = `${taken}both hook approaches together must be at most the span of the bridge, ${metres(span)}`
  findAt(walked, 'cranes[].hookApproachFar', [crane], why)
}

const names = (walked: Walked, count: number): void => {
  const taken = new Map<string, number>()
  for (let crane = 0; crane < count; crane++) {
    const name = craneName(walked, crane)
    const other = taken.get(name)
    if (other === undefined) taken.set(name, crane)
    else findAt(walked, 'cranes[].name', [crane], `cranes[${other}] has the same name; each crane needs its own`)
  }
}

const cranesTogether = (walked: Walked, count: number): void => {
  const sets = seen(walked, 'basis.cranesTogether')
  if (sets === undefined || typeof sets === 'string') return
  const known = Array.from({ length: count }, (_, crane) => echo(craneName(walked, crane))).join(', ')
  for (const [index, keys] of sets.entries()) {
    const taken = new Map<number, string>()
    for (const key of keys) {
      const path = placed('basis.cranesTogether[].{crane}.vertical', [index, key]).replace(/\.vertical$/, '')
      const crane = craneOfKey(walked, key, count)
      const other = crane === undefined ? undefined : taken.get(crane)
      if (crane === undefined) find(walked, path, key, `names no crane; the cranes are ${known}, or their index from 0`)
      else if (other !== undefined) find(walked, path, key, `means the same crane as ${echo(other)}`)
      else taken.set(crane, key)
    }
  }
}

const runway = (walked: Walked): void => {
  const spans = seen(walked, 'runway.spans')
  const checkSpan = seen(walked, 'runway.checkSpan')
  if (spans && checkSpan !== undefined && checkSpan >= spans.length)
    findAt(walked, 'runway.checkSpan', [], `must be a whole number from 0 to ${spans.length - 1}, counted from 0`)
  const height = seen(walked, 'runway.rail.height') ?? seen(walked, 'runway.rail.name')?.height
  const wear = seen(walked, 'runway.rail.wear')
  if (height !== undefined && wear !== undefined && wear >= height)
    findAt(walked, 'runway.rail.wear', [], `must be less than the height of the rail, ${metres(height)}`)
}

const section = (walked: Walked): void => {
  const at = <K extends 'd' | 'bf' | 'tw' | 'tf' | 'r'>(key: K) => seen(walked, `girder.section.shape.${key}`)
  const [d, bf, tw, tf, r] = [at('d'), at('bf'), at('tw'), at('tf'), at('r')]
  if (d !== undefined && tf !== undefined && r !== undefined && 2 * (tf + r) >= d)
    findAt(walked, 'girder.section.shape.d', [], 'must be more than two flange thicknesses and two radii')
  if (bf !== undefined && tw !== undefined && r !== undefined && tw + 2 * r > bf)
    findAt(walked, 'girder.section.shape.bf', [], 'must be at least the web’s thickness and two radii')
  const web = seen(walked, 'girder.section.web.thickness')
  for (const path of ['girder.section.topFlange.width', 'girder.section.bottomFlange.width'] as const) {
    const width = seen(walked, path)
    if (web !== undefined && width !== undefined && web > width)
      findAt(walked, path, [], `must be at least the web’s thickness, ${metres(web)}`)
  }
}

const steels = (walked: Walked): void => {
  for (const part of STEELS) {
    const fy = seen(walked, `${part}.fy`)
    const fu = seen(walked, `${part}.fu`)
    if (fy !== undefined && fu !== undefined && fu < fy)
      findAt(walked, `${part}.fu`, [], `must not be below the yield stress, ${Number((fy / 1e6).toPrecision(6))} MPa`)
    else if (seen(walked, part)) steelOf(walked, part)
    const [own, E] = [seen(walked, `${part}.E`), seen(walked, 'girder.steel.E')]
    if (seen(walked, part) && own !== undefined && E !== undefined && own !== E)
      findAt(walked, `${part}.E`, [], 'a modulus other than that of girder.steel is not covered by this version')
  }
}

const metres = (value: number): string => `${Number(value.toPrecision(6))} m`
