import { and, asc, eq, isNull, or, sql } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { anchors, climbAnchors, climbs, crags, sectors } from '~/db/schema/crags'
import { parseCode } from '~/lib/code'
import type { Viewer } from '~/people/viewer'
import type { ConditionState } from './condition-state'
import { visibleCrags } from './visible.server'

export interface FoundClimb {
  code: string
  name: string
  where: string
  state: ConditionState
  /** where a report on it begins */
  to: string
}

const most = 60

/** What was typed as a LIKE pattern, its own wildcards taken literally. */
function toPattern(words: string): string {
  return `%${words.replace(/[\\%_]/g, character => `\\${character}`)}%`
}

/**
 * Routes the viewer may see whose name, crag or sector contains the words (accents and case do not matter), or that
 * carry the code, or the fixed point of that code; all of a crag with no words. At most sixty, by place.
 */
export async function searchPlaces(
  db: Queryable,
  viewer: Viewer,
  { words, cragId }: { words: string; cragId?: string },
): Promise<FoundClimb[]> {
  const code = parseCode(words)
  const pattern = toPattern(words)
  const rows = await db
    .select({
      code: climbs.code,
      name: climbs.name,
      state: climbs.worstState,
      crag: crags.name,
      sector: sectors.name,
      anchorCode: sql<
        string | null
      >`(select ${anchors.code} from ${anchors} join ${climbAnchors} on ${climbAnchors.anchorId} = ${anchors.id} where ${climbAnchors.climbId} = ${climbs.id} and ${anchors.code} = ${code} limit 1)`,
    })
    .from(climbs)
    .innerJoin(sectors, eq(sectors.id, climbs.sectorId))
    .innerJoin(crags, eq(crags.id, sectors.cragId))
    .where(
      and(
        visibleCrags(viewer),
        isNull(climbs.retiredAt),
        cragId === undefined ? undefined : eq(crags.id, cragId),
        words === ''
          ? undefined
          : or(
              sql`${climbs.name} like ${pattern}`,
              sql`${crags.name} like ${pattern}`,
              sql`${sectors.name} like ${pattern}`,
              code === null ? undefined : eq(climbs.code, code),
              code === null ? undefined : eq(crags.code, code),
              code === null
                ? undefined
                : sql`exists (select 1 from ${climbAnchors} join ${anchors} on ${anchors.id} = ${climbAnchors.anchorId} where ${climbAnchors.climbId} = ${climbs.id} and ${anchors.code} = ${code})`,
            ),
      ),
    )
    .orderBy(asc(crags.name), asc(sectors.ordinal), asc(climbs.ordinal))
    .limit(most)
  return rows.map(row => ({
    code: row.code,
    name: row.name,
    state: row.state,
    where: `${row.crag}, ${row.sector}`,
    to: row.anchorCode === null ? `/report/${row.code}` : `/report/${row.code}/${row.anchorCode}`,
  }))
}
