import { eq, like } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { anchors, climbs, crags } from '~/db/schema/crags'
import { hazards } from '~/db/schema/reports'
import { findNotice, noticesInForce } from '~/notices/notices.server'
import { publishFirstWarning, publishNotice } from '~/notices/publish.server'
import { confirmWarning, withdrawNotice } from '~/notices/withdraw.server'
import { stranger } from '~/people/viewer'
import { findPoint, now } from '../demo'
import { inDays, noticeRoom } from './room'

const room = await noticeRoom()
const { db, by, hazard, inForce, warn, write, officer, written } = room
const only = async () => (await room.notices())[0]!

/** How many notices the point, its climb and its crag count. */
async function counted() {
  const { anchorId, climbId, cragId } = await findPoint(db, 'Slack Water', 'lower-off')
  const [anchor] = await db.select({ n: anchors.notices }).from(anchors).where(eq(anchors.id, anchorId))
  const [climb] = await db.select({ n: climbs.notices }).from(climbs).where(eq(climbs.id, climbId))
  const [crag] = await db.select({ n: crags.notices }).from(crags).where(eq(crags.id, cragId))
  return [anchor!.n, climb!.n, crag!.n]
}

describe('A first warning', () => {
  it('by a coordinator stands in public at once, in fixed words about both routes', async () => {
    expect(await warn()).toMatchObject({ ok: true })
    const [shown] = await inForce()
    expect(shown!.words).toContain('Do not rely on the lower-off of Slack Water and Ebb')
    expect((await hazard()).state).toBe('warned')
    expect(await counted()).toEqual([1, 1, 1])
  })

  it('asks every access officer of the crag, once', async () => {
    await warn()
    await warn()
    expect(await room.mailed('warning-review')).toEqual(['oona@forum.example'])
  })

  it('is published once: of two at the same moment the second reads why not', async () => {
    const given = await by('ines@keld.example')
    const done = await Promise.all([publishFirstWarning(db, given), publishFirstWarning(db, given)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect(done.find(one => !one.ok)).toMatchObject({ reason: expect.stringMatching(/stands already/) })
    expect(await room.notices()).toHaveLength(1)
  })

  it('outlives its seven days while its hazard is open', async () => {
    await warn()
    expect(await inForce(inDays(30))).toHaveLength(1)
  })

  it.each(['turn', 'watch'] as const)('is not published for what is “%s”, nor is a notice', async band => {
    await db
      .update(hazards)
      .set({ band })
      .where(eq(hazards.id, (await hazard()).id))
    const refused = { ok: false, reason: expect.stringMatching(/In turn or lower/) }
    expect(await warn()).toMatchObject(refused)
    expect(await write()).toMatchObject(refused)
    expect(await room.notices()).toEqual([])
  })

  it('is not published of what is mended and waits for its check', async () => {
    await db
      .update(hazards)
      .set({ state: 'mended' })
      .where(eq(hazards.id, (await hazard()).id))
    expect(await warn()).toMatchObject({ ok: false, reason: expect.stringMatching(/mended, check due/) })
  })

  it('is not published by somebody of another organisation', async () => {
    expect(await publishFirstWarning(db, await by('bram@harrow.example'))).toMatchObject({ ok: false })
    expect(await inForce()).toEqual([])
  })

  it('is published however long the names of its routes are', async () => {
    await db
      .update(climbs)
      .set({ name: 'Ω'.repeat(120) })
      .where(eq(climbs.name, 'Slack Water'))
    await db
      .update(climbs)
      .set({ name: 'Å'.repeat(120) })
      .where(like(climbs.name, 'Ebb%'))
    expect(await warn()).toMatchObject({ ok: true })
    expect((await inForce())[0]!.headline).toMatch(/^Do not rely on the lower-off of Ω+ and Å+…$/)
  })

  it('of a whole route is counted on its points, itself and its crag', async () => {
    await db
      .update(hazards)
      .set({ anchorId: null })
      .where(eq(hazards.id, (await hazard()).id))
    expect(await warn()).toMatchObject({ ok: true })
    expect((await inForce())[0]!.words).toContain('the fixed gear of Slack Water')
    expect((await counted()).slice(1)).toEqual([1, 1])
  })

  it('is confirmed by an access officer, once', async () => {
    await warn()
    const given = await officer((await only()).id)
    expect(await confirmWarning(db, given)).toEqual({ ok: true })
    expect(await confirmWarning(db, given)).toMatchObject({ ok: false })
    expect((await inForce())[0]!.confirmedAt).toEqual(now)
    expect(await room.linesOf(given.noticeId)).toEqual(['confirmed', 'published'])
  })

  it('withdrawn leaves its hazard open again, and counts nowhere', async () => {
    await warn()
    expect(await withdrawNotice(db, await officer((await only()).id))).toEqual({ ok: true })
    expect((await hazard()).state).toBe('open')
    expect(await inForce()).toEqual([])
    expect(await counted()).toEqual([0, 0, 0])
  })

  it('is withdrawn once: of two at the same moment the second reads why not', async () => {
    await warn()
    const given = await officer((await only()).id)
    const done = await Promise.all([withdrawNotice(db, given), withdrawNotice(db, given)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect((await room.linesOf(given.noticeId)).filter(verb => verb === 'withdrawn')).toHaveLength(1)
  })

  it('withdrawn can be read by its code, and not confirmed any more', async () => {
    await warn()
    const { id, code } = await only()
    await withdrawNotice(db, await officer(id))
    expect(await findNotice(db, stranger, code)).toMatchObject({ state: 'withdrawn', withdrawnAt: now })
    expect(await confirmWarning(db, await officer(id))).toMatchObject({ ok: false })
  })
})

describe('An access officer’s notice', () => {
  it('of the hazard takes the place of its first warning, which is on record as withdrawn', async () => {
    await warn()
    const first = await only()
    expect(await write()).toMatchObject({ ok: true })
    expect((await inForce()).map(one => one.headline)).toEqual(['Worn ring'])
    expect(await room.linesOf(first.id)).toEqual(['published', 'withdrawn'])
    expect((await hazard()).state).toBe('warned')
  })

  it('of works stands beside the first warning, which goes on', async () => {
    await warn()
    expect(await write({ kind: 'works', headline: 'Work on Sunday' })).toMatchObject({ ok: true })
    expect((await inForce()).map(one => one.kind)).toEqual(['first_warning', 'works'])
    await withdrawNotice(db, await officer((await only()).id))
    expect((await hazard()).state).toBe('warned')
  })

  it('is written once of a kind: a second press of the button publishes nothing', async () => {
    const given = { ...(await by('oona@forum.example')), notice: written }
    const done = await Promise.all([publishNotice(db, given), publishNotice(db, given)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    expect(await room.notices()).toHaveLength(1)
  })

  it('is not a coordinator’s to write', async () => {
    const given = { ...(await by('ines@keld.example')), notice: written }
    expect(await publishNotice(db, given)).toMatchObject({ ok: false })
    expect(await room.notices()).toEqual([])
  })
})

describe('The list of notices', () => {
  it('has the strongest first, also where only some fit', async () => {
    for (const kind of ['works', 'closed_in_law', 'please_do_not_climb'] as const) await write({ kind })
    await warn()
    const kinds = ['closed_in_law', 'please_do_not_climb', 'first_warning', 'works']
    expect((await inForce()).map(one => one.kind)).toEqual(kinds)
    const some = await noticesInForce(db, stranger, { now, limit: 2 })
    expect(some.map(one => one.kind)).toEqual(kinds.slice(0, 2))
  })

  it('tells strangers nothing of a crag that is withheld, and its organisations everything', async () => {
    await warn()
    const { code } = await only()
    await db
      .update(crags)
      .set({ sensitive: 'withheld' })
      .where(eq(crags.id, (await hazard()).cragId))
    expect(await inForce()).toEqual([])
    expect(await findNotice(db, stranger, code)).toBeNull()
    const { viewer } = await by('oona@forum.example')
    expect(await noticesInForce(db, viewer, { now })).toHaveLength(1)
  })

  it('never names who published', async () => {
    await warn()
    const { act } = await by('ines@keld.example')
    expect(JSON.stringify(await inForce())).not.toContain(act.by.personId)
  })
})
