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
