/** What the window remembers: kept by the desk, and where the desk is out of reach for as long as the window stands. */
import type { Json } from '../../core/job/json.ts'
import type { Desk } from '../desk/client.ts'

export interface Settings {
  /** Undefined where it was never set or the desk cannot say. */
  get(name: string): Promise<Json | undefined>
  set(name: string, value: Json): void
}

export const settingsOf = (desk: Pick<Desk, 'call'>): Settings => ({
  get: async (name) => {
    const outcome = await desk.call('settings.get', { name })
    return outcome.ok ? (outcome.value.value ?? undefined) : undefined
  },
  set: (name, value) => {
    void desk.call('settings.set', { name, value })
  },
})
