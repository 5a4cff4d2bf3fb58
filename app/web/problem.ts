import type { Typed } from './responses'

export interface ProblemWords {
  status: number
  title: string
  words: string
  /** what was being sent when it failed, to be sent again */
  typed: Typed | null
}

const known: Record<number, Pick<ProblemWords, 'title' | 'words'>> = {
  403: { title: 'Not open to you', words: 'You may see this, but not do it.' },
  404: {
    title: 'Nothing here',
    words: 'There is nothing at this address, or it is not open to you. Look it up by name or tag code.',
  },
  405: { title: 'That cannot be sent here', words: 'Open the page and use its form.' },
  409: {
    title: 'It has moved on',
    words: 'Somebody else was here first. Open it again to see what happened.',
  },
  429: { title: 'Too many at once', words: 'Wait a little and try again.' },
  503: {
    title: 'The record cannot be reached just now',
    words: 'Nothing was saved. It comes back by itself; try again in a minute.',
  },
}

const ours = {
  title: 'Something went wrong here',
  words: 'It is our fault, and it is written down. Nothing was saved. Go back and try again.',
}

/** What an error page says, from the answer a loader or action threw; null is a fault of ours. */
export function toProblem(answer: { status: number; data: unknown } | null): ProblemWords {
  if (answer === null) return { status: 500, ...ours, typed: null }
  const given = typeof answer.data === 'object' && answer.data !== null ? answer.data : {}
  const { reason, typed } = given as { reason?: string; typed?: Typed }
  const words = known[answer.status] ?? ours
  return { status: answer.status, ...words, words: reason ?? words.words, typed: typed ?? null }
}
