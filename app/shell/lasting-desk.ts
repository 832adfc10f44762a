/** A desk that outlives its worker. */
import type { Desk } from '../desk/desk.ts'

export type LastingDesk = Pick<Desk, 'ask' | 'close'>

/** Asks one desk for as long as it lives. Where its worker died, what ran is answered as stopped and the next call has a new one. */
export const lastingDesk = (startDesk: () => Desk): LastingDesk => {
  const start = (): { readonly desk: Desk; stopped: boolean } => {
    const started = { desk: startDesk(), stopped: false }
    void started.desk.ended.then(({ kind }) => {
      started.stopped = kind === 'stopped'
    })
    return started
  }
  let current = start()
  return {
    ask: (name, argument, options) => {
      if (current.stopped) current = start()
      return current.desk.ask(name, argument, options)
    },
    close: () => current.desk.close(),
  }
}
