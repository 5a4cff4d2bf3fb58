import type { Feature, LineString, MultiPolygon, Point, Polygon, Position } from 'geojson'
import type { Metres } from './shape'
import { middle } from './skerrow'

// At 33.4 N on WGS 84, from geodesics of a tenth of a degree.
const metresPerDegree = 110_911.6
const metresPerDegreeEast = 93_029.2

/** Longitude and latitude, to 1e-7 of a degree, of a place on the sheet. */
export function toLonLat([east, north]: Metres): Position {
  const round = (degrees: number) => Math.round(degrees * 1e7) / 1e7
  return [round(middle.lon + east / metresPerDegreeEast), round(middle.lat + north / metresPerDegree)]
}

type Facts = Record<string, string | number | boolean>

export const lineFeature = (line: Metres[], properties: Facts = {}): Feature<LineString> => ({
  type: 'Feature',
  properties,
  geometry: { type: 'LineString', coordinates: line.map(toLonLat) },
})

export const areaFeature = (rings: Metres[][], properties: Facts = {}): Feature<Polygon> => ({
  type: 'Feature',
  properties,
  geometry: { type: 'Polygon', coordinates: rings.map(ring => ring.map(toLonLat)) },
})

export const areasFeature = (polygons: Metres[][][], properties: Facts = {}): Feature<MultiPolygon> => ({
  type: 'Feature',
  properties,
  geometry: { type: 'MultiPolygon', coordinates: polygons.map(p => p.map(ring => ring.map(toLonLat))) },
})

export const pointFeature = (at: Metres, properties: Facts = {}): Feature<Point> => ({
  type: 'Feature',
  properties,
  geometry: { type: 'Point', coordinates: toLonLat(at) },
})
