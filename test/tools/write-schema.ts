/** Writes the JSON Schema of the job file and its field reference from the field dictionary: `npm run schema`. */
import { writeFileSync } from 'node:fs'
import { fieldReference } from '../../core/job/reference.ts'
import { jobSchema } from '../../core/job/schema.ts'

const resources = new URL('../../resources/', import.meta.url)
writeFileSync(new URL('job.schema.json', resources), `${JSON.stringify(jobSchema(), null, 2)}\n`)
writeFileSync(new URL('fields.md', resources), fieldReference())
