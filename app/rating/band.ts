/** Urgency, most urgent first: how soon a hazard is to be mended. */
export const bands = ['first', 'soon', 'turn', 'watch'] as const
export type Band = (typeof bands)[number]

export const bandWords: Record<Band, string> = {
  first: 'Mend first',
  soon: 'Mend soon',
  turn: 'In turn',
  watch: 'Keep an eye on',
}
