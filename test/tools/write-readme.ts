/** Puts into README.md what its sample job prints, down to the cautions: `npm run readme`. */
import { readFileSync, writeFileSync } from 'node:fs'
import { checkText } from '../../app/command/check.ts'
import { reviewTable } from '../../app/command/table.ts'

const path = new URL('../../README.md', import.meta.url)
const readme = readFileSync(path, 'utf8')
const [, sample = ''] = /npx longtravel check ([^`\s]+)/.exec(readme) ?? []
const outcome = checkText(readFileSync(new URL(`../../${sample}`, import.meta.url), 'utf8'), sample)
if (outcome.exit === 2) throw new Error(outcome.messages.join('\n'))
const [shown = ''] = reviewTable(outcome.review).split('Cautions\n')
writeFileSync(
  path,
  readme.replace(
    /(reviews a sample job without the window:\n\n```\n)[^]*?(```)/,
    (_, before: string, after: string) => `${before}${shown}...\n${after}`,
  ),
)
