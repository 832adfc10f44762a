import Database from 'better-sqlite3'
import { chmodSync, cpSync, mkdirSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { openForReading, openForWriting, RECORD_FILE } from '../../app/store/open.ts'
import { refusalOf } from '../../app/store/refusal.ts'
import { another } from './another.ts'
import { bytesIn, errorOf, newFile, newFolder, opened, valueOf } from './folder.ts'
import { newRevision } from './texts.ts'

/** A user without rights of their own; where the tests do not run as root, their own user has no right either. */
const NOBODY = process.getuid?.() === 0 ? { user: 65534 } : {}

const tryThere = (how: string, file: string) =>
  `import { ${how} } from './app/store/open.ts'
   const outcome = await ${how}(${JSON.stringify(file)})
   console.log(JSON.stringify(outcome.ok ? { kind: 'opened', message: '' } : outcome.error))`

describe.skipIf(process.platform === 'win32')('rights', () => {
  test('a folder or file that may not be written is refused, and nothing in it changes', async () => {
    const file = newFile()
    valueOf((await opened(file)).close())
    const folder = dirname(file)
    const before = bytesIn(folder)
    for (const [folderMode, fileMode] of [
      [0o555, 0o444],
      [0o555, 0o666],
      [0o777, 0o444],
      [0o777, 0o000],
    ] as const) {
      chmodSync(file, fileMode)
      chmodSync(folder, folderMode)
      const { said } = await another(tryThere('openForWriting', file), NOBODY)
      expect(JSON.parse(said)).toEqual({
        kind: 'no-right',
        message: expect.stringMatching(new RegExp(`^${file}.*LONGTRAVEL_HOME`)) as string,
      })
    }
    chmodSync(folder, 0o700)
    chmodSync(file, 0o600)
    expect(bytesIn(folder)).toEqual(before)
  })

  test('a record that may not be read is refused to a reader', async () => {
    const file = newFile()
    valueOf((await opened(file)).close())
    chmodSync(dirname(file), 0o777)
    chmodSync(file, 0o000)
    const { said } = await another(tryThere('openForReading', file), NOBODY)
    expect(JSON.parse(said)).toMatchObject({ kind: 'no-right' })
  })

  test('a folder that cannot be made is refused', async () => {
    const folder = newFolder()
    mkdirSync(join(folder, 'closed'))
    chmodSync(folder, 0o755)
    chmodSync(join(folder, 'closed'), 0o555)
    const { said } = await another(tryThere('openForWriting', join(folder, 'closed', 'in', RECORD_FILE)), NOBODY)
    expect(JSON.parse(said)).toMatchObject({ kind: 'no-right' })
  })
})

describe.skipIf(process.platform === 'win32')('no room', () => {
  test('what cannot be written is refused, what was kept before stays, and the record opens again', async () => {
    const file = newFile()
    // A limit on the size of any one file stands in for a full disk: 800 blocks of 512 bytes.
    const { said, kill } = await another(
      `import { openForWriting } from './app/store/open.ts'
       import { newRevision } from './test/store/texts.ts'
       const { calls } = (await openForWriting(${JSON.stringify(file)})).value
       const job = calls.createJob(calls.createProject('P', 'letters').value.id, 'J').value.id
       let kept = 0
       let outcome = calls.keepRevision(job, newRevision())
       for (; outcome.ok && kept < 1000; kept++) outcome = calls.keepRevision(job, newRevision({ note: 'n'.repeat(9000) }))
       console.log(JSON.stringify({ kept, outcome, listed: calls.revisions(job).value.length }))`,
      { limits: 'ulimit -f 800' },
    )
    await kill()
    const { kept, outcome, listed } = JSON.parse(said) as {
      kept: number
      outcome: Parameters<typeof errorOf>[0]
      listed: number
    }
    expect(['no-room', 'disk']).toContain(errorOf(outcome).kind)
    expect(errorOf(outcome).message).toContain(file)
    expect(kept).toBeGreaterThan(3)
    expect(listed).toBe(kept)
    const { calls } = await opened(file)
    expect(valueOf(calls.verify())).toEqual({ revisions: kept })
    expect(valueOf(calls.keepRevision(1, newRevision())).sequence).toBe(kept)
  })

  test('a back-up that does not fit leaves the older record as it was', async () => {
    const file = newFile()
    const { calls, close } = await opened(file)
    const job = valueOf(calls.createJob(valueOf(calls.createProject('P', 'letters')).id, 'J'))
    for (let each = 0; each < 60; each++) valueOf(calls.keepRevision(job.id, newRevision()))
    valueOf(close())
    const copy = newFile()
    cpSync(file, copy)
    const { said, kill } = await another(
      `import { openForWriting } from './app/store/open.ts'
       import { MIGRATIONS } from './app/store/migrations/chain.ts'
       const next = { version: 2, run: (database) => database.exec('CREATE TABLE drafts (id INTEGER PRIMARY KEY) STRICT') }
       console.log(JSON.stringify(await openForWriting(${JSON.stringify(file)}, [...MIGRATIONS, next])))`,
      { limits: 'ulimit -f 400' },
    )
    await kill()
    expect(['no-room', 'disk']).toContain(errorOf(JSON.parse(said) as Parameters<typeof errorOf>[0]).kind)
    expect([...bytesIn(dirname(file))].filter(([, bytes]) => bytes !== '')).toEqual([...bytesIn(dirname(copy))])
    expect(valueOf((await opened(file)).calls.verify())).toEqual({ revisions: 60 })
  })
})

describe('what SQLite and the system say', () => {
  test.each([
    ['SQLITE_FULL', 'no-room'],
    ['SQLITE_IOERR_FSYNC', 'disk'],
    ['SQLITE_CORRUPT_INDEX', 'damaged'],
    ['SQLITE_NOTADB', 'damaged'],
    ['SQLITE_BUSY_SNAPSHOT', 'locked'],
    ['SQLITE_READONLY_DIRECTORY', 'no-right'],
    ['SQLITE_CANTOPEN', 'no-right'],
  ])('%s is %s', (code, kind) => {
    expect(refusalOf(new Database.SqliteError('as SQLite says it', code), '/r')).toMatchObject({
      kind,
      message: expect.stringMatching(/^\/r: .*\(as SQLite says it\)$/) as string,
    })
  })

  test.each([
    ['ENOSPC', 'no-room'],
    ['EROFS', 'no-right'],
    ['ENOTDIR', 'place'],
    ['EIO', 'disk'],
  ])('%s is %s', (code, kind) => {
    expect(refusalOf(Object.assign(new Error('as the system says it'), { code }), '/r').kind).toBe(kind)
  })

  test('what only a programmer can cause is thrown on', () => {
    const faults = [new Database.SqliteError('no such table', 'SQLITE_ERROR'), new TypeError('not a function'), 'text']
    for (const fault of faults) expect(() => refusalOf(fault, '/r')).toThrow()
    expect(() => refusalOf(new Database.SqliteError('CHECK', 'SQLITE_CONSTRAINT_CHECK'), '/r')).toThrow('CHECK')
  })

  test('nothing is opened where nothing is', async () => {
    const file = newFile()
    expect(errorOf(await openForReading(file)).kind).toBe('not-found')
    expect(bytesIn(dirname(file)).size).toBe(0)
    valueOf(valueOf(await openForWriting(file)).close())
  })
})
