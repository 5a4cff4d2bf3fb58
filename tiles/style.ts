import type { StyleSpecification } from 'maplibre-gl'
import { type GroundPalette, groundPalettes } from './palette'
import { heightLayers, landLayers } from './style-land'
import { nameLayers } from './style-names'
import { seaLayers } from './style-sea'
import { wayLayers } from './style-ways'

/** Absolute addresses of the shipped font files for one face: basic Latin, and its extension where there is one. */
interface FontFiles {
  latin: string
  latinExt?: string
}

export interface MapStyleOptions {
  theme: 'light' | 'dark'
  /** The app's own address, without a slash at the end. */
  origin: string
  fonts: { regular: FontFiles; italic: FontFiles; semibold: FontFiles }
  /** Stands in the tiles' address, so that a new ground is fetched anew. */
  version?: string
  attribution?: string
}

const ranges = {
  latin: [
    'U+0000-00FF',
    'U+0131',
    'U+0152-0153',
    'U+02BB-02BC',
    'U+02C6',
    'U+02DA',
    'U+02DC',
    'U+2000-206F',
    'U+20AC',
    'U+2122',
    'U+2212',
  ],
  latinExt: [
    'U+0100-02AF',
    'U+1E00-1E9F',
    'U+1EF2-1EFF',
    'U+2020',
    'U+20A0-20AB',
    'U+20AD-20C0',
    'U+2C60-2C7F',
    'U+A720-A7FF',
  ],
}

/** The ground's style for MapLibre: muted, by theme, on this app's tiles and fonts alone; marks are added over it. */
export function mapStyle({
  theme,
  origin,
  fonts,
  version,
  attribution,
}: MapStyleOptions): StyleSpecification {
  const colours: GroundPalette = groundPalettes[theme]
  return {
    version: 8,
    name: `Skerrow, ${theme}`,
    transition: { duration: 0, delay: 0 },
    'font-faces': {
      'Work Sans Regular': faces(fonts.regular),
      'Work Sans Italic': faces(fonts.italic),
      'Work Sans SemiBold': faces(fonts.semibold),
    },
    sources: {
      ground: {
        type: 'vector',
        tiles: [`${origin}/ground/{z}/{x}/{y}.mvt${version ? `?v=${version}` : ''}`],
        minzoom: 0,
        maxzoom: 14,
        attribution: attribution ?? 'Ground: the Isle of Skerrow, invented. Far coasts: Natural Earth',
      },
    },
    layers: [
      ...landLayers(colours),
      ...heightLayers(colours),
      ...seaLayers(colours),
      ...wayLayers(colours),
      ...nameLayers(colours),
    ],
  } as StyleSpecification
}

function faces({ latin, latinExt }: FontFiles) {
  const basic = { url: latin, 'unicode-range': ranges.latin }
  return latinExt ? [basic, { url: latinExt, 'unicode-range': ranges.latinExt }] : [basic]
}
