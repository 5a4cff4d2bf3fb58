import { and, eq } from 'drizzle-orm'
import { formatPart } from '~/crags/part'
import type { Database, Queryable, Transaction } from '~/db/client.server'
import { linkTokens, offers } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hashSecret } from '~/record/acts.server'
import { formatDay } from '~/ui/when'
import { toOfferMail, toProgressMail } from './mails'
import { moveOrder, requireOrder } from './move.server'
import { findAddress, listNeededParts, listRebolters } from './order-details.server'
import type { Order } from './orders.server'

const offerDays = 7

/** The facts of a job as rows of word and value, for mails. */
export async function listJobRows(db: Queryable, order: Order): Promise<[string, string][]> {
  const parts = await listNeededParts(db, order.id)
  const rows: [string, string | null][] = [
    [
      'Where',
      order.hazards[0]
        ? `${order.hazards[0].position} of ${order.hazards[0].climbName}, ${order.cragName}`
        : order.cragName,
    ],
    ['By', order.aimOn === null ? null : formatDay(order.aimOn)],
    [
      'Parts',
      parts.length === 0 ? null : parts.map(part => `${part.quantity} × ${formatPart(part)}`).join('\n'),
    ],
    ['Way there', order.approach],
    ['Consent', order.consentReason],
  ]
  return rows.filter((row): row is [string, string] => row[1] !== null)
}

/** Offers a job to one rebolter of the organisation by mail; the link answers for seven days. */
export async function offerOrder(
  db: Database,
  given: { orderId: string; personId: string; act: Act; appUrl: string },
) {
  const { orderId, personId, act, appUrl } = given
  return await inCommand(db, async tx => {
    const order = await requireOrder(tx, orderId)
    const to = (await listRebolters(tx, order.organisationId)).find(person => person.id === personId)
    if (to === undefined) throw new Refusal('That person is no rebolter of your organisation, or not yet 18.')
    await moveOrder(tx, act, order, 'offered', { verb: 'offered' })
    const offerId = act.newId()
    const expiresAt = new Date(act.now.getTime() + offerDays * 86_400_000)
    await tx.insert(offers).values({
      id: offerId,
      orderId,
      personId,
      state: 'sent',
      expiresAt,
      createdAt: act.now,
      updatedAt: act.now,
    })
    const secret = act.newSecret()
    await tx.insert(linkTokens).values({
      tokenHash: hashSecret(secret),
      purpose: 'offer',
      offerId,
      // the page itself says that an offer has run out, so the link outlives it a while
      expiresAt: new Date(expiresAt.getTime() + 90 * 86_400_000),
      createdAt: act.now,
    })
    const rows = await listJobRows(tx, order)
    const { title, what, organisation: from } = order
    await queueMail(
      tx,
      act,
      toOfferMail({
        orderId,
        offerId,
        to,
        name: to.name,
        from,
        title,
        what,
        rows,
        url: `${appUrl}/offers/${secret}`,
      }),
    )
    return {}
  })
}

/** Tells whoever made an order what became of it. */
export async function tellMaker(
  tx: Transaction,
  act: Act,
  order: Order,
  told: {
    key: string
    who: string
    did: Parameters<typeof toProgressMail>[0]['did']
    words: string | null
    appUrl: string
  },
): Promise<void> {
  const to = await findAddress(tx, order.madeBy)
  if (to === null) return
  const { appUrl, ...rest } = told
  const url = `${appUrl}/orders/${order.code}`
  await queueMail(tx, act, toProgressMail({ orderId: order.id, to, title: order.title, url, ...rest }))
}

/** Ends one offer unanswered or declined; an order without a live offer is a draft again, and its maker hears of it. */
export async function endOffer(
  tx: Transaction,
  act: Act,
  offer: { id: string; orderId: string; personId: string },
  to: 'declined' | 'expired',
  words: string | null,
  appUrl: string,
): Promise<void> {
  const order = await requireOrder(tx, offer.orderId)
  const [ended] = await tx
    .update(offers)
    .set({ state: to, answeredAt: act.now, words, updatedAt: act.now })
    .where(and(eq(offers.id, offer.id), eq(offers.state, 'sent')))
  // somebody answered it meanwhile
  if (ended.affectedRows === 0) return
  await writeActivity(tx, act, { verb: to, subjectKind: 'offer', subjectId: offer.id })
  const live = await tx
    .select({ id: offers.id })
    .from(offers)
    .where(and(eq(offers.orderId, offer.orderId), eq(offers.state, 'sent')))
    .limit(1)
  if (live.length === 0 && order.state === 'offered')
    await moveOrder(tx, act, order, 'draft', { verb: 'unoffered' })
  const who = (await findAddress(tx, offer.personId))?.name ?? 'Somebody'
  await tellMaker(tx, act, order, { key: offer.id, who, did: to, words, appUrl })
}
