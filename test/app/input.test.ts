/** Job texts from files and streams: bounded, plain, UTF-8, or refused in one line. */
import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, truncateSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { MOST_BYTES, readFileText, readStreamText } from '../../app/command/input.ts'

const folder = mkdtempSync(join(tmpdir(), 'longtravel-input-'))
afterAll(() => {
  rmSync(folder, { recursive: true })
})

const file = (name: string, content: string | Uint8Array = ''): string => {
  const path = join(folder, name)
  writeFileSync(path, content)
  return path
}

/** Bytes without end; counts how many chunks were taken. */
const endless = () => {
  const taken = { chunks: 0 }
  const stream = (async function* () {
    for (;;) {
      taken.chunks++
      yield await Promise.resolve(new Uint8Array(1_000_000))
    }
  })()
  return { stream, taken }
}

describe('a file', () => {
  it('gives its text, without a byte order mark', async () => {
    expect(await readFileText(file('plain', '\uFEFF{"a": "2 × 3"}'))).toEqual({ text: '{"a": "2 × 3"}' })
  })

  it('of no bytes is read as it stands', async () => {
    expect(await readFileText(file('empty'))).toEqual({ text: '' })
  })

  it('of 200 MB is refused by its size', async () => {
    const path = file('large')
    truncateSync(path, 200_000_000)
    const before = process.memoryUsage().arrayBuffers
    expect(await readFileText(path)).toEqual({ message: `${path}: is larger than 10 MB; a job is a few kilobytes` })
    expect(process.memoryUsage().arrayBuffers - before).toBeLessThan(MOST_BYTES)
  })

  it('in another encoding is refused', async () => {
    const path = file('utf16', Buffer.from('\uFEFF{}', 'utf16le'))
    expect(await readFileText(path)).toEqual({ message: `${path}: is not UTF-8 text` })
  })

  it.each([
    ['a folder', folder, 'is a folder; a job file is needed'],
    ['missing', join(folder, 'none'), 'cannot be read: there is no such file or folder'],
    ['below a file', join(file('leaf'), 'job'), 'cannot be read: a part of the path is a file, not a folder'],
    ['a device without end', '/dev/zero', 'is not a plain file; "-" reads a job from standard input'],
    ['a name too long', join(folder, 'n'.repeat(300)), 'cannot be read: the path is too long'],
  ])('that is %s is refused', async (_, path, message) => {
    expect(await readFileText(path)).toEqual({ message: `${path}: ${message}` })
  })

  it('that is a pipe nobody writes to is refused at once', async () => {
    const path = join(folder, 'pipe')
    execFileSync('mkfifo', [path])
    expect(await readFileText(path)).toEqual({
      message: `${path}: is not a plain file; "-" reads a job from standard input`,
    })
  })
})

describe('a stream', () => {
  it('gives its text though a character is cut between two chunks', async () => {
    const bytes = Buffer.from('"½"')
    const chunks = async function* () {
      yield await Promise.resolve(bytes.subarray(0, 2))
      yield bytes.subarray(2)
    }
    expect(await readStreamText(chunks())).toEqual({ text: '"½"' })
  })

  it('without end is left as soon as it is too large', async () => {
    const { stream, taken } = endless()
    expect(await readStreamText(stream)).toEqual({
      message: 'standard input: is larger than 10 MB; a job is a few kilobytes',
    })
    expect(taken.chunks).toBe(MOST_BYTES / 1_000_000 + 1)
  })

  it('that the system refuses gives the reason', async () => {
    const broken = async function* () {
      yield await Promise.reject<Uint8Array>(Object.assign(new Error('EISDIR'), { code: 'EISDIR' }))
    }
    expect(await readStreamText(broken())).toEqual({ message: 'standard input: cannot be read: it is a folder' })
  })

  it('broken by a fault of the program throws', async () => {
    const broken = async function* () {
      yield await Promise.reject<Uint8Array>(new TypeError('a fault'))
    }
    await expect(readStreamText(broken())).rejects.toThrow('a fault')
  })
})
