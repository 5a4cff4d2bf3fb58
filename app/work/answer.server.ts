import { and, eq } from 'drizzle-orm'
import type { Database, Queryable } from '~/db/client.server'
import { people } from '~/db/schema/people'
import { linkTokens, offers } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hashSecret } from '~/record/acts.server'
import { toSheetMail } from './mails'
import { moveOrder, requireOrder } from './move.server'
import { endOffer, listJobRows, tellMaker } from './offer.server'
import type { OfferState } from './order'
import { findAddress } from './order-details.server'

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
    .where(and(eq(linkTokens.tokenHash, hashSecret(secret)), eq(linkTokens.purpose, 'offer')))
    .limit(1)
  if (row === undefined) return null
  const state: OfferState = row.state === 'sent' && row.expiresAt <= now ? 'expired' : row.state
  return { ...row, state }
}

/** Why an offer that is no longer open cannot be answered, kindly. */
export const answeredWords: Record<Exclude<OfferState, 'sent'>, string> = {
  accepted: 'You have accepted this job already. The sheet came by mail.',
  declined: 'You have declined this job. If you can do it after all, tell the coordinator.',
  expired:
    'This offer has run out. If you can still do the job, tell the coordinator, who may offer it again.',
  withdrawn: 'This job is no longer needed, or somebody else does it. Thank you all the same.',
}

const notWhole = 'This link is not whole. Use the whole link from the mail.'

interface Answer {
  secret: string
  act: Act
  appUrl: string
}

/**
 * Accepts an offer by its link: the job is that person's, other offers of it are withdrawn, the coordinator and the
 * worker are told, and a link to the read-only sheet is made that lives as long as the job. Gives the sheet's secret.
 */
export async function acceptOffer(db: Database, { secret, act, appUrl }: Answer) {
  return await inCommand(db, async tx => {
    const known = await findOffered(tx, secret, act.now)
    if (known === null) throw new Refusal(notWhole)
    const order = await requireOrder(tx, known.orderId)
    // read again behind the order's lock: of two answers at once the second reads what the first has done
    const offered = (await findOffered(tx, secret, act.now))!
    if (offered.state !== 'sent') throw new Refusal(answeredWords[offered.state])
    await tx
      .update(offers)
      .set({ state: 'accepted', answeredAt: act.now, updatedAt: act.now })
      .where(and(eq(offers.id, offered.id), eq(offers.state, 'sent')))
    await moveOrder(tx, act, order, 'accepted', { verb: 'accepted', set: { workerId: offered.personId } })
    await writeActivity(tx, act, { verb: 'accepted', subjectKind: 'offer', subjectId: offered.id })
    const sheet = act.newSecret()
    await tx
      .insert(linkTokens)
      .values({ tokenHash: hashSecret(sheet), purpose: 'sheet', orderId: order.id, createdAt: act.now })
    const to = await findAddress(tx, offered.personId)
    const rows = await listJobRows(tx, order)
    if (to !== null)
      await queueMail(
        tx,
        act,
        toSheetMail({
          orderId: order.id,
          offerId: offered.id,
          to,
          title: order.title,
          rows,
          url: `${appUrl}/sheet/${sheet}`,
        }),
      )
    await tellMaker(tx, act, order, {
      key: offered.id,
      who: offered.name,
      did: 'accepted',
      words: null,
      appUrl,
    })
    return { sheetSecret: sheet }
  })
}

/** Declines an offer by its link, with a word if there is one. */
export async function declineOffer(
  db: Database,
  { secret, act, appUrl, words }: Answer & { words: string | null },
) {
  return await inCommand(db, async tx => {
    const offered = await findOffered(tx, secret, act.now)
    if (offered === null) throw new Refusal(notWhole)
    if (offered.state !== 'sent') throw new Refusal(answeredWords[offered.state])
    await endOffer(tx, act, offered, 'declined', words, appUrl)
    return {}
  })
}

/** The order a sheet's link opens while the job goes on, or null. */
export async function findSheetOrder(db: Queryable, secret: string): Promise<string | null> {
  const [row] = await db
    .select({ orderId: linkTokens.orderId })
    .from(linkTokens)
    .where(and(eq(linkTokens.tokenHash, hashSecret(secret)), eq(linkTokens.purpose, 'sheet')))
    .limit(1)
  return row?.orderId ?? null
}
