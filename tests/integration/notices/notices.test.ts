import { eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { anchors } from '~/db/schema/crags'
import { messages } from '~/db/schema/mail'
import { notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { inTransaction } from '~/db/transaction.server'
import { confirmWarning, endFirstWarnings, withdrawNotice } from '~/notices/end.server'
import { noticesInForce } from '~/notices/notices.server'
import { publishFirstWarning, publishNotice } from '~/notices/publish.server'
import { stranger } from '~/people/viewer'
import { takeIn } from '~/reports/decide.server'
import { testDatabase } from '../database'
import { actBy, findPerson, findPoint, links, now, reportRing, seedDemo, viewerOf } from '../demo'

const { db, empty, url } = await testDatabase()
const appUrl = links.appUrl
let code: string

beforeEach(async () => {
  await empty()
  await seedDemo(url)
  const { reportId } = await reportRing(db)
  const ines = await findPerson(db, 'ines@keld.example')
  const done = await takeIn(db, { reportId, act: actBy(ines.id), links, publicPhotoKeys: [] })
  code = (done as { hazardCode: string }).hazardCode
})

const by = async (email: string) => ({
  hazardCode: code,
  viewer: await viewerOf(db, email),
  act: actBy((await findPerson(db, email)).id),
  appUrl,
})
const hazard = async () => (await db.select().from(hazards).where(eq(hazards.code, code)))[0]!
const notice = async () => (await db.select().from(notices))[0]!
const inForce = (at = now) => noticesInForce(db, stranger, { now: at })
const written = {
  kind: 'hazard',
  headline: 'Worn ring',
  words: 'Do not lower from it.',
  endsAt: null,
  decidedByWords: 'Skerrow Access Forum',
  ground: 'seen worn',
  reviewOn: '2027-07-01',
} as const

describe('A first warning', () => {
  it('by a coordinator stands in public at once, in fixed words about both routes', async () => {
    expect(await publishFirstWarning(db, await by('ines@keld.example'))).toMatchObject({ ok: true })
    const [shown] = await inForce()
    expect(shown!.words).toContain('Do not rely on the lower-off of Slack Water and Ebb')
    expect((await hazard()).state).toBe('warned')
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    const [anchor] = await db.select().from(anchors).where(eq(anchors.id, point.anchorId))
    expect(anchor!.notices).toBe(1)
  })

  it('asks every access officer of the crag, once', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    const asked = await db.select().from(messages).where(eq(messages.kind, 'warning-review'))
    expect(asked.map(mail => mail.toEmail)).toEqual(['oona@forum.example'])
  })

  it('is published once: of two at the same moment the second reads why not', async () => {
    const given = await by('ines@keld.example')
    const done = await Promise.all([publishFirstWarning(db, given), publishFirstWarning(db, given)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
  })

  it('outlives its seven days while its hazard is open', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    const later = new Date(now.getTime() + 30 * 86_400_000)
    expect(await inForce(later)).toHaveLength(1)
  })

  it('is not published for what is In turn', async () => {
    await db.update(hazards).set({ band: 'turn' }).where(eq(hazards.code, code))
    const done = await publishFirstWarning(db, await by('ines@keld.example'))
    expect(done).toMatchObject({ ok: false, reason: expect.stringMatching(/In turn/) })
  })

  it('is not published by somebody of another organisation', async () => {
    expect(await publishFirstWarning(db, await by('bram@harrow.example'))).toMatchObject({ ok: false })
    expect(await inForce()).toEqual([])
  })

  it('is confirmed by an access officer, once', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    const { act } = await by('oona@forum.example')
    const { id } = await notice()
    const given = { noticeId: id, cragId: (await hazard()).cragId, act }
    expect(await confirmWarning(db, given)).toEqual({ ok: true })
    expect(await confirmWarning(db, given)).toMatchObject({ ok: false })
    expect((await inForce())[0]!.confirmedAt).toEqual(now)
  })

  it('withdrawn leaves its hazard open again', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    const { id } = await notice()
    const { act } = await by('oona@forum.example')
    expect(await withdrawNotice(db, { noticeId: id, cragId: (await hazard()).cragId, act })).toEqual({
      ok: true,
    })
    expect((await hazard()).state).toBe('open')
    expect(await inForce()).toEqual([])
  })

  it('ends by itself when its hazard is cleared', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    const { id } = await hazard()
    await db.update(hazards).set({ state: 'cleared' }).where(eq(hazards.id, id))
    await inTransaction(db, tx => endFirstWarnings(tx, actBy(null), { hazardIds: [id], appUrl }))
    expect((await notice()).state).toBe('withdrawn')
  })
})

describe('An access officer’s notice', () => {
  it('takes the place of the first warning of its hazard', async () => {
    await publishFirstWarning(db, await by('ines@keld.example'))
    expect(await publishNotice(db, { ...(await by('oona@forum.example')), notice: written })).toMatchObject({
      ok: true,
    })
    expect((await inForce()).map(one => one.headline)).toEqual(['Worn ring'])
  })

  it('is not ended by the clearing of its hazard: the officer is asked', async () => {
    await publishNotice(db, { ...(await by('oona@forum.example')), notice: written })
    const { id } = await hazard()
    await db.update(hazards).set({ state: 'cleared' }).where(eq(hazards.id, id))
    await inTransaction(db, tx => endFirstWarnings(tx, actBy(null), { hazardIds: [id], appUrl }))
    expect(await notice()).toMatchObject({ state: 'published', askedAt: now })
    const asked = await db.select().from(messages).where(eq(messages.kind, 'notice-still-true'))
    expect(asked.map(mail => mail.toEmail)).toEqual(['oona@forum.example'])
  })

  it('is not a coordinator’s to write', async () => {
    expect(await publishNotice(db, { ...(await by('ines@keld.example')), notice: written })).toMatchObject({
      ok: false,
    })
  })
})
