/** Who may find a crag at all: open, place withheld (in no public tile, search or list), members only. */
export const sensitivities = ['open', 'withheld', 'members'] as const
export type Sensitivity = (typeof sensitivities)[number]
