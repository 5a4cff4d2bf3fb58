import type { LayerSpecification } from 'maplibre-gl'
import type { GroundPalette } from './palette'
import { byZoom, fromGround } from './style-parts'

/**
 * The sea over the land's edge, water lines, shore, becks and cliffs. Far out the teeth stand behind the shore, where
 * they can be seen; near, they hang from the cliff's top towards the sea.
 */
export function seaLayers(c: GroundPalette): LayerSpecification[] {
  return [
    {
      id: 'ocean',
      type: 'fill',
      ...fromGround('ocean'),
      paint: { 'fill-color': c.sea, 'fill-antialias': false },
    },
    {
      id: 'waterlines',
      type: 'line',
      ...fromGround('x_waterlines'),
      minzoom: 11,
      layout: { 'line-join': 'round' },
      paint: {
        'line-color': c.waterline,
        'line-width': byZoom([11, 0.4], [13, 0.7], [16, 0.9]),
        'line-opacity': ['interpolate', ['linear'], ['get', 'order'], 0, 0.75, 4, 0.2],
      },
    },
    {
      id: 'becks',
      type: 'line',
      ...fromGround('water_lines'),
      layout: { 'line-cap': 'round', 'line-join': 'round' },
      paint: { 'line-color': c.beck, 'line-width': byZoom([11, 0.5], [13, 1], [16, 2.2]) },
    },
    {
      id: 'water',
      type: 'fill',
      ...fromGround('water_polygons'),
      paint: { 'fill-color': c.sea, 'fill-antialias': false },
    },
    {
      id: 'water-edge',
      type: 'line',
      ...fromGround('water_polygons'),
      paint: { 'line-color': c.coast, 'line-width': byZoom([11, 0.6], [13, 1.1], [16, 1.5]) },
    },
    {
      id: 'coast',
      type: 'line',
      ...fromGround('x_coast'),
      layout: { 'line-join': 'round' },
      paint: { 'line-color': c.coast, 'line-width': byZoom([7, 0.6], [11, 1], [13, 1.5], [16, 2]) },
    },
    {
      id: 'cliff-teeth',
      type: 'line',
      ...fromGround('x_cliffs'),
      minzoom: 11.5,
      paint: {
        'line-color': c.cliff,
        'line-width': byZoom([11.5, 2.4], [13, 3.8], [15, 4.2], [17, 6.4]),
        'line-offset': byZoom([11.5, -1], [13.2, -0.9], [14.4, 1.2], [15, 2.1], [17, 3.2]),
        'line-dasharray': [0.28, 0.72],
        'line-opacity': 0.78,
      },
    },
    {
      id: 'cliff-top',
      type: 'line',
      ...fromGround('x_cliffs'),
      minzoom: 13.4,
      layout: { 'line-join': 'round' },
      paint: {
        'line-color': c.cliff,
        'line-width': byZoom([12, 0.5], [13, 0.8], [16, 1.3]),
        'line-opacity': byZoom([13.4, 0], [14.2, 0.8]),
      },
    },
  ]
}
