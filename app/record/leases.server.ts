import { and, asc, eq, gte, inArray, isNull, lt, lte, or, type SQL, sql } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import type { messages } from '~/db/schema/mail'
import type { jobs } from '~/db/schema/record'
import { inTransaction } from '~/db/transaction.server'
import { leaseLimit, leaseMilliseconds, mostTries, toNextTry } from './lease'

/** What workers share: the tables whose rows are taken under a lease. */
export type LeaseTable = typeof jobs | typeof messages
type Row<T extends LeaseTable> = T['$inferSelect']

/** One worker's hold on rows of a table: `token` is its own, `now` the moment of the change. */
export interface Hold {
  token: string
  now: Date
}

// both tables have the lease's columns under the same names; the query builder's types know one table at a time
const asJobs = (table: LeaseTable) => table as typeof jobs

function isFree(now: Date): (rows: typeof jobs) => SQL | undefined {
  return rows => or(isNull(rows.leaseUntil), lt(rows.leaseUntil, now))
}

/**
 * Takes up to 20 rows that are due and held by nobody, earliest first, for two minutes, counting a try. Two workers
 * never get the same row. A row whose last try ended without a word (its worker was killed) is given up.
 */
export async function takeLeases<T extends LeaseTable>(
  db: Database,
  table: T,
  { token, now }: Hold,
  { kinds, limit = leaseLimit }: { kinds?: string[]; limit?: number } = {},
): Promise<Row<T>[]> {
  const rows = asJobs(table)
  const waiting = and(eq(rows.state, 'waiting'), isFree(now)(rows))
  return await inTransaction(db, async tx => {
    await tx
      .update(rows)
      .set({
        state: 'dead',
        leaseBy: null,
        leaseUntil: null,
        error: 'The worker ended in the middle of the last try.',
      })
      .where(and(waiting, gte(rows.tries, mostTries)))
    await tx
      .update(rows)
      .set({
        leaseBy: token,
        leaseUntil: new Date(now.getTime() + leaseMilliseconds),
        tries: sql`${rows.tries} + 1`,
      })
      .where(and(waiting, lte(rows.dueAt, now), kinds && inArray(rows.kind, kinds)))
      .orderBy(asc(rows.dueAt))
      .limit(limit)
    return (await tx
      .select()
      .from(rows)
      .where(and(eq(rows.leaseBy, token), eq(rows.state, 'waiting')))
      .orderBy(asc(rows.dueAt), asc(rows.id))) as Row<T>[]
  })
}

/** Changes one row if it is still held under the token, and says whether it was. */
async function change(
  db: Database,
  table: LeaseTable,
  id: string,
  token: string,
  values: Record<string, unknown>,
): Promise<boolean> {
  const rows = asJobs(table)
  const [result] = await db
    .update(rows)
    .set(values)
    .where(and(eq(rows.id, id), eq(rows.leaseBy, token), eq(rows.state, 'waiting')))
  return result.affectedRows === 1
}

const free = { leaseBy: null, leaseUntil: null }

/** Holds a row for two more minutes; false when another worker has it by now, and it must be left alone. */
export async function renewLease(
  db: Database,
  table: LeaseTable,
  id: string,
  { token, now }: Hold,
): Promise<boolean> {
  return await change(db, table, id, token, { leaseUntil: new Date(now.getTime() + leaseMilliseconds) })
}

/** Gives a row back untried. */
export async function releaseLease(
  db: Database,
  table: LeaseTable,
  id: string,
  { token }: Hold,
): Promise<boolean> {
  return await change(db, table, id, token, { ...free, tries: sql`${asJobs(table).tries} - 1` })
}

/** Marks a row as done, with further values of its table (`sentAt`). */
export async function finishLease(
  db: Database,
  table: LeaseTable,
  id: string,
  { token }: Hold,
  values: Record<string, unknown> = {},
): Promise<boolean> {
  return await change(db, table, id, token, { ...free, ...values, state: 'done', error: null })
}

/**
 * Puts a failed row off by 1, 5, 25 minutes, 2 and 10 hours; after that, or at once when it is `permanent`, it is
 * dead and waits for a person.
 */
export async function failLease(
  db: Database,
  table: LeaseTable,
  { id, tries }: { id: string; tries: number },
  { token, now }: Hold,
  { error, permanent = false }: { error: string; permanent?: boolean },
): Promise<boolean> {
  const next = permanent ? null : toNextTry(tries, now)
  const fate = next === null ? { state: 'dead' } : { dueAt: next }
  return await change(db, table, id, token, { ...free, ...fate, error: error.slice(0, 2000) })
}
