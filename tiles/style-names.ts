import type { ExpressionSpecification, LayerSpecification } from 'maplibre-gl'
import type { GroundPalette } from './palette'
import { fromGround } from './style-parts'

/** Names and heights, in Work Sans: upright on land, italic on water. */
export function nameLayers(c: GroundPalette): LayerSpecification[] {
  const name: ExpressionSpecification = ['get', 'name']
  const onLand = { 'text-color': c.placeText, 'text-halo-color': c.landHalo, 'text-halo-width': 1.4 }
  const onWater = { 'text-color': c.waterText, 'text-halo-color': c.seaHalo, 'text-halo-width': 1.2 }
  return [
    {
      id: 'contour-heights',
      type: 'symbol',
      ...fromGround('x_contours'),
      minzoom: 12,
      filter: ['get', 'index'],
      layout: {
        'symbol-placement': 'line',
        'symbol-spacing': 420,
        'text-field': ['to-string', ['get', 'ele']],
        'text-font': ['Work Sans Regular'],
        'text-size': 10,
        'text-padding': 12,
        'text-max-angle': 25,
      },
      paint: { 'text-color': c.contourText, 'text-halo-color': c.landHalo, 'text-halo-width': 1.6 },
    },
    {
      id: 'beck-names',
      type: 'symbol',
      ...fromGround('water_lines_labels'),
      minzoom: 13.2,
      layout: {
        'symbol-placement': 'line',
        'text-field': name,
        'text-font': ['Work Sans Italic'],
        'text-size': 11,
        'text-letter-spacing': 0.04,
        'text-offset': [0, -0.7],
      },
      paint: { ...onWater, 'text-halo-color': c.landHalo },
    },
    {
      id: 'water-names',
      type: 'symbol',
      ...fromGround('water_polygons_labels'),
      minzoom: 12.2,
      layout: {
        'text-field': name,
        'text-font': ['Work Sans Italic'],
        'text-size': 11,
        'text-offset': [0, 1.6],
      },
      paint: { ...onWater, 'text-halo-color': c.landHalo },
    },
    {
      id: 'sea-names',
      type: 'symbol',
      ...fromGround('x_sea_labels'),
      minzoom: 10,
      filter: ['step', ['zoom'], ['==', ['get', 'size'], 'sound'], 13, true],
      layout: {
        'text-field': name,
        'text-font': ['Work Sans Italic'],
        'text-size': ['case', ['==', ['get', 'size'], 'sound'], 13, 11.5],
        'text-letter-spacing': 0.05,
      },
      paint: onWater,
    },
    {
      id: 'peaks',
      type: 'symbol',
      ...fromGround('x_peaks'),
      minzoom: 11.6,
      layout: {
        'text-field': [
          'format',
          name,
          { 'font-scale': 1 },
          '\n',
          {},
          ['to-string', ['get', 'ele']],
          { 'font-scale': 0.84 },
        ],
        'text-font': ['Work Sans Regular'],
        'text-size': 12,
        'text-letter-spacing': 0.02,
        'text-line-height': 1.15,
      },
      paint: onLand,
    },
    {
      id: 'places',
      type: 'symbol',
      ...fromGround('place_labels'),
      minzoom: 11,
      filter: ['!=', ['get', 'kind'], 'island'],
      layout: {
        'text-field': name,
        'text-font': ['Work Sans Regular'],
        'text-size': [
          'match',
          ['get', 'kind'],
          ['hamlet', 'farm', 'isolated_dwelling', 'locality'],
          11.5,
          12.5,
        ],
        'text-letter-spacing': 0.02,
      },
      paint: onLand,
    },
    {
      id: 'islands',
      type: 'symbol',
      ...fromGround('place_labels'),
      minzoom: 7,
      maxzoom: 11.6,
      filter: ['==', ['get', 'kind'], 'island'],
      layout: {
        'text-field': name,
        'text-font': ['Work Sans Regular'],
        'text-size': 13,
        'text-letter-spacing': 0.04,
      },
      paint: onLand,
    },
  ]
}
