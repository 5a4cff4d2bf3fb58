import type { Material, PartKind } from '~/crags/part'
import type { Database } from '~/db/client.server'
import { orderHazards, orderParts, orders } from '~/db/schema/work'
import { inCommand, Refusal } from '~/db/transaction.server'
import { toCode } from '~/lib/code'
import type { Act } from '~/record/act'
import { writeActivity } from '~/record/activities.server'
import { hazardStateWords } from '~/reports/hazard'
import { listHazardsById } from '~/reports/hazards.server'
import type { JobKind } from './job'
import { lockAnchors } from './orders.server'

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

/**
 * Makes an order to clear one open hazard. Refused while the owner disputes work there; where consent is not known a
 * written reason is asked, which prints on the sheet.
 */
export async function makeOrder(db: Database, { act, ...order }: NewOrder & { act: Act }) {
  return await inCommand(db, async tx => {
    const [found] = await listHazardsById(tx, [order.hazardId])
    if (found === undefined) throw new Refusal('This hazard is no longer on record.')
    await lockAnchors(tx, [found])
    const [hazard] = await listHazardsById(tx, [order.hazardId])
    if (hazard!.state !== 'open' && hazard!.state !== 'warned')
      throw new Refusal(
        `This hazard is ${hazardStateWords[hazard!.state]} now, so no order is needed for it.`,
      )
    if (hazard!.consent === 'disputed')
      throw new Refusal(
        'The owner disputes work at this crag, so no order can be made until that is settled.',
      )
    if (hazard!.consent === 'unknown' && order.consentReason === null)
      throw new Refusal(
        'Whether the owner consents is not known here. Give a reason why the work goes on; it prints on the sheet.',
      )
    const id = act.newId()
    const code = toCode(hazard!.areaCode, act.random)
    await tx.insert(orders).values({
      id,
      code,
      organisationId: order.organisationId,
      cragId: hazard!.cragId,
      climbId: hazard!.climbId,
      kind: order.kind,
      state: 'draft',
      aimOn: order.aimOn,
      what: order.what,
      consentReason: order.consentReason,
      madeBy: act.by.personId,
      createdAt: act.now,
      updatedAt: act.now,
    })
    await tx.insert(orderHazards).values({ orderId: id, hazardId: hazard!.id })
    for (const part of order.parts)
      await tx.insert(orderParts).values({ id: act.newId(), orderId: id, ...part })
    await writeActivity(tx, act, {
      verb: 'made',
      subjectKind: 'order',
      subjectId: id,
      cragId: hazard!.cragId,
    })
    return { code }
  })
}
