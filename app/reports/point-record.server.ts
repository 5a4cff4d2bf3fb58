import { listParts } from '~/crags/anchors.server'
import type { Queryable } from '~/db/client.server'
import { groupBy } from '~/lib/group-by'
import { can, type Subject, type Viewer } from '~/people/viewer'
import { listFindings } from './findings.server'
import { listHazardsAt } from './hazards.server'
import { findJudgement } from './judgements.server'
import { listPhotos } from './photos.server'
import { listStandingReports } from './reports.server'

/**
 * What the record says of one fixed point: its parts, what was found on each and by how many, its hazards, photos the
 * viewer may see, and (for those who may) the urgency of its worst open hazard with reasons. No reporter is named.
 */
export async function readPoint(db: Queryable, viewer: Viewer, anchorId: string, subject: Subject) {
  const [parts, hazards, reports] = [
    await listParts(db, anchorId),
    await listHazardsAt(db, [anchorId]),
    await listStandingReports(db, [anchorId]),
  ]
  const found = await listFindings(
    db,
    reports.map(report => report.id),
  )
  const byReport = groupBy(found, finding => finding.reportId)
  const photos = await listPhotos(db, { reportIds: reports.map(report => report.id) })
  const seesAll = can(viewer, 'photo:full', subject)
  const worst = hazards
    .filter(hazard => hazard.state === 'open' || hazard.state === 'warned')
    .find(hazard => hazard.ratingId !== null)
  return {
    parts,
    hazards: hazards.map(({ id, code, headline, state, openedAt, clearedAt, band, bandHigh }) => ({
      id,
      code,
      headline,
      state,
      openedAt,
      clearedAt,
      ...(can(viewer, 'urgency:see', subject) ? { band, bandHigh } : { band: null, bandHigh: null }),
    })),
    seen: reports.map(report => ({
      id: report.id,
      seenOn: report.seenOn,
      howSeen: report.howSeen,
      isCheck: report.isCheck,
      findings: byReport.get(report.id) ?? [],
    })),
    photos: photos
      .filter(photo => photo.public || seesAll)
      .map(({ storageKey, width, height, credit }) => ({ storageKey, width, height, credit })),
    urgency:
      worst !== undefined && can(viewer, 'urgency:see', subject)
        ? { hazardCode: worst.code, judgement: await findJudgement(db, worst.ratingId!) }
        : null,
  }
}

export type PointRecord = Awaited<ReturnType<typeof readPoint>>
