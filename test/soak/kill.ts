/**
 * Kills a process that keeps revisions, at random times, and looks at what it leaves. `node test/soak/kill.ts [ROUNDS] [SEED]`
 * runs 100 rounds. A kill leaves the system running: it proves nothing about a loss of power. For that the record rests
 * on synchronous FULL, which is read back on every open.
 */
import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { openForWriting, RECORD_FILE } from '../../app/store/open.ts'
import { contentOf } from './content.ts'

export interface KillReport {
  readonly rounds: number
  /** Rounds in which the process was killed before it had kept anything, most of them while it made the record. */
  readonly early: number
  readonly acknowledged: number
  /** What was found wrong, a line each. */
  readonly faults: readonly string[]
}

/** Rounds on one record before a new one is made. */
const ROUNDS_A_RECORD = 10
/** Milliseconds of keeping before the kill, at the most; and of making a record. */
const LONGEST = 250
const LONGEST_MAKING = 40

export const killRounds = async (rounds: number, seed: number): Promise<KillReport> => {
  const random = randomFrom(seed)
  const faults: string[] = []
  let early = 0
  let total = 0
  let folder = ''
  let acknowledged = new Map<number, number>()
  for (let round = 0; round < rounds; round++) {
    const fresh = round % ROUNDS_A_RECORD === 0
    if (fresh) {
      if (folder !== '') rmSync(folder, { recursive: true })
      folder = mkdtempSync(join(tmpdir(), 'longtravel-kill-'))
      acknowledged = new Map()
    }
    const file = join(folder, RECORD_FILE)
    const before = acknowledged.size
    await keepAndKill(file, fresh, random, acknowledged)
    if (acknowledged.size === before) early++
    total += acknowledged.size - before
    faults.push(...(await faultsIn(file, acknowledged)).map((fault) => `round ${round}: ${fault}`))
  }
  if (folder !== '') rmSync(folder, { recursive: true })
  return { rounds, early, acknowledged: total, faults }
}

/** Runs a keeper and kills it; adds what it had said: id and sequence. */
const keepAndKill = async (
  file: string,
  fresh: boolean,
  random: () => number,
  acknowledged: Map<number, number>,
): Promise<void> => {
  const keeper = spawn(process.execPath, [new URL('./keeper.ts', import.meta.url).pathname, file], {
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const over = once(keeper, 'close')
  let said = ''
  keeper.stdout.on('data', (bytes: Buffer) => (said += bytes.toString()))
  if (fresh) {
    while (!existsSync(`${file}-writer`) && keeper.exitCode === null) await wait(1)
    await wait(random() * LONGEST_MAKING)
  } else {
    await Promise.race([once(keeper.stdout, 'data'), over])
    await wait(random() * LONGEST)
  }
  if (keeper.exitCode !== null) throw new Error(`the keeper ended by itself with exit code ${keeper.exitCode}`)
  keeper.kill('SIGKILL')
  await over
  for (const line of said.split('\n').slice(0, -1)) {
    const [id, sequence] = line.split(' ').map(Number)
    acknowledged.set(id!, sequence!)
  }
}

/** The record opened as the next start would; every acknowledged revision read and compared with what it was to say. */
const faultsIn = async (file: string, acknowledged: ReadonlyMap<number, number>): Promise<readonly string[]> => {
  const outcome = await openForWriting(file)
  if (!outcome.ok) return [outcome.error.message]
  const { calls, settings, close } = outcome.value
  const faults: string[] = []
  if (settings['synchronous'] !== 2 || settings['journal_mode'] !== 'wal') faults.push('not FULL in WAL')
  const verified = calls.verify()
  // The last one may be kept and not yet be acknowledged; it then counts as kept.
  if (!verified.ok) faults.push(verified.error.message)
  else if (verified.value.revisions < acknowledged.size)
    faults.push(`${verified.value.revisions} of ${acknowledged.size} revisions are there`)
  for (const [id, sequence] of acknowledged) {
    const found = calls.revision(id)
    const wanted = contentOf(sequence)
    if (!found.ok) faults.push(found.error.message)
    else if (found.value.sequence !== sequence || found.value.note !== wanted.note || found.value.text !== wanted.text)
      faults.push(`revision ${id} is not what was kept`)
  }
  const closed = close()
  return closed.ok ? faults : [...faults, closed.error.message]
}

/** Numbers from 0 to 1, the same for the same seed: a linear congruential generator (Numerical Recipes, 2nd ed., section 7.1). */
const randomFrom = (seed: number) => {
  let state = seed >>> 0
  return (): number => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0
    return state / 2 ** 32
  }
}

if (import.meta.main) {
  const [rounds = '100', seed = String(Date.now() % 2 ** 32)] = process.argv.slice(2)
  const report = await killRounds(Number(rounds), Number(seed))
  for (const fault of report.faults) console.error(fault)
  console.log(
    `seed ${seed}: ${report.rounds} kills (${report.early} before the first revision of the round), ` +
      `${report.acknowledged} acknowledged revisions, ${report.faults.length} faults`,
  )
  process.exitCode = report.faults.length === 0 ? 0 : 1
}
