import { Link } from 'react-router'
import { findClimbById } from '~/crags/climbs.server'
import { Line } from '~/crags/components/line'
import { findConsent } from '~/crags/crags.server'
import { formatGearShort } from '~/crags/part-words'
import { formatCode } from '~/lib/code'
import { toDay } from '~/lib/dates'
import { toDrawnPoint, toZones } from '~/reports/drawn-line'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import { notFound } from '~/web/responses'
import { Fact, JobFacts } from '~/work/components/job-facts'
import { WorkCaution } from '~/work/components/work-caution'
import { orderStateWords } from '~/work/order'
import { listNeededParts } from '~/work/order-details.server'
import { findOrderById } from '~/work/orders.server'
import { mostRows } from '~/work/part-rows'
import { findSheetOrder } from '~/work/sheets.server'
import { recordLabels } from '~/work/words'
import type { Route } from './+types/$token'

export const meta: Route.MetaFunction = () => [
  { title: 'Job sheet · Cragfettle' },
  { name: 'robots', content: 'noindex' },
]

export async function loader({ params, context }: Route.LoaderArgs) {
  const db = context.get(databaseContext)
  const now = context.get(clockContext)()
  const orderId = await findSheetOrder(db, params.token, now)
  const order = orderId === null ? null : await findOrderById(db, orderId)
  if (order === null) throw notFound('This link opens no job sheet. Use the whole link from the mail.')
  if (order.state !== 'accepted')
    throw notFound(
      `This sheet was for as long as the job went on. The order is ${orderStateWords[order.state]} now.`,
    )
  const [hazard] = order.hazards
  const today = toDay(now, order.timeZone)
  const climb = hazard?.climbId == null ? null : await findClimbById(db, hazard.climbId, today)
  return {
    order: {
      code: order.code,
      title: order.title,
      cragName: order.cragName,
      approach: order.approach,
      aimOn: order.aimOn,
      what: order.what,
      consentReason: order.consentReason,
      hazards: order.hazards.map(({ code, headline, position, climbName, alongM }) => ({
        code,
        headline,
        position,
        climbName,
        alongM,
      })),
    },
    needed: await listNeededParts(db, order.id),
    consent: (await findConsent(db, order.cragId))?.conditions ?? null,
    line:
      climb === null
        ? null
        : {
            lengthM: climb.lengthM,
            ledges: climb.ledges,
            ground: climb.points[0]?.below ?? ('ground' as const),
            zones: toZones(climb),
            points: climb.points.map(point => toDrawnPoint(point, formatGearShort(point.parts))),
            at: hazard?.anchorCode ?? undefined,
          },
  }
}

/** The boxes of the record's form, to be written by hand: those of each part it needs. */
function toBlanks(parts: number): string[] {
  const { doneOn, minutes, kind, material, sizeMm, replaces, marking, words, noPhotoReason } = recordLabels
  const part = [kind, material, sizeMm, replaces, marking]
  const rows = Array.from({ length: Math.min(parts, mostRows) }, (_, index) =>
    part.map(word => (parts === 1 ? word : `Part ${index + 1}: ${word.toLowerCase()}`)),
  )
  return [doneOn, minutes, ...rows.flat(), words, 'Photo taken', noPhotoReason]
}

/** The sheet of an accepted job: to print, to take along, to write on; it changes nothing. */
export default function Sheet({ loaderData }: Route.ComponentProps) {
  const { order, needed, consent, line } = loaderData
  const pieces = needed.reduce((sum, part) => sum + part.quantity, 0)
  return (
    <Page title={order.title} lead={`Job sheet, ${formatCode(order.code)}`}>
      <JobFacts job={order} needed={needed} consent={consent} />
      <WorkCaution />
      {line && (
        <div className="mt-6">
          <Line {...line} selected={line.at} href={code => `/points/${code}`} />
        </div>
      )}
      <h2 className="mt-8 text-1 font-semibold">To fill in</h2>
      <dl className="mt-2 max-w-[68ch] border-b border-rule">
        {toBlanks(Math.max(1, pieces)).map(word => (
          <Fact key={word} word={word}>
            <span className="block h-6" />
          </Fact>
        ))}
      </dl>
      <p className="no-print mt-6">
        <Link to={`/orders/${order.code}/record`}>Record the work</Link>, when it is done. You sign in with a
        code that is mailed to you.
      </p>
    </Page>
  )
}
