import { validateStyleMin } from '@maplibre/maplibre-gl-style-spec'
import { describe, expect, it } from 'vitest'
import { mapStyle } from '../../../tiles/style'

const origin = 'http://127.0.0.1:3000'
const face = (name: string) => ({
  latin: `${origin}/assets/${name}.woff2`,
  latinExt: `${origin}/assets/${name}-ext.woff2`,
})
const fonts = { regular: face('regular'), italic: face('italic'), semibold: face('semibold') }
const themes = ['light', 'dark'] as const

describe.each(themes)('the %s style of the map', theme => {
  const style = mapStyle({ theme, origin, fonts, version: 'abc' })

  it('is valid by the style specification', () => {
    expect(validateStyleMin(style)).toEqual([])
  })

  it('asks nobody but the app for tiles and fonts', () => {
    const addresses = JSON.stringify(style).match(/https?:\/\/[^"]*/g)!
    expect(addresses.length).toBe(7)
    expect(addresses.filter(address => !address.startsWith(`${origin}/`))).toEqual([])
  })

  it('names the version of the ground in the tiles address', () => {
    expect(style.sources.ground).toMatchObject({ tiles: [`${origin}/ground/{z}/{x}/{y}.mvt?v=abc`] })
  })

  it('sets every name in a face that it ships', () => {
    const used = style.layers.flatMap(layer =>
      layer.type === 'symbol' ? (layer.layout?.['text-font'] ?? ['none']) : [],
    )
    const shipped = Object.keys(style['font-faces']!)
    expect(used.filter(font => !shipped.includes(String(font)))).toEqual([])
  })

  it('draws the sea over the contours, and names last', () => {
    const order = style.layers.map(({ id }) => id)
    expect(order.indexOf('ocean')).toBeGreaterThan(order.indexOf('contours-index'))
    const firstName = style.layers.findIndex(({ type }) => type === 'symbol')
    expect(style.layers.slice(firstName).every(({ type }) => type === 'symbol')).toBe(true)
  })
})

describe('both themes', () => {
  it('have the same layers in the same order, so that only colours change between them', () => {
    const [light, dark] = themes.map(theme => mapStyle({ theme, origin, fonts }).layers.map(({ id }) => id))
    expect(light).toEqual(dark)
  })
})
