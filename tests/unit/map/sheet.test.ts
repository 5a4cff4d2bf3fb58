import { describe, expect, it } from 'vitest'
import { toGrid } from '~/map/grid'
import { contourWords, metresPerPixel, scaleBar, sheetTicks, tickSpacing } from '~/map/sheet'

const width = 868
const height = 744
const zoom = 12.6
const middle = { lon: -28.6, lat: 33.394 }
const frame = { left: 22, top: 22, right: width - 22, bottom: height - 22 }

/** Web Mercator with 512-pixel tiles, the map's own projection. */
function unproject(x: number, y: number) {
  const world = 512 * 2 ** zoom
  const north = (lat: number) => Math.asinh(Math.tan((lat * Math.PI) / 180))
  const lon = middle.lon + ((x - width / 2) / world) * 360
  const up = north(middle.lat) - ((y - height / 2) / world) * 2 * Math.PI
  return { lon, lat: (Math.atan(Math.sinh(up)) * 180) / Math.PI }
}

const perKilometre = 1000 / metresPerPixel(middle.lat, zoom)

describe('the neatline', () => {
  const ticks = sheetTicks(unproject, frame, perKilometre)

  it('has a tick exactly where a kilometre line of the grid crosses each side', () => {
    expect(ticks.length).toBeGreaterThan(24)
    for (const { side, at, kilometres } of ticks) {
      const upright = side === 'top' || side === 'bottom'
      const place = upright ? unproject(at, frame[side]) : unproject(frame[side], at)
      const { east, north } = toGrid(place.lon, place.lat)
      expect((upright ? east : north) / 1000).toBeCloseTo(kilometres, 3)
    }
  })

  it('leaves no kilometre out along a side', () => {
    for (const side of ['top', 'bottom', 'left', 'right']) {
      const found = ticks.filter(tick => tick.side === side).map(({ kilometres }) => kilometres)
      expect(found).toEqual(found.map((_, i) => found[0]! + i))
      expect(found.length).toBeGreaterThan(5)
    }
  })

  it('keeps its ticks at least 44 pixels apart, in steps of 1, 2 and 5', () => {
    expect([100, 44, 43, 20, 10, 5, 1].map(tickSpacing)).toEqual([1, 1, 2, 5, 5, 10, 50])
  })

  it('draws none, rather than thousands, where the view makes no sense', () => {
    expect(sheetTicks(() => ({ lon: Number.NaN, lat: Number.NaN }), frame, perKilometre)).toEqual([])
  })
})

describe('the scale', () => {
  it('is a round length of 60 to 150 pixels with its unit', () => {
    expect(scaleBar(9.7)).toEqual({ pixels: 1000 / 9.7, words: '1 km' })
    for (let metres = 0.2; metres < 5000; metres *= 1.1) {
      const { pixels } = scaleBar(metres)
      expect(pixels).toBeGreaterThanOrEqual(60)
      expect(pixels).toBeLessThanOrEqual(150)
    }
    expect(scaleBar(0.9).words).toBe('100 m')
  })

  it('names only the contours that are drawn at that zoom', () => {
    expect([9, 10.5, 12].map(contourWords)).toEqual([null, 'contours 50 m', 'contours 10 m'])
  })
})
