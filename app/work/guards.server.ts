import { requireCragSubject } from '~/crags/crags.server'
import type { Queryable } from '~/db/client.server'
import { parseCode } from '~/lib/code'
import { requireCan } from '~/people/guards.server'
import type { Viewer } from '~/people/viewer'
import { notFound } from '~/web/responses'
import { findOrder } from './orders.server'
import { toOrderSubject } from './subject'

/** The order of a code as its page's address gives it, and what permission asks about it; another organisation's order throws 404. */
export async function requireOrderOf(db: Queryable, viewer: Viewer, typedCode: string) {
  const code = parseCode(typedCode)
  const order = code === null ? null : await findOrder(db, viewer, code)
  if (order === null) throw notFound('No order of your organisation carries this code.')
  const subject = toOrderSubject(await requireCragSubject(db, order.cragId), order.organisationId)
  requireCan(viewer, 'order:see', subject, { seen: false })
  return { order, subject }
}
