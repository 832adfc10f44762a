/** What was typed in a line of the data sheet, as the value that the job file takes; and back as the text of the line. */
import type { Entry, QuantityEntry } from '../../core/job/field.ts'
import type { Json } from '../../core/job/json.ts'
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import { readQuantity } from '../../core/quantity/read.ts'
import { writeExact, writeUnit } from '../../core/quantity/write.ts'

/**
 * The value for the job file. A bare number takes the unit shown in `system`, and the unit is written to it; whatever
 * cannot be read stays as it was typed, so that the review names what is wrong with it.
 */
export const storedOf = (entry: Entry, typed: string, system: UnitSystem): Json => {
  const text = typed.trim()
  switch (entry.is) {
    case 'quantity':
      return quantityText(entry, text, system)
    case 'number': {
      const read = readQuantity(text, 'ratio')
      return read.ok ? read.value : text
    }
    case 'flag':
      return text === 'true' ? true : text === 'false' ? false : text
    case 'list':
      return listOf(entry, text, system) ?? text
    case 'either':
      return eitherOf(entry.of, text, system)
    case 'text':
      return typed
    default:
      return text
  }
}

/** The text of a line for what stands in the file; equal items of a list are counted: "4 × 30 ft". */
export const lineOf = (json: Json | undefined): string | undefined => {
  if (json === undefined) return undefined
  if (typeof json === 'string') return json
  if (!Array.isArray(json)) return json === null || typeof json !== 'object' ? String(json) : undefined
  const items = (json as readonly Json[]).map((item) => lineOf(item))
  if (items.includes(undefined)) return undefined
  if (items.length === 0) return NONE
  return items.length > 1 && items.every((item) => item === items[0])
    ? `${items.length} × ${items[0]!}`
    : items.join(', ')
}

/** What an empty list is called: the spacings of a single wheel. */
const NONE = 'none'

/** More items than any list of the dictionary takes; the review names the limit. */
const MOST_ITEMS = 1000

const quantityText = (entry: QuantityEntry, text: string, system: UnitSystem): string => {
  const bare = readQuantity(text, entry.kind, system)
  if (!bare.ok || entry.kind === 'ratio' || readQuantity(text, entry.kind).ok) return text
  const unit = writeUnit(bare.unit)
  // "6-7/8" is a difference, "6-7/8 in" is not: the unit may only be set where the value stays the same.
  const same = [`${text} ${unit}`, `(${text}) ${unit}`].find((candidate) => {
    const read = readQuantity(candidate, entry.kind)
    return read.ok && read.value === bare.value
  })
  return same ?? writeExact(bare.value, bare.unit)
}

/** "3 × 30 ft, 12 ft": a count before a sign of multiplication repeats an item; undefined where a part says nothing. */
const listOf = (
  entry: Extract<Entry, { is: 'list' }>,
  text: string,
  system: UnitSystem,
): readonly Json[] | undefined => {
  if (text.toLowerCase() === NONE && entry.least === 0) return []
  const parts = partsOf(text)
  if (parts.includes('')) return undefined
  const items = parts.flatMap((part) => {
    const [, times, item] = /^(\d{1,3})\s*[×xX]\s*(.+)$/.exec(part) ?? []
    const count = times === undefined ? 1 : Number(times)
    return Array.from({ length: Math.min(count, MOST_ITEMS) }, () => storedOf(entry.of, item ?? part, system))
  })
  return items.length === 0 || items.length > MOST_ITEMS ? undefined : items
}

/** A comma parts items unless it stands between two digits: "1,250 kip" and "7,5 m" are one item each. */
const partsOf = (text: string): readonly string[] => text.split(/\s*(?:;|\||,(?!\d)|(?<!\d),)\s*/)

const eitherOf = (forms: readonly Entry[], text: string, system: UnitSystem): Json => {
  if (forms.some((form) => form.is === 'choice' && form.of.includes(text))) return text
  const list = forms.find((form) => form.is === 'list')
  if (list && (partsOf(text).length > 1 || /^\d+\s*[×xX]/.test(text))) return storedOf(list, text, system)
  const single = forms.find((form) => form.is !== 'choice' && form.is !== 'list' && form.is !== 'object')
  return single ? storedOf(single, text, system) : text
}
