/** A calc sheet of an invented plant with every block and every kind of line; its numbers do not belong together. */
import { as, type UnitSystem } from '../../core/quantity/kinds.ts'
import type { Figure } from '../../core/figure/types.ts'
import { chapter } from '../../core/formula/chapter.ts'
import type { Line } from '../../core/formula/types.ts'
import { writeWorking } from '../../core/formula/write.ts'
import { working } from '../../core/formula/working.ts'
import type { Block, Sheet } from '../../core/sheet/types.ts'
import { F2_2, F2_4, F2_6, F2_LTB, girder, of } from '../formula/examples.ts'

const F2 = chapter('AISC 360-22', 'F2')

/** A chain of sums, roots and fractions longer than any line of a page. */
const LONG = F2.formula('F2-5', {
  gives: ['F_n', 'stress'],
  where: { F_y: 'stress', E: 'stress', L_b: 'length', r_ts: 'length', C_b: 'ratio' },
  text: 'F_y*(L_b/r_ts)/(L_b/r_ts + C_b) + 0.078*E*(C_b/(L_b/r_ts))^2 - sqrt(F_y*E)*(C_b + 0.3)/(L_b/r_ts)^2 + F_y/(C_b + L_b/r_ts + (L_b/r_ts)^2 + (L_b/r_ts)^3 + (L_b/r_ts)^4) + sqrt(F_y^2*(L_b/r_ts + C_b + 2.5)/(L_b/r_ts + 3) + E*F_y/(L_b/r_ts + C_b)^2 + (0.7*F_y)^2 + (E/500)^2)',
})

/** Every kind of line: given, formula, bound, condition, row, iteration, comparison that fails, note. */
export function lines(system: UnitSystem): readonly Line[] {
  const written = working()
  written.given('L_b', 'distance', girder.L_b, 'the span, no bracing in it', F2.clause('F2.2'))
  written.note('The unbraced length is the span, since nothing holds the top flange between the brackets.')
  written.row('shapes', 'W27X84', [
    ['S_x', 'modulus', girder.S_x],
    ['Z_x', 'modulus', girder.Z_x],
    ['r_ts', 'length', girder.r_ts],
  ])
  written.take(F2_6, girder)
  written.take(F2_4, girder)
  written.take(F2_2, girder)
  written.take(F2_LTB, girder)
  written.take(LONG, { ...girder, L_b: as('length', girder.L_b) })
  written.iterate('x', 'ratio', 0.4142, 1e-10, 9, 'where the moment is greatest')
  written.compare('M_u', { kind: 'moment', value: of('moment', 1100, 'kip ft') }, '<=', 'phi_b M_n', {
    kind: 'moment',
    value: of('moment', 889, 'kip ft'),
  })
  return writeWorking(written, system)
}

const short = (system: UnitSystem): readonly Line[] => {
  const written = working()
  written.take(F2_LTB, { ...girder, L_b: of('distance', 6, 'ft') })
  return writeWorking(written, system)
}

const figure: Figure = {
  width: 170,
  height: 52,
  alt: 'A span of 30 ft with two wheels of 88.2 kip at 12.08 ft and 23.75 ft; the resultant stands 2.92 ft right of midspan.',
  items: [
    {
      item: 'area',
      points: [
        [10, 26],
        [160, 26],
        [160, 28],
        [10, 28],
      ],
      fill: 'paper',
      role: 'ink',
    },
    { item: 'arrow', from: [70, 12], to: [70, 26], role: 'ink' },
    { item: 'arrow', from: [128, 12], to: [128, 26], role: 'ink' },
    { item: 'text', at: [70, 10], text: '88.2 kip', role: 'ink', anchor: 'middle' },
    { item: 'text', at: [128, 10], text: '88.2 kip', role: 'ink', anchor: 'middle' },
    {
      item: 'line',
      points: [
        [99, 10],
        [99, 31],
      ],
      role: 'accent',
    },
    { item: 'text', at: [100.5, 18], text: 'resultant 176.4 kip', role: 'accent', anchor: 'start' },
    {
      item: 'line',
      points: [
        [85, 22],
        [85, 33],
      ],
      role: 'centre',
    },
    {
      item: 'line',
      points: [
        [10, 40],
        [160, 40],
      ],
      role: 'dimension',
    },
    { item: 'text', at: [40, 38.6], text: '12.08 ft', role: 'dimension', anchor: 'middle' },
    { item: 'text', at: [99, 38.6], text: '11.67 ft', role: 'dimension', anchor: 'middle' },
    { item: 'text', at: [144, 38.6], text: '6.25 ft', role: 'dimension', anchor: 'middle' },
    { item: 'text', at: [4, 34], text: 'elevation', role: 'hair', anchor: 'start', turn: -90 },
    {
      item: 'area',
      points: [
        [10, 43],
        [70, 50],
        [128, 48],
        [160, 43],
      ],
      fill: 'shade',
      role: 'envelope',
    },
    { item: 'circle', centre: [70, 50], radius: 0.9, fill: 'solid', role: 'ink' },
    {
      item: 'area',
      points: [
        [6, 28],
        [14, 28],
        [14, 33],
        [6, 33],
      ],
      fill: 'hatch',
      role: 'thin',
    },
    {
      item: 'area',
      points: [
        [156, 28],
        [164, 28],
        [164, 33],
        [156, 33],
      ],
      fill: 'accentHatch',
    },
  ],
}

/** Words of about this number, in one paragraph. */
export const manyWords = (count: number): string =>
  Array.from(
    { length: count },
    (_, index) => ['girder', 'runway', 'survey', 'of', 'the', 'rail', 'Balkenlänge'][index % 7],
  ).join(' ')

/** The sheet; more blocks can be put behind its own. */
export function sampleSheet(system: UnitSystem = 'us', more: readonly Block[] = []): Sheet {
  const checks = [
    'Strong axis, lateral\u2013torsional buckling',
    'Biaxial bending with side thrust',
    'Web under the wheel, crippling',
  ]
  return {
    title: {
      project: 'Tarn Hollow Foundry (invented)',
      subject: 'North bay, line B, girder B4\u2013B5',
      number: '1187-S-04',
      revision: 'C',
      preparedBy: 'Α. Παπαδόπουλος',
      checkedBy: '',
      date: '2025-03-14',
    },
    units: system,
    program: 'Longtravel 0.1.0',
    fingerprint: '9f3c71a05be2d4189f3c71a05be2d4189f3c71a05be2d4189f3c71a05be2d418',
    basis: system === 'us' ? 'LRFD, US units' : 'LRFD, SI units',
    kept: false,
    date: '2025-03-14',
    caution: 'For review and seal by a licensed engineer; local codes govern',
    blocks: [
      { block: 'heading', level: 1, number: '1', text: 'Summary of checks' },
      {
        block: 'table',
        caption: 'All checks, worst first',
        columns: [
          { head: 'Check', align: 'left', width: 5 },
          { head: 'Clause', align: 'left', width: 2.4 },
          { head: 'Demand', align: 'right', width: 2 },
          { head: 'Resistance', align: 'right', width: 2 },
          { head: 'Utilisation', align: 'left', width: 3.6 },
        ],
        rows: Array.from({ length: 14 }, (_, index) => [
          `${checks[index % 3]!} ${index + 1}`,
          'AISC 360-22 F2-2',
          `${620 - 20 * index} kip-ft`,
          '610 kip-ft',
          index === 13
            ? { utilisation: null, word: 'not covered: no bearing length is given' }
            : { utilisation: 1.07 - 0.08 * index, word: index === 0 ? 'fails' : 'holds' },
        ]),
      },
      { block: 'verdict', text: '1 check fails; 1 is not covered', holds: false },
      { block: 'heading', level: 1, number: '2', text: 'Entries' },
      {
        block: 'entries',
        rows: [
          { label: 'Rated capacity', value: '25 ton', isDefault: false },
          { label: 'Bridge weight', value: '62.4 kip', isDefault: false, source: 'data sheet of the crane' },
          { label: 'Side thrust share of this rail', value: '0.5', isDefault: true, source: 'common practice' },
          {
            label: 'Spans',
            value: '30 ft, 30 ft, 30 ft, 28 ft 6 in, 30 ft, 30 ft, 30 ft, 12 ft 3 1/2 in',
            isDefault: false,
          },
          { label: 'Deflection limit, vertical', value: 'span/800', isDefault: true },
        ],
      },
      { block: 'heading', level: 1, number: '6', text: 'Checks' },
      { block: 'heading', level: 2, number: '6.3', text: 'Biaxial bending with side thrust' },
      {
        block: 'paragraph',
        text: 'The governing position is found for the interaction itself: wheel 1 of crane 1 at station 12.08 ft, both wheels on the span.',
        clause: 'factored, impact 25 %',
        tone: 'plain',
      },
      {
        block: 'figure',
        figure,
        caption: 'Governing position: the resultant and wheel 1 stand 2.92 ft either side of midspan.',
      },
      { block: 'heading', level: 3, number: '', text: 'Strong axis' },
      { block: 'working', lines: lines(system) },
      { block: 'verdict', text: 'fails, 1.237', holds: false },
      { block: 'heading', level: 3, number: '', text: 'Short unbraced length' },
      { block: 'working', lines: short(system) },
      { block: 'verdict', text: 'holds, 0.98', holds: true },
      ...more,
      { block: 'heading', level: 1, number: '8', text: 'What is not covered' },
      { block: 'paragraph', text: 'Fatigue of the bracket. Пролёт балки и тормозной путь.', tone: 'note' },
      {
        block: 'paragraph',
        text: 'Clearances, the building frame and the foundation are not looked at. '.repeat(3).trim(),
        tone: 'caution',
      },
      { block: 'seal', text: 'Place for seal and signature' },
    ],
  }
}
