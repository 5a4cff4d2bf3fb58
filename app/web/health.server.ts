import { access } from 'node:fs/promises'
import { sql } from 'drizzle-orm'
import type { RequestHandler } from 'express'
import type { Database } from '~/db/client.server'

/** `/healthz`: the process is up. */
export const answerHealth: RequestHandler = (_, response) => {
  response.set('Cache-Control', 'no-store').json({ up: true })
}

const patience = 2_000
const workerSilence = 60_000

async function isAnswering(db: Database): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined
  const tooLong = new Promise<false>(resolve => {
    timer = setTimeout(resolve, patience, false)
  })
  const answered = db.execute(sql`select 1`).then(
    () => true,
    () => false,
  )
  return await Promise.race([answered, tooLong]).finally(() => clearTimeout(timer))
}

/**
 * `/readyz`: 200 when the database answers within two seconds, the worker went round in the last minute and the
 * ground's file is there; else 503 naming what is missing. `lastPass` gives null where no worker runs here.
 */
export function answerReadiness({
  db,
  lastPass,
  groundFile,
  clock = () => new Date(),
}: {
  db: Database
  lastPass: (() => Date | null) | null
  groundFile: string
  clock?: () => Date
}): RequestHandler {
  return async (_, response) => {
    const passed = lastPass?.()
    const worker =
      lastPass === null || (passed != null && clock().getTime() - passed.getTime() < workerSilence)
    const [database, ground] = await Promise.all([
      isAnswering(db),
      access(groundFile).then(
        () => true,
        () => false,
      ),
    ])
    const ready = database && worker && ground
    response
      .status(ready ? 200 : 503)
      .set('Cache-Control', 'no-store')
      .json({ ready, database, worker, ground })
  }
}
