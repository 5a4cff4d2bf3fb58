import { contours } from 'd3-contour'
import type { Metres } from './shape'

/** A grid of values over the island's sheet; row 0 is the northern edge, `step` metres between values. */
export interface Raster {
  columns: number
  rows: number
  step: number
  west: number
  north: number
  values: Float64Array
}

/** A raster over the box, filled by a function of place (metres east and north). */
export function rasterOf(
  box: { west: number; south: number; east: number; north: number },
  step: number,
  value: (east: number, north: number, index: number) => number,
): Raster {
  const columns = Math.round((box.east - box.west) / step) + 1
  const rows = Math.round((box.north - box.south) / step) + 1
  const values = new Float64Array(columns * rows)
  for (let row = 0; row < rows; row++)
    for (let column = 0; column < columns; column++) {
      const index = row * columns + column
      values[index] = value(box.west + column * step, box.north - row * step, index)
    }
  return { columns, rows, step, west: box.west, north: box.north, values }
}

/** A raster of the same grid, each value made from its index. */
export function mapRaster(like: Raster, value: (index: number) => number): Raster {
  return { ...like, values: Float64Array.from(like.values, (_, index) => value(index)) }
}

/** The value at a place, by straight lines between the four around it; the edge's beyond the edge. */
export function valueAt(raster: Raster, [east, north]: Metres): number {
  const { columns, rows, step, values } = raster
  const x = Math.min(columns - 1.001, Math.max(0, (east - raster.west) / step))
  const y = Math.min(rows - 1.001, Math.max(0, (raster.north - north) / step))
  const at = Math.floor(y) * columns + Math.floor(x)
  const [u, v] = [x % 1, y % 1]
  const top = values[at]! * (1 - u) + values[at + 1]! * u
  const low = values[at + columns]! * (1 - u) + values[at + columns + 1]! * u
  return top * (1 - v) + low * v
}

/** The areas where the raster is at or above `level`: polygons of rings in metres, the outer ring first. */
export function areasAbove(raster: Raster, level: number): Metres[][][] {
  const { columns, rows, step, west, north, values } = raster
  // d3-contour gives the value of a cell the middle of that cell, hence the half.
  const place = ([x, y]: number[]): Metres => [west + (x! - 0.5) * step, north - (y! - 0.5) * step]
  const found = contours()
    .size([columns, rows])
    .contour(values as unknown as number[], level)
  return found.coordinates.map(polygon => polygon.map(ring => ring.map(place)))
}

/** The raster with each value the mean of the square `reach` cells around it, twice over. */
export function blurred(raster: Raster, reach: number): Raster {
  let values = raster.values
  for (let pass = 0; pass < 2; pass++) {
    values = meanAlong(values, raster.rows, raster.columns, raster.columns, 1, reach)
    values = meanAlong(values, raster.columns, raster.rows, 1, raster.columns, reach)
  }
  return { ...raster, values }
}

function meanAlong(
  values: Float64Array,
  lines: number,
  length: number,
  lineStride: number,
  stride: number,
  reach: number,
): Float64Array {
  const out = new Float64Array(values.length)
  for (let line = 0; line < lines; line++) {
    const start = line * lineStride
    const at = (i: number) => values[start + Math.max(0, Math.min(length - 1, i)) * stride]!
    let sum = 0
    for (let i = -reach; i <= reach; i++) sum += at(i)
    for (let i = 0; i < length; i++) {
      out[start + i * stride] = sum / (2 * reach + 1)
      sum += at(i + reach + 1) - at(i - reach)
    }
  }
  return out
}
