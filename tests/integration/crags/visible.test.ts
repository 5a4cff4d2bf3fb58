import { eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { findAnchor } from '~/crags/anchors.server'
import { findClimb } from '~/crags/climbs.server'
import { findCrag, listCrags } from '~/crags/crags.server'
import { searchPlaces } from '~/crags/search.server'
import { crags } from '~/db/schema/crags'
import { noticesInForce } from '~/notices/notices.server'
import { publishFirstWarning } from '~/notices/publish.server'
import { stranger, type Viewer } from '~/people/viewer'
import { listDanger } from '~/reports/danger-list.server'
import { testDatabase } from '../database'
import { actBy, findPerson, findPoint, links, now, seedDemo, viewerOf } from '../demo'

const { db, empty, url } = await testDatabase()
const today = '2027-05-02'

beforeEach(async () => {
  await empty()
  await seedDemo(url)
  const bram = await findPerson(db, 'bram@harrow.example')
  const viewer = await viewerOf(db, 'bram@harrow.example')
  const [hazard] = await listDanger(db, viewer, today)
  await publishFirstWarning(db, {
    hazardCode: hazard!.code!,
    viewer,
    act: actBy(bram.id),
    appUrl: links.appUrl,
  })
})

const hide = (sensitive: 'withheld' | 'members') =>
  db.update(crags).set({ sensitive }).where(eq(crags.name, 'Raven Quarry'))

/** Everything a viewer finds of Raven Quarry, as one text. */
async function findAll(viewer: Viewer): Promise<string> {
  const point = await findPoint(db, 'Cold Front', 2)
  const [crag] = await db.select({ code: crags.code }).from(crags).where(eq(crags.name, 'Raven Quarry'))
  return JSON.stringify([
    await listCrags(db, viewer),
    await findCrag(db, viewer, crag!.code),
    await findClimb(db, viewer, point.climbCode, today),
    await findAnchor(db, viewer, point.code),
    await searchPlaces(db, viewer, { words: 'cold' }),
    await searchPlaces(db, viewer, { words: point.code }),
    await noticesInForce(db, viewer, { now }),
  ])
}

describe.each(['withheld', 'members'] as const)('A crag that is %s', sensitive => {
  it('is found by no stranger and no climber, under any name or code', async () => {
    await hide(sensitive)
    for (const viewer of [
      stranger,
      await viewerOf(db, 'pia@climbers.example'),
      await viewerOf(db, 'ines@keld.example'),
    ])
      expect(await findAll(viewer)).not.toMatch(/Raven|Cold Front|HF[2-9A-Z]{5}/)
  })

  it('is found by those who look after it', async () => {
    await hide(sensitive)
    for (const email of ['bram@harrow.example', 'wyn@harrow.example', 'oona@forum.example'])
      expect(await findAll(await viewerOf(db, email))).toMatch(/Raven Quarry/)
  })
})

describe('Search', () => {
  it('forgives accents and case, and takes its own wildcards literally', async () => {
    expect((await searchPlaces(db, stranger, { words: 'SLÁCK' })).map(one => one.name)).toEqual([
      'Slack Water',
    ])
    expect(await searchPlaces(db, stranger, { words: '%' })).toEqual([])
    expect(await searchPlaces(db, stranger, { words: '_' })).toEqual([])
  })
})
