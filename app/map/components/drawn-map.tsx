import italicLatin from '@fontsource/work-sans/files/work-sans-latin-400-italic.woff2?url'
import regularLatin from '@fontsource/work-sans/files/work-sans-latin-400-normal.woff2?url'
import semiboldLatin from '@fontsource/work-sans/files/work-sans-latin-600-normal.woff2?url'
import italicExt from '@fontsource/work-sans/files/work-sans-latin-ext-400-italic.woff2?url'
import regularExt from '@fontsource/work-sans/files/work-sans-latin-ext-400-normal.woff2?url'
import semiboldExt from '@fontsource/work-sans/files/work-sans-latin-ext-600-normal.woff2?url'
import { useMemo } from 'react'
import { mapStyle } from '../../../tiles/style'
import { boundsOf } from '../crag-features'
import type { MapTheme } from '../mark'
import CragMap from './crag-map'
import type { MapStageProps } from './map-stage'

const absolute = (path: string) => new URL(path, window.location.origin).href

const toFonts = () => ({
  regular: { latin: absolute(regularLatin), latinExt: absolute(regularExt) },
  italic: { latin: absolute(italicLatin), latinExt: absolute(italicExt) },
  semibold: { latin: absolute(semiboldLatin), latinExt: absolute(semiboldExt) },
})

/** The map with this app's own ground and fonts; everything in it is loaded only where a map is drawn. */
export default function DrawnMap(props: MapStageProps & { theme: MapTheme; onFailed(): void }) {
  const style = useMemo(
    () => mapStyle({ theme: props.theme, origin: window.location.origin, fonts: toFonts() }),
    [props.theme],
  )
  const bounds = useMemo(() => boundsOf(props.crags) ?? world, [props.crags])
  return <CragMap {...props} style={style} bounds={bounds} />
}

const world: [number, number, number, number] = [-180, -70, 180, 75]
