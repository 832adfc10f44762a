/** Plain text for a screen: wrapped, in columns, without control characters. */

const WIDTH = 110

/** Control characters of a job's texts could move the cursor or colour the screen: they are shown as a question mark. */
export const printable = (text: string): string => text.replace(/[^\P{C}\n]/gu, '?')

/** Lines of at most the screen's width: the first one indented as told, the others by `hanging` more. */
export const wrap = (text: string, indent: number, hanging = 2): readonly string[] => {
  const lines: string[] = []
  let line = ''
  for (const word of text.split(/\s+/).filter((part) => part !== '')) {
    const margin = ' '.repeat(lines.length === 0 ? indent : indent + hanging)
    if (line !== '' && margin.length + line.length + word.length + 1 > WIDTH) {
      lines.push(margin + line)
      line = word
    } else {
      line += line === '' ? word : ` ${word}`
    }
  }
  return [...lines, ' '.repeat(lines.length === 0 ? indent : indent + hanging) + line]
}

/** Columns padded to their widest cell, two spaces between; columns named in `right` stand flush right. */
export const columns = (rows: readonly (readonly string[])[], right: readonly number[] = []): readonly string[] => {
  const widths = (rows[0] ?? []).map((_, column) => Math.max(...rows.map((row) => (row[column] ?? '').length)))
  const pad = (text: string, column: number): string =>
    right.includes(column) ? text.padStart(widths[column] ?? 0) : text.padEnd(widths[column] ?? 0)
  return rows.map((row) => row.map(pad).join('  ').trimEnd())
}
