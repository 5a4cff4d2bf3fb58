import { and, count, eq, gt, min, sql } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { signInCodes } from '~/db/schema/people'
import { rateLimits } from '~/db/schema/record'
import { inCommand, Refusal } from '~/db/transaction.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { hashSecret } from '~/record/acts.server'
import { codeRules, toCodeDigits } from './code'
import { toCodeMail } from './code-mail'
import { countTries, formatWait, hashCode, listLive, type Pair, toSpent } from './codes.server'

const minute = 60 * 1000
const hour = 60 * minute
const day = 24 * hour

const before = (now: Date, milliseconds: number) => new Date(now.getTime() - milliseconds)

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
