/** A command line whose streams are texts, and a small job to run it on. */
import { run } from '../../app/cli.ts'

export interface Ran {
  readonly exit: number
  readonly out: string
  readonly err: string
}

/** Runs a command line in this process. `input` is standard input; `environment` that of the command. */
export const ran = async (
  args: readonly string[],
  input: string | (() => AsyncIterable<Uint8Array>) = '',
  environment: Record<string, string> = {},
): Promise<Ran> => {
  let out = ''
  let err = ''
  const stdin =
    typeof input === 'function'
      ? input
      : async function* () {
          yield await Promise.resolve(Buffer.from(input))
        }
  const exit = await run(args, {
    stdin,
    stdout: (written) => {
      out += typeof written === 'string' ? written : Buffer.from(written).toString('latin1')
    },
    stderr: (text) => {
      err += text
    },
    environment,
  })
  return { exit, out, err }
}

/** A job of no plant: two wheels on one span, everything else by default. */
export const smallJob = {
  format: 'longtravel-job',
  version: 1,
  project: { title: 'Test bay' },
  basis: { standard: 'us' },
  cranes: [
    {
      name: 'North',
      ratedCapacity: '10 ton',
      bridgeWeight: '14 kip',
      trolleyWeight: '3 kip',
      bridgeSpan: '50 ft',
      hookApproach: '4 ft',
      operation: 'pendant',
      serviceClass: 'C',
      wheelSpacings: ['8 ft'],
    },
  ],
  runway: { spans: ['20 ft'], rail: { name: 'ASCE 40' } },
  girder: { section: { kind: 'rolled', shape: 'W24X84' }, steel: { name: 'A992' } },
}
