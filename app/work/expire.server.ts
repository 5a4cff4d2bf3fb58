import { and, eq, lte } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import { offers } from '~/db/schema/work'
import { inTransaction } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { endOffer } from './offer.server'

/** Ends the offers whose time is over, each in a transaction of its own, and gives how many that were. */
export async function expireOffers(db: Database, act: Act, appUrl: string): Promise<number> {
  const over = await db
    .select({ id: offers.id, orderId: offers.orderId, personId: offers.personId })
    .from(offers)
    .where(and(eq(offers.state, 'sent'), lte(offers.expiresAt, act.now)))
    .limit(20)
  let ended = 0
  for (const offer of over) {
    const to = { to: 'expired', words: null, appUrl } as const
    if (await inTransaction(db, tx => endOffer(tx, act, offer, to))) ended += 1
  }
  return ended
}
