import {
  type IRateLimiterStoreNoAutoExpiryOptions,
  RateLimiterMemory,
  RateLimiterMySQL,
  RateLimiterRes,
} from 'rate-limiter-flexible'
import type { Database } from '~/db/client.server'

/** How often: per network (many people may share one) and per browser. */
const allowances = {
  report: { network: 60, browser: 20, seconds: 3600, what: 'reports' },
  upload: { network: 240, browser: 80, seconds: 3600, what: 'photos' },
} as const
export type Limited = keyof typeof allowances

export type LimitAnswer = { ok: true } | { ok: false; reason: string; retryAfter: number }

export interface Limits {
  /** Counts one more and says whether it may be done; `retryAfter` in seconds. The hashes are of network and browser. */
  take(limited: Limited, by: { network: string; browser: string | null }): Promise<LimitAnswer>
}

/** The pool below the query builder with callbacks, which is what the limiter speaks. */
function findPool(db: Database): unknown {
  return (db as unknown as { $client: { pool: unknown } }).$client.pool
}

/**
 * Limits counted in the database, so that they hold over all processes; while it is away each process counts by
 * itself. `dbName` is the database's name.
 */
export function createLimits({ db, dbName }: { db: Database; dbName: string }): Limits {
  const toLimiter = (limited: Limited, by: 'network' | 'browser') => {
    const { [by]: points, seconds } = allowances[limited]
    const options = { keyPrefix: `${limited}-${by}`, points, duration: seconds }
    return new RateLimiterMySQL({
      ...options,
      storeClient: findPool(db),
      storeType: 'pool',
      dbName,
      tableName: 'rate_limits',
      tableCreated: true,
      insuranceLimiter: new RateLimiterMemory(options),
    } as IRateLimiterStoreNoAutoExpiryOptions)
  }
  const limiters = {
    report: { network: toLimiter('report', 'network'), browser: toLimiter('report', 'browser') },
    upload: { network: toLimiter('upload', 'network'), browser: toLimiter('upload', 'browser') },
  }
  return {
    async take(limited, { network, browser }) {
      try {
        if (browser !== null) await limiters[limited].browser.consume(browser)
        await limiters[limited].network.consume(network)
        return { ok: true }
      } catch (error) {
        if (error instanceof RateLimiterRes) return toAnswer(limited, error.msBeforeNext)
        throw error
      }
    },
  }
}

function toAnswer(limited: Limited, milliseconds: number): LimitAnswer {
  const retryAfter = Math.max(1, Math.ceil(milliseconds / 1000))
  const minutes = Math.ceil(retryAfter / 60)
  const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`
  const { what } = allowances[limited]
  return {
    ok: false,
    retryAfter,
    reason: `More ${what} came from here in an hour than we take. Nothing was lost that was already sent. Try again in ${wait}.`,
  }
}
