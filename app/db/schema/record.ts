import { bigint, boolean, index, int, json, mysqlTable, text, varchar } from 'drizzle-orm/mysql-core'
import { actorKinds, leaseStates, subjectKinds } from '../../record/activity'
import { moment, oneOf, uuid } from '../columns'

/** One line for every move; append-only by the database's grants, but `details` may be erased. */
export const activities = mysqlTable(
  'activities',
  {
    id: uuid('id').primaryKey(),
    at: moment('at').notNull(),
    organisationId: uuid('organisation_id'),
    cragId: uuid('crag_id'),
    byPersonId: uuid('by_person_id'),
    byKind: varchar('by_kind', { length: 10 }).$type<(typeof actorKinds)[number]>().notNull(),
    verb: varchar('verb', { length: 40 }).notNull(),
    subjectKind: varchar('subject_kind', { length: 20 }).$type<(typeof subjectKinds)[number]>().notNull(),
    subjectId: uuid('subject_id').notNull(),
    public: boolean('public').notNull(),
    details: json('details').$type<Record<string, unknown>>(),
  },
  table => [
    index('activities_subject').on(table.subjectKind, table.subjectId, table.at),
    index('activities_crag').on(table.cragId, table.at),
    oneOf('activities_by', 'by_kind', actorKinds),
    oneOf('activities_of', 'subject_kind', subjectKinds),
  ],
)

export const jobs = mysqlTable(
  'jobs',
  {
    id: uuid('id').primaryKey(),
    dedupeKey: varchar('dedupe_key', { length: 120 }).notNull().unique(),
    kind: varchar('kind', { length: 40 }).notNull(),
    params: json('params').$type<Record<string, unknown>>().notNull(),
    state: varchar('state', { length: 10 }).$type<(typeof leaseStates)[number]>().notNull(),
    dueAt: moment('due_at').notNull(),
    tries: int('tries').notNull().default(0),
    leaseBy: varchar('lease_by', { length: 40 }),
    leaseUntil: moment('lease_until'),
    error: text('error'),
    createdAt: moment('created_at').notNull(),
  },
  table => [index('jobs_due').on(table.state, table.dueAt), oneOf('jobs_state', 'state', leaseStates)],
)

/** The upload limiter's table (its library's shape), migrated like all others. */
export const rateLimits = mysqlTable('rate_limits', {
  key: varchar('key', { length: 255 }).primaryKey(),
  points: int('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number', unsigned: true }),
})
