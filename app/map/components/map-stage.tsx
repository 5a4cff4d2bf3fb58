import { lazy, Suspense, useEffect, useState } from 'react'
import type { MappedCrag } from '../crag-features'
import type { MapTheme } from '../mark'
import { canDrawMap } from './can-draw-map'

const DrawnMap = lazy(() => import('./drawn-map'))

export interface MapStageProps {
  crags: MappedCrag[]
  selected: string | null
  hovered: string | null
  onSelect(code: string): void
  onHover(code: string | null): void
}

/** Where the map stands: drawn after the page is there, in the person's theme; said plainly where it cannot be. */
export function MapStage(props: MapStageProps) {
  const theme = useTheme()
  const [failed, setFailed] = useState(false)
  if (theme === null) return <div className="home-no-map" aria-hidden="true" />
  if (failed || !canDrawMap())
    return (
      <p className="home-no-map">
        This browser cannot draw the map. The list holds every crag that the map would show.
      </p>
    )
  return (
    <Suspense fallback={<p className="home-no-map">Drawing the map …</p>}>
      <DrawnMap {...props} theme={theme} onFailed={() => setFailed(true)} />
    </Suspense>
  )
}

/** The theme the person's device asks for; null until the page is alive, so that the server draws no map. */
function useTheme(): MapTheme | null {
  const [theme, setTheme] = useState<MapTheme | null>(null)
  useEffect(() => {
    const dark = matchMedia('(prefers-color-scheme: dark)')
    const follow = () => setTheme(dark.matches ? 'dark' : 'light')
    follow()
    dark.addEventListener('change', follow)
    return () => dark.removeEventListener('change', follow)
  }, [])
  return theme
}
