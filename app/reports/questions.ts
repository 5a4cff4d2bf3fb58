import type { EdgeClass, FindingKind } from '~/rating/finding'

/** What the form asks first: is it worn, sharp, loose, rusty, or something else? */
export const topics = ['groove', 'sharp', 'loose', 'rust', 'other'] as const
export type Topic = (typeof topics)[number]

export const topicWords: Record<Topic, { label: string; hint: string }> = {
  groove: { label: 'Groove or wear', hint: 'worn by the rope' },
  sharp: { label: 'Sharp edge', hint: 'you can feel it with a fingernail' },
  loose: { label: 'Loose or spinning', hint: 'hanger, nut or the whole bolt' },
  rust: { label: 'Rust or cracks', hint: 'stains, flakes, hairlines' },
  other: { label: 'Something else', hint: 'say it in words' },
}

/** How deep a groove is, by eye; the ranges stand for the words, in millimetres. */
export const depths = ['hairline', '1-2', '2-4', 'more'] as const
export type Depth = (typeof depths)[number]

export const depthWords: Record<Depth, { label: string; low: number; high: number }> = {
  hairline: { label: 'hairline', low: 0, high: 1 },
  '1-2': { label: '1–2 mm', low: 1, high: 2 },
  '2-4': { label: '2–4 mm', low: 2, high: 4 },
  more: { label: 'more', low: 4, high: 6 },
}

/** What an edge is like to a fingernail, as the form asks it. */
export const edgeAnswers = ['rounded', 'felt', 'sharp', 'knife'] as const satisfies readonly EdgeClass[]

export const edgeAnswerWords: Record<(typeof edgeAnswers)[number], string> = {
  rounded: 'a fingernail slides over it',
  felt: 'a fingernail catches',
  sharp: 'sharp',
  knife: 'shaves a fingernail, or rope fluff on it',
}

/** What is loose, and the finding it is. */
export const looseAnswers = [
  'spins',
  'nut_loose',
  'nut_missing',
  'turns_by_hand',
  'loose_in_hole',
] as const satisfies readonly FindingKind[]

export const looseWords: Record<(typeof looseAnswers)[number], string> = {
  spins: 'the hanger spins',
  nut_loose: 'the nut is loose',
  nut_missing: 'the nut is missing',
  turns_by_hand: 'the whole bolt turns by hand',
  loose_in_hole: 'the bolt moves in its hole',
}

/** How much rust, as it is seen; each is a grade of ISO 4628-3. */
export const rustAnswers = ['2', '3', '4', '5', 'cracked'] as const

export const rustWords: Record<(typeof rustAnswers)[number], string> = {
  '2': 'a few spots',
  '3': 'patches on the surface',
  '4': 'flaking',
  '5': 'flaking all over, section lost',
  cracked: 'a crack or hairline',
}

/** What else can be wrong. */
export const otherAnswers = [
  'missing',
  'link_unscrewed',
  'gate_stuck',
  'bent',
  'fabric_faded',
  'resin_soft',
  'resin_gap',
  'rock_hollow',
  'other',
] as const satisfies readonly FindingKind[]

export const otherWords: Record<(typeof otherAnswers)[number], string> = {
  missing: 'hanger or part missing',
  link_unscrewed: 'a link is unscrewed',
  gate_stuck: 'a gate does not close',
  bent: 'bent',
  fabric_faded: 'cord or sling faded or stiff',
  resin_soft: 'resin soft',
  resin_gap: 'gap in the resin',
  rock_hollow: 'the rock sounds hollow when tapped',
  other: 'none of these',
}
