/** The derivation of every check at its worst place. */
import { elevationFigure } from '../figure/elevation.ts'
import type { Line } from '../formula/types.ts'
import type { Working } from '../formula/working.ts'
import { writeWorking } from '../formula/write.ts'
import type { UnitSystem } from '../quantity/kinds.ts'
import { writeUtilisation } from '../quantity/write.ts'
import type { Check, Review } from '../review/types.ts'
import { citation } from '../sources/clause.ts'
import { heading, plain } from './block.ts'
import { FIGURE_WIDTH, placeOf } from './governing.ts'
import type { Block } from './types.ts'

export function workingsPart(review: Review, units: UnitSystem, number: string): readonly Block[] {
  const judged = review.checks.filter((check) => check.working !== undefined)
  /** Derivations that stand on the sheet already, by where. */
  const printed = new Map<Working, string>()
  return [
    heading(1, number, 'Workings'),
    ...judged.flatMap((check, index) => workingOf(review, check, units, `${number}.${index + 1}`, printed)),
  ]
}

/** The lines of a derivation; parts that stand on the sheet already are told by their result and where they stand. */
function linesOf(working: Working, units: UnitSystem, printed: Map<Working, string>, number: string): readonly Line[] {
  return working.steps.flatMap((step) => {
    if (step.step !== 'part') return writeWorking({ steps: [step] }, units)
    const where = printed.get(step.working)
    if (where !== undefined) {
      return writeWorking(
        { steps: [{ step: 'given', figure: step.figure, note: `${step.name}, from ${where}`, clause: undefined }] },
        units,
      )
    }
    printed.set(step.working, number)
    return linesOf(step.working, units, printed, number)
  })
}

function workingOf(
  review: Review,
  check: Check,
  units: UnitSystem,
  number: string,
  printed: Map<Working, string>,
): readonly Block[] {
  const { at, combination, set, utilisation } = check
  const blocks: Block[] = [heading(2, number, check.title)]
  if (at !== undefined) {
    const refined = at.method === 'refined' ? ' Found by closing in to 1e-9 of the span.' : ''
    blocks.push(
      plain(`${combination ?? ''}, ${set ?? ''}. ${placeOf(review, at, units)}${refined}`, citation(check.clause)),
    )
    if (DRAWN.has(check.id)) {
      const figure = elevationFigure(review, at, { units, width: FIGURE_WIDTH })
      blocks.push({ block: 'figure', figure, caption: 'Static wheel loads, where this check governs' })
    }
  } else {
    blocks.push(plain('Wherever the cranes stand.', citation(check.clause)))
  }
  const holds = check.status !== 'fails'
  return [
    ...blocks,
    { block: 'working', lines: linesOf(check.working!(), units, printed, number) },
    { block: 'verdict', text: `${holds ? 'holds' : 'fails'}, ${writeUtilisation(utilisation!)}`, holds },
  ]
}

/** Checks whose own position is worth a drawing beside that of the greatest moment. */
const DRAWN: ReadonlySet<string> = new Set(['us.flexure.biaxial', 'us.shear', 'us.deflection.vertical'])
