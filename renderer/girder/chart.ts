/** One diagram on a canvas by Chart.js, its area laid on the elevation's own horizontal scale. */
import { Chart, Filler, LineController, LineElement, LinearScale, PointElement, type ChartDataset } from 'chart.js'
import type { Bounds, Point } from './diagram-data.ts'

Chart.register(LineController, LineElement, PointElement, LinearScale, Filler)

export type DiagramChart = Chart<'line', Point[]>

export interface Theme {
  readonly ink: string
  readonly accent: string
  readonly shade: string
  readonly soft: string
}

/** The colours of the page as it stands: they differ between light and dark. */
export const themeOf = (element: Element): Theme => {
  const style = getComputedStyle(element)
  const read = (name: string): string => style.getPropertyValue(name).trim()
  return { ink: read('--ink'), accent: read('--accent'), shade: read('--shade'), soft: read('--soft') }
}

export interface Frame {
  /** Width and height of the canvas, px. */
  readonly width: number
  readonly height: number
  /** From the canvas's edges to the ends of the stations shown, px. */
  readonly side: number
  /** Rows for labels above and below the ordinates, px. */
  readonly above: number
  readonly below: number
  /** Stations shown, m. */
  readonly from: number
  readonly to: number
  readonly hangs: boolean
}

export interface Lines {
  readonly envelope: readonly (Bounds & { readonly x: number })[]
  readonly present: readonly Point[]
  readonly peak: Point | undefined
}

/** An empty diagram: `frameChart`, `dressChart` and `moveChart` fill it. */
export const makeChart = (canvas: HTMLCanvasElement): DiagramChart =>
  new Chart<'line', Point[]>(canvas, {
    type: 'line',
    data: { datasets: [] },
    options: {
      responsive: false,
      maintainAspectRatio: false,
      animation: false,
      events: [],
      parsing: false,
      normalized: true,
      scales: { x: { type: 'linear', display: false }, y: { type: 'linear', display: false } },
    },
  })

/** Size and horizontal scale; crisp at the screen's present pixel ratio. */
export const frameChart = (chart: DiagramChart, frame: Frame): void => {
  const { side, above, below } = frame
  chart.options.layout = { padding: { left: side, right: side, top: above, bottom: below } }
  chart.options.devicePixelRatio = window.devicePixelRatio
  chart.resize(frame.width, frame.height)
}

/** The envelope in the page's colours, and the scale it sets: what stays while the crane moves. */
export const dressChart = (chart: DiagramChart, frame: Frame, envelope: Lines['envelope'], theme: Theme): void => {
  const line = (data: Point[], borderColor: string, borderWidth: number): ChartDataset<'line', Point[]> => ({
    data,
    borderColor,
    borderWidth,
    borderJoinStyle: 'round',
    pointRadius: 0,
    clip: CLIP,
  })
  const ends = [envelope[0], envelope.at(-1)].flatMap((end) => (end === undefined ? [] : [{ x: end.x, y: 0 }]))
  const edge = (of: 'max' | 'min'): Point[] => envelope.map((at) => ({ x: at.x, y: at[of] }))
  const peak = { ...line([], theme.accent, 0), pointRadius: 4, pointBorderWidth: 0, pointBackgroundColor: theme.accent }
  chart.data.datasets = [
    peak,
    line([], theme.ink, 2),
    line(ends, theme.ink, 1),
    { ...line(edge('max'), theme.soft, 1), fill: '+1', backgroundColor: theme.shade },
    line(edge('min'), theme.soft, 1),
  ]
  chart.options.scales = {
    x: { type: 'linear', display: false, min: frame.from, max: frame.to, afterBuildTicks: bare },
    y: { type: 'linear', display: false, ...ordinates(envelope, []), reverse: frame.hangs, afterBuildTicks: bare },
  }
}

/** Axes that are not shown need no figures; measuring them would be half the work of a move. */
const bare = (axis: { ticks: unknown[] }): void => {
  axis.ticks = []
}

/** How far a line or the mark at the peak may reach beyond the ordinates, px. */
const CLIP = 8

/** The present position over it, at once and without any movement of its own. */
export const moveChart = (chart: DiagramChart, { envelope, present, peak }: Lines): void => {
  const [mark, line] = chart.data.datasets
  if (mark === undefined || line === undefined) return
  mark.data = peak === undefined ? [] : [{ x: peak.x, y: peak.y }]
  line.data = [...present]
  // Cranes that stand apart may pass the envelope, which is that of cranes bumper to bumper.
  Object.assign(chart.options.scales?.['y'] ?? {}, ordinates(envelope, present))
  chart.update('none')
}

/** The least and greatest ordinate, with the base line among them. */
const ordinates = (envelope: Lines['envelope'], present: Lines['present']): { min: number; max: number } => {
  const values = [0, ...envelope.flatMap(({ max, min }) => [max, min]), ...present.map(({ y }) => y)]
  const [min, max] = [Math.min(...values), Math.max(...values)]
  return { min, max: max > min ? max : min + 1 }
}
