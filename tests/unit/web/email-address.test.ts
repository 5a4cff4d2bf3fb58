import { expect, test } from 'vitest'
import { parseEmailAddress } from '~/web/email-address'

test.each([
  [' Mara.Quill@Example.ORG ', 'mara.quill@example.org'],
  ['a+crag@example.org', 'a+crag@example.org'],
  ['tove@bücher.example', 'tove@xn--bcher-kva.example'],
])('%s is kept as %s', (typed, kept) => {
  expect(parseEmailAddress(typed)).toBe(kept)
})

test.each([
  'mara',
  '@example.org',
  'mara@example',
  'mara@',
  'mara@exa mple.org',
  'mara@127.0.0.1',
  'mara@example.org/x',
  'two@at@example.org',
  'máŕa@example.org',
  '.mara@example.org',
  'mara@example.org\nBcc: x@example.org',
  `${'m'.repeat(65)}@example.org`,
])('%j is no address', typed => {
  expect(parseEmailAddress(typed)).toBeNull()
})
