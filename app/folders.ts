/** Where the program keeps its data. */
import { posix, win32 } from 'node:path'

export type Folder = { readonly folder: string } | { readonly message: string }

/**
 * The data folder by the platform's convention, or why there is none. LONGTRAVEL_HOME moves it; a relative one counts from where the
 * program was started. Linux and others: XDG Base Directory Specification, which has a relative XDG_DATA_HOME ignored.
 * Windows: the local application data, never the roaming ones, which a server copies while they are open.
 */
export const dataFolder = (environment: Readonly<Record<string, string | undefined>>, platform: string): Folder => {
  const given = (name: string): string | undefined => environment[name] || undefined
  const moved = given('LONGTRAVEL_HOME')
  if (moved !== undefined) return { folder: moved }
  if (platform === 'win32') {
    const profile = given('USERPROFILE')
    const local = given('LOCALAPPDATA') ?? (profile === undefined ? undefined : win32.join(profile, 'AppData', 'Local'))
    return local === undefined ? missing('LOCALAPPDATA') : { folder: win32.join(local, 'Longtravel') }
  }
  const home = given('HOME')
  if (platform === 'darwin') {
    if (home === undefined) return missing('HOME')
    return { folder: posix.join(home, 'Library', 'Application Support', 'Longtravel') }
  }
  const shared = given('XDG_DATA_HOME')
  if (shared !== undefined && posix.isAbsolute(shared)) return { folder: posix.join(shared, 'longtravel') }
  return home === undefined ? missing('HOME') : { folder: posix.join(home, '.local', 'share', 'longtravel') }
}

const missing = (name: string): Folder => ({
  message: `there is no folder for data: ${name} is not set; LONGTRAVEL_HOME may name one instead`,
})
