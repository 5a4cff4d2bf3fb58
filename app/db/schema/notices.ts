import { boolean, index, int, mysqlTable, primaryKey, text, varchar } from 'drizzle-orm/mysql-core'
import { noticeKinds, noticeStates } from '../../notices/notice'
import { day, exactlyOne, moment, oneOf, stamps, uuid } from '../columns'
import { anchors, areas, climbs, crags, sectors } from './crags'
import { organisations, people } from './people'
import { hazards } from './reports'

export const notices = mysqlTable(
  'notices',
  {
    id: uuid('id').primaryKey(),
    code: varchar('code', { length: 7 }).notNull().unique(),
    organisationId: uuid('organisation_id')
      .notNull()
      .references(() => organisations.id),
    kind: varchar('kind', { length: 20 }).$type<(typeof noticeKinds)[number]>().notNull(),
    state: varchar('state', { length: 10 }).$type<(typeof noticeStates)[number]>().notNull(),
    revision: int('revision').notNull().default(1),
    /** whose decision it is, and on what ground */
    decidedByWords: varchar('decided_by_words', { length: 200 }),
    ground: varchar('ground', { length: 300 }),
    reviewOn: day('review_on'),
    publishedBy: uuid('published_by').references(() => people.id),
    /** an access officer who confirmed a first warning */
    confirmedBy: uuid('confirmed_by').references(() => people.id),
    confirmedAt: moment('confirmed_at'),
    publishedAt: moment('published_at'),
    withdrawnAt: moment('withdrawn_at'),
    withdrawnBy: uuid('withdrawn_by').references(() => people.id),
    /** its hazard is mended: the access officer is asked whether it still stands */
    askedAt: moment('asked_at'),
    ...stamps,
  },
  table => [
    index('notices_state').on(table.state, table.publishedAt),
    oneOf('notices_kind', 'kind', noticeKinds),
    oneOf('notices_state_word', 'state', noticeStates),
  ],
)

export const noticeHazards = mysqlTable(
  'notice_hazards',
  {
    noticeId: uuid('notice_id')
      .notNull()
      .references(() => notices.id),
    hazardId: uuid('hazard_id')
      .notNull()
      .references(() => hazards.id),
  },
  table => [primaryKey({ columns: [table.noticeId, table.hazardId] })],
)

export const noticeRevisions = mysqlTable(
  'notice_revisions',
  {
    noticeId: uuid('notice_id')
      .notNull()
      .references(() => notices.id),
    number: int('number').notNull(),
    headline: varchar('headline', { length: 200 }).notNull(),
    words: text('words').notNull(),
    lang: varchar('lang', { length: 12 }).notNull(),
    startsAt: moment('starts_at').notNull(),
    endsAt: moment('ends_at'),
    /** a first warning also stands while its hazard is open */
    whileOpen: boolean('while_open').notNull(),
    by: uuid('by_person_id').references(() => people.id),
    at: moment('at').notNull(),
  },
  table => [primaryKey({ columns: [table.noticeId, table.number] })],
)

export const noticePlaces = mysqlTable(
  'notice_places',
  {
    id: uuid('id').primaryKey(),
    noticeId: uuid('notice_id')
      .notNull()
      .references(() => notices.id),
    areaId: uuid('area_id').references(() => areas.id),
    cragId: uuid('crag_id').references(() => crags.id),
    sectorId: uuid('sector_id').references(() => sectors.id),
    climbId: uuid('climb_id').references(() => climbs.id),
    anchorId: uuid('anchor_id').references(() => anchors.id),
  },
  table => [
    index('notice_places_notice').on(table.noticeId),
    exactlyOne('notice_places_of', 'area_id', 'crag_id', 'sector_id', 'climb_id', 'anchor_id'),
  ],
)
