/** The steels of a girder: which parts each serves, and its strengths at the greatest thickness among those. */
import type { Metre } from '../quantity/kinds.ts'
import type { SteelEntry } from './types.ts'
import { findAt, seen, type Walked } from './walk.ts'

export const STEELS = ['girder.steel', 'girder.capSteel', 'girder.plateSteel'] as const

export type SteelPath = (typeof STEELS)[number]

/**
 * The steel entered at a path, or undefined once a finding is noted: no strength is listed for its thickness, or no part is
 * of this steel. Strengths by thickness are those of the thickest part it serves.
 */
export const steelOf = (walked: Walked, path: SteelPath): SteelEntry | undefined => {
  const E = seen(walked, `${path}.E`)
  const parts = thicknesses(walked)
  const served = parts.filter(({ steel }) => steel === path).map(({ thickness }) => thickness)
  if (path !== 'girder.steel' && parts.length > 0 && served.length === 0) {
    findAt(walked, path, [], 'no part of the section is of this steel; leave it out')
    return undefined
  }
  if (E === undefined) return undefined
  const listed = seen(walked, `${path}.name`)
  if (!listed) {
    const fy = seen(walked, `${path}.fy`)
    const fu = seen(walked, `${path}.fu`)
    return fy === undefined || fu === undefined ? undefined : { name: 'as entered', fy, fu, E }
  }
  const greatest = Math.max(0, ...served)
  // "203.2 mm" must not fall beyond a step that ends at 8 in by its last digit.
  const step = listed.steps.find(({ upTo }) => upTo === undefined || greatest <= upTo * (1 + 1e-9))
  if (step) return { name: listed.name, fy: step.fy, fu: step.fu, E }
  findAt(
    walked,
    `${path}.name`,
    [],
    `no strength is listed for a thickness of ${Number((greatest * 1000).toPrecision(6))} mm`,
  )
  return undefined
}

/** The thickness of every part of the section as far as it was read, with the steel that the part is of. */
const thicknesses = (walked: Walked): readonly { readonly thickness: Metre; readonly steel: SteelPath }[] => {
  const plateSteel: SteelPath = seen(walked, 'girder.plateSteel') ? 'girder.plateSteel' : 'girder.steel'
  const shape = seen(walked, 'girder.section.shape')
  const rolled =
    shape === true
      ? [seen(walked, 'girder.section.shape.tf'), seen(walked, 'girder.section.shape.tw')]
      : [shape?.tf, shape?.tw]
  const plates = [
    seen(walked, 'girder.section.topFlange.thickness'),
    seen(walked, 'girder.section.web.thickness'),
    seen(walked, 'girder.section.bottomFlange.thickness'),
  ]
  const channel = seen(walked, 'girder.section.cap.shape')
  const capPlate = seen(walked, 'girder.section.cap.plate.thickness')
  const capSteel = seen(walked, 'girder.capSteel') ? 'girder.capSteel' : undefined
  const of = (values: readonly (Metre | undefined)[], steel: SteelPath) =>
    values.flatMap((thickness) => (thickness === undefined ? [] : [{ thickness, steel }]))
  return [
    ...of(rolled, 'girder.steel'),
    ...of(plates, plateSteel),
    ...of([channel?.tf, channel?.tw], capSteel ?? 'girder.steel'),
    ...of([capPlate], capSteel ?? plateSteel),
  ]
}
