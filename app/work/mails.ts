import { renderMail } from '~/mail/layout'
import type { Message } from '~/mail/message'
import { workCaution } from './words'

interface To {
  id: string
  email: string
}

interface OrderMail {
  orderId: string
  to: To
  /** "Replace ring or link, lower-off of Slack Water, Gannet Wall" */
  title: string
}

const addressed = ({ orderId, to }: OrderMail) => ({
  to: to.email,
  personId: to.id,
  thread: `order-${orderId}`,
})

/** The offer of a job: what, where, by when, and one link where it is accepted or declined. */
export function toOfferMail(
  mail: OrderMail & {
    offerId: string
    name: string
    from: string
    what: string
    rows: [string, string][]
    url: string
  },
): Message {
  return {
    kind: 'order-offered',
    dedupeKey: `order-offered:${mail.offerId}`,
    ...addressed(mail),
    subject: `A job for you? ${mail.title}`,
    ...renderMail({
      heading: `${mail.name}, can you do this job?`,
      paragraphs: [`${mail.from} offers you: ${mail.title}.`, mail.what, workCaution],
      table: { rows: mail.rows },
      button: { words: 'See the job, accept or decline', url: mail.url },
      footer: ['The link speaks for you and opens this offer only. Do not pass it on.'],
    }),
  }
}

/** To the worker who accepted: the sheet, until the job ends. */
export function toSheetMail(
  mail: OrderMail & { offerId: string; rows: [string, string][]; url: string },
): Message {
  return {
    kind: 'order-sheet',
    dedupeKey: `order-sheet:${mail.offerId}`,
    ...addressed(mail),
    subject: `Your job sheet: ${mail.title}`,
    ...renderMail({
      heading: 'Thank you. The job is yours',
      paragraphs: [
        'The sheet below can be printed and works on paper. When it is done, record it from there.',
        workCaution,
      ],
      table: { rows: mail.rows },
      button: { words: 'Open the job sheet', url: mail.url },
    }),
  }
}

const said = {
  accepted: 'accepted the job',
  declined: 'declined the job',
  expired: 'did not answer in time',
  handed_back: 'handed the job back',
  done: 'recorded the work as done; it waits for a check by somebody else',
  checked: 'checked the work; it can be closed',
  returned: 'returned the work',
} as const

/** To the coordinator who made the order, or a worker: what somebody did with it. */
export function toProgressMail(
  mail: OrderMail & { key: string; who: string; did: keyof typeof said; words: string | null; url: string },
): Message {
  return {
    kind: `order-${mail.did.replace('_', '-')}`,
    dedupeKey: `order-${mail.did}:${mail.key}:${mail.to.id}`,
    ...addressed(mail),
    subject: `${mail.who} ${said[mail.did].split(';')[0]}: ${mail.title}`,
    ...renderMail({
      heading: `${mail.who} ${said[mail.did]}`,
      paragraphs: [mail.title, ...(mail.words ? [`“${mail.words}”`] : [])],
      button: { words: 'Open the order', url: mail.url },
    }),
  }
}

/** To those who could check: work waits for somebody who did not do it. */
export function toCheckDueMail(mail: OrderMail & { recordId: string; url: string }): Message {
  return {
    kind: 'order-check-due',
    dedupeKey: `order-check-due:${mail.recordId}:${mail.to.id}`,
    ...addressed(mail),
    subject: `Check due: ${mail.title}`,
    ...renderMail({
      heading: 'Work waits for a check',
      paragraphs: [mail.title, 'Somebody who did not do it looks at it, best on the rope, and says how.'],
      button: { words: 'Open the order', url: mail.url },
    }),
  }
}

/** To whoever had an offer or the job, when the order is cancelled. */
export function toCancelledMail(mail: OrderMail & { key: string }): Message {
  return {
    kind: 'order-cancelled',
    dedupeKey: `order-cancelled:${mail.key}:${mail.to.id}`,
    ...addressed(mail),
    subject: `No longer needed: ${mail.title}`,
    ...renderMail({
      heading: 'The job is no longer needed',
      paragraphs: [mail.title, 'Nothing is asked of you any more. Thank you for being there.'],
    }),
  }
}

/** To who reported a hazard: it is mended, with a picture where there is one. The fitter is not named. */
export function toThanksMail(mail: {
  hazardId: string
  reportId: string
  to: { personId: string | null; email: string }
  /** "lower-off of Slack Water, Gannet Wall" */
  place: string
  fitted: string
  statusUrl: string
  picture: { storageKey: string } | null
}): Message {
  const contentId = `work-${mail.hazardId}@cragfettle`
  return {
    kind: 'hazard-mended',
    dedupeKey: `hazard-mended:${mail.hazardId}:${mail.reportId}`,
    to: mail.to.email,
    personId: mail.to.personId,
    thread: `report-${mail.reportId}`,
    subject: `Mended: the ${mail.place}`,
    ...renderMail({
      heading: `The ${mail.place} is mended`,
      paragraphs: [
        'You told us about it. It has been mended by volunteers and checked by somebody who did not do the work. Thank you.',
        mail.fitted === '' ? 'Nothing had to be replaced.' : `Fitted: ${mail.fitted}.`,
      ],
      ...(mail.picture === null ? {} : { picture: { contentId, alt: `The ${mail.place} after the work` } }),
      button: { words: 'See what became of your report', url: mail.statusUrl },
    }),
    pictures:
      mail.picture === null ? [] : [{ storageKey: mail.picture.storageKey, contentId, name: 'mended.jpg' }],
  }
}
