import { and, eq } from 'drizzle-orm'
import type { Request, RequestHandler } from 'express'
import { requireCragSubject } from '~/crags/crags.server'
import type { Database } from '~/db/client.server'
import { photos, reports } from '~/db/schema/reports'
import { orders, workRecords } from '~/db/schema/work'
import { findViewer } from '~/people/sessions.server'
import { can } from '~/people/viewer'
import type { KnownViewer } from '~/people/viewer-context'
import { findCookie, guestCookie, sessionCookie } from '~/web/cookies'
import type { Settings } from '~/web/settings'
import { toPhotoPath } from './photo-files.server'

/** Sizes the address may name; full size is for coordinators. */
const files = { '320.webp': false, '960.webp': false, '960.jpg': false, '2048.webp': true } as const

async function findPhoto(db: Database, key: string) {
  const [row] = await db
    .select({
      state: photos.state,
      public: photos.public,
      stagedBy: photos.stagedBy,
      reportCragId: reports.cragId,
      reporterId: reports.personId,
      workCragId: orders.cragId,
      workerId: workRecords.by,
    })
    .from(photos)
    .leftJoin(reports, eq(reports.id, photos.reportId))
    .leftJoin(workRecords, eq(workRecords.id, photos.workRecordId))
    .leftJoin(orders, eq(orders.id, workRecords.orderId))
    .where(and(eq(photos.storageKey, key)))
    .limit(1)
  return row ?? null
}

type Photo = NonNullable<Awaited<ReturnType<typeof findPhoto>>>

/** Its owner while staged; then the reporter or worker, and who looks after the crag; full size for coordinators. */
async function maySee(db: Database, photo: Photo, viewer: KnownViewer, full: boolean): Promise<boolean> {
  if (photo.state === 'staged')
    return photo.stagedBy !== null && [viewer.sessionHash, viewer.guestHash].includes(photo.stagedBy)
  if (photo.state !== 'kept') return false
  const cragId = photo.reportCragId ?? photo.workCragId
  if (cragId === null || viewer.person === null) return false
  const crag = await requireCragSubject(db, cragId)
  if (can(viewer, 'photo:full', crag)) return true
  if (full) return false
  const own = [photo.reporterId, photo.workerId].includes(viewer.person.id)
  return own || can(viewer, 'order:see', crag) || can(viewer, 'urgency:see', crag)
}

/**
 * `GET /photos/:key/:file`: a published photo for everybody, kept a day by caches; any other through the guard, never
 * kept. What one may not see answers 404.
 */
export function servePhotos(given: { db: Database; clock: () => Date; settings: Settings }): RequestHandler {
  return async (request: Request, response) => {
    const { key, file } = request.params as { key: string; file: string }
    if (!/^[0-9a-f]{32}$/.test(key) || !(file in files)) return void response.status(404).end()
    const full = files[file as keyof typeof files]
    const photo = await findPhoto(given.db, key)
    if (photo === null) return void response.status(404).end()
    const open = photo.public && photo.state === 'kept' && !full
    if (!open && !(await maySee(given.db, photo, await whoLooks(request, given), full)))
      return void response.status(404).end()
    response.set({
      'Cache-Control': open ? 'public, max-age=86400' : 'private, no-store',
      'Content-Security-Policy': "sandbox; default-src 'none'",
      'Content-Disposition': 'inline',
    })
    response.sendFile(toPhotoPath(given.settings.photoDir, key, file), { dotfiles: 'deny' }, error => {
      if (error && !response.headersSent) response.status(404).end()
    })
  }
}

async function whoLooks(request: Request, { db, clock }: { db: Database; clock: () => Date }) {
  const header = request.headers.cookie
  const secrets = { session: findCookie(header, sessionCookie), guest: findCookie(header, guestCookie) }
  return await findViewer(db, secrets, clock())
}
