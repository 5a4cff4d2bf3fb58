import { createHmac, timingSafeEqual } from 'node:crypto'
import { and, asc, count, desc, eq, gt, isNull, min, sql } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { signInCodes } from '~/db/schema/people'
import { rateLimits } from '~/db/schema/record'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { hashSecret } from '~/record/acts.server'
import { codeRules, toCodeDigits } from './code'
import { toCodeMail } from './code-mail'

const minute = 60 * 1000
const hour = 60 * minute
const day = 24 * hour

const before = (now: Date, milliseconds: number) => new Date(now.getTime() - milliseconds)

/** What is stored of a code: keyed with the installation's secret, since eight digits alone are soon guessed. */
function hashCode(code: string, { email, browserHash }: Pair, appSecret: string): string {
  return createHmac('sha256', appSecret).update(`code ${email} ${browserHash} ${code}`).digest('hex')
}

interface Pair {
  email: string
  browserHash: string
}

/**
 * Mails a new code to an address, for one browser; the answer never tells whether the address is known. Refused
 * when too many went to the address or came from the network, or after five wrong tries while those codes live.
 */
export async function askForCode(
  db: Database,
  act: Act,
  { email, browserHash, network }: Pair & { network: string },
  { appSecret, appUrl }: { appSecret: string; appUrl: string },
) {
  return await inCommand(db, async tx => {
    await waitTurn(tx, act, `codes-${hashSecret(email)}`)
    await waitTurn(tx, act, `codes-${network}`)
    await refuseWhenOften(tx, act, { email, network })
    const live = await listLive(tx, { email, browserHash }, act.now)
    if (countTries(live) >= codeRules.tries) throw new Refusal(toSpent(live, act.now))
    const code = toCodeDigits(act.random)
    const id = act.newId()
    await tx.insert(signInCodes).values({
      id,
      email,
      network,
      browserHash,
      codeHash: hashCode(code, { email, browserHash }, appSecret),
      expiresAt: new Date(act.now.getTime() + codeRules.minutes * minute),
      createdAt: act.now,
    })
    await queueMail(tx, act, {
      kind: 'sign-in-code',
      dedupeKey: `sign-in-code:${id}`,
      to: email,
      ...toCodeMail({ code, appUrl }),
    })
    return {}
  })
}

/** Makes askers under one key wait for one another until the transaction ends, so that their counts are true. */
async function waitTurn(tx: Transaction, act: Act, key: string): Promise<void> {
  const expire = act.now.getTime() + day
  await tx
    .insert(rateLimits)
    .values({ key, points: 1, expire })
    .onDuplicateKeyUpdate({ set: { points: sql`${rateLimits.points} + 1`, expire } })
}

async function refuseWhenOften(
  tx: Transaction,
  { now }: Act,
  { email, network }: { email: string; network: string },
): Promise<void> {
  const [byAddress] = await tx
    .select({ number: count(), first: min(signInCodes.createdAt) })
    .from(signInCodes)
    .where(and(eq(signInCodes.email, email), gt(signInCodes.createdAt, before(now, day))))
  if (byAddress && byAddress.number >= codeRules.perAddressADay) {
    const wait = formatWait(byAddress.first!, day, now)
    throw new Refusal(
      `Ten codes went to this address within a day, and more are not sent. Ask again in ${wait}.`,
    )
  }
  const [byNetwork] = await tx
    .select({ number: count(), first: min(signInCodes.createdAt) })
    .from(signInCodes)
    .where(and(eq(signInCodes.network, network), gt(signInCodes.createdAt, before(now, hour))))
  if (byNetwork && byNetwork.number >= codeRules.perNetworkAnHour) {
    const wait = formatWait(byNetwork.first!, hour, now)
    throw new Refusal(`Many codes were asked for from your network within an hour. Ask again in ${wait}.`)
  }
}

function formatWait(first: Date, span: number, now: Date): string {
  const minutes = Math.max(1, Math.ceil((first.getTime() + span - now.getTime()) / minute))
  if (minutes === 1) return 'a minute'
  return minutes <= 90 ? `${minutes} minutes` : `${Math.ceil(minutes / 60)} hours`
}

type Live = Awaited<ReturnType<typeof listLive>>
const countTries = (live: Live) => live.reduce((sum, { tries }) => sum + tries, 0)

/** The codes of an address in a browser that still work, locked, oldest first. */
async function listLive(tx: Transaction, { email, browserHash }: Pair, now: Date) {
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

function toSpent(live: Live, now: Date): string {
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
    reason: `That is not the code of the newest mail. Look again: ${left === 1 ? 'one try is' : `${left} tries are`} left.`,
  }
}
