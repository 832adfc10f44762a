/** The command line: which command, which options, which exit code. */
import { parseArgs } from 'node:util'
import manifest from '../package.json' with { type: 'json' }
import { EXIT, type Io } from './command/exit.ts'
import { reasonOf } from './command/reason.ts'
import { printable } from './command/text.ts'

const USAGE = `longtravel: sizes, checks and documents the girders that an overhead crane runs on

  longtravel check JOB [--json FILE] [--pdf FILE] [--csv FOLDER]
                     review a job file; a table of checks on the screen
      --json FILE    the whole result as JSON, SI units
      --pdf FILE     the calc sheet, on Letter paper for a job in US units, on A4 for one in SI
      --csv FOLDER   checks.csv and envelope.csv, made where the folder is not there
  longtravel evidence [--coverage]
                     outside checks: printed value, computed value, difference
      --coverage     the clauses used and left out as well
  longtravel --help | --version

JOB or FILE may be "-": standard input or output. With --json - or --pdf - nothing else goes to standard output.

Exit codes: 0 nothing fails and nothing owed is missing; 1 a check fails; 2 the input is wrong;
3 a fault of the program; 4 nothing fails, but something owed is not covered.
`

/** Words of the command line that a later version will know. */
const LATER = ['search', 'rate', 'compare']

/** Runs one command line and gives its exit code; never throws. The rooms are loaded here, so that a fault in them is told. */
export const run = async (args: readonly string[], io: Io): Promise<number> => {
  try {
    return await command(args, io)
  } catch (error) {
    return tellFault(error, io)
  }
}

/** Runs the command line that this process was started with. */
export const start = async (): Promise<void> => {
  const lost = { output: false }
  const refuse = (name: string) => (error: NodeJS.ErrnoException) => {
    // A reader that has seen enough (`| head`) is no fault.
    if (error.code === 'EPIPE') return
    lost.output = true
    process.exitCode = EXIT.input
    if (name === 'output') process.stderr.write(`standard output: cannot be written: ${reasonOf(error)}\n`)
  }
  process.stdout.on('error', refuse('output'))
  process.stderr.on('error', refuse('error'))
  const io: Io = {
    stdin: () => process.stdin,
    stdout: (written) => void process.stdout.write(written),
    stderr: (text) => void process.stderr.write(text),
    environment: process.env,
  }
  process.on('uncaughtException', (error) => process.exit(tellFault(error, io)))
  const exit = await run(process.argv.slice(2), io)
  process.exitCode = lost.output ? EXIT.input : exit
}

const tellFault = (error: unknown, { stderr, environment }: Io): number => {
  const text = error instanceof Error ? error.message : String(error)
  stderr(`${printable(`longtravel: a fault of the program (LONGTRAVEL_DEBUG=1 shows where): ${text}`)}\n`)
  if (environment['LONGTRAVEL_DEBUG'] === '1' && error instanceof Error) stderr(`${error.stack ?? ''}\n`)
  return EXIT.fault
}

const command = async (args: readonly string[], io: Io): Promise<number> => {
  const refuse = (text: string): number => {
    io.stderr(`${printable(text)}\n`)
    return EXIT.input
  }
  const say = (text: string): number => {
    io.stdout(text)
    return EXIT.holds
  }
  const [name] = args
  if (name !== undefined && LATER.includes(name)) return refuse(`${name}: not covered by this version`)
  const read = parse(args)
  if (typeof read === 'string') return refuse(read)
  const { values, positionals } = read
  const [word, job, ...more] = positionals
  if (values.help) return say(USAGE)
  if (values.version) return say(`${manifest.version}\n`)
  if (word === undefined) return refuse(`a command is missing: check or evidence\n\n${USAGE}`)
  if (more.length > 0) return refuse(`${more[0] ?? ''}: one job at a time`)
  const { json, csv, pdf, coverage } = values
  if (word === 'check') {
    if (job === undefined) return refuse('check: which job file? longtravel check JOB')
    if (coverage) return refuse('--coverage: goes with evidence, not with check')
    if (csv === '-' || csv === '') return refuse(`--csv: read "${csv}"; a folder is needed`)
    if (json === '') return refuse('--json: read ""; a file is needed, or - for standard output')
    if (pdf === '') return refuse('--pdf: read ""; a file is needed, or - for standard output')
    if (pdf === '-' && json === '-') return refuse('--json and --pdf: only one of them can be standard output')
    const { check } = await import('./command/check.ts')
    return check({ job, json, csv, pdf }, io)
  }
  if (word === 'evidence') {
    if (job !== undefined) return refuse(`${job}: evidence takes no job`)
    if (json !== undefined || csv !== undefined || pdf !== undefined)
      return refuse('--json, --csv and --pdf go with check, not with evidence')
    const { evidence } = await import('./command/evidence.ts')
    return evidence(coverage, io)
  }
  return refuse(`${word}: no such command; there are check and evidence ("longtravel --help")`)
}

/** The options and words read, or why they cannot be. */
const parse = (args: readonly string[]) => {
  try {
    const read = parseArgs({
      args: [...args],
      allowPositionals: true,
      tokens: true,
      options: {
        json: { type: 'string' },
        csv: { type: 'string' },
        pdf: { type: 'string' },
        coverage: { type: 'boolean', default: false },
        help: { type: 'boolean', short: 'h', default: false },
        version: { type: 'boolean', short: 'V', default: false },
      },
    })
    const names = read.tokens.flatMap((token) => (token.kind === 'option' ? [token.rawName] : []))
    const twice = names.find((name, index) => names.indexOf(name) < index)
    return twice === undefined ? read : `${twice}: is given twice`
  } catch (error) {
    // parseArgs adds advice on quoting in a second sentence that helps a programmer only.
    if (error instanceof TypeError)
      return `${error.message.split('. ')[0] ?? ''} ("longtravel --help" lists the options)`
    throw error
  }
}

if (import.meta.main) await start()
