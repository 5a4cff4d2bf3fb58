import { describe, expect, it } from 'vitest'
import { groundZones, toConsequence, toTerrain, toUncaught } from '~/rating/consequence'
import { at } from './case'

const line = at(3, []).climb
const onLine = (heights: number[]) => ({
  ...line,
  lengthM: heights.at(-1)!,
  points: heights.map(alongM => ({ kind: 'bolt' as const, alongM, assumed: false, state: 'good' as const })),
})

describe('The ground zone of a line', () => {
  const zones = groundZones(onLine([2.1, 3.9, 5.6, 7.6, 9.7, 11.9, 14, 16.3, 18.5]))
  const kindAt = (metres: number) =>
    zones.find(zone => zone.fromM < metres && metres <= zone.toM)?.kind ?? null

  it('is dotted up to the first bolt, where a fall meets the ground anyway', () => {
    expect(zones[0]).toMatchObject({ fromM: 0, kind: 'anyway' })
    expect(kindAt(2)).toBe('anyway')
  })

  it('is hatched above bolts 2 and 3, where only the bolt below keeps a fall off the ground', () => {
    expect(kindAt(4.2)).toBe('hatched')
    expect(kindAt(7.4)).toBe('hatched')
  })

  it('has ended in the upper half', () => {
    for (const metres of [10.5, 13, 16, 18.4]) expect(kindAt(metres)).toBe(null)
  })

  it('begins again above a ledge', () => {
    const above = groundZones({ ...onLine([2.1, 3.9, 5.6, 7.6, 9.7, 11.9]), ledges: [{ atM: 7 }] })
    expect(above.some(zone => zone.fromM >= 7.5 && zone.kind === 'anyway')).toBe(true)
  })

  it('is nowhere when there is only air below', () => {
    expect(groundZones({ ...line, below: 'air' })).toEqual([])
  })
})

describe('What a failure leads to', () => {
  const terrain = toTerrain({ start: 'ground', below: 'ground', ledges: [] })
  const fall = { y: 7, at: 6, caughtAt: 4, give: 1 }

  it('is the ground when the next bolt cannot keep the feet off it and the sound one would have', () => {
    // at rest 4 − 3 − 1 = 0 m with the feet a metre lower; held by the sound one 6 − 1 − 1 = 4 m
    expect(toConsequence(terrain, fall)).toBe('ground')
  })

  it('is one class lower when the ground would have been met anyway', () => {
    expect(toConsequence(terrain, { y: 4.5, at: 2.5, caughtAt: null, give: 1 })).toBe('low')
  })

  it('is a longer fall, by twice the way to the bolt that catches, higher up', () => {
    expect(toConsequence(terrain, { y: 17, at: 16, caughtAt: 15, give: 1 })).toBe('short')
    expect(toConsequence(terrain, { y: 17, at: 16, caughtAt: 13, give: 1 })).toBe('long')
    expect(toConsequence(terrain, { y: 27, at: 26, caughtAt: 20, give: 1 })).toBe('low')
  })

  it('is the belay’s catch on a pitch that starts at a stance with air below', () => {
    const airy = toTerrain({ start: 'stance', below: 'air', ledges: [] })
    expect(toConsequence(airy, { y: 3, at: 2, caughtAt: null, give: 1 })).toBe('long')
    expect(toUncaught(airy, 3)).toBe('ground')
  })

  it('is the ledge for a cut rope, whatever bolts there are', () => {
    const ledged = toTerrain({ start: 'ground', below: 'ground', ledges: [{ atM: 8 }] })
    expect(toUncaught(ledged, 9.5)).toBe('long')
    expect(toUncaught(ledged, 10.5)).toBe('low')
    expect(toUncaught(ledged, 12.5)).toBe('ground')
  })
})
