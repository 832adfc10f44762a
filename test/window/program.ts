/** The window's own program as a process: as `npm start` starts it, or the built page alone. */
import { spawn, type ChildProcess } from 'node:child_process'
import { join } from 'node:path'
import { newFolder } from './serve.ts'

const PROJECT = join(import.meta.dirname, '../..')

export interface Program {
  readonly address: string
  /** Ends it at once, without a farewell. */
  readonly kill: () => Promise<void>
  /** Asks it to end; its exit code. */
  readonly end: () => Promise<number | null>
}

/** Starts it on a new data folder and waits for its address. */
export const startProgram = async (file: 'app/start.ts' | 'out/main/page.js'): Promise<Program> => {
  const home = newFolder()
  const child = spawn(process.execPath, [file, '--no-open'], {
    cwd: PROJECT,
    env: { ...process.env, LONGTRAVEL_HOME: home.folder, LONGTRAVEL_PAGE: '1' },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const ended = new Promise<number | null>((resolve) => child.once('exit', resolve))
  void ended.then(home.remove)
  return {
    address: await addressFrom(child),
    kill: async () => {
      child.kill('SIGKILL')
      await ended
    },
    end: () => {
      child.kill('SIGTERM')
      return ended
    },
  }
}

const addressFrom = (child: ChildProcess): Promise<string> =>
  new Promise((resolve, reject) => {
    let told = ''
    child.stdout?.on('data', (chunk) => {
      told += String(chunk)
      const address = /http:\/\/127\.0\.0\.1:\d+\/#key=\S+(?=\s)/.exec(told)?.[0]
      if (address !== undefined) resolve(address)
    })
    child.once('exit', (code) => reject(new Error(`The program ended with ${code ?? 'a signal'} and said: ${told}`)))
  })
