/** Runs in the worker: hands what is asked to the answerer. */
import type { ToLive } from '../../core/contract/live.ts'
import { answerer } from './live.ts'

const answer = answerer(() => performance.now())

self.addEventListener('message', ({ data }: MessageEvent<ToLive>) => {
  const answered = answer(data)
  if (answered !== undefined) self.postMessage(answered)
})
