import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { and, eq } from 'drizzle-orm'
import { afterAll } from 'vitest'
import type { Database } from '~/db/client.server'
import { anchors, climbAnchors, climbs } from '~/db/schema/crags'
import { people } from '~/db/schema/people'
import { findViewer, startSession } from '~/people/sessions.server'
import type { Act } from '~/record/act'
import { toAct } from '~/record/acts.server'
import type { NewFinding } from '~/reports/report.schema'
import { sendReport } from '~/reports/send.server'
import { seed } from '../../drizzle/seed'

export const now = new Date('2027-05-02T12:00:00.000Z')

export const links = { appUrl: 'http://127.0.0.1:3000', toStatusSecret: (id: string) => `secret-${id}` }

/** The photos of one test file, gone when it is done. */
export const photoDir = mkdtempSync(join(tmpdir(), 'cragfettle-photos-'))
afterAll(() => rmSync(photoDir, { recursive: true, force: true }))

/** Puts the demo of Skerrow in an empty database. */
export async function seedDemo(url: string): Promise<{ photoDir: string }> {
  await seed({ databaseUrl: url, photoDir, now })
  return { photoDir }
}

export async function findPerson(db: Database, email: string) {
  const [row] = await db
    .select({ id: people.id, email: people.email, name: people.name })
    .from(people)
    .where(eq(people.email, email))
  return { ...row!, email: row!.email! }
}

export const actBy = (personId: string | null, at = now): Act =>
  toAct(at, personId === null ? { kind: 'guest', personId } : { kind: 'person', personId })

/** Who looks when this person is signed in. */
export async function viewerOf(db: Database, email: string) {
  const person = await findPerson(db, email)
  const session = await startSession(db, actBy(person.id), person.id)
  return await findViewer(db, { session, guest: null }, now)
}

/** A fixed point of a climb of the demo: a bolt's number or 'lower-off'. */
export async function findPoint(db: Database, climbName: string, at: number | 'lower-off') {
  const kind = at === 'lower-off' ? 'lower_off' : 'bolt'
  const [row] = await db
    .select({
      anchorId: anchors.id,
      code: anchors.code,
      cragId: anchors.cragId,
      climbId: climbs.id,
      climbCode: climbs.code,
    })
    .from(climbs)
    .innerJoin(climbAnchors, eq(climbAnchors.climbId, climbs.id))
    .innerJoin(anchors, eq(anchors.id, climbAnchors.anchorId))
    .where(
      and(
        eq(climbs.name, climbName),
        eq(anchors.kind, kind),
        eq(climbAnchors.ordinal, at === 'lower-off' ? 1 : at),
      ),
    )
  return row!
}

export const groove: NewFinding = {
  kind: 'groove',
  partId: null,
  unit: 'mm',
  low: 3.3,
  high: 3.3,
  method: 'measured',
  edge: 'sharp',
  triedByHand: true,
}

let sent = 0

/** A report of a worn ring on Slack Water's lower-off by a climber of the demo, or by a guest. */
export async function reportRing(
  db: Database,
  given: {
    findings?: NewFinding[]
    guestEmail?: string
    clientKey?: string
    climb?: string
    at?: number | 'lower-off'
  } = {},
) {
  const point = await findPoint(db, given.climb ?? 'Slack Water', given.at ?? 'lower-off')
  const pia = await findPerson(db, 'pia@climbers.example')
  const guest = given.guestEmail !== undefined
  return await sendReport(db, {
    act: actBy(guest ? null : pia.id),
    links,
    clientKey: given.clientKey ?? `test-report-${String(++sent).padStart(12, '0')}`,
    cragId: point.cragId,
    climbId: point.climbId,
    anchorId: point.anchorId,
    place: 'the lower-off on Slack Water, Gannet Wall',
    seenOn: '2027-05-02',
    howSeen: 'on_it',
    words: null,
    findings: given.findings ?? [groove],
    photoKeys: [],
    stagedBy: null,
    person: guest ? null : pia,
    guestEmail: given.guestEmail ?? null,
  })
}
