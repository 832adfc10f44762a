import Database from 'better-sqlite3'
import {
  cpSync,
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  symlinkSync,
  truncateSync,
  writeFileSync,
} from 'node:fs'
import { dirname, join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { APPLICATION_ID } from '../../app/store/handle.ts'
import { schemaOf, schemaOfChain } from '../../app/store/integrity.ts'
import { migrate, newest } from '../../app/store/migrate.ts'
import { MIGRATIONS, type Migration } from '../../app/store/migrations/chain.ts'
import { openForReading, openForWriting, RECORD_FILE } from '../../app/store/open.ts'
import { another } from './another.ts'
import { bytesIn, errorOf, newFile, newFolder, opened, valueOf } from './folder.ts'
import { newRevision } from './texts.ts'

const FIXTURE = new URL('../fixtures/store/version-1.sqlite', import.meta.url).pathname

/** A step that no release knows, to see a record brought up. */
const later: Migration = {
  version: 2,
  run: (database) => database.exec('CREATE TABLE drafts (id INTEGER PRIMARY KEY, text TEXT NOT NULL) STRICT'),
}
const LATER = [...MIGRATIONS, later]

/** A closed record with revisions of about 600 kB in it. */
const filled = async (): Promise<string> => {
  const file = newFile()
  const { calls, close } = await opened(file)
  const job = valueOf(calls.createJob(valueOf(calls.createProject('P', 'letters')).id, 'J'))
  for (let each = 0; each < 20; each++) valueOf(calls.keepRevision(job.id, newRevision({ note: 'n'.repeat(10_000) })))
  valueOf(close())
  return file
}

/** Refused both ways, by the kind and the file's name, and everything in the folder is as it was. */
const refusedBothWays = async (file: string, kind: string): Promise<void> => {
  const before = bytesIn(dirname(file))
  for (const outcome of [await openForWriting(file), await openForReading(file)]) {
    const error = errorOf(outcome)
    expect(error.kind).toBe(kind)
    expect(error.message.startsWith(`${file}: `), error.message).toBe(true)
    expect(error.message.split(/[;.]/).length, error.message).toBeGreaterThan(1)
  }
  // Opening to read may set up an empty log beside the file, and nothing else.
  const after = [...bytesIn(dirname(file))].filter(([name, bytes]) => before.has(name) || bytes !== '')
  expect(new Map(after)).toEqual(before)
}

describe('settings, read back from the connection', () => {
  // SQLite's documentation of PRAGMA: synchronous 2 is FULL.
  const always = {
    journal_mode: 'wal',
    synchronous: 2,
    foreign_keys: 1,
    trusted_schema: 0,
    cell_size_check: 1,
    recursive_triggers: 1,
    busy_timeout: 5000,
    application_id: 0x4c747667,
    user_version: 1,
  }

  test('hold on the first opening, on the next, for a reader, and on a record brought up', async () => {
    const file = newFile()
    const first = await opened(file)
    expect(first.settings).toMatchObject({ ...always, query_only: 0 })
    const reader = valueOf(await openForReading(file))
    expect(reader.settings).toMatchObject({ ...always, query_only: 1 })
    valueOf(reader.close())
    valueOf(first.close())
    const second = await opened(file)
    expect(second.settings).toEqual(first.settings)
    valueOf(second.close())
    const raised = await opened(file, LATER)
    expect(raised.settings).toEqual({ ...first.settings, user_version: 2 })
  })

  test('hold where someone has set the file otherwise', async () => {
    const file = await filled()
    const database = new Database(file)
    database.pragma('journal_mode = DELETE')
    database.close()
    const { settings } = await opened(file)
    expect(settings).toMatchObject(always)
  })
})

describe('migrations', () => {
  test('count 1, 2, 3 and make the schema that a new record really has', async () => {
    expect(newest(MIGRATIONS)).toBe(MIGRATIONS.length)
    expect(() => newest([later])).toThrow('count')
    const file = newFile()
    valueOf((await opened(file)).close())
    const made = new Database(file, { readonly: true })
    expect(schemaOf(made)).toEqual(schemaOfChain(MIGRATIONS))
    expect(schemaOf(made).length).toBeGreaterThan(7)
    made.close()
  })

  test('the record kept by version 1 has the schema of step 1 and opens with all it holds', async () => {
    const file = newFile()
    cpSync(FIXTURE, file)
    const raw = new Database(file, { readonly: true })
    expect(schemaOf(raw)).toEqual(schemaOfChain(MIGRATIONS.slice(0, 1)))
    raw.close()
    const { calls } = await opened(file)
    expect(valueOf(calls.verify())).toEqual({ revisions: 3 })
    const [project] = valueOf(calls.projects())
    expect(project).toEqual({ id: 1, name: 'Γραμμή 3/4 · Цех', numbering: 'letters' })
    const [job] = valueOf(calls.jobs(1))
    expect(valueOf(calls.revisions(job!.id)).map(({ label }) => label)).toEqual(['A', 'B', 'C'])
    expect(valueOf(calls.revision(3))).toMatchObject({
      note: 'third\nline 🏗️',
      program: '0.1.0',
      result: { format: 'longtravel-result' },
    })
    expect(valueOf(calls.setting('window.units'))).toBe('si')
  })

  test('an older record is brought up after a back-up beside it that holds the former one whole', async () => {
    const file = await filled()
    const { calls, close } = await opened(file, LATER)
    expect(valueOf(calls.verify())).toEqual({ revisions: 20 })
    valueOf(close())
    const copy = `${file}.before-version-2`
    expect(readdirSync(dirname(file)).sort()).toEqual(
      [RECORD_FILE, `${RECORD_FILE}.before-version-2`, `${RECORD_FILE}-writer`].sort(),
    )
    const before = await opened(copy)
    expect(before.settings['user_version']).toBe(1)
    expect(valueOf(before.calls.verify())).toEqual({ revisions: 20 })
  })

  test('a step that fails leaves the record at the step before, with its back-up', async () => {
    const file = await filled()
    const failing: Migration = {
      version: 2,
      run: (database) => {
        database.exec(
          'CREATE TABLE half (id INTEGER PRIMARY KEY) STRICT; DROP TRIGGER revisions_never_go; DELETE FROM revisions',
        )
        throw new Error('step 2 breaks')
      },
    }
    await expect(openForWriting(file, [...MIGRATIONS, failing])).rejects.toThrow('step 2 breaks')
    const { calls } = await opened(file)
    expect(valueOf(calls.verify())).toEqual({ revisions: 20 })
    expect(existsSync(`${file}.before-version-2`)).toBe(true)
  })

  test('a reader does not bring an older record up', async () => {
    const file = await filled()
    const before = bytesIn(dirname(file))
    expect(errorOf(await openForReading(file, LATER))).toMatchObject({
      kind: 'in-use',
      message: expect.stringContaining('older version 1') as string,
    })
    expect(bytesIn(dirname(file)).get(RECORD_FILE)).toBe(before.get(RECORD_FILE))
  })

  test('a chain gives the same schema in one go and step by step', () => {
    const stepwise = new Database(':memory:')
    for (let steps = 1; steps <= LATER.length; steps++) migrate(stepwise, LATER.slice(0, steps))
    expect(schemaOf(stepwise)).toEqual(schemaOfChain(LATER))
    expect(stepwise.pragma('user_version', { simple: true })).toBe(2)
    stepwise.close()
  })
})

describe('left as it is and refused by name', () => {
  test('a record of a newer program, even with a log that was never brought in', async () => {
    const file = newFile()
    valueOf((await opened(file)).close())
    const newer = new Database(file)
    newer.pragma('user_version = 2')
    newer.exec('CREATE TABLE news (id INTEGER PRIMARY KEY) STRICT')
    const copy = newFile()
    cpSync(file, copy)
    cpSync(`${file}-wal`, `${copy}-wal`)
    newer.close()
    expect(statSync(`${copy}-wal`).size).toBeGreaterThan(0)
    await refusedBothWays(copy, 'newer')
    await refusedBothWays(file, 'newer')
    expect(errorOf(await openForWriting(file)).message).toContain('version 2, this one keeps 1')
  })

  test("another program's database, in either journal mode", async () => {
    for (const mode of ['DELETE', 'WAL']) {
      const file = newFile()
      const foreign = new Database(file)
      foreign.pragma(`journal_mode = ${mode}`)
      foreign.exec('CREATE TABLE accounts (id INTEGER); PRAGMA application_id = 252006')
      foreign.close()
      await refusedBothWays(file, 'foreign')
    }
  })

  test('a file of junk, of no bytes, of text', async () => {
    for (const bytes of [Buffer.alloc(100_000, 0xa5), Buffer.alloc(0), Buffer.from('a letter'), Buffer.alloc(8192)]) {
      const file = newFile()
      writeFileSync(file, bytes)
      await refusedBothWays(file, 'damaged')
    }
  })

  test('a record cut off', async () => {
    const whole = await filled()
    const size = statSync(whole).size
    for (const length of [100, 4096, 4096 * 3, Math.floor(size / 2), size - 4096]) {
      const file = newFile()
      cpSync(whole, file)
      truncateSync(file, length)
      await refusedBothWays(file, 'damaged')
    }
  })

  test('a record with junk over its beginning, its tables, its end', async () => {
    const whole = readFileSync(await filled())
    for (const page of [0, 1, 2, 3, Math.floor(whole.length / 4096 / 2)]) {
      const file = newFile()
      const bytes = Buffer.from(whole)
      bytes.fill(0x5a, page * 4096, page * 4096 + 4096)
      writeFileSync(file, bytes)
      const outcome = await openForWriting(file)
      // Text in an overflow page may take any bytes: there the revision's own hash tells.
      if (outcome.ok) {
        expect(errorOf(outcome.value.calls.verify()).kind).toBe('damaged')
        valueOf(outcome.value.close())
      } else await refusedBothWays(file, 'damaged')
    }
  })

  test('a log whose file is missing: a new file would take it for its own', async () => {
    const file = newFile()
    writeFileSync(`${file}-wal`, 'left over')
    await refusedBothWays(file, 'damaged')
    expect(existsSync(file)).toBe(false)
  })

  test('a folder, a device, a path through a file', async () => {
    const folder = newFolder()
    mkdirSync(join(folder, RECORD_FILE))
    expect(errorOf(await openForWriting(join(folder, RECORD_FILE)))).toMatchObject({
      kind: 'place',
      message: expect.stringContaining('is a folder') as string,
    })
    expect(errorOf(await openForReading('/dev/null')).kind).toBe('place')
    writeFileSync(join(folder, 'letter'), '')
    expect(errorOf(await openForWriting(join(folder, 'letter', RECORD_FILE))).kind).toBe('place')
    expect(errorOf(await openForReading(join(folder, 'none', RECORD_FILE))).kind).toBe('not-found')
    expect(readdirSync(folder).sort()).toEqual(['letter', RECORD_FILE].sort())
  })
})

describe('junk written over the file while it is open', () => {
  test('is told as damage or does no harm, and the file is refused when it is opened next', async () => {
    const file = await filled()
    const store = await opened(file)
    valueOf(store.calls.keepRevision(1, newRevision({ note: 'before' })))
    const size = statSync(file).size
    writeFileSync(file, Buffer.alloc(size, 0xa5))
    for (const work of [
      () => store.calls.revisions(1),
      () => store.calls.revision(1),
      () => store.calls.verify(),
      () => store.calls.keepRevision(1, newRevision()),
    ]) {
      const outcome = work()
      if (!outcome.ok) expect(outcome.error.kind).toBe('damaged')
    }
    expect(errorOf(store.calls.verify()).kind).toBe('damaged')
    store.close()
    expect(statSync(file).size).toBeGreaterThanOrEqual(size)
    await refusedBothWays(file, 'damaged')
  })
})

describe('one writer among all processes', () => {
  const openThere = (how: string, file: string) =>
    `import { ${how} } from './app/store/open.ts'
     const outcome = await ${how}(${JSON.stringify(file)}).then((opened) => opened.ok ? { ok: true, value: { calls: opened.value.calls } } : opened)
     globalThis.gc()
     await new Promise((done) => setTimeout(done, 20))
     console.log(outcome.ok ? JSON.stringify(outcome.value.calls.projects()) : outcome.error.kind)`

  test('a second process is told so and may read, also what is written after', async () => {
    const file = newFile()
    const { calls } = await opened(file)
    const project = valueOf(calls.createProject('P', 'letters'))
    const writer = await another(openThere('openForWriting', file))
    expect(writer.said).toBe('in-use')
    const reader = await another(openThere('openForReading', file))
    expect(JSON.parse(reader.said)).toEqual({ ok: true, value: [project] })
    valueOf(calls.createProject('Q', 'letters'))
    // Neither does a reader that dies take anything with it.
    await reader.kill()
    expect(valueOf(calls.projects())).toHaveLength(2)
  })

  test('the lock dies with its process', async () => {
    const file = newFile()
    const writer = await another(openThere('openForWriting', file))
    expect(JSON.parse(writer.said)).toEqual({ ok: true, value: [] })
    const error = errorOf(await openForWriting(file))
    expect(error.kind).toBe('in-use')
    expect(error.message).toContain('can be read')
    const reader = valueOf(await openForReading(file))
    expect(valueOf(reader.calls.projects())).toEqual([])
    valueOf(reader.close())
    await writer.kill()
    await opened(file)
  })

  test('also in one process, and by another path to the same file', async () => {
    const file = newFile()
    await opened(file)
    const link = join(newFolder(), 'link.sqlite')
    symlinkSync(file, link)
    expect(errorOf(await openForWriting(file)).kind).toBe('in-use')
    expect(errorOf(await openForWriting(link)).kind).toBe('in-use')
  })

  test('a file that another program has locked as a whole is told so', async () => {
    const file = await filled()
    const before = bytesIn(dirname(file)).get(RECORD_FILE)
    const locker = await another(
      `import Database from 'better-sqlite3'
       const database = new Database(${JSON.stringify(file)})
       database.pragma('locking_mode = EXCLUSIVE')
       database.exec('BEGIN EXCLUSIVE')
       globalThis.kept = database
       console.log('locked')`,
    )
    expect(locker.said).toBe('locked')
    expect(errorOf(await openForWriting(file)).kind).toBe('locked')
    expect(errorOf(await openForReading(file)).kind).toBe('locked')
    await locker.kill()
    expect(bytesIn(dirname(file)).get(RECORD_FILE)).toBe(before)
    expect(valueOf((await opened(file)).calls.verify())).toEqual({ revisions: 20 })
  })
})

test('a new record is made whole or not at all: what a killed maker left is put away', async () => {
  const file = newFile()
  writeFileSync(`${file}.new`, 'half')
  writeFileSync(`${file}.new-journal`, 'half')
  const { calls } = await opened(file)
  expect(valueOf(calls.projects())).toEqual([])
  expect(readdirSync(dirname(file)).filter((name) => name.includes('.new'))).toEqual([])
  expect(APPLICATION_ID).toBe(0x4c747667)
})

test('a record in a folder of many signs', async () => {
  const folder = join(newFolder(), 'Цех № 7 — Ω 🏗️ %20?x=1#y')
  const { calls, close } = await opened(join(folder, RECORD_FILE))
  valueOf(calls.createProject('P', 'letters'))
  valueOf(close())
  renameSync(folder, `${folder}2`)
  expect(valueOf((await opened(join(`${folder}2`, RECORD_FILE))).calls.projects())).toHaveLength(1)
  rmSync(`${folder}2`, { recursive: true })
})
