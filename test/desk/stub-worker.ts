/** The desk's worker with a printer of the tests': it says what it was given, in steps, or does what the job's title asks for. */
import { parentPort, workerData } from 'node:worker_threads'
import { setImmediate as breath } from 'node:timers/promises'
import { serve } from '../../app/desk/serve.ts'
import { done, refuse } from '../../core/contract/errors.ts'

const PAGES = 10

serve(
  parentPort!,
  (workerData as { home: string }).home,
  async (review, { signal, onProgress, revision, paper, units }) => {
    const { title } = review.job.project
    if (title === 'refuse') return refuse('not-covered', 'no typeface draws this')
    if (title === 'throw') throw new Error('the pen broke')
    if (title === 'die') {
      setImmediate(() => {
        throw new Error('the worker dies')
      })
    }
    if (title === 'exit') process.exit(7)
    // Runs for ever: only a cancel ends it.
    const pages = title === 'endless' || title === 'die' ? Infinity : PAGES
    for (let page = 1; page <= pages; page++) {
      signal.throwIfAborted()
      if (page <= PAGES) onProgress(page, PAGES)
      await breath()
    }
    return done(
      new TextEncoder().encode(`%PDF ${JSON.stringify({ title, revision: revision?.label ?? null, paper, units })}`),
    )
  },
)
