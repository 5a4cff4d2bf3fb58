import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson'
import { feature } from 'topojson-client'
import type { GroundLayer } from './ground'

/** The rest of the world's seas at low zoom: all but Natural Earth's land (public domain, from world-atlas). */
export function worldOcean(): GroundLayer[] {
  const file = createRequire(import.meta.url).resolve('world-atlas/land-110m.json')
  const atlas = JSON.parse(readFileSync(file, 'utf8'))
  const land = feature(atlas, atlas.objects.land) as unknown as FeatureCollection<Polygon | MultiPolygon>
  const shores = land.features.flatMap(({ geometry }) =>
    geometry.type === 'Polygon' ? [geometry.coordinates[0]!] : geometry.coordinates.map(rings => rings[0]!),
  )
  const world: Position[] = [
    [-180, -85.0511],
    [180, -85.0511],
    [180, 85.0511],
    [-180, 85.0511],
    [-180, -85.0511],
  ]
  const ocean: Feature = {
    type: 'Feature',
    properties: {},
    geometry: { type: 'Polygon', coordinates: [world, ...shores] },
  }
  return [{ name: 'ocean', fromZoom: 0, features: [ocean] }]
}
