import { eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { noticeRevisions, notices } from '~/db/schema/notices'
import { hazards } from '~/db/schema/reports'
import { forceCases } from '../../unit/notices/force-cases'
import { now } from '../demo'
import { noticeRoom } from './room'

const room = await noticeRoom(beforeAll)
const cases = forceCases.map(one => [one.title, one] as const)

beforeAll(async () => {
  await room.warn()
})

describe('In the database, as by the rule, a notice', () => {
  it.each(cases)('%s', async (_, { held, force }) => {
    const [notice] = await room.notices()
    const { state, startsAt, endsAt, whileOpen, hazardOpen } = held(now)
    await room.db.update(notices).set({ state }).where(eq(notices.id, notice!.id))
    await room.db
      .update(noticeRevisions)
      .set({ startsAt, endsAt, whileOpen })
      .where(eq(noticeRevisions.noticeId, notice!.id))
    await room.db
      .update(hazards)
      .set({ state: hazardOpen ? 'warned' : 'mended' })
      .where(eq(hazards.id, (await room.hazard()).id))
    expect(await room.inForce()).toHaveLength(force === 'in_force' ? 1 : 0)
  })
})
