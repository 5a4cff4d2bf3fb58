import { inArray, type SQL, sql } from 'drizzle-orm'
import { crags } from '~/db/schema/crags'
import type { Viewer } from '~/people/viewer'

/**
 * The condition on `crags` that every list, count, tile, search, feed, photo and export of this viewer carries:
 * open crags for everybody, others for members of the organisations that look after them.
 */
export function visibleCrags(viewer: Viewer): SQL {
  const open = sql`${crags.sensitive} = 'open'`
  const mine = viewer.memberships.map(membership => membership.organisationId)
  if (mine.length === 0) return open
  return sql`(${open} or exists (select 1 from crag_organisations held where held.crag_id = ${crags.id} and ${inArray(sql`held.organisation_id`, mine)}))`
}
