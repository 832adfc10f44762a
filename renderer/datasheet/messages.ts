/** Which message stands at which line of the data sheet, and which have no line. */
import type { Finding } from '../../core/job/read.ts'
import type { FormGroup, FormLine } from './form.ts'

/** The first finding at a line: of its own path, of an item of its list, of the part it names, or of a part that is missing. */
export const findingAt = (findings: ReadonlyMap<string, Finding>, line: FormLine): Finding | undefined =>
  [...findings.values()].find((finding) => belongs(finding, line))

/** Findings that no line shows: of fields without a line, of the file as a whole. */
export const unplaced = (findings: ReadonlyMap<string, Finding>, groups: readonly FormGroup[]): readonly Finding[] => {
  const lines = groups.flatMap((group) => group.lines)
  return [...findings.values()].filter((finding) => !lines.some((line) => belongs(finding, line)))
}

const belongs = (finding: Finding, { path, part, owed, control }: FormLine): boolean => {
  if (control === 'form' && isUnformed(finding)) return false
  return (
    finding.path === path ||
    finding.path === part ||
    finding.path.startsWith(`${path}[`) ||
    // Where a whole part is missing, each of its lines is still to be filled in.
    (owed && isOwed(finding) && path.startsWith(`${finding.path}.`))
  )
}

/** The message without the field's name, which the line bears already. */
export const messageOf = ({ message }: Finding, { field }: FormLine): string => {
  const start = `${field.name}: `
  return message.startsWith(start) ? message.slice(start.length) : message
}

/** An entry that is still to be made: said by the empty line itself. */
export const isOwed = (finding: Finding): boolean => finding.read === 'nothing' || isUnformed(finding)

/** A part of which nothing is entered that its form needs. */
const isUnformed = ({ read }: Finding): boolean => /^an object with \d+ fields$/.test(read)
