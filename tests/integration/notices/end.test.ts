import { eq } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { anchors } from '~/db/schema/crags'
import { hazards } from '~/db/schema/reports'
import { expireNotices } from '~/notices/expire.server'
import { withdrawNotice } from '~/notices/withdraw.server'
import { actBy, findPoint, now } from '../demo'
import { inDays, noticeRoom } from './room'

const room = await noticeRoom()
const { db, hazard, inForce, warn, write, clear, officer } = room
const only = async () => (await room.notices())[0]!
const reopen = async () =>
  await db
    .update(hazards)
    .set({ state: 'open' })
    .where(eq(hazards.id, (await hazard()).id))
const expire = async (days: number) => await expireNotices(db, actBy(null, inDays(days)))
async function counted() {
  const { anchorId } = await findPoint(db, 'Slack Water', 'lower-off')
  return (await db.select({ n: anchors.notices }).from(anchors).where(eq(anchors.id, anchorId)))[0]!.n
}

describe('When a hazard is cleared', () => {
  it('its first warning ends by itself, and nobody is asked', async () => {
    await warn()
    await clear()
    expect(await only()).toMatchObject({ state: 'withdrawn', withdrawnAt: now })
    expect(await room.mailed('notice-still-true')).toEqual([])
  })

  it('another notice stays, and the access officer is asked whether it stands', async () => {
    await write()
    await clear()
    expect(await only()).toMatchObject({ state: 'published', askedAt: now })
    expect(await room.mailed('notice-still-true')).toEqual(['oona@forum.example'])
    expect(await inForce()).toHaveLength(1)
  })

  it('a second time, the access officer is asked a second time', async () => {
    await write()
    await clear()
    await reopen()
    await clear(inDays(60))
    expect(await room.mailed('notice-still-true')).toHaveLength(2)
  })

  it('nobody is asked about a notice that has come to its end already', async () => {
    await write({ endsAt: inDays(3) })
    await clear(inDays(4))
    expect(await room.mailed('notice-still-true')).toEqual([])
  })

  it('a first warning of the work that is not checked yet goes on', async () => {
    await warn()
    const { id } = await hazard()
    await db.update(hazards).set({ state: 'mended' }).where(eq(hazards.id, id))
    expect(await inForce(inDays(1))).toHaveLength(1)
    expect((await only()).state).toBe('published')
  })
})

describe('When a notice comes to its last day', () => {
  it('its hazard is open again and nothing counts it, once', async () => {
    await write({ endsAt: inDays(3) })
    expect(await expire(2)).toBe(0)
    expect([(await hazard()).state, await counted()]).toEqual(['warned', 1])
    expect(await expire(3)).toBe(1)
    expect([(await hazard()).state, await counted()]).toEqual(['open', 0])
    expect(await expire(3)).toBe(0)
  })

  it('its hazard stays warned of while another notice of it stands', async () => {
    await write({ kind: 'works', endsAt: inDays(3) })
    await warn()
    expect(await expire(4)).toBe(1)
    expect([(await hazard()).state, await counted()]).toEqual(['warned', 1])
    expect(await expire(4)).toBe(0)
  })

  it('a first warning of an open hazard does not end by the clock', async () => {
    await warn()
    expect(await expire(30)).toBe(0)
    expect((await hazard()).state).toBe('warned')
  })

  it('it stands in the way of no new warning', async () => {
    await write({ endsAt: inDays(3) })
    expect(await warn(inDays(2))).toMatchObject({ ok: false })
    expect(await warn(inDays(4))).toMatchObject({ ok: true })
  })

  it('it does not keep a hazard warned of when the last warning is withdrawn', async () => {
    await write({ endsAt: inDays(3) })
    await warn(inDays(4))
    const first = (await room.notices()).find(notice => notice.kind === 'first_warning')!
    await withdrawNotice(db, await officer(first.id, inDays(5)))
    expect((await hazard()).state).toBe('open')
  })
})
