/** The pages that stand open: each holds a request open, and the program ends soon after the last one. */
import type { ServerResponse } from 'node:http'

export interface Visitors {
  readonly isFull: () => boolean
  readonly welcome: (response: ServerResponse) => void
  /** Settles when the last page has gone, or when none ever came. */
  readonly gone: Promise<void>
}

export interface Patience {
  /** Milliseconds for the first page to come. */
  readonly first: number
  /** Milliseconds after the last page went: a page that is loaded anew is gone for a moment. */
  readonly last: number
}

/** A browser holds at most six connections to one host; each page needs one for itself, and calls need the rest. */
const MOST_PAGES = 4

export const visitorsOf = (patience: Patience): Visitors => {
  const open = new Set<ServerResponse>()
  const gone = Promise.withResolvers<undefined>()
  let ending: NodeJS.Timeout | undefined
  const endIn = (milliseconds: number) => {
    clearTimeout(ending)
    ending = setTimeout(() => gone.resolve(undefined), milliseconds)
  }
  endIn(patience.first)
  return {
    isFull: () => open.size >= MOST_PAGES,
    welcome: (response) => {
      clearTimeout(ending)
      open.add(response)
      response.on('close', () => {
        open.delete(response)
        if (open.size === 0) endIn(patience.last)
      })
    },
    gone: gone.promise,
  }
}
