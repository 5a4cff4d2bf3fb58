import { randomUUID } from 'node:crypto'
import type { Database, Queryable } from '~/db/client.server'
import { jobs } from '~/db/schema/record'
import type { Act } from './act'
import { toAct } from './acts.server'
import { failLease, finishLease, releaseLease, renewLease, takeLeases } from './leases.server'
import type { Step } from './worker.server'

export interface Job {
  kind: string
  /** the same key is never queued twice */
  dedupeKey: string
  params?: Record<string, unknown>
  /** at once when left out */
  dueAt?: Date
}

/** What a kind of job does. It may run more than once, so a second run must change nothing. */
export type JobHandler = (db: Database, act: Act, params: Record<string, unknown>) => Promise<void>

/** Queues a job in the command's transaction, once per key. */
export async function queueJob(tx: Queryable, act: Act, job: Job): Promise<void> {
  await tx
    .insert(jobs)
    .ignore()
    .values({
      id: act.newId(),
      dedupeKey: job.dedupeKey,
      kind: job.kind,
      params: job.params ?? {},
      state: 'waiting',
      dueAt: job.dueAt ?? act.now,
      createdAt: act.now,
    })
}

/** The worker's step that runs jobs by their kind; kinds without a handler here are left to other processes. */
export function jobStep(
  handlers: Record<string, JobHandler>,
  onError: (error: unknown, kind: string) => void,
): Step {
  const kinds = Object.keys(handlers)
  return {
    name: 'jobs',
    async run({ db, clock, stopping }) {
      if (kinds.length === 0) return 0
      const token = randomUUID()
      const taken = await takeLeases(db, jobs, { token, now: clock() }, { kinds })
      for (const job of taken) {
        const hold = { token, now: clock() }
        if (stopping()) await releaseLease(db, jobs, job.id, hold)
        else if (await renewLease(db, jobs, job.id, hold))
          await runJob(db, job, handlers[job.kind]!, token, clock, onError)
      }
      return taken.length
    },
  }
}

async function runJob(
  db: Database,
  job: typeof jobs.$inferSelect,
  handler: JobHandler,
  token: string,
  clock: () => Date,
  onError: (error: unknown, kind: string) => void,
): Promise<void> {
  try {
    await handler(db, toAct(clock(), { kind: 'system', personId: null }), job.params)
  } catch (error) {
    onError(error, job.kind)
    await failLease(db, jobs, job, { token, now: clock() }, { error: String(error) })
    return
  }
  await finishLease(db, jobs, job.id, { token, now: clock() })
}
