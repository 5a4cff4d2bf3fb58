import type { Database } from '../../app/db/client.server'
import { inTransaction } from '../../app/db/transaction.server'
import { addDays } from '../../app/lib/dates'
import { recordCheck } from '../../app/reports/checks.server'
import { refreshAnchors } from '../../app/reports/refresh.server'
import type { DemoAct } from './act'
import type { DemoPeople } from './people'
import type { DemoPlaces } from './places'

/** Routes nobody has looked at lately, and single bolts that were passed over. */
const unseen = new Set(['Undertow', 'Slate Wages'])
const passedOver: Record<string, number[]> = { 'Slack Water': [7], Neap: [4] }

/** The spring's checks: rebolters looked at most of what is there, some on it, some from the rope. */
export async function seedLooks(
  db: Database,
  at: DemoAct,
  people: DemoPeople,
  places: DemoPlaces,
): Promise<void> {
  for (const [index, climb] of [...places.values()].entries()) {
    if (unseen.has(climb.name)) continue
    const checker = climb.cragName === 'Gannet Wall' ? people.person.joss! : people.person.wyn!
    const act = at(-60 - index, { personId: checker.id })
    const seenOn = addDays(act.now.toISOString().slice(0, 10), 0)
    const points = [...climb.bolts, climb.lowerOff].filter(
      (_, bolt) => !passedOver[climb.name]?.includes(bolt + 1),
    )
    await inTransaction(db, async tx => {
      for (const [bolt, point] of points.entries())
        await recordCheck(tx, act, {
          cragId: climb.cragId,
          climbId: climb.id,
          anchorId: point.id,
          personId: checker.id,
          seenOn,
          howSeen: bolt % 5 === 4 ? 'on_the_rope' : 'on_it',
        })
      await refreshAnchors(
        tx,
        act,
        points.map(point => point.id),
      )
    })
  }
  const left = [...places.values()].filter(climb => unseen.has(climb.name))
  await inTransaction(db, tx =>
    refreshAnchors(
      tx,
      at(-60),
      left.flatMap(climb => [...climb.bolts, climb.lowerOff].map(point => point.id)),
    ),
  )
}
