import { expect, test } from 'vitest'
import { as } from '../../core/quantity/kinds.ts'
import { valuesOf } from '../../core/review/values.ts'
import { Stand } from '../../renderer/state/stand.svelte.ts'
import { jobOf, review } from './job-of.ts'

const valuesAt = (job = jobOf()) => {
  const reviewed = review(job)
  if (!reviewed.ok) throw new Error('the sample has findings')
  return valuesOf(reviewed.review)
}

test('the crane is first stood at the greatest moment, and then where it is moved', () => {
  const stand = new Stand()
  const values = valuesAt()
  stand.fit(values)
  expect(stand.lead).toBe(values.envelope.moment.max.lead)
  expect(stand.station).toBe(values.envelope.moment.max.station)
  stand.moveTo(as('distance', 3))
  stand.readAt(as('distance', 4))
  stand.fit(values)
  expect([stand.lead, stand.station]).toEqual([3, 4])
})

test('a span that is gone is not stood in', () => {
  const job = jobOf()
  const stand = new Stand()
  stand.fit(valuesAt(job))
  stand.at({ span: 3, train: undefined, lead: as('distance', 30), mirrored: true, station: as('distance', 30) })
  expect([stand.span, stand.train]).toEqual([3, 0])
  job.enter('runway.spans', '30 ft')
  stand.fit(valuesAt(job))
  expect(stand.span).toBe(0)
  expect(stand.station).toBeLessThanOrEqual(30 * 0.3048)
})

test('another job is stood anew', () => {
  const stand = new Stand()
  const values = valuesAt()
  stand.fit(values)
  stand.moveTo(as('distance', 1))
  stand.leave()
  stand.fit(values)
  expect(stand.lead).toBe(values.envelope.moment.max.lead)
})
