import { type ConditionState, conditionShort } from './condition-state'

/** A crag's worst in a few words with its count: "2 points not to rely on", "3 suspect", "not looked at". */
export function formatWorst(counts: Record<ConditionState, number>): string {
  const plural = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`
  if (counts.severe > 0) return plural(counts.severe, 'point not to rely on', 'points not to rely on')
  if (counts.poor > 0) return `${counts.poor} suspect`
  if (counts.fair > 0) return `${counts.fair} minor`
  if (counts.good > 0 && counts.unknown === 0) return conditionShort.good.toLowerCase()
  return counts.good > 0 ? `${counts.unknown} not looked at` : 'not looked at'
}

/** "3 notices, 7 hazards", or what can be said without either. */
export function formatOpen(of: { notices: number; openHazards: number }): string {
  const count = (number: number, one: string) => (number === 1 ? `1 ${one}` : `${number} ${one}s`)
  const words = [
    of.notices > 0 ? count(of.notices, 'notice') : '',
    of.openHazards > 0 ? count(of.openHazards, 'hazard') : '',
  ].filter(Boolean)
  return words.length > 0 ? words.join(', ') : 'no hazard open'
}

/** "8 bolts and a lower-off". */
export function formatGear(kinds: readonly string[]): string {
  const bolts = kinds.filter(kind => kind === 'bolt').length
  const words = [
    bolts > 0 ? `${bolts} ${bolts === 1 ? 'bolt' : 'bolts'}` : '',
    kinds.includes('lower_off') ? 'a lower-off' : '',
    kinds.includes('abseil_station') ? 'an abseil station' : '',
    kinds.includes('belay_stake') ? 'a belay stake' : '',
    kinds.includes('stance') ? 'a stance' : '',
    kinds.includes('peg') ? 'pegs' : '',
    kinds.includes('thread') ? 'threads' : '',
  ].filter(Boolean)
  if (words.length === 0) return 'no fixed gear on record'
  return words.length === 1 ? words[0]! : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}
