import { useMap } from 'react-map-gl/maplibre'

/** Nearer and farther for those who neither scroll nor pinch. */
export function ZoomButtons() {
  const { current: map } = useMap()
  const duration = () => (window.matchMedia('(prefers-reduced-motion: reduce)').matches ? 0 : 250)
  return (
    <div className="map-zoom">
      <button type="button" aria-label="Nearer" onClick={() => map?.zoomIn({ duration: duration() })}>
        <svg width="14" height="14" aria-hidden="true">
          <path d="M7 1.5v11M1.5 7h11" />
        </svg>
      </button>
      <button type="button" aria-label="Farther" onClick={() => map?.zoomOut({ duration: duration() })}>
        <svg width="14" height="14" aria-hidden="true">
          <path d="M1.5 7h11" />
        </svg>
      </button>
    </div>
  )
}
