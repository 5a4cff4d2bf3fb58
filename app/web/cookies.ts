/** The cookie of somebody signed in, and the one of a browser nobody signed in on: codes and staged photos hang on it. */
export const sessionCookie = '__Host-session'
export const guestCookie = '__Host-guest'

const ours = [sessionCookie, guestCookie] as const
type CookieName = (typeof ours)[number]

// a cookie outlives its session, whose end the database decides; browsers keep none for longer than 400 days
const keptSeconds = 400 * 24 * 60 * 60
const attributes = 'Path=/; Secure; HttpOnly; SameSite=Lax'
const secret = /^[A-Za-z0-9_-]{43}$/

/** The secret under a cookie's name in a `Cookie` header, or null when it is absent or not one of ours. */
export function findCookie(header: string | null | undefined, name: CookieName): string | null {
  for (const pair of (header ?? '').split(';')) {
    const [key, value] = pair.trim().split('=', 2)
    if (key === name && value !== undefined && secret.test(value)) return value
  }
  return null
}

/** Whether a request carries a cookie of ours under any value, so that it may act for somebody. */
export function hasOurCookie(header: string | null | undefined): boolean {
  return (header ?? '').split(';').some(pair => ours.includes(pair.trim().split('=', 1)[0] as CookieName))
}

/** The `Set-Cookie` line that gives a browser its secret. */
export function toSetCookie(name: CookieName, value: string): string {
  return `${name}=${value}; ${attributes}; Max-Age=${keptSeconds}`
}

/** The `Set-Cookie` line that takes the secret away. */
export function toClearCookie(name: CookieName): string {
  return `${name}=; ${attributes}; Max-Age=0`
}
