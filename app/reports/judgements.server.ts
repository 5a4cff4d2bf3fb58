import { eq } from 'drizzle-orm'
import type { Queryable } from '~/db/client.server'
import { ratings } from '~/db/schema/rating'
import type { Judgement } from './judgement'

/** A rating as it was computed and kept, or null. */
export async function findJudgement(db: Queryable, ratingId: string): Promise<Judgement | null> {
  const [row] = await db
    .select({ results: ratings.results })
    .from(ratings)
    .where(eq(ratings.id, ratingId))
    .limit(1)
  return row === undefined ? null : (row.results as Judgement)
}
