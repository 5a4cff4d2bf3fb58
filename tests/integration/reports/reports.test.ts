import { eq } from 'drizzle-orm'
import { beforeEach, describe, expect, it } from 'vitest'
import { anchors, climbs, crags } from '~/db/schema/crags'
import { messages } from '~/db/schema/mail'
import { ratings } from '~/db/schema/rating'
import { activities } from '~/db/schema/record'
import { findings, hazards, reports } from '~/db/schema/reports'
import { inTransaction } from '~/db/transaction.server'
import { stranger } from '~/people/viewer'
import { listDanger } from '~/reports/danger-list.server'
import { askDetail, declineReport, putOnRecord, takeIn } from '~/reports/decide.server'
import { refreshAnchors } from '~/reports/refresh.server'
import { answerDetail, withdrawReport } from '~/reports/reply.server'
import { confirmGuest } from '~/reports/send.server'
import { testDatabase } from '../database'
import { actBy, findPerson, findPoint, groove, links, now, reportRing, seedDemo, viewerOf } from '../demo'

const { db, empty, url } = await testDatabase()

beforeEach(async () => {
  await empty()
  await seedDemo(url)
})

const coordinator = async () => actBy((await findPerson(db, 'ines@keld.example')).id)
const decide = async (reportId: string) => ({ reportId, act: await coordinator(), links })
const take = async (reportId: string) => takeIn(db, { ...(await decide(reportId)), publicPhotoKeys: [] })
const stateOf = async (anchorId: string) =>
  (
    await db
      .select({ state: anchors.state, open: anchors.openHazards })
      .from(anchors)
      .where(eq(anchors.id, anchorId))
  )[0]

describe('A report that is sent', () => {
  it('is judged at once, and a sharp worn ring comes out as Mend first', async () => {
    const { reportId } = await reportRing(db)
    const [row] = await db.select().from(reports).where(eq(reports.id, reportId))
    expect(row).toMatchObject({ state: 'received', band: 'first' })
    const [rating] = await db.select().from(ratings).where(eq(ratings.reportId, reportId))
    expect(rating).toMatchObject({ band: 'first', cause: 'received' })
  })

  it('changes nothing in public before somebody has looked', async () => {
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    await reportRing(db)
    expect(await stateOf(point.anchorId)).toEqual({ state: 'good', open: 0 })
  })

  it('is one report when it is sent twice', async () => {
    const first = await reportRing(db, { clientKey: 'the-same-form-sent-twice' })
    const [again, once] = await Promise.all(
      [1, 2].map(() => reportRing(db, { clientKey: 'the-same-form-sent-twice' })),
    )
    expect([again, once]).toEqual([first, first])
  })

  it('mails the reporter, and the coordinator on duty because it is Mend first', async () => {
    await reportRing(db)
    const waiting = await db.select().from(messages).where(eq(messages.state, 'waiting'))
    expect(waiting.map(mail => [mail.kind, mail.toEmail]).sort()).toEqual([
      ['report-duty', 'ines@keld.example'],
      ['report-received', 'pia@climbers.example'],
    ])
  })

  it('writes lines of record without anybody’s name or address', async () => {
    await reportRing(db, { guestEmail: 'somebody@climbers.example' })
    const lines = JSON.stringify(await db.select().from(activities))
    expect(lines).not.toMatch(/@|Pia|Ines/)
  })
})

describe('A guest', () => {
  it('is asked to confirm the address, and the link confirms it once and for all', async () => {
    const { reportId } = await reportRing(db, { guestEmail: 'guest@climbers.example' })
    const [mail] = await db.select().from(messages).where(eq(messages.toEmail, 'guest@climbers.example'))
    const secret = /status\/confirm\/([\w-]+)/.exec(mail!.text!)![1]!
    expect(await confirmGuest(db, actBy(null), secret)).toEqual({ reportId })
    expect(await confirmGuest(db, actBy(null), secret)).toEqual({ reportId })
    const [row] = await db.select().from(reports).where(eq(reports.id, reportId))
    expect(row!.confirmedAt).not.toBeNull()
  })

  it('gets nowhere with a link that is not whole', async () => {
    expect(await confirmGuest(db, actBy(null), 'not-a-link-of-ours')).toBeNull()
  })
})

describe('Taking a report in', () => {
  it('opens a hazard, rates it, and the point, its routes and its crag show the condition', async () => {
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    const done = await take((await reportRing(db)).reportId)
    expect(done).toMatchObject({ ok: true, joined: false })
    const [hazard] = await db.select().from(hazards).where(eq(hazards.anchorId, point.anchorId))
    expect(hazard).toMatchObject({ state: 'open', mode: 'cuts_rope', band: 'first' })
    expect(hazard!.headline).toBe('Lower-off ring: groove 3.3 mm, sharp edge')
    expect(await stateOf(point.anchorId)).toEqual({ state: 'severe', open: 1 })
    const shown = await db.select({ name: climbs.name, state: climbs.worstState }).from(climbs)
    expect(shown.find(climb => climb.name === 'Slack Water')!.state).toBe('severe')
    expect(shown.find(climb => climb.name === 'Ebb')!.state).toBe('severe')
    const [crag] = await db.select().from(crags).where(eq(crags.id, point.cragId))
    expect(crag!.worstState).toBe('severe')
  })

  it('joins the open hazard of the same problem, which is rated from both', async () => {
    await take((await reportRing(db)).reportId)
    const second = await take((await reportRing(db)).reportId)
    expect(second).toMatchObject({ ok: true, joined: true })
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    expect(await db.select().from(hazards).where(eq(hazards.anchorId, point.anchorId))).toHaveLength(1)
  })

  it('of two reports at the same moment ends in one hazard', async () => {
    const both = [await reportRing(db), await reportRing(db)]
    const done = await Promise.all(both.map(({ reportId }) => take(reportId)))
    expect(done.every(one => one.ok)).toBe(true)
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    expect(await db.select().from(hazards).where(eq(hazards.anchorId, point.anchorId))).toHaveLength(1)
  })

  it('happens once: the second of two coordinators reads what it has become', async () => {
    const { reportId } = await reportRing(db)
    const done = await Promise.all([take(reportId), take(reportId)])
    expect(done.map(one => one.ok).sort()).toEqual([false, true])
    const refused = done.find(one => !one.ok) as { reason: string }
    expect(refused.reason).toMatch(/taken in already/)
  })

  it('shows in the list, above what is less dangerous', async () => {
    await take((await reportRing(db)).reportId)
    const rows = await listDanger(db, await viewerOf(db, 'ines@keld.example'), '2027-05-02')
    expect(rows[0]).toMatchObject({
      kind: 'hazard',
      what: 'Lower-off ring: groove 3.3 mm, sharp edge',
      band: 'first',
    })
    const order = rows.map(row => ['first', 'soon', 'turn', 'watch'].indexOf(row.band!))
    expect(order).toEqual([...order].sort((a, b) => a - b))
  })
})

describe('The list of dangers', () => {
  it('holds nothing of another organisation’s crags', async () => {
    const rows = await listDanger(db, await viewerOf(db, 'bram@harrow.example'), '2027-05-02')
    expect(new Set(rows.map(row => row.cragName))).toEqual(new Set(['Raven Quarry']))
  })

  it('is empty for somebody who looks after nothing', async () => {
    expect(await listDanger(db, stranger, '2027-05-02')).toEqual([])
    expect(await listDanger(db, await viewerOf(db, 'pia@climbers.example'), '2027-05-02')).toEqual([])
  })
})

describe('A coordinator', () => {
  it('asks a question, and the answer brings the report back', async () => {
    const { reportId } = await reportRing(db)
    expect(await askDetail(db, { ...(await decide(reportId)), question: 'Which ring?' })).toEqual({
      ok: true,
    })
    expect(await answerDetail(db, { reportId, act: actBy(null), answer: 'The left one.' })).toEqual({
      ok: true,
    })
    const [row] = await db.select().from(reports).where(eq(reports.id, reportId))
    expect(row).toMatchObject({ state: 'received', words: 'The left one.' })
  })

  it('declines with a reason, after which nothing can be taken in', async () => {
    const { reportId } = await reportRing(db)
    await declineReport(db, { ...(await decide(reportId)), reason: 'Mended last week.' })
    expect(await take(reportId)).toMatchObject({ ok: false })
    const point = await findPoint(db, 'Slack Water', 'lower-off')
    expect(await stateOf(point.anchorId)).toMatchObject({ state: 'good' })
  })

  it('puts a report on record, which counts for the condition without a hazard', async () => {
    const point = await findPoint(db, 'Neap', 2)
    const rust = { ...groove, kind: 'rust', unit: 'grade', low: 3, high: 3, edge: null } as const
    const { reportId } = await reportRing(db, { climb: 'Neap', at: 2, findings: [rust] })
    await putOnRecord(db, await decide(reportId))
    expect(await stateOf(point.anchorId)).toEqual({ state: 'fair', open: 0 })
  })

  it('does not improve a point by a climber’s word that nothing is wrong', async () => {
    const point = await findPoint(db, 'Slack Water', 3)
    const nothing = { ...groove, kind: 'no_fault', unit: null, low: null, high: null, edge: null } as const
    const { reportId } = await reportRing(db, { at: 3, findings: [nothing] })
    await putOnRecord(db, await decide(reportId))
    expect(await stateOf(point.anchorId)).toMatchObject({ state: 'poor' })
  })
})

describe('A reporter', () => {
  it('takes a report back before it is taken in, and not after', async () => {
    const early = await reportRing(db)
    expect(await withdrawReport(db, { reportId: early.reportId, act: actBy(null) })).toEqual({ ok: true })
    const late = await reportRing(db)
    await take(late.reportId)
    expect(await withdrawReport(db, { reportId: late.reportId, act: actBy(null) })).toMatchObject({
      ok: false,
    })
  })
})

describe('What is derived', () => {
  it('is the same after it is worked out anew', async () => {
    await take((await reportRing(db)).reportId)
    const all = async () => ({
      anchors: await db
        .select({
          id: anchors.id,
          state: anchors.state,
          open: anchors.openHazards,
          band: anchors.worstBand,
          lapses: anchors.lapsesOn,
        })
        .from(anchors)
        .orderBy(anchors.id),
      climbs: await db
        .select({ id: climbs.id, state: climbs.worstState, open: climbs.openHazards })
        .from(climbs)
        .orderBy(climbs.id),
      crags: await db
        .select({ id: crags.id, state: crags.worstState, open: crags.openHazards })
        .from(crags)
        .orderBy(crags.id),
    })
    const before = await all()
    await inTransaction(db, tx =>
      refreshAnchors(
        tx,
        actBy(null),
        before.anchors.map(row => row.id),
      ),
    )
    expect(await all()).toEqual(before)
  })

  it('lapses to Not looked at by the clock', async () => {
    const point = await findPoint(db, 'Neap', 2)
    const later = new Date(now.getTime() + 400 * 86_400_000)
    await inTransaction(db, tx => refreshAnchors(tx, actBy(null, later), [point.anchorId]))
    expect(await stateOf(point.anchorId)).toMatchObject({ state: 'unknown' })
  })

  it('never shows No fault seen on stainless steel by a warm sea', async () => {
    const point = await findPoint(db, 'Haar', 3)
    const [check] = await db
      .select()
      .from(findings)
      .innerJoin(reports, eq(reports.id, findings.reportId))
      .where(eq(reports.anchorId, point.anchorId))
    expect(check!.findings.kind).toBe('no_fault')
    expect(await stateOf(point.anchorId)).toMatchObject({ state: 'unknown' })
  })
})
