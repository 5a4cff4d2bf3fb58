import type { ReactNode } from 'react'
import {
  isRouteErrorResponse,
  Links,
  Meta,
  Outlet,
  Scripts,
  ScrollRestoration,
  useRouteError,
  useRouteLoaderData,
} from 'react-router'
import './app.css'
import type { Route } from './+types/root'
import { Bar } from './ui/bar'
import { Footer } from './ui/footer'
import { KeptForm } from './ui/kept-form'
import { Problem } from './ui/problem'
import { nonceContext } from './web/context'
import { toProblem } from './web/problem'

export const links: Route.LinksFunction = () => [
  { rel: 'icon', href: '/favicon.svg', type: 'image/svg+xml' },
  { rel: 'manifest', href: '/site.webmanifest' },
]

export function loader({ context }: Route.LoaderArgs) {
  return { nonce: context.get(nonceContext) }
}

/** The document around every page. */
export function Layout({ children }: { children: ReactNode }) {
  const nonce = useRouteLoaderData<typeof loader>('root')?.nonce
  return (
    <html lang="en">
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="theme-color" content="#fdfbf6" media="(prefers-color-scheme: light)" />
        <meta name="theme-color" content="#172124" media="(prefers-color-scheme: dark)" />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration nonce={nonce} />
        <Scripts nonce={nonce} />
      </body>
    </html>
  )
}

export default function App() {
  return <Outlet />
}

/** The honest error page: what happened, what to do, and the form that was being sent, where there was one. */
export function ErrorBoundary() {
  const error = useRouteError()
  const problem = toProblem(isRouteErrorResponse(error) ? error : null)
  return (
    <>
      <title>{`${problem.title} · Cragfettle`}</title>
      <Bar
        items={[
          { to: '/', label: 'Map' },
          { to: '/crags', label: 'Crags' },
        ]}
        current=""
        report
        account={null}
      />
      <Problem status={problem.status} title={problem.title} words={problem.words}>
        {problem.typed && <KeptForm typed={problem.typed} />}
      </Problem>
      <Footer />
    </>
  )
}
