import { Link } from 'react-router'
import { toSlug } from '~/lib/code'
import { formatBy, toLabel } from '~/notices/components/notice-bands'
import { mostNotices, noticesInForce } from '~/notices/notices.server'
import { viewerContext } from '~/people/viewer-context'
import { Empty } from '~/ui/empty'
import { Page } from '~/ui/page'
import { clockContext, databaseContext } from '~/web/context'
import type { Route } from './+types/index'

export const meta: Route.MetaFunction = () => [
  { title: 'Notices · Cragfettle' },
  { name: 'description', content: 'Warnings and closures in force on the crags of this record.' },
]

export async function loader({ context }: Route.LoaderArgs) {
  const now = context.get(clockContext)()
  const notices = await noticesInForce(context.get(databaseContext), context.get(viewerContext), { now })
  return {
    notices,
    lead:
      notices.length < mostNotices
        ? `${notices.length} in force`
        : `the ${mostNotices} strongest of those in force`,
  }
}

export default function Notices({ loaderData: { notices, lead } }: Route.ComponentProps) {
  return (
    <Page title="Notices" lead={notices.length === 0 ? undefined : lead}>
      {notices.length === 0 ? (
        <Empty title="No notice is in force">
          Warnings of gear not to rely on, works and closures stand here while they hold. Their absence says
          nothing about any fixed gear: look before you trust it.
        </Empty>
      ) : (
        <ul className="mt-6 border-b border-rule">
          {notices.map(notice => (
            <li
              key={notice.code}
              className="grid gap-x-8 gap-y-1 border-t border-rule py-4 md:grid-cols-[10rem_1fr]"
            >
              <span className={notice.kind === 'works' ? 'font-semibold' : 'font-semibold text-oxide'}>
                {toLabel(notice)}
              </span>
              <div>
                <Link to={`/notices/${notice.code}`} className="font-medium text-slate">
                  {notice.headline}
                </Link>
                <p className="max-w-[62ch] whitespace-pre-line" lang={notice.lang}>
                  {notice.words}
                </p>
                <p className="text-s text-stone">
                  <Link to={`/crags/${toSlug(notice.cragName, notice.cragCode)}`} className="text-stone">
                    {notice.cragName}
                  </Link>
                  {`, ${formatBy(notice, notice.timeZone)}`}
                </p>
              </div>
            </li>
          ))}
        </ul>
      )}
    </Page>
  )
}
