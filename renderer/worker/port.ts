/** The page's way to its worker. */
import type { FromLive } from '../../core/contract/live.ts'
import type { LivePort } from '../state/types.ts'

/** Starts the worker. A fault that ends it is told as the answer to whatever was asked. */
export const livePort = (): LivePort => {
  const worker = new Worker(new URL('./start.ts', import.meta.url), { type: 'module' })
  return {
    post: (ask) => worker.postMessage(ask),
    listen: (answered) => {
      worker.addEventListener('message', ({ data }: MessageEvent<FromLive>) => answered(data))
      worker.addEventListener('error', ({ message }) => {
        answered({ answer: 'fault', turn: 0, message: message || 'the worker that reviews the job has stopped' })
      })
    },
  }
}
