import type { ExpressionSpecification, LayerSpecification } from 'maplibre-gl'
import type { GroundPalette } from './palette'
import { byZoom, fromGround, kind } from './style-parts'

/** Roads white and cased, paths broken, houses small. */
export function wayLayers(c: GroundPalette): LayerSpecification[] {
  const roads = [
    'motorway',
    'trunk',
    'primary',
    'secondary',
    'tertiary',
    'unclassified',
    'residential',
    'living_street',
  ]
  const main = kind('motorway', 'trunk', 'primary', 'secondary', 'tertiary')
  const width = (zoom: number, large: number, small: number): [number, ExpressionSpecification] => [
    zoom,
    ['case', main, large, small],
  ]
  const wide = (...stops: [number, ExpressionSpecification][]) =>
    ['interpolate', ['linear'], ['zoom'], ...stops.flat()] as unknown as ExpressionSpecification
  return [
    {
      id: 'paths',
      type: 'line',
      ...fromGround('streets'),
      minzoom: 12,
      filter: kind('path', 'footway', 'bridleway', 'steps'),
      paint: {
        'line-color': c.path,
        'line-width': byZoom([12, 0.7], [13, 0.9], [16, 1.6]),
        'line-dasharray': [3, 2.2],
        'line-opacity': 0.85,
      },
    },
    {
      id: 'tracks',
      type: 'line',
      ...fromGround('streets'),
      minzoom: 11.5,
      filter: kind('track', 'service'),
      paint: {
        'line-color': c.path,
        'line-width': byZoom([11.5, 0.8], [13, 1.2], [16, 2.4]),
        'line-dasharray': [6, 1.6],
      },
    },
    {
      id: 'roads-edge',
      type: 'line',
      ...fromGround('streets'),
      filter: kind(...roads),
      layout: { 'line-cap': 'round', 'line-join': 'round' },
      paint: {
        'line-color': c.roadEdge,
        'line-width': wide(width(10, 1.6, 0.8), width(13, 5, 3.6), width(16, 13, 10)),
      },
    },
    {
      id: 'roads',
      type: 'line',
      ...fromGround('streets'),
      filter: kind(...roads),
      layout: { 'line-cap': 'round', 'line-join': 'round' },
      paint: {
        'line-color': c.road,
        'line-width': wide(width(10, 0.8, 0.3), width(13, 3.4, 2.2), width(16, 11, 8)),
      },
    },
    {
      id: 'buildings',
      type: 'fill',
      ...fromGround('buildings'),
      minzoom: 13,
      paint: { 'fill-color': c.building },
    },
  ]
}
