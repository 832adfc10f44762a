import { describe, expect, test } from 'vitest'
import { catalogue } from '../../core/catalogue/load.ts'
import { as } from '../../core/quantity/kinds.ts'
import { UNIT } from '../../core/quantity/units.ts'
import { sectionName } from '../../core/section/name.ts'
import { plate, plated } from './make-up.ts'

const shape = catalogue.iShape('W27X84')!
const inches = (value: number) => as('length', value * UNIT.in)

describe('a make-up is named as on a drawing', () => {
  test('rolled, with a channel, with a plate', () => {
    const channel = catalogue.channel('C15X33.9')!
    expect(sectionName({ kind: 'rolled', shape }, 'us')).toBe('W27X84')
    expect(sectionName({ kind: 'rolled', shape, cap: { kind: 'channel', channel } }, 'si')).toBe('W27X84 + C15X33.9')
    const cap = { kind: 'plate', plate: { width: inches(12), thickness: inches(0.375) } } as const
    expect(sectionName({ kind: 'rolled', shape, cap }, 'us')).toBe('W27X84 + PL 12x3/8 in')
  })

  test('plates in the units of the job: sixteenths where they are, else decimals', () => {
    const metric = plated(plate(0.35, 0.02), 0.65, 0.008, plate(0.25, 0.014))
    expect(sectionName(metric, 'si')).toBe('PL 350x20 / 650x8 / 250x14 mm')
    expect(sectionName(metric, 'us')).toBe('PL 13.7795x0.7874 / 25.5906x0.315 / 9.8425x0.5512 in')
    const imperial = plated({ width: inches(23), thickness: inches(1.25) }, inches(48), inches(0.625), {
      width: inches(16),
      thickness: inches(1.0625),
    })
    expect(sectionName(imperial, 'us')).toBe('PL 23x1 1/4 / 48x5/8 / 16x1 1/16 in')
  })
})
