/** The plastic axis of bending about the horizontal axis, exactly, from bands whose width varies linearly with the height. */

/** A piece of the section between two heights; its width changes linearly from one to the other. Metres. */
export interface Band {
  readonly bottom: number
  readonly top: number
  readonly widthBottom: number
  readonly widthTop: number
}

/**
 * Height of the line that halves the area, and the plastic modulus about it: the sum of the first moments of the two halves.
 * Bands may overlap in height. Between two neighbouring band ends the area grows quadratically, so the line is a root in closed form.
 * Exact but for rounding; the bands must leave no gap in height where half the area is reached.
 */
export const plasticAxis = (bands: readonly Band[]): { readonly height: number; readonly Z: number } => {
  const levels: number[] = []
  for (const band of bands) levels.push(band.bottom, band.top)
  levels.sort((a, b) => a - b)
  const highest = levels[levels.length - 1]!
  const half = areaBelow(bands, highest) / 2
  let next = 1
  while (next < levels.length - 1 && areaBelow(bands, levels[next]!) < half) next += 1
  const low = levels[next - 1]!
  const high = levels[next]!
  const height = low + heightForArea(bands, low, high, half - areaBelow(bands, low))
  return { height, Z: momentBelow(bands, highest) - 2 * momentBelow(bands, height) }
}

/** How far above `low` the given area is filled; no band begins or ends between `low` and `high`. */
const heightForArea = (bands: readonly Band[], low: number, high: number, area: number): number => {
  if (area <= 0) return 0
  let width = 0
  let slope = 0
  for (const band of bands) {
    if (band.bottom > low || band.top < high) continue
    const own = slopeOf(band)
    width += band.widthBottom + own * (low - band.bottom)
    slope += own
  }
  // The root of slope/2 s^2 + width s - area = 0 that stays finite as the slope vanishes.
  return (2 * area) / (width + Math.sqrt(Math.max(0, width * width + 2 * slope * area)))
}

const slopeOf = (band: Band): number => (band.widthTop - band.widthBottom) / (band.top - band.bottom)

const areaBelow = (bands: readonly Band[], height: number): number => {
  let sum = 0
  for (const band of bands) {
    const filled = Math.min(height, band.top) - band.bottom
    if (filled > 0) sum += filled * (band.widthBottom + (slopeOf(band) * filled) / 2)
  }
  return sum
}

/** First moment about height 0 of what lies below a height. */
const momentBelow = (bands: readonly Band[], height: number): number => {
  let sum = 0
  for (const band of bands) {
    const filled = Math.min(height, band.top) - band.bottom
    if (filled <= 0) continue
    sum += band.widthBottom * filled * (band.bottom + filled / 2)
    sum += slopeOf(band) * filled * filled * (band.bottom / 2 + filled / 3)
  }
  return sum
}
