import { Authenticator } from 'remix-auth'
import { Strategy } from 'remix-auth/strategy'
import type { Database } from '~/db/client.server'
import type { Act } from '~/record/act'
import { hashSecret } from '~/record/acts.server'
import { findCookie, guestCookie, sessionCookie } from '~/web/cookies'
import { parseForm, readForm } from '~/web/forms.server'
import { CodeForm } from './sign-in.schema'
import { type SignedIn, type SignInAnswer, signInByCode } from './sign-in.server'

interface TypedCode {
  code: string
  browserHash: string
  sessionHash: string | null
}

/** Thrown when a code does not sign in: a sentence for the code's field. */
export class CodeRefused extends Error {
  override name = 'CodeRefused'
}

/** Signing in by a mailed code: the form's `code`, bound to the browser by its own cookie. */
export class CodeStrategy extends Strategy<SignedIn, TypedCode> {
  name = 'code'

  async authenticate(request: Request): Promise<SignedIn> {
    const cookies = request.headers.get('cookie')
    const parsed = parseForm(CodeForm, await readForm(request))
    if (!parsed.ok) throw new CodeRefused(parsed.errors.code)
    const browser = findCookie(cookies, guestCookie)
    if (browser === null) {
      throw new CodeRefused('A code works only in the browser that asked for it. Ask for a new one here.')
    }
    const session = findCookie(cookies, sessionCookie)
    return await this.verify({
      code: parsed.value.code,
      browserHash: hashSecret(browser),
      sessionHash: session && hashSecret(session),
    })
  }
}

function orRefuse(answer: SignInAnswer): SignedIn {
  if (!answer.ok) throw new CodeRefused(answer.reason)
  return answer
}

/** The ways to sign in, for one request. */
export function createAuthenticator({ db, act, appSecret }: { db: Database; act: Act; appSecret: string }) {
  return new Authenticator<SignedIn>().use(
    new CodeStrategy(async typed => orRefuse(await signInByCode(db, act, typed, appSecret))),
  )
}
