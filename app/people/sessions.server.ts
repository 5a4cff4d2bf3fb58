import { and, desc, eq, gt, isNull, lt } from 'drizzle-orm'
import type { Database, Queryable } from '~/db/client.server'
import { membershipRoles, memberships, organisations, people, sessions } from '~/db/schema/people'
import type { Act } from '~/record/act'
import { hashSecret } from '~/record/acts.server'
import type { Membership } from './viewer'
import type { KnownViewer } from './viewer-context'

const day = 24 * 60 * 60 * 1000
const sessionLife = 90 * day
const seenEvery = 10 * 60 * 1000

const after = (moment: Date, milliseconds: number) => new Date(moment.getTime() + milliseconds)

/** Signs a person in and gives the cookie's secret, of which only the hash is kept. */
export async function startSession(tx: Queryable, act: Act, personId: string): Promise<string> {
  const secret = act.newSecret()
  await tx.insert(sessions).values({
    tokenHash: hashSecret(secret),
    personId,
    seenAt: act.now,
    expiresAt: after(act.now, sessionLife),
    confirmedAt: act.now,
    createdAt: act.now,
  })
  return secret
}

/**
 * Who looks, by the secrets of the two cookies: person and roles as they stand now. A session lives 90 days from
 * when it was last seen, which is written at most every ten minutes. Nobody known when there is no live session.
 */
export async function findViewer(
  db: Database,
  secrets: { session: string | null; guest: string | null },
  now: Date,
): Promise<KnownViewer> {
  const guestHash = secrets.guest === null ? null : hashSecret(secrets.guest)
  const nobody = { person: null, memberships: [], sessionHash: null, guestHash, confirmedAt: null }
  if (secrets.session === null) return nobody
  const found = await findLiveSession(db, hashSecret(secrets.session), now)
  if (found === null) return nobody
  if (now.getTime() - found.seenAt.getTime() >= seenEvery) await touchSession(db, found.tokenHash, now)
  const { tokenHash: sessionHash, confirmedAt, id, name, email, over18 } = found
  const person = { id, name, email: email ?? '', over18 }
  return { person, memberships: await listMemberships(db, id), sessionHash, guestHash, confirmedAt }
}

async function findLiveSession(db: Database, tokenHash: string, now: Date) {
  const [found] = await db
    .select({
      tokenHash: sessions.tokenHash,
      seenAt: sessions.seenAt,
      confirmedAt: sessions.confirmedAt,
      id: people.id,
      name: people.name,
      email: people.email,
      over18: people.over18,
    })
    .from(sessions)
    .innerJoin(people, eq(people.id, sessions.personId))
    .where(and(eq(sessions.tokenHash, tokenHash), gt(sessions.expiresAt, now), isNull(people.erasedAt)))
  return found ?? null
}

async function touchSession(db: Database, tokenHash: string, now: Date): Promise<void> {
  await db
    .update(sessions)
    .set({ seenAt: now, expiresAt: after(now, sessionLife) })
    .where(and(eq(sessions.tokenHash, tokenHash), lt(sessions.seenAt, now)))
}

async function listMemberships(db: Database, personId: string): Promise<Membership[]> {
  const rows = await db
    .select({
      organisationId: organisations.id,
      organisationName: organisations.name,
      role: membershipRoles.role,
    })
    .from(memberships)
    .innerJoin(organisations, eq(organisations.id, memberships.organisationId))
    .leftJoin(membershipRoles, eq(membershipRoles.membershipId, memberships.id))
    .where(and(eq(memberships.personId, personId), isNull(memberships.endedAt)))
    .orderBy(organisations.name)
  const byOrganisation = new Map<string, Membership>()
  for (const { organisationId, organisationName, role } of rows) {
    const membership = byOrganisation.get(organisationId) ?? { organisationId, organisationName, roles: [] }
    if (role !== null) membership.roles.push(role)
    byOrganisation.set(organisationId, membership)
  }
  return [...byOrganisation.values()]
}

/** The person's live sessions, last seen first. */
export async function listSessions(db: Queryable, personId: string, now: Date) {
  return await db
    .select({ tokenHash: sessions.tokenHash, seenAt: sessions.seenAt, createdAt: sessions.createdAt })
    .from(sessions)
    .where(and(eq(sessions.personId, personId), gt(sessions.expiresAt, now)))
    .orderBy(desc(sessions.seenAt))
    .limit(50)
}

/** Ends one session; ending one that is not there changes nothing. */
export async function endSession(tx: Queryable, sessionHash: string): Promise<void> {
  await tx.delete(sessions).where(eq(sessions.tokenHash, sessionHash))
}

/** Ends every session of a person, on every device. */
export async function endAllSessions(tx: Queryable, personId: string): Promise<void> {
  await tx.delete(sessions).where(eq(sessions.personId, personId))
}
