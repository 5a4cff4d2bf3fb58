import { describe, expect, it } from 'vitest'
import { type AnchorKind, anchorKinds, formatPosition } from '~/crags/anchor'
import { toFirstWarning, toWarnedPlace } from '~/notices/first-warning'
import { type FailureMode, failureModes } from '~/reports/hazard'

const warn = (kind: AnchorKind | null, mode: FailureMode, climbs = ['Slack Water']) =>
  toFirstWarning({
    kind,
    mode,
    position: kind === null ? 'fixed gear' : formatPosition(kind, 3),
    climbs,
    cragName: 'Gannet Wall',
  })

const asIfAbsent = 'Climb as if it were not there, or leave the route alone.'
const backUp = 'Back it up with gear of your own, or leave the route alone.'
const noWayDown = 'Do not lower from it. Leave the route alone unless you can get down without it.'
const lower = 'Lower from a connector of your own and leave it behind, or do not climb the route.'
const abseil = 'Abseil from a connector of your own and leave it behind, or do not abseil here.'

/** What to do instead: at each kind of point for what pulls out, breaks, cuts the rope, lets it out. */
const instead: Record<AnchorKind, [string, string, string, string]> = {
  bolt: [asIfAbsent, asIfAbsent, asIfAbsent, asIfAbsent],
  peg: [asIfAbsent, asIfAbsent, asIfAbsent, asIfAbsent],
  thread: [asIfAbsent, asIfAbsent, asIfAbsent, asIfAbsent],
  lower_off: [noWayDown, noWayDown, lower, noWayDown],
  abseil_station: ['Do not abseil from it.', 'Do not abseil from it.', abseil, 'Do not abseil from it.'],
  stance: [backUp, backUp, backUp, backUp],
  belay_stake: [backUp, backUp, backUp, backUp],
}

const names: Record<AnchorKind, string> = {
  bolt: 'bolt 3',
  peg: 'the peg',
  thread: 'the thread',
  lower_off: 'the lower-off',
  abseil_station: 'the abseil station',
  stance: 'the stance',
  belay_stake: 'the belay stake',
}

const faults: Record<FailureMode, string> = {
  pulls_out: 'it may pull out or be missing',
  breaks: 'it may break',
  cuts_rope: 'a worn or sharp edge may cut the rope',
  releases_rope: 'it may let the rope out',
}

const every = anchorKinds.flatMap(kind => failureModes.map(mode => ({ kind, mode })))

describe('A first warning', () => {
  it.each(every)('of a $kind that $mode says what not to rely on, why, and what to do', ({ kind, mode }) => {
    const { headline, words } = warn(kind, mode)
    expect(headline).toBe(`Do not rely on ${names[kind]} of Slack Water, Gannet Wall`)
    expect(words).toBe(
      `Do not rely on ${names[kind]} of Slack Water: ${faults[mode]}. ${instead[kind][failureModes.indexOf(mode)]}`,
    )
  })

  it.each(every)('of a $kind that $mode sends nobody to another fixed point', ({ kind, mode }) => {
    const { words } = warn(kind, mode)
    const after = words.slice(words.indexOf(':'))
    expect(after).not.toMatch(/\b(bolt|peg|thread|stance|stake|station|lower-off|anchor|next|other)\b/i)
    expect(words).not.toMatch(/\b((un)?safe|secure|sound|trust)\b/i)
  })

  it.each(['pulls_out', 'breaks', 'releases_rope'] as const)(
    'hangs nobody’s own connector in a lower-off that %s',
    mode => {
      expect(warn('lower_off', mode).words).not.toContain('connector')
      expect(warn('abseil_station', mode).words).not.toContain('connector')
    },
  )

  it('of a whole route names its fixed gear', () => {
    expect(warn(null, 'breaks').words).toBe(
      'Do not rely on the fixed gear of Slack Water: it may break. Leave the route alone.',
    )
  })

  it.each([
    [['Slack Water', 'Ebb'], 'Slack Water and Ebb'],
    [['Slack Water', 'Ebb', 'Neap'], 'Slack Water, Ebb and Neap'],
    [['Slack Water', 'Ebb', 'Neap', 'Spring', 'Bore'], 'Slack Water, Ebb and 3 more routes'],
    [[], 'this route'],
  ])('about the routes %j speaks of %s', (climbs, named) => {
    expect(warn('lower_off', 'cuts_rope', climbs).words).toContain(`the lower-off of ${named}:`)
  })

  it('keeps its headline to what fits, however long the names are', () => {
    const long = warn('lower_off', 'breaks', ['Å'.repeat(120), 'Ω'.repeat(120)])
    expect(Array.from(long.headline)).toHaveLength(200)
    expect(long.headline.endsWith('…')).toBe(true)
    expect(long.words).toContain('Ω'.repeat(120))
  })

  it('is about every climb the point stands on, or the hazard’s own where it stands on none', () => {
    const hazard = {
      anchorKind: 'lower_off' as const,
      mode: 'breaks' as const,
      position: 'Lower-off',
      climbName: 'Ebb',
      cragName: 'Gannet Wall',
    }
    const both = [
      { name: 'Slack Water', position: 'Lower-off' },
      { name: 'Ebb', position: 'Lower-off' },
    ]
    expect(toWarnedPlace(hazard, both).climbs).toEqual(['Slack Water', 'Ebb'])
    expect(toWarnedPlace(hazard, []).climbs).toEqual(['Ebb'])
    expect(toWarnedPlace({ ...hazard, climbName: null }, []).climbs).toEqual([])
  })
})
