import { formatCode } from '~/lib/code'
import { renderMail } from '~/mail/layout'
import type { Message } from '~/mail/message'

interface Officer {
  id: string
  email: string
}

interface Told {
  id: string
  code: string
  headline: string
  words: string
  officer: Officer
  appUrl: string
}

/** To an access officer: a coordinator has published a first warning, which wants a look. */
export function toReviewMail({ id, code, headline, words, officer, appUrl }: Told): Message {
  return {
    kind: 'warning-review',
    dedupeKey: `warning-review:${id}:${officer.id}`,
    to: officer.email,
    personId: officer.id,
    thread: `notice-${id}`,
    subject: `First warning published: ${headline}`,
    ...renderMail({
      heading: 'A first warning was published',
      paragraphs: [
        words,
        `It stands for seven days and while its hazard is open. Until you confirm it, it is marked “not reviewed” (${formatCode(code)}). Its page also leads to writing a notice in other words, which takes its place.`,
      ],
      button: { words: 'Confirm, revise or withdraw it', url: `${appUrl}/notices/${code}` },
    }),
  }
}

/** To an access officer: what a notice warns of is mended; does it still stand? Asked once each time that happens. */
export function toStillTrueMail(told: Omit<Told, 'words'> & { askedAt: Date }): Message {
  const { id, code, headline, officer, appUrl, askedAt } = told
  return {
    kind: 'notice-still-true',
    dedupeKey: `notice-still-true:${id}:${officer.id}:${askedAt.getTime()}`,
    to: officer.email,
    personId: officer.id,
    thread: `notice-${id}`,
    subject: `Does it still stand? ${headline}`,
    ...renderMail({
      heading: 'What this notice warns of has been mended',
      paragraphs: [
        headline,
        'The work is done and checked. Please withdraw the notice, or leave it if there is another reason for it.',
      ],
      button: { words: 'Open the notice', url: `${appUrl}/notices/${code}` },
    }),
  }
}
