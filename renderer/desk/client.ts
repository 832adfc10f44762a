/** The one door of the window to the desk: over the shell's bridge where there is one, else over HTTP to the page's own origin. */
import { bridgeDesk } from './bridge.ts'
import type { Desk } from './desk.ts'
import { pageDesk } from './page.ts'

export { pickText, saveBytes, textOf } from './files.ts'
export type { Desk } from './desk.ts'

const MEMORY = 'longtravel.token'

/** To be called once, when the window starts: it takes the key out of the address. */
export const deskClient = (): Desk => {
  if (window.longtravel !== undefined) return bridgeDesk(window.longtravel)
  const key = new URLSearchParams(location.hash.slice(1)).get('key') ?? undefined
  if (key !== undefined) history.replaceState(null, '', location.pathname)
  return pageDesk({
    fetch: (path, init) => fetch(path, init),
    key,
    memory: {
      read: () => sessionStorage.getItem(MEMORY),
      write: (token) => sessionStorage.setItem(MEMORY, token),
    },
  })
}
