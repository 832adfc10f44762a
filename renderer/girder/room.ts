/** Room for the elevation, so that neither rail nor diagrams jump up and down while the crane moves. */
import { elevationFigure } from '../../core/figure/elevation.ts'
import { beamOf, type Shown } from '../../core/figure/standing.ts'
import type { Figure } from '../../core/figure/types.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import type { Stood } from './governing.ts'
import { limitsOf } from './moving.ts'
import { extremeAt } from './standing.ts'

/** Height of the rail's head on paper, mm: the top of the widest solid bar. A figure without one has it at its top. */
export const railOf = ({ items }: Figure): number =>
  items.reduce(
    (rail, item) => {
      if (item.item !== 'area' || item.fill !== 'solid') return rail
      const [across, down] = [item.points.map(([x]) => x), item.points.map(([, y]) => y)]
      const width = Math.max(...across) - Math.min(...across)
      return width > rail.width ? { width, top: Math.min(...down) } : rail
    },
    { width: 0, top: 0 },
  ).top

/** Positions tried between the limits of the train. */
const TRIED = 8

/** The most that positions of this train need above and below the rail's head, mm. */
export const roomFor = (review: ReviewValues, stood: Omit<Stood, 'lead'>, shown: Shown) => {
  const train = review.trains[stood.train]
  if (train === undefined) return { above: 0, below: 0 }
  const { from, to } = limitsOf(beamOf(review), stood.span, train, stood.mirrored)
  const figures = Array.from({ length: TRIED + 1 }, (_, part) =>
    elevationFigure(review, extremeAt(review, { ...stood, lead: from + ((to - from) * part) / TRIED }), shown),
  )
  return {
    above: Math.max(...figures.map(railOf)),
    below: Math.max(...figures.map((figure) => figure.height - railOf(figure))),
  }
}
