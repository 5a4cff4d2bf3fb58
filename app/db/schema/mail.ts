import { index, int, json, mysqlTable, text, varchar } from 'drizzle-orm/mysql-core'
import { leaseStates } from '../../record/activity'
import { moment, oneOf, uuid } from '../columns'
import { people } from './people'

/** The outbox: mails are written with what they tell, and leave by the worker under a fixed Message-ID. */
export const messages = mysqlTable(
  'messages',
  {
    id: uuid('id').primaryKey(),
    dedupeKey: varchar('dedupe_key', { length: 160 }).notNull().unique(),
    messageId: varchar('message_id', { length: 200 }).notNull().unique(),
    kind: varchar('kind', { length: 40 }).notNull(),
    toEmail: varchar('to_email', { length: 254 }).notNull(),
    personId: uuid('person_id').references(() => people.id),
    thread: varchar('thread', { length: 200 }),
    subject: varchar('subject', { length: 300 }).notNull(),
    text: text('text'),
    html: text('html'),
    /** pictures shown in the mail: storage keys and content ids */
    parts: json('parts').$type<{ storageKey: string; contentId: string; name: string }[]>().notNull(),
    state: varchar('state', { length: 10 }).$type<(typeof leaseStates)[number]>().notNull(),
    dueAt: moment('due_at').notNull(),
    tries: int('tries').notNull().default(0),
    leaseBy: varchar('lease_by', { length: 40 }),
    leaseUntil: moment('lease_until'),
    error: text('error'),
    sentAt: moment('sent_at'),
    createdAt: moment('created_at').notNull(),
  },
  table => [
    index('messages_due').on(table.state, table.dueAt),
    oneOf('messages_state', 'state', leaseStates),
  ],
)
