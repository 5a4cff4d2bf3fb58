import { eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { activities } from '~/db/schema/record'
import { orders } from '~/db/schema/work'
import { acceptOffer } from '~/work/answer.server'
import { cancelOrder, handBack } from '~/work/hand-back.server'
import { makeOrder } from '~/work/make.server'
import { offerOrder } from '~/work/offer.server'
import { findOrder, listOrders, listOrdersOf } from '~/work/orders.server'
import { findSheetOrder } from '~/work/sheets.server'
import { testDatabase } from '../database'
import { actBy, now, viewerOf } from '../demo'
import { appUrl, type Crew, gatherCrew } from './crew'

const { db, empty, url } = await testDatabase()
let crew: Crew

beforeEach(async () => {
  await empty()
  crew = await gatherCrew(db, url)
})

describe('An order', () => {
  it('is not made while the owner disputes work', async () => {
    await crew.ownerSays('disputed')
    const made = await makeOrder(db, { ...crew.newOrder(), consentReason: 'It is urgent.' })
    expect(made).toMatchObject({ ok: false, reason: expect.stringMatching(/disputes/) })
  })

  it('needs a written reason while consent is not known', async () => {
    await crew.ownerSays('unknown')
    expect(await makeOrder(db, crew.newOrder())).toMatchObject({ ok: false })
    const reasoned = { ...crew.newOrder(), consentReason: 'The owner cannot be found.' }
    expect(await makeOrder(db, reasoned)).toMatchObject({ ok: true })
  })

  it('is made once for a hazard, though two coordinators press it', async () => {
    const made = await Promise.all([makeOrder(db, crew.newOrder()), makeOrder(db, crew.newOrder())])
    expect(made.map(one => one.ok).sort()).toEqual([false, true])
    expect(made.find(one => !one.ok)).toMatchObject({ reason: expect.stringMatching(/already and is draft/) })
  })

  it('is made anew for a hazard whose order was cancelled', async () => {
    await cancelOrder(db, { orderId: await crew.make(), act: actBy(crew.ines) })
    expect(await makeOrder(db, crew.newOrder())).toMatchObject({ ok: true })
    expect((await listOrdersOf(db, crew.hazardId)).map(order => order.state).sort()).toEqual([
      'cancelled',
      'draft',
    ])
  })

  it('is seen by its own organisation alone', async () => {
    await crew.make()
    const { code } = (await db.select().from(orders))[0]!
    const [tam, wyn] = [await viewerOf(db, 'tam@keld.example'), await viewerOf(db, 'wyn@harrow.example')]
    expect(await findOrder(db, tam, code)).toMatchObject({ code })
    expect(await listOrders(db, tam)).toHaveLength(1)
    expect(await findOrder(db, wyn, code)).toBeNull()
    expect(await listOrders(db, wyn)).toEqual([])
  })
})

describe('A job handed back', () => {
  const back = (orderId: string, by: string) =>
    handBack(db, { orderId, words: 'Hurt my wrist.', who: 'Tam', act: actBy(by), appUrl })

  it('is a draft again, with the word why on record, and only its worker can hand it back', async () => {
    const orderId = await crew.accepted()
    expect(await back(orderId, crew.joss)).toMatchObject({ ok: false })
    expect(await back(orderId, crew.tam)).toEqual({ ok: true })
    expect(await crew.states()).toEqual(['draft', 'open'])
    const [line] = await db.select().from(activities).where(eq(activities.verb, 'handed_back'))
    expect(line).toMatchObject({ details: { words: 'Hurt my wrist.' }, public: false })
    expect((await crew.mailsOf('order-handed-back')).map(mail => mail.toEmail)).toEqual(['ines@keld.example'])
  })

  it('closes its sheet for good, also when another accepts the job', async () => {
    const orderId = await crew.accepted()
    const sheet = await crew.secretIn('order-sheet', 'sheet')
    expect(await findSheetOrder(db, sheet, now)).toBe(orderId)
    await back(orderId, crew.tam)
    await acceptOffer(db, crew.answer(await crew.offer(orderId, crew.joss)))
    expect(await findSheetOrder(db, sheet, now)).toBeNull()
    expect(await findSheetOrder(db, await crew.secretIn('order-sheet', 'sheet'), now)).toBe(orderId)
  })
})

describe('A cancelled order', () => {
  it('is told to whoever had the job, and cannot be offered again', async () => {
    const orderId = await crew.accepted()
    expect(await cancelOrder(db, { orderId, act: actBy(crew.ines) })).toEqual({ ok: true })
    expect((await crew.mailsOf('order-cancelled')).map(mail => mail.toEmail)).toEqual(['tam@keld.example'])
    const offered = await offerOrder(db, { orderId, personId: crew.tam, act: actBy(crew.ines), appUrl })
    expect(offered).toMatchObject({ ok: false, reason: expect.stringMatching(/cancelled now/) })
  })

  it('cannot be one whose work is done', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    expect(await cancelOrder(db, { orderId, act: actBy(crew.ines) })).toMatchObject({ ok: false })
    expect(await crew.states()).toEqual(['done', 'mended'])
  })
})
