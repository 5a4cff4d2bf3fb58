import type { Feature } from 'geojson'
import { areaFeature, areasFeature, lineFeature, pointFeature, toLonLat } from './geography'
import type { GroundLayer } from './ground'
import { areasAbove, blurred, mapRaster, valueAt } from './raster'
import type { Relief } from './relief'
import { cutCorners, keepWhere, lengthOf, type Metres, withOnRight } from './shape'
import { edge, quarries, seaBox, seaNames, tarn } from './skerrow'

/** The sea and what follows its edge: shore, water lines, cliffs and their names. */
export function coastLines(relief: Relief): GroundLayer[] {
  return [
    { name: 'ocean', fromZoom: 7, features: [ocean(relief)] },
    {
      name: 'water_polygons',
      fromZoom: 10,
      features: [areaFeature([relief.tarn], { kind: 'water', ...tarnArea })],
    },
    {
      name: 'water_polygons_labels',
      fromZoom: 12,
      features: [pointFeature(tarn.at, { kind: 'water', name: tarn.name, name_en: tarn.name, ...tarnArea })],
    },
    {
      name: 'water_lines',
      fromZoom: 11,
      features: beckLines(relief).map(({ line }) =>
        lineFeature(line, { kind: 'stream', tunnel: false, bridge: false }),
      ),
    },
    {
      name: 'water_lines_labels',
      fromZoom: 13,
      features: beckLines(relief).map(({ name, line }) =>
        lineFeature(line, { kind: 'stream', name, name_en: name }),
      ),
    },
    { name: 'x_coast', fromZoom: 7, features: relief.shores.map(ring => lineFeature(ring)) },
    { name: 'x_waterlines', fromZoom: 10, features: waterLines(relief) },
    { name: 'x_cliffs', fromZoom: 11, features: cliffs(relief) },
    {
      name: 'x_sea_labels',
      fromZoom: 9,
      features: seaNames.map(({ at, ...facts }) => pointFeature(at, facts)),
    },
  ]
}

const tarnArea = { way_area: Math.round(Math.PI * tarn.reach[0] * tarn.reach[1]) }

function ocean(relief: Relief): Feature {
  const { west, south, east, north } = seaBox
  const box = [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
    [west, south],
  ]
  const islands = relief.shores.map(ring => ring.map(toLonLat))
  return { type: 'Feature', properties: {}, geometry: { type: 'Polygon', coordinates: [box, ...islands] } }
}

function beckLines(relief: Relief): { name: string; line: Metres[] }[] {
  return relief.becks.flatMap(({ name, line }) =>
    keepWhere(line, at => -valueAt(relief.sea, at))
      .slice(0, 1)
      .map(piece => ({ name, line: piece })),
  )
}

/** Lines along the shore that thin out to seaward, as an engraver drew shallow water. */
function waterLines(relief: Relief): Feature[] {
  return [26, 60, 104, 160, 230].flatMap((far, order) =>
    areasAbove(blurred(relief.sea, order + 1), far)
      .flat()
      .flatMap(ring => keepWhere(ring, onSheet))
      .map(line => lineFeature(line, { order })),
  )
}

const onSheet = ([east, north]: Metres) => Math.min(6300 - Math.abs(east), 4600 - Math.abs(north))

/** Cliff tops with the fall on the right hand: sea cliffs, the quarries' faces and the inland edge. */
function cliffs(relief: Relief): Feature[] {
  return [
    ...seaCliffs(relief).map(line => lineFeature(line, { kind: 'sea' })),
    ...quarryFaces(relief).map(({ line }) => lineFeature(line, { kind: 'quarry' })),
    lineFeature(gritEdge(), { kind: 'edge' }),
  ]
}

/** Tops of the sea cliffs: 18 m behind the shore wherever the land there is 18 m high or more. */
function seaCliffs(relief: Relief): Metres[][] {
  const land = mapRaster(relief.sea, index => -relief.sea.values[index]!)
  return areasAbove(land, 18)
    .flat()
    .map(ring => cutCorners(ring, true))
    .flatMap(ring =>
      keepWhere(ring, at =>
        Math.min(valueAt(relief.height, at) - 18, 60 * (valueAt(relief.steep, at) - 0.45)),
      ),
    )
    .filter(line => lengthOf(line) > 140)
    .map(line => withOnRight(line, at => valueAt(relief.sea, at)))
}

/** The worked faces of the quarries, all but the mouth. */
function quarryFaces(relief: Relief): { name: string; line: Metres[] }[] {
  return relief.pits.map(({ name, ring }, i) => {
    const { at, turn, mouth } = quarries[i]!
    const open = (place: Metres) => {
      const angle = Math.atan2(place[1] - at[1], place[0] - at[0]) - turn - mouth
      return Math.abs(Math.atan2(Math.sin(angle), Math.cos(angle))) - 0.75
    }
    const start = ring.findIndex(place => open(place) <= 0)
    const turned = [...ring.slice(start, -1), ...ring.slice(0, start + 1)]
    const line = keepWhere(turned, open)[0]!
    return { name, line: withOnRight(line, place => -Math.hypot(place[0] - at[0], place[1] - at[1])) }
  })
}

/** The gritstone edge, which falls to the south. */
function gritEdge(): Metres[] {
  const smooth = cutCorners(cutCorners(edge.line, false), false)
  return withOnRight(smooth, ([, north]) => -north)
}

export const quarryAreas = (relief: Relief): Feature =>
  areasFeature(
    relief.pits.map(({ ring }) => [ring]),
    { kind: 'quarry' },
  )
