/** Brings a job file of an older version up to the present one, step by step. */
import type { JsonObject } from './json.ts'

/** The version of the job file that this program writes. */
export const JOB_VERSION = 1

/** One step from a version to the next. `upgrade` gives a new job and leaves the old one as it is. */
export interface Upgrade {
  readonly from: number
  readonly to: number
  readonly upgrade: (job: JsonObject) => JsonObject
}

/** The steps so far: version 1 is the first. */
export const UPGRADES: readonly Upgrade[] = []

/**
 * The job after every step from `from` to `to`, its version raised with each. Throws where the chain has no step, which only a
 * programmer can cause: a version without an upgrade must not be released.
 */
export const upgradeJob = (job: JsonObject, from: number, to = JOB_VERSION, steps = UPGRADES): JsonObject => {
  if (from === to) return job
  const step = steps.find((one) => one.from === from && one.to > from && one.to <= to)
  if (!step) throw new Error(`No upgrade of the job file leads from version ${from} to version ${to}`)
  return upgradeJob({ ...step.upgrade(job), version: step.to }, step.to, to, steps)
}
