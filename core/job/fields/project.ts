/** The head of the job file and its title block. */
import type { Field } from '../field.ts'
import { object, text } from './entries.ts'

export const PROJECT = {
  format: {
    name: 'Format',
    meaning: 'Names the file as a job of this program.',
    entry: { is: 'constant', value: 'longtravel-job' },
    required: true,
  },
  version: {
    name: 'Version of the format',
    meaning: 'Older versions are brought up to date when read; a newer one is refused by name.',
    entry: { is: 'constant', value: 1 },
    required: true,
  },
  project: { name: 'Title block', meaning: 'What the head of each page says.', entry: object, required: true },
  'project.title': { name: 'Title', meaning: 'Name of the job.', entry: text, required: true },
  'project.number': { name: 'Number', meaning: 'Number of the project.', entry: text },
  'project.client': { name: 'Client', meaning: 'For whom the calculation is made.', entry: text },
  'project.site': { name: 'Site', meaning: 'Plant, building, aisle.', entry: text },
  'project.subject': { name: 'Subject', meaning: 'Which girder line is calculated.', entry: text },
  'project.preparedBy': { name: 'Prepared by', meaning: 'Name or initials.', entry: text },
  'project.checkedBy': { name: 'Checked by', meaning: 'Name or initials.', entry: text },
  'project.date': { name: 'Date', meaning: 'As it is to be printed.', entry: text },
  'project.notes': {
    name: 'Notes',
    meaning: 'Printed in full.',
    entry: { is: 'text', most: 50_000 },
  },
  units: {
    name: 'Units shown',
    meaning: 'How values are shown and printed; never changes the result.',
    entry: { is: 'choice', of: ['us', 'si'] },
    default: { entry: 'us', source: 'custom of the United States, whose rules are used' },
  },
} as const satisfies Record<string, Field>
