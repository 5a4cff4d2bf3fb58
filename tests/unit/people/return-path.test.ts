import { expect, test } from 'vitest'
import { toReturnPath, toReturnQuery } from '~/people/return-path'

test('a path of ours is gone back to with its query and mark', () => {
  expect(toReturnPath('/crags/gannet-wall-KC7FQ2X?view=list#a3')).toBe(
    '/crags/gannet-wall-KC7FQ2X?view=list#a3',
  )
})

test.each([
  null,
  '',
  'crags',
  'https://evil.example/',
  '//evil.example',
  '/\\evil.example',
  '/\t/evil.example',
  '/..//evil.example',
  'javascript:alert(1)',
  '/sign-in',
  '/sign-in/code?to=/x',
  '/sign-out',
  '/sign-out.data',
])('%j is no way back', asked => {
  expect(toReturnPath(asked, '/account')).toBe('/account')
})

test('a page whose name only begins like signing in is one of ours', () => {
  expect(toReturnPath('/sign-inside')).toBe('/sign-inside')
})

test('the way back goes along through signing in only when it is one of ours', () => {
  expect(toReturnQuery('/hazards?band=first')).toBe('?to=%2Fhazards%3Fband%3Dfirst')
  expect(toReturnQuery('https://evil.example')).toBe('')
  expect(toReturnQuery(null)).toBe('')
})
