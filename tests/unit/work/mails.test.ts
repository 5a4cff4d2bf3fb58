import { describe, expect, it } from 'vitest'
import { toOfferMail, toProgressMail, toThanksMail } from '~/work/mails'
import { workCaution } from '~/work/words'

const to = { id: 'tam', email: 'tam@keld.example' }
const title = 'Replace ring or link, lower-off of Slack Water, Gannet Wall'

describe('The mail of an offer', () => {
  const mail = toOfferMail({
    ...{ orderId: 'o1', offerId: 'f1', to, title, name: 'Tam', from: 'Keld Rebolters' },
    what: 'Replace the ring.',
    rows: [['Where', 'Lower-off of Slack Water']],
    url: 'https://gear.example.org/offers/abc',
  })

  it('says who asks, what and where, carries the caution and one link', () => {
    for (const words of ['Keld Rebolters', 'Replace the ring.', 'Lower-off of Slack Water', workCaution])
      expect(mail.text).toContain(words)
    expect(mail.text.match(/https?:\/\/\S+/g)).toEqual(['https://gear.example.org/offers/abc'])
  })

  it('is sent once for each offer', () => {
    expect(mail.dedupeKey).toBe('order-offered:f1')
  })
})

describe('A mail about what became of an order', () => {
  const progress = (did: Parameters<typeof toProgressMail>[0]['did'], words: string | null) =>
    toProgressMail({
      orderId: 'o1',
      to,
      title,
      key: 'k',
      who: 'Joss Alder',
      did,
      words,
      url: 'https://x.example',
    })

  it('carries the words that were said', () => {
    expect(progress('returned', 'The link is open.').text).toContain('“The link is open.”')
    expect(progress('done', null).text).not.toContain('“')
  })

  it('names what happened in its subject', () => {
    expect(progress('handed_back', null).subject).toBe(`Joss Alder handed the job back: ${title}`)
    expect(progress('done', null).subject).toBe(`Joss Alder recorded the work as done: ${title}`)
  })
})

describe('The thanks to a reporter', () => {
  const thanks = (fitted: string, picture: { storageKey: string } | null) =>
    toThanksMail({
      ...{ hazardId: 'h1', reportId: 'r1', to: { personId: null, email: 'pia@climbers.example' } },
      ...{ place: 'lower-off of Slack Water, Gannet Wall', statusUrl: 'https://x.example/status/s' },
      ...{ fitted, picture },
    })

  it('shows the picture that goes with it', () => {
    const { html, pictures } = thanks('Ring, titanium, 12 mm', { storageKey: 'abc' })
    expect(pictures).toEqual([{ storageKey: 'abc', contentId: 'work-h1@cragfettle', name: 'mended.jpg' }])
    expect(html).toContain('src="cid:work-h1@cragfettle"')
  })

  it('without a picture promises none', () => {
    const { html, pictures } = thanks('Ring, titanium, 12 mm', null)
    expect(pictures).toEqual([])
    expect(html).not.toContain('cid:')
  })

  it('says what was fitted, or that nothing had to be replaced', () => {
    expect(thanks('Ring, titanium, 12 mm', null).text).toContain('Fitted: Ring, titanium, 12 mm.')
    expect(thanks('', null).text).toContain('Nothing had to be replaced.')
  })
})
