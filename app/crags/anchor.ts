/** Kinds of fixed point: one placement each, shared by the climbs that pass it. */
export const anchorKinds = [
  'bolt',
  'lower_off',
  'stance',
  'abseil_station',
  'thread',
  'peg',
  'belay_stake',
] as const
export type AnchorKind = (typeof anchorKinds)[number]

export const anchorKindWords: Record<AnchorKind, string> = {
  bolt: 'Bolt',
  lower_off: 'Lower-off',
  stance: 'Stance',
  abseil_station: 'Abseil station',
  thread: 'Thread',
  peg: 'Peg',
  belay_stake: 'Belay stake',
}

/** A fixed point's life: out of use is nut or hanger off, removed is mended away, stolen or disputed. */
export const anchorLives = ['in_place', 'out_of_use', 'removed', 'replaced'] as const

/** What lies below a position on a climb. */
export const grounds = ['ground', 'ledge', 'stance', 'sea', 'air'] as const
export type Below = (typeof grounds)[number]

/** How a fixed point is called on one climb: bolts are numbered from the ground, a single other one is not. */
export function formatPosition(kind: AnchorKind, ordinal: number): string {
  return kind === 'bolt' ? `Bolt ${ordinal}` : anchorKindWords[kind]
}
