/** Who acted: a person signed in, a guest, the holder of a mailed link, or the product itself by the clock. */
export const actorKinds = ['person', 'guest', 'link', 'system'] as const
export type ActorKind = (typeof actorKinds)[number]

/** What an activity line is about. */
export const subjectKinds = [
  'person',
  'organisation',
  'crag',
  'climb',
  'anchor',
  'part',
  'report',
  'hazard',
  'notice',
  'order',
  'offer',
  'work_record',
  'photo',
] as const
export type SubjectKind = (typeof subjectKinds)[number]

/** States of what workers take under a lease; `dead` waits for a person. */
export const leaseStates = ['waiting', 'done', 'dead'] as const
