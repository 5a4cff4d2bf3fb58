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
        `It stands for seven days and while its hazard is open. Until you confirm it, it is marked “not reviewed” (${formatCode(code)}).`,
      ],
      button: { words: 'Confirm or withdraw it', url: `${appUrl}/notices/${code}` },
    }),
  }
}

/** To an access officer: what a notice warns of is mended; does it still stand? */
export function toStillTrueMail({ id, code, headline, officer, appUrl }: Omit<Told, 'words'>): Message {
  return {
    kind: 'notice-still-true',
    dedupeKey: `notice-still-true:${id}:${officer.id}`,
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
