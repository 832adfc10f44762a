/** Where the window lives inside Electron: a scheme of its own, so that no file and no other page is of its origin. */

export const SCHEME = 'longtravel'
const HOST = 'window'
export const WINDOW_ADDRESS = `${SCHEME}://${HOST}/`

/** Path of an address that belongs to the window, as it came; undefined for any other. */
export const pathOf = (address: string): string | undefined => {
  if (!URL.canParse(address)) return undefined
  const { protocol, host, pathname } = new URL(address)
  return protocol === `${SCHEME}:` && host === HOST ? pathname : undefined
}

/** The channels between the window's bridge and the shell. */
export const CHANNELS = {
  call: 'longtravel:call',
  cancel: 'longtravel:cancel',
  progress: 'longtravel:progress',
  save: 'longtravel:save',
  pick: 'longtravel:pick',
} as const
