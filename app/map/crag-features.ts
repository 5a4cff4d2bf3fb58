import type { FeatureCollection, Point } from 'geojson'
import { drawingOrder, type MapTheme, type MarkState, markImageName } from './mark'

/** A crag as the map draws it. */
export interface MappedCrag {
  code: string
  name: string
  lon: number
  lat: number
  state: MarkState
}

/** The crags as points with the picture to draw and the order to draw it in, worst on top. */
export function cragFeatures(crags: MappedCrag[], theme: MapTheme): FeatureCollection<Point> {
  return {
    type: 'FeatureCollection',
    features: crags.map(({ code, name, lon, lat, state }) => ({
      type: 'Feature',
      geometry: { type: 'Point', coordinates: [lon, lat] },
      properties: { code, name, image: markImageName(state, theme), order: drawingOrder(state) },
    })),
  }
}

/** The box around the crags, grown by a tenth and by at least 400 m; null without crags. */
export function boundsOf(crags: { lon: number; lat: number }[]): [number, number, number, number] | null {
  if (crags.length === 0) return null
  const lons = crags.map(({ lon }) => lon)
  const lats = crags.map(({ lat }) => lat)
  const [west, east] = [Math.min(...lons), Math.max(...lons)]
  const [south, north] = [Math.min(...lats), Math.max(...lats)]
  const wide = Math.max(0.0043, (east - west) / 10)
  const high = Math.max(0.0036, (north - south) / 10)
  return [west - wide, south - high, east + wide, north + high]
}
