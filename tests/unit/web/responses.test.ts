import { expect, test } from 'vitest'
import { away, forbidden, invalid, notFound, orAway, refuse, tooMany } from '~/web/responses'

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
  expect(away(typed)).toMatchObject({ data: { typed }, init: { status: 503 } })
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

test('with the database away an action answers the form as it was typed, other faults are faults', async () => {
  const typed = { words: 'ring worn' }
  const fail = (error: unknown) => orAway(typed, async () => Promise.reject(error))
  const away = Object.assign(new Error('x'), { code: 'ECONNREFUSED' })
  expect(await fail(away)).toMatchObject({ init: { status: 503 }, data: { typed } })
  await expect(fail(new Error('broken'))).rejects.toThrow('broken')
  expect(await orAway(typed, async () => 'done')).toBe('done')
})
