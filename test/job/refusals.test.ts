import { describe, expect, test } from 'vitest'
import type { Json } from '../../core/job/json.ts'
import { at, platedInFull, read, refused, rolledInFull, smallest, type Draft } from './plant.ts'

/** One entry changed, added or (undefined) taken out. */
const put =
  (path: readonly (string | number)[], value: Json | Draft | undefined, base = smallest) =>
  (): Draft => {
    const job = base()
    const parent = at(job, ...path.slice(0, -1))
    const key = path.at(-1)!
    if (value === undefined)
      delete parent[key] // eslint-disable-line @typescript-eslint/no-dynamic-delete
    else parent[key] = value
    return job
  }

const crane = (key: string, value: Json | undefined) => put(['cranes', 0, key], value)
const section = (value: Json) => put(['girder', 'section'], value)

const cases: readonly (readonly [what: string, draft: () => Draft, path: string, message: RegExp])[] = [
  // Units and kinds.
  ['a quantity without a unit', crane('ratedCapacity', '10'), 'cranes[0].ratedCapacity', /has no unit/],
  ['a length for a weight', crane('bridgeWeight', '20 ft'), 'cranes[0].bridgeWeight', /length/],
  ['a mass for a length', put(['runway', 'spans'], ['20 ft', '3 t']), 'runway.spans[1]', /length/],
  ['a mass for a force', put(['girder', 'addedAxial'], '20 t'), 'girder.addedAxial', /force/],
  ['NaN as a text', crane('bridgeSpan', 'NaN'), 'cranes[0].bridgeSpan', /NaN/],
  ['an unknown unit', crane('bridgeSpan', '60 furlong'), 'cranes[0].bridgeSpan', /furlong/],
  ['a list for a quantity', crane('bridgeSpan', ['60 ft']), 'cranes[0].bridgeSpan', /a length with its unit/],
  ['null', crane('bridgeSpan', null), 'cranes[0].bridgeSpan', /a length with its unit/],
  ['a number for a word', put(['units'], 1), 'units', /"us" or "si"/],
  ['a word for a flag', put(['runway', 'eitherWay'], 'yes'), 'runway.eitherWay', /true or false/],
  ['a text for a number', put(['basis', 'sideThrustShare'], '0.5'), 'basis.sideThrustShare', /a number from 0 to 1/],
  ['an object for a list', put(['cranes'], {}), 'cranes', /a list of 1 to 10 values/],
  ['a list for an object', put(['runway'], []), 'runway', /an object/],
  ['a blank title', put(['project', 'title'], ' '), 'project.title', /a text of 1 to 500/],
  // Limits.
  ['a span too short', put(['runway', 'spans'], ['0.09 m']), 'runway.spans[0]', /from 0.1 m to 100 m/],
  ['a span too long', put(['runway', 'spans'], ['101 m']), 'runway.spans[0]', /from 0.1 m to 100 m/],
  ['no span', put(['runway', 'spans'], []), 'runway.spans', /a list of 1 to 100/],
  ['no crane', put(['cranes'], []), 'cranes', /a list of 1 to 10/],
  ['a wheel spacing of nothing', crane('wheelSpacings', ['0 ft']), 'cranes[0].wheelSpacings[0]', /from 1 mm to 100 m/],
  ['a negative wheel spacing', crane('wheelSpacings', ['-1 ft']), 'cranes[0].wheelSpacings[0]', /from 1 mm to 100 m/],
  ['a share beyond 1', put(['basis', 'sideThrustShare'], 1.01), 'basis.sideThrustShare', /from 0 to 1/],
  [
    'a deflection limit of nothing',
    put(['basis', 'deflection'], { vertical: 0 }),
    'basis.deflection.vertical',
    /from 0.001 to/,
  ],
  ['a broken index', put(['runway', 'checkSpan'], 0.5), 'runway.checkSpan', /whole number/],
  ['a span that is not there', put(['runway', 'checkSpan'], 2), 'runway.checkSpan', /from 0 to 1/],
  // Lists that do not fit.
  ['too few wheel loads', crane('wheelLoad', ['5 kip']), 'cranes[0].wheelLoad', /a list of 2 values/],
  ['too many least loads', crane('leastWheelLoad', [1, 1, 1]), 'cranes[0].leastWheelLoad', /a list of 2 values/],
  ['too few empty loads', crane('emptyWheelLoad', [1]), 'cranes[0].emptyWheelLoad', /a list of 2 values/],
  ['one bumper overhang', crane('bumperOverhang', ['1 ft']), 'cranes[0].bumperOverhang', /a list of 2 values/],
  // Names.
  ['an unknown shape', section({ kind: 'rolled', shape: 'W18X51' }), 'girder.section.shape', /nearest: .*W18X50/],
  [
    'a European shape',
    section({ kind: 'rolled', shape: 'HE 300 B' }),
    'girder.section.shape',
    /no such name.*; it has the families W, S, HP$/,
  ],
  [
    'an unknown channel',
    section({ kind: 'rolled', shape: 'W18X50', cap: { shape: 'C15X34' } }),
    'girder.section.cap.shape',
    /C15X33\.9/,
  ],
  ['an unknown rail', put(['runway', 'rail'], { name: 'ASCE 41' }), 'runway.rail.name', /ASCE ?40/],
  ['an unknown steel', put(['girder', 'steel'], { name: 'A99' }), 'girder.steel.name', /A992/],
  // Fields.
  ['an unknown field', crane('wheelLoads', []), 'cranes[0].wheelLoads', /did you mean "wheelLoad"/],
  ['an unknown field like none', put(['qqqq'], 1), 'qqqq', /the fields here are format, version/],
  ['a field with an odd name', put(['runway', 'no such'], 1), 'runway["no such"]', /no field of this name/],
  ['constructor', put(['constructor'], {}), 'constructor', /no field of this name/],
  ['prototype', put(['girder', 'prototype'], {}), 'girder.prototype', /no field of this name/],
  // What belongs together.
  [
    'fu below fy',
    put(['girder', 'steel'], { fy: '50 ksi', fu: '49 ksi' }),
    'girder.steel.fu',
    /not be below the yield stress/,
  ],
  ['fy without fu', put(['girder', 'steel'], { fy: '50 ksi' }), 'girder.steel.fu', /required/],
  [
    'a name and a yield stress',
    put(['girder', 'steel'], { name: 'A36', fy: '36 ksi' }),
    'girder.steel.fy',
    /does not go with name/,
  ],
  ['no way at all', put(['girder', 'steel'], {}), 'girder.steel', /an object with name or fy, fu/],
  [
    'a rail by half its dimensions',
    put(['runway', 'rail'], { height: '5 in', headWidth: '2 in', mass: '40 lb/yd' }),
    'runway.rail.footWidth',
    /required/,
  ],
  [
    'a web in a rolled section',
    section({ kind: 'rolled', shape: 'W18X50', web: {} }),
    'girder.section.web',
    /does not go with kind "rolled"/,
  ],
  [
    'two caps',
    section({ kind: 'rolled', shape: 'W18X50', cap: { shape: 'C15X33.9', plate: { width: 1, thickness: 0.1 } } }),
    'girder.section.cap.plate',
    /does not go with shape/,
  ],
  ['an unknown kind', section({ kind: 'cast', shape: 'W18X50' }), 'girder.section.kind', /"rolled" or "plated"/],
  [
    'a hook beyond the bridge',
    crane('hookApproach', '61 ft'),
    'cranes[0].hookApproach',
    /less than the span of the bridge/,
  ],
  [
    'a hook at the far rail',
    crane('hookApproach', '60 ft'),
    'cranes[0].hookApproach',
    /less than the span of the bridge/,
  ],
  [
    'approaches that meet',
    put(['cranes', 0, 'hookApproachFar'], '59 ft', () => crane('hookApproach', '2 ft')()),
    'cranes[0].hookApproachFar',
    /together/,
  ],
  ['a rail worn away', put(['runway', 'rail', 'wear'], '3.5 in'), 'runway.rail.wear', /less than the height/],
  [
    'wheel loads derived from nothing',
    crane('bridgeWeight', undefined),
    'cranes[0].bridgeWeight',
    /wheelLoad is derived from it where not given/,
  ],
  [
    'least and empty loads derived from nothing',
    put(['cranes', 0, 'bridgeWeight'], undefined, () =>
      put(['cranes', 0, 'leastWheelLoad'], 'derive', () =>
        put(['cranes', 0, 'emptyWheelLoad'], 'derive', () => crane('wheelLoad', ['38.1 kip', '38.1 kip'])())(),
      )(),
    ),
    'cranes[0].bridgeWeight',
    /leastWheelLoad, emptyWheelLoad are derived from it where not given/,
  ],
  ['side thrust of nothing', crane('trolleyWeight', undefined), 'cranes[0].trolleyWeight', /side thrust/],
  ['a steel of no part', put(['girder', 'capSteel'], { name: 'A36' }), 'girder.capSteel', /no part of the section/],
  ['plates of no part', put(['girder', 'plateSteel'], { name: 'A36' }), 'girder.plateSteel', /no part of the section/],
  [
    'a shape whose flanges fill it',
    section({ kind: 'rolled', shape: { d: '2 in', bf: '4 in', tw: '1 in', tf: '0.9 in', r: '0.1 in' } }),
    'girder.section.shape.d',
    /more than two flange thicknesses/,
  ],
  [
    'a web wider than its flange',
    put(['girder', 'section', 'topFlange', 'width'], '7 mm', platedInFull),
    'girder.section.topFlange.width',
    /at least the web/,
  ],
  [
    'two cranes of one name',
    put(['cranes', 1, 'name'], 'North', rolledInFull),
    'cranes[1].name',
    /cranes\[0\] has the same name/,
  ],
  [
    'a set with an unknown crane',
    put(['basis', 'cranesTogether'], [{ East: {} }], rolledInFull),
    'basis.cranesTogether[0].East',
    /the cranes are “North”, “South crane”/,
  ],
  [
    'a set with an index too far',
    put(['basis', 'cranesTogether'], [{ 2: {} }], rolledInFull),
    'basis.cranesTogether[0]["2"]',
    /names no crane/,
  ],
  [
    'a set with one crane twice',
    put(['basis', 'cranesTogether'], [{ 0: {}, North: {} }], rolledInFull),
    'basis.cranesTogether[0].North',
    /same crane/,
  ],
  ['an empty set', put(['basis', 'cranesTogether'], [{}], rolledInFull), 'basis.cranesTogether[0]', /must name 1 to/],
  ['no set', put(['basis', 'cranesTogether'], [], rolledInFull), 'basis.cranesTogether', /a list of 1 to 50/],
  // What must be there.
  ['no format', put(['format'], undefined), 'format', /required/],
  ['no version', put(['version'], undefined), 'version', /required/],
  ['no title', put(['project', 'title'], undefined), 'project.title', /required/],
  ['no cranes', put(['cranes'], undefined), 'cranes', /required/],
  ['no runway', put(['runway'], undefined), 'runway', /required/],
  ['no section', put(['girder', 'section'], undefined), 'girder.section', /required/],
  ['no service class', crane('serviceClass', undefined), 'cranes[0].serviceClass', /required/],
  // Other files.
  ['another kind of file', put(['format'], 'longtravel-result'), 'format', /this is no job file/],
  ['a newer file', put(['version'], 2), 'version', /^written by a newer program: version 2, this one reads 1$/],
  ['version nought', put(['version'], 0), 'version', /must be 1/],
  ['a version as a text', put(['version'], '1'), 'version', /must be 1/],
]

describe('refused with its path and what would be right', () => {
  test.each(cases)('%s', (_, draft, path, message) => {
    const findings = refused(draft())
    expect(findings.map((finding) => finding.path)).toEqual([path])
    expect(findings[0]!.message).toMatch(message)
    expect(findings[0]!.read).not.toBe('')
  })

  test('__proto__, written in the file, is a field like any other and unknown', () => {
    const text = JSON.stringify(smallest()).replace('"project":', '"__proto__":{"units":"si"},"project":')
    expect(refused(text)).toEqual([
      { path: '__proto__', read: 'an object with 1 fields', message: expect.stringContaining('no field') as string },
    ])
    const set = JSON.stringify(put(['basis', 'cranesTogether'], 'here')()).replace('"here"', '[{"__proto__":{}}]')
    expect(refused(set)[0]!.path).toBe('basis.cranesTogether[0].__proto__')
  })

  test('a number too large for a computer', () => {
    const text = JSON.stringify(smallest()).replace('"10 ton"', '1e999')
    expect(refused(text)).toMatchObject([{ path: 'cranes[0].ratedCapacity', read: 'Infinity' }])
  })
})

const notCovered: readonly (readonly [path: string, draft: () => Draft])[] = [
  ['basis.standard', put(['basis', 'standard'], 'eu')],
  ['basis.sideThrust', put(['basis', 'sideThrust'], 'mill')],
  ['basis.buildingClass', put(['basis', 'buildingClass'], 'A')],
  ['basis.torsion', put(['basis', 'torsion'], 'mixed')],
  ['basis.cranesTogether', put(['basis', 'cranesTogether'], 'mill')],
  ['basis.fatigueImpact', put(['basis', 'fatigueImpact'], true)],
  ['cranes[0].millKind', crane('millKind', 'ladle')],
  ['cranes[0].drivenWheels', crane('drivenWheels', 1)],
  ['cranes[0].rigidGuided', crane('rigidGuided', true)],
  ['cranes[0].travelSpeed', crane('travelSpeed', '200 ft/min')],
  ['cranes[0].hoistSpeed', crane('hoistSpeed', '20 ft/min')],
  ['cranes[0].liftsPerDay', crane('liftsPerDay', 10)],
  ['cranes[0].years', crane('years', 50)],
  ['cranes[0].totalLifts', crane('totalLifts', 100000)],
  ['cranes[0].liftSpectrum', crane('liftSpectrum', [{ share: 1, load: 1 }])],
  ['runway.continuity', put(['runway', 'continuity'], 'continuous')],
  ['runway.overhangs', put(['runway', 'overhangs'], ['1 ft', '1 ft'])],
  ['runway.settlements', put(['runway', 'settlements'], ['1 in', '0 in', '0 in'])],
  ['runway.springs', put(['runway', 'springs'], ['1 kN/mm', '1 kN/mm', '1 kN/mm'])],
  ['runway.topFlangeRestraint', put(['runway', 'topFlangeRestraint'], 'surge-girder')],
  ['runway.rail.fixing', put(['runway', 'rail', 'fixing'], 'welded')],
  ['runway.rail.pad', put(['runway', 'rail', 'pad'], true)],
  ['runway.stop', put(['runway', 'stop'], { bumperStroke: '6 in' })],
  ['girder.surge', put(['girder', 'surge'], {})],
  ['girder.welds', put(['girder', 'welds'], { cap: { size: '1/4 in' } })],
  ['girder.stiffeners', put(['girder', 'stiffeners'], { spacing: '5 ft' })],
  ['girder.holes', put(['girder', 'holes'], [{ flange: 'top', diameter: '1 in', count: 2 }])],
  ['girder.addedAxial', put(['girder', 'addedAxial'], '1 kip')],
  ['girder.fatigueDetails', put(['girder', 'fatigueDetails'], [{ detail: '3.1', at: '1 m' }])],
]

describe('refused as not covered by this version, never ignored', () => {
  test.each(notCovered)('%s', (path, draft) => {
    const findings = refused(draft())
    expect(findings.map((finding) => finding.path)).toEqual([path])
    expect(findings[0]!.message).toMatch(/not covered by this version/)
  })

  test('an axial force of nothing and all wheels driven are what this version assumes', () => {
    for (const draft of [
      put(['girder', 'addedAxial'], '0 kip'),
      crane('drivenWheels', 2),
      put(['girder', 'holes'], []),
    ])
      expect(read(draft()).ok).toBe(true)
  })

  test('"split" is covered', () => {
    expect(read(put(['basis', 'craneDeadFactor'], 'split')()).ok).toBe(true)
  })
})

describe('all findings at once', () => {
  test('one for each entry, wherever it stands', () => {
    const job = smallest()
    at(job, 'basis').standard = 'eu'
    at(job, 'basis').colour = 'red'
    at(job, 'cranes', 0).wheelLoad = ['5 kip']
    at(job, 'cranes', 0).hookApproach = '70 ft'
    at(job, 'cranes', 0).operation = 'steam'
    at(job, 'runway').spans = ['20 ft', '0 ft', '20']
    at(job, 'girder').steel = { fy: '50 ksi', fu: '40 ksi' }
    at(job, 'girder', 'section').shape = 'W18X'
    delete job.project
    const found = refused(job).map(({ path }) => path)
    expect(found.sort()).toEqual(
      [
        'basis.standard',
        'basis.colour',
        'cranes[0].wheelLoad',
        'cranes[0].hookApproach',
        'cranes[0].operation',
        'runway.spans[1]',
        'runway.spans[2]',
        'girder.steel.fu',
        'girder.section.shape',
        'project',
      ].sort(),
    )
  })

  test('an empty object is told everything it needs', () => {
    expect(refused({}).map(({ path }) => path)).toEqual([
      'format',
      'version',
      'project',
      'basis',
      'cranes',
      'runway',
      'girder',
    ])
  })

  test('a file that is no job at all is not answered without end', () => {
    const findings = refused(Object.fromEntries(Array.from({ length: 100_000 }, (_, index) => [`field ${index}`, 1])))
    expect(findings).toHaveLength(501)
    expect(findings.at(-1)!.message).toMatch(/more than 500/)
  })
})

describe('files that cannot be read', () => {
  const only = (text: string): string => {
    const findings = refused(text)
    expect(findings).toHaveLength(1)
    expect(findings[0]!.path).toBe('')
    return findings[0]!.message
  }

  test('say what is wrong, and where', () => {
    expect(only('')).toMatch(/the file is empty/)
    expect(only(' \n\uFEFF')).not.toMatch(/NaN/)
    expect(only('\uFEFF')).toMatch(/the file is empty/)
    expect(only('%PDF-1.7')).toMatch(/line 1, column 1/)
    expect(only('{\n  "format": longtravel\n}')).toMatch(/line 2, column 13: “longtravel” is no JSON value/)
    expect(only('{"units": NaN}')).toMatch(/“NaN” is no JSON value/)
    expect(only('[1, 2]')).toMatch(/one object/)
    expect(only('"job"')).toMatch(/one object/)
    expect(only('['.repeat(100_000))).toMatch(/nested deeper than 32 levels/)
  })

  test('half a file says that it ends too early', () => {
    const text = JSON.stringify(smallest(), null, 2)
    const message = only(text.slice(0, text.length / 2))
    expect(message).toMatch(/line \d+, column \d+: the file ends too early/)
  })

  test('200 MB are refused before they are looked at', () => {
    const started = performance.now()
    expect(only(' '.repeat(200_000_000))).toMatch(/at most 20000000 characters/)
    expect(performance.now() - started).toBeLessThan(1000)
  })

  test('a name given twice is refused by its path, since the first value would be lost', () => {
    const text = JSON.stringify(smallest()).replace('"operation":', '"bridgeSpan":"70 ft","operation":')
    expect(refused(text)).toMatchObject([{ path: 'cranes[0].bridgeSpan', message: /given twice/ }])
  })
})
