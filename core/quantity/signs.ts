/** One spelling for the many signs that look alike: minus signs, primes, fractions, superscripts, spaces. */

/** The text in plain signs, or the first sign that cannot be part of a quantity, named. */
export function plainSigns(text: string): { readonly text: string } | { readonly strange: string } {
  const plain = text
    .replace(/[¼-¾⅐-⅞]/g, (sign) => ` ${sign.normalize('NFKC').replace('\u2044', '/')} `)
    .replace(/[⁻⁺]?[⁰¹²³⁴-⁹]+/g, (run) => `^${run.replace(/./g, (sign) => sign.normalize('NFKC'))} `)
    .replace(/[\u2010-\u2014\u2212]/g, '-')
    .replace(/[×✕✖]/g, '*')
    .replace(/[÷\u2044\u2215]/g, '/')
    .replace(/[⋅•∙]/g, '·')
    .replace(/[′’‘´]/g, "'")
    .replace(/[″”“]|''/g, '"')
    .replace(GROUPS, (groups) => groups.replace(/\D/g, ''))
    .replace(/\s+/g, ' ')
    .trim()
  const strange = /[^ -~·]/u.exec(plain)?.[0]
  return strange === undefined ? { text: plain } : { strange: nameOf(strange) }
}

/** A sign that prints, in quotes; any other by its number alone, so that it cannot disturb the line it stands in. */
function nameOf(sign: string): string {
  const number = `U+${(sign.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`
  return /^[\p{L}\p{N}\p{P}\p{S}]$/u.test(sign) && !RIGHT_TO_LEFT.test(sign) ? `“${sign}” (${number})` : number
}

/** What was read, in quotes and shortened, without signs that could disturb the line it stands in. */
export function echo(text: string): string {
  const safe = text.replace(/[^\p{L}\p{N}\p{P}\p{S} ]|[\u0590-\u08FF\uFB1D-\uFDFF\uFE70-\uFEFC]/gu, (sign) => {
    return `\\u{${(sign.codePointAt(0) ?? 0).toString(16).toUpperCase()}}`
  })
  const signs = Array.from(safe)
  return `“${signs.length > 60 ? `${signs.slice(0, 59).join('')}…` : safe}”`
}

/** Digits in groups of three parted by no-break or thin spaces. */
const GROUPS = /(?<![\d.,/])\d{1,3}(?:[\u00A0\u2007\u2009\u202F]\d{3})+(?!\d| ?\/)/g

/** Scripts written from right to left. */
const RIGHT_TO_LEFT = /[\u0590-\u08FF\uFB1D-\uFDFF\uFE70-\uFEFC]/
