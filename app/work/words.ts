import type { CheckerKind, CheckMethod, OfferState } from './order'

export const checkerWords: Record<CheckerKind, string> = {
  partner: 'partner of the day',
  independent: 'independent',
}

export const checkMethodWords: Record<CheckMethod, string> = {
  on_the_rope: 'on the rope',
  from_photos: 'from photos',
  load_test: 'load test after cure',
}

export const offerStateWords: Record<OfferState, string> = {
  sent: 'not answered yet',
  accepted: 'accepted',
  declined: 'declined',
  expired: 'not answered in time',
  withdrawn: 'withdrawn',
}

/** Why an offer that is no longer open cannot be answered, kindly. */
export const answeredWords: Record<Exclude<OfferState, 'sent'>, string> = {
  accepted: 'You have accepted this job already. The sheet came by mail.',
  declined: 'You have declined this job. If you can do it after all, tell the coordinator.',
  expired:
    'This offer has run out. If you can still do the job, tell the coordinator, who may offer it again.',
  withdrawn: 'This job is no longer needed, or somebody else does it. Thank you all the same.',
}

/** The boxes of a record of work, the same on the form and on the printed sheet. */
export const recordLabels = {
  doneOn: 'Done on',
  minutes: 'Minutes on the wall',
  kind: 'Part',
  material: 'Material',
  sizeMm: 'Bar, in mm',
  replaces: 'In the place of',
  marking: 'Stamped on it',
  words: 'In your words',
  noPhotoReason: 'No photo? Say why',
} as const

/** The caution of every page and mail somebody works from. */
export const workCaution =
  'Work on fixed gear is for trained people, in twos, under local rules and with the owner’s consent. Never trust the gear you came to mend: rig from anchors of your own. The maker’s sheet comes first. This record does not certify any fixed gear.'
