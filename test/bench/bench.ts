/**
 * Measured speed: every figure beside a reference timed in the same run, so that the ratio holds when the machine does not.
 * `npm run bench` prints a table; `npm run bench -- --json FILE` also writes the rows.
 */
import { readFileSync, writeFileSync } from 'node:fs'
import { flexuralStrength } from '../../core/basis/us/flexure.ts'
import { catalogue } from '../../core/catalogue/load.ts'
import { chapter } from '../../core/formula/chapter.ts'
import { readJob } from '../../core/job/read.ts'
import { as } from '../../core/quantity/kinds.ts'
import { review } from '../../core/review/review.ts'
import { sectionOf } from '../../core/section/properties.ts'
import { drive } from '../../core/travel/drive.ts'
import { marchedMoment, type March } from './march.ts'
import { printSpeed } from './print.ts'
import { timed, type Row } from './timed.ts'
import { windowSpeed } from './window.ts'

const rows: Row[] = []

/** Absolute maximum moment of 8 wheels: exact, against marching position and section until the error is as small as 1e-6. */
function envelopes(): void {
  const loads = [210e3, 190e3, 230e3, 205e3, 180e3, 220e3, 195e3, 215e3]
  const offsets = [0, 1.1, 3.2, 4.4, 8.1, 9.3, 11.2, 12.5]
  const march: March = { span: 14, loads, offsets }
  const wheels = loads.map((load, wheel) => ({
    crane: 0,
    wheel,
    offset: as('distance', offsets[wheel]!),
    load: as('force', load),
  }))
  const train = { cranes: [0], turned: [false], wheels, mayMirror: false }
  const beam = { continuity: 'simple', spans: [as('distance', march.span)] } as const
  const exact = () =>
    drive(
      { beam, span: 0, trains: [train], train: 0, eitherWay: false },
      {
        kind: 'moments',
        terms: [
          {
            factor: 1,
            at: 'worst',
            wheels: loads,
            uniform: as('lineLoad', 0),
            ends: [as('moment', 0), as('moment', 0)],
          },
        ],
      },
    ).value
  const value = exact()
  let steps = 1000
  while ((value - marchedMoment(march, steps)) / value > 1e-6) steps *= 2
  const [mine, reference] = [timed(exact), timed(() => marchedMoment(march, steps))]
  rows.push({
    name: `absolute maximum moment, 8 wheels: exact against a march of ${steps} positions (error below 1e-6)`,
    milliseconds: mine,
    reference,
    ratio: reference / mine,
  })
}

/** A whole review of the job of two cranes, no derivation written, against its parts: reading and the section. */
function reviews(): void {
  const text = readFileSync(new URL('../../resources/jobs/two-crane-plate-girder.json', import.meta.url), 'utf8')
  const read = readJob(text, catalogue)
  if (!read.ok) throw new Error('the sample job is refused')
  const whole = timed(() => review(read.job))
  const reading = timed(() => readJob(text, catalogue))
  rows.push({
    name: 'review of two cranes on a plate girder, no derivation written, against reading its file',
    milliseconds: whole,
    reference: reading,
    ratio: reading / whole,
  })
}

/** F4-5 as a compiled closure against the same arithmetic by hand, and a whole strength. */
function formulas(): void {
  const text = 'C_b*pi^2*E/(L_b/r_t)^2*sqrt(1 + 0.078*J/(S_xc*h_o)*(L_b/r_t)^2)'
  const closure = chapter('AISC 360-22', 'F4').formula('F4-5', {
    gives: ['F_cr', 'stress'],
    where: {
      C_b: 'ratio',
      E: 'stress',
      L_b: 'distance',
      r_t: 'length',
      J: 'inertia',
      S_xc: 'modulus',
      h_o: 'length',
    },
    text,
  })
  const v = {
    C_b: 1,
    E: as('stress', 200e9),
    L_b: as('distance', 9),
    r_t: as('length', 0.1),
    J: as('inertia', 2e-6),
    S_xc: as('modulus', 5e-3),
    h_o: as('length', 0.7),
  }
  const byHand = ({ C_b, E, L_b, r_t, J, S_xc, h_o }: typeof v): number =>
    ((C_b * Math.PI ** 2 * E) / (L_b / r_t) ** 2) * Math.sqrt(1 + ((0.078 * J) / (S_xc * h_o)) * (L_b / r_t) ** 2)
  const many = (compute: (values: typeof v) => number) => () => {
    let sum = 0
    for (let i = 0; i < 10_000; i++) sum += compute({ ...v, L_b: as('distance', 9 + i * 1e-6) })
    return sum
  }
  const [mine, reference] = [timed(many((values) => closure.value(values))), timed(many(byHand))]
  rows.push({
    name: '10,000 values of F4-5: closure against hand-written arithmetic',
    milliseconds: mine,
    reference,
    ratio: reference / mine,
  })

  const section = sectionOf({ kind: 'rolled', shape: catalogue.iShape('W27X84')! })
  const steel = { F_y: as('stress', 345e6), E: as('stress', 200e9) }
  const strength = timed(() => flexuralStrength(section, steel, as('distance', 9), 'shear-centre'))
  rows.push({
    name: 'flexural strength of W27X84 with its derivation kept, against 10,000 hand-written formulas',
    milliseconds: strength,
    reference,
    ratio: reference / strength,
  })
}

envelopes()
reviews()
formulas()

const width = Math.max(...rows.map(({ name }) => name.length))
console.log(`${'what'.padEnd(width)}  ${'ms'.padStart(10)}  ${'reference'.padStart(10)}  ${'ratio'.padStart(10)}`)
for (const { name, milliseconds, reference, ratio } of rows) {
  const figures = [milliseconds, reference, ratio].map((figure) => figure.toPrecision(3).padStart(10))
  console.log(`${name.padEnd(width)}  ${figures.join('  ')}`)
}
const measured = [...(await printSpeed()), ...(await windowSpeed())]
console.log()
for (const { name, value, unit } of measured)
  console.log(`${name.padEnd(width)}  ${value.toPrecision(3).padStart(10)} ${unit}`)

const json = process.argv.indexOf('--json')
if (json > 0) writeFileSync(process.argv[json + 1]!, `${JSON.stringify([...rows, ...measured], null, 2)}\n`)
