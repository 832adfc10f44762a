/** A formula as outlines: MathML typeset by MathJax, taken over glyph by glyph. Lengths in thousandths of an em, y upward. */
import { MathJaxStix2Font } from '@mathjax/mathjax-stix2-font/js/svg.js'
import { liteAdaptor, type LiteAdaptor } from '@mathjax/src/js/adaptors/liteAdaptor.js'
import { LiteElement, type LiteNode } from '@mathjax/src/js/adaptors/lite/Element.js'
import { RegisterHTMLHandler } from '@mathjax/src/js/handlers/html.js'
import { MathML } from '@mathjax/src/js/input/mathml.js'
import { mathjax } from '@mathjax/src/js/mathjax.js'
import { SVG } from '@mathjax/src/js/output/svg.js'
import './glyphs.ts'

type Box = readonly [x: number, y: number, width: number, height: number]

/** One outline or bar, scaled and moved into its place. */
export interface Mark {
  readonly scaleX: number
  readonly scaleY: number
  readonly x: number
  readonly y: number
  /** Outline of a glyph in its own coordinates, or a bar. */
  readonly outline: string | Box
  /** Nothing shows outside of it, in the coordinates of the formula. */
  readonly clip?: Box
}

export interface Drawing {
  readonly width: number
  readonly ascent: number
  readonly depth: number
  readonly marks: readonly Mark[]
  /** Where each part of the outermost row begins. */
  readonly starts: readonly number[]
  /** Characters that the typeface of formulas lacks. */
  readonly lacking: readonly string[]
}

/**
 * Typesets one math element, `<math><mrow>...</mrow></math>`. Throws where MathJax reports an error, which the formula room
 * never gives cause for.
 */
export function typeset(mathml: string): Drawing {
  const { convert, adaptor } = (jax ??= start())
  const svg = adaptor.firstChild(convert(mathml.replace('<math', `<math scriptminsize="${SMALLEST}em"`))) as LiteElement
  const [, top = 0, width = 0, height = 0] = numbers(attributeOf(adaptor, svg, 'viewBox'))
  const found: Found = { marks: [], lacking: [] }
  // The page of the library has y downward; its outermost group turns it round.
  for (const child of svg.children) walk(adaptor, child, { scaleX: 1, scaleY: -1, x: 0, y: 0 }, found)
  return { width, ascent: -top, depth: height + top, ...found, starts: startsOf(adaptor, svg) }
}

/** Characters of a MathML text that the typeface of formulas lacks; each is tried once. */
export function lackingIn(mathml: string): readonly string[] {
  const words = mathml.replace(/<[^>]*>/g, '')
  return Array.from(new Set(words.match(/[^\x20-\x7e\u2061-\u2064]/gu) ?? [])).filter((character) => {
    let drawn = drawable.get(character)
    if (drawn === undefined) {
      drawn = typeset(`<math><mrow><mtext>${character}</mtext></mrow></math>`).lacking.length === 0
      drawable.set(character, drawn)
    }
    return !drawn
  })
}

const drawable = new Map<string, boolean>()

/** Scripts of scripts are not set smaller than this: a page is read by lamp light, and copied. */
const SMALLEST = 0.6

interface Place {
  readonly scaleX: number
  readonly scaleY: number
  readonly x: number
  readonly y: number
  readonly clip?: Box
}

interface Found {
  readonly marks: Mark[]
  readonly lacking: string[]
}

interface Jax {
  readonly adaptor: LiteAdaptor
  readonly convert: (mathml: string) => LiteElement
}

let jax: Jax | undefined

function start(): Jax {
  // All glyphs are there already (glyphs.ts), so that there is nothing to load.
  mathjax.asyncLoad = (): undefined => undefined
  mathjax.asyncIsSynchronous = true
  const adaptor = liteAdaptor()
  RegisterHTMLHandler(adaptor)
  const document = mathjax.document('', {
    InputJax: new MathML(),
    OutputJax: new SVG({ fontData: MathJaxStix2Font, fontCache: 'none', displayOverflow: 'overflow' }),
    compileError: (_document: unknown, _math: unknown, error: Error) => {
      throw error
    },
    typesetError: (_document: unknown, _math: unknown, error: Error) => {
      throw error
    },
  })
  const options = { display: true, em: 16, ex: 8, containerWidth: 1_000_000 }
  return { adaptor, convert: (mathml) => document.convert(mathml, options) as LiteElement }
}

function walk(adaptor: LiteAdaptor, node: LiteNode, at: Place, found: Found): void {
  if (!(node instanceof LiteElement)) return
  const place = moved(at, attributeOf(adaptor, node, 'transform'))
  const attribute = (name: string): number => Number.parseFloat(attributeOf(adaptor, node, name) ?? '0')
  const within = (inner: Place): void => {
    for (const child of node.children) walk(adaptor, child, inner, found)
  }
  switch (node.kind) {
    case 'path': {
      const outline = attributeOf(adaptor, node, 'd')
      if (outline !== '' && outline !== undefined) found.marks.push({ ...place, outline })
      return
    }
    case 'rect':
      found.marks.push({
        ...place,
        outline: [attribute('x'), attribute('y'), attribute('width'), attribute('height')],
      })
      return
    case 'text':
      found.lacking.push(...Array.from(adaptor.textContent(node)))
      return
    case 'svg': {
      // The stretched part of a bracket, cut at its edges.
      const [left = 0, top = 0, width = 0, height = 0] = numbers(attributeOf(adaptor, node, 'viewBox'))
      const corner = moved(place, `translate(${attribute('x')},${attribute('y')})`)
      const clip: Box = [corner.x, corner.y, width * corner.scaleX, height * corner.scaleY]
      within({ ...moved(corner, `translate(${-left},${-top})`), clip })
      return
    }
    default:
      within(place)
  }
}

/** A place after a further transform: moves and scales are all that the library writes. */
function moved(at: Place, transform: string | undefined): Place {
  let place = at
  for (const [, name = '', inner = ''] of (transform ?? '').matchAll(/(\w+)\(([^)]*)\)/g)) {
    const [a = 0, b] = numbers(inner)
    if (name === 'translate') place = { ...place, x: place.x + place.scaleX * a, y: place.y + place.scaleY * (b ?? 0) }
    else if (name === 'scale') place = { ...place, scaleX: place.scaleX * a, scaleY: place.scaleY * (b ?? a) }
    else throw new Error(`unknown transform ${name}`)
  }
  return place
}

function startsOf(adaptor: LiteAdaptor, svg: LiteElement): number[] {
  let row: LiteElement = svg
  for (const name of ['', 'math', 'mrow']) {
    const next = row.children.find(
      (child): child is LiteElement =>
        child instanceof LiteElement &&
        child.kind === 'g' &&
        (name === '' || adaptor.getAttribute(child, 'data-mml-node') === name),
    )
    if (next === undefined) throw new Error('a formula is not one row')
    row = next
  }
  return row.children.flatMap((child) =>
    child instanceof LiteElement ? [moved(START, attributeOf(adaptor, child, 'transform')).x] : [],
  )
}

const START: Place = { scaleX: 1, scaleY: 1, x: 0, y: 0 }

/** The library's own type of an attribute is any. */
const attributeOf = (adaptor: LiteAdaptor, node: LiteElement, name: string): string | undefined =>
  adaptor.getAttribute(node, name) as string | undefined

const numbers = (text: string | undefined): number[] => (text ?? '').split(/[\s,]+/).map(Number)
