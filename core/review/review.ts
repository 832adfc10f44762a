/** The one room that knows the order of the stages: loads, trains, section, rules, drive, judge. */
import type { Ask, Status, Verdict } from '../basis/types.ts'
import { combinationsOf, groupsOf, setsOfCranes } from '../basis/us/combinations.ts'
import { designOf, type Design } from '../basis/us/design.ts'
import { plan } from '../basis/us/plan.ts'
import { wheelTrains } from '../crane/trains.ts'
import { wheelLoads } from '../crane/wheels.ts'
import { unrecorded, working, type Working, type WorkingRecorder } from '../formula/working.ts'
import type { Job } from '../job/types.ts'
import { as } from '../quantity/kinds.ts'
import { sectionOf } from '../section/properties.ts'
import { DOCUMENTS } from '../sources/bibliography.ts'
import { citation } from '../sources/clause.ts'
import { drive } from '../travel/drive.ts'
import { staticEnvelope } from '../travel/envelope.ts'
import type { Beam } from '../travel/types.ts'
import { handedOn } from './handed-on.ts'
import type { Check, Place, Review } from './types.ts'
import { VERSION } from './version.ts'

/** Reviews a job. Pure: the same job gives the same review. What it throws is a fault of the program. */
export function review(job: Job): Review {
  const { basis, cranes, runway, girder } = job
  const section = sectionOf(girder.section)
  const wheels = cranes.map(wheelLoads)
  const groups = groupsOf(setsOfCranes(basis, cranes))
  const { trains, cautions: ofTrains } = wheelTrains(job, wheels, groups)
  const beam: Beam = { continuity: runway.continuity, spans: runway.spans }
  const design = designOf(job, section, wheels, trains)
  const asked = plan(design)
  const checks = checksOf(asked.verdicts, asked.asks, (ask) => place(ask, beam, design))
  const judged = checks.filter((check) => check.utilisation !== undefined)
  const complete = checks.every((check) => check.status !== 'not-covered')
  return {
    program: VERSION,
    job,
    section,
    wheels,
    trains,
    envelope: staticEnvelope(beam, trains, as('flexuralStiffness', girder.steel.E * section.Ix)),
    actions: design.forces.map(({ impact, sideThrust, longitudinal, working }, crane) => ({
      crane,
      impact,
      sideThrustPerWheel: sideThrust.map((value) => ({ kind: 'force', value })),
      longitudinal: { kind: 'force', value: longitudinal },
      working,
    })),
    deadLoad: { value: { kind: 'lineLoad', value: design.dead }, working: design.deadWorking },
    combinations: combinationsOf(basis.method).map(({ name, clause, text }) => ({
      name,
      clause: citation(clause),
      text,
    })),
    checks,
    governing: judged.reduce<Check | undefined>((a, b) => (a && a.utilisation! >= b.utilisation! ? a : b), undefined)
      ?.id,
    ok: checks.some((check) => check.status === 'fails') ? false : complete ? true : null,
    complete,
    handedOn: handedOn(design, beam),
    cautions: [...new Set([...wheels.flatMap((crane) => crane.cautions), ...ofTrains, ...asked.cautions])],
    editions: editionsOf(checks),
  }
}

/** The ask judged at its worst place. */
function place(ask: Ask, beam: Beam, { trains, job }: Design): Place {
  const { span, train, combination, set } = ask
  const at = drive({ beam, span, trains, train, eitherWay: job.runway.eitherWay }, ask.effect)
  const judgement = ask.judge(at, unrecorded)
  const status = judgement.utilisation <= 1 ? 'holds' : 'fails'
  return { status, ...judgement, at, combination, set, working: written((on) => ask.judge(at, on)) }
}

/** A derivation that is made when it is asked for. */
const written = (decide: (on: WorkingRecorder) => unknown) => (): Working => {
  const on = working()
  decide(on)
  return on
}

/** One check a subject: its worst place leads, the others follow. In the order in which the rules name the subjects. */
function checksOf(verdicts: readonly Verdict[], asks: readonly Ask[], judge: (ask: Ask) => Place): readonly Check[] {
  const subjects = new Map<string, { subject: Ask | Verdict; places: Place[] }>()
  const enter = (subject: Ask | Verdict, entered: Place): void => {
    const known = subjects.get(subject.id)
    if (known) known.places.push(entered)
    else subjects.set(subject.id, { subject, places: [entered] })
  }
  for (const ask of asks) enter(ask, judge(ask))
  for (const verdict of verdicts) {
    const { status, why, judge: decide } = verdict
    const judged = decide && { ...decide(unrecorded), working: written(decide) }
    enter(verdict, { status, ...(why === '' ? {} : { why }), ...judged })
  }
  return [...subjects.values()].map(({ subject, places }) => {
    const [worst, ...others] = places.sort(worseFirst) as [Place, ...Place[]]
    const { id, title, clause } = subject
    return { id, title, clause, ...worst, places: others }
  })
}

const RANK: Readonly<Record<Status, number>> = { fails: 0, 'not-covered': 1, holds: 2, 'not-applicable': 3 }

const worseFirst = (a: Place, b: Place): number =>
  RANK[a.status] - RANK[b.status] || (b.utilisation ?? 0) - (a.utilisation ?? 0)

function editionsOf(checks: readonly Check[]): readonly string[] {
  const documents = [...new Set(checks.map((check) => check.clause.document)), 'ASCE 7-22' as const]
  return [...new Set(documents)].map((key) => {
    const { title, edition } = DOCUMENTS[key]
    return edition === '' ? title : `${title} (${edition})`
  })
}
