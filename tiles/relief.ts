import { distanceTo, signedDistanceTo } from './distance'
import { gradientNoise, layered } from './noise'
import { areasAbove, mapRaster, type Raster, rasterOf } from './raster'
import { curveThrough, cutCorners, type Metres, oval } from './shape'
import { coast, edge, hills, lowShores, northCliffs, quarries, seed, sheet, streams, tarn } from './skerrow'

export interface Relief {
  /** Rings of the shore in metres, closed, islets included. */
  shores: Metres[][]
  /** Metres to the shore: above 0 at sea, below 0 on land. */
  sea: Raster
  /** Height of the land surface in metres, carried on smoothly under the sea, so that cliffs are where it is high at the shore. */
  height: Raster
  /** From 0 (a beach) to 1 (a cliff). */
  steep: Raster
  tarn: Metres[]
  pits: { name: string; ring: Metres[] }[]
  becks: { name: string; line: Metres[] }[]
}

const step = 15
const bell = (far: number, reach: number) => Math.exp(-((far / reach) ** 2))
const ease = (from: number, to: number, value: number) => {
  const t = Math.min(1, Math.max(0, (value - from) / (to - from)))
  return t * t * (3 - 2 * t)
}

/** The island's surface, the same every time: shore, heights and what is cut into them. */
export function raiseIsland(): Relief {
  const shores = roughShores()
  const grid = rasterOf(sheet, step, () => 0)
  const sea = signedDistanceTo(grid, shores)
  const becks = wanderingBecks()
  const beck = distanceTo(
    grid,
    becks.map(({ line }) => line),
  )
  const steep = rasterOf(sheet, step, steepness)
  const tarnRing = oval(
    tarn.at,
    tarn.reach,
    tarn.turn,
    a => 0.16 * Math.sin(2 * a + 1) + 0.08 * Math.sin(3 * a),
  )
  const height = heights(sea, beck, steep, distanceTo(grid, [tarnRing]))
  return { shores, sea, height, steep, tarn: tarnRing, pits: pits(), becks }
}

function roughShores(): Metres[][] {
  const noise = layered(gradientNoise(seed), 5, 0.58)
  const smooth = signedDistanceTo(
    rasterOf(sheet, step, () => 0),
    [curveThrough(coast, 25, true)],
  )
  const rough = mapRaster(smooth, index => {
    const east = sheet.west + (index % smooth.columns) * step
    const north = sheet.north - Math.floor(index / smooth.columns) * step
    return -smooth.values[index]! + 82 * noise(east / 620, north / 620)
  })
  return areasAbove(rough, 0)
    .map(polygon => cutCorners(polygon[0]!, true))
    .filter(ring => ring.length > 24)
}

function wanderingBecks(): Relief['becks'] {
  const noise = layered(gradientNoise(seed + 5), 2)
  return streams.map(({ name, line }) => ({
    name,
    line: curveThrough(line, 30).map(([east, north], i, all): Metres => {
      const sway = 55 * Math.sin((Math.PI * i) / (all.length - 1))
      return [
        east + sway * noise(east / 260, north / 260 + 40),
        north + sway * noise(east / 260 + 90, north / 260),
      ]
    }),
  }))
}

function steepness(east: number, north: number): number {
  let steep = ease(-350, -1150, north)
  for (const { at, reach } of northCliffs)
    steep = Math.max(steep, bell(Math.hypot(east - at[0], north - at[1]), reach))
  for (const { at, reach } of lowShores) steep *= 1 - bell(Math.hypot(east - at[0], north - at[1]), reach)
  return steep
}

function heights(sea: Raster, beck: Raster, steep: Raster, tarnFar: Raster): Raster {
  const broad = layered(gradientNoise(seed + 1), 3, 0.45)
  const fine = layered(gradientNoise(seed + 2), 2, 0.5)
  const swell = gradientNoise(seed + 3)
  return rasterOf(sheet, step, (east, north, index) => {
    const bend = 170 * swell(east / 1500, north / 1500)
    const [x, y] = [east + bend, north - bend * 0.7]
    let high = 56 + 15 * swell(east / 1900 + 8, north / 1900)
    for (const hill of hills) high += hill.high * hillAt(hill, x, y)
    high *= 1 + 0.17 * broad(x / 900, y / 900)
    high += 2.2 * fine(east / 300, north / 300) + scarp(east, north)
    high *= 1 - 0.36 * bell(beck.values[index]!, 300)
    high -= 9 * bell(tarnFar.values[index]!, 260)
    const inland = -sea.values[index]!
    const shelving = 1 - Math.exp(-Math.max(0, inland) / 620)
    const rise = steep.values[index]! + (1 - steep.values[index]!) * shelving
    return Math.max(0.5, high * rise)
  })
}

function hillAt({ at, reach, turn }: (typeof hills)[number], east: number, north: number): number {
  const [dx, dy] = [east - at[0], north - at[1]]
  const along = (dx * Math.cos(turn) + dy * Math.sin(turn)) / reach[0]
  const across = (-dx * Math.sin(turn) + dy * Math.cos(turn)) / reach[1]
  return Math.exp(-(along * along + across * across))
}

/** The step in the hillside under the gritstone edge: 22 m within about 70 m. */
function scarp(east: number, north: number): number {
  const first = edge.line[0]!
  const last = edge.line[edge.line.length - 1]!
  const away = Math.max(first[0] - east, 0, east - last[0])
  if (away > 700) return 0
  const next = Math.max(
    1,
    edge.line.findIndex(([x]) => x >= east),
  )
  const [a, b] = [edge.line[next - 1]!, edge.line[next]!]
  const along = Math.min(1, Math.max(0, (east - a[0]) / (b[0] - a[0])))
  const top = a[1] + (b[1] - a[1]) * along
  return 11 * Math.tanh((north - top) / 35) * bell(away, 260) * bell(north - top, 420)
}

function pits(): Relief['pits'] {
  const noise = gradientNoise(seed + 7)
  return quarries.map(({ name, at, reach, turn }) => ({
    name,
    ring: oval(
      at,
      reach,
      turn,
      angle => 0.24 * noise(at[0] + 1.4 * Math.cos(angle), at[1] + 1.4 * Math.sin(angle)),
    ),
  }))
}
