import type { Feature } from 'geojson'
import { signedDistanceTo } from './distance'
import { areasFeature, lineFeature, pointFeature } from './geography'
import type { GroundLayer } from './ground'
import { areasAbove, blurred, mapRaster, type Raster, valueAt } from './raster'
import type { Relief } from './relief'
import { keepWhere, lengthOf, type Metres } from './shape'
import { fells } from './skerrow'

/** Contours each 10 m (each 50 m an index), soft shading by steps, and summits with their heights. */
export function heightLines(relief: Relief): GroundLayer[] {
  const lines = contourLines(relief)
  return [
    { name: 'x_hillshade', fromZoom: 8, features: shading(relief) },
    { name: 'x_contours', fromZoom: 10, features: lines.filter(({ properties }) => properties?.index) },
    { name: 'x_contours', fromZoom: 11, features: lines.filter(({ properties }) => !properties?.index) },
    { name: 'x_peaks', fromZoom: 11, features: summits(relief) },
  ]
}

function contourLines({ height, sea, pits, tarn }: Relief): Feature[] {
  const pit = signedDistanceTo(
    height,
    pits.map(({ ring }) => ring),
  )
  const water = signedDistanceTo(height, [tarn])
  const shown = (at: Metres) => Math.min(-valueAt(sea, at), valueAt(pit, at), valueAt(water, at))
  const highest = height.values.reduce((a, b) => Math.max(a, b))
  const features: Feature[] = []
  for (let ele = 10; ele < highest; ele += 10)
    for (const ring of areasAbove(height, ele).flat())
      for (const line of keepWhere(ring, shown))
        if (lengthOf(line) > 520) features.push(lineFeature(line, { ele, index: ele % 50 === 0 }))
  return features
}

const lightFrom = { east: -0.64, north: 0.77 }

/**
 * Shade as nested areas, light from the north-west: `tone` 1 to 5 the darker the steeper away from the light, -1 to -5
 * the brighter towards it. Each is drawn over the one before, so a few thin washes make an even slope of tone.
 */
function shading({ height, sea }: Relief): Feature[] {
  const smooth = blurred(height, 3)
  const lit = blurred(
    mapRaster(smooth, index => (sea.values[index]! > 60 ? 0 : slopeTowards(smooth, index))),
    2,
  )
  const away = mapRaster(lit, index => -lit.values[index]!)
  return [1, 2, 3, 4, 5, 6].flatMap(tone => [
    areasFeature(areasAbove(away, 0.035 * tone ** 1.25), { tone }),
    areasFeature(areasAbove(lit, 0.035 * tone ** 1.25), { tone: -tone }),
  ])
}

/** Rise per metre along the light's way, at one value of the raster. */
function slopeTowards({ values, columns, rows, step }: Raster, index: number): number {
  const column = index % columns
  const row = Math.floor(index / columns)
  if (column === 0 || row === 0 || column === columns - 1 || row === rows - 1) return 0
  const east = (values[index + 1]! - values[index - 1]!) / (2 * step)
  const north = (values[index - columns]! - values[index + columns]!) / (2 * step)
  return -(east * lightFrom.east + north * lightFrom.north)
}

/** The highest spot within 350 m of each named fell, with its height in whole metres. */
function summits({ height }: Relief): Feature[] {
  return fells.map(({ name, at }) => {
    let best = { at, high: 0 }
    for (let east = at[0] - 350; east <= at[0] + 350; east += 15)
      for (let north = at[1] - 350; north <= at[1] + 350; north += 15) {
        const high = valueAt(height, [east, north])
        if (high > best.high) best = { at: [east, north], high }
      }
    return pointFeature(best.at, { name, ele: Math.round(best.high) })
  })
}
