import { Link } from 'react-router'
import { formatCode } from '~/lib/code'
import { groupBy } from '~/lib/group-by'
import { requireCan, requirePerson } from '~/people/guards.server'
import { viewerContext } from '~/people/viewer-context'
import { Empty } from '~/ui/empty'
import { Page } from '~/ui/page'
import { formatDay } from '~/ui/when'
import { databaseContext } from '~/web/context'
import { orderStates, orderStateWords } from '~/work/order'
import { listOrders } from '~/work/orders.server'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [{ title: 'Work · Cragfettle' }]

export async function loader({ request, context }: Route.LoaderArgs) {
  const viewer = requirePerson(context.get(viewerContext), request)
  requireCan(viewer, 'order:see', {}, { seen: true })
  const orders = await listOrders(context.get(databaseContext), viewer)
  const byState = groupBy(orders, order => order.state)
  return {
    count: orders.filter(order => order.state !== 'closed' && order.state !== 'cancelled').length,
    states: orderStates.flatMap(state => {
      const list = byState.get(state)
      return list === undefined
        ? []
        : [{ state, orders: list.map(({ code, title, aimOn }) => ({ code, title, aimOn })) }]
    }),
  }
}

/** The ledger of work: orders under their state. */
export default function Orders({ loaderData }: Route.ComponentProps) {
  return (
    <Page
      small
      title="Work"
      lead={`${loaderData.count} ${loaderData.count === 1 ? 'order' : 'orders'} under way`}
    >
      {loaderData.states.length === 0 && (
        <Empty title="No order yet">
          Orders to mend hazards stand here under their state. A coordinator makes one from a hazard’s page.
        </Empty>
      )}
      {loaderData.states.map(({ state, orders }) => (
        <section key={state} className="mt-7">
          <h2 className="border-b border-slate pb-1 text-1 font-semibold">
            {orderStateWords[state].charAt(0).toUpperCase() + orderStateWords[state].slice(1)}
          </h2>
          <ul>
            {orders.map(order => (
              <li
                key={order.code}
                className="flex flex-wrap justify-between gap-x-6 border-b border-rule py-3"
              >
                <Link to={`/orders/${order.code}`} className="plain-link font-medium">
                  {order.title}
                </Link>
                <span className="text-stone">
                  {`${order.aimOn ? `by ${formatDay(order.aimOn)}, ` : ''}${formatCode(order.code)}`}
                </span>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </Page>
  )
}
