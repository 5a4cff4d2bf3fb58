import type { ExpressionSpecification } from 'maplibre-gl'

/** The source and its layer, as every layer of the style names them. */
export const fromGround = (layer: string) => ({ source: 'ground', 'source-layer': layer })

/** A number that follows the zoom, straight between the stops. */
export const byZoom = (...stops: [zoom: number, value: number][]): ExpressionSpecification =>
  ['interpolate', ['linear'], ['zoom'], ...stops.flat()] as unknown as ExpressionSpecification

/** True for features of one of the kinds. */
export const kind = (...kinds: string[]): ExpressionSpecification => [
  'in',
  ['get', 'kind'],
  ['literal', kinds],
]
