/** The MathML of a line as a tree, and back. Only what the formula room writes is read. */

export interface Element {
  readonly name: string
  /** As written, with the space before. */
  readonly attributes: string
  readonly children: readonly Element[]
  /** Of a leaf, with entities as written. */
  readonly text: string
}

/** The parts of the outermost row of `<math><mrow>...</mrow></math>`; none of an empty text. */
export function partsOf(mathml: string): readonly Element[] {
  const [math] = read(mathml)
  if (math === undefined) return []
  const [only] = math.children
  return math.children.length === 1 && only?.name === 'mrow' ? only.children : math.children
}

/** A math element with these parts in one row. */
export const mathOf = (parts: readonly Element[]): string =>
  `<math xmlns="http://www.w3.org/1998/Math/MathML" display="block"><mrow>${parts.map(markup).join('')}</mrow></math>`

export const leaf = (name: string, text: string): Element => ({ name, attributes: '', children: [], text })

export const row = (children: readonly Element[]): Element => ({ name: 'mrow', attributes: '', children, text: '' })

const markup = ({ name, attributes, children, text }: Element): string =>
  `<${name}${attributes}>${text}${children.map(markup).join('')}</${name}>`

function read(text: string): readonly Element[] {
  interface Open {
    name: string
    attributes: string
    children: Element[]
    text: string
  }
  const root: Open = { name: '', attributes: '', children: [], text: '' }
  const open: Open[] = [root]
  for (const [, closing, name = '', attributes = '', single, words = ''] of text.matchAll(TOKEN)) {
    const top = open.at(-1)!
    if (words !== '') top.text += words
    else if (closing === '/') {
      open.pop()
      const parent = open.at(-1)
      if (parent === undefined || top.name !== name) throw new Error(`formula is not well formed at </${name}>`)
      parent.children.push(top)
    } else if (single === '/') top.children.push({ name, attributes, children: [], text: '' })
    else open.push({ name, attributes, children: [], text: '' })
  }
  if (open.length > 1) throw new Error(`formula is not well formed: ${open.at(-1)!.name} is left open`)
  return root.children
}

const TOKEN = /<(\/?)([a-z]+)((?: [a-z]+="[^"]*")*)\s*(\/?)>|([^<]+)/g
