import { distanceTo } from './distance'
import { areasFeature } from './geography'
import type { GroundLayer } from './ground'
import { quarryAreas } from './ground-coast'
import { gradientNoise, layered } from './noise'
import { areasAbove, mapRaster, type Raster } from './raster'
import type { Relief } from './relief'
import type { Metres } from './shape'
import { lowShores, seed, settlements } from './skerrow'

/** What covers the land: woods in the valleys, heath on the fells, beaches, quarries, by Shortbread's kinds. */
export function coverOf(relief: Relief): GroundLayer[] {
  const features = [
    areasFeature(largerThan(areasAbove(heath(relief), 0), 30_000), { kind: 'heath' }),
    areasFeature(largerThan(areasAbove(woods(relief), 0), 12_000), { kind: 'forest' }),
    areasFeature(largerThan(areasAbove(beaches(relief), 0), 1_500), { kind: 'beach' }),
    quarryAreas(relief),
  ]
  return [{ name: 'land', fromZoom: 8, features }]
}

const placeOf = (raster: Raster, index: number): Metres => [
  raster.west + (index % raster.columns) * raster.step,
  raster.north - Math.floor(index / raster.columns) * raster.step,
]

/** Above 0 where heath grows: high ground, its lower edge ragged. */
function heath({ height, sea }: Relief): Raster {
  const ragged = layered(gradientNoise(seed + 11), 3)
  return mapRaster(height, index => {
    const [east, north] = placeOf(height, index)
    const high = (height.values[index]! - 128) / 40 + 0.9 * ragged(east / 520, north / 520)
    return Math.min(high, (-sea.values[index]! - 150) / 60)
  })
}

/** Above 0 where trees stand: along the becks, out of the wind of the shore, below the heath. */
function woods({ height, sea, becks, tarn }: Relief): Raster {
  const ragged = layered(gradientNoise(seed + 12), 3)
  const beck = distanceTo(
    height,
    becks.map(({ line }) => line),
  )
  const water = distanceTo(height, [tarn])
  return mapRaster(height, index => {
    const [east, north] = placeOf(height, index)
    const sheltered = 0.62 * Math.exp(-((beck.values[index]! / 260) ** 2)) - height.values[index]! / 420
    const homes = settlements.map(({ at }) => Math.hypot(at[0] - east, at[1] - north))
    const wild = (Math.min(...homes) - 330) / 90
    const dry = (water.values[index]! - 30) / 60
    const grown = sheltered + 0.62 * ragged(east / 430 + 50, north / 430) - 0.36
    return Math.min(grown, wild, dry, (-sea.values[index]! - 260) / 90)
  })
}

/** Above 0 on the flat foot of the low shores. */
function beaches({ sea, height }: Relief): Raster {
  return mapRaster(sea, index => {
    const [east, north] = placeOf(sea, index)
    const far = lowShores.map(({ at, reach }) => 1 - Math.hypot(at[0] - east, at[1] - north) / (reach * 0.8))
    return Math.min(Math.max(...far), (38 + sea.values[index]!) / 20, (9 - height.values[index]!) / 5)
  })
}

function largerThan(polygons: Metres[][][], squareMetres: number): Metres[][][] {
  return polygons
    .filter(([outer]) => Math.abs(areaOf(outer!)) > squareMetres)
    .map(([outer, ...holes]) => [outer!, ...holes.filter(hole => Math.abs(areaOf(hole)) > squareMetres / 4)])
}

/** Area of a closed ring in square metres, above 0 when it turns anticlockwise. */
function areaOf(ring: Metres[]): number {
  let twice = 0
  for (let i = 0; i + 1 < ring.length; i++)
    twice += ring[i]![0] * ring[i + 1]![1] - ring[i + 1]![0] * ring[i]![1]
  return twice / 2
}
