/** Reading a job's text: bounded in size, UTF-8, from a plain file or from standard input. */
import { open, stat } from 'node:fs/promises'
import { reasonOf } from './reason.ts'

/** A job is a few kilobytes; what is larger than this is not a job. In bytes. */
export const MOST_BYTES = 10_000_000

export type Text = { readonly text: string } | { readonly message: string }

/** The text of a file, or why it cannot be read. Never reads more than MOST_BYTES, nor from anything but a plain file. */
export const readFileText = async (path: string): Promise<Text> => {
  try {
    const { size, ...entry } = await kindOf(path)
    if (entry.folder) return { message: `${path}: is a folder; a job file is needed` }
    if (!entry.plain) return { message: `${path}: is not a plain file; "-" reads a job from standard input` }
    if (size > MOST_BYTES) return { message: tooLarge(path) }
    const file = await open(path, 'r')
    try {
      return await gather(file.createReadStream({ autoClose: false }), path)
    } finally {
      await file.close()
    }
  } catch (error) {
    return { message: `${path}: cannot be read: ${reasonOf(error)}` }
  }
}

/** The text that standard input brings, or why it cannot be used. Stops reading once it is past MOST_BYTES. */
export const readStreamText = async (stream: AsyncIterable<Uint8Array>): Promise<Text> => {
  try {
    return await gather(stream, 'standard input')
  } catch (error) {
    return { message: `standard input: cannot be read: ${reasonOf(error)}` }
  }
}

const kindOf = async (path: string): Promise<{ size: number; folder: boolean; plain: boolean }> => {
  const found = await stat(path)
  return { size: found.size, folder: found.isDirectory(), plain: found.isFile() }
}

const gather = async (stream: AsyncIterable<unknown>, from: string): Promise<Text> => {
  const chunks: Uint8Array[] = []
  let size = 0
  for await (const chunk of stream) {
    const bytes = chunk as Uint8Array
    size += bytes.length
    if (size > MOST_BYTES) return { message: tooLarge(from) }
    chunks.push(bytes)
  }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks)) }
  } catch {
    return { message: `${from}: is not UTF-8 text` }
  }
}

const tooLarge = (from: string): string => `${from}: is larger than ${MOST_BYTES / 1e6} MB; a job is a few kilobytes`
