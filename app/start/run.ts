/** Running one of the two programs that hold the window, to its end. */
import { spawn } from 'node:child_process'

/** Exit codes of the program itself: a wrong setting, a fault. What it said of them stands. */
const INPUT = 2
export const FAULT = 3

/** Milliseconds in which a program that cannot run here has given up. */
const AT_ONCE = 10_000

export interface End {
  /** Undefined where a signal ended it, or where it did not start. */
  readonly code: number | undefined
  readonly milliseconds: number
  /** Whether it was told to end. */
  readonly told: boolean
}

/** Runs a program in a folder on this terminal; the signals that end this process go on to it. */
export const run = (file: string, given: readonly string[], cwd: string): Promise<End> =>
  new Promise((resolve) => {
    const began = performance.now()
    let told = false
    const child = spawn(file, given, { cwd, stdio: 'inherit' })
    const pass = (signal: NodeJS.Signals) => {
      told = true
      child.kill(signal)
    }
    const signals = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const
    const end = (code: number | undefined) => {
      for (const signal of signals) process.off(signal, pass)
      resolve({ code, milliseconds: performance.now() - began, told })
    }
    for (const signal of signals) process.on(signal, pass)
    child.on('error', (error) => {
      process.stderr.write(`longtravel: cannot start ${file}: ${error.message}\n`)
      end(undefined)
    })
    child.on('exit', (code) => end(code ?? undefined))
  })

/** Whether it cannot run here at all, so that another may be tried: not one that was used first, or that says what is wrong. */
export const failedAtOnce = ({ code, milliseconds, told }: End): boolean =>
  code !== 0 && code !== INPUT && code !== FAULT && milliseconds < AT_ONCE && !told
