import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ran } from './doors.ts'

const SAMPLE = new URL('../../resources/jobs/ten-ton-pendant.json', import.meta.url)

describe('longtravel check --pdf', () => {
  let folder = ''
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'longtravel-pdf-'))
  })
  afterAll(() => rm(folder, { recursive: true }))

  it('prints the sheet beside the table, the same bytes each time', async () => {
    const [first, second] = [join(folder, 'a.pdf'), join(folder, 'b.pdf')]
    const { exit, out } = await ran(['check', SAMPLE.pathname, '--pdf', first])
    expect(exit).toBe(4)
    expect(out).toContain('Strong-axis bending')
    await ran(['check', SAMPLE.pathname, '--pdf', second])
    const [a, b] = [await readFile(first), await readFile(second)]
    expect(a.subarray(0, 5).toString()).toBe('%PDF-')
    expect(a.equals(b)).toBe(true)
  })

  it('names what cannot be drawn and leaves the former file as it was', async () => {
    const [job, target] = [join(folder, 'job.json'), join(folder, 'kept.pdf')]
    const text = await readFile(SAMPLE, 'utf8')
    await writeFile(job, text.replace('Brackenford', '起重机'))
    await writeFile(target, 'former')
    const { exit, err, out } = await ran(['check', job, '--pdf', target])
    expect(exit).toBe(2)
    expect(out).toBe('')
    expect(err).toContain('起')
    expect(await readFile(target, 'utf8')).toBe('former')
  })
})
