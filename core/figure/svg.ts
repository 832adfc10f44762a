/** A figure as SVG: geometry in attributes, looks by class alone, so that it passes a policy without inline style. */
import { arrowParts } from './arrow.ts'
import type { Figure, Fill, Item, Point, Role } from './types.ts'

/**
 * Classes: `figure`; `role-ink` and so on for strokes, `fill-shade` and so on for areas, `text role-dimension` for texts,
 * `head role-ink` for arrow heads. Hatches are the patterns `figure-hatch` and `figure-accent-hatch`, their lines of the classes
 * `hatch-line` and `accent-hatch-line`. User units are millimetres on paper.
 */
export const svgOf = ({ width, height, items, alt }: Figure): string => {
  const size = `${number(width)} ${number(height)}`
  const body = items.map(element).join('')
  return `<svg xmlns="http://www.w3.org/2000/svg" class="figure" viewBox="0 0 ${size}" role="img" aria-label="${escaped(alt)}">${HATCHES}${body}</svg>`
}

const hatch = (name: string): string =>
  `<pattern id="figure-${name}" width="1.6" height="1.6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><line x1="0" y1="0" x2="0" y2="1.6" class="${name}-line"/></pattern>`

const HATCHES = `<defs>${hatch('hatch')}${hatch('accent-hatch')}</defs>`

const element = (item: Item): string => {
  switch (item.item) {
    case 'line':
      return `<polyline points="${points(item.points)}" class="${role(item.role)} fill-none"/>`
    case 'area':
      return `<polygon points="${points(item.points)}" class="${outline(item.role)} ${fill(item.fill)}"/>`
    case 'circle': {
      const [x, y] = item.centre
      return `<circle cx="${number(x)}" cy="${number(y)}" r="${number(item.radius)}" class="${role(item.role)} ${fill(item.fill)}"/>`
    }
    case 'arrow': {
      const { shaft, head } = arrowParts(item)
      return `<polyline points="${points(shaft)}" class="${role(item.role)} fill-none"/><polygon points="${points(head)}" class="head ${role(item.role)}"/>`
    }
    case 'text': {
      const [x, y] = item.at.map(number) as [string, string]
      const turn = item.turn === undefined ? '' : ` transform="rotate(${number(item.turn)} ${x} ${y})"`
      return `<text x="${x}" y="${y}"${turn} text-anchor="${item.anchor}" class="text ${role(item.role)}">${escaped(item.text)}</text>`
    }
  }
}

const role = (of: Role): string => `role-${of}`
const outline = (of: Role | undefined): string => (of === undefined ? 'role-none' : role(of))
const fill = (of: Fill | undefined): string =>
  `fill-${of === undefined ? 'none' : of === 'accentHatch' ? 'accent-hatch' : of}`

const points = (list: readonly Point[]): string => list.map(([x, y]) => `${number(x)},${number(y)}`).join(' ')

/** To a thousandth of a millimetre. */
const number = (value: number): string => {
  if (!Number.isFinite(value)) throw new RangeError(`${value} mm cannot be drawn`)
  const text = value.toFixed(3).replace(/\.?0+$/, '')
  return text === '-0' ? '0' : text
}

const escaped = (text: string): string =>
  text.replace(/[&<>"']/g, (sign) => ENTITIES[sign] ?? sign).replace(CONTROLS, '\ufffd')

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

/** What XML 1.0 does not allow. */
// eslint-disable-next-line no-control-regex -- these are the characters that must go
const CONTROLS = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g
