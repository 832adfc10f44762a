/** Another process on the same record. */
import { spawn } from 'node:child_process'
import { onTestFinished } from 'vitest'

export interface Another {
  /** Its first line. */
  readonly said: string
  readonly kill: () => Promise<void>
}

const PROJECT = new URL('../..', import.meta.url).pathname

/**
 * Starts Node on a script (imports count from the project) that says one line and then waits to be killed, under a shell's
 * limits and as another user where asked. Killed when the test is over.
 */
export const another = async (
  script: string,
  how: { readonly limits?: string; readonly user?: number } = {},
): Promise<Another> => {
  const node = [process.execPath, '--expose-gc', '--input-type=module-typescript', '-e']
  const waiting = `${script}\nsetInterval(() => undefined, 1000)`
  const limited = ['-c', `${how.limits ?? 'true'}; exec "$@"`, 'sh', ...node, waiting]
  const child = spawn('sh', limited, {
    cwd: PROJECT,
    stdio: ['ignore', 'pipe', 'pipe'],
    ...(how.user === undefined ? {} : { uid: how.user, gid: how.user }),
  })
  let complaint = ''
  child.stderr.on('data', (bytes: Buffer) => (complaint += bytes.toString()))
  const over = new Promise<void>((resolve) => child.on('close', () => resolve()))
  const kill = async () => {
    child.kill('SIGKILL')
    await over
  }
  onTestFinished(kill)
  const said = await new Promise<string>((resolve, reject) => {
    child.stdout.once('data', (bytes: Buffer) => resolve(bytes.toString().trim()))
    child.once('close', () => reject(new Error(`the other process ended: ${complaint}`)))
  })
  return { said, kill }
}
