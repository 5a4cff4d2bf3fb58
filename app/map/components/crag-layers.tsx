import { useMemo } from 'react'
import { Layer, Source } from 'react-map-gl/maplibre'
import { cragFeatures, type MappedCrag } from '../crag-features'
import { cornersImageName, type MapTheme, markInks } from '../mark'

/** Layer whose marks answer to the pointer. */
export const marksLayer = 'crag-marks'

export interface CragLayersProps {
  crags: MappedCrag[]
  selected: string | null
  hovered: string | null
  theme: MapTheme
}

/** The crags' marks, names and corner ticks; a name that finds no room is left out, a mark never is. */
export function CragLayers({ crags, selected, hovered, theme }: CragLayersProps) {
  const data = useMemo(() => cragFeatures(crags, theme), [crags, theme])
  const inks = markInks[theme]
  const chosen = selected ?? ''
  const pointedAt = hovered && hovered !== selected ? hovered : ''
  return (
    <Source id="crags" type="geojson" data={data}>
      <Layer
        id="crag-names"
        type="symbol"
        layout={{
          'text-field': ['get', 'name'],
          'text-font': ['Work Sans SemiBold'],
          'text-size': 13,
          'text-variable-anchor': ['top', 'bottom', 'left', 'right'],
          'text-radial-offset': 1.45,
          'text-padding': 3,
          'symbol-sort-key': [
            'case',
            ['in', ['get', 'code'], ['literal', [chosen, pointedAt]]],
            -99,
            ['-', 0, ['get', 'order']],
          ],
        }}
        paint={{
          'text-color': inks.slate,
          'text-halo-color': inks.disc,
          'text-halo-width': 1.7,
          'text-halo-blur': 0.4,
        }}
      />
      <Layer
        id={marksLayer}
        type="symbol"
        layout={{
          'icon-image': ['get', 'image'],
          'icon-allow-overlap': true,
          'icon-padding': 0,
          'symbol-sort-key': ['get', 'order'],
        }}
      />
      <Layer
        id="crag-corners"
        type="symbol"
        filter={['in', ['get', 'code'], ['literal', [chosen, pointedAt]]]}
        layout={{
          'icon-image': [
            'case',
            ['==', ['get', 'code'], chosen],
            cornersImageName('selected', theme),
            cornersImageName('hovered', theme),
          ],
          'icon-allow-overlap': true,
          'icon-ignore-placement': true,
        }}
      />
    </Source>
  )
}
