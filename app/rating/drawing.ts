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

/** The strength drawn (kN): of the part of which most are bad. */
export function toDrawnStrength(inputs: RatingInputs, picker: Picker): Mixture {
  const all = listStrengths(inputs, picker).map(({ strength }) => strength)
  if (all.length === 0) return []
  return all.reduce((worst, next) => (next[2]!.weight > worst[2]!.weight ? next : worst))
}
