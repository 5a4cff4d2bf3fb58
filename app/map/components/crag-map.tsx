import type { MapLayerMouseEvent, MapLibreMap, StyleSpecification } from 'maplibre-gl'
import * as maplibre from 'maplibre-gl'
import 'maplibre-gl/dist/maplibre-gl.css'
import workerUrl from 'maplibre-gl/dist/maplibre-gl-worker.mjs?url'
import { useEffect, useMemo, useRef } from 'react'
import MapView, {
  AttributionControl,
  type MapRef,
  type StyleSpecification as ViewStyle,
} from 'react-map-gl/maplibre'
import type { MappedCrag } from '../crag-features'
import type { MapTheme } from '../mark'
import { CragLayers, marksLayer } from './crag-layers'
import './crag-map.css'
import { drawMapImage } from './map-image'
import { SheetFrame } from './sheet-frame'
import { ZoomButtons } from './zoom-buttons'

maplibre.setWorkerUrl(workerUrl)

/** West, south, east, north in degrees. */
export type Bounds = [number, number, number, number]

export interface CragMapProps {
  crags: MappedCrag[]
  selected: string | null
  hovered: string | null
  onSelect: (code: string) => void
  onHover: (code: string | null) => void
  theme: MapTheme
  style: StyleSpecification
  bounds: Bounds
  /** Pixels kept free around `bounds`; larger below where a ledger covers the map. */
  padding?: number | { top: number; right: number; bottom: number; left: number }
  maxBounds?: Bounds
  label?: string
  onMoved?: (view: { bounds: Bounds; zoom: number }) => void
  /** Told once when the map cannot be drawn here; the list then stands alone. */
  onFailed?: (reason: string) => void
}

/** The map beside the list: ground, marks, and the furniture of a printed sheet. Load it after mount only. */
export default function CragMap(props: CragMapProps) {
  const { crags, selected, hovered, theme, style, bounds, padding = 56, maxBounds, label, onFailed } = props
  const box = useRef<HTMLDivElement>(null)
  const map = useRef<MapRef>(null)
  const pointer = usePointer(props)
  useFollow(map, crags, selected, bounds, padding)
  const named = label ?? 'Map of the crags. The list holds the same crags.'
  const locale = useMemo(() => ({ 'Map.Title': named }), [named])
  return (
    <div ref={box} className={`crag-map crag-map-${theme}`} data-map-theme={theme}>
      <MapView
        ref={map}
        mapLib={maplibre}
        mapStyle={style as ViewStyle}
        initialViewState={{ bounds, fitBoundsOptions: { padding } }}
        maxBounds={maxBounds}
        minZoom={1}
        maxZoom={18}
        maxPitch={0}
        dragRotate={false}
        pitchWithRotate={false}
        touchPitch={false}
        fadeDuration={0}
        attributionControl={false}
        locale={locale}
        {...pointer}
        onLoad={({ target }) => {
          target.touchZoomRotate.disableRotation()
          target.keyboard.disableRotation()
          tellMoved(target, props.onMoved)
        }}
        onMoveStart={() => box.current?.removeAttribute('data-map-idle')}
        onMoveEnd={({ target }) => tellMoved(target, props.onMoved)}
        onIdle={() => box.current?.setAttribute('data-map-idle', 'true')}
        onStyleData={({ target }) => offerImages(target)}
        onError={({ error }) => {
          if (/webgl/i.test(error?.message ?? '')) onFailed?.('This browser could not draw the map.')
        }}
      >
        <CragLayers crags={crags} selected={selected} hovered={hovered} theme={theme} />
        <AttributionControl compact={false} position="bottom-left" />
        <SheetFrame theme={theme} />
        <ZoomButtons />
      </MapView>
    </div>
  )
}

function tellMoved(map: MapLibreMap, onMoved: CragMapProps['onMoved']): void {
  const [[west, south], [east, north]] = map.getBounds().toArray() as [[number, number], [number, number]]
  onMoved?.({ bounds: [west, south, east, north], zoom: map.getZoom() })
}

const listening = new WeakSet<MapLibreMap>()

/** Draws the marks' pictures when the map first asks for them, also again after a change of theme. */
function offerImages(map: MapLibreMap): void {
  if (listening.has(map)) return
  listening.add(map)
  map.setMissingStyleImageResolver(id => {
    const ratio = Math.max(2, Math.ceil(window.devicePixelRatio))
    const image = drawMapImage(id, ratio)
    if (image && !map.hasImage(id)) map.addImage(id, image, { pixelRatio: ratio })
  })
}

/** Pointer to crag: the nearest mark within a finger's reach on touch, within a few pixels for a mouse. */
function usePointer({ onSelect, onHover }: CragMapProps) {
  const over = useRef<string | null>(null)
  const hover = (code: string | null) => {
    if (code === over.current) return
    over.current = code
    onHover(code)
  }
  return {
    onMouseMove: (event: MapLayerMouseEvent) => {
      const code = nearestCrag(event, 12)
      event.target.getCanvas().style.cursor = code ? 'pointer' : ''
      hover(code)
    },
    onMouseOut: () => hover(null),
    onClick: (event: MapLayerMouseEvent) => {
      const touch = (event.originalEvent as PointerEvent).pointerType === 'touch'
      const code = nearestCrag(event, touch ? 22 : 14)
      if (code) onSelect(code)
    },
  }
}

function nearestCrag({ target, point }: MapLayerMouseEvent, reach: number): string | null {
  if (!target.getLayer(marksLayer)) return null
  const found = target.queryRenderedFeatures(
    [
      [point.x - reach, point.y - reach],
      [point.x + reach, point.y + reach],
    ],
    { layers: [marksLayer] },
  )
  let best: { code: string; far: number } | null = null
  for (const { geometry, properties } of found) {
    if (geometry.type !== 'Point') continue
    const at = target.project(geometry.coordinates as [number, number])
    const far = Math.hypot(at.x - point.x, at.y - point.y)
    if (!best || far < best.far) best = { code: String(properties?.code), far }
  }
  return best?.code ?? null
}

/** Fits new bounds, and brings a crag chosen elsewhere into view; at once where motion is unwelcome. */
function useFollow(
  map: React.RefObject<MapRef | null>,
  crags: MappedCrag[],
  selected: string | null,
  bounds: Bounds,
  padding: CragMapProps['padding'],
) {
  const asked = bounds.join(',')
  const first = useRef(asked)
  useEffect(() => {
    if (first.current === asked) return
    first.current = asked
    map.current?.fitBounds(asked.split(',').map(Number) as Bounds, { padding, duration: unhurried(500) })
  }, [map, asked, padding])
  useEffect(() => {
    const crag = crags.find(({ code }) => code === selected)
    if (!crag || !map.current) return
    const { x, y } = map.current.project([crag.lon, crag.lat])
    const { clientWidth, clientHeight } = map.current.getContainer()
    const seen = x > 30 && y > 30 && x < clientWidth - 30 && y < clientHeight - 40
    if (!seen) map.current.easeTo({ center: [crag.lon, crag.lat], duration: unhurried(400) })
  }, [map, crags, selected])
}

const unhurried = (milliseconds: number) =>
  window.matchMedia('(prefers-reduced-motion: reduce)').matches ? 0 : milliseconds
