import { GeoJSONVT, type GeoJSONVTFeature, type GeoJSONVTTile } from '@maplibre/geojson-vt'
import { fromGeojsonVt } from '@maplibre/vt-pbf'
import type { Feature } from 'geojson'
import type { GroundLayer } from './ground'

const options = { maxZoom: 14, indexMaxZoom: 7, indexMaxPoints: 0, extent: 4096, buffer: 96, tolerance: 1 }

/** An encoded vector tile, or null where there is nothing. */
export type Cutter = (z: number, x: number, y: number) => Uint8Array | null

/** Cuts layers into tiles; each layer from its own zoom on. */
export function tileCutter(layers: GroundLayer[]): Cutter {
  const indexed = layers.map(({ name, fromZoom, features }) => ({
    name,
    fromZoom,
    index: new GeoJSONVT(collection(features), options),
  }))
  return (z, x, y) => {
    const found: Record<string, GeoJSONVTTile> = {}
    for (const { name, fromZoom, index } of indexed) {
      const whole = z < fromZoom ? null : index.getTile(z, x, y)
      const tile = whole && ({ ...whole, features: whole.features.filter(hasExtent) } as GeoJSONVTTile)
      if (!tile || tile.features.length === 0) continue
      const already = found[name]
      found[name] = already ? { ...already, features: [...already.features, ...tile.features] } : tile
    }
    return Object.keys(found).length === 0 ? null : fromGeojsonVt(found, { version: 2, extent: 4096 })
  }
}

/** False for an area that a hole fills wholly, which cutting leaves where a tile lies within the hole. */
function hasExtent({ type, geometry }: GeoJSONVTFeature): boolean {
  if (type !== 3) return true
  let twice = 0
  for (const ring of geometry as [number, number][][])
    for (let i = 0, before = ring.length - 1; i < ring.length; before = i++)
      twice += ring[before]![0] * ring[i]![1] - ring[i]![0] * ring[before]![1]
  return Math.abs(twice) > 2
}

const collection = (features: Feature[]): GeoJSON.FeatureCollection => ({
  type: 'FeatureCollection',
  features,
})

/** Column and row of the tile that holds a place, at a zoom, unclamped. */
export function tileOf(lon: number, lat: number, z: number): [x: number, y: number] {
  const phi = (lat * Math.PI) / 180
  const y = (1 - Math.log(Math.tan(phi) + 1 / Math.cos(phi)) / Math.PI) / 2
  return [Math.floor(((lon + 180) / 360) * 2 ** z), Math.floor(y * 2 ** z)]
}
