import Database from 'better-sqlite3'
import { describe, expect, test } from 'vitest'
import { openForWriting } from '../../app/store/open.ts'
import { errorOf, newFile, opened, valueOf } from './folder.ts'
import { newRevision } from './texts.ts'

/** A record with one job of two revisions, closed. */
const twoRevisions = async (): Promise<string> => {
  const file = newFile()
  const { calls, close } = await opened(file)
  const project = valueOf(calls.createProject('P', 'letters'))
  const job = valueOf(calls.createJob(project.id, 'J'))
  valueOf(calls.keepRevision(job.id, newRevision()))
  valueOf(calls.keepRevision(job.id, newRevision({ note: 'second' })))
  valueOf(close())
  return file
}

const COLUMNS = 'job, sequence, label, purpose, author, checker, date, note, text, result, program, fingerprint, hash'
const copyOf = (sequence: string, label: string) =>
  `SELECT job, ${sequence}, ${label}, purpose, author, checker, date, 'forged', text, result, program, fingerprint, hash FROM revisions WHERE sequence = 0`

describe('a kept revision is protected by the database itself, whatever program writes', () => {
  test.each([
    ["UPDATE revisions SET note = 'forged'", 'never changed'],
    ['UPDATE revisions SET hash = hash WHERE id = 1', 'never changed'],
    ["UPDATE OR REPLACE revisions SET sequence = 1, label = 'B' WHERE sequence = 0", 'never changed'],
    ['DELETE FROM revisions', 'never deleted'],
    ['DELETE FROM revisions WHERE id = 2', 'never deleted'],
    ['DELETE FROM jobs', 'FOREIGN KEY'],
    ['DELETE FROM projects', 'FOREIGN KEY'],
    ['UPDATE jobs SET id = 9', 'FOREIGN KEY'],
    [`REPLACE INTO revisions (id, ${COLUMNS}) SELECT 1, * FROM (${copyOf('sequence', 'label')})`, 'next of its job'],
    [`REPLACE INTO revisions (id, ${COLUMNS}) SELECT 1, * FROM (${copyOf('2', "'C'")})`, 'next of its job'],
    [`REPLACE INTO revisions (${COLUMNS}) ${copyOf('sequence', 'label')}`, 'next of its job'],
    [`REPLACE INTO revisions (${COLUMNS}) ${copyOf('2', 'label')}`, 'next of its job'],
    [`INSERT INTO revisions (${COLUMNS}) ${copyOf('5', "'F'")}`, 'next of its job'],
    [`INSERT INTO revisions (${COLUMNS}) ${copyOf('-1', "'F'")}`, 'next of its job'],
  ])('%s', async (sql, message) => {
    const database = new Database(await twoRevisions())
    // The least protected connection there is: no setting of ours.
    database.pragma('recursive_triggers = OFF')
    const before = database.prepare('SELECT * FROM revisions ORDER BY id').all()
    expect(() => database.exec(sql)).toThrow(message)
    expect(database.prepare('SELECT * FROM revisions ORDER BY id').all()).toEqual(before)
    expect(before).toHaveLength(2)
    database.close()
  })

  test('a result that is no JSON, a date that is none and an empty text are refused', async () => {
    const database = new Database(await twoRevisions())
    const insert = (column: string, value: string) => () =>
      database.exec(
        `INSERT INTO revisions (${COLUMNS}) SELECT ${COLUMNS.split(', ')
          .map((name) => (name === column ? value : name === 'sequence' ? '2' : name === 'label' ? "'C'" : name))
          .join(', ')} FROM revisions WHERE sequence = 0`,
      )
    expect(insert('result', "'{'")).toThrow('CHECK')
    expect(insert('date', "'31.3.2026'")).toThrow('CHECK')
    expect(insert('text', "''")).toThrow('CHECK')
    expect(insert('note', "x'00'")).toThrow('cannot store BLOB')
    expect(insert('note', "'fine'")).not.toThrow()
    database.close()
  })

  test('a revision changed behind the triggers is refused by its hash, and the others still open', async () => {
    const file = await twoRevisions()
    const database = new Database(file)
    const trigger = database
      .prepare<[], string>("SELECT sql FROM sqlite_schema WHERE name = 'revisions_never_change'")
      .pluck()
      .get()
    database.exec("DROP TRIGGER revisions_never_change; UPDATE revisions SET note = 'forged' WHERE id = 2")
    database.exec(trigger!)
    database.close()
    const { calls } = await opened(file)
    expect(valueOf(calls.revision(1)).label).toBe('A')
    expect(errorOf(calls.revision(2))).toMatchObject({
      kind: 'damaged',
      message: expect.stringContaining('revision B (2)') as string,
    })
    expect(errorOf(calls.verify()).kind).toBe('damaged')
  })

  test('a record without one of its triggers is refused', async () => {
    const file = await twoRevisions()
    const database = new Database(file)
    database.exec('DROP TRIGGER revisions_never_go')
    database.close()
    expect(errorOf(await openForWriting(file))).toMatchObject({
      kind: 'damaged',
      message: expect.stringContaining('tables') as string,
    })
  })
})
