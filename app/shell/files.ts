/** The files of the built window: a list made once, so that no address can name any other file. */
import { readdirSync } from 'node:fs'
import { readFile } from 'node:fs/promises'
import { extname, join } from 'node:path'

export interface ServedFile {
  readonly type: string
  readonly bytes: Uint8Array<ArrayBuffer>
}

/** A file by the path of an address as it came, nothing decoded; undefined where the window has no such file. */
export type WindowFiles = (path: string) => Promise<ServedFile | undefined>

/** The files below a folder. Links are not followed; a file of a kind that a window does not have is not served. */
export const windowFiles = (folder: string): WindowFiles => {
  const listed = new Map<string, { readonly file: string; readonly type: string }>()
  for (const entry of readdirSync(folder, { withFileTypes: true, recursive: true })) {
    const file = join(entry.parentPath, entry.name)
    const type = TYPES[extname(entry.name)]
    if (entry.isFile() && type !== undefined)
      listed.set(file.slice(folder.length).replaceAll('\\', '/'), { file, type })
  }
  return async (path) => {
    const found = listed.get(path === '/' ? '/index.html' : path)
    if (found === undefined) return undefined
    const bytes = await readFile(found.file).catch(() => undefined)
    return bytes && { type: found.type, bytes }
  }
}

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.ttf': 'font/ttf',
  '.woff': 'font/woff',
  '.woff2': 'font/woff2',
}
