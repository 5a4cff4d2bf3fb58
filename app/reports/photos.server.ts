import { and, asc, eq, inArray, lt } from 'drizzle-orm'
import type { Database, Queryable, Transaction } from '~/db/client.server'
import { photos } from '~/db/schema/reports'
import type { Act } from '~/record/act'
import { photoLimits } from './photo'
import type { TakenPhoto } from './photo-files.server'

type Target = { reportId: string; workRecordId?: undefined } | { workRecordId: string; reportId?: undefined }

const dayMs = 24 * 60 * 60_000

/** Remembers photos just taken up, owned by a session or guest (`stagedBy`, a hash) until their form is sent, a day at most. */
export async function stagePhotos(
  db: Queryable,
  act: Act,
  stagedBy: string,
  taken: TakenPhoto[],
): Promise<void> {
  for (const photo of taken)
    await db.insert(photos).values({
      id: act.newId(),
      storageKey: photo.key,
      state: 'staged',
      stagedBy,
      width: photo.width,
      height: photo.height,
      sha256: photo.sha256,
      expiresAt: new Date(act.now.getTime() + dayMs),
      createdAt: act.now,
      updatedAt: act.now,
    })
}

/** Of the keys a form names, those staged by this owner and not yet swept, in the form's order. */
export async function listStaged(db: Queryable, stagedBy: string, keys: string[], now: Date) {
  if (keys.length === 0) return []
  const rows = await db
    .select({
      key: photos.storageKey,
      width: photos.width,
      height: photos.height,
      expiresAt: photos.expiresAt,
    })
    .from(photos)
    .where(
      and(
        eq(photos.stagedBy, stagedBy),
        eq(photos.state, 'staged'),
        inArray(photos.storageKey, keys.slice(0, photoLimits.files)),
      ),
    )
  return keys.flatMap(key => rows.filter(row => row.key === key && row.expiresAt! > now))
}

/** Gives the owner's staged photos to a report or work record, in the command's transaction. Others' keys do nothing. */
export async function claimPhotos(
  tx: Transaction,
  act: Act,
  claim: { keys: string[]; stagedBy: string; target: Target },
): Promise<number> {
  if (claim.keys.length === 0) return 0
  const [done] = await tx
    .update(photos)
    .set({ state: 'kept', stagedBy: null, expiresAt: null, updatedAt: act.now, ...claim.target })
    .where(
      and(
        inArray(photos.storageKey, claim.keys.slice(0, photoLimits.files)),
        eq(photos.stagedBy, claim.stagedBy),
        eq(photos.state, 'staged'),
      ),
    )
  return done.affectedRows
}

/** The photos kept of a report or work record, oldest first; the public is shown only those let out. */
export async function listPhotos(db: Queryable, targets: { reportIds?: string[]; workRecordIds?: string[] }) {
  const { reportIds = [], workRecordIds = [] } = targets
  const of =
    reportIds.length > 0
      ? inArray(photos.reportId, reportIds)
      : workRecordIds.length > 0
        ? inArray(photos.workRecordId, workRecordIds)
        : null
  if (of === null) return []
  return await db
    .select({
      storageKey: photos.storageKey,
      reportId: photos.reportId,
      workRecordId: photos.workRecordId,
      width: photos.width,
      height: photos.height,
      public: photos.public,
      credit: photos.credit,
    })
    .from(photos)
    .where(and(of, eq(photos.state, 'kept')))
    .orderBy(asc(photos.id))
    .limit(100)
}

/** Lets a report's photos out to the public, after a coordinator has looked at them. */
export async function publishPhotos(tx: Transaction, act: Act, keys: string[]): Promise<void> {
  if (keys.length === 0) return
  await tx
    .update(photos)
    .set({ public: true, updatedAt: act.now })
    .where(and(inArray(photos.storageKey, keys), eq(photos.state, 'kept')))
}

/** Staged photos whose day is over: their rows go, and the keys whose files may be deleted are given. */
export async function sweepStaged(db: Database, now: Date): Promise<string[]> {
  const over = await db
    .select({ key: photos.storageKey })
    .from(photos)
    .where(and(eq(photos.state, 'staged'), lt(photos.expiresAt, now)))
    .limit(100)
  const keys = over.map(row => row.key)
  if (keys.length > 0)
    await db.delete(photos).where(and(inArray(photos.storageKey, keys), eq(photos.state, 'staged')))
  return keys
}
