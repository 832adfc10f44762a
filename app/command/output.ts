/** Writing files so that none is ever half-written: all are written beside their targets, then all are renamed. */
import { access, constants, mkdir, open, realpath, rename, rm, rmdir, stat } from 'node:fs/promises'
import { basename, dirname, join, resolve } from 'node:path'
import { reasonOf } from './reason.ts'

export interface Target {
  readonly path: string
  readonly content: string | Uint8Array
}

/**
 * Why these paths cannot be written, one message a path; empty where they can. `source` is a file that must stay as it is
 * (the job itself); `folder` will be made where it is not there.
 */
export const refusals = async (
  paths: readonly string[],
  source: string | undefined,
  folder: string | undefined,
): Promise<readonly string[]> => {
  const refused = folder === undefined ? undefined : await folderRefusal(folder)
  if (refused !== undefined) return [refused]
  const used = new Set(source === undefined ? [] : [await trueOf(source)])
  const messages: string[] = []
  for (const path of paths) {
    const message = await fileRefusal(path, folder)
    const place = await trueOf(path)
    if (message !== undefined) messages.push(message)
    else if (used.has(place)) messages.push(`${path}: this command already reads or writes that file`)
    else used.add(place)
  }
  return messages
}

/** Writes all targets. Where one cannot be written it gives the message, and the former files stand as they were. */
export const writeAll = async (targets: readonly Target[], folder: string | undefined): Promise<string | undefined> => {
  const beside: { readonly from: string; readonly to: string }[] = []
  let made: string | undefined
  let current = folder ?? ''
  try {
    if (folder !== undefined) made = await mkdir(folder, { recursive: true })
    for (const { path, content } of targets) {
      current = path
      const to = await trueOf(path)
      const from = join(dirname(to), `.${basename(to)}.${process.pid}.new`)
      beside.push({ from, to })
      await writeThrough(from, content, await modeOf(to))
    }
    for (const { from, to } of beside) {
      current = to
      await rename(from, to)
    }
    return undefined
  } catch (error) {
    await Promise.all(beside.map(({ from }) => rm(from, { force: true }).catch(() => undefined)))
    if (made !== undefined) await rmdir(made).catch(() => undefined)
    return `${current}: cannot be written: ${reasonOf(error)}`
  }
}

/** Where a path leads: links followed, the last part allowed to be missing. */
const trueOf = async (path: string): Promise<string> => {
  const whole = resolve(path)
  const parent = async () => join(await realpath(dirname(whole)).catch(() => dirname(whole)), basename(whole))
  return realpath(whole).catch(parent)
}

const fileRefusal = async (path: string, folder: string | undefined): Promise<string | undefined> => {
  const found = await stat(path).catch(() => undefined)
  if (found?.isDirectory()) return `${path}: is a folder; a file is needed`
  if (found !== undefined && !found.isFile()) return `${path}: is not a plain file; "-" writes to standard output`
  if (found !== undefined) return accessRefusal(path, path)
  const parent = dirname(resolve(path))
  return folder !== undefined && parent === resolve(folder) ? undefined : accessRefusal(path, parent)
}

const folderRefusal = async (folder: string): Promise<string | undefined> => {
  const found = await stat(folder).catch(() => undefined)
  if (found !== undefined && !found.isDirectory()) return `${folder}: is a file; a folder is needed`
  return accessRefusal(folder, found === undefined ? dirname(resolve(folder)) : folder)
}

/** Why `path` cannot be written as `needed` (itself, or the folder it is to stand in) refuses it. */
const accessRefusal = async (path: string, needed: string): Promise<string | undefined> => {
  try {
    // A file's path with a slash behind is refused by the system where it is not a folder.
    await access(needed === path ? needed : `${needed}/`, constants.W_OK)
    return undefined
  } catch (error) {
    return `${path}: cannot be written: ${reasonOf(error)}`
  }
}

const modeOf = async (path: string): Promise<number | undefined> =>
  stat(path).then(
    ({ mode }) => mode & 0o777,
    () => undefined,
  )

/** Text to a new file, on the disk before this returns. */
const writeThrough = async (path: string, content: string | Uint8Array, mode: number | undefined): Promise<void> => {
  const file = await open(path, 'wx')
  try {
    if (mode !== undefined) await file.chmod(mode)
    await file.writeFile(content)
    await file.sync()
  } finally {
    await file.close()
  }
}
