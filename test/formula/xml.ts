/** A checker of MathML as text: elements closed in order, entities known, as many children as each element takes. */

const CHILDREN: Readonly<Record<string, number>> = { mfrac: 2, msub: 2, msup: 2, mroot: 2 }
const LEAVES = ['mi', 'mn', 'mo', 'mtext', 'mspace']
const KNOWN = [...LEAVES, ...Object.keys(CHILDREN), 'math', 'mrow', 'msqrt']

/** What is wrong with a text that should be one well-formed math element. */
export function faultsOf(text: string): readonly string[] {
  const faults: string[] = []
  const open: { name: string; children: number; text: string }[] = []
  const root = { name: '', children: 0, text: '' }
  let rest = text
  const top = () => open.at(-1) ?? root
  while (rest !== '') {
    const tag = /^<(\/?)([a-z]+)((?: [a-z]+="[^"<&]*")*)(\/?)>/.exec(rest)
    if (tag) {
      const [all, closing, name = '', , single] = tag
      rest = rest.slice(all.length)
      if (!KNOWN.includes(name)) faults.push(`unknown element ${name}`)
      if (closing === '/') {
        const element = open.pop()
        if (element?.name !== name) faults.push(`${name} closes ${element?.name ?? 'nothing'}`)
        else if (name in CHILDREN && element.children !== CHILDREN[name]) faults.push(`${name} of ${element.children}`)
        else if (LEAVES.includes(name) && (element.text === '' || element.children > 0)) faults.push(`bad ${name}`)
        else if (!LEAVES.includes(name) && element.text !== '') faults.push(`text "${element.text}" in ${name}`)
        continue
      }
      top().children += 1
      if (single !== '/') open.push({ name, children: 0, text: '' })
      continue
    }
    const piece = /^(?:[^<>&"]|&(?:amp|lt|gt|quot);)+/.exec(rest)?.[0]
    if (piece === undefined) return [...faults, `stray ${rest.slice(0, 20)}`]
    top().text += piece
    rest = rest.slice(piece.length)
  }
  if (open.length > 0) faults.push(`${open.length} elements left open`)
  if (root.children !== 1 || root.text !== '') faults.push('not one element')
  return faults
}
