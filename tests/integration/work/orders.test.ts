import { and, eq, isNull } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { anchors, crags } from '~/db/schema/crags'
import { messages } from '~/db/schema/mail'
import { notices } from '~/db/schema/notices'
import { parts } from '~/db/schema/parts'
import { findings, hazards } from '~/db/schema/reports'
import { offers, orders, workRecords } from '~/db/schema/work'
import { publishFirstWarning } from '~/notices/publish.server'
import { takeIn } from '~/reports/decide.server'
import { acceptOffer, declineOffer } from '~/work/answer.server'
import { checkWork } from '~/work/check.server'
import { closeOrder } from '~/work/close.server'
import { expireOffers } from '~/work/expire.server'
import { cancelOrder, handBack } from '~/work/hand-back.server'
import { makeOrder } from '~/work/make.server'
import { offerOrder } from '~/work/offer.server'
import { type FittedPart, recordWork } from '~/work/record.server'
import { testDatabase } from '../database'
import { actBy, findPerson, findPoint, links, now, reportRing, seedDemo, viewerOf } from '../demo'

const { db, empty, url } = await testDatabase()
const { appUrl } = links
const day = 86_400_000
let hazardId: string
let anchorId: string
let ids: Record<'ines' | 'tam' | 'joss', string>
let keld: string

beforeEach(async () => {
  await empty()
  await seedDemo(url)
  const point = await findPoint(db, 'Slack Water', 'lower-off')
  anchorId = point.anchorId
  ids = {
    ines: (await findPerson(db, 'ines@keld.example')).id,
    tam: (await findPerson(db, 'tam@keld.example')).id,
    joss: (await findPerson(db, 'joss@keld.example')).id,
  }
  keld = (await viewerOf(db, 'ines@keld.example')).memberships[0]!.organisationId
  const { reportId } = await reportRing(db)
  await takeIn(db, { reportId, act: actBy(ids.ines), links, publicPhotoKeys: [] })
  hazardId = (await db.select().from(hazards).where(eq(hazards.anchorId, anchorId)))[0]!.id
})

const stateOfOrder = async () => (await db.select().from(orders))[0]!.state
const stateOfHazard = async () => (await db.select().from(hazards).where(eq(hazards.id, hazardId)))[0]!.state
const mailsOf = async (kind: string) => await db.select().from(messages).where(eq(messages.kind, kind))

const newOrder = () => ({
  hazardId,
  organisationId: keld,
  kind: 'replace_ring' as const,
  what: 'Replace the ring by a titanium one.',
  aimOn: null,
  consentReason: null,
  parts: [{ kind: 'ring' as const, material: 'titanium' as const, sizeMm: 12, quantity: 1 }],
  act: actBy(ids.ines),
})

async function make(): Promise<string> {
  expect(await makeOrder(db, newOrder())).toMatchObject({ ok: true })
  return (await db.select().from(orders))[0]!.id
}

/** Offers to somebody and gives the secret of the mail's link. */
async function offer(orderId: string, personId = ids.tam): Promise<string> {
  expect(await offerOrder(db, { orderId, personId, act: actBy(ids.ines), appUrl })).toEqual({ ok: true })
  const mails = await mailsOf('order-offered')
  return /offers\/([\w-]+)/.exec(mails.at(-1)!.text!)![1]!
}

const answer = (secret: string, at = now) => ({ secret, act: actBy(null, at), appUrl })

async function accepted(): Promise<string> {
  const orderId = await make()
  expect(await acceptOffer(db, answer(await offer(orderId)))).toMatchObject({ ok: true })
  return orderId
}

const wornRing = async () =>
  (
    await db
      .select()
      .from(parts)
      .where(and(eq(parts.anchorId, anchorId), eq(parts.kind, 'ring'), isNull(parts.removedOn)))
  )[0]!

async function record(
  orderId: string,
  given: { clientKey?: string; fitted?: FittedPart[]; by?: string } = {},
) {
  const ring = await wornRing()
  return await recordWork(db, {
    orderId,
    clientKey: given.clientKey ?? 'record-of-the-new-ring',
    doneOn: '2027-05-02',
    minutes: 40,
    words: 'Old ring cut off.',
    noPhotoReason: 'camera fell',
    photoKeys: [],
    stagedBy: null,
    fitted: given.fitted ?? [
      { replaces: ring.id, side: null, kind: 'ring', material: 'titanium', sizeMm: 12, marking: null },
    ],
    who: 'Tam',
    act: actBy(given.by ?? ids.tam),
    appUrl,
  })
}

const check = (orderId: string, given: Partial<Parameters<typeof checkWork>[1]> = {}) =>
  checkWork(db, {
    orderId,
    whoKind: 'independent',
    how: 'on_the_rope',
    outcome: 'good',
    words: null,
    who: 'Joss',
    act: actBy(ids.joss),
    appUrl,
    ...given,
  })

const close = (orderId: string) =>
  closeOrder(db, { orderId, act: actBy(ids.ines), links, publicPhotoKeys: [] })

describe('A job from offer to closing', () => {
  it('clears the hazard, renews the part, ends the first warning and thanks the reporter', async () => {
    const viewer = await viewerOf(db, 'ines@keld.example')
    const [{ code }] = (await db
      .select({ code: hazards.code })
      .from(hazards)
      .where(eq(hazards.id, hazardId))) as [{ code: string }]
    await publishFirstWarning(db, { hazardCode: code, viewer, act: actBy(ids.ines), appUrl })
    const worn = await wornRing()
    const orderId = await accepted()
    expect(await record(orderId)).toEqual({ ok: true })
    expect([await stateOfOrder(), await stateOfHazard()]).toEqual(['done', 'mended'])
    expect(await check(orderId)).toEqual({ ok: true })
    expect(await close(orderId)).toEqual({ ok: true })
    expect([await stateOfOrder(), await stateOfHazard()]).toEqual(['closed', 'cleared'])
    const [old] = await db.select().from(parts).where(eq(parts.id, worn.id))
    expect(old!.removedOn).toBe('2027-05-02')
    expect(await wornRing()).toMatchObject({ material: 'titanium', sizeMm: 12, fittedOn: '2027-05-02' })
    const [anchor] = await db.select().from(anchors).where(eq(anchors.id, anchorId))
    expect(anchor).toMatchObject({ state: 'good', openHazards: 0, notices: 0, stateOn: '2027-05-02' })
    expect((await db.select().from(notices))[0]!.state).toBe('withdrawn')
    const [thanks] = await mailsOf('hazard-mended')
    expect(thanks).toMatchObject({ toEmail: 'pia@climbers.example' })
    expect(thanks!.text).not.toMatch(/Tam|Joss|Ines/)
    const open = await db
      .select()
      .from(findings)
      .where(and(eq(findings.kind, 'groove'), isNull(findings.clearedAt)))
    expect(open.filter(finding => finding.low === 3.3)).toEqual([])
  })

  it('tells the coordinator of each step, and asks the others for a check', async () => {
    const orderId = await accepted()
    await record(orderId)
    expect((await mailsOf('order-accepted')).map(mail => mail.toEmail)).toEqual(['ines@keld.example'])
    expect((await mailsOf('order-done')).map(mail => mail.toEmail)).toEqual(['ines@keld.example'])
    expect((await mailsOf('order-check-due')).map(mail => mail.toEmail)).toEqual(['joss@keld.example'])
  })
})

describe('An offer', () => {
  it('is accepted once: the second press reads that it was', async () => {
    const secret = await offer(await make())
    const done = await Promise.all([acceptOffer(db, answer(secret)), acceptOffer(db, answer(secret))])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect((done.find(one => !one.ok) as { reason: string }).reason).toMatch(/accepted this job already/)
  })

  it('that has run out cannot be accepted', async () => {
    const secret = await offer(await make())
    const late = await acceptOffer(db, answer(secret, new Date(now.getTime() + 8 * day)))
    expect(late).toMatchObject({ ok: false, reason: expect.stringMatching(/has run out/) })
    expect(await stateOfOrder()).toBe('offered')
  })

  it('runs out by the clock, the order is a draft again and its coordinator hears of it', async () => {
    await offer(await make())
    expect(await expireOffers(db, actBy(null, new Date(now.getTime() + 6 * day)), appUrl)).toBe(0)
    expect(await expireOffers(db, actBy(null, new Date(now.getTime() + 8 * day)), appUrl)).toBe(1)
    expect(await stateOfOrder()).toBe('draft')
    expect((await mailsOf('order-expired')).map(mail => mail.toEmail)).toEqual(['ines@keld.example'])
  })

  it('declined with a word leaves a draft that can be offered to another', async () => {
    const orderId = await make()
    const secret = await offer(orderId)
    expect(await declineOffer(db, { ...answer(secret), words: 'Away that week.' })).toEqual({ ok: true })
    expect(await stateOfOrder()).toBe('draft')
    await offer(orderId, ids.joss)
    expect(await stateOfOrder()).toBe('offered')
  })

  it('of a cancelled order is withdrawn, and says so kindly', async () => {
    const orderId = await make()
    const secret = await offer(orderId)
    expect(await cancelOrder(db, { orderId, act: actBy(ids.ines) })).toEqual({ ok: true })
    expect((await db.select().from(offers))[0]!.state).toBe('withdrawn')
    expect(await acceptOffer(db, answer(secret))).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/no longer needed/),
    })
  })

  it('goes to nobody outside the organisation', async () => {
    const wyn = await findPerson(db, 'wyn@harrow.example')
    expect(
      await offerOrder(db, { orderId: await make(), personId: wyn.id, act: actBy(ids.ines), appUrl }),
    ).toMatchObject({ ok: false })
  })

  it('does not open with a link that is not whole', async () => {
    await offer(await make())
    expect(await acceptOffer(db, answer('half-a-link'))).toMatchObject({ ok: false })
  })
})

describe('An order', () => {
  it('is not made while the owner disputes work', async () => {
    await db.update(crags).set({ consent: 'disputed' }).where(eq(crags.name, 'Gannet Wall'))
    expect(await makeOrder(db, newOrder())).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/disputes/),
    })
  })

  it('needs a written reason while consent is not known', async () => {
    await db.update(crags).set({ consent: 'unknown' }).where(eq(crags.name, 'Gannet Wall'))
    expect(await makeOrder(db, newOrder())).toMatchObject({ ok: false })
    expect(await makeOrder(db, { ...newOrder(), consentReason: 'The owner cannot be found.' })).toMatchObject(
      { ok: true },
    )
  })

  it('handed back is a draft again, and only its worker can hand it back', async () => {
    const orderId = await accepted()
    const back = (by: string) =>
      handBack(db, { orderId, words: 'Hurt my wrist.', who: 'Tam', act: actBy(by), appUrl })
    expect(await back(ids.joss)).toMatchObject({ ok: false })
    expect(await back(ids.tam)).toEqual({ ok: true })
    expect(await stateOfOrder()).toBe('draft')
  })
})

describe('A record of work', () => {
  it('sent twice is one record', async () => {
    const orderId = await accepted()
    expect(await Promise.all([record(orderId), record(orderId)])).toEqual([{ ok: true }, { ok: true }])
    expect(await db.select().from(workRecords)).toHaveLength(1)
  })

  it('is made by whoever accepted the job, nobody else', async () => {
    expect(await record(await accepted(), { by: ids.joss })).toMatchObject({ ok: false })
    expect(await stateOfHazard()).toBe('open')
  })

  it('is not made before the job is accepted', async () => {
    const orderId = await make()
    expect(await record(orderId)).toMatchObject({ ok: false, reason: expect.stringMatching(/draft now/) })
  })
})

describe('A check', () => {
  it('is not made by whoever did the work', async () => {
    const orderId = await accepted()
    await record(orderId)
    expect(await check(orderId, { act: actBy(ids.tam) })).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/did not do it/),
    })
  })

  it('from photos alone does not do for a bonded bolt', async () => {
    const orderId = await accepted()
    await record(orderId, {
      fitted: [
        { replaces: null, side: 'a', kind: 'bonded_eye', material: 'titanium', sizeMm: 10, marking: null },
      ],
    })
    expect(await check(orderId, { how: 'from_photos' })).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/bonded bolt/),
    })
    expect(await stateOfOrder()).toBe('done')
  })

  it('that finds fault sends the work back and opens the hazard again', async () => {
    const orderId = await accepted()
    await record(orderId)
    expect(await check(orderId, { outcome: 'returned', words: 'The ring is not closed.' })).toEqual({
      ok: true,
    })
    expect([await stateOfOrder(), await stateOfHazard()]).toEqual(['accepted', 'open'])
    expect((await mailsOf('order-returned')).map(mail => mail.toEmail).sort()).toEqual([
      'ines@keld.example',
      'tam@keld.example',
    ])
  })
})

describe('Closing', () => {
  it('before the check is refused and changes nothing', async () => {
    const orderId = await accepted()
    await record(orderId)
    expect(await close(orderId)).toMatchObject({ ok: false })
    expect([await stateOfOrder(), await stateOfHazard()]).toEqual(['done', 'mended'])
    expect(await wornRing()).toMatchObject({ material: 'steel' })
  })

  it('happens once, though two press it', async () => {
    const orderId = await accepted()
    await record(orderId)
    await check(orderId)
    const done = await Promise.all([close(orderId), close(orderId)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect(await mailsOf('hazard-mended')).toHaveLength(1)
  })
})
