/** What stands on every page: the title block at its head, program, fingerprint and caution at its foot. */
import type { Sheet } from '../../core/sheet/types.ts'
import { COLOUR, STYLE } from './hand.ts'
import { artifact, box, rise, rule, write, writeEnd, writeLines, type Pen } from './pen.ts'
import { wrap, wrapAtMost } from './text.ts'

export interface Furniture {
  /** Upper edge of what the page holds. */
  readonly top: number
  /** Height of it. */
  readonly room: number
  readonly draw: (page: number, of: number) => void
}

/** Lines of a name in the title block; a longer one ends with an ellipsis and stands whole in the file's properties. */
const MOST_LINES = 8
const PAD = 5.5
const BELOW_TITLE = 22
const ABOVE_FOOT = 14

export const NOT_KEPT = 'not kept as a revision'

/** The furniture of a sheet's pages; all of them have the same. */
export function furnitureOf(pen: Pen, sheet: Sheet): Furniture {
  const title = titleBlock(pen, sheet)
  const foot = footOf(pen, sheet)
  const top = pen.frame.top + title.height + BELOW_TITLE
  return {
    top,
    room: foot.top - ABOVE_FOOT - top,
    draw: (page, of) => {
      artifact(pen, 'Pagination', () => {
        title.draw(`${page} of ${of}`)
        foot.draw()
      })
    },
  }
}

interface Field {
  readonly label: string
  readonly text: string
  readonly share: number
}

function titleBlock(pen: Pen, { title }: Sheet) {
  const { left, right, top } = pen.frame
  const fields: readonly Field[] = [
    { label: 'PROJECT', text: title.project, share: 25.5 },
    { label: 'SUBJECT', text: title.subject, share: 25.5 },
    { label: 'NUMBER / REV', text: joined(title.number, title.revision, '\u00a0/\u00a0'), share: 14.5 },
    { label: 'BY · CHECKED', text: `${name(title.preparedBy)} ·\u00a0${name(title.checkedBy)}`, share: 17 },
    ...(title.date === '' ? [] : [{ label: 'DATE', text: title.date, share: 13 }]),
    { label: 'PAGE', text: '', share: 9 },
  ]
  const whole = fields.reduce((sum, { share }) => sum + share, 0)
  let x = left
  const cells = fields.map((field) => {
    const width = ((right - left) * field.share) / whole
    const cell = { ...field, x, lines: wrapAtMost(pen, field.text, STYLE.title, width - 2 * PAD, MOST_LINES) }
    x += width
    return cell
  })
  const tallest = Math.max(...cells.map(({ lines }) => lines.length))
  const height = 4 + STYLE.label.leading + tallest * STYLE.title.leading + 4
  return {
    height,
    draw: (page: string) => {
      box(pen, left, top, right - left, height, COLOUR.ink, 0.8)
      cells.forEach(({ label, x: at, lines }, index) => {
        if (index > 0) rule(pen, [at, top], [at, top + height], COLOUR.ink, 0.4)
        write(pen, label, STYLE.label, at + PAD, top + 4 + rise(STYLE.label))
        writeLines(pen, label === 'PAGE' ? [page] : lines, STYLE.title, at + PAD, top + 4 + STYLE.label.leading)
      })
    },
  }
}

/** A line to write on where no name is given. */
const name = (text: string): string => (text === '' ? '____' : text)

const joined = (first: string, second: string, between: string): string =>
  [first, second].filter((word) => word !== '').join(between)

function footOf(pen: Pen, sheet: Sheet) {
  const { left, right, bottom } = pen.frame
  const style = STYLE.foot
  const width = right - left
  const words = (text: string, share: number): readonly string[] => wrap(pen, text, style, width * share)
  const record = words(joined(sheet.program, sheet.basis, ' · '), 0.48)
  const caution = words(sheet.caution, 0.48)
  const mark = sheet.kept ? '' : NOT_KEPT
  const fingerprint = words(`fingerprint ${inFours(sheet.fingerprint)}`, 0.8)
  const above = Math.max(record.length, caution.length)
  const top = bottom - (above + fingerprint.length) * style.leading - 5
  return {
    top,
    draw: () => {
      rule(pen, [left, top], [right, top], COLOUR.ink, 0.8)
      const [first, second] = [top + 4, top + 4 + above * style.leading]
      writeLines(pen, record, style, left, first)
      caution.forEach((line, index) => writeEnd(pen, line, style, right, first + index * style.leading + rise(style)))
      writeLines(pen, fingerprint, style, left, second)
      writeEnd(pen, mark, STYLE.footStrong, right, second + rise(style))
    },
  }
}

/** A fingerprint in groups of four, to be compared by eye. */
const inFours = (fingerprint: string): string =>
  /^[0-9a-f]{8,}$/i.test(fingerprint) ? fingerprint.replace(/.{4}(?=.)/g, '$& ') : fingerprint
