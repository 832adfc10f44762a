import { describe, expect, test } from 'vitest'
import { blankJob, Job } from '../../renderer/state/job.svelte.ts'
import { jobOf, review, sampleText, stored, wrongPaths } from './job-of.ts'

describe('entering', () => {
  test('an entry is kept as it was typed', () => {
    const job = jobOf()
    job.enter('cranes[0].bridgeSpan', '78\' 6 1/2"')
    expect(job.entry('cranes[0].bridgeSpan')).toBe('78\' 6 1/2"')
    expect(stored(job).cranes[0]?.['bridgeSpan']).toBe('78\' 6 1/2"')
    expect(review(job).ok).toBe(true)
  })

  test('arithmetic is kept as it was typed, and read', () => {
    const job = jobOf()
    job.enter('cranes[0].bridgeSpan', '3*7.5 m')
    expect(job.entry('cranes[0].bridgeSpan')).toBe('3*7.5 m')
    const reviewed = review(job)
    expect(reviewed.ok && reviewed.review.job.cranes[0]?.bridgeSpan).toBe(22.5)
  })

  test('an entry that is taken out gives way to its default', () => {
    const job = jobOf()
    expect(job.entry('cranes[0].belowHook')).toBe('2.2 kip')
    job.enter('cranes[0].belowHook', '  ')
    expect(job.entry('cranes[0].belowHook')).toBeUndefined()
    const reviewed = review(job)
    expect(reviewed.ok && reviewed.review.job.cranes[0]?.belowHook).toBe(0)
    expect(reviewed.ok && reviewed.review.job.defaults.map(({ path }) => path)).toContain('cranes[0].belowHook')
  })

  test('a share is stored as a number and shown as it was typed', () => {
    const job = jobOf()
    job.enter('basis.sideThrustShare', '60 %')
    expect(stored(job).basis['sideThrustShare']).toBe(0.6)
    expect(job.entry('basis.sideThrustShare')).toBe('60 %')
  })

  test('yes and no are stored as true and false', () => {
    const job = jobOf()
    job.enter('runway.eitherWay', 'false')
    expect(stored(job).runway['eitherWay']).toBe(false)
    expect(job.entry('runway.eitherWay')).toBe('false')
    expect(review(job).ok).toBe(true)
  })

  test('an entry keeps its place in the file', () => {
    const job = jobOf()
    const before = job.text.indexOf('"bridgeSpan"')
    job.enter('cranes[0].bridgeSpan', '80 ft')
    expect(job.text.indexOf('"bridgeSpan"')).toBe(before)
  })

  test('a field that the dictionary lacks is a fault of the program', () => {
    expect(() => {
      jobOf().enter('cranes[0].colour', 'red')
    }).toThrow('cranes[0].colour')
  })
})

describe('bare numbers take the unit shown, and the unit is written', () => {
  test.each([
    ['us', 'cranes[0].bridgeSpan', '78', '78 ft'],
    ['si', 'cranes[0].bridgeSpan', '24', '24 m'],
    ['us', 'cranes[0].ratedCapacity', '100', '100 kip'],
    ['si', 'cranes[0].ratedCapacity', '440', '440 kN'],
    ['us', 'runway.bearingLength', '12 1/2', '12 1/2 in'],
    ['us', 'cranes[0].ratedCapacity', '1,250', '1,250 kip'],
    ['us', 'cranes[0].bridgeSpan', '3*26', '3*26 ft'],
    ['us', 'cranes[0].bridgeSpan', '70+8', '(70+8) ft'],
    // A difference of two numbers is 5 1/8; with the unit set right behind it would be read as 6 7/8.
    ['us', 'runway.bearingLength', '6-7/8', '(6-7/8) in'],
  ] as const)('%s: %s %s', (units, path, typed, kept) => {
    const job = jobOf()
    job.setUnits(units)
    job.enter(path, typed)
    expect(job.entry(path)).toBe(kept)
    expect(wrongPaths(job)).toEqual([])
  })

  test('a written unit wins over the unit shown', () => {
    const job = jobOf()
    job.setUnits('si')
    job.enter('cranes[0].bridgeSpan', '80 ft')
    expect(job.entry('cranes[0].bridgeSpan')).toBe('80 ft')
  })
})

describe('lists', () => {
  test.each([
    ['4 × 30 ft', ['30 ft', '30 ft', '30 ft', '30 ft']],
    ['2 x 9 m; 30 ft', ['9 m', '9 m', '30 ft']],
    ['30, 25 1/2', ['30 ft', '25 1/2 ft']],
    ['30 ft,25 ft', ['30 ft', '25 ft']],
    ['7,5 m', ['7,5 m']],
  ])('%s', (typed, spans) => {
    const job = jobOf()
    job.enter('runway.spans', typed)
    expect(stored(job).runway['spans']).toEqual(spans)
    expect(wrongPaths(job)).toEqual([])
  })

  test('what took no unit is shown as it was typed, what took one with its unit', () => {
    const job = jobOf()
    job.enter('runway.spans', '30 ft, 30 ft')
    expect(job.entry('runway.spans')).toBe('30 ft, 30 ft')
    job.enter('runway.spans', '3 × 30')
    expect(job.entry('runway.spans')).toBe('3 × 30 ft')
  })

  test('a single wheel has no spacings', () => {
    const job = jobOf()
    job.enter('cranes[0].wheelSpacings', 'none')
    expect(stored(job).cranes[0]?.['wheelSpacings']).toEqual([])
    expect(job.entry('cranes[0].wheelSpacings')).toBe('none')
    expect(wrongPaths(job)).toEqual([])
  })

  test('one of several forms: a word, one value, a list', () => {
    const job = jobOf()
    const loads = () => stored(job).cranes[0]?.['wheelLoad']
    job.enter('cranes[0].wheelLoad', 'derive')
    expect(loads()).toBe('derive')
    job.enter('cranes[0].wheelLoad', '42')
    expect(loads()).toBe('42 kip')
    job.enter('cranes[0].wheelLoad', '2 × 42, 41, 43 kip')
    expect(loads()).toEqual(['42 kip', '42 kip', '41 kip', '43 kip'])
    job.enter('basis.impact', 'standard')
    expect(stored(job).basis['impact']).toBe('standard')
    job.enter('basis.impact', '25 %')
    expect(stored(job).basis['impact']).toBe(0.25)
  })

  test('items beyond any limit are refused by the review, not dropped', () => {
    const job = jobOf()
    job.enter('runway.spans', '999 × 1 ft, 999 × 1 ft')
    expect(wrongPaths(job)).toEqual(['runway.spans'])
    expect(job.entry('runway.spans')).toBe('999 × 1 ft, 999 × 1 ft')
  })
})

describe('wrong entries', () => {
  test.each([
    ['cranes[0].ratedCapacity', '50 ft'],
    ['cranes[0].ratedCapacity', '🙂'],
    ['cranes[0].ratedCapacity', 'עשר'],
    ['cranes[0].operation', 'rope'],
    ['runway.checkSpan', 'first'],
    ['runway.rail.name', 'no such rail'],
    ['girder.section.shape', 'W99X9999'],
    ['basis.sideThrustShare', '1.5'],
  ])('%s: %s is kept and named by its path', (path, typed) => {
    const job = jobOf()
    job.enter(path, typed)
    expect(job.entry(path)).toBe(typed)
    expect(wrongPaths(job)).toEqual([path])
    expect(job.findings.get(path)?.message).not.toBe('')
  })

  test('a page of text that was pasted into a number is refused for its length', () => {
    const job = jobOf()
    job.enter('cranes[0].ratedCapacity', 'a page of text\n'.repeat(1000))
    expect(wrongPaths(job)).toEqual(['cranes[0].ratedCapacity'])
    expect(job.findings.get('cranes[0].ratedCapacity')?.message).toContain('longer than')
  })

  test('an item of a list is named with its index', () => {
    const job = jobOf()
    job.enter('runway.spans', '30 ft, 30 kip')
    expect(wrongPaths(job)).toEqual(['runway.spans[1]'])
  })
})

describe('units', () => {
  test('switching changes what is shown and no entry', () => {
    const job = jobOf()
    job.enter('cranes[0].bridgeSpan', '78')
    const { cranes, runway, girder } = stored(job)
    job.setUnits('si')
    expect(job.units).toBe('si')
    expect(stored(job)).toMatchObject({ units: 'si', cranes, runway, girder })
    job.setUnits('us')
    expect(stored(job)).toMatchObject({ units: 'us', cranes, runway, girder })
  })

  test('the result is the same in both', () => {
    const job = jobOf()
    const us = review(job)
    job.setUnits('si')
    const si = review(job)
    const figures = (reviewed: typeof us) => reviewed.ok && reviewed.review.checks.map(({ utilisation }) => utilisation)
    expect(figures(si)).toEqual(figures(us))
  })
})

describe('cranes', () => {
  test('one more has the entries of the last, and a name of its own', () => {
    const job = jobOf()
    job.addCrane()
    expect(job.cranes).toBe(2)
    const [first, second] = stored(job).cranes
    expect({ ...second, name: first?.['name'] }).toEqual(first)
    expect(job.entry('cranes[1].name')).toBeUndefined()
    expect(wrongPaths(job)).toEqual([])
  })

  test('an entry of one leaves the others alone', () => {
    const job = jobOf()
    job.addCrane()
    job.enter('cranes[1].ratedCapacity', '20 t')
    expect(job.entry('cranes[0].ratedCapacity')).toBe('50 ton')
    expect(job.entry('cranes[1].ratedCapacity')).toBe('20 t')
  })

  test('one that is taken out takes what was typed along', () => {
    const job = jobOf('plateGirder')
    job.enter('cranes[0].wheelSpacings', '2 × 4 ft')
    job.removeCrane(0)
    expect(job.cranes).toBe(1)
    expect(job.entry('cranes[0].name')).toBe('Crane 2, 25 ton')
    expect(job.entry('cranes[0].wheelSpacings')).toBe('11 ft 4 in')
  })
})

describe('forms of a part', () => {
  test('a rolled section becomes a welded one and comes back as it was', () => {
    const job = jobOf()
    const before = stored(job).girder['section']
    job.turn('girder.section', 'plated')
    expect(job.way('girder.section')).toBe('plated')
    expect(stored(job).girder['section']).toEqual({ kind: 'plated', cap: { shape: 'C15X33.9' } })
    job.turn('girder.section', 'rolled')
    expect(stored(job).girder['section']).toEqual(before)
  })

  test('a plated section can be entered from nothing', () => {
    const job = jobOf()
    job.turn('girder.section', 'plated')
    job.turn('girder.section.cap', 'none')
    for (const [name, value] of [
      ['topFlange.width', '18 in'],
      ['topFlange.thickness', '1 in'],
      ['web.depth', '36 in'],
      ['web.thickness', '1/2 in'],
      ['bottomFlange.width', '18 in'],
      ['bottomFlange.thickness', '1 in'],
    ])
      job.enter(`girder.section.${name ?? ''}`, value ?? '')
    expect(wrongPaths(job)).toEqual([])
  })

  test('without a cap its steel is laid aside', () => {
    const job = jobOf()
    job.turn('girder.section.cap', 'none')
    expect(job.has('girder.section.cap')).toBe(false)
    expect(job.has('girder.capSteel')).toBe(false)
    expect(wrongPaths(job)).toEqual([])
    job.turn('girder.section.cap', 'shape')
    expect(job.entry('girder.section.cap.shape')).toBe('C15X33.9')
  })

  test('a steel by strengths instead of by name', () => {
    const job = jobOf()
    job.turn('girder.steel', 'own')
    job.enter('girder.steel.fy', '50')
    job.enter('girder.steel.fu', '65')
    expect(stored(job).girder['steel']).toEqual({ fy: '50 ksi', fu: '65 ksi' })
    expect(wrongPaths(job)).toEqual([])
    job.turn('girder.steel', 'name')
    expect(stored(job).girder['steel']).toEqual({ name: 'A992' })
  })

  test('a rail by dimensions keeps what both forms share', () => {
    const job = jobOf()
    job.enter('runway.rail.wear', '1/8 in')
    job.turn('runway.rail', 'own')
    expect(stored(job).runway['rail']).toEqual({ wear: '1/8 in' })
    expect(job.way('runway.rail')).toBe('own')
  })

  test('a shape by its dimensions', () => {
    const job = jobOf()
    job.turn('girder.section.shape', 'own')
    for (const [name, value] of Object.entries({ d: '36', bf: '12', tw: '0.7', tf: '1.2', r: '0.8' }))
      job.enter(`girder.section.shape.${name}`, value)
    expect(wrongPaths(job)).toEqual([])
    job.turn('girder.section.shape', 'name')
    expect(job.entry('girder.section.shape')).toBe('W36X182')
  })
})

describe('opening', () => {
  test.each([
    ['', 'the file is empty'],
    ['not a job', 'no job file'],
    ['[1, 2]', 'no object'],
    ['{"format": "something-else", "version": 1}', 'its format'],
    ['{"format": "longtravel-job"}', 'version is missing'],
    ['{"format": "longtravel-job", "version": 2}', 'newer program'],
    ['{"format": "longtravel-job", "version": 1, "units": "us", "units": "si"}', 'given twice'],
    [' '.repeat(1_000_001), 'at most'],
  ])('%.40s is refused and the job stays', (text, why) => {
    const job = jobOf()
    job.enter('cranes[0].bridgeSpan', '80 ft')
    const before = job.text
    expect(job.open(text)).toContain(why)
    expect(job.text).toBe(before)
  })

  test('a job with wrong entries is opened, so that they can be mended', () => {
    const job = jobOf()
    expect(job.open(sampleText('pendant').replace('"46 ft"', '"46 kip"'))).toBeUndefined()
    expect(job.entry('cranes[0].bridgeSpan')).toBe('46 kip')
    expect(wrongPaths(job)).toEqual(['cranes[0].bridgeSpan'])
  })

  test('what is saved is opened again letter by letter', () => {
    const job = jobOf('plateGirder')
    job.enter('cranes[1].bridgeSpan', '3*7.5 m')
    const other = new Job(job.text)
    expect(other.text).toBe(job.text)
  })

  test('names that mean something to the language are names like any other', () => {
    const job = jobOf()
    const text = sampleText('cab').replace('"units"', '"__proto__":{"polluted":true},"units"')
    expect(job.open(text)).toBeUndefined()
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined()
    expect(wrongPaths(job)).toEqual(['__proto__'])
    job.enter('units', 'si')
    expect(wrongPaths(job)).toEqual(['__proto__'])
  })

  test('a new job asks for all that is required and nothing else is wrong', () => {
    const job = new Job(blankJob('si'))
    const reviewed = review(job)
    expect(reviewed.ok).toBe(false)
    expect([...job.findings.values()].every(({ read }) => read === 'nothing')).toBe(true)
    expect(job.units).toBe('si')
  })
})
