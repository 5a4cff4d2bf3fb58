import type { AnchorKind } from '~/crags/anchor'
import type { FailureMode } from '~/reports/hazard'

const does: Record<FailureMode, string> = {
  pulls_out: 'it is loose and may pull out',
  breaks: 'it may break',
  cuts_rope: 'a worn or sharp edge may cut the rope',
  releases_rope: 'it may let the rope out',
}

/** What to do instead, by what people do at such a point; never another fixed point, which nobody has looked at. */
const instead: Partial<Record<AnchorKind, string>> = {
  lower_off: 'Lower from a connector of your own and leave it behind, or do not climb the route.',
  abseil_station: 'Do not abseil from it.',
  stance: 'Back it up with gear of your own.',
  belay_stake: 'Back it up with gear of your own.',
}

/** What a first warning is about. */
export interface WarnedPlace {
  kind: AnchorKind
  mode: FailureMode
  /** "Lower-off", "Bolt 3" */
  position: string
  climbs: string[]
  cragName: string
}

/**
 * The fixed wording of a first warning, from where it is and how it would fail. It says what not to rely on and what
 * to do instead; it never recommends another fixed point.
 */
export function toFirstWarning(place: WarnedPlace): { headline: string; words: string } {
  const where = `the ${place.position.toLowerCase()} of ${joinNames(place.climbs)}`
  const act =
    instead[place.kind] ?? 'Clip past it only with a plan for its failure, or leave the route alone.'
  return {
    headline: `Do not rely on ${where}, ${place.cragName}`,
    words: `Do not rely on ${where}: ${does[place.mode]}. ${act}`,
  }
}

/** "Slack Water", "Slack Water and Ebb", "Slack Water, Ebb and Neap". */
function joinNames(names: string[]): string {
  if (names.length <= 1) return names[0] ?? 'this route'
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`
}
