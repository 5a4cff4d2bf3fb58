/** Urgency, most urgent first: how soon a hazard is to be mended. */
export const bands = ['first', 'soon', 'turn', 'watch'] as const
export type Band = (typeof bands)[number]

export const bandWords: Record<Band, string> = {
  first: 'Mend first',
  soon: 'Mend soon',
  turn: 'In turn',
  watch: 'Keep an eye on',
}

/** Where each band begins, a year: the figures of the UK regulator's tolerability paper (R2P2, 2001), as marks on a scale. */
const begins: Record<Exclude<Band, 'watch'>, number> = { first: 1e-3, soon: 1e-4, turn: 1e-6 }

/** The band of a rate R a year. */
export function bandOf(rate: number): Band {
  if (rate >= begins.first) return 'first'
  if (rate >= begins.soon) return 'soon'
  return rate >= begins.turn ? 'turn' : 'watch'
}

/** The more urgent of two bands. */
export function moreUrgent(a: Band, b: Band): Band {
  return bands.indexOf(a) <= bands.indexOf(b) ? a : b
}
