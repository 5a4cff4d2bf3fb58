import type { Database, Transaction } from './client.server'

const deadlock = 1213
const lockTimeout = 1205

/** The database's error number behind an error of the query builder, or null. */
export function findErrorNumber(error: unknown): number | null {
  for (let at = error; at instanceof Error; at = at.cause) {
    const number = (at as { errno?: unknown }).errno
    if (typeof number === 'number') return number
  }
  return null
}

/** Whether an error is a second row under a UNIQUE key. */
export function isDuplicate(error: unknown): boolean {
  return findErrorNumber(error) === 1062
}

/**
 * Runs `work` in one READ COMMITTED transaction and gives its result; an error rolls all of it back. A deadlock
 * or a lock wait is tried again, up to three times, so `work` must do nothing that the rollback does not undo.
 */
export async function inTransaction<T>(db: Database, work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries++) {
    try {
      return await db.transaction(work, { isolationLevel: 'read committed' })
    } catch (error) {
      const number = findErrorNumber(error)
      if (tries > 3 || (number !== deadlock && number !== lockTimeout)) throw error
      await new Promise(resolve => setTimeout(resolve, 10 * tries * Math.random()))
    }
  }
}

/** Thrown inside a transaction to undo it and answer the person with a sentence (409). */
export class Refusal extends Error {
  override name = 'Refusal'
}

/** `inTransaction` for commands: a `Refusal` becomes `{ ok: false, reason }`, everything of it undone. */
export async function inCommand<T extends object>(
  db: Database,
  work: (tx: Transaction) => Promise<T>,
): Promise<({ ok: true } & T) | { ok: false; reason: string }> {
  try {
    return { ok: true, ...(await inTransaction(db, work)) }
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, reason: error.message }
    throw error
  }
}
