import { and, eq, gt } from 'drizzle-orm'
import type { Database, Queryable, Transaction } from '~/db/client.server'
import { people } from '~/db/schema/people'
import { linkTokens, offers } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hashSecret } from '~/record/acts.server'
import { requireOrder } from './lock.server'
import { toSheetMail } from './mails'
import { moveOrder } from './move.server'
import { endOffer, requireConsent } from './offer.server'
import type { OfferState } from './order'
import type { Order } from './orders.server'
import { makeSheet } from './sheets.server'
import { listJobRows, tellMaker } from './tell.server'
import { answeredWords } from './words'
import { listRebolters } from './workers.server'

/** What a link of an offer's mail opens: the offer, for whom it speaks, and whether it can still be answered. */
export async function findOffered(db: Queryable, secret: string, now: Date) {
  const [row] = await db
    .select({
      id: offers.id,
      orderId: offers.orderId,
      personId: offers.personId,
      name: people.name,
      state: offers.state,
      expiresAt: offers.expiresAt,
    })
    .from(linkTokens)
    .innerJoin(offers, eq(offers.id, linkTokens.offerId))
    .innerJoin(people, eq(people.id, offers.personId))
    .where(
      and(
        eq(linkTokens.tokenHash, hashSecret(secret)),
        eq(linkTokens.purpose, 'offer'),
        gt(linkTokens.expiresAt, now),
      ),
    )
    .limit(1)
  if (row === undefined) return null
  const state: OfferState = row.state === 'sent' && row.expiresAt <= now ? 'expired' : row.state
  return { ...row, state }
}

interface Answer {
  secret: string
  act: Act
  appUrl: string
}

/** The offer and its order, locked and read behind the lock: of two answers at once the second sees the first. */
async function requireOpenOffer(tx: Transaction, { secret, act }: Answer) {
  const known = await findOffered(tx, secret, act.now)
  if (known === null) throw new Refusal('This link is not whole. Use the whole link from the mail.')
  const order = await requireOrder(tx, known.orderId)
  const offer = (await findOffered(tx, secret, act.now))!
  if (offer.state !== 'sent') throw new Refusal(answeredWords[offer.state])
  await tx
    .update(linkTokens)
    .set({ usedAt: act.now })
    .where(eq(linkTokens.tokenHash, hashSecret(secret)))
  return { offer, order }
}

/** The worker as the organisation knows them now: who left it, or its rebolters, since the mail takes no job. */
async function requireWorker(tx: Transaction, order: Order, personId: string) {
  const worker = (await listRebolters(tx, order.organisationId)).find(person => person.id === personId)
  if (worker === undefined)
    throw new Refusal(
      `You are no longer among the rebolters of ${order.organisation}, so this job cannot be accepted. Write to them if that is wrong.`,
    )
  return worker
}

/**
 * Accepts an offer by its link: the job is that person's, the coordinator and the worker are told, and a link to the
 * read-only sheet is made that lives as long as the job. Gives the sheet's secret.
 */
export async function acceptOffer(db: Database, answer: Answer) {
  const { act, appUrl } = answer
  return await inCommand(db, async tx => {
    const { offer, order } = await requireOpenOffer(tx, answer)
    requireConsent(order)
    const to = await requireWorker(tx, order, offer.personId)
    await tx
      .update(offers)
      .set({ state: 'accepted', answeredAt: act.now, updatedAt: act.now })
      .where(and(eq(offers.id, offer.id), eq(offers.state, 'sent')))
    await moveOrder(tx, act, order, 'accepted', { verb: 'accepted', set: { workerId: to.id } })
    await writeActivity(tx, act, { verb: 'accepted', subjectKind: 'offer', subjectId: offer.id })
    const sheetSecret = await makeSheet(tx, act, order.id)
    const mail = { orderId: order.id, offerId: offer.id, to, title: order.title }
    const rows = await listJobRows(tx, order)
    await queueMail(tx, act, toSheetMail({ ...mail, rows, url: `${appUrl}/sheet/${sheetSecret}` }))
    await tellMaker(tx, act, order, { key: offer.id, who: offer.name, did: 'accepted', words: null, appUrl })
    return { sheetSecret }
  })
}

/** Declines an offer by its link, with a word if there is one. */
export async function declineOffer(db: Database, { words, ...answer }: Answer & { words: string | null }) {
  return await inCommand(db, async tx => {
    const { offer } = await requireOpenOffer(tx, answer)
    await endOffer(tx, answer.act, offer, { to: 'declined', words, appUrl: answer.appUrl })
    return {}
  })
}
