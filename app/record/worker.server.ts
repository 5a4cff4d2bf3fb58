import type { Database } from '~/db/client.server'

/** One thing the worker does each time round. */
export interface Step {
  name: string
  /** Does what is due and gives how much that was. It must soon come to an end once `stopping()` is true. */
  run(circumstances: { db: Database; clock: () => Date; stopping: () => boolean }): Promise<number>
}

export interface Worker {
  /** Lets the step under way finish, then ends. */
  stop(): Promise<void>
  /** Goes round now rather than at the end of the pause. */
  wake(): void
  /** When the worker last came round with every step in order, or null. */
  lastPass(): Date | null
}

const pause = 1_000
const longestPause = 15_000

/**
 * Runs the steps over and over, at once again while there is something to do, else after a second. A step that
 * fails (the database is away) is told to `onError` once, until it works again; meanwhile the pauses grow to 15 s.
 */
export function startWorker({
  db,
  steps,
  clock,
  onError,
}: {
  db: Database
  steps: Step[]
  clock: () => Date
  onError: (error: unknown, step: string) => void
}): Worker {
  let stopping = false
  let passed: Date | null = null
  let failures = 0
  const failing = new Set<string>()
  const sleeper = createSleeper()

  async function runStep(step: Step): Promise<number> {
    try {
      const count = await step.run({ db, clock, stopping: () => stopping })
      failing.delete(step.name)
      return count
    } catch (error) {
      if (!failing.has(step.name)) onError(error, step.name)
      failing.add(step.name)
      return 0
    }
  }

  async function goRound(): Promise<number> {
    let count = 0
    for (const step of steps) {
      if (!stopping) count += await runStep(step)
    }
    failures = failing.size === 0 ? 0 : failures + 1
    if (failing.size === 0) passed = clock()
    return count
  }

  async function loop(): Promise<void> {
    while (!stopping) {
      const count = await goRound()
      if (!stopping && (count === 0 || failures > 0)) {
        await sleeper.sleep(Math.min(longestPause, pause * 2 ** Math.min(failures, 10)))
      }
    }
  }

  const running = loop()
  return {
    wake: sleeper.wake,
    lastPass: () => passed,
    stop: async () => {
      stopping = true
      sleeper.wake()
      await running
    },
  }
}

/** A sleep that can be cut short; a wake while nobody sleeps cuts short the next one. */
function createSleeper() {
  let wakeNow: (() => void) | null = null
  let woken = false
  return {
    wake() {
      woken = true
      wakeNow?.()
    },
    async sleep(milliseconds: number) {
      if (!woken) {
        await new Promise<void>(resolve => {
          const timer = setTimeout(resolve, milliseconds)
          wakeNow = () => {
            clearTimeout(timer)
            resolve()
          }
        })
      }
      woken = false
      wakeNow = null
    },
  }
}
