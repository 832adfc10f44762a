import { describe, expect, test } from 'vitest'
import { fieldList, FIELDS } from '../../core/job/fields.ts'
import { defaultText, formOf, helpOf, type FormLine } from '../../renderer/datasheet/form.ts'
import { findingAt, isOwed, messageOf, unplaced } from '../../renderer/datasheet/messages.ts'
import { blankJob, Job } from '../../renderer/state/job.svelte.ts'
import { jobOf, review, sampleText } from './job-of.ts'

const linesOf = (job: Job): readonly FormLine[] => formOf(job).flatMap(({ lines }) => lines)
const lineAt = (job: Job, path: string): FormLine => linesOf(job).find((line) => line.path === path)!

describe('lines', () => {
  test('a field has one line, and every line is a field of the dictionary', () => {
    const paths = linesOf(jobOf('plateGirder')).map(({ path }) => path)
    expect(new Set(paths).size).toBe(paths.length)
    expect(paths.filter((path) => !(path.replace(/\[\d+\]/g, '[]') in FIELDS))).toEqual([])
  })

  test('what is not covered has no line', () => {
    const refused = fieldList.filter(([, { notCovered }]) => notCovered === 'all').map(([path]) => path)
    const patterns = linesOf(jobOf()).map(({ path }) => path.replace(/\[\d+\]/g, '[]'))
    expect(refused.length).toBeGreaterThan(20)
    expect(patterns.filter((path) => refused.includes(path))).toEqual([])
  })

  test('with all forms gone through every covered field that can be answered in more than one way has a line', () => {
    const shown = new Set<string>()
    const look = (job: Job) => {
      for (const { path } of linesOf(job)) shown.add(path.replace(/\[\d+\]/g, '[]'))
    }
    const job = jobOf()
    look(job)
    for (const part of ['runway.rail', 'girder.steel', 'girder.capSteel', 'girder.section.shape']) job.turn(part, 'own')
    look(job)
    job.turn('girder.section', 'plated')
    job.turn('girder.section.cap', 'plate')
    job.turn('girder.plateSteel', 'name')
    look(job)
    job.turn('girder.plateSteel', 'own')
    look(job)
    const missing = fieldList
      .filter(([, { entry, notCovered }]) => entry.is !== 'object' && notCovered === undefined)
      .map(([path]) => path)
      .filter((path) => !shown.has(path))
    const sets = ['vertical', 'impact', 'sideThrust', 'longitudinal'].map(
      (name) => `basis.cranesTogether[].{crane}.${name}`,
    )
    expect(missing.toSorted()).toEqual(
      // The file's own marks, the units in the head, the list of cranes itself, the form of the section; and sets of one's own,
      // which are read from a file and shown as such.
      ['format', 'version', 'units', 'cranes', 'girder.section.kind', ...sets].toSorted(),
    )
  })

  test('each crane has a group of its own', () => {
    expect(formOf(jobOf('plateGirder')).map(({ title }) => title)).toEqual([
      'Crane 1',
      'Crane 2',
      'Runway',
      'Girder',
      'Rules',
      'Project',
    ])
  })

  test('lines follow the form of the section', () => {
    const job = jobOf()
    const has = (path: string) => linesOf(job).some((line) => line.path === path)
    expect(has('girder.section.shape')).toBe(true)
    expect(has('girder.section.web.depth')).toBe(false)
    expect(has('girder.capSteel')).toBe(true)
    job.turn('girder.section', 'plated')
    job.turn('girder.section.cap', 'none')
    expect(has('girder.section.shape')).toBe(false)
    expect(has('girder.section.web.depth')).toBe(true)
    expect(has('girder.capSteel')).toBe(false)
  })

  test('a refused choice is not offered', () => {
    const words = lineAt(jobOf(), 'basis.cranesTogether').choices.map(([value]) => value)
    expect(words).toEqual(['building', 'half-both'])
  })
})

describe('words', () => {
  test('defaults are told in the words of the dictionary, nothing in the units shown', () => {
    const job = jobOf()
    expect(defaultText(lineAt(job, 'cranes[0].belowHook'), 'us')).toBe('0 kip')
    expect(defaultText(lineAt(job, 'cranes[0].belowHook'), 'si')).toBe('0 kN')
    expect(defaultText(lineAt(job, 'basis.sideThrustShare'), 'us')).toBe('0.5')
    expect(defaultText(lineAt(job, 'runway.unbracedLength'), 'us')).toBe('the span')
    expect(defaultText(lineAt(job, 'cranes[0].name'), 'us')).toBe('Crane 1')
  })

  test('help says meaning, limits, the unit of a bare number and the source of the default', () => {
    const help = helpOf(lineAt(jobOf(), 'cranes[0].hookApproach'), 'us').join(' ')
    expect(help).toContain('Least distance from the hook to this rail.')
    expect(help).toContain('from 0 m to 100 m')
    expect(help).toContain('A bare number is read in ft.')
    expect(help).toContain('on the safe side')
  })
})

describe('messages', () => {
  test('stand at their line, without its name', () => {
    const job = jobOf()
    job.enter('cranes[0].ratedCapacity', '50 ft')
    review(job)
    const line = lineAt(job, 'cranes[0].ratedCapacity')
    const finding = findingAt(job.findings, line)
    expect(finding && messageOf(finding, line)).toMatch(/^“50 ft” is a length/)
    expect(unplaced(job.findings, formOf(job))).toEqual([])
  })

  test('of an item stand at its list', () => {
    const job = jobOf()
    job.enter('runway.spans', '30 ft, 30 kip')
    review(job)
    expect(findingAt(job.findings, lineAt(job, 'runway.spans'))?.path).toBe('runway.spans[1]')
  })

  test('of a new job all stand at lines that are still to be filled in', () => {
    const job = new Job(blankJob('us'))
    review(job)
    const owed = linesOf(job).filter((line) => {
      const finding = findingAt(job.findings, line)
      return finding !== undefined && isOwed(finding)
    })
    expect(owed.map(({ path }) => path)).toEqual([
      'cranes[0].ratedCapacity',
      'cranes[0].bridgeWeight',
      'cranes[0].trolleyWeight',
      'cranes[0].bridgeSpan',
      'cranes[0].operation',
      'cranes[0].serviceClass',
      'cranes[0].wheelSpacings',
      'runway.spans',
      'runway.rail.name',
      'girder.section.shape',
      'girder.steel.name',
      'project.title',
    ])
    expect(unplaced(job.findings, formOf(job))).toEqual([])
  })

  test('of a missing part stand at each of its lines', () => {
    const job = jobOf()
    job.turn('girder.section', 'plated')
    review(job)
    expect(findingAt(job.findings, lineAt(job, 'girder.section.web.depth'))).toMatchObject({ read: 'nothing' })
    expect(unplaced(job.findings, formOf(job))).toEqual([])
  })

  test.each([
    ['runway.rail', 'own', ['height', 'headWidth', 'footWidth', 'mass']],
    ['girder.steel', 'own', ['fy', 'fu']],
    ['girder.capSteel', 'own', ['fy', 'fu']],
    ['girder.section.cap', 'plate', ['plate.width', 'plate.thickness']],
  ])('of %s in another form stand at what that form needs', (part, word, needed) => {
    const job = jobOf()
    job.turn(part, word)
    review(job)
    const owed = linesOf(job).filter(({ path }) => path.startsWith(`${part}.`))
    const marked = owed.filter((line) => {
      const finding = findingAt(job.findings, line)
      return finding !== undefined && isOwed(finding) && line.control !== 'beside'
    })
    expect(marked.map(({ path }) => path)).toEqual(needed.map((name) => `${part}.${name}`))
    expect(unplaced(job.findings, formOf(job))).toEqual([])
  })

  test('of fields without a line are told apart', () => {
    const job = jobOf()
    job.open(sampleText('cab').replace('"units"', '"colour":"red","units"'))
    review(job)
    expect(unplaced(job.findings, formOf(job)).map(({ path }) => path)).toEqual(['colour'])
    job.enter('colour', '')
    review(job)
    expect(unplaced(job.findings, formOf(job))).toEqual([])
  })
})
