/**
 * The coverage list: which clauses the program uses, and which it knowingly leaves out. Formulas and cases enter their
 * clause when they are defined, so the list cannot fall behind the rules.
 */
import type { DocumentKey } from './bibliography.ts'
import { citation, clausePlace, type Clause } from './clause.ts'

export type Coverage =
  | { readonly document: DocumentKey; readonly clause: string; readonly status: 'used' }
  | {
      readonly document: DocumentKey
      readonly clause: string
      readonly status: 'not-covered' | 'not-applicable'
      readonly reason: string
    }

const used = new Map<string, Coverage>()
const leftOut = new Map<string, Coverage>()

/**
 * Every clause used or left out by the rules loaded so far, by document and clause, each once.
 * Throws where one and the same clause is both used and left out: the reason given would be untrue.
 */
export function coverage(): readonly Coverage[] {
  const both = [...leftOut.keys()].find((key) => used.has(key))
  if (both !== undefined) throw new Error(`${both} is used by a formula and listed as left out`)
  return [...used.values(), ...leftOut.values()].sort(
    (a, b) => compareText(a.document, b.document) || comparePlaces(a.clause, b.clause),
  )
}

/** Enters a clause as used. */
export function useClause(clause: Clause): void {
  used.set(citation(clause), { document: clause.document, clause: clausePlace(clause), status: 'used' })
}

/** Enters a clause that no formula uses, with the reason in words a reader of the calculation understands. */
export function leaveOutClause(clause: Clause, status: 'not-covered' | 'not-applicable', reason: string): void {
  leftOut.set(citation(clause), { document: clause.document, clause: clausePlace(clause), status, reason })
}

const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)

/** F2 before F10: figures inside a clause count as numbers. */
function comparePlaces(a: string, b: string): number {
  const left = placeParts(a)
  const right = placeParts(b)
  for (const [index, part] of left.entries()) {
    const other = right[index]
    if (other === undefined) return 1
    const order = Number(part) - Number(other) || compareText(part, other)
    if (order !== 0) return order
  }
  return left.length - right.length
}

const placeParts = (place: string): readonly string[] => place.match(/\d+|\D+/g) ?? []
