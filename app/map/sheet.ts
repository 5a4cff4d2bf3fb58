import { toGrid, zoneOf } from './grid'

export interface Frame {
  left: number
  top: number
  right: number
  bottom: number
}

/** Where a pixel of the map lies: longitude and latitude. */
export type Unproject = (x: number, y: number) => { lon: number; lat: number }

/** A tick of the neatline: its place along the side in pixels, and the grid's kilometres to read there. */
export interface Tick {
  side: 'top' | 'bottom' | 'left' | 'right'
  at: number
  kilometres: number
}

/** Whole kilometres between ticks so that they stand at least 44 pixels apart; 1, 2, 5, 10 and so on. */
export function tickSpacing(pixelsPerKilometre: number): number {
  for (let tens = 1; tens <= 10_000; tens *= 10)
    for (const step of [1, 2, 5]) if (step * tens * pixelsPerKilometre >= 44) return step * tens
  return 50_000
}

/** Ticks where the lines of the kilometre grid (UTM, in the zone of the frame's middle) cross the frame's sides. */
export function sheetTicks(unproject: Unproject, frame: Frame, pixelsPerKilometre: number): Tick[] {
  const { left, top, right, bottom } = frame
  const zone = zoneOf(unproject((left + right) / 2, (top + bottom) / 2).lon)
  const spacing = tickSpacing(pixelsPerKilometre)
  const east = (x: number, y: number) => {
    const { lon, lat } = unproject(x, y)
    return toGrid(lon, lat, zone).east / 1000
  }
  const north = (x: number, y: number) => {
    const { lon, lat } = unproject(x, y)
    return toGrid(lon, lat, zone).north / 1000
  }
  const along = (side: Tick['side'], from: number, to: number, value: (at: number) => number) =>
    crossings(from, to, value, spacing).map(({ at, kilometres }) => ({ side, at, kilometres }))
  return [
    ...along('top', left, right, x => east(x, top)),
    ...along('bottom', left, right, x => east(x, bottom)),
    ...along('left', top, bottom, y => north(left, y)),
    ...along('right', top, bottom, y => north(right, y)),
  ]
}

/** Places between `from` and `to` where a nearly straight, steady function passes multiples of `spacing`. */
function crossings(
  from: number,
  to: number,
  value: (at: number) => number,
  spacing: number,
): { at: number; kilometres: number }[] {
  const [first, last] = [value(from), value(to)]
  const [low, high] = [Math.min(first, last), Math.max(first, last)]
  const found: { at: number; kilometres: number }[] = []
  if (!Number.isFinite(low) || !Number.isFinite(high) || (high - low) / spacing > 200) return found
  for (let kilometres = Math.ceil(low / spacing) * spacing; kilometres <= high; kilometres += spacing) {
    let at = from + ((kilometres - first) / (last - first)) * (to - from)
    // One step of the secant through the side's own slope takes the bend of the projection out.
    at += ((kilometres - value(at)) / (last - first)) * (to - from)
    if (at >= from && at <= to) found.push({ at, kilometres })
  }
  return found
}

/** A bar of a round length between 60 and 150 pixels: its pixels and what to write beside it. */
export function scaleBar(metresPerPixel: number): { pixels: number; words: string } {
  for (let tens = 1; tens <= 10_000_000; tens *= 10)
    for (const step of [1, 2, 5]) {
      const pixels = (step * tens) / metresPerPixel
      if (pixels >= 60) return { pixels, words: formatLength(step * tens) }
    }
  return { pixels: 0, words: '' }
}

const formatLength = (metres: number) => (metres < 1000 ? `${metres} m` : `${metres / 1000} km`)

/** The contour interval shown at a zoom, in words, or null where there are none. */
export function contourWords(zoom: number): string | null {
  if (zoom >= 11.4) return 'contours 10 m'
  return zoom >= 10 ? 'contours 50 m' : null
}

/** Metres on the ground per pixel at a latitude and a zoom of 512-pixel tiles. */
export const metresPerPixel = (lat: number, zoom: number): number =>
  (40_075_016.686 * Math.cos((lat * Math.PI) / 180)) / (512 * 2 ** zoom)
