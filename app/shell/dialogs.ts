/** Files by the system's dialogs: the window gives and gets bytes, and never learns a path. */
import { open } from 'node:fs/promises'
import { basename } from 'node:path'
import { BrowserWindow, dialog, type WebContents } from 'electron'
import type { Picked } from '../../core/contract/carriers.ts'
import { done, refuse, type Outcome } from '../../core/contract/errors.ts'
import { writeAll } from '../command/output.ts'
import { reasonOf } from '../command/reason.ts'

/** A calc sheet is some megabytes at the most. */
const MOST_SAVED_BYTES = 200_000_000
/** A job file is at most a million characters; nothing longer is read. */
const MOST_PICKED_BYTES = 4_000_000
const MOST_NAME = 120

/** Asks where to save and writes there, whole or not at all. False where the user thought better of it. */
export const saveBytes = async (contents: WebContents, name: unknown, bytes: unknown): Promise<Outcome<boolean>> => {
  const window = BrowserWindow.fromWebContents(contents)
  if (typeof name !== 'string' || !(bytes instanceof Uint8Array) || bytes.length > MOST_SAVED_BYTES || window === null)
    return refuse('argument', `right would be a name and at most ${MOST_SAVED_BYTES} bytes`)
  const { canceled, filePath } = await dialog.showSaveDialog(window, { defaultPath: fileNameOf(name) })
  if (canceled || filePath === '') return done(false)
  const failure = await writeAll([{ path: filePath, content: bytes }], undefined)
  return failure === undefined ? done(true) : refuse('disk', failure)
}

/** Asks for a job file and reads it. Null where the user thought better of it. */
export const pickText = async (contents: WebContents): Promise<Outcome<Picked | null>> => {
  const window = BrowserWindow.fromWebContents(contents)
  if (window === null) return done(null)
  const { filePaths } = await dialog.showOpenDialog(window, {
    properties: ['openFile'],
    filters: [
      { name: 'Job', extensions: ['json'] },
      { name: 'All files', extensions: ['*'] },
    ],
  })
  const [path] = filePaths
  return path === undefined ? done(null) : textOf(path)
}

const textOf = async (path: string): Promise<Outcome<Picked>> => {
  const name = basename(path)
  try {
    const file = await open(path)
    try {
      const { size } = await file.stat()
      if (size > MOST_PICKED_BYTES)
        return refuse(
          'argument',
          `${name} has ${size} bytes; right would be a job file of at most ${MOST_PICKED_BYTES} bytes`,
        )
      const text = decoded(await file.readFile())
      return text === undefined
        ? refuse('argument', `${name} is no text; right would be a job file (JSON in UTF-8)`)
        : done({ name, text })
    } finally {
      await file.close()
    }
  } catch (error) {
    return refuse('disk', `${name}: cannot be read: ${reasonOf(error)}`)
  }
}

const decoded = (bytes: Uint8Array): string | undefined => {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return undefined
  }
}

/** What every system takes as a file's name: a proposal that the user may change. */
const fileNameOf = (name: string): string =>
  name
    .replace(/[\p{Cc}<>:"/\\|?*]+/gu, ' ')
    .trim()
    .slice(0, MOST_NAME) || 'longtravel'
