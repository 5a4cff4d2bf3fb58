import { and, eq, isNull } from 'drizzle-orm'
import { expect } from 'vitest'
import type { Database } from '~/db/client.server'
import { crags } from '~/db/schema/crags'
import { messages } from '~/db/schema/mail'
import { parts } from '~/db/schema/parts'
import { hazards } from '~/db/schema/reports'
import { orders } from '~/db/schema/work'
import { takeIn } from '~/reports/decide.server'
import { acceptOffer } from '~/work/answer.server'
import { checkWork } from '~/work/check.server'
import { closeOrder } from '~/work/close.server'
import { makeOrder } from '~/work/make.server'
import { offerOrder } from '~/work/offer.server'
import { type NewRecord, recordWork } from '~/work/record.server'
import { actBy, findPerson, findPoint, links, now, reportRing, seedDemo, viewerOf } from '../demo'

export const { appUrl } = links
export const day = 86_400_000
export const later = (days: number) => new Date(now.getTime() + days * day)

/**
 * The demo with a worn ring at the lower-off of Slack Water taken in, and what the Keld Rebolters do about it: Ines
 * coordinates, Tam mends, Joss checks. Each step stands on the one before.
 */
export async function gatherCrew(db: Database, url: string) {
  await seedDemo(url)
  const { anchorId } = await findPoint(db, 'Slack Water', 'lower-off')
  const idOf = async (name: string) => (await findPerson(db, `${name}@keld.example`)).id
  const [ines, tam, joss] = [await idOf('ines'), await idOf('tam'), await idOf('joss')]
  const keld = (await viewerOf(db, 'ines@keld.example')).memberships[0]!.organisationId
  const { reportId } = await reportRing(db)
  await takeIn(db, { reportId, act: actBy(ines), links, publicPhotoKeys: [] })
  const hazardId = (await db.select().from(hazards).where(eq(hazards.anchorId, anchorId)))[0]!.id

  const newOrder = () => ({
    hazardId,
    organisationId: keld,
    kind: 'replace_ring' as const,
    what: 'Replace the ring by a titanium one.',
    aimOn: null,
    consentReason: null,
    parts: [{ kind: 'ring' as const, material: 'titanium' as const, sizeMm: 12, quantity: 1 }],
    act: actBy(ines),
  })
  const mailsOf = async (kind: string) => await db.select().from(messages).where(eq(messages.kind, kind))
  const read = new Set<string>()
  /** The secret of a mail's link that has not been read yet. */
  async function secretIn(kind: string, path: string): Promise<string> {
    const mail = (await mailsOf(kind)).find(one => !read.has(one.id))!
    read.add(mail.id)
    return new RegExp(`/${path}/([\\w-]+)`).exec(mail.text!)![1]!
  }
  const ringInPlace = async () =>
    (
      await db
        .select()
        .from(parts)
        .where(and(eq(parts.anchorId, anchorId), eq(parts.kind, 'ring'), isNull(parts.removedOn)))
    )[0]!

  async function make(): Promise<string> {
    expect(await makeOrder(db, newOrder())).toMatchObject({ ok: true })
    return (await db.select().from(orders))[0]!.id
  }
  /** Offers to somebody and gives the secret of the mail's link. */
  async function offer(orderId: string, personId = tam): Promise<string> {
    expect(await offerOrder(db, { orderId, personId, act: actBy(ines), appUrl })).toEqual({ ok: true })
    return await secretIn('order-offered', 'offers')
  }
  const answer = (secret: string, at = now) => ({ secret, act: actBy(null, at), appUrl })
  async function accepted(): Promise<string> {
    const orderId = await make()
    expect(await acceptOffer(db, answer(await offer(orderId)))).toMatchObject({ ok: true })
    return orderId
  }
  /** Records a new titanium ring in the place of the worn one, or what is given. */
  async function record(orderId: string, { by = tam, ...given }: Partial<NewRecord> & { by?: string } = {}) {
    const ring = await ringInPlace()
    return await recordWork(db, {
      orderId,
      clientKey: 'record-of-the-new-ring',
      doneOn: '2027-05-02',
      minutes: 40,
      words: 'Old ring cut off.',
      noPhotoReason: 'camera fell',
      photoKeys: [],
      stagedBy: null,
      fitted: [
        { replaces: ring.id, side: null, kind: 'ring', material: 'titanium', sizeMm: 12, marking: null },
      ],
      who: 'Tam',
      ...given,
      act: actBy(by),
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
      act: actBy(joss),
      appUrl,
      ...given,
    })
  const close = (orderId: string, publicPhotoKeys: string[] = []) =>
    closeOrder(db, { orderId, act: actBy(ines), links, publicPhotoKeys })
  const states = async () => [
    (await db.select().from(orders))[0]!.state,
    (await db.select().from(hazards).where(eq(hazards.id, hazardId)))[0]!.state,
  ]
  const ownerSays = (consent: 'disputed' | 'unknown') =>
    db.update(crags).set({ consent }).where(eq(crags.name, 'Gannet Wall'))

  return {
    ...{ anchorId, hazardId, keld, ines, tam, joss },
    ...{ newOrder, mailsOf, secretIn, ringInPlace, states, ownerSays },
    ...{ make, offer, answer, accepted, record, check, close },
  }
}

export type Crew = Awaited<ReturnType<typeof gatherCrew>>
