import { evaluate } from './evaluate'
import type { RatingInputs } from './inputs'
import type { Picker } from './picker'
import { type Said, toReason } from './words'

/** A number of the model, or a measure, and R with it at its milder and its worse end, all others central. */
export interface Moved {
  name: string
  low: number
  high: number
}

/** R with each ranged number in turn at its two ends, all others central. */
export function moveEach(inputs: RatingInputs, picker: Picker): Moved[] {
  return picker.ranged().map(name => {
    const ends = [picker.hold(name, 'low'), picker.hold(name, 'high')].map(
      held => evaluate(inputs, held).rate,
    )
    return { name, low: Math.min(...ends), high: Math.max(...ends) }
  })
}

/** Something not known for sure, in words, with R at its worse end over R at its milder one. */
export interface Reason extends Said {
  name: string
  times: number
}

/** What moves R, strongest first; numbers that say the same in words are one reason, the strongest of them. */
export function toReasons(moved: Moved[], inputs: RatingInputs): Reason[] {
  const { kind } = inputs.climb.points[inputs.at]!
  const strongest = moved.filter(({ low }) => low > 0).sort((a, b) => b.high / b.low - a.high / a.low)
  const said = new Map<string, Reason>()
  for (const { name, low, high } of strongest) {
    const reason = { ...toReason(name, kind), name, times: high / low }
    if (!said.has(reason.words)) said.set(reason.words, reason)
  }
  return [...said.values()].filter(({ times }) => times > 1.005)
}

/** The look that settles most: of the strongest reason that has one, and rather one that a visit answers. */
export function toLookNext(reasons: Reason[]): string | null {
  const looks = reasons.filter(({ look, times }) => look !== undefined && times >= 1.5)
  return (looks.find(({ seldom }) => !seldom) ?? looks[0])?.look ?? null
}
