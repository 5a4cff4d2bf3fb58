import { eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { memberships, people } from '~/db/schema/people'
import { offers } from '~/db/schema/work'
import { acceptOffer, declineOffer } from '~/work/answer.server'
import { expireOffers } from '~/work/expire.server'
import { cancelOrder } from '~/work/hand-back.server'
import { offerOrder } from '~/work/offer.server'
import { testDatabase } from '../database'
import { actBy, findPerson, now } from '../demo'
import { appUrl, type Crew, gatherCrew, later } from './crew'

const { db, empty, url } = await testDatabase()
let crew: Crew

beforeEach(async () => {
  await empty()
  crew = await gatherCrew(db, url)
})

const offerTo = async (personId: string) =>
  await offerOrder(db, { orderId: await crew.make(), personId, act: actBy(crew.ines), appUrl })

describe('An offer', () => {
  it('says in its mail what is wrong where, by when to answer, and the caution, but not who reported it', async () => {
    await crew.offer(await crew.make())
    const [mail] = await crew.mailsOf('order-offered')
    expect(mail).toMatchObject({ toEmail: 'tam@keld.example' })
    for (const words of ['groove 3.3 mm', 'Slack Water', '9 May 2027', '1 × Ring, titanium', 'in twos'])
      expect(mail!.text).toContain(words)
    expect(mail!.text).not.toMatch(/Pia/)
  })

  it('is accepted once: the second press reads that it was', async () => {
    const secret = await crew.offer(await crew.make())
    const done = await Promise.all([
      acceptOffer(db, crew.answer(secret)),
      acceptOffer(db, crew.answer(secret)),
    ])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect((done.find(one => !one.ok) as { reason: string }).reason).toMatch(/accepted this job already/)
    expect(await crew.mailsOf('order-sheet')).toHaveLength(1)
  })

  it('accepted and declined at once is one of the two, and the other reads which', async () => {
    const secret = await crew.offer(await crew.make())
    const done = await Promise.all([
      acceptOffer(db, crew.answer(secret)),
      declineOffer(db, { ...crew.answer(secret), words: null }),
    ])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect(done.find(one => !one.ok)).toMatchObject({ reason: expect.stringMatching(/^You have/) })
  })

  it('that has run out cannot be accepted', async () => {
    const secret = await crew.offer(await crew.make())
    const late = await acceptOffer(db, crew.answer(secret, later(8)))
    expect(late).toMatchObject({ ok: false, reason: expect.stringMatching(/has run out/) })
    expect(await crew.states()).toEqual(['offered', 'open'])
  })

  it('runs out by the clock, the order is a draft again and its coordinator hears of it once', async () => {
    await crew.offer(await crew.make())
    expect(await expireOffers(db, actBy(null, later(6)), appUrl)).toBe(0)
    expect(await expireOffers(db, actBy(null, later(8)), appUrl)).toBe(1)
    expect(await expireOffers(db, actBy(null, later(9)), appUrl)).toBe(0)
    expect(await crew.states()).toEqual(['draft', 'open'])
    expect((await crew.mailsOf('order-expired')).map(mail => mail.toEmail)).toEqual(['ines@keld.example'])
  })

  it('declined with a word leaves a draft that can be offered to another', async () => {
    const orderId = await crew.make()
    const secret = await crew.offer(orderId)
    expect(await declineOffer(db, { ...crew.answer(secret), words: 'Away that week.' })).toEqual({ ok: true })
    expect(await crew.states()).toEqual(['draft', 'open'])
    expect((await crew.mailsOf('order-declined'))[0]!.text).toContain('Away that week.')
    await crew.offer(orderId, crew.joss)
    expect(await crew.states()).toEqual(['offered', 'open'])
  })

  it('of a cancelled order is withdrawn, and says so kindly', async () => {
    const orderId = await crew.make()
    const secret = await crew.offer(orderId)
    expect(await cancelOrder(db, { orderId, act: actBy(crew.ines) })).toEqual({ ok: true })
    expect((await db.select().from(offers))[0]!.state).toBe('withdrawn')
    const answered = await acceptOffer(db, crew.answer(secret))
    expect(answered).toMatchObject({ ok: false, reason: expect.stringMatching(/no longer needed/) })
  })

  it('goes to nobody outside the organisation', async () => {
    const wyn = await findPerson(db, 'wyn@harrow.example')
    expect(await offerTo(wyn.id)).toMatchObject({ ok: false })
  })

  it('goes to nobody under 18', async () => {
    await db.update(people).set({ over18: false }).where(eq(people.id, crew.tam))
    expect(await offerTo(crew.tam)).toMatchObject({ ok: false, reason: expect.stringMatching(/18/) })
  })

  it('is neither made nor accepted once the owner disputes work', async () => {
    const orderId = await crew.make()
    const secret = await crew.offer(orderId)
    await crew.ownerSays('disputed')
    const disputed = { ok: false, reason: expect.stringMatching(/disputes/) }
    expect(await acceptOffer(db, crew.answer(secret))).toMatchObject(disputed)
    await declineOffer(db, { ...crew.answer(secret), words: null })
    const again = await offerOrder(db, { orderId, personId: crew.tam, act: actBy(crew.ines), appUrl })
    expect(again).toMatchObject(disputed)
  })

  it('is not accepted by somebody who has left the organisation', async () => {
    const secret = await crew.offer(await crew.make())
    await db.update(memberships).set({ endedAt: now }).where(eq(memberships.personId, crew.tam))
    expect(await acceptOffer(db, crew.answer(secret))).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/no longer among the rebolters/),
    })
    expect(await crew.states()).toEqual(['offered', 'open'])
  })

  it('does not open with a link that is not whole', async () => {
    await crew.offer(await crew.make())
    expect(await acceptOffer(db, crew.answer('half-a-link'))).toMatchObject({ ok: false })
  })
})
