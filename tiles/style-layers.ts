import type { ExpressionSpecification, LayerSpecification } from 'maplibre-gl'
import type { GroundPalette } from './palette'

const fromGround = (layer: string) => ({ source: 'ground', 'source-layer': layer })

/** A number that follows the zoom, straight between the stops. */
const byZoom = (...stops: [zoom: number, value: number][]): ExpressionSpecification =>
  ['interpolate', ['linear'], ['zoom'], ...stops.flat()] as unknown as ExpressionSpecification

const kind = (...kinds: string[]): ExpressionSpecification => ['in', ['get', 'kind'], ['literal', kinds]]

/** Page of the sheet and what grows on it, with the soft shade of the hills. */
export function landLayers(c: GroundPalette): LayerSpecification[] {
  const cover = (id: string, kinds: string[], colour: string): LayerSpecification => ({
    id: `land-${id}`,
    type: 'fill',
    ...fromGround('land'),
    filter: kind(...kinds),
    paint: { 'fill-color': colour, 'fill-antialias': false },
  })
  const shade = (id: string, dark: boolean, colour: string, strength: number): LayerSpecification => ({
    id,
    type: 'fill',
    ...fromGround('x_hillshade'),
    filter: [dark ? '>' : '<', ['get', 'tone'], 0],
    paint: {
      'fill-color': colour,
      'fill-opacity': byZoom([13, strength], [15.5, strength * 0.3]),
      'fill-antialias': false,
    },
  })
  return [
    { id: 'page', type: 'background', paint: { 'background-color': c.land } },
    cover('heath', ['heath', 'scrub', 'grassland'], c.heath),
    cover('forest', ['forest'], c.forest),
    cover('beach', ['beach', 'sand', 'shingle'], c.beach),
    shade('shade', true, c.shade, c.shadeStrength),
    shade('light', false, c.light, c.lightStrength),
    cover('quarry', ['quarry', 'bare_rock', 'scree'], c.quarry),
  ]
}

/** Contours, fine and brown, each fifth stronger. */
export function heightLayers(c: GroundPalette): LayerSpecification[] {
  return [
    {
      id: 'contours',
      type: 'line',
      ...fromGround('x_contours'),
      minzoom: 11.4,
      filter: ['!', ['get', 'index']],
      layout: { 'line-join': 'round' },
      paint: {
        'line-color': c.contour,
        'line-width': byZoom([11, 0.5], [13, 0.7], [16, 1]),
        'line-opacity': c.contourStrength,
      },
    },
    {
      id: 'contours-index',
      type: 'line',
      ...fromGround('x_contours'),
      minzoom: 10,
      filter: ['get', 'index'],
      layout: { 'line-join': 'round' },
      paint: {
        'line-color': c.contour,
        'line-width': byZoom([10, 0.5], [13, 1.15], [16, 1.5]),
        'line-opacity': c.indexStrength,
      },
    },
  ]
}

/** The sea over the land's edge, water lines, shore, becks and the teeth of the cliffs. */
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
        'line-width': byZoom([11.5, 2], [13, 3.4], [15, 4.2], [17, 6.4]),
        'line-offset': byZoom([11.5, 1], [13, 1.7], [15, 2.1], [17, 3.2]),
        'line-dasharray': [0.3, 0.8],
        'line-opacity': 0.72,
      },
    },
    {
      id: 'cliff-top',
      type: 'line',
      ...fromGround('x_cliffs'),
      minzoom: 12.2,
      layout: { 'line-join': 'round' },
      paint: {
        'line-color': c.cliff,
        'line-width': byZoom([12, 0.5], [13, 0.8], [16, 1.3]),
        'line-opacity': 0.8,
      },
    },
  ]
}

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
      filter: ['step', ['zoom'], ['==', ['get', 'size'], 'sound'], 12, true],
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
        'text-variable-anchor': ['bottom', 'top', 'right', 'left'],
        'text-radial-offset': 0.7,
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
