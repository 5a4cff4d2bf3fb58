import { expect, test } from 'vitest'
import { forbidden, invalid, notFound, refuse, tooMany } from '~/web/responses'

test('every refusal of a form has one shape and keeps what was typed', () => {
  const typed = { words: 'ring worn' }
  expect(invalid({ errors: { name: 'Type a name.' }, typed })).toMatchObject({
    data: { errors: { name: 'Type a name.' }, typed },
    init: { status: 400 },
  })
  expect(refuse('It was taken in a minute ago.', typed)).toMatchObject({
    data: { errors: {}, typed, reason: 'It was taken in a minute ago.' },
    init: { status: 409 },
  })
  expect(tooMany('Try again in a minute.', 60, typed)).toMatchObject({
    data: { typed },
    init: { status: 429, headers: { 'Retry-After': '60' } },
  })
})

test('what is not there and what is not allowed carry their sentence', () => {
  expect(notFound()).toMatchObject({ init: { status: 404 }, data: { reason: expect.stringMatching(/\w/) } })
  expect(forbidden('Only a coordinator may.')).toMatchObject({
    init: { status: 403 },
    data: { reason: 'Only a coordinator may.' },
  })
})
