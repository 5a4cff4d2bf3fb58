import { and, eq, gt, isNull, or } from 'drizzle-orm'
import type { Queryable, Transaction } from '~/db/client.server'
import { linkTokens } from '~/db/schema/work'
import type { Act } from '~/record/act'
import { hashSecret } from '~/record/acts.server'

/** Makes the link to an order's read-only sheet and gives its secret. */
export async function makeSheet(tx: Transaction, act: Act, orderId: string): Promise<string> {
  const secret = act.newSecret()
  await tx
    .insert(linkTokens)
    .values({ tokenHash: hashSecret(secret), purpose: 'sheet', orderId, createdAt: act.now })
  return secret
}

/** Ends the sheet links of an order, when the job is no longer that worker's. */
export async function endSheets(tx: Transaction, act: Act, orderId: string): Promise<void> {
  await tx
    .update(linkTokens)
    .set({ expiresAt: act.now })
    .where(
      and(eq(linkTokens.orderId, orderId), eq(linkTokens.purpose, 'sheet'), isNull(linkTokens.expiresAt)),
    )
}

/** The order a sheet's link opens at this moment, or null. */
export async function findSheetOrder(db: Queryable, secret: string, now: Date): Promise<string | null> {
  const [row] = await db
    .select({ orderId: linkTokens.orderId })
    .from(linkTokens)
    .where(
      and(
        eq(linkTokens.tokenHash, hashSecret(secret)),
        eq(linkTokens.purpose, 'sheet'),
        or(isNull(linkTokens.expiresAt), gt(linkTokens.expiresAt, now)),
      ),
    )
    .limit(1)
  return row?.orderId ?? null
}
