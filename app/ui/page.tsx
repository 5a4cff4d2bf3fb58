import type { ReactNode } from 'react'
import { Link } from 'react-router'

interface Crumb {
  label: string
  to?: string
}

/** A page: where it stands, its name, a quiet line beside it, and its content. */
export function Page(props: {
  title: string
  lead?: string
  crumbs?: Crumb[]
  /** a list's heading rather than a place's name */
  small?: boolean
  children: ReactNode
}) {
  const { title, lead, crumbs = [], small, children } = props
  return (
    <main id="content" className="mx-auto max-w-[1280px] px-4 pt-[26px] pb-12 md:px-12">
      {crumbs.length > 0 && (
        <nav aria-label="Where this is" className="text-s text-stone">
          {crumbs.map((crumb, index) => (
            <span key={crumb.label}>
              {index > 0 && ' / '}
              {crumb.to ? (
                <Link to={crumb.to} className="text-stone no-underline hover:underline">
                  {crumb.label}
                </Link>
              ) : (
                crumb.label
              )}
            </span>
          ))}
        </nav>
      )}
      <div className="mt-1.5 flex flex-wrap items-baseline gap-x-[18px] gap-y-1">
        <h1 className={`font-semibold ${small ? 'text-2' : 'text-3'}`}>{title}</h1>
        {lead && <span className="text-stone">{lead}</span>}
      </div>
      {children}
    </main>
  )
}
