import { Link } from 'react-router'
import { Strip } from '~/crags/components/strip'
import { toDay } from '~/lib/dates'
import { requireCan, requirePerson } from '~/people/guards.server'
import { viewerContext } from '~/people/viewer-context'
import { Urgency } from '~/rating/components/band-word'
import { formatTwoDigits } from '~/rating/figures'
import { type DangerRow, listDanger } from '~/reports/danger-list.server'
import { Empty } from '~/ui/empty'
import { Page } from '~/ui/page'
import { formatDayShort } from '~/ui/when'
import { clockContext, databaseContext } from '~/web/context'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [
  { title: 'Hazards · Cragfettle' },
  { name: 'description', content: 'New reports and open hazards in one list, most dangerous first.' },
]

export async function loader({ request, context }: Route.LoaderArgs) {
  const viewer = requirePerson(context.get(viewerContext), request)
  requireCan(viewer, 'urgency:see', {}, { seen: true })
  const rows = await listDanger(
    context.get(databaseContext),
    viewer,
    toDay(context.get(clockContext)(), 'UTC'),
  )
  return { rows }
}

export default function Hazards({ loaderData }: Route.ComponentProps) {
  const { rows } = loaderData
  const open = rows.filter(row => row.kind === 'hazard')
  const fresh = rows.length - open.length
  const bare = open.filter(row => row.order === null).length
  const lead = [
    `${open.length} open`,
    `${bare} without an order`,
    fresh > 0 ? `${fresh} new ${fresh === 1 ? 'report' : 'reports'}` : '',
  ]
  return (
    <Page title="Hazards, most dangerous first" lead={lead.filter(Boolean).join(', ')} small>
      {rows.length === 0 ? (
        <Empty title="Nothing to decide, nothing open">
          New reports and open hazards of your crags stand here, most dangerous first. Climbers send them from
          a crag’s page or the button above; you can report something yourself the same way.
        </Empty>
      ) : (
        <table className="ruled hazards mt-4">
          <thead>
            <tr>
              <th scope="col">Where</th>
              <th scope="col">What</th>
              <th scope="col">The line</th>
              <th scope="col">Urgency</th>
              <th scope="col">Danger, × a usual one</th>
              <th scope="col">Seen by</th>
              <th scope="col">Order</th>
            </tr>
          </thead>
          <tbody>
            {rows.map(row => (
              <Row key={row.id} row={row} />
            ))}
          </tbody>
        </table>
      )}
    </Page>
  )
}

const toAddress = (row: DangerRow) => (row.kind === 'hazard' ? `/hazards/${row.code}` : `/reports/${row.id}`)

function Row({ row }: { row: DangerRow }) {
  const top = row.line.at(-1)?.alongM ?? 1
  return (
    <tr>
      <td data-label="Where">
        <Link to={toAddress(row)} className="plain-link font-medium">
          {row.climbName ?? row.cragName}
        </Link>
        <br />
        <span className="text-s text-stone">{row.cragName}</span>
      </td>
      <td data-label="What">
        {row.what}
        {row.kind === 'report' && (
          <span className="text-s text-stone">
            {row.state === 'needs_detail'
              ? ' (new, asked for detail)'
              : ` (new${row.confirmed ? '' : ', address not confirmed'})`}
          </span>
        )}
      </td>
      <td data-label="The line">
        <Strip
          points={row.line.map(point => ({
            along: point.alongM / top,
            state: point.state,
            current: point.code === row.anchorCode,
          }))}
        />
      </td>
      <td data-label="Urgency">
        <span>
          {row.band !== null && row.bandHigh !== null ? (
            <Urgency band={row.band} bandHigh={row.bandHigh} small />
          ) : (
            <span className="text-stone">not rated</span>
          )}
        </span>
      </td>
      <td data-label="Danger, × a usual one">
        {row.danger === null ? (
          <span className="text-stone">none</span>
        ) : (
          <span>
            {formatTwoDigits(row.danger.times)}{' '}
            <span className="text-stone">{`${formatTwoDigits(row.danger.low)} to ${formatTwoDigits(row.danger.high)}`}</span>
          </span>
        )}
      </td>
      <td data-label="Seen by" className="text-stone">
        {row.lastSeen === null
          ? row.seenBy
          : `${row.seenBy}, ${row.seenBy > 1 ? 'last ' : ''}${formatDayShort(row.lastSeen)}`}
      </td>
      <td data-label="Order">
        <OrderCell row={row} />
      </td>
    </tr>
  )
}

function OrderCell({ row }: { row: DangerRow }) {
  if (row.kind === 'report')
    return (
      <Link to={toAddress(row)} className="font-medium text-verdigris no-underline hover:underline">
        Decide
      </Link>
    )
  if (row.order === null)
    return (
      <Link
        to={`/orders/new?hazard=${row.code}`}
        className="font-medium text-verdigris no-underline hover:underline"
      >
        Make order
      </Link>
    )
  return (
    <Link to={`/orders/${row.order.code}`} className="plain-link">
      {row.order.state}
    </Link>
  )
}
