import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import { and, eq, lte } from 'drizzle-orm'
import type { Database } from './db/client.server'
import { anchors } from './db/schema/crags'
import { inTransaction } from './db/transaction.server'
import { toDay } from './lib/dates'
import { mailStep } from './mail/deliveries.server'
import { createSender } from './mail/sender.server'
import { expireNotices } from './notices/expire.server'
import { signInSweep } from './people/sign-in.server'
import { toAct } from './record/acts.server'
import { type Step, startWorker } from './record/worker.server'
import { readMailPicture } from './reports/photo-files.server'
import { sweepStaged } from './reports/photos.server'
import { refreshAnchors } from './reports/refresh.server'
import { log } from './web/log.server'
import type { Settings } from './web/settings'
import { expireOffers } from './work/expire.server'

const system = { kind: 'system', personId: null } as const

/** Runs `step` at most once in so many milliseconds of the process's own time. */
function seldom(milliseconds: number, step: Step): Step {
  let next = 0
  return {
    name: step.name,
    async run(circumstances) {
      if (performance.now() < next) return 0
      const count = await step.run(circumstances)
      if (count === 0) next = performance.now() + milliseconds
      return count
    },
  }
}

/** "No fault seen" that is too old lapses to "Not looked at". */
const lapseStep: Step = {
  name: 'lapse',
  async run({ db, clock }) {
    const now = clock()
    const over = await db
      .select({ id: anchors.id })
      .from(anchors)
      .where(and(eq(anchors.state, 'good'), lte(anchors.lapsesOn, toDay(now, 'UTC'))))
      .limit(50)
    const ids = over.map(row => row.id)
    if (ids.length > 0) await inTransaction(db, tx => refreshAnchors(tx, toAct(now, system), ids))
    return ids.length
  },
}

/** Photos of forms that were never sent go after a day, rows first. */
const sweepStep = (photoDir: string): Step => ({
  name: 'sweep',
  async run({ db, clock }) {
    const keys = await sweepStaged(db, clock())
    for (const key of keys) await rm(join(photoDir, key), { recursive: true, force: true })
    return keys.length
  },
})

/** Offers whose time is over end, and their orders go back to draft when no live offer is left. */
const offersStep = (appUrl: string): Step => ({
  name: 'offers',
  run: async ({ db, clock }) => await expireOffers(db, toAct(clock(), system), appUrl),
})

/** Notices that reach their end: what they warned of is open again. */
const noticesStep: Step = {
  name: 'notices',
  run: async ({ db, clock }) => await expireNotices(db, toAct(clock(), system)),
}

/** Everything done by the clock or after a command: mails, lapses, offers and notices that run out, sweeping. */
export function startWork(given: { db: Database; settings: Settings; clock: () => Date }) {
  const { db, settings, clock } = given
  const sender = createSender({
    smtpUrl: settings.smtpUrl,
    mailFrom: settings.mailFrom,
    readPicture: key => readMailPicture(settings.photoDir, key),
  })
  const minute = 60_000
  const worker = startWorker({
    db,
    clock,
    steps: [
      mailStep(sender, failure => log.warn(failure, 'a mail could not leave')),
      seldom(minute, offersStep(settings.appUrl)),
      seldom(minute, noticesStep),
      seldom(minute, lapseStep),
      seldom(10 * minute, sweepStep(settings.photoDir)),
      seldom(60 * minute, signInSweep),
    ],
    onError: (error, step) =>
      log.warn({ err: error, step }, 'the worker could not do a step; it tries again'),
  })
  return {
    wake: worker.wake,
    lastPass: worker.lastPass,
    async stop() {
      await worker.stop()
      sender.close()
    },
  }
}
