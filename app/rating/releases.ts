import type { ConsequenceClass } from './consequence'
import { toChances } from './cuts'
import { countEvents, isStation, listFalls, toStationClass } from './events'
import { toHangShares } from './falls'
import type { FindingKind } from './finding'
import type { RatingInputs } from './inputs'
import type { Picker } from './picker'

/** Findings by which a part may let the rope out, and the rows of the model that count it. */
const releaseOf: Partial<Record<FindingKind, string>> = {
  gate_stuck: 'gate',
  link_unscrewed: 'unscrewed',
  // without its nut a hanger comes off as an unscrewed link does
  nut_missing: 'unscrewed',
  nose_hooked: 'nose',
  keeper_gone: 'open_hook',
  hook_worn: 'worn_hook',
  badly_placed: 'rotation',
}

/** The chance a year that a part lets the rope out at low force: by handling, hang and fall, by what follows. */
export function toReleases(inputs: RatingInputs, picker: Picker): Record<ConsequenceClass, number> {
  const expected = { short: 0, long: 0, low: 0, ground: 0 }
  const names = inputs.parts.flatMap(part => part.findings.flatMap(({ kind }) => releaseOf[kind] ?? []))
  if (names.length === 0) return expected
  const { handling, hangs, falls } = countEvents(inputs, picker)
  for (const name of new Set(names)) {
    const of = (event: string) => picker.pick(`release.${name}.${event}`)
    const still = handling * of('handling') + hangs * of('hang')
    const fallen = falls * of('fall')
    if (isStation(inputs)) {
      expected[toStationClass(inputs)] += still + fallen
      continue
    }
    for (const { consequence, share } of listFalls(inputs, picker)) expected[consequence] += fallen * share
    for (const { consequence, share } of picker.step('hangs', () => toHangShares(inputs, picker)))
      expected[consequence] += still * share
  }
  return toChances(expected)
}
