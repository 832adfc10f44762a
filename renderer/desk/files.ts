/** Files in and out, without a path: by the shell's dialogs, or as the browser does it. */
import type { Bridge, Picked } from '../../core/contract/carriers.ts'
import type { Outcome } from '../../core/contract/errors.ts'
import { refused } from './desk.ts'

declare global {
  interface Window {
    /** Put there by the shell's preload; not there on the loopback page. */
    readonly longtravel?: Bridge
  }
}

/** A job file is at most a million characters; nothing longer is read. */
const MOST_BYTES = 4_000_000

/**
 * Saves bytes under a name that the user may change; false where the user thought better of it. On the loopback page the
 * browser's own way of saving decides what is asked, and the answer is true once it has the bytes.
 */
export const saveBytes = async (name: string, bytes: Uint8Array, type: string): Promise<Outcome<boolean>> => {
  if (window.longtravel !== undefined) return window.longtravel.saveBytes(name, bytes)
  const address = URL.createObjectURL(new Blob([new Uint8Array(bytes)], { type }))
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  // The browser takes the bytes after the click has been dealt with.
  setTimeout(() => URL.revokeObjectURL(address), 60_000)
  return Promise.resolve({ ok: true, value: true })
}

/** Lets the user pick a job file; null where the user thought better of it. To be called from a click or a key. */
export const pickText = async (): Promise<Outcome<Picked | null>> => {
  if (window.longtravel !== undefined) return window.longtravel.pickText()
  const input = document.createElement('input')
  input.type = 'file'
  input.accept = '.json,application/json'
  const picked = Promise.withResolvers<File | undefined>()
  input.addEventListener('change', () => picked.resolve(input.files?.[0]))
  input.addEventListener('cancel', () => picked.resolve(undefined))
  input.click()
  const file = await picked.promise
  return file === undefined ? { ok: true, value: null } : textOf(file)
}

/** The text of a file that was picked or dropped; a picture or anything else that is no text is told by its name. */
export const textOf = async (file: File): Promise<Outcome<Picked>> => {
  if (file.size > MOST_BYTES)
    return refused(
      'argument',
      `${file.name} has ${file.size} bytes; right would be a job file of at most ${MOST_BYTES} bytes`,
    )
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(await file.arrayBuffer())
    return { ok: true, value: { name: file.name, text } }
  } catch {
    return refused('argument', `${file.name} is no text; right would be a job file (JSON in UTF-8)`)
  }
}
