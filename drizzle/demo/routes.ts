import type { Traffic } from '../../app/crags/crag'
import type { Material, PartKind, Side } from '../../app/crags/part'

export interface DemoPart {
  kind: PartKind
  material: Material
  sizeMm?: number
  side?: Side
  /** year of fitting; left out where nobody knows */
  year?: number
}

export interface DemoRoute {
  name: string
  grade: string
  sector: string
  traffic: Traffic
  lengthM: number
  ledges?: number[]
  /** heights of the bolts; measured unless `assumed` */
  bolts: number[]
  assumed?: true
  bolt: DemoPart[]
  /** bolts that are something else */
  other?: Record<number, DemoPart[]>
  /** the lower-off's parts, or the route whose lower-off it shares */
  lowerOff: DemoPart[] | { of: string }
}

const titanium: DemoPart[] = [{ kind: 'bonded_eye', material: 'titanium', sizeMm: 10, year: 2014 }]
const stainless = (year: number): DemoPart[] => [
  { kind: 'bonded_eye', material: 'stainless', sizeMm: 10, year },
]
const plated: DemoPart[] = [
  { kind: 'wedge_bolt', material: 'plated_steel', sizeMm: 10 },
  { kind: 'hanger', material: 'plated_steel' },
]
const pair = (eye: DemoPart[], ring: DemoPart): DemoPart[] => [
  { ...eye[0]!, side: 'a' },
  { ...eye[0]!, side: 'b' },
  ring,
]
const steelRing = (year: number): DemoPart => ({ kind: 'ring', material: 'steel', sizeMm: 10, year })

/** Gannet Wall: a sea cliff of limestone, most of it re-equipped in titanium. */
export const gannetWall: DemoRoute[] = [
  {
    name: 'Slack Water',
    grade: '6b',
    sector: 'Left of the cave',
    traffic: 'busy',
    lengthM: 18.5,
    bolts: [2.1, 3.9, 5.6, 7.6, 9.7, 11.9, 14.0, 16.3],
    bolt: titanium,
    other: { 3: plated, 7: [{ kind: 'wedge_bolt', material: 'unknown' }] },
    lowerOff: pair(titanium, steelRing(2014)),
  },
  {
    name: 'Ebb',
    grade: '6a+',
    sector: 'Left of the cave',
    traffic: 'steady',
    lengthM: 18,
    bolts: [2.4, 4.4, 6.6, 9, 11.6, 14.2],
    bolt: titanium,
    lowerOff: { of: 'Slack Water' },
  },
  {
    name: 'Spindrift',
    grade: '5c',
    sector: 'Left of the cave',
    traffic: 'groups',
    lengthM: 14,
    bolts: [2, 4, 6, 8.2, 10.6],
    bolt: titanium,
    lowerOff: pair(titanium, { kind: 'ring', material: 'titanium', sizeMm: 12, year: 2019 }),
  },
  {
    name: 'Haar',
    grade: '7a',
    sector: 'Right of the cave',
    traffic: 'steady',
    lengthM: 21,
    bolts: [2.6, 4.6, 6.8, 9, 11.4, 13.8, 16.4, 18.8],
    bolt: stainless(2006),
    lowerOff: [
      ...pair(stainless(2006), { kind: 'chain', material: 'stainless', sizeMm: 8, year: 2006, side: 'a' }),
      { kind: 'chain', material: 'stainless', sizeMm: 8, year: 2006, side: 'b' },
    ],
  },
  {
    name: 'Bilge',
    grade: '7b',
    sector: 'Right of the cave',
    traffic: 'steady',
    lengthM: 16,
    bolts: [2.2, 4.1, 6, 8, 10.2, 12.6],
    bolt: titanium,
    other: {
      5: [
        { kind: 'bonded_eye', material: 'titanium', sizeMm: 10, year: 2014 },
        { kind: 'fixed_draw', material: 'steel', sizeMm: 12, year: 2021 },
      ],
    },
    lowerOff: pair(titanium, { kind: 'ring', material: 'titanium', sizeMm: 12, year: 2014 }),
  },
  {
    name: 'Undertow',
    grade: '6c',
    sector: 'Right of the cave',
    traffic: 'quiet',
    lengthM: 19,
    ledges: [6.5],
    bolts: [2.5, 5, 8, 11, 14, 16.8],
    assumed: true,
    bolt: titanium,
    lowerOff: pair(titanium, { kind: 'ring', material: 'titanium', sizeMm: 12, year: 2014 }),
  },
  {
    name: 'Neap',
    grade: '5b',
    sector: 'Right of the cave',
    traffic: 'steady',
    lengthM: 12,
    bolts: [2, 4, 6.2, 8.6],
    bolt: titanium,
    lowerOff: pair(titanium, { kind: 'ring', material: 'titanium', sizeMm: 12, year: 2014 }),
  },
]

/** Raven Quarry: slate, inland, of several ages. */
export const ravenQuarry: DemoRoute[] = [
  {
    name: 'Cold Front',
    grade: '6b+',
    sector: 'Top bay',
    traffic: 'busy',
    lengthM: 19,
    bolts: [2.3, 4.5, 7, 9.6, 12.4, 15.4],
    bolt: stainless(2009),
    lowerOff: pair(stainless(2009), steelRing(2009)),
  },
  {
    name: 'Powder Monkey',
    grade: '7a+',
    sector: 'Top bay',
    traffic: 'steady',
    lengthM: 24,
    bolts: [2.8, 5, 7.2, 9.6, 12.2, 14.8, 17.6, 20.6],
    bolt: stainless(2015),
    lowerOff: pair(stainless(2015), { kind: 'ring', material: 'stainless', sizeMm: 12, year: 2015 }),
  },
  {
    name: 'Trolley Way',
    grade: '5a',
    sector: 'Incline',
    traffic: 'groups',
    lengthM: 15,
    bolts: [2, 4, 6, 8.2, 10.6, 12.8],
    bolt: stainless(2018),
    lowerOff: pair(stainless(2018), { kind: 'ring', material: 'stainless', sizeMm: 12, year: 2018 }),
  },
  {
    name: 'Slate Wages',
    grade: '6a',
    sector: 'Incline',
    traffic: 'steady',
    lengthM: 17,
    bolts: [2.5, 5.5, 8.5, 11.5, 14.5],
    assumed: true,
    bolt: [
      { kind: 'self_drilled', material: 'plated_steel', sizeMm: 8 },
      { kind: 'hanger', material: 'plated_steel' },
    ],
    lowerOff: pair(plated, { kind: 'chain', material: 'plated_steel', sizeMm: 8 }),
  },
  {
    name: 'Splitting Shed',
    grade: '6c+',
    sector: 'Incline',
    traffic: 'quiet',
    lengthM: 13,
    bolts: [2.4, 4.4, 6.6, 9.2],
    bolt: stainless(2015),
    lowerOff: pair(stainless(2015), { kind: 'ring', material: 'stainless', sizeMm: 12, year: 2015 }),
  },
]
