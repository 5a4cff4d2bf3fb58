import type { RatingModel } from './model'

export type End = 'low' | 'high'

/** Gives the model's numbers, all central but the one that is held at an end; remembers which were asked for. */
export interface Picker {
  pick(name: string): number
  /** a value of the inputs with a range of its own, under a name of its own */
  pickBetween(name: string, range: { low: number; central: number; high: number }): number
  /** names asked for whose ends differ */
  ranged(): string[]
}

/** A picker over a model with at most one number at an end of its range. */
export function createPicker(model: RatingModel, held: { name: string; end: End } | null): Picker {
  const ranged = new Set<string>()
  const choose = (name: string, range: { low: number; central: number; high: number }) => {
    if (range.low !== range.high) ranged.add(name)
    return held?.name === name ? range[held.end] : range.central
  }
  return {
    pick(name) {
      const found = model.get(name)
      if (found === undefined) throw new Error(`the rating model has no ${name}`)
      return choose(name, found)
    },
    pickBetween: choose,
    ranged: () => [...ranged],
  }
}
