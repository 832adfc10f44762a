/** The page's worker: reviews the job while it is edited, and writes the derivation of the check that is looked at. */
import { catalogue } from '../../core/catalogue/load.ts'
import type { FromLive, ToLive } from '../../core/contract/live.ts'
import { writeWorking } from '../../core/formula/write.ts'
import { reviewText } from '../../core/review/review-text.ts'
import type { Review } from '../../core/review/types.ts'
import { valuesOf } from '../../core/review/values.ts'

/** Answers one ask after another; keeps the last review that held, since its derivations are made when they are looked at. */
export function answerer(now: () => number): (ask: ToLive) => FromLive | undefined {
  let held: { readonly turn: number; readonly review: Review } | undefined

  const reviewed = ({ turn, text }: Extract<ToLive, { ask: 'review' }>): FromLive => {
    const start = now()
    const read = reviewText(text, catalogue)
    if (!read.ok) return { answer: 'findings', turn, findings: read.findings }
    held = { turn, review: read.review }
    return { answer: 'review', turn, review: valuesOf(read.review), milliseconds: now() - start }
  }

  const worked = ({ turn, id, place, units }: Extract<ToLive, { ask: 'working' }>): FromLive | undefined => {
    if (held?.turn !== turn) return undefined
    const check = held.review.checks.find((one) => one.id === id)
    const working = (place === 0 ? check : check?.places[place - 1])?.working
    return { answer: 'working', turn, id, place, lines: working ? writeWorking(working(), units) : [] }
  }

  return (ask) => {
    try {
      return ask.ask === 'review' ? reviewed(ask) : worked(ask)
    } catch (error) {
      return { answer: 'fault', turn: ask.turn, message: error instanceof Error ? error.message : String(error) }
    }
  }
}
