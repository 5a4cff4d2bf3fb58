import type { Material, PartKind } from '~/crags/part'
import type { Database, Queryable } from '~/db/client.server'
import { orderHazards, orderParts, orders } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { formatCode, toCode } from '~/lib/code'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hazardStateWords } from '~/reports/hazard'
import { type Hazard, listHazardsById } from '~/reports/hazards.server'
import { findConsentFault } from './consent'
import type { JobKind } from './job'
import { lockHazards } from './lock.server'
import { orderStateWords } from './order'
import { findLiveOrder } from './orders.server'

export interface NewOrder {
  hazardId: string
  organisationId: string
  kind: JobKind
  what: string
  aimOn: string | null
  /** why work goes on although consent is unknown */
  consentReason: string | null
  parts: { kind: PartKind; material: Material; sizeMm: number | null; quantity: number }[]
}

/** Why a hazard takes no order now, whatever the form says, or null. */
export async function findObstacle(db: Queryable, hazard: Hazard): Promise<string | null> {
  if (hazard.state !== 'open' && hazard.state !== 'warned')
    return `This hazard is ${hazardStateWords[hazard.state]} now, so no order is needed for it.`
  const live = await findLiveOrder(db, hazard.id)
  if (live !== null)
    return `Order ${formatCode(live.code)} stands for this hazard already and is ${orderStateWords[live.state]}. Go on with that one.`
  return hazard.consent === 'disputed' ? findConsentFault(hazard.consent, null) : null
}

/**
 * Makes an order to clear one open hazard that no other order stands for. Refused while the owner disputes work there;
 * where consent is not known a written reason is asked, which prints on the sheet.
 */
export async function makeOrder(db: Database, { act, ...order }: NewOrder & { act: Act }) {
  return await inCommand(db, async tx => {
    await lockHazards(tx, [order.hazardId])
    const [hazard] = await listHazardsById(tx, [order.hazardId])
    if (hazard === undefined) throw new Refusal('This hazard is no longer on record.')
    const obstacle = await findObstacle(tx, hazard)
    if (obstacle !== null) throw new Refusal(obstacle)
    const fault = findConsentFault(hazard.consent, order.consentReason)
    if (fault !== null) throw new Refusal(fault)
    const id = act.newId()
    const code = toCode(hazard.areaCode, act.random)
    await tx.insert(orders).values({
      id,
      code,
      organisationId: order.organisationId,
      cragId: hazard.cragId,
      climbId: hazard.climbId,
      kind: order.kind,
      state: 'draft',
      aimOn: order.aimOn,
      what: order.what,
      consentReason: order.consentReason,
      madeBy: act.by.personId,
      createdAt: act.now,
      updatedAt: act.now,
    })
    await tx.insert(orderHazards).values({ orderId: id, hazardId: hazard.id })
    for (const part of order.parts)
      await tx.insert(orderParts).values({ id: act.newId(), orderId: id, ...part })
    await writeActivity(tx, act, {
      verb: 'made',
      subjectKind: 'order',
      subjectId: id,
      cragId: hazard.cragId,
    })
    return { code }
  })
}
