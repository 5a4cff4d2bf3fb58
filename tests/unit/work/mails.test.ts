import { describe, expect, it } from 'vitest'
import { caution } from '~/lib/caution'
import {
  toCancelledMail,
  toCheckDueMail,
  toOfferMail,
  toProgressMail,
  toSheetMail,
  toThanksMail,
} from '~/work/mails'

const to = { id: 'tam', email: 'tam@keld.example' }
const title = 'Replace ring or link, lower-off of Slack Water, Gannet Wall'
const url = 'http://127.0.0.1:3000/somewhere'
const order = { orderId: 'o1', to, title }
const rows: [string, string][] = [['Where', 'Lower-off of Slack Water, Gannet Wall']]
const progress = { ...order, key: 'k', who: 'Tam Ridley', did: 'declined' as const, words: 'Away.', url }
const thanks = {
  hazardId: 'h1',
  reportId: 'r1',
  to: { personId: null, email: 'guest@climbers.example' },
  place: 'lower-off of Slack Water, Gannet Wall',
  fitted: 'Ring, titanium, 12 mm',
  statusUrl: url,
  picture: { storageKey: 'abc' },
}
const offer = toOfferMail({
  ...order,
  offerId: 'f1',
  name: 'Tam Ridley',
  from: 'Keld Rebolters',
  what: 'Replace the ring <today> & look at the chain.',
  rows,
  url,
})
const all = {
  offer,
  sheet: toSheetMail({ ...order, offerId: 'f1', rows, url }),
  progress: toProgressMail(progress),
  'check due': toCheckDueMail({ ...order, recordId: 'w1', url }),
  cancelled: toCancelledMail({ ...order, key: 'o1' }),
  thanks: toThanksMail(thanks),
}

describe.each(Object.entries(all))('The mail of %s', (_name, mail) => {
  it('carries the caution in both of its parts and its link in the plain one', () => {
    for (const part of [mail.text, mail.html]) expect(part).toContain(caution)
    if (mail.kind !== 'order-cancelled') expect(mail.text).toContain(url)
  })

  it('never says that gear is safe', () => {
    expect(`${mail.subject} ${mail.text}`).not.toMatch(/\b(un)?safe/i)
  })
})

describe('The mail of an offer', () => {
  it('names who offers, the place, and that the link speaks for its reader', () => {
    for (const words of ['Keld Rebolters offers you', rows[0]![1], 'speaks for you'])
      expect(offer.text).toContain(words)
  })

  it('shows what a coordinator typed as text, never as markup', () => {
    expect(offer.html).toContain('&lt;today&gt; &amp;')
    expect(offer.html).not.toContain('<today>')
  })
})

describe('Mails about a job', () => {
  it('of different events to one person are never taken for the same one', () => {
    const keys = (
      ['accepted', 'declined', 'expired', 'handed_back', 'done', 'checked', 'returned'] as const
    ).map(did => toProgressMail({ ...progress, did }).dedupeKey)
    expect(new Set(keys).size).toBe(keys.length)
  })

  it('leave out a word that was not given', () => {
    expect(toProgressMail(progress).text).toContain('“Away.”')
    expect(toProgressMail({ ...progress, words: null }).text).not.toContain('“')
  })
})

describe('The thanks to who reported', () => {
  it('say what was fitted and bring the picture by its content id', () => {
    const mail = all.thanks
    expect(mail.text).toContain('Fitted: Ring, titanium, 12 mm.')
    expect(mail.html).toContain(`cid:${mail.pictures![0]!.contentId}`)
  })

  it('without a picture have none, and without a new part say that none was needed', () => {
    const mail = toThanksMail({ ...thanks, picture: null, fitted: '' })
    expect(mail.pictures).toEqual([])
    expect(mail.html).not.toContain('<img')
    expect(mail.text).toContain('Nothing had to be replaced.')
  })
})
