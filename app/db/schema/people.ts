import { boolean, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core'
import { roles } from '../../people/role'
import { moment, oneOf, stamps, uuid } from '../columns'

export const people = mysqlTable(
  'people',
  {
    id: uuid('id').primaryKey(),
    name: varchar('name', { length: 120 }).notNull(),
    /** lower case; null when erased */
    email: varchar('email', { length: 254 }),
    emailConfirmedAt: moment('email_confirmed_at'),
    over18: boolean('over_18').notNull().default(false),
    erasedAt: moment('erased_at'),
    ...stamps,
  },
  table => [uniqueIndex('people_email').on(table.email)],
)

export const signInCodes = mysqlTable(
  'sign_in_codes',
  {
    id: uuid('id').primaryKey(),
    email: varchar('email', { length: 254 }).notNull(),
    network: varchar('network', { length: 64 }).notNull(),
    browserHash: varchar('browser_hash', { length: 64 }).notNull(),
    codeHash: varchar('code_hash', { length: 64 }).notNull(),
    tries: int('tries').notNull().default(0),
    expiresAt: moment('expires_at').notNull(),
    usedAt: moment('used_at'),
    createdAt: moment('created_at').notNull(),
  },
  table => [
    index('sign_in_codes_email').on(table.email, table.createdAt),
    index('sign_in_codes_network').on(table.network, table.createdAt),
  ],
)

export const sessions = mysqlTable(
  'sessions',
  {
    tokenHash: varchar('token_hash', { length: 64 }).primaryKey(),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    seenAt: moment('seen_at').notNull(),
    expiresAt: moment('expires_at').notNull(),
    /** when a mailed code last proved the person, for what asks again */
    confirmedAt: moment('confirmed_at').notNull(),
    createdAt: moment('created_at').notNull(),
  },
  table => [index('sessions_person').on(table.personId)],
)

export const organisations = mysqlTable('organisations', {
  id: uuid('id').primaryKey(),
  name: varchar('name', { length: 120 }).notNull().unique(),
  timeZone: varchar('time_zone', { length: 60 }).notNull(),
  currency: varchar('currency', { length: 3 }).notNull(),
  ...stamps,
})

export const memberships = mysqlTable(
  'memberships',
  {
    id: uuid('id').primaryKey(),
    organisationId: uuid('organisation_id')
      .notNull()
      .references(() => organisations.id),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    endedAt: moment('ended_at'),
    ...stamps,
  },
  table => [uniqueIndex('memberships_once').on(table.organisationId, table.personId)],
)

export const membershipRoles = mysqlTable(
  'membership_roles',
  {
    membershipId: uuid('membership_id')
      .notNull()
      .references(() => memberships.id),
    role: varchar('role', { length: 20 }).$type<(typeof roles)[number]>().notNull(),
  },
  table => [primaryKey({ columns: [table.membershipId, table.role] }), oneOf('role', 'role', roles)],
)
