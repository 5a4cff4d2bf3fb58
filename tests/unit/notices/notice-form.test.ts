import { describe, expect, it } from 'vitest'
import { toNoticeSchema } from '~/notices/notice.schema'
import { parseForm } from '~/web/forms.server'

const filled = {
  kind: 'hazard',
  headline: 'Worn ring',
  words: 'Do not lower from it.',
  decidedByWords: 'Skerrow Access Forum',
  ground: 'worn ring seen by two climbers',
  reviewOn: '2027-07-01',
  endsOn: '',
}

function parse(given: Partial<Record<keyof typeof filled, string>>) {
  const form = new FormData()
  for (const [name, value] of Object.entries({ ...filled, ...given })) form.set(name, value)
  return parseForm(toNoticeSchema('2027-05-02'), form)
}

const errorsOf = (given: Partial<typeof filled>): Record<string, string> => {
  const parsed = parse(given)
  return parsed.ok ? {} : parsed.errors
}

describe('The form of a notice', () => {
  it('takes a notice without a last day', () => {
    expect(parse({})).toMatchObject({ ok: true, value: { kind: 'hazard', reviewOn: '2027-07-01' } })
  })

  it('names every field left empty, each with an example', () => {
    const errors = errorsOf({
      kind: '',
      headline: '',
      words: '',
      decidedByWords: '',
      ground: '',
      reviewOn: '',
    })
    expect(Object.keys(errors).sort()).toEqual(
      ['decidedByWords', 'ground', 'headline', 'kind', 'reviewOn', 'words'].sort(),
    )
    for (const sentence of Object.values(errors)) expect(sentence).toContain('for example')
  })

  it.each([
    ['a kind nobody writes', { kind: 'first_warning' }, 'kind'],
    ['a headline longer than a line', { headline: 'x'.repeat(201) }, 'headline'],
    ['a review that is over', { reviewOn: '2027-05-02' }, 'reviewOn'],
    ['a day the calendar lacks', { reviewOn: '2027-02-30' }, 'reviewOn'],
    ['a last day that is over', { endsOn: '2027-05-01' }, 'endsOn'],
    ['a last day that is none', { endsOn: 'soon' }, 'endsOn'],
  ] as const)('refuses %s and nothing else', (_, given, field) => {
    expect(Object.keys(errorsOf(given as Partial<typeof filled>))).toEqual([field])
  })

  it('gives as an example a day that it takes', () => {
    const { reviewOn } = errorsOf({ reviewOn: '' })
    const [example] = /\d{4}-\d{2}-\d{2}/.exec(reviewOn!)!
    expect(errorsOf({ reviewOn: example, endsOn: example })).toEqual({})
    expect(errorsOf({ reviewOn: '2027-05-02' }).reviewOn).toContain('after 2 May 2027')
  })

  it('takes today as the last day', () => {
    expect(parse({ endsOn: '2027-05-02' }).ok).toBe(true)
  })
})
