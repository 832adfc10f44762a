/** Opens the window in the default browser. */
import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

/**
 * Opens an address by way of a file that leads to it and that only the user can read: what stands on a command line, any user of
 * the machine can read. Gives a function that takes the file away again.
 */
export const openInBrowser = (address: string, command: Opener): (() => void) => {
  const folder = mkdtempSync(join(tmpdir(), 'longtravel-'))
  const file = join(folder, 'open.html')
  writeFileSync(file, leadingTo(address), { mode: 0o600, flag: 'wx' })
  const child = spawn(command.file, [...command.before, file], { stdio: 'ignore', detached: true })
  // A machine without a browser: the address was printed.
  child.on('error', () => undefined)
  child.unref()
  return () => rmSync(folder, { recursive: true, force: true })
}

export interface Opener {
  readonly file: string
  readonly before: readonly string[]
}

/** What opens a file in the default browser; undefined on a Linux without a display. */
export const openerFor = (
  platform: string,
  environment: Readonly<Record<string, string | undefined>>,
): Opener | undefined => {
  if (platform === 'darwin') return { file: 'open', before: [] }
  if (platform === 'win32') return { file: 'explorer.exe', before: [] }
  return hasDisplay(platform, environment) ? { file: 'xdg-open', before: [] } : undefined
}

/** On Linux a window needs X11 or Wayland. */
export const hasDisplay = (platform: string, environment: Readonly<Record<string, string | undefined>>): boolean =>
  platform === 'win32' ||
  platform === 'darwin' ||
  Boolean(environment['DISPLAY']) ||
  Boolean(environment['WAYLAND_DISPLAY'])

/** The address is the program's own and holds no sign that HTML reads otherwise. */
const leadingTo = (address: string): string => `<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="referrer" content="no-referrer">
<meta http-equiv="refresh" content="0; url=${address}">
<title>Longtravel</title>
<a href="${address}">Longtravel</a>
`
