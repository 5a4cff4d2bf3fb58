import { findConsent } from '~/crags/crags.server'
import { formatPart } from '~/crags/part'
import type { Queryable, Transaction } from '~/db/client.server'
import { queueMail } from '~/mail/outbox.server'
import type { Act } from '~/record/act'
import { formatDay } from '~/ui/when'
import { toProgressMail } from './mails'
import { listNeededParts } from './order-details.server'
import type { Order } from './orders.server'
import { findAddress } from './workers.server'

const formatLines = (lines: string[]) => (lines.length === 0 ? null : lines.join('\n'))

/** The facts of a job as rows of word and value, for mails. */
export async function listJobRows(db: Queryable, order: Order): Promise<[string, string][]> {
  const parts = await listNeededParts(db, order.id)
  const consent = await findConsent(db, order.cragId)
  const places = order.hazards.map(
    hazard => `${hazard.position ?? 'Somewhere'} of ${hazard.climbName ?? order.cragName}, ${order.cragName}`,
  )
  const rows: [string, string | null][] = [
    ['Where', formatLines(places) ?? order.cragName],
    ['What is wrong', formatLines(order.hazards.map(hazard => hazard.headline))],
    ['By', order.aimOn === null ? null : formatDay(order.aimOn)],
    ['Parts', formatLines(parts.map(part => `${part.quantity} × ${formatPart(part)}`))],
    ['Way there', order.approach],
    ['Owner’s conditions', consent?.conditions ?? null],
    ['Consent not known', order.consentReason],
  ]
  return rows.filter((row): row is [string, string] => row[1] !== null)
}

/** Tells whoever made an order what became of it. */
export async function tellMaker(
  tx: Transaction,
  act: Act,
  order: Order,
  told: {
    key: string
    who: string
    did: Parameters<typeof toProgressMail>[0]['did']
    words: string | null
    appUrl: string
  },
): Promise<void> {
  const to = await findAddress(tx, order.madeBy)
  if (to === null) return
  const { appUrl, ...rest } = told
  const url = `${appUrl}/orders/${order.code}`
  await queueMail(tx, act, toProgressMail({ orderId: order.id, to, title: order.title, url, ...rest }))
}
