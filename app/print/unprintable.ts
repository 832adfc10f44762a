/** Characters that cannot be drawn, found in the whole sheet before anything is printed. */
import type { Block, Sheet } from '../../core/sheet/types.ts'
import type { Faces } from './faces.ts'
import { lackingIn } from './formula.ts'
import { tidy } from './text.ts'

/** Text with characters that no typeface of the program draws: scripts other than Latin, Greek, Cyrillic; pictures; controls. */
export class UnprintableText extends Error {
  /** Each once, in the order in which they are met. */
  readonly characters: readonly string[]
  /** Where they stand: "title block, project". */
  readonly where: readonly string[]

  constructor(characters: readonly string[], where: readonly string[]) {
    const shown = characters.slice(0, 10).map(named)
    const more = characters.length > 10 ? ` and ${characters.length - 10} more` : ''
    super(
      `no typeface of this program draws ${shown.join(', ')}${more} (in ${where.slice(0, 5).join('; ')}${where.length > 5 ? '; and elsewhere' : ''}): ` +
        `write it in Latin, Greek or Cyrillic letters`,
    )
    this.name = 'UnprintableText'
    this.characters = characters
    this.where = where
  }
}

/** What of a sheet no face draws, or undefined where all of it can be drawn. */
export function unprintableIn(sheet: Sheet, faces: Faces): UnprintableText | undefined {
  const characters = new Set<string>()
  const where = new Set<string>()
  for (const [place, text, formula = ''] of textsOf(sheet)) {
    const lacking = [...faces.undrawn(tidy(text).replaceAll('\n', '')), ...lackingIn(formula)]
    if (lacking.length === 0) continue
    for (const character of lacking) characters.add(character)
    where.add(place)
  }
  return characters.size === 0 ? undefined : new UnprintableText([...characters], [...where])
}

type Placed = readonly [place: string, text: string, mathml?: string]

const FIELD: Readonly<Record<keyof Sheet['title'], string>> = {
  project: 'project',
  subject: 'subject',
  number: 'number',
  revision: 'revision',
  preparedBy: 'prepared by',
  checkedBy: 'checked by',
  date: 'date',
}

function textsOf(sheet: Sheet): readonly Placed[] {
  const title = (Object.keys(FIELD) as (keyof typeof FIELD)[]).map((field): Placed => [
    `title block, ${FIELD[field]}`,
    sheet.title[field],
  ])
  const foot = [sheet.program, sheet.fingerprint, sheet.basis, sheet.caution].map((text): Placed => ['foot', text])
  let heading = ''
  const blocks = sheet.blocks.flatMap((block) => {
    if (block.block === 'heading') heading = `${block.number} ${block.text}`.trim()
    const under = heading === '' ? '' : ` under "${heading}"`
    return blockTexts(block).map(([place, ...texts]): Placed => [`${place}${under}`, ...texts])
  })
  return [...title, ...foot, ...blocks]
}

function blockTexts(block: Block): readonly Placed[] {
  switch (block.block) {
    case 'heading':
      return [['heading', `${block.number} ${block.text}`]]
    case 'paragraph':
      return [
        ['paragraph', block.text],
        ['clause', block.clause ?? ''],
      ]
    case 'table':
      return [
        ['table', block.caption ?? ''],
        ...block.columns.map(({ head }): Placed => ['table', `${head}${head.toUpperCase()}`]),
        ...block.rows.flat().map((cell): Placed => ['table', typeof cell === 'string' ? cell : cell.word]),
      ]
    case 'entries':
      return block.rows.map(({ label, value, source = '' }): Placed => [`entry ${label}`, label + value + source])
    case 'working':
      return block.lines.map(({ clause, note, symbols, values }): Placed => [
        'working',
        clause + note,
        symbols + values,
      ])
    case 'figure':
      return [
        ['caption', block.caption],
        ...block.figure.items.map((item): Placed => ['figure', item.item === 'text' ? item.text : '']),
      ]
    case 'verdict':
    case 'seal':
      return [[block.block, block.text]]
  }
}

const named = (character: string): string => {
  const code = `U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}`
  return /[\p{C}\p{Z}\p{M}]/u.test(character) ? code : `"${character}" (${code})`
}
