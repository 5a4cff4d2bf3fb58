import { describe, expect, it } from 'vitest'
import { chooseEdge, findEdge } from '~/rating/edges'
import type { EdgeClass } from '~/rating/finding'
import type { PartInput } from '~/rating/inputs'
import { modelRows, toModel } from '~/rating/model'
import { createPicker } from '~/rating/picker'
import { found, part } from './case'

const picker = createPicker(toModel(modelRows))
const worn = (percent: number, edge: EdgeClass | null = null) =>
  part('ring', [found('groove', { low: percent, high: percent, unit: 'percent', edge })])

describe('The edge class', () => {
  const cases: [want: EdgeClass | null, title: string, of: PartInput][] = [
    ['smooth', 'a ring nobody said a word of', part('ring', [])],
    ['smooth', 'a groove under 15 % of the bar without a word of its edge', worn(14)],
    ['rounded', 'a groove of 15 % without a word of its edge', worn(15)],
    ['rounded', 'a deep groove that is called smooth', worn(30, 'smooth')],
    ['smooth', 'a groove whose depth nobody gave', part('ring', [found('groove')])],
    ['felt', 'a groove that catches a fingernail', worn(5, 'felt')],
    ['knife', 'a groove that shaves a fingernail', worn(5, 'knife')],
    ['sharp', 'a sharp edge on the rope’s side', part('connector', [found('sharp_edge_rope')])],
    ['sharp', 'a fresh nick from a plate hanger', part('connector', [found('nicked')])],
    ['felt', 'a sharp edge at the hanger’s end of a draw', part('fixed_draw', [found('sharp_edge_hanger')])],
    ['sharp', 'the worst of several', part('ring', [found('groove', { edge: 'felt' }), found('nicked')])],
    [null, 'a part no rope runs over', part('wedge_bolt', [])],
  ]

  it.each(cases)('is %s for %s', (want, _, of) => {
    expect(chooseEdge(of, picker)).toBe(want)
  })

  it('counts at a bolt only for what stays hanging there', () => {
    const hanger = part('hanger', [found('sharp_edge_rope')])
    expect(findEdge([hanger], false, picker)).toBe(null)
    expect(findEdge([hanger, part('fixed_draw', [found('nicked')])], false, picker)).toBe('sharp')
  })

  it('counts for a hanger where the rope was seen to run over it', () => {
    expect(findEdge([part('hanger', [])], true, picker)).toBe(null)
    expect(findEdge([part('hanger', [found('rope_over_edge')])], true, picker)).toBe('sharp')
  })
})
