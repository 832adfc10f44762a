/** The worst place of a sum of moments, dressed as an extreme and proved. */
import { as } from '../quantity/kinds.ts'
import type { WheelTrain } from '../crane/types.ts'
import { apart, contactGoverns } from './apart.ts'
import { spanOf, withinSpan } from './influence.ts'
import { EQUAL } from './passage.ts'
import { inOrder, onSpan, placed, stationsOf, worse, type Way } from './place.ts'
import { momentAt, proveEquilibrium, proveValue, shearAt, sizeOf, type Standing } from './statics.ts'
import { stationAt, sweep, type SweepTerm } from './sweep.ts'
import type { Drive, EffectOf, Extreme, MomentTerm } from './types.ts'

/** Effects as drive.ts checked them. */
export const driveMoments = (
  { beam, span, train: index }: Drive,
  train: WheelTrain | undefined,
  ways: readonly Way[],
  { terms }: EffectOf<'moments'>,
): Extreme => {
  const { start, length } = spanOf(beam, span)
  const searched = terms.filter(({ at }) => at !== 'same')
  const termsOf = (way: Way): SweepTerm[] =>
    searched.map(({ factor, at, wheels, uniform, ends: [left, right] }) => ({
      factor,
      at: typeof at === 'number' ? withinSpan(beam, span, at) : undefined,
      weights: inOrder(way, wheels),
      uniform,
      left,
      right,
    }))
  const rowOf = (offsets: Float64Array) => ({ length, offsets, moves: new Uint8Array(offsets.length).fill(1) })
  const found = ways.map((way) => ({ way, ...sweep(rowOf(way.offsets), termsOf(way)) })).reduce(worse)
  const { way } = found
  const row = rowOf(way.offsets)
  let stations = stationsOf(train, way.mirrored, start + found.lead)
  let value = found.value
  let method: Extreme['method'] = 'exact'
  let standing = row
  let lead = found.lead
  if (train !== undefined && train.cranes.length > 1) {
    const cranes = way.order.map((i) => train.wheels[i]!.crane)
    if (!contactGoverns(row, cranes, termsOf(way))) {
      const free = apart(row, cranes, termsOf(way), found)
      method = 'refined'
      if (free.value > value + EQUAL * Math.abs(value)) {
        value = free.value
        standing = { ...row, offsets: free.stations }
        lead = 0
        stations = stations.map((_, i) => start + free.stations[way.order.indexOf(i)]!)
      }
    }
  }

  const sections = termsOf(way).map((term) => stationAt(standing, term, lead))
  const places = terms.map((term) => (term.at === 'same' ? sections[0]! : sections[searched.indexOf(term)]!))
  const on = onSpan(beam, span, stations)
  const loaded = (term: MomentTerm): Standing => ({
    length,
    loads: on.map(({ wheel, x }) => ({ x, force: term.wheels[wheel]! })),
    uniform: term.uniform,
    left: term.ends[0],
    right: term.ends[1],
  })
  const read = terms.map((term, t) => {
    const moment = momentAt(loaded(term), places[t]!)
    proveEquilibrium(loaded(term), places[t]!)
    return { station: as('distance', start + places[t]!), value: as('moment', moment) }
  })
  const first = loaded(terms[0]!)
  const total = terms.reduce((sum, { factor }, t) => sum + factor * read[t]!.value, 0)
  const size = terms.reduce((sum, { factor }, t) => sum + Math.abs(factor) * sizeOf(loaded(terms[t]!)), 0)
  proveValue(value, total, size)
  return {
    value,
    span,
    station: read[0]!.station,
    side: 'at',
    ...placed(index, train, way.mirrored, stations),
    on: on.map(({ wheel }) => wheel),
    terms: read,
    with: { moment: read[0]!.value, shear: as('force', shearAt(first, places[0]!)) },
    method,
  }
}
