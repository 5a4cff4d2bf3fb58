import {
  addAnchor,
  addArea,
  addClimb,
  addCrag,
  addPart,
  addSector,
  type NewCrag,
  placeAnchor,
} from '../../app/crags/places.server'
import type { Database, Transaction } from '../../app/db/client.server'
import { inTransaction } from '../../app/db/transaction.server'
import type { Act } from '../../app/record/act'
import { cragPlaces } from '../../tiles/places'
import type { DemoPeople } from './people'
import { type DemoPart, type DemoRoute, gannetWall, ravenQuarry } from './routes'

export interface DemoClimb {
  id: string
  code: string
  name: string
  cragId: string
  cragName: string
  /** bolts 1, 2, … and last the lower-off */
  bolts: { id: string; parts: { id: string; kind: string }[] }[]
  lowerOff: { id: string; parts: { id: string; kind: string }[] }
}

export type DemoPlaces = Map<string, DemoClimb>

/** Two crags of Skerrow with twelve climbs and their fixed points. */
export async function seedPlaces(db: Database, act: Act, people: DemoPeople): Promise<DemoPlaces> {
  const made: DemoPlaces = new Map()
  const access = { organisationId: people.organisation.access, remit: 'access', lead: true } as const
  await inTransaction(db, async tx => {
    const zone = { timeZone: 'Atlantic/Azores' }
    const island = await addArea(tx, act, { code: 'SK', name: 'Isle of Skerrow', ...zone })
    const keld = await addArea(tx, act, { code: 'KC', name: 'Keld Cliffs', parentId: island.id, ...zone })
    const harrow = await addArea(tx, act, { code: 'HF', name: 'Harrow Fell', parentId: island.id, ...zone })
    await seedCrag(tx, act, keld, gannetWall, made, {
      name: 'Gannet Wall',
      pos: toPos('Gannet Wall'),
      rock: 'limestone',
      seaKm: 0.02,
      warmSea: true,
      corrosivity: 'CX',
      aspect: 'south',
      consent: 'given',
      consentConditions:
        'Work on weekdays, or before ten at weekends. Tell the harbour office the day before.',
      policy: 'Bolts and lower-offs in titanium only.',
      approach:
        'From the harbour along the coast path, twenty minutes; scramble down left of the cave at low water.',
      organisations: [{ organisationId: people.organisation.keld, remit: 'rebolting', lead: true }, access],
      keepers: [{ personId: people.person.ines!.id, rank: 1 }],
    })
    await seedCrag(tx, act, harrow, ravenQuarry, made, {
      name: 'Raven Quarry',
      pos: toPos('Raven Quarry'),
      rock: 'slate',
      seaKm: 3.4,
      warmSea: false,
      corrosivity: 'C3',
      aspect: 'east',
      consent: 'not_needed',
      approach: 'From Upper Keld by the incline, half an hour. The floor of the quarry floods in winter.',
      organisations: [{ organisationId: people.organisation.harrow, remit: 'rebolting', lead: true }, access],
      keepers: [{ personId: people.person.bram!.id, rank: 1 }],
    })
  })
  return made
}

type PlaceName = keyof typeof cragPlaces

const toPos = (name: PlaceName) => ({ lon: cragPlaces[name].lon, lat: cragPlaces[name].lat })

/** A place so far along a crag's face, 0 to 1 from the left. */
function alongFace(name: PlaceName, share: number): { lon: number; lat: number } {
  const { face } = cragPlaces[name]
  const at = share * (face.length - 1)
  const from = Math.min(Math.floor(at), face.length - 2)
  const [a, b] = [face[from]!, face[from + 1]!]
  const t = at - from
  return { lon: a[0]! + t * (b[0]! - a[0]!), lat: a[1]! + t * (b[1]! - a[1]!) }
}

async function seedCrag(
  tx: Transaction,
  act: Act,
  area: { id: string; code: string },
  routes: DemoRoute[],
  made: DemoPlaces,
  crag: NewCrag,
): Promise<void> {
  const { id: cragId, code: _, areaCode } = await addCrag(tx, act, area, crag)
  const sectors = new Map<string, string>()
  for (const name of new Set(routes.map(route => route.sector)))
    sectors.set(name, await addSector(tx, act, { cragId, name, ordinal: sectors.size + 1 }))
  for (const [index, route] of routes.entries()) {
    const place = { areaCode, cragId, sectorId: sectors.get(route.sector)! }
    const foot = alongFace(crag.name as PlaceName, (index + 1) / (routes.length + 1))
    made.set(
      route.name,
      await seedClimb(tx, act, { ...place, cragName: crag.name, foot, ordinal: index + 1 }, route, made),
    )
  }
}

interface ClimbPlace {
  areaCode: string
  cragId: string
  cragName: string
  sectorId: string
  foot: { lon: number; lat: number }
  ordinal: number
}

async function seedClimb(
  tx: Transaction,
  act: Act,
  place: ClimbPlace,
  route: DemoRoute,
  made: DemoPlaces,
): Promise<DemoClimb> {
  const climb = await addClimb(tx, act, place, {
    name: route.name,
    grade: route.grade,
    ordinal: place.ordinal,
    foot: place.foot,
    traffic: route.traffic,
    lengthM: route.lengthM,
    ledges: route.ledges?.map(atM => ({ atM, below: 'ledge' as const })),
  })
  const at = (alongM: number, ordinal: number) => ({
    ordinal,
    alongM,
    assumed: route.assumed ?? false,
    below: 'ground' as const,
    fromOn: act.now.toISOString().slice(0, 10),
  })
  const on = { climbId: climb.id, pitchId: climb.pitchId }
  const bolts: DemoClimb['bolts'] = []
  for (const [index, height] of route.bolts.entries()) {
    const anchor = await addAnchor(tx, act, place, 'bolt')
    const parts = await addParts(tx, act, anchor.id, route.other?.[index + 1] ?? route.bolt)
    await placeAnchor(tx, { ...on, anchorId: anchor.id }, at(height, index + 1))
    bolts.push({ id: anchor.id, parts })
  }
  const lowerOff = await seedLowerOff(tx, act, place, route, made)
  await placeAnchor(tx, { ...on, anchorId: lowerOff.id }, { ...at(route.lengthM, 1), assumed: false })
  return {
    id: climb.id,
    code: climb.code,
    name: route.name,
    cragId: place.cragId,
    cragName: place.cragName,
    bolts,
    lowerOff,
  }
}

async function seedLowerOff(
  tx: Transaction,
  act: Act,
  place: ClimbPlace,
  route: DemoRoute,
  made: DemoPlaces,
) {
  if (!Array.isArray(route.lowerOff)) return made.get(route.lowerOff.of)!.lowerOff
  const anchor = await addAnchor(tx, act, place, 'lower_off')
  return { id: anchor.id, parts: await addParts(tx, act, anchor.id, route.lowerOff) }
}

async function addParts(tx: Transaction, act: Act, anchorId: string, parts: DemoPart[]) {
  const made: { id: string; kind: string }[] = []
  for (const part of parts)
    made.push({
      kind: part.kind,
      id: await addPart(tx, act, anchorId, {
        kind: part.kind,
        material: part.material,
        side: part.side ?? null,
        sizeMm: part.sizeMm ?? null,
        fittedOn: part.year === undefined ? null : `${part.year}-08-01`,
        fittedPrecision: part.year === undefined ? 'unknown' : 'year',
      }),
    })
  return made
}
