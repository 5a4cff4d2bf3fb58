import { listFalls, toYearlyEvents } from './events'
import type { RatingInputs } from './inputs'
import type { Lognormal, Mixture } from './lognormal'
import type { Picker } from './picker'
import { listStrengths } from './point'

/** The load drawn against the strength (kN): all falls of a bolt as one, the commonest load of a station. */
export function toDrawnLoad(inputs: RatingInputs, picker: Picker): Lognormal | null {
  const falls = listFalls(inputs, picker)
  if (falls.length === 0) return toCommonest(inputs, picker)
  let [mean, square] = [0, 0]
  for (const { share, load } of falls) {
    const middle = Math.log(load.median)
    mean += share * middle
    square += share * (load.zeta ** 2 + middle ** 2)
  }
  return { median: Math.exp(mean), zeta: Math.sqrt(square - mean * mean) }
}

function toCommonest(inputs: RatingInputs, picker: Picker): Lognormal | null {
  const streams = Object.values(toYearlyEvents(inputs, picker)).flat()
  // handling is commoner than any real load and weighs nothing
  const loads = streams.filter(({ load }) => load.median > picker.pick('load.handling'))
  if (loads.length === 0) return null
  return loads.reduce((most, next) => (next.rate > most.rate ? next : most)).load
}

/** The strength drawn (kN): of the weakest part, by how many of it are bad or by a gate that is not shut. */
export function toDrawnStrength(inputs: RatingInputs, picker: Picker): Mixture {
  const all = listStrengths(inputs, picker)
  if (all.length === 0) return []
  const weakness = ({ strength, cap }: (typeof all)[number]) => (cap === null ? strength[2]!.weight : 1)
  const { strength, cap } = all.reduce((worst, next) => (weakness(next) > weakness(worst) ? next : worst))
  if (cap === null) return strength
  return strength.map(part => (part.median > cap.median ? { ...cap, weight: part.weight } : part))
}
