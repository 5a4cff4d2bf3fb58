import { describe, expect, it } from 'vitest'
import { evaluate } from '~/rating/evaluate'
import { modelRows, type RatingModel, toModel } from '~/rating/model'
import { createPicker } from '~/rating/picker'
import { createHazards } from './random-hazard'

/** A model that remembers which of its numbers were asked for. */
function toWatched(asked: Set<string>): RatingModel {
  const model = toModel(modelRows)
  const get = (name: string) => {
    asked.add(name)
    return model.get(name)
  }
  return new Proxy(model, { get: (map, key) => (key === 'get' ? get : Reflect.get(map, key)) })
}

describe('Rating model 1', () => {
  it('has every number once, with its central value between its ends, a source and a mark', () => {
    expect(new Set(modelRows.map(({ name }) => name)).size).toBe(modelRows.length)
    for (const { name, low, central, high, source, mark } of modelRows) {
      expect(low <= central && central <= high && central > 0, name).toBe(true)
      expect(source, name).not.toBe('')
      expect(['std', 'book', 'prac', 'mem', 'ours'], name).toContain(mark)
    }
  })

  it('has no number that no rating uses', () => {
    const asked = new Set<string>()
    const { hazard } = createHazards(3)
    for (let i = 0; i < 2500; i++) evaluate(hazard(), createPicker(toWatched(asked)))
    expect(modelRows.map(({ name }) => name).filter(name => !asked.has(name))).toEqual([])
  })

  it('says which number is missing when one is asked for that it has not', () => {
    expect(() => createPicker(new Map()).pick('slack')).toThrow('the rating model has no slack')
  })
})

describe('A run of a rating', () => {
  const model = toModel([
    { name: 'a', low: 1, central: 2, high: 3, unit: '', source: '', mark: '' },
    { name: 'b', low: 10, central: 20, high: 30, unit: '', source: '', mark: '' },
  ])

  it('repeats only the steps that asked for the number that is held at an end', () => {
    const picker = createPicker(model)
    let times = 0
    const run = (one: typeof picker) => {
      const inner = () => {
        times++
        return one.pick('a') * 100
      }
      return one.step('outer', () => one.step('inner', inner) + one.pick('b'))
    }
    expect(run(picker)).toBe(220)
    expect(run(picker.hold('b', 'high'))).toBe(230)
    expect(times).toBe(1)
    expect(run(picker.hold('a', 'low'))).toBe(120)
    expect(times).toBe(2)
    expect(picker.ranged().sort()).toEqual(['a', 'b'])
  })
})
