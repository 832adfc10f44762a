/** Strengths of rolled W shapes, against the AISC Manual's tables and design examples. Fy 50 ksi, E 29,000 ksi. */
import { availableForceOf, flexureOf, type Design } from './member-design.ts'
import type { EvidenceCase } from './types.ts'

const table32 = 'AISC Manual, Table 3-2 (values recomputed from the handbook figures, as remembered)'
const table94 = 'AISC Manual, Table 9-4, W18X50'

interface Row {
  readonly shape: string
  /** kip ft, ft, ft, kip ft */
  readonly phiMp: number
  readonly Lp: number
  readonly Lr: number
  readonly phiMr: number
  /** Unbraced length in ft -> phi Mn in kip ft, C_b = 1. */
  readonly phiMn: Readonly<Record<20 | 25 | 30, number>>
  readonly phiVn: number
  readonly phiMny: number
  /** Bearing length 5 in, interior, kip. */
  readonly yielding: number
  readonly crippling: number
}

const ROWS: readonly Row[] = [
  row('W18X50', 379, 5.83, 16.9, 233, [179.9, 129.7, 101.1], 192, 62.3, 175.0, 162.6),
  row('W21X62', 540, 6.25, 18.1, 333, [284.1, 201.6, 155.1], 252, 81.4, 212.0, 197.0),
  row('W24X84', 840, 6.89, 20.3, 514, [522.0, 372.5, 285.9], 340, 122.2, 266.7, 264.9),
  row('W27X84', 915, 7.31, 20.8, 559, [579.2, 408.1, 304.7], 368, 124.5, 257.6, 242.1),
  row('W30X116', 1418, 7.74, 22.6, 864, [961.7, 733.6, 551.6], 508, 184.5, 353.1, 359.5),
]

function row(
  shape: string,
  phiMp: number,
  Lp: number,
  Lr: number,
  phiMr: number,
  [at20, at25, at30]: readonly [number, number, number],
  phiVn: number,
  phiMny: number,
  yielding: number,
  crippling: number,
): Row {
  return { shape, phiMp, Lp, Lr, phiMr, phiMn: { 20: at20, 25: at25, 30: at30 }, phiVn, phiMny, yielding, crippling }
}

/** Tolerances: 0.5 % of strengths (three digits of the handbook figures), 0.05 ft of lengths. */
function casesOf(r: Row): readonly EvidenceCase[] {
  const lrfd: Design = { shape: r.shape, method: 'LRFD' }
  const strength = (what: string, printed: number, unit: string, compute: () => number): EvidenceCase => ({
    id: `${r.shape} ${what}`,
    what: `${what} of ${r.shape}`,
    source: table32,
    known: 'arithmetic from the source’s inputs',
    printed,
    unit,
    tolerance: 0.005 * printed,
    why: 'handbook figures of three digits',
    compute,
  })
  const length = (what: string, printed: number, compute: () => number): EvidenceCase => ({
    ...strength(what, printed, 'ft', compute),
    tolerance: 0.05,
    why: 'printed to a tenth of a foot',
  })
  return [
    strength('phi Mp', r.phiMp, 'kip ft', () => flexureOf(lrfd, 1).strong),
    length('Lp', r.Lp, () => flexureOf(lrfd, 1).L_p),
    length('Lr', r.Lr, () => flexureOf(lrfd, 1).L_r),
    strength('phi Mr', r.phiMr, 'kip ft', () => flexureOf(lrfd, flexureOf(lrfd, 1).L_r).strong),
    ...([20, 25, 30] as const).map((L) =>
      strength(`phi Mn at ${L} ft`, r.phiMn[L], 'kip ft', () => flexureOf(lrfd, L).strong),
    ),
    strength('phi Mny', r.phiMny, 'kip ft', () => flexureOf(lrfd, 1).weak),
    strength('phi Vn', r.phiVn, 'kip', () => availableForceOf(lrfd, 'shear')),
    strength('web yielding, 5 in bearing', r.yielding, 'kip', () => availableForceOf(lrfd, 'yielding', 5)),
    strength('web crippling, 5 in bearing', r.crippling, 'kip', () => availableForceOf(lrfd, 'crippling', 5)),
  ]
}

const memory = (
  id: string,
  what: string,
  source: string,
  printed: number,
  unit: string,
  tolerance: number,
  compute: () => number,
): EvidenceCase => ({ id, what, source, known: 'from memory', printed, unit, tolerance, compute })

const w18: Design = { shape: 'W18X50', method: 'LRFD' }
const w24: Design = { shape: 'W24X62', method: 'LRFD' }

export const MEMBERS: readonly EvidenceCase[] = [
  ...ROWS.flatMap(casesOf),
  memory(
    'F.1-2B',
    'phi Mn of W18X50, Lb 11.7 ft, Cb 1.01',
    'AISC Design Examples, F.1-2B',
    305,
    'kip ft',
    0.5,
    () => flexureOf(w18, 11.7, 1.01).strong,
  ),
  memory(
    'F.1-3B',
    'phi Mn of W18X50, Lb 17.5 ft, Cb 1.30',
    'AISC Design Examples, F.1-3B',
    288,
    'kip ft',
    0.5,
    () => flexureOf(w18, 17.5, 1.3).strong,
  ),
  memory('G.1 LRFD', 'phi Vn of W24X62', 'AISC Design Examples, G.1', 306, 'kip', 0.5, () =>
    availableForceOf(w24, 'shear'),
  ),
  memory('G.1 ASD', 'Vn/Omega of W24X62', 'AISC Design Examples, G.1', 204, 'kip', 0.5, () =>
    availableForceOf({ ...w24, method: 'ASD' }, 'shear'),
  ),
  memory('9-4 R1', 'phi R1 of W18X50: end form with no bearing length', table94, 43.1, 'kip', 0.05, () =>
    availableForceOf(w18, 'yielding at the end', 0),
  ),
  memory(
    '9-4 R2',
    'phi R2 of W18X50: for each inch of bearing',
    table94,
    17.8,
    'kip/in',
    0.05,
    () => availableForceOf(w18, 'yielding at the end', 1) - availableForceOf(w18, 'yielding at the end', 0),
  ),
]
