import { describe, expect, it } from 'vitest'
import { DOCUMENTS } from '../../core/sources/bibliography.ts'
import { citation, type Clause } from '../../core/sources/clause.ts'
import { coverage, leaveOutClause, useClause } from '../../core/sources/coverage.ts'

describe('a clause', () => {
  it('is cited as a calculation prints it', () => {
    const cited = [
      [{ document: 'AISC 360-22', clause: 'F2', equation: 'F2-2' }, 'AISC 360-22 F2-2'],
      [{ document: 'ASCE 7-22', clause: '4.9.3' }, 'ASCE 7-22 4.9.3'],
      [{ document: 'AISC 360-22', clause: 'Commentary F1' }, 'AISC 360-22 Commentary F1'],
      [{ document: 'AISC 360-22', clause: 'App. 3.2' }, 'AISC 360-22 App. 3.2'],
      [{ document: 'statics', clause: 'simple beam' }, 'statics, simple beam'],
      [{ document: 'practice', clause: '' }, 'common practice'],
      [{ document: 'practice', clause: 'flange couple', equation: 'arm' }, 'common practice, arm'],
    ] as const satisfies readonly (readonly [Clause, string])[]
    for (const [clause, text] of cited) expect(citation(clause)).toBe(text)
  })

  it('does not compile with an unknown document or chapter', () => {
    // @ts-expect-error no such document
    const document: Clause = { document: 'AISC 360-99', clause: 'F2' }
    // @ts-expect-error no such chapter
    const chapter: Clause = { document: 'AISC 360-22', clause: 'Q7.3' }
    // @ts-expect-error the chapter of another document
    const other: Clause = { document: 'ASCE 7-22', clause: 'F2' }
    expect([document, chapter, other]).toHaveLength(3)
  })
})

describe('the bibliography', () => {
  it('names title, edition and publisher of every document', () => {
    for (const [key, document] of Object.entries(DOCUMENTS)) {
      expect(document.title, key).not.toBe('')
      expect(document.chapters.length, key).toBeGreaterThan(0)
      expect(new Set(document.chapters).size, key).toBe(document.chapters.length)
      if (key !== 'practice' && key !== 'statics') expect(document.publisher, key).not.toBe('')
    }
  })
})

describe('the coverage list', () => {
  it('holds each clause once, in the order of the document', () => {
    const at = (clause: `F${1 | 2}${string}`): Clause => ({ document: 'AISC 360-22', clause })
    for (const clause of [at('F2.10'), at('F2.2'), at('F1'), at('F2.2'), at('F2')]) useClause(clause)
    useClause({ document: 'ASCE 7-22', clause: '4.9.3' })
    leaveOutClause({ document: 'AISC 360-22', clause: 'F5' }, 'not-covered', 'slender webs')
    expect(coverage()).toEqual([
      { document: 'AISC 360-22', clause: 'F1', status: 'used' },
      { document: 'AISC 360-22', clause: 'F2', status: 'used' },
      { document: 'AISC 360-22', clause: 'F2.2', status: 'used' },
      { document: 'AISC 360-22', clause: 'F2.10', status: 'used' },
      { document: 'AISC 360-22', clause: 'F5', status: 'not-covered', reason: 'slender webs' },
      { document: 'ASCE 7-22', clause: '4.9.3', status: 'used' },
    ])
  })

  it('refuses a clause that is both used and left out', () => {
    leaveOutClause({ document: 'ASCE 7-22', clause: '4.9.3' }, 'not-applicable', 'no crane')
    expect(() => coverage()).toThrow('ASCE 7-22 4.9.3 is used by a formula and listed as left out')
  })
})
