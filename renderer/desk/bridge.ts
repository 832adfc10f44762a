/** Carries calls over the bridge of the Electron shell. */
import type { Bridge } from '../../core/contract/carriers.ts'
import { refused, type Ask, type Desk } from './desk.ts'

/** A desk behind `window.longtravel`. It cannot go away alone: the shell's end is the window's. */
export const bridgeDesk = (bridge: Pick<Bridge, 'call' | 'cancel'>): Desk => {
  let last = 0

  const ask: Ask = async (name, argument, { signal, onProgress } = {}) => {
    if (signal?.aborted) return refused('cancelled', `${name}: cancelled`)
    const id = ++last
    const cancel = () => bridge.cancel(id)
    signal?.addEventListener('abort', cancel)
    try {
      const copy: unknown = JSON.parse(JSON.stringify(argument))
      return await bridge.call(id, name, copy, (done, of) => onProgress?.(done, of))
    } catch (error) {
      return refused('fault', `${name}: the shell did not answer: ${String(error)}`)
    } finally {
      signal?.removeEventListener('abort', cancel)
    }
  }

  return { call: ask as Desk['call'], ended: new Promise(() => undefined) }
}
