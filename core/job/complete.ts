/** A job without findings as the value the rest of the program works on. */
import type { Newton } from '../quantity/kinds.ts'
import type { FieldPath, Given } from './fields.ts'
import type { Json } from './json.ts'
import { craneName, craneOfKey, driveOf } from './rules.ts'
import { steelOf, type SteelPath } from './steel.ts'
import type { Basis, Cap, Crane, CraneSet, Girder, Job, Plate, Runway, SectionEntry, SteelEntry } from './types.ts'
import { isObject, placed, seen, type Walked } from './walk.ts'

/** Throws where an entry is missing that the dictionary requires: only without findings may a job be completed. */
export const complete = (walked: Walked, fingerprint: string): Job => ({
  ...entries(walked),
  fingerprint,
  entered: enteredLeaves(walked),
  defaults: [...walked.defaults.values()],
})

/** Texts as typed; numbers, flags and lists of them as JSON writes them. Objects are told by their own fields. */
const enteredLeaves = ({ entered }: Walked): Job['entered'] =>
  [...entered].flatMap(([path, json]) => {
    const values: readonly Json[] = Array.isArray(json) ? (json as readonly Json[]) : [json]
    return values.some((each) => isObject(each)) ? [] : [{ path, value: values.map(asTyped).join(', ') }]
  })

const asTyped = (json: Json): string => (typeof json === 'string' ? json : JSON.stringify(json))

const entries = (walked: Walked): Omit<Job, 'fingerprint' | 'entered' | 'defaults'> => ({
  project: present<Job['project']>({
    title: given(walked, 'project.title'),
    number: given(walked, 'project.number'),
    client: given(walked, 'project.client'),
    site: given(walked, 'project.site'),
    subject: given(walked, 'project.subject'),
    preparedBy: given(walked, 'project.preparedBy'),
    checkedBy: given(walked, 'project.checkedBy'),
    date: given(walked, 'project.date'),
    notes: given(walked, 'project.notes'),
  }),
  units: given(walked, 'units'),
  basis: basis(walked),
  cranes: given(walked, 'cranes').map((_, index) => crane(walked, index)),
  runway: runway(walked),
  girder: girder(walked),
})

const basis = (walked: Walked): Basis => ({
  standard: given(walked, 'basis.standard'),
  method: given(walked, 'basis.method'),
  sideThrust: given(walked, 'basis.sideThrust'),
  sideThrustShare: given(walked, 'basis.sideThrustShare'),
  sideThrustPerWheel: given(walked, 'basis.sideThrustPerWheel'),
  impact: given(walked, 'basis.impact'),
  cb: given(walked, 'basis.cb'),
  loadHeight: given(walked, 'basis.loadHeight'),
  craneDeadFactor: given(walked, 'basis.craneDeadFactor'),
  cranesTogether: cranesTogether(walked),
  deflection: present<Basis['deflection']>({
    vertical: given(walked, 'basis.deflection.vertical'),
    lateral: given(walked, 'basis.deflection.lateral'),
  }),
})

const cranesTogether = (walked: Walked): Basis['cranesTogether'] => {
  const entered = given(walked, 'basis.cranesTogether')
  if (typeof entered === 'string') return entered
  const count = given(walked, 'cranes').length
  return entered.map((keys, set): CraneSet => {
    const factors = (key: string) => ({
      vertical: given(walked, 'basis.cranesTogether[].{crane}.vertical', set, key),
      impact: given(walked, 'basis.cranesTogether[].{crane}.impact', set, key),
      sideThrust: given(walked, 'basis.cranesTogether[].{crane}.sideThrust', set, key),
      longitudinal: given(walked, 'basis.cranesTogether[].{crane}.longitudinal', set, key),
    })
    return new Map(keys.map((key) => [craneOfKey(walked, key, count)!, factors(key)]))
  })
}

const crane = (walked: Walked, index: number): Crane => {
  const drives = {
    bridgeDrive: driveOf(walked, 'cranes[].bridgeDrive', index),
    trolleyDrive: driveOf(walked, 'cranes[].trolleyDrive', index),
    hoistDrive: driveOf(walked, 'cranes[].hoistDrive', index),
  }
  for (const [key, value] of Object.entries(drives))
    show(walked, placed(`cranes[].${key}` as FieldPath, [index]), value)
  show(walked, placed('cranes[].name', [index]), craneName(walked, index))
  const [first, last] = given(walked, 'cranes[].bumperOverhang', index)
  const hookApproach = given(walked, 'cranes[].hookApproach', index)
  const count = given(walked, 'cranes[].wheelSpacings', index).length + 1
  const eachWheel = (loads: 'derive' | Newton | readonly Newton[]): 'derive' | readonly Newton[] =>
    typeof loads === 'number' ? Array.from({ length: count }, () => loads) : loads
  return present<Crane>({
    name: craneName(walked, index),
    ratedCapacity: given(walked, 'cranes[].ratedCapacity', index),
    bridgeWeight: given(walked, 'cranes[].bridgeWeight', index),
    trolleyWeight: given(walked, 'cranes[].trolleyWeight', index),
    belowHook: given(walked, 'cranes[].belowHook', index),
    bridgeSpan: given(walked, 'cranes[].bridgeSpan', index),
    hookApproach,
    hookApproachFar: given(walked, 'cranes[].hookApproachFar', index) ?? hookApproach,
    operation: given(walked, 'cranes[].operation', index),
    ...drives,
    serviceClass: given(walked, 'cranes[].serviceClass', index),
    wheelSpacings: given(walked, 'cranes[].wheelSpacings', index),
    wheelLoad: eachWheel(given(walked, 'cranes[].wheelLoad', index)),
    leastWheelLoad: eachWheel(given(walked, 'cranes[].leastWheelLoad', index)),
    emptyWheelLoad: eachWheel(given(walked, 'cranes[].emptyWheelLoad', index)),
    bumperOverhang: [first!, last!],
  })
}

const runway = (walked: Walked): Runway => {
  const rail = given(walked, 'runway.rail.name')
  return present<Runway>({
    spans: given(walked, 'runway.spans'),
    continuity: given(walked, 'runway.continuity'),
    eitherWay: given(walked, 'runway.eitherWay'),
    checkSpan: given(walked, 'runway.checkSpan'),
    unbracedLength: given(walked, 'runway.unbracedLength'),
    unbracedLengthBottom: given(walked, 'runway.unbracedLengthBottom'),
    rail: present<Runway['rail']>({
      name: rail?.name ?? 'as entered',
      height: rail?.height ?? given(walked, 'runway.rail.height')!,
      headWidth: rail?.headWidth ?? given(walked, 'runway.rail.headWidth')!,
      footWidth: rail?.footWidth ?? given(walked, 'runway.rail.footWidth')!,
      massPerLength: rail?.massPerLength ?? given(walked, 'runway.rail.mass')!,
      Ix: rail ? rail.Ix : given(walked, 'runway.rail.ix'),
      wear: given(walked, 'runway.rail.wear'),
      eccentricity: given(walked, 'runway.rail.eccentricity'),
    }),
    bearingLength: given(walked, 'runway.bearingLength'),
    bracketEccentricity: given(walked, 'runway.bracketEccentricity'),
    endDistance: given(walked, 'runway.endDistance'),
  })
}

const girder = (walked: Walked): Girder => {
  const steel = (path: SteelPath): SteelEntry | undefined => (seen(walked, path) ? steelOf(walked, path) : undefined)
  const made = section(walked)
  // Where there is nothing of a steel, its default says nothing.
  if (!made.cap) walked.defaults.delete('girder.capSteel')
  if (made.kind === 'rolled' && made.cap?.kind !== 'plate') walked.defaults.delete('girder.plateSteel')
  const plateSteel = steel('girder.plateSteel')
  if (plateSteel && made.cap?.kind === 'plate') show(walked, 'girder.capSteel', 'the steel of the plates')
  return present<Girder>({
    section: made,
    steel: steel('girder.steel')!,
    capSteel: steel('girder.capSteel') ?? (made.cap?.kind === 'plate' ? plateSteel : undefined),
    plateSteel,
    addedDeadLoad: given(walked, 'girder.addedDeadLoad'),
    addedLiveLoad: given(walked, 'girder.addedLiveLoad'),
  })
}

const section = (walked: Walked): SectionEntry => {
  const cap = capOf(walked)
  const kind = given(walked, 'girder.section.kind')
  if (kind === 'rolled') {
    const shape = given(walked, 'girder.section.shape')!
    return present<SectionEntry & { kind: 'rolled' }>({ kind, shape: shape === true ? ownShape(walked) : shape, cap })
  }
  return present<SectionEntry & { kind: 'plated' }>({
    kind,
    topFlange: plate(walked, 'girder.section.topFlange'),
    web: {
      depth: given(walked, 'girder.section.web.depth'),
      thickness: given(walked, 'girder.section.web.thickness'),
    },
    bottomFlange: plate(walked, 'girder.section.bottomFlange'),
    cap,
  })
}

type IShape = (SectionEntry & { kind: 'rolled' })['shape']

const ownShape = (walked: Walked): IShape => {
  const tf = given(walked, 'girder.section.shape.tf')
  const r = given(walked, 'girder.section.shape.r')
  return {
    name: 'as entered',
    family: 'own',
    source: 'entered with the job',
    d: given(walked, 'girder.section.shape.d'),
    bf: given(walked, 'girder.section.shape.bf'),
    tw: given(walked, 'girder.section.shape.tw'),
    tf,
    k: (tf + r) as typeof tf,
    r,
    figures: present<IShape['figures']>({
      A: given(walked, 'girder.section.shape.A'),
      Ix: given(walked, 'girder.section.shape.Ix'),
      Sx: given(walked, 'girder.section.shape.Sx'),
      Zx: given(walked, 'girder.section.shape.Zx'),
      Iy: given(walked, 'girder.section.shape.Iy'),
      Sy: given(walked, 'girder.section.shape.Sy'),
      Zy: given(walked, 'girder.section.shape.Zy'),
      J: given(walked, 'girder.section.shape.J'),
      Cw: given(walked, 'girder.section.shape.Cw'),
      rts: given(walked, 'girder.section.shape.rts'),
      ho: given(walked, 'girder.section.shape.ho'),
      massPerLength: given(walked, 'girder.section.shape.massPerLength'),
    }),
  }
}

const capOf = (walked: Walked): Cap | undefined => {
  const channel = given(walked, 'girder.section.cap.shape')
  if (channel) return { kind: 'channel', channel }
  return given(walked, 'girder.section.cap.plate')
    ? { kind: 'plate', plate: plate(walked, 'girder.section.cap.plate') }
    : undefined
}

const plate = (
  walked: Walked,
  path: 'girder.section.topFlange' | 'girder.section.bottomFlange' | 'girder.section.cap.plate',
): Plate => ({ width: given(walked, `${path}.width`), thickness: given(walked, `${path}.thickness`) })

/** The value of a field of a job without findings. */
const given = <P extends FieldPath>(walked: Walked, path: P, ...at: readonly (number | string)[]): Given<P> =>
  seen(walked, path, ...at) as Given<P>

/** Puts the value that a default came out at into its place in the list of defaults. */
const show = (walked: Walked, path: string, value: string): void => {
  const taken = walked.defaults.get(path)
  if (taken) walked.defaults.set(path, { ...taken, value })
}

/** Optional keys may be handed in as undefined. */
type Loose<T> = { [K in keyof T]: object extends Pick<T, K> ? T[K] | undefined : T[K] }

/** The object without its undefined entries. */
const present = <T extends object>(value: Loose<T>): T =>
  Object.fromEntries(Object.entries(value).filter(([, one]) => one !== undefined)) as T
