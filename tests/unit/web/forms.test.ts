import { expect, test } from 'vitest'
import { z } from 'zod'
import { choiceField, dayField, emailField, numberField, textField, tickField } from '~/web/fields.server'
import { cleanText, parseForm, readForm, toTyped } from '~/web/forms.server'

function form(values: [string, string | Blob][]): FormData {
  const data = new FormData()
  for (const [name, value] of values) data.append(name, value)
  return data
}

const Schema = z.object({
  words: textField({ what: 'what you saw', example: 'ring worn to half', max: 20, lines: true }),
  name: textField({ what: 'your name', example: 'Mara Quill', max: 12 }).optional(),
  wear: numberField({ what: 'the wear', example: '4.5', min: 0, max: 30, unit: 'mm' }).optional(),
})

test('a form in order gives its values', () => {
  const parsed = parseForm(
    Schema,
    form([
      ['words', ' ring worn\r\nthrough '],
      ['name', ''],
      ['wear', '4,5 mm'],
    ]),
  )
  expect(parsed).toMatchObject({ ok: true, value: { words: 'ring worn\nthrough', wear: 4.5 } })
})

test('each wrong field is named with an example, and all that was typed is kept', () => {
  const parsed = parseForm(
    Schema,
    form([
      ['words', ''],
      ['name', 'Mara Quill of Skerrow'],
      ['wear', 'much'],
    ]),
  )
  expect(parsed).toEqual({
    ok: false,
    errors: {
      words: 'Type what you saw, for example ring worn to half.',
      name: 'This has 21 characters; 12 fit. Shorten it, for example to Mara Quill.',
      wear: 'Type the wear as a number from 0 to 30 mm, for example 4.5.',
    },
    typed: { words: '', name: 'Mara Quill of Skerrow', wear: 'much' },
  })
})

test('names in every script stay, put into one form; a letter of two parts counts once', () => {
  expect(cleanText('Zoe\u0308 Ødegård 北島 ‏سارا')).toBe('Zoë Ødegård 北島 ‏سارا')
  const parsed = parseForm(Schema, form([['words', '𝕜'.repeat(20)]]))
  expect(parsed.ok).toBe(true)
})

test('control characters, halves of letters and forced directions are taken out', () => {
  expect(cleanText('a\u0000b\u0007c\u009fd\ud800e\u202ef\ufeffg\uffffh')).toBe('abcdefgh')
  expect(cleanText('one\ttab\rtwo\u2028three')).toBe('one\ttab\ntwo\nthree')
})

test('a line field takes no second line', () => {
  const parsed = parseForm(
    Schema,
    form([
      ['words', 'x'],
      ['name', 'Mara\nQuill'],
    ]),
  )
  expect(parsed).toMatchObject({ value: { name: 'Mara Quill' } })
})

test('a name sent twice becomes a list, and photos are not text', () => {
  const typed = toTyped(
    form([
      ['kind', 'a'],
      ['kind', 'b'],
      ['photo', new Blob(['x'])],
      ['__proto__', 'x'],
    ]),
  )
  expect(typed).toEqual({ kind: ['a', 'b'] })
})

test('a body that is no form is read as an empty one', async () => {
  const request = new Request('http://x.example', {
    method: 'POST',
    body: 'junk',
    headers: { 'content-type': 'multipart/form-data' },
  })
  expect([...(await readForm(request))]).toEqual([])
})

const Fields = z.object({
  email: emailField(),
  kind: choiceField(['ring', 'hook'], { what: 'the kind', example: 'ring' }),
  seen: dayField({ what: 'the day', example: '2027-03-12' }),
  holes: numberField({ what: 'the holes', example: '2', min: 0, max: 9, unit: '', whole: true }),
  adult: tickField(),
})
const right: [string, string][] = [
  ['email', 'A@b.example'],
  ['kind', 'ring'],
  ['seen', '2027-03-12'],
  ['holes', '2'],
]

test('address, choice, day, count and tick are read as what they are', () => {
  expect(parseForm(Fields, form(right))).toMatchObject({
    value: { email: 'a@b.example', kind: 'ring', seen: '2027-03-12', holes: 2, adult: false },
  })
  expect(parseForm(Fields, form([...right, ['adult', 'on']]))).toMatchObject({ value: { adult: true } })
})

test.each([
  ['email', 'mara', 'mara@example.org'],
  ['kind', 'nail', 'for example ring'],
  ['seen', '2027-02-30', 'for example 2027-03-12'],
  ['seen', '12.3.2027', 'year-month-day'],
  ['holes', '2.5', 'whole number from 0 to 9'],
  ['holes', '1e3', 'for example 2'],
])('%s cannot be %j, and the message shows what can', (name, value, words) => {
  const parsed = parseForm(Fields, form([...right.filter(([other]) => other !== name), [name, value]]))
  expect(parsed.ok || parsed.errors).toEqual({ [name]: expect.stringContaining(words) })
})
