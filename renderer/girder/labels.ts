/** What is written at a diagram's lines: the greatest value now, and for shear the envelope's ends, none over another. */
import { as, type UnitSystem } from '../../core/quantity/kinds.ts'
import { inUnit, shownUnit } from '../../core/quantity/units.ts'
import { writeNumber, writeQuantity } from '../../core/quantity/write.ts'
import { textWidth } from '../../core/figure/text.ts'
import { HANGS, KIND_OF, type Bounds, type Effect, type Peak } from './diagram-data.ts'
import { stationText } from './standing.ts'

export interface Label {
  readonly text: string
  readonly role: 'ink' | 'soft'
  /** Above the diagram's highest ordinate or below its lowest. */
  readonly row: 'above' | 'below'
  /** Left edge, px. */
  readonly left: number
}

/** A value in the unit shown, with its unit: where no heading tells it. */
export const quantityText = (effect: Effect, value: number, units: UnitSystem): string => {
  const kind = KIND_OF[effect]
  return writeQuantity({ kind, value: as(kind, value) }, units)
}

/** The figure alone: the diagram's heading and the table's caption name the unit. */
export const valueText = (effect: Effect, value: number, units: UnitSystem): string =>
  writeNumber(inUnit(value, shownUnit(KIND_OF[effect], units)))

/** Pixels that a text takes, at most. */
const pixelsOf = (text: string, perMillimetre: number): number => textWidth(text) * perMillimetre

/** Kept free between two labels, px. */
const GAP = 8

export interface Place {
  readonly toPixels: (station: number) => number
  readonly perMillimetre: number
  /** Of the diagram, px. */
  readonly pixels: number
}

/** The value at the peak, beside its place; the ends of the shear envelope give way to it. */
export const labelsOf = (
  effect: Effect,
  peak: Peak | undefined,
  ends: readonly { readonly x: number; readonly value: number }[],
  units: UnitSystem,
  { toPixels, perMillimetre, pixels }: Place,
): readonly Label[] => {
  const place = (text: string, x: number, role: Label['role'], row: Label['row'], anchor: number): Label => {
    const width = pixelsOf(text, perMillimetre)
    return { text, role, row, left: Math.max(0, Math.min(toPixels(x) - anchor * width, pixels - width)) }
  }
  const rowOf = (value: number): Label['row'] => (value > 0 === HANGS[effect] ? 'below' : 'above')
  const mark =
    peak === undefined
      ? []
      : [
          place(
            `${valueText(effect, peak.y, units)} at ${stationText(peak.x, units)}${peak.where}`,
            peak.x,
            'ink',
            rowOf(peak.y),
            0.5,
          ),
        ]
  const clear = (label: Label): boolean =>
    mark.every(
      (other) =>
        other.row !== label.row ||
        label.left + pixelsOf(label.text, perMillimetre) + GAP <= other.left ||
        other.left + pixelsOf(other.text, perMillimetre) + GAP <= label.left,
    )
  const written = ends
    .filter(({ value }) => value !== 0)
    .map(({ x, value }, i) => place(valueText(effect, value, units), x, 'soft', rowOf(value), i === 0 ? 0 : 1))
  return [...mark, ...written.filter(clear)]
}

/** The envelope's ordinates worth writing: of shear at either end, where they are greatest. */
export const endsOf = (
  effect: Effect,
  envelope: readonly (Record<Effect, Bounds> & { readonly x: number })[],
): readonly { readonly x: number; readonly value: number }[] => {
  const [first, last] = [envelope[0], envelope.at(-1)]
  if (effect !== 'shear' || first === undefined || last === undefined) return []
  return [
    { x: first.x, value: first.shear.max },
    { x: last.x, value: last.shear.min },
  ]
}
