/** Names as they are looked up, and names that are near to what was typed. */

/** Capitals, spaces and hyphens do not matter; x, X and the multiplication sign are the same. */
export const shapeKey = (name: string): string =>
  name
    .toUpperCase()
    .replace(/[×✕]/g, 'X')
    .replace(/[\s\u2010-\u2015-]/g, '')

/** A rail by its weight: "ASCE 85", "85 lb", "135 LB", "CR 135", "135". */
export const railKey = (name: string): string =>
  shapeKey(name).replace(/^(ASCE|CR|RAIL)+|(LBS?|#)?(\/?YD)?(RAIL)?$/g, '')

/** A steel: "A992", "ASTM A992/A992M", "A572-50", "A572 Gr. 50". */
export const steelKey = (name: string): string =>
  shapeKey(name)
    .replace(/^ASTM/, '')
    .replace(/\/A\d+M/, '')
    .replace(/GRADE|GR\.?/, '')

/**
 * Up to five of `names` nearest to what was typed: first those one slip of the keys away, then those nearest in depth and in
 * weight where a size was typed, else those with the fewest slips. Of a long table only what is near at all.
 */
export function nearestNames(
  names: readonly string[],
  typed: string,
  key: (name: string) => string,
): readonly string[] {
  const wanted = key(typed.slice(0, LONGEST))
  const far = names.length > 20 ? Math.max(2, Math.floor(wanted.length / 2)) : Infinity
  return names
    .map((name) => {
      const slips = editDistance(wanted, key(name))
      const slipped = slips <= 1 && wanted.length > 3
      return { name, slips, slipped, size: sizeDistance(wanted, key(name)), start: sharedStart(wanted, key(name)) }
    })
    .filter((each) => each.size < Infinity || each.slips <= far)
    .sort(
      (a, b) =>
        Number(b.slipped) - Number(a.slipped) || compare(a.size, b.size) || a.slips - b.slips || b.start - a.start,
    )
    .slice(0, 5)
    .map((each) => each.name)
}

/** No name in the tables comes near this length. */
const LONGEST = 40

const compare = (a: number, b: number): number => (a === b ? 0 : a < b ? -1 : 1)

/** How far apart two sizes are, an inch of nominal depth counting as ten pounds per foot; infinite where they have nothing in common. */
function sizeDistance(a: string, b: string): number {
  const [one, other] = [SIZE.exec(a), SIZE.exec(b)]
  if (!one || !other) return Infinity
  const family = one[1] === other[1] ? 0 : 200
  const size = 10 * Math.abs(Number(one[2]) - Number(other[2])) + Math.abs(Number(one[3] ?? 0) - Number(other[3] ?? 0))
  return size > 200 ? Infinity : family + size
}

function sharedStart(a: string, b: string): number {
  let length = 0
  while (length < a.length && a[length] === b[length]) length++
  return length
}

const SIZE = /^([A-Z]*)(\d+(?:\.\d+)?)(?:X(\d+(?:\.\d+)?))?$/

/** Letters to put in, leave out or change (Levenshtein 1966). */
function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, i) => i)
  for (let i = 1; i <= a.length; i++) {
    const next = [i]
    for (let j = 1; j <= b.length; j++) {
      const change = (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1)
      next.push(Math.min(change, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1))
    }
    row = next
  }
  return row[b.length] ?? 0
}
