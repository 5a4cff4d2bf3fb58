import { eq } from 'drizzle-orm'
import { type beforeAll, beforeEach } from 'vitest'
import { messages } from '~/db/schema/mail'
import { notices } from '~/db/schema/notices'
import { activities } from '~/db/schema/record'
import { hazards } from '~/db/schema/reports'
import { inTransaction } from '~/db/transaction.server'
import { endFirstWarnings } from '~/notices/end.server'
import { noticesInForce } from '~/notices/notices.server'
import { publishFirstWarning, publishNotice } from '~/notices/publish.server'
import { stranger } from '~/people/viewer'
import { takeIn } from '~/reports/decide.server'
import { testDatabase } from '../database'
import { actBy, findPerson, links, now, reportRing, seedDemo, viewerOf } from '../demo'

const day = 86_400_000
const appUrl = links.appUrl
export const inDays = (days: number) => new Date(now.getTime() + days * day)

/**
 * The demo with one open hazard at Slack Water's lower-off, made anew before each test (or `beforeAll`), and what one
 * does with its notices.
 */
export async function noticeRoom(before: typeof beforeEach | typeof beforeAll = beforeEach) {
  const { db, empty, url } = await testDatabase()
  let code: string

  before(async () => {
    await empty()
    await seedDemo(url)
    const { reportId } = await reportRing(db)
    const ines = await findPerson(db, 'ines@keld.example')
    const done = await takeIn(db, { reportId, act: actBy(ines.id), links, publicPhotoKeys: [] })
    code = (done as { hazardCode: string }).hazardCode
  })

  const by = async (email: string, at = now) => ({
    hazardCode: code,
    viewer: await viewerOf(db, email),
    act: actBy((await findPerson(db, email)).id, at),
    appUrl,
  })
  const hazard = async () => (await db.select().from(hazards).where(eq(hazards.code, code)))[0]!
  const written = {
    kind: 'hazard',
    headline: 'Worn ring',
    words: 'Do not lower from it.',
    endsAt: null,
    decidedByWords: 'Skerrow Access Forum',
    ground: 'seen worn',
    reviewOn: '2027-07-01',
  } as const
  return {
    db,
    by,
    hazard,
    written,
    notices: async () => await db.select().from(notices).orderBy(notices.publishedAt, notices.id),
    inForce: (at = now) => noticesInForce(db, stranger, { now: at }),
    /** A coordinator warns. */
    warn: async (at = now) => await publishFirstWarning(db, await by('ines@keld.example', at)),
    /** An access officer writes. */
    write: async (notice: Partial<Parameters<typeof publishNotice>[1]['notice']> = {}, at = now) =>
      await publishNotice(db, {
        ...(await by('oona@forum.example', at)),
        notice: { ...written, ...notice },
      }),
    /** What is given to the commands that confirm and withdraw. */
    officer: async (noticeId: string, at = now) => ({
      noticeId,
      cragId: (await hazard()).cragId,
      act: (await by('oona@forum.example', at)).act,
    }),
    /** The hazard is cleared, as the closing of its order does. */
    clear: async (at = now) => {
      const { id } = await hazard()
      await db.update(hazards).set({ state: 'cleared' }).where(eq(hazards.id, id))
      await inTransaction(db, tx => endFirstWarnings(tx, actBy(null, at), { hazardIds: [id], appUrl }))
    },
    mailed: async (kind: string) =>
      (await db.select().from(messages).where(eq(messages.kind, kind))).map(mail => mail.toEmail),
    linesOf: async (subjectId: string) =>
      (await db.select().from(activities).where(eq(activities.subjectId, subjectId)))
        .map(line => line.verb)
        .sort(),
  }
}
