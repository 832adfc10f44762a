/** How a make-up is called on a drawing. */
import type { Plate, SectionEntry } from '../job/types.ts'
import type { UnitSystem } from '../quantity/kinds.ts'
import { inUnit } from '../quantity/units.ts'

/** "W27X84 + C15X33.9"; plates width by thickness, top flange / web / bottom flange: "PL 23x1 1/4 / 48x5/8 / 16x1 1/4 in". */
export function sectionName(entry: SectionEntry, units: UnitSystem): string {
  const size = units === 'us' ? inches : millimetres
  const plate = ({ width, thickness }: Plate): string => `${size(width)}x${size(thickness)}`
  const { cap } = entry
  const plates =
    entry.kind === 'plated'
      ? `PL ${plate(entry.topFlange)} / ${size(entry.web.depth)}x${size(entry.web.thickness)} / ${plate(entry.bottomFlange)}`
      : entry.shape.name
  const girder = entry.kind === 'plated' ? `${plates} ${units === 'us' ? 'in' : 'mm'}` : plates
  if (cap === undefined) return girder
  return `${girder} + ${cap.kind === 'channel' ? cap.channel.name : `PL ${plate(cap.plate)} ${units === 'us' ? 'in' : 'mm'}`}`
}

const millimetres = (length: number): string => String(Number((length * 1000).toFixed(2)))

/** Sixteenths where the length is a number of them, as a drawing has it; else decimals. */
function inches(length: number): string {
  const value = inUnit(length, 'in')
  const sixteenths = Math.round(value * 16)
  if (Math.abs(value * 16 - sixteenths) > 1e-6) return String(Number(value.toFixed(4)))
  const whole = Math.floor(sixteenths / 16)
  let [over, under] = [sixteenths % 16, 16]
  while (over > 0 && over % 2 === 0) [over, under] = [over / 2, under / 2]
  return over === 0 ? String(whole) : whole === 0 ? `${over}/${under}` : `${whole} ${over}/${under}`
}
