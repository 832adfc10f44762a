/** The result file: the fields users' scripts rest on, SI, one way to name a crane, no figure that is none. */
import { describe, expect, it } from 'vitest'
import { resultOf } from '../../core/review/result.ts'
import type { Review } from '../../core/review/types.ts'
import { extreme, failing, quantity, standIn } from './stand-in.ts'

const result = resultOf(standIn)

describe('the result of a review', () => {
  it('has the fields of version 1, in their order', () => {
    expect(Object.keys(result)).toEqual([
      'format',
      'version',
      'program',
      'fingerprint',
      'trains',
      'envelope',
      'section',
      'topFlangeSystem',
      'actions',
      'checks',
      'governing',
      'ok',
      'complete',
      'handedOn',
      'cautions',
      'editions',
    ])
    expect([result.format, result.version, result.program]).toEqual(['longtravel-result', 1, '0.1.0'])
  })

  it('goes through JSON unchanged', () => {
    expect(JSON.parse(JSON.stringify(result))).toEqual(result)
  })

  it('names cranes wherever one is meant', () => {
    expect(result.trains).toEqual([
      {
        cranes: ['North'],
        wheels: [
          { crane: 'North', offset: 0, load: 50_000 },
          { crane: 'North', offset: 2, load: 40_000 },
        ],
      },
    ])
    expect(result.envelope.moment.max.positions).toEqual([{ crane: 'North', lead: 2, mirrored: false }])
    expect(result.actions.cranes[0]?.crane).toBe('North')
  })

  it('gives every extreme with its place and what coincides', () => {
    expect(result.envelope.moment.max).toEqual({
      value: 50_000,
      span: 0,
      station: 3,
      side: 'at',
      lead: 2,
      mirrored: false,
      train: 0,
      positions: [{ crane: 'North', lead: 2, mirrored: false }],
      with: { moment: 50_000, shear: 10 },
    })
    expect(result.envelope.reaction[0]?.support).toBe(0)
    expect(result.envelope.endReaction[0]?.end).toBe('left')
  })

  it('gives a check with its units and citation', () => {
    expect(result.checks[1]).toMatchObject({
      id: 'us.flexure.major',
      clause: 'AISC 360-22 F2-2',
      status: 'fails',
      why: null,
      ok: false,
      demand: { value: 500_050, unit: 'N m' },
      resistance: { value: 500_000, unit: 'N m' },
      combination: '1.2D + 1.6L',
      places: [],
    })
  })

  it('tells by ok what the status tells', () => {
    expect(result.checks.map(({ status, ok }) => [status, ok])).toEqual([
      ['holds', true],
      ['fails', false],
      ['not-covered', null],
      ['not-applicable', null],
    ])
  })

  it('writes null where there is no value, and 1 for a plain ratio', () => {
    expect(result.checks[2]).toMatchObject({ demand: null, resistance: null, utilisation: null, at: null, set: null })
    const ratio = resultOf({ ...standIn, checks: [{ ...failing, demand: quantity('ratio', 0.5) }] })
    expect(ratio.checks[0]?.demand).toEqual({ value: 0.5, unit: '1' })
    expect(resultOf({ ...standIn, governing: undefined }).governing).toBeNull()
  })

  it('gives the other places of a check under places', () => {
    const check = { ...failing, places: [{ status: 'holds', utilisation: 0.9, at: extreme(400_000, 4) } as const] }
    const [place] = resultOf({ ...standIn, checks: [check] }).checks[0]?.places ?? []
    expect(place).toMatchObject({ status: 'holds', ok: true, utilisation: 0.9, at: { station: 4 }, demand: null })
  })

  it.each([Number.NaN, Infinity, -Infinity])('refuses to hold %d', (figure) => {
    const wrong: Review = { ...standIn, checks: [{ ...failing, utilisation: figure }] }
    expect(() => resultOf(wrong)).toThrow(`result.checks.0.utilisation is ${figure}`)
  })

  it('refuses a crane that the job does not have', () => {
    const [train] = standIn.trains
    expect(() => resultOf({ ...standIn, trains: [{ ...train!, cranes: [7] }] })).toThrow('crane 7')
  })
})
