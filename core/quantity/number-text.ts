/** Numbers as people write them: thousands commas, decimal commas, powers of ten. */

/** A number, or the two numbers that it may be where a comma can be read both ways. */
export type NumberText =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'ambiguous'; readonly thousands: number; readonly decimal: number }
  | { readonly kind: 'refused'; readonly why: string }

/**
 * Reads digits with points and commas, and an exponent of ten. Commas that part groups of three are thousands where there are
 * several, or a point follows; a comma that does not is a decimal comma; "1,250" alone may be either.
 */
export function readNumber(digits: string, exponent: number): NumberText {
  const number = (text: string): NumberText => {
    const value = Number(`${text}e${exponent}`)
    if (!Number.isFinite(value)) return refused('is too large a number')
    return value === 0 && /[1-9]/.test(text) ? refused('is too small a number') : { kind: 'number', value }
  }
  if (/^(\d+\.?\d*|\.\d+)$/.test(digits)) return number(digits)
  if (/^[1-9]\d{0,2},\d{3}$/.test(digits)) {
    const thousands = number(digits.replace(',', ''))
    const decimal = number(digits.replace(',', '.'))
    if (thousands.kind !== 'number' || decimal.kind !== 'number') return thousands
    return { kind: 'ambiguous', thousands: thousands.value, decimal: decimal.value }
  }
  if (/^[1-9]\d{0,2}(,\d{3})+(\.\d*)?$/.test(digits)) return number(digits.replaceAll(',', ''))
  if (/^\d*,\d+$/.test(digits)) return number(digits.replace(',', '.'))
  if (/^[1-9]\d{0,2}(\.\d{3})+,\d+$/.test(digits)) return number(digits.replaceAll('.', '').replace(',', '.'))
  return refused(`has “${digits}”, whose points and commas make no number`)
}

const refused = (why: string): NumberText => ({ kind: 'refused', why })
