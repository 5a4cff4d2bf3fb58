import type { ComponentProps, ReactNode } from 'react'
import { Link } from 'react-router'

type Kind = 'action' | 'quiet' | 'danger'

/** A button with a verb on it; while its form is on the way it says so and cannot be pressed again. */
export function Button({
  kind = 'action',
  pending,
  children,
  className = '',
  ...rest
}: { kind?: Kind; pending?: boolean } & ComponentProps<'button'>) {
  return (
    <button type="submit" className={`btn btn-${kind} ${className}`} disabled={pending} {...rest}>
      {pending ? 'One moment …' : children}
    </button>
  )
}

/** A link that leads to doing something, drawn as a button. */
export function ButtonLink({
  to,
  kind = 'action',
  children,
}: {
  to: string
  kind?: Kind
  children: ReactNode
}) {
  return (
    <Link to={to} className={`btn btn-${kind}`}>
      {children}
    </Link>
  )
}
