import { and, asc, eq, isNull } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { cragOrganisations } from '~/db/schema/crags'
import { membershipRoles, memberships, people } from '~/db/schema/people'

/** The access officers of the organisations that look after a crag's access, each with an address. */
export async function listAccessOfficers(db: Queryable, cragId: string) {
  const rows = await db
    .selectDistinct({ id: people.id, name: people.name, email: people.email })
    .from(cragOrganisations)
    .innerJoin(memberships, eq(memberships.organisationId, cragOrganisations.organisationId))
    .innerJoin(membershipRoles, eq(membershipRoles.membershipId, memberships.id))
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(
      and(
        eq(cragOrganisations.cragId, cragId),
        eq(cragOrganisations.remit, 'access'),
        eq(membershipRoles.role, 'access_officer'),
        isNull(memberships.endedAt),
      ),
    )
    .orderBy(asc(people.name))
    .limit(50)
  return rows.flatMap(row => (row.email === null ? [] : [{ ...row, email: row.email }]))
}
