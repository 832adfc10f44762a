/** `longtravel check`: a job file in, a table of checks and the files asked for out. */
import { join } from 'node:path'
import { catalogue } from '../../core/catalogue/load.ts'
import type { Finding } from '../../core/job/read.ts'
import { resultOf, type Result } from '../../core/review/result.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'
import { sheetOf } from '../../core/sheet/sheet.ts'
import { checksCsv, envelopeCsv } from './csv.ts'
import { EXIT, type Io } from './exit.ts'
import { readFileText, readStreamText } from './input.ts'
import { refusals, writeAll, type Target } from './output.ts'
import { reviewTable } from './table.ts'
import { printable } from './text.ts'

export type Outcome =
  | { readonly exit: 0 | 1 | 4; readonly review: Review; readonly result: Result }
  | { readonly exit: 2; readonly messages: readonly string[] }

/** A job's text reviewed; no file is touched. `name` is what messages call the text. What is thrown is a fault of the program. */
export const checkText = (text: string, name = 'job'): Outcome => {
  const reviewed = reviewText(text, catalogue)
  if (!reviewed.ok) return { exit: EXIT.input, messages: reviewed.findings.map((finding) => messageOf(finding, name)) }
  const { review } = reviewed
  return { exit: exitOf(review), review, result: resultOf(review) }
}

export interface CheckOptions {
  readonly job: string
  readonly json: string | undefined
  readonly csv: string | undefined
  readonly pdf: string | undefined
}

/** Runs the command; `-` is standard input or output. Gives the exit code. Nothing is written unless all can be. */
export const check = async ({ job, json, csv, pdf }: CheckOptions, io: Io): Promise<number> => {
  const refuse = (messages: readonly string[]): number => {
    for (const text of messages) io.stderr(`${printable(text)}\n`)
    return EXIT.input
  }
  const tables = csv === undefined ? [] : [join(csv, 'checks.csv'), join(csv, 'envelope.csv')]
  const files = [json, pdf].flatMap((file) => (file === undefined || file === '-' ? [] : [file]))
  const refused = await refusals([...files, ...tables], job === '-' ? undefined : job, csv)
  if (refused.length > 0) return refuse(refused)

  const read = job === '-' ? await readStreamText(io.stdin()) : await readFileText(job)
  if ('message' in read) return refuse([read.message])
  const outcome = checkText(read.text, job === '-' ? 'standard input' : job)
  if (outcome.exit === EXIT.input) return refuse(outcome.messages)

  const { review, result } = outcome
  const text = `${JSON.stringify(result, null, 2)}\n`
  const sheet = pdf === undefined ? undefined : await sheetBytes(review)
  if (sheet !== undefined && 'message' in sheet) return refuse([`${pdf ?? ''}: ${sheet.message}`])
  const targets: Target[] = []
  if (json !== undefined && json !== '-') targets.push({ path: json, content: text })
  if (pdf !== undefined && pdf !== '-' && sheet) targets.push({ path: pdf, content: sheet.bytes })
  const [checks, envelope] = tables
  if (checks !== undefined) targets.push({ path: checks, content: checksCsv(result) })
  if (envelope !== undefined) targets.push({ path: envelope, content: envelopeCsv(review) })
  const failed = await writeAll(targets, csv)
  if (failed !== undefined) return refuse([failed])
  if (pdf === '-' && sheet) io.stdout(sheet.bytes)
  else io.stdout(json === '-' ? text : reviewTable(review))
  return outcome.exit
}

/** The calc sheet, which says that it was not kept as a revision; or what of it cannot be printed. */
const sheetBytes = async (review: Review): Promise<{ bytes: Uint8Array } | { message: string }> => {
  const { units } = review.job
  const { printSheet } = await import('../print/print.ts')
  const { UnprintableText } = await import('../print/unprintable.ts')
  try {
    return { bytes: await printSheet(sheetOf(review, units), units === 'us' ? 'letter' : 'a4') }
  } catch (error) {
    if (error instanceof UnprintableText) return { message: error.message }
    throw error
  }
}

const exitOf = ({ ok }: Review): 0 | 1 | 4 => (ok === null ? EXIT.open : ok ? EXIT.holds : EXIT.fails)

/** One line an entry: its path, what was read, what would be right. The file as a whole goes by its name. */
const messageOf = ({ path, read, message }: Finding, name: string): string =>
  `${path || name}: ${read === '' ? '' : `read ${read}; `}${message}`.replace(/\s+/g, ' ')
