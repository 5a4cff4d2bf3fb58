import { importBuilt } from '../../app/commands/build.mjs'

/*
 * One task of the built product in a process of its own, told as a message: `serve` until the process is ended,
 * `seed` an empty database, or `grant` the app its rights. Answers with `{ done }` or `{ failed }`.
 */

/** @param {any} answer */
const answer = answer => process.send?.(answer)

const tasks = {
  /** @param {any} settings */
  async serve(settings) {
    const { serve } = await importBuilt('index')
    const { url, close } = await serve(settings)
    process.once('SIGTERM', () => close().then(() => process.exit(0)))
    return url
  },
  /** @param {{ ownerUrl: string, appUser: string, photoDir: string, now: string }} given */
  async seed({ ownerUrl, appUser, photoDir, now }) {
    const { migrateDatabase, grantApp } = await importBuilt('index')
    const { seed } = await importBuilt('seed')
    await migrateDatabase({ ownerUrl })
    await grantApp({ ownerUrl, appUser })
    await seed({ databaseUrl: ownerUrl, photoDir, now: new Date(now) })
  },
  /** @param {{ ownerUrl: string, appUser: string }} given */
  async grant(given) {
    const { grantApp } = await importBuilt('index')
    await grantApp(given)
  },
}

process.once('message', async (/** @type {{ task: keyof typeof tasks, given: any }} */ { task, given }) => {
  try {
    answer({ done: (await tasks[task](given)) ?? true })
    if (task !== 'serve') process.exit(0)
  } catch (error) {
    answer({ failed: error instanceof Error ? (error.stack ?? error.message) : String(error) })
  }
})
// whoever started this is gone: nobody will end it
process.once('disconnect', () => process.exit(0))
