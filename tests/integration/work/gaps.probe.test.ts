import { and, eq, isNull } from 'drizzle-orm'
import { beforeEach, expect, it } from 'vitest'
import { anchors, crags } from '~/db/schema/crags'
import { messages } from '~/db/schema/mail'
import { memberships } from '~/db/schema/people'
import { parts } from '~/db/schema/parts'
import { hazards } from '~/db/schema/reports'
import { orders } from '~/db/schema/work'
import { takeIn } from '~/reports/decide.server'
import { acceptOffer, declineOffer, findSheetOrder } from '~/work/answer.server'
import { checkWork } from '~/work/check.server'
import { handBack } from '~/work/hand-back.server'
import { makeOrder } from '~/work/make.server'
import { offerOrder } from '~/work/offer.server'
import { recordWork } from '~/work/record.server'
import { testDatabase } from '../database'
import { actBy, findPerson, findPoint, links, now, reportRing, seedDemo, viewerOf } from '../demo'
const { db, empty, url } = await testDatabase()
const { appUrl } = links
let hazardId: string, anchorId: string, keld: string
let ids: any
beforeEach(async () => {
  await empty(); await seedDemo(url)
  anchorId = (await findPoint(db, 'Slack Water', 'lower-off')).anchorId
  ids = { ines: (await findPerson(db, 'ines@keld.example')).id, tam: (await findPerson(db, 'tam@keld.example')).id, joss: (await findPerson(db, 'joss@keld.example')).id }
  keld = (await viewerOf(db, 'ines@keld.example')).memberships[0]!.organisationId
  const { reportId } = await reportRing(db)
  await takeIn(db, { reportId, act: actBy(ids.ines), links, publicPhotoKeys: [] })
  hazardId = (await db.select().from(hazards).where(eq(hazards.anchorId, anchorId)))[0]!.id
})
const make = () => makeOrder(db, { hazardId, organisationId: keld, kind: 'replace_ring', what: 'Ring.', aimOn: null, consentReason: null, parts: [], act: actBy(ids.ines) })
const idOf = async () => (await db.select().from(orders))[0]!.id
const offer = (orderId: string) => offerOrder(db, { orderId, personId: ids.tam, act: actBy(ids.ines), appUrl })
const secretOf = async (k = 'order-offered', p = 'offers') => new RegExp(`${p}/([\\w-]+)`).exec((await db.select().from(messages).where(eq(messages.kind, k))).at(-1)!.text!)![1]!
const rec = async (orderId: string, over: any = {}) => recordWork(db, { orderId, clientKey: 'record-of-the-new-ring', doneOn: '2027-05-02', minutes: 1, words: 'x', noPhotoReason: 'y', photoKeys: [], stagedBy: null, fitted: [], who: 'Tam', act: actBy(ids.tam), appUrl, ...over })
it('F disputed offer', async () => { await make(); await db.update(crags).set({ consent: 'disputed' }); expect((await offer(await idOf())).ok).toBe(false) })
it('E second order', async () => { await make(); expect((await make()).ok).toBe(false) })
it('A decline loses', async () => {
  await make(); await offer(await idOf()); const secret = await secretOf(); const a = { secret, act: actBy(null), appUrl }
  const [x, y] = await Promise.all([acceptOffer(db, a), declineOffer(db, { ...a, words: null })])
  expect([x.ok, y.ok].filter(Boolean)).toHaveLength(1)
})
it('B member gone accepts', async () => { await make(); await offer(await idOf()); await db.update(memberships).set({ endedAt: now }).where(eq(memberships.personId, ids.tam)); expect((await acceptOffer(db, { secret: await secretOf(), act: actBy(null), appUrl })).ok).toBe(false) })
it('H sheet after hand back', async () => {
  await make(); const id = await idOf(); await offer(id); await acceptOffer(db, { secret: await secretOf(), act: actBy(null), appUrl })
  const sheet = await secretOf('order-sheet', 'sheet'); await handBack(db, { orderId: id, words: 'w', who: 'T', act: actBy(ids.tam), appUrl })
  expect(await findSheetOrder(db, sheet)).toBe(null)
})
async function accepted() { await make(); const id = await idOf(); await offer(id); await acceptOffer(db, { secret: await secretOf(), act: actBy(null), appUrl }); return id }
const fit = (replaces: any) => [{ replaces, side: null, kind: 'ring', material: 'titanium', sizeMm: 12, marking: null }]
it('S foreign part', async () => { const id = await accepted(); expect((await rec(id, { fitted: fit('nonsense') })).ok).toBe(false) })
it('C member gone records', async () => { const id = await accepted(); await db.update(memberships).set({ endedAt: now }).where(eq(memberships.personId, ids.tam)); expect((await rec(id)).ok).toBe(false) })
it('K photos at bonded', async () => {
  const id = await accepted(); const [ring] = await db.select().from(parts).where(and(eq(parts.anchorId, anchorId), eq(parts.kind, 'ring'), isNull(parts.removedOn)))
  console.log((await db.select().from(parts).where(eq(parts.anchorId, anchorId))).map(p => [p.kind, p.side, p.removedOn]))
  await rec(id, { fitted: fit(ring!.id) })
  const r = await checkWork(db, { orderId: id, whoKind: 'independent', how: 'from_photos', outcome: 'good', words: null, who: 'J', act: actBy(ids.joss), appUrl })
  expect(r.ok).toBe(false)
})
it('G mail', async () => { await make(); await offer(await idOf()); const t = (await db.select().from(messages).where(eq(messages.kind, 'order-offered')))[0]!.text!; console.log(t); expect(t).toMatch(/groove/); expect(t).toMatch(/9 May 2027/) })
