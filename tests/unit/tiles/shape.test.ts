import { describe, expect, it } from 'vitest'
import { curveThrough, keepWhere, lengthOf, type Metres, traced, withOnRight } from '../../../tiles/shape'

const square = traced('0,0 10,0 10,10 0,10 0,0')

describe('lines of the ground', () => {
  it('end exactly where they pass out of what is kept', () => {
    const pieces = keepWhere(traced('0,0 10,0 20,0'), ([east]) => east - 4)
    expect(pieces).toEqual([traced('4,0 10,0 20,0')])
  })

  it('are cut nowhere but at the edge: a ring that starts inside stays one stretch', () => {
    const [piece, ...others] = keepWhere(square, ([east]) => 5 - east)
    expect(others).toEqual([])
    expect(piece).toEqual(traced('5,10 0,10 0,0 5,0'))
  })

  it('stay whole where all is kept, and vanish where nothing is', () => {
    expect(keepWhere(square, () => 1)).toEqual([square])
    expect(keepWhere(square, () => -1)).toEqual([])
  })

  it('run so that the lower side lies on the right hand', () => {
    const east: Metres[] = traced('0,0 100,0')
    expect(withOnRight(east, ([, north]) => -north)).toEqual(east)
    expect(withOnRight(east, ([, north]) => north)).toEqual(traced('100,0 0,0'))
  })

  it('pass through every point they were traced by', () => {
    const points = traced('0,0 300,100 500,-200')
    const curve = curveThrough(points, 20)
    for (const point of points) expect(curve).toContainEqual(point)
    expect(lengthOf(curve)).toBeGreaterThan(lengthOf(points))
  })
})
