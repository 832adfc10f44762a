/** Progress, stop, and characters that cannot be drawn. */
import { describe, expect, test } from 'vitest'
import { printSheet } from '../../app/print/print.ts'
import { UnprintableText } from '../../app/print/unprintable.ts'
import type { Block, Sheet } from '../../core/sheet/types.ts'
import { pagesOf } from './reader.ts'
import { sampleSheet } from './sample.ts'

const sheet = sampleSheet('us')
const withBlocks = (...blocks: Block[]): Sheet => ({ ...sheet, blocks })
const paragraph = (text: string): Block => ({ block: 'paragraph', text, tone: 'plain' })

describe('progress', () => {
  test('rises from nothing to all of it', async () => {
    const told: (readonly [number, number])[] = []
    await printSheet(sheet, 'a4', { onProgress: (done, of) => told.push([done, of]) })
    expect(told[0]![0]).toBe(0)
    expect(told.at(-1)![0]).toBe(told.at(-1)![1])
    told.forEach(([done, of], index) => {
      expect(done).toBeGreaterThanOrEqual(told[index - 1]?.[0] ?? 0)
      expect(of).toBe(2 * sheet.blocks.length)
    })
  })

  test('lets other work have its turn between blocks', async () => {
    let turns = 0
    let printing = true
    const count = (): void => {
      turns += 1
      if (printing) setImmediate(count)
    }
    setImmediate(count)
    await printSheet(sheet, 'a4')
    printing = false
    expect(turns).toBeGreaterThan(sheet.blocks.length)
  })

  test('stops where it is told to, with the reason given', async () => {
    const control = new AbortController()
    const done: number[] = []
    const printed = printSheet(sheet, 'a4', {
      signal: control.signal,
      onProgress: (at) => {
        done.push(at)
        if (at >= 5) control.abort(new Error('stopped by the user'))
      },
    })
    await expect(printed).rejects.toThrow('stopped by the user')
    expect(done.at(-1)).toBe(5)
    await expect(printSheet(sheet, 'a4', { signal: AbortSignal.abort(new Error('before')) })).rejects.toThrow('before')
  })
})

describe('characters', () => {
  test.each([
    ['Latin with marks', 'Łódź Çelik Đà Nẵng Þórður Žižkov'],
    ['Greek', 'Χαλυβουργία Ἀθηνῶν'],
    ['Cyrillic', 'Завод «Коксохим», Ђорђе Ґанок'],
    ['signs', '≤ ≥ × · − ± ° ′ ″ ½ ² ³ ⁴ ₁ ⌀ → Ω μ € №'],
  ])('draws %s', async (_, text) => {
    const pages = pagesOf(
      await printSheet({ ...withBlocks(paragraph(text)), title: { ...sheet.title, project: text } }, 'a4'),
    )
    const drawn = pages.flatMap(({ marks }) => marks).filter(({ tagged }) => tagged)
    expect(
      drawn
        .map((mark) => mark.text)
        .join('')
        .replaceAll(' ', ''),
    ).toBe(text.normalize('NFC').replaceAll(' ', ''))
  })

  test.each([
    ['Chinese', '漢字', ['漢', '字']],
    ['Arabic, which one of the typefaces has but which is not set right to left', 'سلام', ['س', 'ل', 'ا', 'م']],
    ['Hebrew', 'א', ['א']],
    ['Devanagari', 'क', ['क']],
    ['a picture', 'ok 🏗', ['🏗']],
    ['a face that one of the typefaces has', '😀', ['😀']],
    ['a control', 'a\u0007b', ['\u0007']],
    ['a turn of direction', 'a\u202eb', ['\u202e']],
    ['half of a pair', 'a\ud83d', ['\ud83d']],
  ])('names %s before anything is printed', async (_, text, characters) => {
    const told: number[] = []
    const fault = await faultOf({ ...sheet, title: { ...sheet.title, subject: `Halle ${text}` } }, told)
    expect(fault.characters).toEqual(characters)
    expect(fault.where).toEqual(['title block, subject'])
    expect(told).toEqual([])
    for (const character of characters)
      expect(fault.message).toContain(`U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}`)
  })

  test('names where in the sheet they stand, all places at once', async () => {
    const line = {
      kind: 'given',
      clause: '',
      symbols: '<math><mrow><mi>漢</mi></mrow></math>',
      values: '',
      text: '',
      note: '',
    } as const
    const fault = await faultOf(
      withBlocks(
        { block: 'heading', level: 1, number: '4', text: 'Notes' },
        paragraph('字'),
        { block: 'entries', rows: [{ label: 'Name', value: '中', isDefault: false }] },
        { block: 'working', lines: [line] },
        {
          block: 'table',
          columns: [{ head: 'a', align: 'left', width: 1 }],
          rows: [['中'], [{ utilisation: 1, word: '文' }]],
        },
        { block: 'verdict', text: '文', holds: true },
      ),
    )
    expect(fault.characters).toEqual(['字', '中', '漢', '文'])
    expect(fault.where).toEqual([
      'paragraph under "4 Notes"',
      'entry Name under "4 Notes"',
      'working under "4 Notes"',
      'table under "4 Notes"',
      'verdict under "4 Notes"',
    ])
  })
})

async function faultOf(odd: Sheet, told: number[] = []): Promise<UnprintableText> {
  try {
    await printSheet(odd, 'a4', { onProgress: (done) => told.push(done) })
  } catch (error) {
    if (error instanceof UnprintableText) return error
    throw error
  }
  throw new Error('it was printed')
}
