/** Words into lines. */
import type { Style } from './hand.ts'
import { widthOf, type Pen } from './pen.ts'

/** Text as it is drawn: composed letters, tabs as spaces, lines ended alike. */
export const tidy = (text: string): string => text.normalize('NFC').replace(/\r\n?/g, '\n').replaceAll('\t', '    ')

/** Broken into lines no wider than `width`, at spaces; a word that is wider is broken where it must be. */
export function wrap(pen: Pen, text: string, style: Style, width: number): string[] {
  return tidy(text)
    .split('\n')
    .flatMap((paragraph) => wrapParagraph(pen, paragraph, style, width))
}

/** The first `most` lines; where there are more the last one ends with an ellipsis. */
export function wrapAtMost(pen: Pen, text: string, style: Style, width: number, most: number): string[] {
  const lines = wrap(pen, text, style, width)
  if (lines.length <= most) return lines
  const kept = lines.slice(0, most)
  let last = Array.from(kept[most - 1]!)
  while (last.length > 0 && widthOf(pen, `${last.join('')}…`, style) > width) last = last.slice(0, -1)
  return [...kept.slice(0, -1), `${last.join('').trimEnd()}…`]
}

function wrapParagraph(pen: Pen, text: string, style: Style, width: number): string[] {
  const lines: string[] = []
  let line = ''
  let used = 0
  const space = widthOf(pen, ' ', style)
  for (const word of wordsOf(text)) {
    const wide = widthOf(pen, word, style)
    if (line !== '' && used + space + wide <= width) {
      line += ` ${word}`
      used += space + wide
      continue
    }
    if (line.trim() !== '') lines.push(line)
    const pieces = wide <= width ? [word] : broken(pen, word, style, width)
    lines.push(...pieces.slice(0, -1))
    line = pieces.at(-1)!
    used = widthOf(pen, line, style)
  }
  return [...lines, line].map((each) => each.trimEnd())
}

/** Words between spaces; a figure and its unit are one, feet and inches too. */
function wordsOf(text: string): string[] {
  const words: string[] = []
  for (const word of text.split(' ')) {
    const before = words.at(-1)
    if (before !== undefined && belong(before, word)) words[words.length - 1] = `${before} ${word}`
    else words.push(word)
  }
  return words
}

/** A unit behind its figure, inches behind feet, a fraction behind a whole. */
const belong = (before: string, word: string): boolean =>
  /\d$/.test(before) ? UNIT.test(word) || /^\d+\/\d/.test(word) : /\d['′]$/.test(before) && /^\d/.test(word)

const UNIT = /^(%|ft|in|kip|kips|ksi|ton|t|lb|mm|m|kN|MPa|(kip|kN|N|lb)[-·/](ft|in|m|mm))[.,;:)]*$/

/** A word wider than a line, in parts: after a hyphen, a slash or a dot where there is one far enough along, else anywhere. */
function broken(pen: Pen, word: string, style: Style, width: number): string[] {
  const pieces: string[] = []
  let rest = letters(word)
  for (;;) {
    let count = 0
    let used = 0
    while (count < rest.length && (used += widthOf(pen, rest[count]!, style)) <= width) count += 1
    // Side by side letters may stand a little farther apart than each by itself.
    while (count > 1 && widthOf(pen, rest.slice(0, count).join(''), style) > width) count -= 1
    if (count === rest.length) return [...pieces, rest.join('')]
    const after = rest.slice(0, count).findLastIndex((letter) => /[-/._,;:\\–—]/.test(letter)) + 1
    const cut = Math.max(1, after > count / 2 ? after : count)
    pieces.push(rest.slice(0, cut).join(''))
    rest = rest.slice(cut)
  }
}

/** Characters, marks with the letter they stand on. */
const letters = (word: string): string[] => word.match(/\P{M}\p{M}*|\p{M}+/gu) ?? []
