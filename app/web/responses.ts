import { data } from 'react-router'

export type Typed = Record<string, string | string[]>

/** What an action answers when it did not do what was asked: the one shape every form reads. */
export interface FormAnswer {
  /** a sentence by field name */
  errors: Record<string, string>
  /** what was typed, to stand in the form again */
  typed: Typed
  /** why the whole was refused */
  reason?: string
}

const answer = (status: number, body: FormAnswer) => data(body, { status })

/** 400: these fields cannot be taken as they are. */
export function invalid({ errors, typed }: { errors: Record<string, string>; typed: Typed }) {
  return answer(400, { errors, typed })
}

/** 409: the fields are right, but the thing has moved on; the sentence says why. */
export function refuse(reason: string, typed: Typed = {}) {
  return answer(409, { errors: {}, typed, reason })
}

/** 429: too often; the sentence says when to try again, `retryAfter` in seconds. */
export function tooMany(reason: string, retryAfter: number, typed: Typed = {}) {
  const headers = { 'Retry-After': String(retryAfter) }
  return data<FormAnswer>({ errors: {}, typed, reason }, { status: 429, headers })
}

export const awaySentence =
  'The record cannot be reached just now, so nothing was saved. What you typed is still here: send it again in a minute.'

/** To be thrown: what the whole page answers when there is nothing to show, with a sentence in `data.reason`. */
export function notFound(reason = 'There is nothing here, or it is not open to you.') {
  return data({ reason }, { status: 404 })
}

/** To be thrown: seen, but not allowed. */
export function forbidden(reason: string) {
  return data({ reason }, { status: 403 })
}

/** To be thrown: the database is away, so that nothing can be said or done. */
export function unreachable() {
  return data({ reason: awaySentence }, { status: 503 })
}
