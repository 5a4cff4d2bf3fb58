/**
 * A path of ours to go back to after signing in, or `fallback`: it begins with one slash, so that no address of
 * somebody else's can be handed in, and never leads back to signing in or out.
 */
export function toReturnPath(asked: string | null | undefined, fallback = '/'): string {
  if (!asked?.startsWith('/') || /[\\\p{Cc}]/u.test(asked)) return fallback
  const base = 'http://ours.invalid'
  const url = URL.canParse(asked, base) ? new URL(asked, base) : null
  if (url === null || url.origin !== base || url.pathname.startsWith('//')) return fallback
  if (/^\/sign-(in|out)(\/|\.|$)/.test(url.pathname)) return fallback
  return url.pathname + url.search + url.hash
}

/** The query that carries a way back through signing in; empty when there is none of ours. */
export function toReturnQuery(asked: string | null): string {
  const to = toReturnPath(asked, '')
  return to === '' ? '' : `?${new URLSearchParams({ to })}`
}
