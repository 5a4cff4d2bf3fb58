import { and, eq } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { linkTokens, offers } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hashSecret } from '~/record/acts.server'
import { formatMoment, formatZone } from '~/ui/when'
import { findConsentFault } from './consent'
import { requireOrder } from './lock.server'
import { toOfferMail } from './mails'
import { moveOrder } from './move.server'
import type { Order } from './orders.server'
import { listJobRows, tellMaker } from './tell.server'
import { findAddress, listRebolters } from './workers.server'

const dayMs = 86_400_000
const offerDays = 7
// the page itself says that an offer has run out, so the link outlives it a while
const linkDays = 97

/** Refuses work that the owner's word, or a missing reason, forbids by now. */
export function requireConsent(order: Order): void {
  for (const hazard of order.hazards) {
    const fault = findConsentFault(hazard.consent, order.consentReason)
    if (fault !== null) throw new Refusal(fault)
  }
}

/** Offers a job to one rebolter of the organisation by mail; the link answers for seven days. */
export async function offerOrder(
  db: Database,
  given: { orderId: string; personId: string; act: Act; appUrl: string },
) {
  const { orderId, personId, act, appUrl } = given
  return await inCommand(db, async tx => {
    const order = await requireOrder(tx, orderId)
    requireConsent(order)
    const to = (await listRebolters(tx, order.organisationId)).find(person => person.id === personId)
    if (to === undefined) throw new Refusal('That person is no rebolter of your organisation, or not yet 18.')
    await moveOrder(tx, act, order, 'offered', { verb: 'offered' })
    const offerId = act.newId()
    const expiresAt = new Date(act.now.getTime() + offerDays * dayMs)
    const secret = act.newSecret()
    await tx.insert(offers).values({
      id: offerId,
      orderId,
      personId,
      state: 'sent',
      expiresAt,
      createdAt: act.now,
      updatedAt: act.now,
    })
    await tx.insert(linkTokens).values({
      tokenHash: hashSecret(secret),
      purpose: 'offer',
      offerId,
      expiresAt: new Date(act.now.getTime() + linkDays * dayMs),
      createdAt: act.now,
    })
    const answerBy = `${formatMoment(expiresAt, order.timeZone)}, ${formatZone(order.timeZone)}`
    const { title, what, organisation: from } = order
    const rows: [string, string][] = [...(await listJobRows(tx, order)), ['Answer by', answerBy]]
    const url = `${appUrl}/offers/${secret}`
    await queueMail(
      tx,
      act,
      toOfferMail({ orderId, offerId, to, name: to.name, from, title, what, rows, url }),
    )
    return {}
  })
}

/**
 * Ends one offer unanswered or declined; an order without a live offer is a draft again, and its maker hears of it.
 * Gives false, and changes nothing, when it was answered meanwhile.
 */
export async function endOffer(
  tx: Transaction,
  act: Act,
  offer: { id: string; orderId: string; personId: string },
  ended: { to: 'declined' | 'expired'; words: string | null; appUrl: string },
): Promise<boolean> {
  const { to, words, appUrl } = ended
  const order = await requireOrder(tx, offer.orderId)
  const [done] = await tx
    .update(offers)
    .set({ state: to, answeredAt: act.now, words, updatedAt: act.now })
    .where(and(eq(offers.id, offer.id), eq(offers.state, 'sent')))
  if (done.affectedRows === 0) return false
  await writeActivity(tx, act, { verb: to, subjectKind: 'offer', subjectId: offer.id })
  const live = await tx
    .select({ id: offers.id })
    .from(offers)
    .where(and(eq(offers.orderId, offer.orderId), eq(offers.state, 'sent')))
    .limit(1)
  if (live.length === 0 && order.state === 'offered')
    await moveOrder(tx, act, order, 'draft', { verb: 'back_to_draft' })
  const who = (await findAddress(tx, offer.personId))?.name ?? 'Somebody'
  await tellMaker(tx, act, order, { key: offer.id, who, did: to, words, appUrl })
  return true
}
