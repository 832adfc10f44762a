/** A place in a document of the bibliography. */
import { DOCUMENTS, type ChapterOf, type Document, type DocumentKey } from './bibliography.ts'

/** A clause of one document: begins with one of its chapters, or is the commentary to one. `equation` is the printed number. */
interface ClauseOf<D extends DocumentKey> {
  readonly document: D
  readonly clause: `${'' | 'Commentary '}${ChapterOf<D>}${string}`
  readonly equation?: string
}

/** A clause of any document; an unknown document or a chapter that is not in the bibliography does not compile. */
export type Clause = { [D in DocumentKey]: ClauseOf<D> }[DocumentKey]

/**
 * As it is printed beside a check: "AISC 360-22 F2-2", "ASCE 7-22 4.9.3", "statics, simple beam". An equation's number
 * stands for its clause.
 */
export function citation(clause: Clause): string {
  const document: Document = DOCUMENTS[clause.document]
  const name = document.cited ?? clause.document
  const place = clausePlace(clause)
  if (place === '') return name
  return document.chapters.includes('') ? `${name}, ${place}` : `${name} ${place}`
}

/** The place inside the document: the equation's number where there is one, else the clause. */
export const clausePlace = (clause: Clause): string => clause.equation ?? clause.clause
