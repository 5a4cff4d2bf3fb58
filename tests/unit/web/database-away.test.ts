import { expect, test } from 'vitest'
import { isDatabaseAway } from '~/web/database-away'

const error = (fields: object, message = 'x') => Object.assign(new Error(message), fields)

test.each([
  [error({ code: 'ECONNREFUSED' })],
  [error({ code: 'PROTOCOL_CONNECTION_LOST' })],
  [error({ errno: 1040 })],
  [error({ errno: 1053 })],
  [error({}, "Can't add new command when connection is in closed state")],
])('the database is away when the error is %s', cause => {
  expect(isDatabaseAway(cause)).toBe(true)
  expect(isDatabaseAway(new Error('Failed query', { cause }))).toBe(true)
})

test.each([
  [error({ errno: 1062, code: 'ER_DUP_ENTRY' })],
  [new TypeError('x is not a function')],
  ['text'],
  [null],
])('the database is there when the error is %s', cause => {
  expect(isDatabaseAway(cause)).toBe(false)
})
