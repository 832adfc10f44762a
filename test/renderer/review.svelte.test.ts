import { describe, expect, test } from 'vitest'
import type { FromLive, ToLive } from '../../core/contract/live.ts'
import type { Finding } from '../../core/job/read.ts'
import { Review } from '../../renderer/state/review.svelte.ts'
import { answerer } from '../../renderer/worker/live.ts'
import { sampleText } from './job-of.ts'

/** A worker that answers only when it is told to. */
const standIn = () => {
  const asked: ToLive[] = []
  const found: (readonly Finding[])[] = []
  let listener: (answer: FromLive) => void = () => undefined
  const answer = answerer(() => 0)
  const reviews = new Review(
    { post: (ask) => asked.push(ask), listen: (answered) => (listener = answered) },
    (findings) => found.push(findings),
  )
  const last = (): ToLive => asked.at(-1)!
  return {
    reviews,
    asked,
    found,
    last,
    /** Answers an ask as the worker would, through a structured clone as a posted message is. */
    answer: (ask: ToLive = last()) => {
      const answered = answer(ask)
      if (answered !== undefined) listener(structuredClone(answered))
    },
    hear: (answered: FromLive) => {
      listener(answered)
    },
    reviewsAsked: () => asked.filter(({ ask }) => ask === 'review').length,
  }
}

const cab = sampleText('cab')
const pendant = sampleText('pendant')
const wrong = cab.replace('"78 ft"', '"78 kip"')

describe('turns', () => {
  test('the first text is asked at once and its review is shown', () => {
    const { reviews, answer } = standIn()
    reviews.submit(cab, 'us')
    expect(reviews.stale).toBe(true)
    expect(reviews.review).toBeUndefined()
    answer()
    expect(reviews.stale).toBe(false)
    expect(reviews.review?.checks.length).toBeGreaterThan(10)
    expect(reviews.chosen).toBe(reviews.review?.governing)
  })

  test('while one review runs no other is asked; then the newest text alone', () => {
    const { reviews, asked, answer, last } = standIn()
    reviews.submit(cab, 'us')
    for (const span of ['70 ft', '71 ft', '72 ft']) reviews.submit(cab.replace('"78 ft"', `"${span}"`), 'us')
    expect(asked).toHaveLength(1)
    answer(asked[0])
    const next = asked.findLast(({ ask }) => ask === 'review')
    expect(next?.ask === 'review' && next.text).toContain('"72 ft"')
    expect(reviews.stale).toBe(true)
    answer(next)
    expect(reviews.stale).toBe(false)
    expect(last().ask).toBe('working')
  })

  test('the same text is not asked twice', () => {
    const { reviews, answer, reviewsAsked } = standIn()
    reviews.submit(cab, 'us')
    answer()
    reviews.submit(cab, 'us')
    expect(reviewsAsked()).toBe(1)
  })

  test('an answer of another turn changes nothing', () => {
    const { reviews, asked, answer, hear } = standIn()
    reviews.submit(cab, 'us')
    answer()
    const shown = reviews.review
    reviews.submit(pendant, 'us')
    hear({ answer: 'findings', turn: 1, findings: [{ path: 'units', read: '', message: 'stale' }] })
    expect(reviews.review).toBe(shown)
    expect(reviews.stale).toBe(true)
    answer(asked.findLast(({ ask }) => ask === 'review'))
    expect(reviews.review).not.toBe(shown)
  })

  test('a refused text leaves the last good review, and says so', () => {
    const { reviews, found, answer } = standIn()
    reviews.submit(cab, 'us')
    answer()
    const good = reviews.review
    reviews.submit(wrong, 'us')
    answer()
    expect(reviews.review).toBe(good)
    expect(reviews.stale).toBe(true)
    expect(found.at(-1)?.map(({ path }) => path)).toEqual(['cranes[0].bridgeSpan'])
    reviews.submit(cab, 'us')
    answer()
    expect(reviews.stale).toBe(false)
    expect(found.at(-1)).toEqual([])
  })

  test('a fault of the program is told, and the next text is asked all the same', () => {
    const { reviews, answer, hear, last } = standIn()
    reviews.submit(cab, 'us')
    hear({ answer: 'fault', turn: 1, message: 'out of order' })
    expect(reviews.fault).toBe('out of order')
    reviews.submit(pendant, 'us')
    expect(last()).toMatchObject({ ask: 'review', turn: 2 })
    answer()
    expect(reviews.fault).toBeUndefined()
  })

  test('another job that comes in takes the figures of the one before away', () => {
    const { reviews, answer } = standIn()
    reviews.submit(cab, 'us')
    answer()
    reviews.start(pendant, 'us')
    expect(reviews.review).toBeUndefined()
    expect(reviews.chosen).toBeUndefined()
    answer()
    expect(reviews.review?.job.project.number).toBe('BKW-101')
  })

  test('the same job that comes in again is reviewed again', () => {
    const { reviews, answer } = standIn()
    reviews.submit(cab, 'us')
    answer()
    reviews.start(cab, 'us')
    expect(reviews.stale).toBe(true)
    answer()
    expect(reviews.review).toBeDefined()
    expect(reviews.stale).toBe(false)
  })

  test('what was asked of the job before is not shown for the one that came in', () => {
    const { reviews, asked, answer } = standIn()
    reviews.submit(cab, 'us')
    reviews.start(pendant, 'us')
    answer(asked[0])
    expect(reviews.review).toBeUndefined()
    answer(asked[1])
    expect(reviews.review?.job.project.number).toBe('BKW-101')
  })
})

describe('workings', () => {
  const shown = () => {
    const stand = standIn()
    stand.reviews.submit(cab, 'us')
    stand.answer()
    return stand
  }

  test('the chosen check is derived in the units shown', () => {
    const { reviews, answer, last } = shown()
    answer()
    expect(reviews.working?.length).toBeGreaterThan(0)
    expect(reviews.working?.map(({ text }) => text).join('\n')).toContain('kip')
    reviews.submit(cab, 'si')
    expect(last()).toMatchObject({ ask: 'working', units: 'si' })
    expect(reviews.working).toBeUndefined()
    answer()
    expect(reviews.working?.map(({ text }) => text).join('\n')).toContain('kN')
  })

  test('lines stand until those of the next review are there, and longer where they say the same', () => {
    const { reviews, asked, answer } = shown()
    answer()
    const lines = reviews.working
    const next = (text: string) => {
      reviews.submit(text, 'us')
      answer(asked.findLast(({ ask }) => ask === 'review'))
    }
    next(cab.replace('BKW-204', 'BKW-205'))
    expect(reviews.working).toBe(lines)
    answer()
    expect(reviews.working).toBe(lines)
    next(cab.replace('"50 ton"', '"60 ton"'))
    expect(reviews.working).toBe(lines)
    answer()
    expect(reviews.working).not.toEqual(lines)
  })

  test('lines of a check that is no longer chosen are dropped', () => {
    const { reviews, asked, answer } = shown()
    const first = asked.at(-1)
    reviews.choose('us.shear')
    answer(first)
    expect(reviews.working).toBeUndefined()
    answer()
    expect(reviews.working?.length).toBeGreaterThan(0)
  })

  test('another place of a check has its own derivation', () => {
    const { reviews, answer } = shown()
    const check = reviews.review?.checks.find(({ places, derived }) => derived && places.length > 0)
    reviews.choose(check!.id)
    answer()
    const worst = reviews.working
    reviews.choose(check!.id, 1)
    answer()
    expect(reviews.place).toBe(1)
    expect(reviews.working?.length).toBeGreaterThan(0)
    expect(reviews.working).not.toEqual(worst)
  })

  test('a derivation of an older review is never given for a newer one', () => {
    const answer = answerer(() => 0)
    answer({ ask: 'review', turn: 1, text: cab })
    answer({ ask: 'review', turn: 2, text: pendant })
    expect(answer({ ask: 'working', turn: 1, id: 'us.shear', place: 0, units: 'us' })).toBeUndefined()
    expect(answer({ ask: 'working', turn: 2, id: 'us.shear', place: 0, units: 'us' })).toMatchObject({ turn: 2 })
  })
})

test.each(['cab', 'pendant', 'plateGirder'] as const)('the review of %s can be posted', (name) => {
  const answered = answerer(() => 0)({ ask: 'review', turn: 1, text: sampleText(name) })
  expect(answered?.answer).toBe('review')
  expect(structuredClone(answered)).toEqual(answered)
})

test('sets of cranes, which are maps, can be posted', () => {
  const sets = '"cranesTogether":[{"0":{},"1":{"impact":0}}],"standard"'
  const text = sampleText('plateGirder').replace('"standard"', sets)
  const answered = answerer(() => 0)({ ask: 'review', turn: 1, text })
  expect(answered?.answer).toBe('review')
  expect(structuredClone(answered)).toEqual(answered)
})
