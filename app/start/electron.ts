/** Electron's own program: a package that is installed without it, and fetches it when it is first wanted. */
import { spawn } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'

/** Where the program lies inside the package's folder; undefined where it was not fetched. Decided by the files alone. */
export const electronIn = (folder: string): string | undefined => {
  try {
    const file = join(folder, 'dist', readFileSync(join(folder, 'path.txt'), 'utf8').trim())
    return existsSync(file) ? file : undefined
  } catch {
    return undefined
  }
}

/**
 * Lets the package's own installer fetch it, for at most so many milliseconds. Without a network the installer gives up at once. Its
 * words are for developers, and are dropped: whether the program is there afterwards is all that counts.
 */
export const fetchElectron = async (folder: string, limit: number): Promise<string | undefined> => {
  const installer = spawn(process.execPath, [join(folder, 'install.js')], { stdio: 'ignore', timeout: limit })
  await new Promise((resolve) => {
    installer.on('error', resolve)
    installer.on('exit', resolve)
  })
  return electronIn(folder)
}
