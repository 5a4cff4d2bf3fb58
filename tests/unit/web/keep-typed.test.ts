import { expect, test } from 'vitest'
import { keepTyped } from '~/web/keep-typed.server'

test('with the database away the answer holds the form as it was typed, other faults are faults', async () => {
  const typed = { words: 'ring worn' }
  const fail = (error: unknown) => keepTyped(typed, async () => Promise.reject(error))
  const away = Object.assign(new Error('x'), { code: 'ECONNREFUSED' })
  await expect(fail(away)).rejects.toMatchObject({ init: { status: 503 }, data: { typed } })
  await expect(fail(new Error('broken'))).rejects.toThrow('broken')
  expect(await keepTyped(typed, async () => 'done')).toBe('done')
})
