import { can, type Viewer } from './viewer'

/** The entries of the bar for who looks: the public's, or a coordinator's with hazards and work. */
export function listMenu(viewer: Viewer): { to: string; label: string }[] {
  const work = can(viewer, 'order:see')
  const danger = can(viewer, 'urgency:see')
  return [
    { to: '/', label: 'Map' },
    ...(danger ? [{ to: '/hazards', label: 'Hazards' }] : []),
    ...(work ? [{ to: '/orders', label: 'Work' }] : []),
    { to: '/notices', label: 'Notices' },
    { to: '/crags', label: 'Crags' },
    ...(danger || work ? [] : [{ to: '/about', label: 'About the record' }]),
  ]
}

/** How the bar names who looks: the organisation, the person, or the way to sign in. */
export function toAccount(viewer: Viewer): { to: string; label: string } {
  if (viewer.person === null) return { to: '/sign-in', label: 'Sign in' }
  return { to: '/account', label: viewer.memberships[0]?.organisationName ?? viewer.person.name }
}
