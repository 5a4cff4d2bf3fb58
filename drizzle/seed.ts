import { mkdirSync } from 'node:fs'
import { eq } from 'drizzle-orm'
import { openDatabase } from '../app/db/client.server'
import { messages } from '../app/db/schema/mail'
import { adoptFirstModel } from '../app/rating/models.server'
import { demoAct } from './demo/act'
import { seedLooks } from './demo/looks'
import { accounts, seedPeople } from './demo/people'
import { seedPlaces } from './demo/places'
import { seedReports } from './demo/reports'

/** The people of the demo, as the start command prints them. Sign in with the address; the code comes to the inbox. */
export const demoAccounts = accounts.map(({ name, email, does }) => ({ name, email, does }))

/**
 * Puts the demo in an empty, migrated database through the product's own commands: the same for a given `now`, every
 * date an offset from it. Mails that the past would have sent count as sent.
 */
export async function seed({
  databaseUrl,
  photoDir,
  now,
  onStep = () => {},
}: {
  databaseUrl: string
  photoDir: string
  now: Date
  onStep?: (words: string) => void
}): Promise<{ accounts: typeof demoAccounts }> {
  const { db, close } = openDatabase(databaseUrl)
  mkdirSync(`${photoDir}/incoming`, { recursive: true })
  try {
    const at = demoAct(now)
    await adoptFirstModel(db, at(-400))
    onStep('people and organisations')
    const people = await seedPeople(db, at(-400))
    onStep('crags, routes and fixed points')
    const places = await seedPlaces(db, at(-390), people)
    onStep('checks')
    await seedLooks(db, at, people, places)
    onStep('reports and hazards')
    await seedReports(db, at, people, places, photoDir)
    await db.update(messages).set({ state: 'done', sentAt: now }).where(eq(messages.state, 'waiting'))
    return { accounts: demoAccounts }
  } finally {
    await close()
  }
}
