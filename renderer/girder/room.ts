/** Room for the elevation, so that neither rail nor diagrams jump up and down while the crane moves. */
import { elevationFigure } from '../../core/figure/elevation.ts'
import { beamOf, type Shown, type View } from '../../core/figure/standing.ts'
import type { Figure } from '../../core/figure/types.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import type { Stood } from './governing.ts'
import { held, limitsOf } from './moving.ts'
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
const TRIED = 6

/** A distance on paper that its text does not fit over, mm. */
const SHORT = 5

/** The most that positions of this train need above and below the rail's head, mm. */
export const roomFor = (review: ReviewValues, stood: Omit<Stood, 'lead'>, shown: Shown & { readonly view: View }) => {
  const train = review.trains[stood.train]
  if (train === undefined) return { above: 0, below: 0 }
  const limits = limitsOf(beamOf(review), stood.span, train, stood.mirrored)
  const { from, to, home, end } = limits
  const even = Array.from({ length: TRIED + 1 }, (_, part) => from + ((to - from) * part) / TRIED)
  // An outer wheel just within a support leaves a distance too short for its text.
  const short = (SHORT / shown.width) * (shown.view.to - shown.view.from)
  const leads = [...even, home + short, end - short, from + short, to - short, (home + end) / 2]
  const figures = leads.map((lead) =>
    elevationFigure(review, extremeAt(review, { ...stood, lead: held(lead, limits) }), shown),
  )
  return {
    above: Math.max(...figures.map(railOf)),
    below: Math.max(...figures.map((figure) => figure.height - railOf(figure))),
  }
}
