/** Pixels of the window and millimetres of a figure: one scale for the elevation and everything that hangs under it. */

/** Least width of a figure, mm (core/figure/standing.ts). */
const LEAST = 120

/** Pixels for a millimetre: the figures' texts of 2.8 mm then stand as high as the window's own small words. */
const USUAL = 4.2

export interface Paper {
  /** Width of the figure, mm. */
  readonly width: number
  /** Width on the screen, px: a whole number, so that edges stay crisp. */
  readonly pixels: number
  /** Pixels for a millimetre of paper. */
  readonly perMillimetre: number
}

/** The paper of a column of the window; what is too narrow for a figure is drawn smaller, not cut off. */
export const paperOf = (column: number): Paper => {
  const pixels = Math.max(1, Math.floor(column))
  const perMillimetre = Math.min(USUAL, pixels / LEAST)
  return { width: Math.max(LEAST, pixels / perMillimetre), pixels, perMillimetre }
}

export interface Across {
  /** Pixels from the paper's left edge to a station, m. */
  readonly toPixels: (station: number) => number
  /** The station, m, under a pixel. */
  readonly toStation: (pixel: number) => number
  readonly pixelsPerMetre: number
}

/** Stations on the screen, from the scale of a figure (core/figure/standing.ts, scaleOf). */
export const acrossOf = (
  { perMillimetre }: Paper,
  scale: { readonly perMetre: number; readonly across: (station: number) => number },
): Across => {
  const pixelsPerMetre = scale.perMetre * perMillimetre
  const origin = scale.across(0) * perMillimetre
  return {
    toPixels: (station) => origin + station * pixelsPerMetre,
    toStation: (pixel) => (pixel - origin) / pixelsPerMetre,
    pixelsPerMetre,
  }
}
