import geodesic from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import { toGrid, zoneOf } from '~/map/grid'

const { WGS84 } = geodesic.Geodesic

describe('the kilometre grid', () => {
  it('has zones of six degrees, the first from 180 west', () => {
    expect([-180, -28.6, -24.01, -24, 0, 179.9].map(zoneOf)).toEqual([1, 26, 26, 27, 31, 60])
  })

  it('has easting 500 km along the middle of a zone', () => {
    for (const lat of [-60, 0, 33.4, 80]) expect(toGrid(-27, lat).east).toBeCloseTo(500_000, 6)
  })

  it('counts northing as 0.9996 of the distance from the equator (geographiclib-geodesic)', () => {
    for (const lat of [0.01, 20, 33.4, 55, 83]) {
      const { s12 } = WGS84.Inverse(0, -27, lat, -27)
      expect(toGrid(-27, lat).north).toBeCloseTo(0.9996 * s12!, 3)
    }
  })

  it('counts from ten million south of the equator', () => {
    const { s12 } = WGS84.Inverse(0, -27, -33.4, -27)
    expect(toGrid(-27, -33.4).north).toBeCloseTo(10_000_000 - 0.9996 * s12!, 3)
  })

  it('is as far along as across everywhere in a zone: angles are true (geographiclib-geodesic)', () => {
    for (const lon of [-29.9, -28.6, -27.3, -24.1])
      for (const lat of [5, 33.4, 62]) {
        const scale = [0, 90].map(bearing => {
          const to = WGS84.Direct(lat, lon, bearing, 10)
          const [a, b] = [toGrid(lon, lat, 26), toGrid(to.lon2!, to.lat2!, 26)]
          return Math.hypot(b.east - a.east, b.north - a.north) / 10
        })
        expect(scale[0]).toBeCloseTo(scale[1]!, 5)
        expect(scale[0]).toBeGreaterThan(0.99959)
        expect(scale[0]).toBeLessThan(1.0011)
      }
  })
})
