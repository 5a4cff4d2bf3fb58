import type { AnchorKind } from '~/crags/anchor'
import type { FailureMode } from '~/reports/hazard'

const does: Record<FailureMode, string> = {
  pulls_out: 'it may pull out or be missing',
  breaks: 'it may break',
  cuts_rope: 'a worn or sharp edge may cut the rope',
  releases_rope: 'it may let the rope out',
}

const asIfAbsent = 'Climb as if it were not there, or leave the route alone.'
const backUp = 'Back it up with gear of your own, or leave the route alone.'

/**
 * What to do instead, by what people do at such a point. A connector of one's own helps against an edge only: it would
 * hang in the same bolt that may pull out or break.
 */
function toInstead(kind: AnchorKind | null, mode: FailureMode): string {
  switch (kind) {
    case null:
      return 'Leave the route alone.'
    case 'lower_off':
      return mode === 'cuts_rope'
        ? 'Lower from a connector of your own and leave it behind, or do not climb the route.'
        : 'Do not lower from it. Leave the route alone unless you can get down without it.'
    case 'abseil_station':
      return mode === 'cuts_rope'
        ? 'Abseil from a connector of your own and leave it behind, or do not abseil here.'
        : 'Do not abseil from it.'
    case 'stance':
    case 'belay_stake':
      return backUp
    default:
      return asIfAbsent
  }
}

/** What a first warning is about. */
export interface WarnedPlace {
  /** null: no fixed point, the route as a whole */
  kind: AnchorKind | null
  mode: FailureMode
  /** "Lower-off", "Bolt 3" */
  position: string
  climbs: string[]
  cragName: string
}

/** What a first warning needs of a hazard and of the climbs its fixed point stands on. */
export function toWarnedPlace(
  hazard: {
    anchorKind: AnchorKind | null
    mode: FailureMode
    position: string | null
    climbName: string | null
    cragName: string
  },
  climbs: { name: string; position: string }[],
): WarnedPlace {
  const named = climbs.length > 0 ? climbs.map(climb => climb.name) : [hazard.climbName ?? '']
  return {
    kind: hazard.anchorKind,
    mode: hazard.mode,
    position: hazard.position ?? 'fixed gear',
    climbs: named.filter(Boolean),
    cragName: hazard.cragName,
  }
}

/** Characters that fit in a headline. */
const longest = 200

/**
 * The fixed wording of a first warning, from where it is and how it would fail. It says what not to rely on and what
 * to do instead; it never recommends another fixed point. The headline has at most 200 characters.
 */
export function toFirstWarning(place: WarnedPlace): { headline: string; words: string } {
  const position = place.position.toLowerCase()
  // "bolt 3" is a name, "lower-off" is not
  const where = `${/\d$/.test(position) ? position : `the ${position}`} of ${joinNames(place.climbs)}`
  return {
    headline: shorten(`Do not rely on ${where}, ${place.cragName}`),
    words: `Do not rely on ${where}: ${does[place.mode]}. ${toInstead(place.kind, place.mode)}`,
  }
}

/** "Slack Water", "Slack Water and Ebb", "Slack Water, Ebb and Neap", "Slack Water, Ebb and 3 more routes". */
function joinNames(names: string[]): string {
  if (names.length <= 1) return names[0] ?? 'this route'
  if (names.length > 3) return `${names.slice(0, 2).join(', ')} and ${names.length - 2} more routes`
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`
}

function shorten(text: string): string {
  const characters = Array.from(text)
  return characters.length <= longest ? text : `${characters.slice(0, longest - 1).join('')}…`
}
