/** The record as the desk has it: to write, only to read (and why), or not at all (and why). */
import { join } from 'node:path'
import type { CallError, Outcome } from '../../core/contract/errors.ts'
import type { ReadCalls, WriteCalls } from '../store/calls.ts'
import { openForReading, openForWriting, RECORD_FILE, type Opened } from '../store/open.ts'

export type DeskRecord =
  | { readonly access: 'write'; readonly opened: Opened<WriteCalls> }
  | { readonly access: 'read'; readonly opened: Opened<ReadCalls>; readonly because: CallError }
  | { readonly access: 'none'; readonly because: CallError }

/** Opens the record of a data folder. Where another process writes to it, it is opened for reading. */
export const openRecord = async (home: string): Promise<DeskRecord> => {
  const file = join(home, RECORD_FILE)
  const toWrite = await openForWriting(file)
  if (toWrite.ok) return { access: 'write', opened: toWrite.value }
  if (toWrite.error.kind !== 'in-use') return { access: 'none', because: toWrite.error }
  const toRead = await openForReading(file)
  if (toRead.ok) return { access: 'read', opened: toRead.value, because: toWrite.error }
  return { access: 'none', because: toRead.error }
}

/** A call that reads, or why the record cannot be read. */
export const reading = <T>(record: DeskRecord, work: (calls: ReadCalls) => Outcome<T>): Outcome<T> =>
  record.access === 'none' ? { ok: false, error: record.because } : work(record.opened.calls)

/** A call that writes, or why the record cannot be written. */
export const writing = <T>(record: DeskRecord, work: (calls: WriteCalls) => Outcome<T>): Outcome<T> =>
  record.access === 'write' ? work(record.opened.calls) : { ok: false, error: record.because }
