/** A typeset line as pieces between which it may be broken, since MathML itself is never broken in a window. */

/** Relations a line is broken before first, then the signs between terms and factors. */
const RELATIONS: ReadonlySet<string> = new Set(['=', '≤', '≥', '<', '>', '&lt;', '&gt;'])
const SIGNS: ReadonlySet<string> = new Set(['+', '\u2212', '\u00d7', '\u2062'])

const OPEN = /^<math [^>]*><mrow>/
const CLOSE = '</mrow></math>'

/**
 * Sides of an equation or a comparison, each after the first beginning with its relation, and each side's pieces, each after the
 * first beginning with the sign it is broken before. Every piece is a whole `<math>` element.
 * What is not of our own typesetting's form (core/formula/script.ts, `math`) stays in one piece; nothing stays nothing.
 */
export const sidesOf = (mathml: string): readonly (readonly string[])[] => {
  const open = OPEN.exec(mathml)?.[0]
  if (open === undefined || !mathml.endsWith(CLOSE)) return mathml === '' ? [] : [[mathml]]
  const parts = children(mathml.slice(open.length, -CLOSE.length))
  if (parts === undefined) return [[mathml]]
  const sides: string[][][] = [[[]]]
  for (const part of parts) {
    const sign = /^<mo>([^<]*)<\/mo>$/.exec(part)?.[1] ?? ''
    const [side, breaks] = [RELATIONS.has(sign), RELATIONS.has(sign) || SIGNS.has(sign)]
    const before = sides.at(-1)!.at(-1)!
    if (breaks && before.length > 0 && !endsInSign(before)) {
      if (side) sides.push([[]])
      else sides.at(-1)!.push([])
    }
    const piece = sides.at(-1)!.at(-1)!
    // At the head of a row a sign would be set as a sign of its own number: "infix" keeps the room about it.
    piece.push(breaks && piece.length === 0 ? part.replace('<mo>', '<mo form="infix">') : part)
  }
  return sides.map((side) => side.map((piece) => `${open}${piece.join('')}${CLOSE}`))
}

/** A sign just before belongs with this one: "= −3". */
const endsInSign = (piece: readonly string[]): boolean => /^<mo( form="infix")?>[^<]*<\/mo>$/.test(piece.at(-1)!)

/** The elements side by side in a piece of MathML; undefined where it is not well formed. */
const children = (inner: string): readonly string[] | undefined => {
  const found: string[] = []
  let [depth, start, end] = [0, 0, 0]
  for (const { 0: tag, index } of inner.matchAll(/<(\/?)[a-z]+[^>]*>/g)) {
    if (depth === 0 && index !== end) return undefined
    if (tag.startsWith('</')) depth -= 1
    else if (!tag.endsWith('/>')) depth += 1
    if (depth < 0) return undefined
    if (depth > 0) continue
    end = index + tag.length
    found.push(inner.slice(start, end))
    start = end
  }
  return depth === 0 && end === inner.length ? found : undefined
}
