import { describe, expect, it } from 'vitest'
import { boundsOf, cragFeatures } from '~/map/crag-features'
import { cornersImageName, findMapImage, markImageName, markStates } from '~/map/mark'

const crag = (code: string, state: (typeof markStates)[number], lon = -28.6, lat = 33.38) => ({
  code,
  name: `Crag ${code}`,
  lon,
  lat,
  state,
})

describe('crags on the map', () => {
  it('lie with the worst on top', () => {
    const { features } = cragFeatures(
      markStates.map(state => crag(state, state)),
      'light',
    )
    const upwards = features
      .toSorted((a, b) => a.properties?.order - b.properties?.order)
      .map(({ properties }) => properties?.code)
    expect(upwards).toEqual(['good', 'unknown', 'fair', 'poor', 'severe'])
  })

  it('ask for a picture of their state in the theme', () => {
    const [feature] = cragFeatures([crag('KC', 'poor')], 'dark').features
    expect(findMapImage(feature!.properties?.image)).toEqual({ kind: 'mark', state: 'poor', theme: 'dark' })
  })

  it('have a picture for every state, and corner ticks, in both themes', () => {
    for (const theme of ['light', 'dark'] as const) {
      for (const state of markStates)
        expect(findMapImage(markImageName(state, theme))).toEqual({ kind: 'mark', state, theme })
      expect(findMapImage(cornersImageName('selected', theme))).toEqual({ kind: 'selected', theme })
    }
    expect(findMapImage('mark-perfect-light')).toBeNull()
    expect(findMapImage('airport')).toBeNull()
  })

  it('all lie within their bounds with room around, one alone too', () => {
    expect(boundsOf([])).toBeNull()
    const [west, south, east, north] = boundsOf([crag('A', 'good')])!
    expect(west).toBeLessThan(-28.604)
    expect(east).toBeGreaterThan(-28.596)
    expect(south).toBeLessThan(33.3765)
    expect(north).toBeGreaterThan(33.3835)
    const wide = boundsOf([crag('A', 'good', -28.7), crag('B', 'good', -28.5)])!
    expect(wide[0]).toBeCloseTo(-28.72, 6)
    expect(wide[2]).toBeCloseTo(-28.48, 6)
  })
})
