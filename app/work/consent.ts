import type { ConsentState } from '~/crags/crag'

/**
 * Why work may not go on by what the owner said, or null when it may: never while the owner disputes it, and without
 * the owner's word only for a written reason.
 */
export function findConsentFault(consent: ConsentState, reason: string | null): string | null {
  if (consent === 'disputed')
    return 'The owner disputes work at this crag, so it waits until that is settled. Ask the access officer.'
  if (consent === 'unknown' && reason === null)
    return 'Whether the owner consents is not known here. Give a reason why the work goes on; it prints on the sheet.'
  return null
}
