/** The lines of the data sheet, from the field dictionary: what this version covers, in the order a reader asks for it. */
import type { Entry, Family, Field } from '../../core/job/field.ts'
import { fieldList } from '../../core/job/fields.ts'
import { inWords } from '../../core/job/phrases.ts'
import type { Json } from '../../core/job/json.ts'
import { as, type UnitSystem } from '../../core/quantity/kinds.ts'
import { readQuantity } from '../../core/quantity/read.ts'
import { shownUnit } from '../../core/quantity/units.ts'
import { writeQuantity, writeUnit } from '../../core/quantity/write.ts'
import { lineOf } from '../state/typed.ts'
import type { JobState } from '../state/types.ts'
import { WAYS, type Way } from '../state/ways.ts'

export interface FormGroup {
  readonly title: string
  /** The crane it describes. */
  readonly crane?: number
  readonly lines: readonly FormLine[]
}

export interface FormLine {
  /** Path in the job file of what is entered; of a line that only chooses a form, the path of the part. */
  readonly path: string
  readonly label: string
  readonly field: Field
  readonly control: 'text' | 'note' | 'choice' | 'form' | 'beside'
  /** What can be chosen: value in the file, word. */
  readonly choices: readonly (readonly [value: string, word: string])[]
  /** The part whose form is chosen in this line. */
  readonly part?: string
  readonly family?: Family
  readonly owed: boolean
}

/** The groups of the data sheet as the job's forms stand. */
export const formOf = (job: Pick<JobState, 'way' | 'entry' | 'has' | 'cranes'>): readonly FormGroup[] => [
  ...Array.from({ length: job.cranes }, (_, crane) => ({
    title: job.cranes === 1 ? 'Crane' : `Crane ${crane + 1}`,
    crane,
    lines: linesBelow('cranes[].', job, crane),
  })),
  { title: 'Runway', lines: linesBelow('runway.', job) },
  {
    title: 'Girder',
    lines: [...linesBelow('girder.section', job), ...linesBelow('girder.', job).filter(notOfSection)],
  },
  { title: 'Rules', lines: linesBelow('basis.', job) },
  { title: 'Project', lines: linesBelow('project.', job) },
]

/** The id of a line's entry in the page. */
export const entryId = (path: string): string => `entry-${path.replace(/\W+/g, '-')}`

/** What a line says where nothing is entered: the default, in the units in use. */
export const defaultText = ({ field, path }: Pick<FormLine, 'field' | 'path'>, units: UnitSystem): string => {
  const crane = /^cranes\[(\d+)\]\.name$/.exec(path)?.[1]
  if (crane !== undefined) return `Crane ${Number(crane) + 1}`
  const taken = field.default
  if (taken === undefined) return ''
  if (taken.text !== undefined) return taken.text
  const { entry } = field
  if (entry.is === 'flag') return taken.entry === true ? 'yes' : 'no'
  if (entry.is === 'choice') return wordOf(lineOf(taken.entry) ?? '')
  return lineOf(inUnits(taken.entry, entry, units)) ?? ''
}

/** A default's quantities in the units in use; what is no quantity as it stands. */
const inUnits = (json: Json | undefined, entry: Entry, units: UnitSystem): Json | undefined => {
  if (entry.is === 'list' && Array.isArray(json))
    return (json as readonly Json[]).map((item) => inUnits(item, entry.of, units)!)
  if (entry.is !== 'quantity' || typeof json !== 'string') return json
  const read = readQuantity(json, entry.kind)
  const kind = entry.kind === 'forceOrMass' ? 'force' : entry.kind
  return read.ok ? writeQuantity({ kind, value: as(kind, read.value) }, units) : json
}

/** What may be entered and what holds if nothing is, as the lines of a note. */
export const helpOf = (line: FormLine, units: UnitSystem): readonly string[] => {
  const { field, label } = line
  const { entry, default: taken, source, required } = field
  const shown = bareUnit(entry, units)
  return [
    `${label}. ${field.meaning}`,
    entry.is === 'object' || entry.is === 'choice' || entry.is === 'flag' ? '' : `Right is ${inWords(typed(entry))}.`,
    shown === '' ? '' : `A bare number is read in ${shown}.`,
    entry.is === 'list' ? 'Items are parted by commas; “3 × 30 ft” repeats one.' : '',
    required === undefined ? '' : required === true ? 'Required.' : `Required ${required}.`,
    taken === undefined ? '' : `Left out: ${defaultText(line, units)} (${taken.source}).`,
    source === undefined ? '' : `Source: ${source}.`,
  ].filter((part) => part !== '')
}

/** What can be typed on one line: an object of a job file has lines of its own. */
const typed = (entry: Entry): Entry => {
  const lines = entry.is === 'either' ? entry.of.filter(({ is }) => is !== 'object') : []
  return lines.length === 1 ? lines[0]! : lines.length > 1 ? { is: 'either', of: lines } : entry
}

/** The unit that a bare number takes. */
const bareUnit = (entry: Entry, units: UnitSystem): string => {
  if (entry.is === 'list') return bareUnit(entry.of, units)
  if (entry.is === 'either') return entry.of.map((one) => bareUnit(one, units)).find((unit) => unit !== '') ?? ''
  if (entry.is !== 'quantity') return ''
  return writeUnit(shownUnit(entry.kind === 'forceOrMass' ? 'force' : entry.kind, units))
}

/** The make-up is asked first: which steels there are depends on it. */
const notOfSection = ({ path }: FormLine): boolean => !path.startsWith('girder.section')

type Reads = Pick<JobState, 'way' | 'entry' | 'has'>

const linesBelow = (start: string, job: Reads, crane?: number): readonly FormLine[] =>
  fieldList
    .filter(([path]) => path.startsWith(start) && !path.includes('{'))
    .flatMap(([pattern, field]) => {
      const path = pattern.replace('[]', `[${crane ?? 0}]`)
      return stands(path, field, job) ? [lineOfField(path, field, job)] : []
    })

/** Whether a field has a line: covered, of the form in use, and more than one answer to give. */
const stands = (path: string, field: Field, job: Reads): boolean => {
  if (path in WAYS) return !(path in BESIDE) && partStands(path, job)
  if (field.entry.is === 'object' || path === 'girder.section.kind') return false
  return isCovered(field) && inForm(path, job)
}

const isCovered = ({ entry, notCovered }: Field): boolean => {
  if (notCovered === undefined) return true
  if (typeof notCovered !== 'object' || !('values' in notCovered)) return false
  return coveredChoices(entry, notCovered.values).length > 1
}

/** Whether a field belongs to the forms its parts have now. */
const inForm = (path: string, job: Reads): boolean =>
  Object.entries(WAYS).every(([part, ways]) => {
    if (!path.startsWith(`${part}.`)) return true
    if (!partStands(part, job)) return false
    const name = path.slice(part.length + 1).split('.')[0]!
    const way = ways.find(({ word }) => word === job.way(part))
    const ofForms = ways.some(({ fields }) => fields.includes(name))
    // With its form "none" a part has no entries at all.
    return way !== undefined && way.fields.length > 0 && (!ofForms || way.fields.includes(name) || isName(part, name))
  })

/** A steel of cap or plates has a line only where there is such a part; a shape only in a rolled section. */
const partStands = (part: string, job: Reads): boolean => {
  const [section, cap] = [job.way('girder.section'), job.way('girder.section.cap')]
  if (part === 'girder.section.shape') return section === 'rolled'
  if (part === 'girder.capSteel') return cap !== 'none' || job.has(part)
  if (part === 'girder.plateSteel') return section === 'plated' || cap === 'plate' || job.has(part)
  return true
}

/** Parts that go by a name stand in one line with it, whatever their form. */
const BESIDE: Readonly<Record<string, string>> = {
  'runway.rail': 'runway.rail.name',
  'girder.steel': 'girder.steel.name',
}
const isName = (part: string, name: string): boolean => BESIDE[part] === `${part}.${name}`

const lineOfField = (path: string, field: Field, job: Reads): FormLine => {
  const ways = WAYS[path]
  const owed = field.required === true || isNeeded(path)
  if (path === 'girder.section.shape')
    return { ...besides(path, path, field, 'Shape', job), family: 'iShape', owed: true }
  if (ways !== undefined)
    return { path, label: field.name, field, control: 'form', choices: wordsOf(ways), part: path, owed: false }
  const part = Object.keys(BESIDE).find((each) => BESIDE[each] === path)
  if (part !== undefined) return { ...besides(path, part, field, nameOf(part), job), owed: true }
  const common = { path, label: labelOf(path, field), field, owed }
  const choices = choicesOf(field)
  if (choices.length > 0) return { ...common, control: 'choice', choices }
  const control = field.entry.is === 'text' && field.entry.most > 1000 ? 'note' : 'text'
  return { ...common, control, choices, ...(field.entry.is === 'lookUp' ? { family: field.entry.family } : {}) }
}

/** A line that chooses a part's form beside its label, and takes the name where the part goes by one. */
const besides = (path: string, part: string, field: Field, label: string, job: Reads): Omit<FormLine, 'owed'> => ({
  path,
  label,
  field,
  control: job.way(part) === 'name' ? 'text' : 'beside',
  choices: wordsOf(WAYS[part]!),
  part,
  ...(field.entry.is === 'lookUp' ? { family: field.entry.family } : {}),
})

/** Whether the form that is in use of a part needs this field. */
const isNeeded = (path: string): boolean => {
  const cut = path.lastIndexOf('.')
  const part = fieldList.find(([pattern]) => pattern === path.slice(0, cut))?.[1].entry
  return part?.is === 'object' && part.ways?.some(({ needs }) => needs.includes(path.slice(cut + 1))) === true
}

const wordsOf = (ways: readonly Way[]): FormLine['choices'] => ways.map(({ word, label }) => [word, label])

const choicesOf = ({ entry, notCovered }: Field): FormLine['choices'] => {
  const refused = typeof notCovered === 'object' && 'values' in notCovered ? notCovered.values : []
  if (entry.is === 'flag')
    return [
      ['true', 'yes'],
      ['false', 'no'],
    ]
  const covered = coveredChoices(entry, refused)
  return covered.length < 2 ? [] : covered.map((value) => [value, wordOf(value)] as const)
}

/** Stands for an entry that the data sheet shows but has no line to write. */
export const OWN = '\u0000'

const coveredChoices = (entry: Entry, refused: readonly string[]): readonly string[] => {
  if (entry.is === 'choice') return entry.of.filter((value) => !refused.includes(value))
  if (entry.is !== 'either') return []
  return entry.of.flatMap((one) => coveredChoices(one, refused))
}

const wordOf = (value: string): string => value.replaceAll('-', ' ')

const nameOf = (path: string): string => fieldList.find(([pattern]) => pattern === path)?.[1].name ?? path

/** Width and thickness say nothing without the part they belong to. */
const labelOf = (path: string, field: Field): string => {
  const parent = path.slice(0, path.lastIndexOf('.'))
  const within = parent.split('.').length > 1 && !(parent in WAYS) && !parent.startsWith('basis')
  if (parent === 'girder.capSteel' || parent === 'girder.plateSteel')
    return `${nameOf(parent)}, ${field.entry.is === 'lookUp' ? 'name' : small(field.name)}`
  return within ? `${nameOf(parent)}, ${small(field.name)}` : field.name
}

const small = (name: string): string => name.charAt(0).toLowerCase() + name.slice(1)
