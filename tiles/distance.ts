import type { Raster } from './raster'
import { mapRaster } from './raster'
import type { Metres } from './shape'

/**
 * Metres from every value's place to the nearest of the lines, by passing the nearest known point on from cell to
 * cell in four sweeps (Danielsson's vector distance); exact to about half a step.
 */
export function distanceTo(like: Raster, lines: Metres[][]): Raster {
  const { columns, rows, step, west, north } = like
  const nearEast = new Float64Array(like.values.length).fill(Number.POSITIVE_INFINITY)
  const nearNorth = new Float64Array(like.values.length)
  const best = new Float64Array(like.values.length).fill(Number.POSITIVE_INFINITY)
  const offer = (column: number, row: number, east: number, up: number) => {
    if (column < 0 || row < 0 || column >= columns || row >= rows) return
    const far = Math.hypot(west + column * step - east, north - row * step - up)
    const index = row * columns + column
    if (far >= best[index]!) return
    best[index] = far
    nearEast[index] = east
    nearNorth[index] = up
  }
  for (const line of lines)
    for (const [east, up] of everyHalfStep(line, step / 2))
      offer(Math.round((east - west) / step), Math.round((north - up) / step), east, up)

  const sweep = (rowStep: 1 | -1, columnStep: 1 | -1) => {
    for (let r = 0; r < rows; r++) {
      const row = rowStep === 1 ? r : rows - 1 - r
      for (let c = 0; c < columns; c++) {
        const column = columnStep === 1 ? c : columns - 1 - c
        const from = row * columns + column
        const east = nearEast[from]!
        if (east === Number.POSITIVE_INFINITY) continue
        offer(column + columnStep, row, east, nearNorth[from]!)
        offer(column, row + rowStep, east, nearNorth[from]!)
        offer(column + columnStep, row + rowStep, east, nearNorth[from]!)
        offer(column - columnStep, row + rowStep, east, nearNorth[from]!)
      }
    }
  }
  for (const rowStep of [1, -1] as const)
    for (const columnStep of [1, -1] as const) sweep(rowStep, columnStep)
  return { ...like, values: best }
}

function* everyHalfStep(line: Metres[], every: number): Generator<Metres> {
  for (let i = 0; i + 1 < line.length; i++) {
    const [a, b] = [line[i]!, line[i + 1]!]
    const parts = Math.max(1, Math.ceil(Math.hypot(b[0] - a[0], b[1] - a[1]) / every))
    for (let p = 0; p <= parts; p++)
      yield [a[0] + ((b[0] - a[0]) * p) / parts, a[1] + ((b[1] - a[1]) * p) / parts]
  }
}

/** The same distances, less than 0 inside the rings and above 0 outside. */
export function signedDistanceTo(like: Raster, rings: Metres[][]): Raster {
  const far = distanceTo(like, rings)
  const inside = insideOf(like, rings)
  return mapRaster(far, index => (inside[index] ? -far.values[index]! : far.values[index]!))
}

/** 1 for each value's place within the rings (even and odd crossings along its row), else 0. */
function insideOf(like: Raster, rings: Metres[][]): Uint8Array {
  const { columns, rows, step, west, north } = like
  const inside = new Uint8Array(like.values.length)
  for (let row = 0; row < rows; row++) {
    const up = north - row * step
    const crossings: number[] = []
    for (const ring of rings)
      for (let i = 0; i + 1 < ring.length; i++) {
        const [a, b] = [ring[i]!, ring[i + 1]!]
        if (a[1] > up !== b[1] > up) crossings.push(a[0] + ((up - a[1]) / (b[1] - a[1])) * (b[0] - a[0]))
      }
    crossings.sort((a, b) => a - b)
    for (let pair = 0; pair + 1 < crossings.length; pair += 2) {
      const from = Math.max(0, Math.ceil((crossings[pair]! - west) / step))
      const to = Math.min(columns - 1, Math.floor((crossings[pair + 1]! - west) / step))
      for (let column = from; column <= to; column++) inside[row * columns + column] = 1
    }
  }
  return inside
}
