/** How much of its hazards the public sees. */
export const hazardDetails = ['full', 'crag', 'members'] as const

/** The owner's word on work at a crag; no order is offered while disputed. */
export const consentStates = ['given', 'not_needed', 'disputed', 'unknown'] as const
export type ConsentState = (typeof consentStates)[number]

export const rocks = ['limestone', 'sandstone', 'gritstone', 'granite', 'slate', 'other'] as const
export type Rock = (typeof rocks)[number]

/** Corrosivity of the air by ISO 9223. */
export const corrosivities = ['C1', 'C2', 'C3', 'C4', 'C5', 'CX'] as const
export type Corrosivity = (typeof corrosivities)[number]

/** How much a climb is climbed. */
export const traffics = ['quiet', 'steady', 'busy', 'groups'] as const
export type Traffic = (typeof traffics)[number]

export const trafficWords: Record<Traffic, string> = {
  quiet: 'climbed seldom',
  steady: 'climbed steadily',
  busy: 'climbed often',
  groups: 'climbed by groups',
}
