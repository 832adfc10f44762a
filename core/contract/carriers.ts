/** What the two carriers between window and desk agree on: the shell's bridge, and the lines and limits of the loopback page. Types only. */
import type { CallError, Outcome } from './errors.ts'

/** A text file as it was picked: its name without any folder. */
export interface Picked {
  readonly name: string
  readonly text: string
}

/** What the Electron shell puts into the window as `window.longtravel`. Plain values and functions only: it is cloned. */
export interface Bridge {
  /** `id` names the call for its cancel; the window never uses it twice. */
  readonly call: (
    id: number,
    name: string,
    argument: unknown,
    onProgress: (done: number, of: number) => void,
  ) => Promise<Outcome<unknown>>
  readonly cancel: (id: number) => void
  /** Asks for a place and writes there. False where the user thought better of it. */
  readonly saveBytes: (name: string, bytes: Uint8Array) => Promise<Outcome<boolean>>
  /** Asks for a job file and reads it. Null where the user thought better of it. */
  readonly pickText: () => Promise<Outcome<Picked | null>>
}

/**
 * One line of what the loopback page answers to a call: any number of progress lines and one answer. JSON carries no bytes, so
 * fields of the value that are bytes stand apart, in base64, under their names.
 */
export type PageLine =
  | { readonly kind: 'progress'; readonly done: number; readonly of: number }
  | {
      readonly kind: 'answer'
      readonly ok: true
      readonly value: unknown
      readonly bytes?: Readonly<Record<string, string>>
    }
  | { readonly kind: 'answer'; readonly ok: false; readonly error: CallError }

/** Names the token that a page was given for its key. */
export type TokenHeader = 'x-longtravel-token'
