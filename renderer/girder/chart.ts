/** One diagram on a canvas by Chart.js, its area laid on the elevation's own horizontal scale. */
import {
  Chart,
  Filler,
  LineController,
  LineElement,
  LinearScale,
  PointElement,
  type ChartDataset,
} from 'chart.js'
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
  return { ink: read('--ink'), accent: read('--accent'), shade: read('--shade'), soft: read("--soft") }
}

export interface Frame {
  /** Width and height of the canvas, px. */
  readonly width: number
  readonly height: number
  /** From the canvas's edges to the ends of the stations shown, px. */
  readonly side: number
  /** Rows for labels above and below the ordinates, px. */
  readonly row: number
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

/** An empty diagram: `frameChart` and `drawChart` fill it. */
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
  const { side, row } = frame
  chart.options.layout = { padding: { left: side, right: side, top: row, bottom: row } }
  chart.options.devicePixelRatio = window.devicePixelRatio
  chart.resize(frame.width, frame.height)
}

/** The lines in the page's colours, at once and without any movement of their own. */
export const drawChart = (chart: DiagramChart, frame: Frame, lines: Lines, theme: Theme): void => {
  const { envelope, present, peak } = lines
  const values = [0, ...envelope.flatMap(({ max, min }) => [max, min]), ...present.map(({ y }) => y)]
  const [greatest, least] = [Math.max(...values), Math.min(...values)]
  chart.options.scales = {
    x: { type: 'linear', display: false, min: frame.from, max: frame.to },
    y: {
      type: 'linear',
      display: false,
      min: least,
      max: greatest > least ? greatest : least + 1,
      reverse: frame.hangs,
    },
  }
  const line = (data: Point[], borderColor: string, borderWidth: number): ChartDataset<'line', Point[]> => ({
    data,
    borderColor,
    borderWidth,
    borderJoinStyle: 'round',
    pointRadius: 0,
    clip: 8,
  })
  const ends = [envelope[0], envelope.at(-1)].flatMap((end) => (end === undefined ? [] : [{ x: end.x, y: 0 }]))
  chart.data.datasets = [
    {
      ...line(peak === undefined ? [] : [{ x: peak.x, y: peak.y }], theme.accent, 0),
      pointRadius: 4,
      pointBorderWidth: 0,
      pointBackgroundColor: theme.accent,
    },
    line([...present], theme.ink, 2),
    line(ends, theme.ink, 1),
    {
      ...line(
        envelope.map(({ x, max }) => ({ x, y: max })),
        theme.soft,
        1,
      ),
      fill: '+1',
      backgroundColor: theme.shade,
    },
    line(
      envelope.map(({ x, min }) => ({ x, y: min })),
      theme.soft,
      1,
    ),
  ]
  chart.update('none')
}
