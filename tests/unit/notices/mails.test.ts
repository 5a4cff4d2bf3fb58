import { describe, expect, it } from 'vitest'
import { caution } from '~/lib/caution'
import { toReviewMail, toStillTrueMail } from '~/notices/mails'

const told = {
  id: 'n1',
  code: 'KC7FQ2X',
  headline: 'Do not rely on the lower-off of Slack Water, Gannet Wall',
  words: 'Do not rely on the lower-off of Slack Water: it may break.',
  officer: { id: 'p1', email: 'oona@forum.example' },
  appUrl: 'http://127.0.0.1:3000',
}
const asked = (at: string, officer = told.officer) =>
  toStillTrueMail({ ...told, officer, askedAt: new Date(at) })

describe('A mail about a notice', () => {
  it('for review carries the words, the code, the way to it and the caution', () => {
    const mail = toReviewMail(told)
    for (const part of [told.words, 'KC-7FQ2X', 'not reviewed', `${told.appUrl}/notices/KC7FQ2X`, caution])
      expect(mail.text).toContain(part)
    expect(mail.to).toBe('oona@forum.example')
  })

  it('goes out once to each officer for one warning', () => {
    expect(toReviewMail(told).dedupeKey).toBe(toReviewMail(told).dedupeKey)
    const other = { ...told, officer: { id: 'p2', email: 'ned@forum.example' } }
    expect(toReviewMail(other).dedupeKey).not.toBe(toReviewMail(told).dedupeKey)
  })

  it('asks anew whether a notice stands when its hazard is mended a second time', () => {
    expect(asked('2027-05-02T12:00:00Z').dedupeKey).not.toBe(asked('2027-09-02T12:00:00Z').dedupeKey)
    expect(asked('2027-05-02T12:00:00Z').dedupeKey).toBe(asked('2027-05-02T12:00:00Z').dedupeKey)
    expect(asked('2027-05-02T12:00:00Z').text).toContain(caution)
  })
})
