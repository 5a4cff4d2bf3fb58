import type { Feature } from 'geojson'
import { areaFeature, lineFeature, pointFeature } from './geography'
import type { GroundLayer } from './ground'
import { gradientNoise, seeded } from './noise'
import { areasAbove, blurred, mapRaster, valueAt } from './raster'
import type { Relief } from './relief'
import { curveThrough, keepWhere, lengthOf, type Metres } from './shape'
import { seed, settlements, ways } from './skerrow'

/** What people made: roads, paths, houses, and the names of places. */
export function settled(relief: Relief): GroundLayer[] {
  const drawn = ways.map(({ kind, line }) => ({ kind, line: wind(line) }))
  const roads = drawn.filter(({ kind }) => kind === 'tertiary' || kind === 'unclassified')
  const paths = drawn.filter(({ kind }) => kind === 'track' || kind === 'path')
  const feature = ({ kind, line }: { kind: string; line: Metres[] }) => lineFeature(line, { kind, ...plain })
  return [
    { name: 'streets', fromZoom: 10, features: roads.map(feature) },
    {
      name: 'streets',
      fromZoom: 12,
      features: [...paths, ...coastPath(relief).map(line => ({ kind: 'path', line }))].map(feature),
    },
    { name: 'buildings', fromZoom: 13, features: houses(relief, roads) },
    { name: 'place_labels', fromZoom: 10, features: placeNames() },
    {
      name: 'place_labels',
      fromZoom: 7,
      features: [pointFeature([-300, 400], { kind: 'island', ...named('Isle of Skerrow'), population: 900 })],
    },
  ]
}

const plain = { link: false, rail: false, tunnel: false, bridge: false, oneway: false, oneway_reverse: false }
const named = (name: string) => ({ name, name_en: name })

/** A coarse way drawn as a road is: through its points, with small bends of its own. */
function wind(line: Metres[]): Metres[] {
  const noise = gradientNoise(seed + 21)
  const smooth = curveThrough(line, 45)
  return smooth.map(([east, north], i): Metres => {
    const sway = 34 * Math.sin((Math.PI * i) / (smooth.length - 1))
    return [
      east + sway * noise(east / 340, north / 340 + 9),
      north + sway * noise(east / 340 + 5, north / 340),
    ]
  })
}

/** The path along the southern cliff tops, some 70 m from the edge. */
function coastPath({ sea }: Relief): Metres[][] {
  const land = blurred(
    mapRaster(sea, index => -sea.values[index]!),
    4,
  )
  return areasAbove(land, 62)
    .flat()
    .flatMap(ring => keepWhere(ring, ([, north]) => -1150 - north))
    .filter(line => lengthOf(line) > 900)
}

function placeNames(): Feature[] {
  return settlements
    .toSorted((a, b) => b.population - a.population)
    .map(({ label, kind, name, population }) => pointFeature(label, { kind, ...named(name), population }))
}

/** Houses along the roads through each village, none in the sea or on another. */
function houses({ sea }: Relief, roads: { line: Metres[] }[]): Feature[] {
  const random = seeded(seed + 31)
  const built: Metres[] = []
  const features: Feature[] = []
  for (const { at, houses: wanted, population } of settlements) {
    const reach = 90 + population * 0.7
    const spots = roads.flatMap(({ line }) => roadSpots(line, at, reach))
    for (let tries = 0, made = 0; made < wanted && tries < wanted * 30 && spots.length > 0; tries++) {
      const { place, along } = spots[Math.floor(random() * spots.length)]!
      const side = random() < 0.5 ? -1 : 1
      const off = side * (17 + random() * 26 + (random() < 0.3 ? 30 : 0))
      const spot: Metres = [place[0] - Math.sin(along) * off, place[1] + Math.cos(along) * off]
      if (valueAt(sea, spot) > -25) continue
      if (built.some(other => Math.hypot(other[0] - spot[0], other[1] - spot[1]) < 19)) continue
      built.push(spot)
      made++
      features.push(
        areaFeature([house(spot, along + (random() - 0.5) * 0.3, 9 + random() * 7, 6.5 + random() * 3)], {
          dummy: 1,
        }),
      )
    }
  }
  return features
}

function roadSpots(line: Metres[], at: Metres, reach: number): { place: Metres; along: number }[] {
  const spots: { place: Metres; along: number }[] = []
  for (let i = 0; i + 1 < line.length; i++) {
    const [a, b] = [line[i]!, line[i + 1]!]
    for (const t of [0, 0.33, 0.67]) {
      const place: Metres = [a[0] + (b[0] - a[0]) * t, a[1] + (b[1] - a[1]) * t]
      if (Math.hypot(place[0] - at[0], place[1] - at[1]) < reach)
        spots.push({ place, along: Math.atan2(b[1] - a[1], b[0] - a[0]) })
    }
  }
  return spots
}

function house([east, north]: Metres, turn: number, long: number, deep: number): Metres[] {
  const corner = (x: number, y: number): Metres => [
    east + x * Math.cos(turn) - y * Math.sin(turn),
    north + x * Math.sin(turn) + y * Math.cos(turn),
  ]
  const [x, y] = [long / 2, deep / 2]
  return [corner(-x, -y), corner(x, -y), corner(x, y), corner(-x, y), corner(-x, -y)]
}
