import { flushSync } from 'svelte'
import { expect, test } from 'vitest'
import { jobOf, review } from './job-of.ts'

/** Runs `read` as a view would and again whenever what it read has changed. */
const seenBy = <T>(read: () => T): { readonly seen: readonly T[]; readonly end: () => void } => {
  const seen: T[] = []
  const end = $effect.root(() => {
    $effect(() => {
      seen.push(read())
    })
  })
  flushSync()
  return { seen, end }
}

test('who reads an entry, the text or a finding is told of its change', () => {
  const job = jobOf()
  const entries = seenBy(() => job.entry('cranes[0].bridgeSpan'))
  const lengths = seenBy(() => job.text.length)
  const counts = seenBy(() => job.findings.size)
  job.enter('cranes[0].bridgeSpan', '780 kip')
  review(job)
  flushSync()
  expect(entries.seen).toEqual(['78 ft', '780 kip'])
  expect(lengths.seen).toEqual([lengths.seen[0], lengths.seen[0]! + 2])
  expect(counts.seen).toEqual([0, 1])
  for (const { end } of [entries, lengths, counts]) end()
})

test('who reads the form of a part is told when it turns', () => {
  const job = jobOf()
  const ways = seenBy(() => job.way('girder.section'))
  job.turn('girder.section', 'plated')
  flushSync()
  expect(ways.seen).toEqual(['rolled', 'plated'])
  ways.end()
})
