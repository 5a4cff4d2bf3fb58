import { and, eq, isNull } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { anchors } from '~/db/schema/crags'
import { membershipRoles, memberships } from '~/db/schema/people'
import { findings } from '~/db/schema/reports'
import { putOnRecord } from '~/reports/decide.server'
import { testDatabase } from '../database'
import { actBy, groove, links, now, reportRing } from '../demo'
import { type Crew, gatherCrew } from './crew'

const { db, empty, url } = await testDatabase()
let crew: Crew

beforeEach(async () => {
  await empty()
  crew = await gatherCrew(db, url)
})

const leave = (personId: string) =>
  db.update(memberships).set({ endedAt: now }).where(eq(memberships.personId, personId))

async function loseRoles(personId: string): Promise<void> {
  const [held] = await db.select().from(memberships).where(eq(memberships.personId, personId))
  await db.delete(membershipRoles).where(eq(membershipRoles.membershipId, held!.id))
}

describe('Between page and button', () => {
  it.each([
    ['whoever left the organisation', leave],
    ['whoever is a member still, but no rebolter', loseRoles],
  ])('%s records no work and loses nothing of the job', async (_who, take) => {
    const orderId = await crew.accepted()
    await take(crew.tam)
    const recorded = await crew.record(orderId)
    expect(recorded).toMatchObject({ ok: false, reason: expect.stringMatching(/no longer work for/) })
    expect(await crew.states()).toEqual(['accepted', 'open'])
  })

  it('whoever left the organisation checks no work', async () => {
    const orderId = await crew.accepted()
    await crew.record(orderId)
    await leave(crew.joss)
    expect(await crew.check(orderId)).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/Another checks/),
    })
    expect(await crew.states()).toEqual(['done', 'mended'])
  })
})

describe('What was on record about a part without a hazard', () => {
  /** Closes the job on the ring with a report of light wear on record beforehand, on that ring or on no part named. */
  async function closeAfterWearOn(partId: string | null) {
    const worn = { ...groove, partId, low: 1, high: 1 }
    const { reportId } = await reportRing(db, { findings: [worn] })
    await putOnRecord(db, { reportId, act: actBy(crew.ines), links })
    const orderId = await crew.accepted()
    await crew.record(orderId)
    await crew.check(orderId)
    expect(await crew.close(orderId)).toEqual({ ok: true })
    const standing = await db
      .select({ id: findings.id })
      .from(findings)
      .where(and(eq(findings.reportId, reportId), isNull(findings.clearedAt)))
    const [anchor] = await db.select().from(anchors).where(eq(anchors.id, crew.anchorId))
    return { standing: standing.length, state: anchor!.state }
  }

  it('goes when the part is taken out', async () => {
    const ring = await crew.ringInPlace()
    expect(await closeAfterWearOn(ring.id)).toEqual({ standing: 0, state: 'good' })
  })

  it('stays when it names no part: nobody can tell that it is mended', async () => {
    expect((await closeAfterWearOn(null)).standing).toBe(1)
  })
})
