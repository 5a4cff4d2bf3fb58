import { expect, test } from 'vitest'
import { toThreadId } from '~/mail/thread'

test('mails of one thread refer to one id, of two threads to two', () => {
  expect(toThreadId('order:0190-a')).toBe('<thread.order.0190-a@cragfettle>')
  expect(toThreadId('order:0190-b')).not.toBe(toThreadId('order:0190-a'))
})

test('nothing in a thread can end the id early or begin another header', () => {
  expect(toThreadId('a>\r\nBcc: x@y <b')).toBe('<thread.a.bcc.x.y.b@cragfettle>')
})
