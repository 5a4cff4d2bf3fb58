import { and, asc, eq, inArray, isNull } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { membershipRoles, memberships, people } from '~/db/schema/people'
import { Refusal } from '~/db/transaction.server'
import type { Order } from './orders.server'

/** The organisation's rebolters, of age, whom a job can be offered to. */
export async function listRebolters(db: Queryable, organisationId: string) {
  const rows = await db
    .selectDistinct({ id: people.id, name: people.name, email: people.email })
    .from(memberships)
    .innerJoin(membershipRoles, eq(membershipRoles.membershipId, memberships.id))
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(
      and(
        eq(memberships.organisationId, organisationId),
        isNull(memberships.endedAt),
        eq(membershipRoles.role, 'rebolter'),
        eq(people.over18, true),
      ),
    )
    .orderBy(asc(people.name))
    .limit(200)
  return rows.flatMap(row => (row.email === null ? [] : [{ ...row, email: row.email }]))
}

/**
 * Refuses whoever may not work for the order's organisation at this moment: asked in the command's transaction, since
 * a role may be taken away between page and button. `next` says what to do instead.
 */
export async function requireWorking(
  db: Queryable,
  order: Pick<Order, 'organisationId' | 'organisation'>,
  personId: string | null,
  next: string,
): Promise<void> {
  const held =
    personId === null
      ? []
      : await db
          .select({ role: membershipRoles.role })
          .from(memberships)
          .innerJoin(membershipRoles, eq(membershipRoles.membershipId, memberships.id))
          .where(
            and(
              eq(memberships.personId, personId),
              eq(memberships.organisationId, order.organisationId),
              isNull(memberships.endedAt),
              inArray(membershipRoles.role, ['rebolter', 'coordinator']),
            ),
          )
          .limit(1)
  if (held.length === 0) throw new Refusal(`You no longer work for ${order.organisation}. ${next}`)
}

/** A person's name and address for a mail, or null once erased. */
export async function findAddress(db: Queryable, personId: string | null) {
  if (personId === null) return null
  const [row] = await db
    .select({ id: people.id, name: people.name, email: people.email })
    .from(people)
    .where(eq(people.id, personId))
    .limit(1)
  return row?.email == null ? null : { ...row, email: row.email }
}
