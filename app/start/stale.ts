/** Whether out/ was built from what stands here now: decided by the names, sizes and times of the files it is made from. */
import { createHash } from 'node:crypto'
import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const PROJECT = join(import.meta.dirname, '../..')
const MARK = join(PROJECT, 'out/built-from')
const FOLDERS = ['core', 'app', 'renderer', 'resources']
const FILES = ['electron.config.ts', 'package-lock.json']

export const isStale = (): boolean => {
  try {
    return readFileSync(MARK, 'utf8') !== sources()
  } catch {
    return true
  }
}

/** To be called after a build that went well. */
export const markBuilt = (): void => writeFileSync(MARK, sources())

const sources = (): string => {
  const below = FOLDERS.flatMap((folder) =>
    readdirSync(join(PROJECT, folder), { withFileTypes: true, recursive: true })
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath, entry.name)),
  )
  const hash = createHash('sha256')
  for (const file of [...below.sort(), ...FILES.map((name) => join(PROJECT, name))]) {
    const { size, mtimeMs } = statSync(file)
    hash.update(`${file}\n${size} ${mtimeMs}\n`)
  }
  return hash.digest('hex')
}
