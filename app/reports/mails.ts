import { renderMail } from '~/mail/layout'
import type { Message } from '~/mail/message'

/** Where a report's mails point, and what they speak of. */
export interface ReportMail {
  reportId: string
  to: string
  personId: string | null
  /** "the lower-off on Slack Water, Gannet Wall" */
  place: string
  found: string
  statusUrl: string
}

const thread = (reportId: string) => `report-${reportId}`

const addressed = (mail: ReportMail) => ({
  to: mail.to,
  personId: mail.personId,
  thread: thread(mail.reportId),
})

/** To who reported, on receipt; a guest is asked to confirm the address in the same mail. */
export function toReceivedMail(mail: ReportMail & { confirmUrl: string | null }): Message {
  const confirm =
    mail.confirmUrl === null
      ? []
      : ['Please confirm that this address is yours, so that we can tell you what becomes of it.']
  return {
    kind: 'report-received',
    dedupeKey: `report-received:${mail.reportId}`,
    ...addressed(mail),
    subject: `Received: ${mail.place}`,
    ...renderMail({
      heading: 'Thank you, your report is here',
      paragraphs: [
        `You told us about ${mail.place}: ${mail.found}.`,
        'A coordinator looks at it and decides what happens next. The page below shows how far it is; the link is yours alone.',
        ...confirm,
      ],
      button:
        mail.confirmUrl === null
          ? { words: 'See your report', url: mail.statusUrl }
          : { words: 'Confirm this address', url: mail.confirmUrl },
      footer: mail.confirmUrl === null ? [] : [`Your report: ${mail.statusUrl}`],
    }),
  }
}

/** To who reported, when a coordinator has decided. */
export function toDecidedMail(
  mail: ReportMail & { verb: 'taken_in' | 'on_record' | 'declined' | 'needs_detail'; words: string | null },
): Message {
  const told = {
    taken_in: {
      subject: 'Taken in',
      heading: 'Your report was taken in',
      words: 'It stands in the list of hazards now, and you hear from us when it is mended.',
    },
    on_record: {
      subject: 'On record',
      heading: 'Your report is on record',
      words: 'Nothing has to be mended for now; the next person who looks there will know.',
    },
    declined: {
      subject: 'Not taken in',
      heading: 'Your report was not taken in',
      words: 'It stays where it is, with the reason, but nothing follows from it.',
    },
    needs_detail: {
      subject: 'A question',
      heading: 'A question about your report',
      words: 'Answer on the page below; no account is needed.',
    },
  }[mail.verb]
  return {
    kind: `report-${mail.verb.replace('_', '-')}`,
    dedupeKey:
      `report-${mail.verb}:${mail.reportId}${mail.verb === 'needs_detail' ? `:${mail.words}` : ''}`.slice(
        0,
        160,
      ),
    ...addressed(mail),
    subject: `${told.subject}: ${mail.place}`,
    ...renderMail({
      heading: told.heading,
      paragraphs: [
        `You told us about ${mail.place}: ${mail.found}.`,
        ...(mail.words ? [`“${mail.words}”`] : []),
        told.words,
      ],
      button: { words: mail.verb === 'needs_detail' ? 'Answer' : 'See your report', url: mail.statusUrl },
    }),
  }
}

/** To the coordinator on duty, at once, when a report's provisional urgency is "Mend first". */
export function toDutyMail(mail: {
  reportId: string
  to: string
  personId: string
  place: string
  found: string
  confirmed: boolean
  url: string
}): Message {
  return {
    kind: 'report-duty',
    dedupeKey: `report-duty:${mail.reportId}:${mail.personId}`,
    to: mail.to,
    personId: mail.personId,
    thread: thread(mail.reportId),
    subject: `Mend first? ${mail.place}`,
    ...renderMail({
      heading: 'A new report comes out as Mend first',
      paragraphs: [
        `${mail.place}: ${mail.found}.`,
        mail.confirmed
          ? 'It is provisional: worked out from what the reporter gave, before anybody looked.'
          : 'It is provisional, and the guest who sent it has not confirmed an address yet.',
        'Nothing is public until you take it in.',
      ],
      button: { words: 'Open the report', url: mail.url },
    }),
  }
}
