import { createHmac, timingSafeEqual } from 'node:crypto'
import { and, asc, desc, eq, gt, isNull, sql } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { signInCodes } from '~/db/schema/people'
import { codeRules } from './code'

const minute = 60 * 1000

/** What is stored of a code: keyed with the installation's secret, since eight digits alone are soon guessed. */
export function hashCode(code: string, { email, browserHash }: Pair, appSecret: string): string {
  return createHmac('sha256', appSecret).update(`code ${email} ${browserHash} ${code}`).digest('hex')
}

/** An address and the browser it was typed in. */
export interface Pair {
  email: string
  browserHash: string
}

/** How long until `span` milliseconds after `first` are over, in words: `6 minutes`. */
export function formatWait(first: Date, span: number, now: Date): string {
  const minutes = Math.max(1, Math.ceil((first.getTime() + span - now.getTime()) / minute))
  if (minutes === 1) return 'a minute'
  return minutes <= 90 ? `${minutes} minutes` : `${Math.ceil(minutes / 60)} hours`
}

type Live = Awaited<ReturnType<typeof listLive>>

/** How many wrong codes were typed while these live. */
export const countTries = (live: Live) => live.reduce((sum, { tries }) => sum + tries, 0)

/** The codes of an address in a browser that still work, locked, oldest first. */
export async function listLive(tx: Transaction, { email, browserHash }: Pair, now: Date) {
  return await tx
    .select({
      id: signInCodes.id,
      codeHash: signInCodes.codeHash,
      tries: signInCodes.tries,
      createdAt: signInCodes.createdAt,
    })
    .from(signInCodes)
    .where(
      and(
        eq(signInCodes.email, email),
        eq(signInCodes.browserHash, browserHash),
        gt(signInCodes.expiresAt, now),
        isNull(signInCodes.usedAt),
      ),
    )
    .orderBy(asc(signInCodes.createdAt), asc(signInCodes.id))
    .for('update')
}

/** Why no more codes may be typed, and until when. */
export function toSpent(live: Live, now: Date): string {
  const wait = formatWait(live.at(-1)!.createdAt, codeRules.minutes * minute, now)
  return `Five codes typed here were wrong, so these codes no longer work. Ask for a new one in ${wait}.`
}

/** The address a browser last asked a code for that still works, or null. */
export async function findAsked(
  db: Database | Transaction,
  browserHash: string,
  now: Date,
): Promise<string | null> {
  const [asked] = await db
    .select({ email: signInCodes.email })
    .from(signInCodes)
    .where(
      and(
        eq(signInCodes.browserHash, browserHash),
        gt(signInCodes.expiresAt, now),
        isNull(signInCodes.usedAt),
      ),
    )
    .orderBy(desc(signInCodes.createdAt), desc(signInCodes.id))
    .limit(1)
  return asked?.email ?? null
}

export type CodeAnswer = { ok: true; email: string } | { ok: false; reason: string }

/**
 * Uses up a code for the address the browser asked with. A wrong one counts as a try, so the transaction must be
 * committed whatever the answer.
 */
export async function useCode(
  tx: Transaction,
  now: Date,
  { code, browserHash }: { code: string; browserHash: string },
  appSecret: string,
): Promise<CodeAnswer> {
  const email = await findAsked(tx, browserHash, now)
  const live = email === null ? [] : await listLive(tx, { email, browserHash }, now)
  if (email === null || live.length === 0) {
    return {
      ok: false,
      reason: `Codes work for ${codeRules.minutes} minutes, in the browser that asked. Ask for a new one.`,
    }
  }
  const tries = countTries(live)
  if (tries >= codeRules.tries) return { ok: false, reason: toSpent(live, now) }
  const hash = Buffer.from(hashCode(code, { email, browserHash }, appSecret))
  if (!live.some(({ codeHash }) => timingSafeEqual(Buffer.from(codeHash), hash))) {
    return await countWrong(tx, live, tries + 1, now)
  }
  await tx
    .update(signInCodes)
    .set({ usedAt: now })
    .where(
      and(eq(signInCodes.email, email), eq(signInCodes.browserHash, browserHash), isNull(signInCodes.usedAt)),
    )
  return { ok: true, email }
}

async function countWrong(tx: Transaction, live: Live, tries: number, now: Date): Promise<CodeAnswer> {
  await tx
    .update(signInCodes)
    .set({ tries: sql`${signInCodes.tries} + 1` })
    .where(eq(signInCodes.id, live.at(-1)!.id))
  const left = codeRules.tries - tries
  if (left === 0) return { ok: false, reason: toSpent(live, now) }
  return {
    ok: false,
    reason: `That is not the code we mailed. Look again: ${left === 1 ? 'one try is' : `${left} tries are`} left.`,
  }
}
