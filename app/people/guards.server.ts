import { redirect } from 'react-router'
import { log } from '~/web/log.server'
import { forbidden, notFound, unreachable } from '~/web/responses'
import type { Action } from './permission'
import { toRefusal } from './refusal'
import { can, type Subject, type Viewer } from './viewer'

/** The person signed in (503 while the database is away); else throws the way to signing in, which leads back to the page asked for. */
export function requirePerson<V extends Viewer>(
  viewer: V,
  request: Request,
): V & { person: NonNullable<Viewer['person']> } {
  if (viewer.person !== null) return { ...viewer, person: viewer.person }
  if (viewer.away) throw unreachable()
  const url = new URL(request.url)
  // what was sent cannot be sent again by going back, so a form leads back to the page it stands on
  const to = url.pathname.replace(/(\/_root|\/_)?\.data$/, '') || '/'
  const query = new URLSearchParams({ to: to + withoutRouting(url.searchParams) })
  throw redirect(`/sign-in?${query}`)
}

/** The query without what the framework adds to its own requests. */
function withoutRouting(search: URLSearchParams): string {
  const kept = new URLSearchParams(search)
  kept.delete('_routes')
  if (kept.get('index') === '') kept.delete('index')
  return kept.size === 0 ? '' : `?${kept}`
}

/** Goes on when the viewer may; else throws 404 for what they may not even see, 403 with a sentence for the rest. */
export function requireCan(
  viewer: Viewer,
  action: Action,
  subject: Subject,
  { seen }: { seen: boolean },
): void {
  if (can(viewer, action, subject)) return
  if (viewer.away) throw unreachable()
  log.info({ action, person: viewer.person?.id ?? null, seen }, 'refused')
  throw seen ? forbidden(toRefusal(viewer, action)) : notFound()
}
