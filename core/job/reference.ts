/** The dictionary as a page to read: every field of the job file with its meaning, limits, default and source. */
import type { Field } from './field.ts'
import { fieldList } from './fields.ts'
import { inWords } from './phrases.ts'
import { coverageInWords } from './schema.ts'

/** Markdown, one table for each part of the file. */
export const fieldReference = (): string => {
  const parts = Map.groupBy(fieldList, ([path]) => HEADINGS[path.split(/[.[]/)[0]!] ?? 'Head of the file')
  return [
    '# Fields of the job file',
    'Made from the field dictionary by `npm run schema`; changes are made there.',
    'A quantity is a text with its unit: "30 ft", "12 ft 6 in", "9144 mm", "38.1 kip", "170 kN". A plain number is SI (N, m, Pa, ' +
      'kg, m/s). Where a force or a mass may stand, a mass counts as its weight under standard gravity, 9.80665 m/s²; "t" is the ' +
      'metric tonne and "ton" the short ton of 2000 lb. `[]` stands for an item of a list, `{…}` for a key of one’s own. What is ' +
      'not covered is refused, never ignored.',
    ...[...parts].flatMap(([heading, fields]) => [`## ${heading}`, table(fields)]),
    '',
  ].join('\n\n')
}

const HEADINGS: Record<string, string> = {
  project: 'Title block',
  basis: 'Basis',
  cranes: 'Cranes',
  runway: 'Runway',
  girder: 'Girder',
}

const table = (fields: readonly (readonly [string, Field])[]): string =>
  [
    '| path | name | meaning | entry | required or default |',
    '|---|---|---|---|---|',
    ...fields.map(([path, field]) =>
      row([`\`${path}\``, field.name, meaning(field), inWords(field.entry), need(field)]),
    ),
  ].join('\n')

const row = (cells: readonly string[]): string => `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`

const meaning = (field: Field): string =>
  [field.meaning, field.source === undefined ? '' : `Source: ${field.source}.`, coverageInWords(field)]
    .filter((part) => part !== '')
    .join(' ')

const need = ({ required, default: taken }: Field): string => {
  if (required !== undefined) return required === true ? 'required' : `required ${required}`
  if (taken === undefined) return 'may be left out'
  const value = taken.text ?? (taken.entry === undefined ? '' : JSON.stringify(taken.entry))
  return `default: ${value} (${taken.source})`
}
