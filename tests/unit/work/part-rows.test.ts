import { describe, expect, it } from 'vitest'
import { mostRows, toPartChoices, toPresetRows, toRowCount, withOneMore } from '~/work/part-rows'

const ring = { kind: 'ring', material: 'titanium', sizeMm: 12 } as const
const hanger = { kind: 'hanger', material: 'stainless', sizeMm: null } as const
const there = [
  { id: 'left', kind: 'ring', material: 'steel', sizeMm: 10 },
  { id: 'right', kind: 'ring', material: 'steel', sizeMm: 10 },
  { id: 'plate', kind: 'hanger', material: 'steel', sizeMm: null },
] as const

describe('The form of a record begins', () => {
  const begin = (given: Partial<Parameters<typeof toPresetRows>[0]>) =>
    toPresetRows({ needed: [], before: [], there, faulty: null, ...given })
  const replaced = (rows: ReturnType<typeof begin>) => rows.map(row => row.replaces)

  it('with each part the order needs in the place of one of its kind', () => {
    const rows = begin({
      needed: [
        { ...hanger, quantity: 1 },
        { ...ring, quantity: 2 },
      ],
    })
    expect(rows.map(row => row.kind)).toEqual(['hanger', 'ring', 'ring'])
    expect(replaced(rows)).toEqual(['plate', 'left', 'right'])
  })

  it('with the part found at fault before another of its kind', () => {
    expect(replaced(begin({ needed: [{ ...ring, quantity: 1 }], faulty: 'right' }))).toEqual(['right'])
  })

  it('with a part of another kind in the place of the faulty one', () => {
    const chain = { kind: 'chain', material: 'stainless', sizeMm: 10, quantity: 1 } as const
    expect(replaced(begin({ needed: [chain], faulty: 'left' }))).toEqual(['left'])
    expect(replaced(begin({ needed: [chain] }))).toEqual([null])
  })

  it('with more parts than stand there as new ones', () => {
    expect(replaced(begin({ needed: [{ ...ring, quantity: 3 }] }))).toEqual(['left', 'right', null])
  })

  it('with what was recorded before the work came back, and nothing else', () => {
    const before = [{ ...ring, marking: 'EN 959', replaces: 'right' }]
    expect(begin({ needed: [{ ...hanger, quantity: 2 }], before })).toEqual(before)
  })
})

describe('Rows of parts', () => {
  it('are as many as were sent, else as many as the form begins with, never none', () => {
    expect(toRowCount('3', 1)).toBe(3)
    expect(toRowCount(undefined, 2)).toBe(2)
    expect(toRowCount(undefined, 0)).toBe(1)
    for (const nonsense of ['', '-2', '1.5', 'many']) expect(toRowCount(nonsense, 0)).toBe(1)
    expect(toRowCount('99', 1)).toBe(mostRows)
  })

  it('grow by one and keep what was typed, up to the most a form takes', () => {
    expect(withOneMore({ rows: '2', words: 'done' })).toEqual({ rows: '3', words: 'done' })
    expect(withOneMore({ rows: String(mostRows) }).rows).toBe(String(mostRows))
  })

  it('offer parts that read the same under different numbers', () => {
    expect(toPartChoices(there).map(choice => choice.words)).toEqual([
      'Ring, steel, 10 mm (1 of 2)',
      'Ring, steel, 10 mm (2 of 2)',
      'Plate hanger, steel',
    ])
  })
})
