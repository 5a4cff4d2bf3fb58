import {
  type AnyMySqlColumn,
  boolean,
  double,
  index,
  int,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from 'drizzle-orm/mysql-core'
import { anchorKinds, anchorLives, grounds } from '../../crags/anchor'
import { conditionStates } from '../../crags/condition-state'
import {
  type Corrosivity,
  consentStates,
  hazardDetails,
  type Rock,
  type Traffic,
  traffics,
} from '../../crags/crag'
import { remits } from '../../people/role'
import { sensitivities } from '../../people/sensitivity'
import { day, exactlyOne, moment, oneOf, point, stamps, uuid } from '../columns'
import { organisations, people } from './people'

export const areas = mysqlTable('areas', {
  id: uuid('id').primaryKey(),
  parentId: uuid('parent_id').references((): AnyMySqlColumn => areas.id),
  code: varchar('code', { length: 2 }).notNull().unique(),
  name: varchar('name', { length: 120 }).notNull(),
  timeZone: varchar('time_zone', { length: 60 }).notNull(),
  ...stamps,
})

/** Derived columns (state, hazards, notices): written by `refreshAnchors` alone. */
const derived = {
  worstState: varchar('worst_state', { length: 10 }).$type<(typeof conditionStates)[number]>().notNull(),
  worstBand: varchar('worst_band', { length: 10 }).$type<'first' | 'soon' | 'turn' | 'watch'>(),
  openHazards: int('open_hazards').notNull().default(0),
  notices: int('notices').notNull().default(0),
}

export const crags = mysqlTable(
  'crags',
  {
    id: uuid('id').primaryKey(),
    mapNo: int('map_no').notNull().autoincrement().unique(),
    areaId: uuid('area_id')
      .notNull()
      .references(() => areas.id),
    code: varchar('code', { length: 7 }).notNull().unique(),
    name: varchar('name', { length: 120 }).notNull(),
    pos: point('pos').notNull(),
    sensitive: varchar('sensitive', { length: 10 }).$type<(typeof sensitivities)[number]>().notNull(),
    hazardDetail: varchar('hazard_detail', { length: 10 }).$type<(typeof hazardDetails)[number]>().notNull(),
    rock: varchar('rock', { length: 20 }).$type<Rock>().notNull(),
    seaKm: double('sea_km'),
    warmSea: boolean('warm_sea').notNull(),
    corrosivity: varchar('corrosivity', { length: 2 }).$type<Corrosivity>(),
    aspect: varchar('aspect', { length: 20 }),
    consent: varchar('consent', { length: 12 }).$type<(typeof consentStates)[number]>().notNull(),
    policy: text('policy'),
    approach: text('approach'),
    ...derived,
    version: int('version').notNull().default(1),
    ...stamps,
  },
  table => [
    index('crags_area').on(table.areaId),
    oneOf('crags_sensitive', 'sensitive', sensitivities),
    oneOf('crags_hazard_detail', 'hazard_detail', hazardDetails),
    oneOf('crags_consent', 'consent', consentStates),
    oneOf('crags_state', 'worst_state', conditionStates),
  ],
)

export const consents = mysqlTable(
  'consents',
  {
    id: uuid('id').primaryKey(),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    state: varchar('state', { length: 12 }).$type<(typeof consentStates)[number]>().notNull(),
    owner: varchar('owner', { length: 200 }),
    givenBy: varchar('given_by', { length: 200 }),
    untilOn: day('until_on'),
    conditions: text('conditions'),
    ...stamps,
  },
  table => [index('consents_crag').on(table.cragId), oneOf('consents_state', 'state', consentStates)],
)

export const cragOrganisations = mysqlTable(
  'crag_organisations',
  {
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    organisationId: uuid('organisation_id')
      .notNull()
      .references(() => organisations.id),
    remit: varchar('remit', { length: 10 }).$type<(typeof remits)[number]>().notNull(),
    lead: boolean('lead').notNull(),
  },
  table => [
    primaryKey({ columns: [table.cragId, table.organisationId, table.remit] }),
    oneOf('crag_organisations_remit', 'remit', remits),
  ],
)

/** Who is on duty for a crag: rank 1 is the keeper, 2 the deputy. */
export const cragKeepers = mysqlTable(
  'crag_keepers',
  {
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    rank: int('rank').notNull(),
    awayFrom: day('away_from'),
    awayTo: day('away_to'),
  },
  table => [primaryKey({ columns: [table.cragId, table.personId] })],
)

export const sectors = mysqlTable(
  'sectors',
  {
    id: uuid('id').primaryKey(),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    name: varchar('name', { length: 120 }).notNull(),
    ordinal: int('ordinal').notNull(),
    ...stamps,
  },
  table => [index('sectors_crag').on(table.cragId, table.ordinal)],
)

export const climbs = mysqlTable(
  'climbs',
  {
    id: uuid('id').primaryKey(),
    mapNo: int('map_no').notNull().autoincrement().unique(),
    sectorId: uuid('sector_id')
      .notNull()
      .references(() => sectors.id),
    code: varchar('code', { length: 7 }).notNull().unique(),
    name: varchar('name', { length: 120 }).notNull(),
    grade: varchar('grade', { length: 20 }),
    ordinal: int('ordinal').notNull(),
    foot: point('foot').notNull(),
    traffic: varchar('traffic', { length: 10 }).$type<Traffic>().notNull(),
    ascentsYear: int('ascents_year'),
    retiredAt: moment('retired_at'),
    ...derived,
    version: int('version').notNull().default(1),
    ...stamps,
  },
  table => [
    index('climbs_sector').on(table.sectorId, table.ordinal),
    oneOf('climbs_traffic', 'traffic', traffics),
    oneOf('climbs_state', 'worst_state', conditionStates),
  ],
)

export const placeNames = mysqlTable(
  'place_names',
  {
    id: uuid('id').primaryKey(),
    areaId: uuid('area_id').references(() => areas.id),
    cragId: uuid('crag_id').references(() => crags.id),
    sectorId: uuid('sector_id').references(() => sectors.id),
    climbId: uuid('climb_id').references(() => climbs.id),
    name: varchar('name', { length: 120 }).notNull(),
    lang: varchar('lang', { length: 12 }),
    fromOn: day('from_on'),
    toOn: day('to_on'),
    hidden: boolean('hidden').notNull().default(false),
    ...stamps,
  },
  () => [exactlyOne('place_names_of', 'area_id', 'crag_id', 'sector_id', 'climb_id')],
)

export const pitches = mysqlTable(
  'pitches',
  {
    id: uuid('id').primaryKey(),
    climbId: uuid('climb_id')
      .notNull()
      .references(() => climbs.id),
    number: int('number').notNull(),
    lengthM: double('length_m').notNull(),
    ...stamps,
  },
  table => [uniqueIndex('pitches_number').on(table.climbId, table.number)],
)

export const ledges = mysqlTable(
  'ledges',
  {
    pitchId: uuid('pitch_id')
      .notNull()
      .references(() => pitches.id),
    atM: double('at_m').notNull(),
    below: varchar('below', { length: 10 }).$type<(typeof grounds)[number]>().notNull(),
  },
  table => [primaryKey({ columns: [table.pitchId, table.atM] }), oneOf('ledges_below', 'below', grounds)],
)

export const anchors = mysqlTable(
  'anchors',
  {
    id: uuid('id').primaryKey(),
    mapNo: int('map_no').notNull().autoincrement().unique(),
    code: varchar('code', { length: 7 }).notNull().unique(),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    kind: varchar('kind', { length: 20 }).$type<(typeof anchorKinds)[number]>().notNull(),
    life: varchar('life', { length: 12 }).$type<(typeof anchorLives)[number]>().notNull(),
    replacedBy: uuid('replaced_by').references((): AnyMySqlColumn => anchors.id),
    state: varchar('state', { length: 10 }).$type<(typeof conditionStates)[number]>().notNull(),
    stateOn: day('state_on'),
    stateHow: varchar('state_how', { length: 20 }),
    lapsesOn: day('lapses_on'),
    worstBand: derived.worstBand,
    worstRate: double('worst_rate'),
    openHazards: derived.openHazards,
    notices: derived.notices,
    version: int('version').notNull().default(1),
    ...stamps,
  },
  table => [
    index('anchors_crag').on(table.cragId),
    index('anchors_lapse').on(table.lapsesOn),
    oneOf('anchors_kind', 'kind', anchorKinds),
    oneOf('anchors_life', 'life', anchorLives),
    oneOf('anchors_state', 'state', conditionStates),
  ],
)

/** A position of its own, where it was surveyed; else a fixed point stands at its climb. */
export const anchorPoints = mysqlTable('anchor_points', {
  anchorId: uuid('anchor_id')
    .primaryKey()
    .references(() => anchors.id),
  pos: point('pos').notNull(),
  accuracyM: double('accuracy_m').notNull(),
  method: varchar('method', { length: 40 }).notNull(),
})

export const climbAnchors = mysqlTable(
  'climb_anchors',
  {
    climbId: uuid('climb_id')
      .notNull()
      .references(() => climbs.id),
    anchorId: uuid('anchor_id')
      .notNull()
      .references(() => anchors.id),
    pitchId: uuid('pitch_id')
      .notNull()
      .references(() => pitches.id),
    /** bolt 1, 2, … in its kind on this climb */
    ordinal: int('ordinal').notNull(),
    /** along the pitch; assumed where nobody measured */
    alongM: double('along_m').notNull(),
    assumed: boolean('assumed').notNull(),
    below: varchar('below', { length: 10 }).$type<(typeof grounds)[number]>().notNull(),
    fromOn: day('from_on').notNull(),
    toOn: day('to_on'),
  },
  table => [
    primaryKey({ columns: [table.climbId, table.anchorId, table.fromOn] }),
    index('climb_anchors_anchor').on(table.anchorId),
    oneOf('climb_anchors_below', 'below', grounds),
  ],
)
