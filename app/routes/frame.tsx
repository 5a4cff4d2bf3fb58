import { Outlet, useLocation } from 'react-router'
import { listMenu, toAccount } from '~/people/menu'
import { viewerContext } from '~/people/viewer-context'
import { Bar } from '~/ui/bar'
import { Footer } from '~/ui/footer'
import type { Route } from './+types/frame'

export function loader({ context }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext)
  return { menu: listMenu(viewer), account: toAccount(viewer) }
}

/** The bar above and the caution below every page. */
export default function Frame({ loaderData }: Route.ComponentProps) {
  const { pathname } = useLocation()
  const current = loaderData.menu.findLast(item => item.to === pathname || pathname.startsWith(`${item.to}/`))
  return (
    <>
      <Bar
        items={loaderData.menu}
        current={current?.to ?? toHome(pathname)}
        report
        account={loaderData.account}
      />
      <Outlet />
      {pathname !== '/' && <Footer />}
    </>
  )
}

/** Pages below a crag belong to its entry, though their address begins otherwise. */
function toHome(pathname: string): string {
  if (/^\/(climbs|points)\//.test(pathname)) return '/crags'
  if (/^\/reports\//.test(pathname)) return '/hazards'
  return pathname === '/' ? '/' : ''
}
