import { and, eq, isNull, lt } from 'drizzle-orm'
import type { Database, Transaction } from '~/db/client.server'
import { people, sessions, signInCodes } from '~/db/schema/people'
import { inTransaction } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import type { Step } from '~/record/worker.server'
import { useCode } from './codes.server'
import { endAllSessions, endSession, startSession } from './sessions.server'

export interface SignedIn {
  personId: string
  /** the new session's secret, for the cookie */
  secret: string
  /** whether this made the account */
  isNew: boolean
}

export type SignInAnswer = ({ ok: true } & SignedIn) | { ok: false; reason: string }

/**
 * Signs in whoever typed the code mailed to the address this browser asked with. An address nobody has becomes an
 * account. The browser's earlier session ends, so that a secret known before is worth nothing after.
 */
export async function signInByCode(
  db: Database,
  act: Act,
  typed: { code: string; browserHash: string; sessionHash: string | null },
  appSecret: string,
): Promise<SignInAnswer> {
  return await inTransaction(db, async tx => {
    const used = await useCode(tx, act.now, typed, appSecret)
    if (!used.ok) return used
    const { personId, isNew } = await findOrAddPerson(tx, act, used.email)
    if (typed.sessionHash !== null) await endSession(tx, typed.sessionHash)
    const secret = await startSession(tx, act, personId)
    await writePersonLine(tx, act, personId, isNew ? 'account-opened' : 'signed-in')
    return { ok: true as const, personId, secret, isNew }
  })
}

async function findOrAddPerson(tx: Transaction, act: Act, email: string) {
  const id = act.newId()
  // until the person gives a name, the part before the @ stands for it
  const name = email.split('@', 1)[0]!
  const stamps = { emailConfirmedAt: act.now, createdAt: act.now, updatedAt: act.now }
  const [added] = await tx
    .insert(people)
    .ignore()
    .values({ id, name, email, ...stamps })
  if (added.affectedRows === 1) return { personId: id, isNew: true }
  const [known] = await tx.select({ id: people.id }).from(people).where(eq(people.email, email))
  await tx
    .update(people)
    .set({ emailConfirmedAt: act.now })
    .where(and(eq(people.id, known!.id), isNull(people.emailConfirmedAt)))
  return { personId: known!.id, isNew: false }
}

async function writePersonLine(tx: Transaction, act: Act, personId: string, verb: string): Promise<void> {
  const by = { kind: 'person' as const, personId }
  await writeActivity(tx, { ...act, by }, { verb, subjectKind: 'person', subjectId: personId })
}

/** Ends this browser's session. */
export async function signOut(
  db: Database,
  act: Act,
  { personId, sessionHash }: { personId: string; sessionHash: string },
): Promise<void> {
  await inTransaction(db, async tx => {
    await endSession(tx, sessionHash)
    await writePersonLine(tx, act, personId, 'signed-out')
  })
}

/** Ends every session of the person, this one too. */
export async function signOutEverywhere(db: Database, act: Act, personId: string): Promise<void> {
  await inTransaction(db, async tx => {
    await endAllSessions(tx, personId)
    await writePersonLine(tx, act, personId, 'signed-out-everywhere')
  })
}

const day = 24 * 60 * 60 * 1000

/** The worker's step that takes away sessions and codes that work no more (codes are counted for a day). */
export const signInSweep: Step = {
  name: 'sign-in sweep',
  async run({ db, clock }) {
    const now = clock()
    await db.delete(sessions).where(lt(sessions.expiresAt, now))
    await db.delete(signInCodes).where(lt(signInCodes.createdAt, new Date(now.getTime() - 2 * day)))
    return 0
  },
}
