import type { RatingModel } from './model'

type End = 'low' | 'high'

interface Range {
  low: number
  central: number
  high: number
}

/** Gives the numbers of one run of a rating: all central but the one that is held at an end. */
export interface Picker {
  pick(name: string): number
  /** a value of the inputs with a range of its own, under a name of its own */
  pickBetween(name: string, range: Range): number
  /** a step of the computation under a name: done once, and never again while no number it asked for has moved */
  step<T>(name: string, compute: () => T): T
  /** the same run with one number at an end of its range */
  hold(name: string, end: End): Picker
  /** names asked for so far whose ends differ */
  ranged(): string[]
}

interface Step {
  value: unknown
  /** names of the numbers it asked for, also through steps inside it */
  asked: ReadonlySet<string>
}

/** A picker over a model with every number central; its steps are remembered, so each set of inputs needs one of its own. */
export function createPicker(model: RatingModel): Picker {
  return toPicker(model, null, new Map())
}

function toPicker(
  model: RatingModel,
  held: { name: string; end: End } | null,
  centralSteps: Map<string, Step>,
): Picker {
  const ranged = new Set<string>()
  const ownSteps = held === null ? centralSteps : new Map<string, Step>()
  let asking: Set<string>[] = []

  const choose = (name: string, range: Range) => {
    if (range.low !== range.high) ranged.add(name)
    for (const names of asking) names.add(name)
    return held?.name === name ? range[held.end] : range.central
  }
  const find = (name: string) => {
    const own = ownSteps.get(name)
    if (own !== undefined || held === null) return own
    const central = centralSteps.get(name)
    return central?.asked.has(held.name) ? undefined : central
  }
  return {
    pick(name) {
      const found = model.get(name)
      if (found === undefined) throw new Error(`the rating model has no ${name}`)
      return choose(name, found)
    },
    pickBetween: choose,
    step<T>(name: string, compute: () => T): T {
      let done = find(name)
      if (done === undefined) {
        const asked = new Set<string>()
        const outer = asking
        asking = [...outer, asked]
        done = { value: compute(), asked }
        asking = outer
        ownSteps.set(name, done)
      } else for (const names of asking) for (const name of done.asked) names.add(name)
      return done.value as T
    },
    hold: (name, end) => toPicker(model, { name, end }, centralSteps),
    ranged: () => [...ranged],
  }
}
