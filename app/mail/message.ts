/** A mail ready to leave: the mail room knows nothing of what it is about. */
export interface Message {
  /** says what the mail is for, as `order-offered` */
  kind: string
  /** the same key is never queued twice */
  dedupeKey: string
  to: string
  personId?: string | null
  /** mails of one thread (a report, an order) hang together in the reader's program */
  thread?: string
  subject: string
  text: string
  html: string
  /** pictures the html shows as `cid:<contentId>` */
  pictures?: { storageKey: string; contentId: string; name: string }[]
}
