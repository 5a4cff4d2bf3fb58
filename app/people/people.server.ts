import { and, eq, isNull } from 'drizzle-orm'
import type { Database } from '~/db/client.server'
import { people } from '~/db/schema/people'
import { inTransaction } from '~/db/transaction.server'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'

/** Changes what a person says about themselves. The activity line says that, not what. */
export async function editPerson(
  db: Database,
  act: Act,
  personId: string,
  { name, over18 }: { name: string; over18: boolean },
): Promise<void> {
  await inTransaction(db, async tx => {
    await tx
      .update(people)
      .set({ name, over18, updatedAt: act.now })
      .where(and(eq(people.id, personId), isNull(people.erasedAt)))
    await writeActivity(tx, act, { verb: 'account-edited', subjectKind: 'person', subjectId: personId })
  })
}
