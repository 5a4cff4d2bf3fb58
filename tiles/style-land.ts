import type { LayerSpecification } from 'maplibre-gl'
import type { GroundPalette } from './palette'
import { byZoom, fromGround, kind } from './style-parts'

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
