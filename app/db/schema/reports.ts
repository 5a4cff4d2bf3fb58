import {
  type AnyMySqlColumn,
  bigint,
  boolean,
  double,
  index,
  int,
  mysqlTable,
  primaryKey,
  text,
  varchar,
} from 'drizzle-orm/mysql-core'
import type { bands } from '../../rating/band'
import { type EdgeClass, findingKinds } from '../../rating/finding'
import { failureModes, hazardStates } from '../../reports/hazard'
import { photoStates } from '../../reports/photo'
import { howSeen, reportStates } from '../../reports/report'
import { day, moment, oneOf, stamps, uuid } from '../columns'
import { anchors, climbs, crags, sectors } from './crags'
import { parts } from './parts'
import { people } from './people'

/** What the rating of a report or hazard left on it; the rating itself is a row of its own. */
const judged = {
  ratingId: uuid('rating_id'),
  band: varchar('band', { length: 10 }).$type<(typeof bands)[number]>(),
  bandHigh: varchar('band_high', { length: 10 }).$type<(typeof bands)[number]>(),
  /** the list's order: band, then rate; higher is more urgent */
  urgencySort: double('urgency_sort').notNull().default(0),
}

export const hazards = mysqlTable(
  'hazards',
  {
    id: uuid('id').primaryKey(),
    code: varchar('code', { length: 7 }).notNull().unique(),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    anchorId: uuid('anchor_id').references(() => anchors.id),
    climbId: uuid('climb_id').references(() => climbs.id),
    sectorId: uuid('sector_id').references(() => sectors.id),
    partId: uuid('part_id').references(() => parts.id),
    mode: varchar('mode', { length: 20 }).$type<(typeof failureModes)[number]>().notNull(),
    /** one line: what is wrong, as the list shows it */
    headline: varchar('headline', { length: 200 }).notNull(),
    state: varchar('state', { length: 20 }).$type<(typeof hazardStates)[number]>().notNull(),
    warnedUntil: moment('warned_until'),
    openedAt: moment('opened_at').notNull(),
    mendedAt: moment('mended_at'),
    clearedAt: moment('cleared_at'),
    joinedTo: uuid('joined_to').references((): AnyMySqlColumn => hazards.id),
    ...judged,
    version: int('version').notNull().default(1),
    ...stamps,
  },
  table => [
    index('hazards_list').on(table.state, table.urgencySort, table.id),
    index('hazards_anchor').on(table.anchorId),
    index('hazards_crag').on(table.cragId),
    oneOf('hazards_state', 'state', hazardStates),
    oneOf('hazards_mode', 'mode', failureModes),
  ],
)

export const reports = mysqlTable(
  'reports',
  {
    id: uuid('id').primaryKey(),
    /** made by the form, so that sending twice is one report */
    clientKey: varchar('client_key', { length: 64 }).notNull().unique(),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    climbId: uuid('climb_id').references(() => climbs.id),
    anchorId: uuid('anchor_id').references(() => anchors.id),
    accuracyM: double('accuracy_m'),
    placeWords: varchar('place_words', { length: 300 }),
    seenOn: day('seen_on').notNull(),
    recordedAt: moment('recorded_at').notNull(),
    receivedAt: moment('received_at').notNull(),
    howSeen: varchar('how_seen', { length: 20 }).$type<(typeof howSeen)[number]>().notNull(),
    personId: uuid('person_id').references(() => people.id),
    guestEmail: varchar('guest_email', { length: 254 }),
    confirmedAt: moment('confirmed_at'),
    isCheck: boolean('is_check').notNull().default(false),
    words: text('words'),
    lang: varchar('lang', { length: 12 }),
    state: varchar('state', { length: 20 }).$type<(typeof reportStates)[number]>().notNull(),
    /** the question of "needs detail", or why it was declined */
    reason: text('reason'),
    hazardId: uuid('hazard_id').references(() => hazards.id),
    decidedBy: uuid('decided_by').references(() => people.id),
    decidedAt: moment('decided_at'),
    ...judged,
    ...stamps,
  },
  table => [
    index('reports_list').on(table.state, table.urgencySort, table.id),
    index('reports_anchor').on(table.anchorId),
    index('reports_hazard').on(table.hazardId),
    oneOf('reports_state', 'state', reportStates),
    oneOf('reports_how', 'how_seen', howSeen),
  ],
)

export const reportAnchors = mysqlTable(
  'report_anchors',
  {
    reportId: uuid('report_id')
      .notNull()
      .references(() => reports.id),
    anchorId: uuid('anchor_id')
      .notNull()
      .references(() => anchors.id),
  },
  table => [primaryKey({ columns: [table.reportId, table.anchorId] })],
)

export const findings = mysqlTable(
  'findings',
  {
    id: uuid('id').primaryKey(),
    reportId: uuid('report_id')
      .notNull()
      .references(() => reports.id),
    partId: uuid('part_id').references(() => parts.id),
    kind: varchar('kind', { length: 30 }).$type<(typeof findingKinds)[number]>().notNull(),
    /** what was measured: `depth_mm`, `percent`, `grade` */
    unit: varchar('unit', { length: 10 }).$type<'mm' | 'percent' | 'grade'>(),
    low: double('low'),
    high: double('high'),
    method: varchar('method', { length: 20 }),
    edge: varchar('edge', { length: 10 }).$type<EdgeClass>(),
    triedByHand: boolean('tried_by_hand'),
    words: text('words'),
    /** cleared by closed work, or by a check that names it */
    clearedAt: moment('cleared_at'),
    clearedByRecord: uuid('cleared_by_record'),
    clearedByReport: uuid('cleared_by_report'),
    createdAt: moment('created_at').notNull(),
  },
  table => [index('findings_report').on(table.reportId), oneOf('findings_kind', 'kind', findingKinds)],
)

export const photos = mysqlTable(
  'photos',
  {
    id: uuid('id').primaryKey(),
    /** random, and the only name of the files */
    storageKey: varchar('storage_key', { length: 64 }).notNull().unique(),
    state: varchar('state', { length: 10 }).$type<(typeof photoStates)[number]>().notNull(),
    reportId: uuid('report_id').references(() => reports.id),
    workRecordId: uuid('work_record_id'),
    /** who took it up, while it is staged: hash of the session or guest token */
    stagedBy: varchar('staged_by', { length: 64 }),
    width: int('width').notNull(),
    height: int('height').notNull(),
    sha256: varchar('sha256', { length: 64 }).notNull(),
    phash: bigint('phash', { mode: 'bigint', unsigned: true }),
    takenAt: moment('taken_at'),
    credit: varchar('credit', { length: 120 }),
    public: boolean('public').notNull().default(false),
    expiresAt: moment('expires_at'),
    ...stamps,
  },
  table => [
    index('photos_report').on(table.reportId),
    index('photos_record').on(table.workRecordId),
    index('photos_staged').on(table.stagedBy, table.expiresAt),
    oneOf('photos_state', 'state', photoStates),
  ],
)
