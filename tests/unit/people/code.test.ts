import { expect, test } from 'vitest'
import { formatDigits, parseDigits, toCodeDigits } from '~/people/code'
import { toCodeMail } from '~/people/code-mail'

test('a code has eight digits, the first may be nought', () => {
  const zeros = () => new Uint8Array(8)
  expect(toCodeDigits(zeros)).toBe('00000000')
  expect(toCodeDigits(() => Uint8Array.of(0, 0, 0, 0, 0xff, 0xff, 0xff, 0xff))).toBe('94967295')
})

test('a code is read however it was typed', () => {
  for (const typed of ['48219306', '4821 9306', ' 4821-9306\n', '４８２１９３０６'])
    expect(parseDigits(typed)).toBe('48219306')
  for (const typed of ['4821930', '482193060', '4821930a', '']) expect(parseDigits(typed)).toBeNull()
})

test('the mail with a code shows it, says where it belongs, and holds no link', () => {
  const { subject, text, html } = toCodeMail({ code: '48219306', appUrl: 'https://gear.example.org' })
  expect(text).toContain(formatDigits('48219306'))
  expect(text).toContain('gear.example.org')
  expect(html).not.toMatch(/href|https?:/)
  expect(text).not.toMatch(/https?:/)
  expect(subject).not.toMatch(/\d/)
})
