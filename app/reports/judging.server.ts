import { createHash } from 'node:crypto'
import { and, eq, inArray, isNull } from 'drizzle-orm'
import { findClimbById } from '~/crags/climbs.server'
import type { Queryable, Transaction } from '~/db/client.server'
import { anchors, areas, climbAnchors, climbs, crags } from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import { ratings } from '~/db/schema/rating'
import { findings, hazards, reports } from '~/db/schema/reports'
import { toDay } from '~/lib/dates'
import { canonicalInputs } from '~/rating/inputs'
import { requireModel } from '~/rating/models.server'
import { engineVersion, rate } from '~/rating/rate'
import type { Act } from '~/record/act'
import { addJudgements, type Judgement, toUrgencySort } from './judgement'
import { type RatedFinding, toRatingInputs } from './rating-inputs'

async function requirePlace(db: Queryable, anchorId: string) {
  const [row] = await db
    .select({
      seaKm: crags.seaKm,
      warmSea: crags.warmSea,
      corrosivity: crags.corrosivity,
      timeZone: areas.timeZone,
    })
    .from(anchors)
    .innerJoin(crags, eq(crags.id, anchors.cragId))
    .innerJoin(areas, eq(areas.id, crags.areaId))
    .where(eq(anchors.id, anchorId))
    .limit(1)
  if (row === undefined) throw new Error(`no fixed point ${anchorId}`)
  return row
}

async function listRatedParts(db: Queryable, anchorId: string) {
  return await db
    .select({
      id: parts.id,
      side: parts.side,
      kind: parts.kind,
      material: parts.material,
      sizeMm: parts.sizeMm,
      fittedOn: parts.fittedOn,
    })
    .from(parts)
    .where(and(eq(parts.anchorId, anchorId), isNull(parts.removedOn)))
    .orderBy(parts.id)
}

async function listClimbIdsAt(db: Queryable, anchorId: string) {
  const rows = await db
    .select({ id: climbAnchors.climbId })
    .from(climbAnchors)
    .innerJoin(climbs, eq(climbs.id, climbAnchors.climbId))
    .where(and(eq(climbAnchors.anchorId, anchorId), isNull(climbAnchors.toOn), isNull(climbs.retiredAt)))
    .orderBy(climbAnchors.climbId)
  return rows.map(row => row.id)
}

/** Rates a fixed point with the given findings on every climb it stands on, and adds the climbs up. */
export async function judge(
  db: Queryable,
  now: Date,
  anchorId: string,
  found: RatedFinding[],
): Promise<{ judgement: Judgement; inputs: string; modelId: string } | null> {
  const place = await requirePlace(db, anchorId)
  const there = await listRatedParts(db, anchorId)
  const today = toDay(now, place.timeZone)
  const { id: modelId, model } = await requireModel(db)
  const each: { climbCode: string; inputs: ReturnType<typeof toRatingInputs> }[] = []
  for (const climbId of await listClimbIdsAt(db, anchorId)) {
    const climb = await findClimbById(db, climbId, today)
    if (climb === null) continue
    each.push({
      climbCode: climb.code,
      inputs: toRatingInputs({ climb, anchorId, parts: there, findings: found, place, today }),
    })
  }
  if (each.length === 0) return null
  const judgement = addJudgements(
    each.map(({ climbCode, inputs }) => ({ climbCode, rating: rate(inputs, model) })),
  )
  return { judgement, inputs: `[${each.map(({ inputs }) => canonicalInputs(inputs)).join(',')}]`, modelId }
}

type Target = { hazardId: string; reportId?: undefined } | { reportId: string; hazardId?: undefined }

/** Rates a report or hazard and leaves the rating as a row of its own and its outcome on the report or hazard. */
async function keepRating(
  tx: Transaction,
  act: Act,
  target: Target,
  anchorId: string,
  found: RatedFinding[],
  cause: string,
): Promise<Judgement | null> {
  const judged = await judge(tx, act.now, anchorId, found)
  if (judged === null) return null
  const { judgement } = judged
  const id = act.newId()
  await tx.insert(ratings).values({
    id,
    ...target,
    modelId: judged.modelId,
    engine: engineVersion,
    inputs: JSON.parse(judged.inputs),
    inputsHash: createHash('sha256').update(judged.inputs).digest('hex'),
    results: judgement,
    bandLow: judgement.bandLow,
    band: judgement.band,
    bandHigh: judgement.bandHigh,
    cause,
    at: act.now,
  })
  const outcome = {
    ratingId: id,
    band: judgement.band,
    bandHigh: judgement.bandHigh,
    urgencySort: toUrgencySort(judgement.band, judgement.rate),
    updatedAt: act.now,
  }
  if (target.hazardId !== undefined)
    await tx.update(hazards).set(outcome).where(eq(hazards.id, target.hazardId))
  else await tx.update(reports).set(outcome).where(eq(reports.id, target.reportId))
  return judgement
}

const ratedColumns = {
  kind: findings.kind,
  partId: findings.partId,
  unit: findings.unit,
  low: findings.low,
  high: findings.high,
  edge: findings.edge,
  triedByHand: findings.triedByHand,
}

/** The provisional urgency of a report just received, from its own findings. */
export async function rateReport(tx: Transaction, act: Act, reportId: string, anchorId: string) {
  const found = await tx.select(ratedColumns).from(findings).where(eq(findings.reportId, reportId))
  return await keepRating(tx, act, { reportId }, anchorId, found, 'received')
}

/** The urgency of a hazard from everything found in the reports that were taken in for it. */
export async function rateHazard(
  tx: Transaction,
  act: Act,
  hazardId: string,
  anchorId: string,
  cause: string,
) {
  const found = await tx
    .select(ratedColumns)
    .from(findings)
    .innerJoin(reports, eq(reports.id, findings.reportId))
    .where(
      and(
        eq(reports.hazardId, hazardId),
        inArray(reports.state, ['taken_in', 'on_record']),
        isNull(findings.clearedAt),
      ),
    )
  return await keepRating(tx, act, { hazardId }, anchorId, found, cause)
}
