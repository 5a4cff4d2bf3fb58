import type { Queryable } from '~/db/client.server'
import {
  anchors,
  areas,
  climbAnchors,
  climbs,
  consents,
  cragKeepers,
  cragOrganisations,
  crags,
  ledges,
  pitches,
  sectors,
} from '~/db/schema/crags'
import { parts } from '~/db/schema/parts'
import { toCode } from '~/lib/code'
import type { Remit } from '~/people/role'
import type { Sensitivity } from '~/people/sensitivity'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import type { AnchorKind, Below } from './anchor'
import type { ConsentState, Corrosivity, Rock, Traffic } from './crag'
import type { DatePrecision, Material, PartKind, Side } from './part'

type Coordinates = { lon: number; lat: number }

const stamped = (act: Act) => ({ createdAt: act.now, updatedAt: act.now })

/** Opens an area; its two letters begin every code in it. Gives its id. */
export async function addArea(
  tx: Queryable,
  act: Act,
  area: { code: string; name: string; timeZone: string; parentId?: string },
): Promise<{ id: string; code: string }> {
  const id = act.newId()
  await tx.insert(areas).values({ id, ...area, parentId: area.parentId ?? null, ...stamped(act) })
  return { id, code: area.code }
}

export interface NewCrag {
  name: string
  pos: Coordinates
  sensitive?: Sensitivity
  rock: Rock
  seaKm: number | null
  warmSea: boolean
  corrosivity: Corrosivity | null
  aspect?: string
  consent: ConsentState
  consentConditions?: string
  policy?: string
  approach?: string
  organisations: { organisationId: string; remit: Remit; lead: boolean }[]
  keepers?: { personId: string; rank: number }[]
}

/** Puts a crag on record with who looks after it. Gives its id and code. */
export async function addCrag(tx: Queryable, act: Act, area: { id: string; code: string }, crag: NewCrag) {
  const id = act.newId()
  const code = toCode(area.code, act.random)
  await tx.insert(crags).values({
    id,
    areaId: area.id,
    code,
    name: crag.name,
    pos: crag.pos,
    sensitive: crag.sensitive ?? 'open',
    hazardDetail: 'full',
    rock: crag.rock,
    seaKm: crag.seaKm,
    warmSea: crag.warmSea,
    corrosivity: crag.corrosivity,
    aspect: crag.aspect ?? null,
    consent: crag.consent,
    policy: crag.policy ?? null,
    approach: crag.approach ?? null,
    worstState: 'unknown',
    ...stamped(act),
  })
  for (const held of crag.organisations) await tx.insert(cragOrganisations).values({ cragId: id, ...held })
  for (const keeper of crag.keepers ?? []) await tx.insert(cragKeepers).values({ cragId: id, ...keeper })
  await tx.insert(consents).values({
    id: act.newId(),
    cragId: id,
    state: crag.consent,
    conditions: crag.consentConditions ?? null,
    ...stamped(act),
  })
  await writeActivity(tx, act, {
    verb: 'added',
    subjectKind: 'crag',
    subjectId: id,
    cragId: id,
    public: true,
  })
  return { id, code, areaCode: area.code }
}

/** Adds a sector at the given place from the left. Gives its id. */
export async function addSector(
  tx: Queryable,
  act: Act,
  sector: { cragId: string; name: string; ordinal: number },
): Promise<string> {
  const id = act.newId()
  await tx.insert(sectors).values({ id, ...sector, ...stamped(act) })
  return id
}

export interface NewClimb {
  name: string
  grade?: string
  ordinal: number
  foot: Coordinates
  traffic: Traffic
  lengthM: number
  ledges?: { atM: number; below: Below }[]
}

/** Adds a climb of one pitch with its length and ledges. Gives its id, code and pitch. */
export async function addClimb(
  tx: Queryable,
  act: Act,
  place: { areaCode: string; cragId: string; sectorId: string },
  climb: NewClimb,
) {
  const id = act.newId()
  const code = toCode(place.areaCode, act.random)
  await tx.insert(climbs).values({
    id,
    sectorId: place.sectorId,
    code,
    name: climb.name,
    grade: climb.grade ?? null,
    ordinal: climb.ordinal,
    foot: climb.foot,
    traffic: climb.traffic,
    worstState: 'unknown',
    ...stamped(act),
  })
  const pitchId = act.newId()
  await tx
    .insert(pitches)
    .values({ id: pitchId, climbId: id, number: 1, lengthM: climb.lengthM, ...stamped(act) })
  for (const ledge of climb.ledges ?? []) await tx.insert(ledges).values({ pitchId, ...ledge })
  await writeActivity(tx, act, {
    verb: 'added',
    subjectKind: 'climb',
    subjectId: id,
    cragId: place.cragId,
    public: true,
  })
  return { id, code, pitchId }
}

/** Puts a fixed point on record, looked at by nobody yet. Gives its id and code. */
export async function addAnchor(
  tx: Queryable,
  act: Act,
  place: { areaCode: string; cragId: string },
  kind: AnchorKind,
): Promise<{ id: string; code: string }> {
  const id = act.newId()
  const code = toCode(place.areaCode, act.random)
  await tx.insert(anchors).values({
    id,
    code,
    cragId: place.cragId,
    kind,
    life: 'in_place',
    state: 'unknown',
    ...stamped(act),
  })
  return { id, code }
}

/** Says where on a climb a fixed point stands; several climbs may share it. */
export async function placeAnchor(
  tx: Queryable,
  place: { climbId: string; pitchId: string; anchorId: string },
  position: { ordinal: number; alongM: number; assumed: boolean; below: Below; fromOn: string },
): Promise<void> {
  await tx.insert(climbAnchors).values({ ...place, ...position })
}

export interface NewPart {
  kind: PartKind
  material: Material
  side?: Side | null
  sizeMm?: number | null
  lengthMm?: number | null
  marking?: string | null
  standard?: string | null
  fittedOn?: string | null
  fittedPrecision?: DatePrecision
  fittedByRecord?: string | null
}

/** Puts a part on record at a fixed point. Gives its id. */
export async function addPart(tx: Queryable, act: Act, anchorId: string, part: NewPart): Promise<string> {
  const id = act.newId()
  await tx.insert(parts).values({
    id,
    anchorId,
    ...part,
    fittedPrecision: part.fittedPrecision ?? (part.fittedOn ? 'day' : 'unknown'),
    ...stamped(act),
  })
  return id
}
