/** Which message stands at which line of the data sheet, and which have no line. */
import type { Finding } from '../../core/job/read.ts'
import type { FormGroup, FormLine } from './form.ts'

/** The first finding at a line: of its own path, of an item of its list, or of the part it names. */
export const findingAt = (findings: ReadonlyMap<string, Finding>, { path, part }: FormLine): Finding | undefined =>
  findings.get(path) ??
  (part === undefined ? undefined : findings.get(part)) ??
  [...findings.values()].find((finding) => finding.path.startsWith(`${path}[`))

/** Findings that no line shows: of fields without a line, of the file as a whole. */
export const unplaced = (findings: ReadonlyMap<string, Finding>, groups: readonly FormGroup[]): readonly Finding[] => {
  const lines = groups.flatMap((group) => group.lines)
  const shown = new Set(lines.flatMap(({ path, part }) => (part === undefined ? [path] : [path, part])))
  return [...findings.values()].filter(
    ({ path }) => !shown.has(path) && !lines.some((line) => path.startsWith(`${line.path}[`)),
  )
}

/** The message without the field's name, which the line bears already. */
export const messageOf = ({ message }: Finding, { field }: FormLine): string => {
  const start = `${field.name}: `
  return message.startsWith(start) ? message.slice(start.length) : message
}

/** An entry that is still to be made: said by the empty line itself. */
export const isOwed = ({ read }: Finding): boolean => read === 'nothing'
