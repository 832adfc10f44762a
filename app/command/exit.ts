/** What the command ends with. Users' scripts rest on these. */
export const EXIT = {
  /** Nothing fails and everything owed was checked. */
  holds: 0,
  fails: 1,
  /** The input or the command line is wrong, or a file cannot be read or written. */
  input: 2,
  /** A fault of the program. */
  fault: 3,
  /** Nothing fails, but something owed is not covered. */
  open: 4,
} as const

/** Where the command reads and writes: the process in use, texts in the tests. */
export interface Io {
  readonly stdin: () => AsyncIterable<Uint8Array>
  readonly stdout: (written: string | Uint8Array) => void
  readonly stderr: (text: string) => void
  readonly environment: Readonly<Record<string, string | undefined>>
}
