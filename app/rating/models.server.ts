import { asc, desc, eq } from 'drizzle-orm'
import type { Database, Queryable } from '~/db/client.server'
import { ratingModels, ratingValues } from '~/db/schema/rating'
import { inTransaction, isDuplicate } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { modelRows, type RatingModel, toModel } from './model'

const loaded = new Map<string, RatingModel>()

/** Puts rating model 1 on record when the installation has none yet. */
export async function adoptFirstModel(db: Database, act: Act): Promise<void> {
  const [present] = await db.select({ id: ratingModels.id }).from(ratingModels).limit(1)
  if (present !== undefined) return
  const id = act.newId()
  await inTransaction(db, async tx => {
    await tx.insert(ratingModels).values({ id, number: 1, adoptedAt: act.now })
    await tx.insert(ratingValues).values(modelRows.map(row => ({ modelId: id, ...row })))
  }).catch(error => {
    // another process of the same installation did it at the same moment
    if (!isDuplicate(error)) throw error
  })
}

/** The rating model in force, with its id; read once per process, since an adopted model is never changed. */
export async function requireModel(db: Queryable): Promise<{ id: string; model: RatingModel }> {
  const [newest] = await db
    .select({ id: ratingModels.id })
    .from(ratingModels)
    .orderBy(desc(ratingModels.number))
    .limit(1)
  if (newest === undefined) throw new Error('no rating model has been adopted')
  const known = loaded.get(newest.id)
  if (known !== undefined) return { id: newest.id, model: known }
  const rows = await db
    .select({
      name: ratingValues.name,
      low: ratingValues.low,
      central: ratingValues.central,
      high: ratingValues.high,
      unit: ratingValues.unit,
      source: ratingValues.source,
      mark: ratingValues.mark,
    })
    .from(ratingValues)
    .where(eq(ratingValues.modelId, newest.id))
    .orderBy(asc(ratingValues.name))
  const model = toModel(rows)
  loaded.set(newest.id, model)
  return { id: newest.id, model }
}
