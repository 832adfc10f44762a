/** A job file's text to a job: read, validated, completed with its defaults; or everything that is wrong with it. */
import type { Catalogue } from '../catalogue/types.ts'
import { echo } from '../quantity/signs.ts'
import { complete } from './complete.ts'
import { fingerprint } from './fingerprint.ts'
import { parseJson, type JsonObject } from './json.ts'
import { checkTogether } from './rules.ts'
import type { Job } from './types.ts'
import { JOB_VERSION, upgradeJob } from './upgrade.ts'
import { find, isObject, seen, walk, type Finding, type Walked } from './walk.ts'

export type { Finding } from './walk.ts'

export type JobRead =
  | { readonly ok: true; readonly job: Job; readonly cautions: readonly string[] }
  | { readonly ok: false; readonly findings: readonly Finding[] }

/** Longer texts are refused before they are parsed: a job is some thousand characters long. */
const MOST_CHARACTERS = 20_000_000
/** The deepest path of the dictionary has 6 levels. */
const DEEPEST = 32

/**
 * Reads the text of a job file. Every fault is a finding with its path, what was read and what would be right, all of them at
 * once; the path of the file as a whole is ''. Throws for no text.
 */
export const readJob = (text: string, catalogue: Catalogue): JobRead => {
  if (text.length > MOST_CHARACTERS)
    return refused(`${text.length} characters`, `a job file has at most ${MOST_CHARACTERS} characters`)
  const parsed = parseJson(text, DEEPEST)
  if (!parsed.ok) return refused(parsed.read, `not a job file in JSON: ${parsed.message}`)
  if (!isObject(parsed.value))
    return refused(echo(text.trim().slice(0, 100)), 'a job file holds one object, between { and }')
  const foreign = foreignFile(parsed.value)
  if (foreign) return { ok: false, findings: [foreign] }
  const entered = upgraded(parsed.value)

  const walked = walk(entered, catalogue)
  for (const path of parsed.repeated) {
    walked.findings.delete(path)
    find(walked, path, walked.entered.get(path), 'this field is given twice, last as read here; leave one of them out')
  }
  checkTogether(walked)
  if (walked.findings.size > 0) return { ok: false, findings: [...walked.findings.values()] }
  return { ok: true, job: complete(walked, fingerprint(entered)), cautions: cautions(walked) }
}

const refused = (read: string, message: string): JobRead => ({ ok: false, findings: [{ path: '', read, message }] })

/** A file of another kind or of a newer program: nothing more can be said of it. A missing entry is left to the dictionary. */
const foreignFile = ({ format, version }: JsonObject): Finding | undefined => {
  if (typeof format === 'string' && format !== 'longtravel-job')
    return {
      path: 'format',
      read: echo(format.slice(0, 100)),
      message: 'Format: this is no job file; right would be "longtravel-job"',
    }
  if (typeof version === 'number' && version > JOB_VERSION)
    return {
      path: 'version',
      read: String(version),
      message: `written by a newer program: version ${version}, this one reads ${JOB_VERSION}`,
    }
  return undefined
}

const upgraded = (job: JsonObject): JsonObject => {
  const { version } = job
  const older = typeof version === 'number' && Number.isInteger(version) && version >= 1 && version < JOB_VERSION
  return older ? upgradeJob(job, version) : job
}

/** What is allowed and yet unusual. */
const cautions = (walked: Walked): readonly string[] => {
  const spans = seen(walked, 'runway.spans') ?? []
  return (['runway.unbracedLength', 'runway.unbracedLengthBottom'] as const).flatMap((path) => {
    const length = seen(walked, path)
    return length !== undefined && length > Math.max(...spans)
      ? [`${path} is longer than every span: a girder is held sideways at its supports.`]
      : []
  })
}
