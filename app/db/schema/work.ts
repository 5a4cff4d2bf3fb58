import { double, index, int, mysqlTable, primaryKey, text, varchar } from 'drizzle-orm/mysql-core'
import type { materials, partKinds, sides } from '../../crags/part'
import { jobKinds } from '../../work/job'
import { checkerKinds, checkMethods, offerStates, orderStates } from '../../work/order'
import { day, exactlyOne, moment, oneOf, stamps, uuid } from '../columns'
import { anchors, climbs, crags } from './crags'
import { parts } from './parts'
import { organisations, people } from './people'
import { hazards, reports } from './reports'

export const orders = mysqlTable(
  'orders',
  {
    id: uuid('id').primaryKey(),
    code: varchar('code', { length: 7 }).notNull().unique(),
    organisationId: uuid('organisation_id')
      .notNull()
      .references(() => organisations.id),
    cragId: uuid('crag_id')
      .notNull()
      .references(() => crags.id),
    climbId: uuid('climb_id').references(() => climbs.id),
    kind: varchar('kind', { length: 20 }).$type<(typeof jobKinds)[number]>().notNull(),
    state: varchar('state', { length: 10 }).$type<(typeof orderStates)[number]>().notNull(),
    aimOn: day('aim_on'),
    /** what is to be done, in words for the sheet */
    what: text('what').notNull(),
    /** why work goes on while the owner's consent is unknown; prints on the sheet */
    consentReason: text('consent_reason'),
    madeBy: uuid('made_by').references(() => people.id),
    workerId: uuid('worker_id').references(() => people.id),
    closedAt: moment('closed_at'),
    version: int('version').notNull().default(1),
    ...stamps,
  },
  table => [
    index('orders_state').on(table.organisationId, table.state),
    oneOf('orders_kind', 'kind', jobKinds),
    oneOf('orders_state_word', 'state', orderStates),
  ],
)

export const orderHazards = mysqlTable(
  'order_hazards',
  {
    orderId: uuid('order_id')
      .notNull()
      .references(() => orders.id),
    hazardId: uuid('hazard_id')
      .notNull()
      .references(() => hazards.id),
  },
  table => [
    primaryKey({ columns: [table.orderId, table.hazardId] }),
    index('order_hazards_hazard').on(table.hazardId),
  ],
)

/** Parts the job needs. */
export const orderParts = mysqlTable(
  'order_parts',
  {
    id: uuid('id').primaryKey(),
    orderId: uuid('order_id')
      .notNull()
      .references(() => orders.id),
    kind: varchar('kind', { length: 20 }).$type<(typeof partKinds)[number]>().notNull(),
    material: varchar('material', { length: 20 }).$type<(typeof materials)[number]>().notNull(),
    sizeMm: double('size_mm'),
    quantity: int('quantity').notNull(),
  },
  table => [index('order_parts_order').on(table.orderId)],
)

export const offers = mysqlTable(
  'offers',
  {
    id: uuid('id').primaryKey(),
    orderId: uuid('order_id')
      .notNull()
      .references(() => orders.id),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    state: varchar('state', { length: 10 }).$type<(typeof offerStates)[number]>().notNull(),
    expiresAt: moment('expires_at').notNull(),
    answeredAt: moment('answered_at'),
    words: text('words'),
    ...stamps,
  },
  table => [index('offers_order').on(table.orderId), oneOf('offers_state', 'state', offerStates)],
)

export const workRecords = mysqlTable(
  'work_records',
  {
    id: uuid('id').primaryKey(),
    clientKey: varchar('client_key', { length: 64 }).notNull().unique(),
    orderId: uuid('order_id').references(() => orders.id),
    anchorId: uuid('anchor_id')
      .notNull()
      .references(() => anchors.id),
    by: uuid('by_person_id')
      .notNull()
      .references(() => people.id),
    doneOn: day('done_on').notNull(),
    minutes: int('minutes'),
    words: text('words'),
    noPhotoReason: text('no_photo_reason'),
    outcome: varchar('outcome', { length: 10 }).$type<'done' | 'returned'>().notNull(),
    ...stamps,
  },
  table => [index('work_records_order').on(table.orderId), index('work_records_anchor').on(table.anchorId)],
)

/** What a record says was fitted and taken out; the parts on record follow when the order is closed. */
export const workParts = mysqlTable(
  'work_parts',
  {
    id: uuid('id').primaryKey(),
    workRecordId: uuid('work_record_id')
      .notNull()
      .references(() => workRecords.id),
    /** the part taken out or worked on, where there is one */
    replaces: uuid('replaces').references(() => parts.id),
    side: varchar('side', { length: 1 }).$type<(typeof sides)[number]>(),
    kind: varchar('kind', { length: 20 }).$type<(typeof partKinds)[number]>(),
    material: varchar('material', { length: 20 }).$type<(typeof materials)[number]>(),
    sizeMm: double('size_mm'),
    marking: varchar('marking', { length: 120 }),
  },
  table => [index('work_parts_record').on(table.workRecordId)],
)

export const workChecks = mysqlTable(
  'work_checks',
  {
    id: uuid('id').primaryKey(),
    workRecordId: uuid('work_record_id')
      .notNull()
      .references(() => workRecords.id),
    by: uuid('by_person_id')
      .notNull()
      .references(() => people.id),
    whoKind: varchar('who_kind', { length: 12 }).$type<(typeof checkerKinds)[number]>().notNull(),
    how: varchar('how', { length: 12 }).$type<(typeof checkMethods)[number]>().notNull(),
    outcome: varchar('outcome', { length: 10 }).$type<'good' | 'returned'>().notNull(),
    words: text('words'),
    at: moment('at').notNull(),
  },
  table => [
    index('work_checks_record').on(table.workRecordId),
    oneOf('work_checks_who', 'who_kind', checkerKinds),
    oneOf('work_checks_how', 'how', checkMethods),
  ],
)

/** Links in mails: random, hashed, expiring; each opens one thing and signs nobody in. */
export const linkTokens = mysqlTable(
  'link_tokens',
  {
    tokenHash: varchar('token_hash', { length: 64 }).primaryKey(),
    purpose: varchar('purpose', { length: 20 }).$type<'report_confirm' | 'offer' | 'sheet'>().notNull(),
    reportId: uuid('report_id').references(() => reports.id),
    offerId: uuid('offer_id').references(() => offers.id),
    orderId: uuid('order_id').references(() => orders.id),
    expiresAt: moment('expires_at'),
    usedAt: moment('used_at'),
    createdAt: moment('created_at').notNull(),
  },
  () => [exactlyOne('link_tokens_of', 'report_id', 'offer_id', 'order_id')],
)
