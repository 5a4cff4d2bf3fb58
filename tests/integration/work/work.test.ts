import { and, eq, isNull } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { anchors, areas, crags } from '~/db/schema/crags'
import { notices } from '~/db/schema/notices'
import { parts } from '~/db/schema/parts'
import { findings, hazards, photos, reports } from '~/db/schema/reports'
import { workRecords } from '~/db/schema/work'
import { publishFirstWarning } from '~/notices/publish.server'
import { stagePhotos } from '~/reports/photos.server'
import { acceptOffer } from '~/work/answer.server'
import { handBack } from '~/work/hand-back.server'
import { testDatabase } from '../database'
import { actBy, now, viewerOf } from '../demo'
import { appUrl, type Crew, gatherCrew } from './crew'

const { db, empty, url } = await testDatabase()
let crew: Crew

beforeEach(async () => {
  await empty()
  crew = await gatherCrew(db, url)
})

const stagedBy = 'a'.repeat(64)
/** Takes a photo up for the browser that sends the record; gives its key. */
async function stage(): Promise<string> {
  const key = '0123456789abcdef0123456789abcdef'
  await stagePhotos(db, actBy(crew.tam), stagedBy, [{ key, width: 960, height: 720, sha256: 'b'.repeat(64) }])
  return key
}

async function warn(): Promise<void> {
  const viewer = await viewerOf(db, 'ines@keld.example')
  const [hazard] = await db.select().from(hazards).where(eq(hazards.id, crew.hazardId))
  await publishFirstWarning(db, { hazardCode: hazard!.code, viewer, act: actBy(crew.ines), appUrl })
}

const anchorNow = async () => (await db.select().from(anchors).where(eq(anchors.id, crew.anchorId)))[0]!
const glueIn = {
  replaces: null,
  side: 'a',
  kind: 'bonded_eye',
  material: 'titanium',
  sizeMm: 10,
  marking: null,
} as const

describe('A job from offer to closing', () => {
  it('clears the hazard, renews the part, ends the first warning and thanks the reporter', async () => {
    await warn()
    const worn = await crew.ringInPlace()
    const orderId = await crew.accepted()
    const key = await stage()
    const recorded = await crew.record(orderId, { photoKeys: [key], stagedBy, noPhotoReason: null })
    expect(recorded).toEqual({ ok: true })
    expect(await crew.states()).toEqual(['done', 'mended'])
    expect(await crew.check(orderId)).toEqual({ ok: true })
    expect((await db.select().from(notices))[0]!.state).toBe('published')
    expect(await crew.close(orderId, [key])).toEqual({ ok: true })
    expect(await crew.states()).toEqual(['closed', 'cleared'])
    const [record] = await db.select().from(workRecords)
    const [old] = await db.select().from(parts).where(eq(parts.id, worn.id))
    expect(old).toMatchObject({ removedOn: '2027-05-02', removedByRecord: record!.id })
    expect(await crew.ringInPlace()).toMatchObject({
      ...{ material: 'titanium', sizeMm: 12, side: worn.side },
      ...{ fittedOn: '2027-05-02', fittedPrecision: 'day', fittedByRecord: record!.id },
    })
    expect(await anchorNow()).toMatchObject({
      ...{ state: 'good', openHazards: 0, notices: 0, stateOn: '2027-05-02' },
    })
    expect((await db.select().from(notices))[0]!.state).toBe('withdrawn')
    const groove = and(eq(findings.kind, 'groove'), eq(findings.low, 3.3))
    const [cleared] = await db.select().from(findings).where(groove)
    expect(cleared!.clearedByRecord).toBe(record!.id)
  })

  it('thanks the reporter with a picture of the work and what was fitted, naming nobody', async () => {
    const orderId = await crew.accepted()
    const key = await stage()
    await crew.record(orderId, { photoKeys: [key], stagedBy, noPhotoReason: null })
    await crew.check(orderId)
    await crew.close(orderId, [key])
    const [thanks] = await crew.mailsOf('hazard-mended')
    expect(thanks).toMatchObject({ toEmail: 'pia@climbers.example' })
    expect(thanks!.text).toContain('Ring, titanium, 12 mm')
    expect(thanks!.text).not.toMatch(/Tam|Joss|Ines/)
    expect(thanks!.html).toMatch(/src="cid:/)
    expect(JSON.stringify(thanks!.parts)).toContain(key)
    expect((await db.select().from(photos).where(eq(photos.storageKey, key)))[0]!.public).toBe(true)
  })

  it('lets no photo out that the coordinator did not tick', async () => {
    const orderId = await crew.accepted()
    const key = await stage()
    await crew.record(orderId, { photoKeys: [key], stagedBy, noPhotoReason: null })
    await crew.check(orderId)
    await crew.close(orderId, [])
    expect((await db.select().from(photos).where(eq(photos.storageKey, key)))[0]!.public).toBe(false)
    expect((await crew.mailsOf('hazard-mended'))[0]!.html).not.toMatch(/cid:/)
  })

  it('tells the coordinator of each step, and asks the others for a check', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    const to = async (kind: string) => (await crew.mailsOf(kind)).map(mail => mail.toEmail)
    expect(await to('order-accepted')).toEqual(['ines@keld.example'])
    expect(await to('order-done')).toEqual(['ines@keld.example'])
    expect(await to('order-check-due')).toEqual(['joss@keld.example'])
  })
})

describe('A record of work', () => {
  it('sent twice is one record', async () => {
    const orderId = await crew.accepted()
    const both = await Promise.all([crew.record(orderId), crew.record(orderId)])
    expect(both).toEqual([{ ok: true }, { ok: true }])
    expect(await crew.record(orderId)).toEqual({ ok: true })
    expect(await db.select().from(workRecords)).toHaveLength(1)
    expect(await crew.mailsOf('order-done')).toHaveLength(1)
  })

  it('is made by whoever accepted the job, nobody else', async () => {
    expect(await crew.record(await crew.accepted(), { by: crew.joss })).toMatchObject({ ok: false })
    expect(await crew.states()).toEqual(['accepted', 'open'])
  })

  it('is not made before the job is accepted', async () => {
    const recorded = await crew.record(await crew.make())
    expect(recorded).toMatchObject({ ok: false, reason: expect.stringMatching(/draft now/) })
  })

  it('needs a photo that is really there, or a reason for none', async () => {
    const gone = { photoKeys: ['f'.repeat(32)], stagedBy, noPhotoReason: null }
    const recorded = await crew.record(await crew.accepted(), gone)
    expect(recorded).toMatchObject({ ok: false, reason: expect.stringMatching(/Add a photo/) })
    expect(await crew.states()).toEqual(['accepted', 'open'])
  })

  it('names as replaced only parts in place there, each once', async () => {
    const orderId = await crew.accepted()
    const elsewhere = await db.select().from(parts).where(eq(parts.kind, 'hanger')).limit(1)
    const ring = await crew.ringInPlace()
    const fitted = { ...glueIn, kind: 'ring', side: null } as const
    for (const replaced of [[elsewhere[0]!.id], [ring.id, ring.id], ['nothing-like-an-id']])
      expect(
        await crew.record(orderId, { fitted: replaced.map(replaces => ({ ...fitted, replaces })) }),
      ).toMatchObject({ ok: false, reason: expect.stringMatching(/not in place here/) })
    expect(await crew.states()).toEqual(['accepted', 'open'])
  })
})

describe('A check', () => {
  it('is not made by whoever did the work, nor by who did an earlier part of it', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    const mine = { ok: false, reason: expect.stringMatching(/did not do it/) }
    expect(await crew.check(orderId, { act: actBy(crew.tam) })).toMatchObject(mine)
    await crew.check(orderId, { outcome: 'returned', words: 'The ring is not closed.' })
    await handBack(db, { orderId, words: 'Away now.', who: 'Tam', act: actBy(crew.tam), appUrl })
    await acceptOffer(db, crew.answer(await crew.offer(orderId, crew.joss)))
    expect(await crew.record(orderId, { by: crew.joss, clientKey: 'record-by-joss-of-the-ring' })).toEqual({
      ok: true,
    })
    expect(await crew.check(orderId, { act: actBy(crew.tam) })).toMatchObject(mine)
    expect(await crew.check(orderId, { act: actBy(crew.ines) })).toEqual({ ok: true })
  })

  it('from photos alone does not do for a bonded bolt that was fitted', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId, { fitted: [glueIn] })
    const refused = { ok: false, reason: expect.stringMatching(/bonded bolt/) }
    expect(await crew.check(orderId, { how: 'from_photos' })).toMatchObject(refused)
    expect(await crew.states()).toEqual(['done', 'mended'])
    expect(await crew.check(orderId, { how: 'load_test' })).toEqual({ ok: true })
  })

  it('from photos alone does not do where the ring hangs on bonded bolts', async () => {
    await db
      .update(parts)
      .set({ kind: 'bonded_stud' })
      .where(and(eq(parts.anchorId, crew.anchorId), eq(parts.kind, 'hanger')))
    const orderId = await crew.accepted()
    await crew.record(orderId)
    expect(await crew.check(orderId, { how: 'from_photos' })).toMatchObject({ ok: false })
  })

  it('that finds fault sends the work back and opens the hazard again', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    const words = 'The ring is not closed.'
    expect(await crew.check(orderId, { outcome: 'returned', words })).toEqual({ ok: true })
    expect(await crew.states()).toEqual(['accepted', 'open'])
    const told = await crew.mailsOf('order-returned')
    expect(told.map(mail => mail.toEmail).sort()).toEqual(['ines@keld.example', 'tam@keld.example'])
    expect(told[0]!.text).toContain(words)
  })

  it('is made once, though two check at the same moment', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    const act = actBy(crew.ines)
    const both = await Promise.all([crew.check(orderId), crew.check(orderId, { act })])
    expect(both.map(one => one.ok).sort()).toEqual([false, true])
    expect(both.find(one => !one.ok)).toMatchObject({ reason: expect.stringMatching(/checked now/) })
  })
})

describe('Closing', () => {
  it('before the check is refused and changes nothing', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    expect(await crew.close(orderId)).toMatchObject({ ok: false })
    expect(await crew.states()).toEqual(['done', 'mended'])
    expect(await crew.ringInPlace()).toMatchObject({ material: 'steel' })
  })

  it('happens once, though two press it', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    await crew.check(orderId)
    const done = await Promise.all([crew.close(orderId), crew.close(orderId)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect(await crew.mailsOf('hazard-mended')).toHaveLength(1)
  })

  it('puts the check on record on the day it was at the crag', async () => {
    const [place] = await db
      .select({ areaId: crags.areaId })
      .from(anchors)
      .innerJoin(crags, eq(crags.id, anchors.cragId))
      .where(eq(anchors.id, crew.anchorId))
    await db.update(areas).set({ timeZone: 'Pacific/Kiritimati' }).where(eq(areas.id, place!.areaId))
    const orderId = await crew.accepted()
    await crew.record(orderId)
    await crew.check(orderId)
    await crew.close(orderId)
    const [check] = await db
      .select()
      .from(reports)
      .where(and(eq(reports.personId, crew.joss), eq(reports.receivedAt, now)))
    expect(check).toMatchObject({ isCheck: true, seenOn: '2027-05-03', howSeen: 'on_it' })
  })

  it('leaves no finding of the hazard uncleared', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    await crew.check(orderId)
    await crew.close(orderId)
    const left = await db
      .select({ id: findings.id })
      .from(findings)
      .innerJoin(reports, eq(reports.id, findings.reportId))
      .where(and(eq(reports.hazardId, crew.hazardId), isNull(findings.clearedAt)))
    expect(left).toEqual([])
  })
})
